/* What the rules of the rulebook say about each system of a case: stops first, notes last, inherited ones with their deficiency. */
import { deficiencyOf, type DocumentFacts } from '@domain/case';
import { maskOutcome } from '@domain/hidden';
import { type Outcome } from '@domain/rulebook';
import { type CaseDocumentFile } from '../../case-file';
import { dayWords } from '../days';
import { type RuleWords, ruleWords } from '../rule-words';
import { nameOf } from './acts';
import { noteLook, type OpenedCase } from './open';
import { placeOf } from './places';
import { proseOf, type Prose } from './prose';

export type OutcomeView = {
  code: string;
  /** The rule in words, and where the rulebook states it. */
  rule: RuleWords;
  severity: Outcome['severity'];
  subject: string;
  sentence: string;
  href: string;
  /** Anchor that open points lead to. */
  anchor: string;
  inherited: boolean;
  justification?: { text: Prose; by: string };
  deficiency?: { owner: string; due: string; state: string; signed: boolean; interim?: Prose };
  hash: string;
};
export type OutcomesOfSystem = {
  document: string;
  tag: string;
  stops: OutcomeView[];
  justify: OutcomeView[];
  inherited: OutcomeView[];
  notes: OutcomeView[];
};

function justificationOf(of: OpenedCase, one: CaseDocumentFile, outcome: Outcome) {
  const written = one.after?.body.justifications.find(
    (each) => each.code === outcome.code && each.subject === outcome.subject && each.hash === outcome.hash,
  );
  if (!written) return {};
  const by = `${nameOf(of, written.by)}, ${dayWords(written.on)}`;
  return { justification: { text: proseOf(of, written.text, one), by } };
}

function deficiencyView(of: OpenedCase, facts: DocumentFacts, one: CaseDocumentFile, outcome: Outcome) {
  const item = outcome.inherited ? deficiencyOf(outcome, facts, of.facts) : undefined;
  if (!item) return {};
  return {
    deficiency: {
      owner: nameOf(of, item.owner),
      due: dayWords(item.due),
      state: item.state,
      signed: item.signature !== undefined,
      ...(item.interim ? { interim: proseOf(of, item.interim as Prose['rich'], one) } : {}),
    },
  };
}

/** The subject by its tag; a scenario has none and is called by its name. */
function subjectOf(of: OpenedCase, one: CaseDocumentFile, outcome: Outcome): string {
  if (!outcome.subject.startsWith('scenarios/')) return outcome.tag;
  return placeOf(of, `${one.document.id}:${outcome.subject}`).label;
}

/** One outcome as the reader may see it: its figures are taken out while their view is hidden. */
export function outcomeView(
  of: OpenedCase,
  facts: DocumentFacts,
  one: CaseDocumentFile,
  raw: Outcome,
): OutcomeView {
  const outcome = of.hidden ? maskOutcome(raw) : raw;
  return {
    code: outcome.code,
    rule: ruleWords(of.file.site.slug, outcome.code),
    severity: outcome.severity,
    subject: subjectOf(of, one, outcome),
    sentence: outcome.sentence.replace(new RegExp(`^${escaped(outcome.tag)}:? `), ''),
    href: placeOf(of, `${one.document.id}:${outcome.subject}`).href,
    anchor: `${outcome.code}-${outcome.subject}`,
    inherited: outcome.inherited,
    ...justificationOf(of, one, raw),
    ...deficiencyView(of, facts, one, raw),
    hash: outcome.hash,
  };
}

function escaped(text: string): string {
  return text.replace(/[.*+?^${}()|[\]\\/]/g, '\\$&');
}

function systemOf(of: OpenedCase, one: CaseDocumentFile): OutcomesOfSystem {
  const facts = of.facts.documents.find((each) => each.document === one.document.id);
  const all = facts ? (one.after?.outcomes ?? []).map((raw) => outcomeView(of, facts, one, raw)) : [];
  const fresh = all.filter((each) => !each.inherited || each.severity === 'note');
  return {
    document: one.document.id,
    tag: one.document.tag,
    stops: fresh.filter((each) => each.severity === 'stop'),
    justify: fresh.filter((each) => each.severity === 'justify'),
    inherited: all.filter((each) => each.inherited && each.severity !== 'note'),
    notes: fresh.filter((each) => each.severity === 'note'),
  };
}

/** The outcomes of every system of the case. */
export async function outcomesView(
  of: OpenedCase,
): Promise<{ hidden: boolean; systems: OutcomesOfSystem[] }> {
  await noteLook(of, 'outcomes');
  return { hidden: of.hidden, systems: of.file.documents.map((one) => systemOf(of, one)) };
}
