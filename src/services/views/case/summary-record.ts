/* The record of the summary to sign: what was compared, what was not examined again, who answered, what must hold in the field. */
import { type FieldCondition, quantityOf } from '@domain/basis';
import { changedSheets, type DocumentFacts, type SeatRole, unseenDifferences } from '@domain/case';
import { scenarioLabel } from '@domain/projections';
import { formatQuantity } from '@engine/quantity';
import { type CaseDocumentFile } from '../../case-file';
import { validSignatures } from '../../signed';
import { dayWords } from '../days';
import { nameOf } from './acts';
import { type OpenedCase } from './open';
import { plainOf } from './prose';
import { type ComparedRow, identicalNote, unseenView } from './unseen';
import { shortHash, zonedWords } from './when';

export type Differed = { system: string; rows: ComparedRow[]; within: number; identical?: string };
export type NotExamined = { system: string; scenarios: { name: string; last: string }[]; all: number };
export type AffectedView = {
  tag: string;
  href: string;
  why: string[];
  answer: string;
  reason?: string;
  by?: string;
};
export type ConditionView = {
  system: string;
  tag: string;
  requires: string;
  supports: string[];
  change: 'new' | 'changed' | 'same';
};
export type DueView = { text: string; kind: string; owner: string; due: string; state: string; bars: string };
export type PlaceView = {
  label: string;
  name?: string;
  at?: string;
  meaning?: string;
  hash?: string;
  waits?: string;
};

/** Entries that lie outside their tolerance or were reconciled, and how many agree. */
export async function differedIn(of: OpenedCase): Promise<Differed[]> {
  if (of.hidden) return [];
  const view = await unseenView(of);
  return view.systems.map((system) => {
    const facts = of.facts.documents.find((each) => each.document === system.document);
    const all = facts ? unseenDifferences(facts, of.facts, { barometer: of.file.site.barometer }) : [];
    const identical = identicalNote(all);
    const rows = system.rows.filter((row) => !row.within || row.reconciled);
    return {
      system: system.tag,
      rows,
      within: system.rows.length - rows.length,
      ...(identical === undefined ? {} : { identical }),
    };
  });
}

/** Scenarios that this case neither examined nor moved a sheet of. */
export function notExamined(
  of: OpenedCase,
  one: CaseDocumentFile,
  facts: DocumentFacts | undefined,
): NotExamined {
  const scenarios = one.after?.body.scenarios ?? [];
  const moved = new Set(
    (facts ? changedSheets(facts) : []).map(
      (sheet) => sheet.key.slice(sheet.key.indexOf(':') + 1).split('/')[0],
    ),
  );
  const left = scenarios.filter((each) => each.examined?.case !== of.file.row.id && !moved.has(each.id));
  return {
    system: one.document.tag,
    all: scenarios.length,
    scenarios: left.map((each) => ({
      name: one.after ? scenarioLabel(one.after.body, each) : each.key,
      last: each.examined ? `last examined ${dayWords(each.examined.on)}` : 'no examination on record',
    })),
  };
}

const ANSWERS = { included: 'included in this case', 'not-affected': 'not affected' } as const;

/** The affected systems with their answers. */
export function affectedIn(of: OpenedCase): AffectedView[] {
  return of.file.affected.map((row) => {
    const tag = of.file.affectedDocuments.find((one) => one.id === row.documentId)?.tag ?? row.documentId;
    const by = row.byId === null ? undefined : nameOf(of, row.byId);
    return {
      tag,
      href: `/s/${of.file.site.slug}/systems/${encodeURIComponent(tag)}`,
      why: row.why.map((each) => plainOf(of, each)),
      answer: row.answer ? ANSWERS[row.answer] : 'no answer yet',
      ...(row.reason === null ? {} : { reason: plainOf(of, row.reason) }),
      ...(by === undefined || row.at === null ? {} : { by: `${by}, ${dayWords(row.at)}` }),
    };
  });
}

function requiresOf(condition: FieldCondition): string {
  const figure = quantityOf(condition.requires.figure);
  const lock = condition.lock
    ? `lock ${condition.lock.number}, key with ${condition.lock.keeper}`
    : undefined;
  const parts = [condition.requires.words, figure && formatQuantity(figure), lock].filter(Boolean);
  return parts.length > 0 ? parts.join(', ') : condition.kind.replaceAll('-', ' ');
}

/** Field conditions of a system, new and changed ones first. */
export function conditionsIn(of: OpenedCase, one: CaseDocumentFile): ConditionView[] {
  const { before, after } = one;
  const order = { new: 0, changed: 1, same: 2 };
  const rows = (after?.body.fieldConditions ?? []).map((condition): ConditionView => {
    const was = before?.body.fieldConditions.find((each) => each.id === condition.id);
    const supports = (after?.body.scenarios ?? []).filter((scenario) =>
      (scenario.dependsOn ?? []).some((each) => each.condition === condition.id),
    );
    return {
      system: one.document.tag,
      tag: condition.tag,
      requires: plainOf(of, requiresOf(condition)),
      supports: supports.map((scenario) => (after ? scenarioLabel(after.body, scenario) : scenario.key)),
      change: !was ? 'new' : JSON.stringify(was) === JSON.stringify(condition) ? 'same' : 'changed',
    };
  });
  return rows.toSorted((a, b) => order[a.change] - order[b.change]);
}

const BARS = { 'start-up': 'before start-up', extension: 'before an extension' } as const;

/** What is owed to the case before start-up or later; deficiencies stand with the outcomes. */
export function dueIn(of: OpenedCase): DueView[] {
  return of.file.due
    .filter((item) => item.caseId === of.file.row.id && item.kind !== 'deficiency')
    .map((item) => ({
      text: plainOf(of, item.text),
      kind: item.kind.replaceAll('-', ' '),
      owner: nameOf(of, item.ownerId),
      due: dayWords(item.due),
      state: item.state,
      bars: item.bars ? BARS[item.bars] : '',
    }));
}

const SIGNED: readonly { role: SeatRole; gate: string; label: string }[] = [
  { role: 'originator', gate: 'scenarios', label: 'Originator' },
  { role: 'checker', gate: 'check', label: 'Checker' },
  { role: 'approver', gate: 'approval', label: 'Approver' },
];

/** The places of signature, filled or waiting. */
export function placesIn(of: OpenedCase): PlaceView[] {
  const signatures = validSignatures(of.file).filter((one) => one.valid);
  return SIGNED.flatMap(({ role, gate, label }) => {
    const seats = of.file.seats.filter((seat) => seat.role === role && !seat.untilAt);
    return seats.map((seat, index): PlaceView => {
      const name = nameOf(of, seat.personId);
      const numbered = seats.length > 1 ? `${label} ${String(index + 1)}` : label;
      const signed = signatures.findLast(
        (one) => one.gate === gate && (one.for ?? one.person) === seat.personId,
      );
      if (!signed) return { label: numbered, waits: `waits for ${name}` };
      const at = zonedWords(signed.at, signed.zone);
      return {
        label: `${numbered} signed`,
        name: signed.name,
        at,
        meaning: signed.meaning,
        hash: shortHash(signed.hash),
      };
    });
  });
}
