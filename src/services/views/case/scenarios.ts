/* The scenarios of a system in a case: the table with loads and areas, and what the form of each needs. */
import { type Basis, capital, plainText, type Rich, type Scenario, STATUSES } from '@domain/basis';
import { can, isJustified, scenarioName, type DocumentFacts } from '@domain/case';
import { type Evaluation } from '@domain/evaluate';
import { maskDocument, maskOutcome, readingsOf } from '@domain/hidden';
import { groupLabel } from '@domain/projections';
import { ok, type Result } from '@domain/result';
import { type Outcome } from '@domain/rulebook';
import { orderOfScenario, scenarioByKey, sentencesFor } from '@domain/scenarios';
import { type CaseDocumentFile, onFile } from '../../case-file';
import { whoOf } from '../../context';
import { type Evaluated } from '../../evaluate-document';
import { keptWith } from '@data/memo';
import { ruleName } from '../rule-words';
import { areaUnit, loadUnit, rowFigures, scaleOf, type Scale } from './scenario-figures';
import { answerViews, type AnswerView, calcChoices, type Choices } from './scenario-answers';
import { noteLook, type OpenedCase } from './open';
import { systemOf, type SystemTab, systemTabs } from './systems';

export type LineView = {
  number: number;
  name: string;
  href: string;
  disposition: 'credible' | 'below-limit' | 'not-credible' | 'not-applicable' | 'to-do';
  governs?: boolean;
  reason?: string;
  load?: string;
  required?: string;
  area?: number;
  areaBefore?: number;
  used?: string;
  verdict?: Evaluation['groups'][string]['verdict'];
  hidden?: boolean;
};
export type OutcomeView = {
  code: string;
  /** The rule in words. */
  rule: string;
  severity: 'stop' | 'justify' | 'note';
  subject: string;
  sentence: string;
  hash: string;
  inherited: boolean;
  asks: boolean;
  justification?: { text: string; plain: string };
};
export type ScenarioView = {
  id: string;
  number: number;
  name: string;
  question: string;
  hint: string;
  disposition: string;
  statuses: string[];
  reason: Rich;
  plain: string;
  why: string;
  depends: { value: string; label: string; chosen: boolean }[];
  sentences: { disposition: string; text: string }[];
  answers: AnswerView[];
  outcomes: OutcomeView[];
  changed: boolean;
  bound: string;
};
export type ScenariosView = {
  tabs: SystemTab[];
  system: string;
  version: number | null;
  editable: boolean;
  whyNot?: string;
  hidden: boolean;
  fact: string;
  lines: LineView[];
  scale: Scale | null;
  units: { load: string; area: string; used: string };
  scenarios: ScenarioView[];
  choices: Choices;
};

type Both = { now: Evaluated; before: Evaluated | undefined; doc: Basis };

function governed(evaluation: Evaluation, scenario: Scenario): boolean {
  return Object.values(evaluation.groups).some((group) =>
    scenario.answers.some((answer) => group.governing === `size:${scenario.id}/${answer.id}`),
  );
}

function lineOf(both: Both, scenario: Scenario, number: number, hidden: boolean): LineView {
  const line = {
    number,
    name: scenarioName(scenario),
    href: `#${encodeURIComponent(scenario.id)}`,
    disposition: scenario.disposition ?? ('to-do' as const),
    reason: plainText(scenario.reason),
  };
  if (scenario.disposition !== 'credible') return line;
  if (hidden) return { ...line, hidden };
  return {
    ...line,
    governs: governed(both.now.evaluation, scenario),
    ...rowFigures(both.now.evaluation, both.before?.evaluation, scenario, both.doc.units),
  };
}

function outcomeView(
  outcome: Outcome,
  facts: DocumentFacts | undefined,
  both: Both,
  least: number,
): OutcomeView {
  const text = both.doc.justifications.find(
    (one) => one.code === outcome.code && one.subject === outcome.subject && one.hash === outcome.hash,
  )?.text;
  const { code, severity, sentence, hash, inherited } = outcome;
  const justified = facts ? isJustified(outcome, facts, least) : false;
  return {
    code,
    rule: ruleName(code),
    severity,
    subject: outcome.tag,
    sentence,
    hash,
    inherited,
    asks: severity === 'justify' && !inherited && !justified,
    ...(text ? { justification: { text: plainText(text), plain: plainText(text) } } : {}),
  };
}

function belongs(outcome: Outcome, scenario: Scenario): boolean {
  const at = `scenarios/${scenario.id}`;
  const sheets = ['limit', 'load', 'size'].map((kind) => `sheets/${kind}:${scenario.id}/`);
  return (
    outcome.subject === at ||
    outcome.subject.startsWith(`${at}/`) ||
    sheets.some((sheet) => outcome.subject.startsWith(sheet))
  );
}

function boundOf(doc: Basis, scenario: Scenario): string {
  const { bound } = scenario;
  if (!bound) return '';
  const item = doc.equipment.find((one) => one.id === bound.limit.equipment);
  return `Rests on a figure held below the ${bound.limit.of === 'mawp' ? 'MAWP' : 'external rating'} of ${item?.tag ?? 'the limiting item'}.`;
}

function scenarioView(of: OpenedCase, both: Both, scenario: Scenario, number: number): ScenarioView {
  const standard = scenarioByKey(scenario.key);
  const facts = of.facts.documents.find((one) => one.document === both.doc.id);
  const own = both.now.outcomes.filter((outcome) => belongs(outcome, scenario));
  const outcomes = of.hidden ? own.map(maskOutcome) : own;
  const old = both.before?.body.scenarios.find((one) => one.id === scenario.id);
  return {
    id: scenario.id,
    number,
    name: scenarioName(scenario),
    question: standard?.question ?? 'Can this cause load the relief device, and with how much?',
    hint: standard
      ? `${capital(standard.state)}. Adds to other systems at a header: ${standard.headerNote}.`
      : '',
    disposition: scenario.disposition ?? '',
    statuses: STATUSES.filter((status) => scenario.statuses[status] === true),
    reason: scenario.reason,
    plain: plainText(scenario.reason),
    why: scenario.why ?? '',
    depends: both.doc.fieldConditions.map((one) => ({
      value: one.id,
      label: `${one.tag}, ${one.kind.replaceAll('-', ' ')}`,
      chosen: (scenario.dependsOn ?? []).some((each) => each.condition === one.id),
    })),
    sentences: ['below-limit', 'not-credible', 'not-applicable'].flatMap((disposition) =>
      sentencesFor(scenario.key, disposition).map((text) => ({ disposition, text })),
    ),
    answers: answerViews(both, scenario, of.hidden),
    outcomes: outcomes.map((outcome) => outcomeView(outcome, facts, both, of.facts.rules.reasonLength)),
    changed:
      old !== undefined && JSON.stringify(old) !== JSON.stringify(scenarioOf(both.now.body, scenario.id)),
    bound: boundOf(both.doc, scenario),
  };
}

function scenarioOf(doc: Basis, id: string): Scenario | undefined {
  return doc.scenarios.find((one) => one.id === id);
}

function sorted(doc: Basis): Scenario[] {
  return doc.scenarios.toSorted((a, b) => orderOfScenario(a.key) - orderOfScenario(b.key));
}

const COUNTED = ['credible', 'below-limit', 'not-credible', 'not-applicable', undefined] as const;
const COUNT_WORDS = ['credible', 'below limit', 'not credible', 'not applicable', 'to decide'];

function factOf(doc: Basis): string {
  return COUNTED.flatMap((disposition, i) => {
    const count = doc.scenarios.filter((one) => one.disposition === disposition).length;
    return count === 0 ? [] : [`${String(count)} ${COUNT_WORDS[i] ?? ''}`];
  }).join(', ');
}

function bothOf(one: CaseDocumentFile, hidden: boolean): Both | undefined {
  const now = one.after ?? one.before;
  if (!now) return undefined;
  const doc = hidden ? maskDocument(now.body, readingsOf(now.body)) : now.body;
  return { now, before: one.before, doc };
}

/** The scenarios of one system of a case; results and loads are left out where they are hidden from the reader. */
export async function scenariosView(of: OpenedCase, tag: string | null): Promise<Result<ScenariosView>> {
  const found = systemOf(of, tag);
  if (!found.ok) return found;
  const one = found.value;
  await noteLook(of, `scenarios ${one.document.tag}`);
  return ok(await keptWith(of, `scenarios ${one.document.tag}`, () => Promise.resolve(scenariosOf(of, one))));
}

function scenariosOf(of: OpenedCase, one: CaseDocumentFile): ScenariosView {
  const both = bothOf(one, of.hidden);
  const may = can(whoOf(of.actor), 'edit-document', onFile(of.file));
  const editable = may.ok && one.working?.state === 'working' && !of.hidden;
  const why = may.ok
    ? 'Scenarios are decided in the working revision, which is made when the draft is passed.'
    : may.sentence;
  const list = both ? sorted(both.doc) : [];
  const units = both?.doc.units ?? 'SI';
  return {
    tabs: systemTabs(of, 'scenarios', one.document.tag),
    system: one.document.tag,
    version: one.working?.version ?? null,
    editable,
    ...(editable ? {} : { whyNot: why }),
    hidden: of.hidden,
    fact: both ? factOf(both.doc) : '',
    lines: both ? list.map((scenario, i) => lineOf(both, scenario, i + 1, of.hidden)) : [],
    scale: both && !of.hidden ? scaleOf(both.now, both.before, units) : null,
    units: { load: loadUnit(units), area: areaUnit(units), used: '% of installed' },
    scenarios: both ? list.map((scenario, i) => scenarioView(of, both, scenario, i + 1)) : [],
    choices: both ? calcChoices(both.doc, groupLabel) : { load: [], size: [], fluids: [], groups: [] },
  };
}
