/* The unseen check of a seeded case: every mandatory entry, the reveal, and how the two sides compared. */
import { type Q } from '@engine/quantity';
import {
  compareUnseen,
  originatorsValue,
  type UnseenEntry,
  type UnseenItem,
  unseenState,
} from '@domain/case';
import { addReconciliation, addReveal, addUnseen } from '@data/check';
import { newId } from '@data/ids';
import { answerId, documentId, personId, plainQ, pointId, rich, scenarioKey, systemOf } from '../convert';
import { type DemoUnseen } from '../cases/demo-case-types';
import { type CaseDoc, type CasePlan, factsOf } from './plan';

const STEP = 90_000;
const BEFORE_SIGNATURE = 2.5 * 3_600_000;

type Compared = { against: Q | string | null; deviation: number | null; within: boolean };
/** An entry with what it was compared with; `theirs` is the originator's value at that time. */
export type Entered = { entry: UnseenEntry; compared: Compared };
export type DocumentCheck = { doc: CaseDoc; entries: Entered[]; revealedAt: string };

/** Where an entry of theirs stands: scope and the quantity that sets its tolerance. */
function scopeOf(demo: DemoUnseen): string {
  const [, cause = '', third = ''] = demo.sheet.split('/');
  if (cause === 'device') return `points/${pointId(third)}#builtUp`;
  const sheet = `${scenarioKey(cause)}/${answerId(third)}`;
  return demo.figure === 'relief_load'
    ? `sheets/load:${sheet}#relief_load`
    : `sheets/size:${sheet}#A_required`;
}

function demosOf(plan: CasePlan, doc: CaseDoc): DemoUnseen[] {
  return plan.demo.blind_check.filter((one) => one.sheet.startsWith(`${doc.tag}/`));
}

/** A checker rounds what they read or work; a word is a word. */
function rounded(
  value: Q | string | undefined,
  layer: UnseenItem['layer'],
): Pick<UnseenEntry, 'value' | 'word'> {
  if (typeof value === 'string') return { word: value };
  if (!value) return {};
  return {
    value: {
      value: layer === 'reading' ? value.value : Number(value.value.toPrecision(4)),
      unit: value.unit,
    },
  };
}

function checkedAt(plan: CasePlan, doc: CaseDoc): number {
  const own = demosOf(plan, doc).map((one) => Date.parse(plan.world.shift.instant(one.at)));
  if (own.length > 0) return Math.min(...own);
  const signed =
    plan.demo.signoffs.find((one) => one.gate === 'calculation check')?.at ?? plan.demo.raised_on;
  return Date.parse(plan.world.shift.instant(signed)) - BEFORE_SIGNATURE;
}

type Place = { plan: CasePlan; doc: CaseDoc; at: number };

function entryOf({ plan, doc, at }: Place, item: UnseenItem): Entered {
  const theirs = originatorsValue(factsOf(doc), item);
  const demo = demosOf(plan, doc).find((one) => scopeOf(one) === item.scope && one.round === 1);
  const given = demo ? { value: plainQ(demo.checker_value) } : rounded(theirs, item.layer);
  const entry: UnseenEntry = {
    id: newId('unseen'),
    case: plan.id,
    document: doc.document,
    scope: item.scope,
    layer: item.layer,
    quantity: item.quantity,
    ...given,
    ...(item.layer === 'reading' ? { cites: doc.working.body.references[0]?.title ?? doc.tag } : {}),
    round: 1,
    by: personId(plan.demo.nominated.checker),
    at: new Date(at).toISOString(),
    ...(item.layer === 'figure' && item.scope.startsWith('sheets/')
      ? { route: item.scope.slice(7).split('#')[0] ?? '' }
      : {}),
  };
  return { entry, compared: comparedWith(entry, item.label, theirs) };
}

function comparedWith(entry: UnseenEntry, label: string, theirs: Q | string | undefined): Compared {
  const mine = entry.value ?? entry.word ?? '';
  const compared = compareUnseen({ quantity: entry.quantity, label, mine, theirs });
  return { against: theirs ?? null, deviation: compared.deviation ?? null, within: compared.within };
}

/** Works through the items in the order in which the check asks for them, until nothing is left. */
function mandatory(plan: CasePlan, doc: CaseDoc): Entered[] {
  const of = factsOf(doc);
  const made: Entered[] = [];
  const facts = { case: { class: plan.demo.class, stage: plan.stage } as never, reveals: [] };
  for (let at = checkedAt(plan, doc); ; at += STEP) {
    const state = unseenState(of, { ...facts, unseen: made.map((one) => one.entry) });
    const item = state.mayEnter[0];
    if (!item) return made;
    made.push(entryOf({ plan, doc, at }, item));
  }
}

/** Entries of theirs that the mandatory set does not ask for, such as a first round that did not agree. */
function further(plan: CasePlan, doc: CaseDoc, made: readonly Entered[]): Entered[] {
  const taken = new Set(made.map(({ entry }) => entry.scope));
  return demosOf(plan, doc)
    .filter((one) => !taken.has(scopeOf(one)))
    .map((one) => furtherEntry(plan, doc, one));
}

function furtherEntry(plan: CasePlan, doc: CaseDoc, demo: DemoUnseen): Entered {
  const scope = scopeOf(demo);
  const point = scope.startsWith('points/');
  const side = demo.note?.startsWith('Outside') === true ? doc.base : doc.working;
  const theirs = side.evaluation.figures[scope];
  const set = systemOf(doc.tag).devices.find((device) =>
    scope.includes(`/${pointId(device.tag)}#`),
  )?.set_pressure;
  const share =
    point && set
      ? {
          value: Number(((demo.checker_value.value / 100) * set.value).toPrecision(4)),
          unit: set.unit.replace('_g', ''),
        }
      : undefined;
  const entry: UnseenEntry = {
    id: newId('unseen'),
    case: plan.id,
    document: documentId(doc.tag),
    scope,
    layer: 'figure',
    quantity: point ? 'back-pressure' : 'required-area',
    value: share ?? plainQ(demo.checker_value),
    ...(point ? { cites: `${String(demo.checker_value.value)} % of set` } : {}),
    round: demo.round,
    by: personId(demo.by),
    at: plan.world.shift.instant(demo.at),
  };
  return { entry, compared: comparedWith(entry, demo.figure, theirs) };
}

/** The unseen check of every document of a case that has passed to the check or beyond. */
export function unseenOf(plan: CasePlan): DocumentCheck[] {
  if (!['check', 'approval', 'field', 'in-force', 'refused'].includes(plan.stage)) return [];
  return plan.documents.map((doc) => {
    const first = mandatory(plan, doc);
    const entries = [...first, ...further(plan, doc, first)].sort((a, b) =>
      a.entry.at < b.entry.at ? -1 : 1,
    );
    const ordered = entries.map((one) => ({ ...one, entry: { ...one.entry, id: newId('unseen') } }));
    const last = ordered.at(-1)?.entry.at ?? plan.world.shift.instant(plan.demo.raised_on);
    return { doc, entries: ordered, revealedAt: new Date(Date.parse(last) + STEP).toISOString() };
  });
}

function governing(doc: CaseDoc): Record<string, string> {
  const keys = Object.values(doc.working.evaluation.groups).flatMap((group) => group.governing ?? []);
  return Object.fromEntries(keys.map((key) => [key, doc.working.evaluation.sheets[key]?.hash ?? '']));
}

/** Writes entries, reveals and comparisons; a first round that did not agree is reconciled where the second agreed. */
export async function writeUnseen(plan: CasePlan, checks: readonly DocumentCheck[]): Promise<void> {
  const { trx } = plan.world;
  for (const { doc, entries, revealedAt } of checks) {
    await addUnseen(
      trx,
      entries.map(({ entry }) => {
        const { case: caseId, document, by, value, word, cites, route, ...rest } = entry;
        return {
          ...rest,
          caseId,
          documentId: document,
          byId: by,
          value: value ?? null,
          word: word ?? null,
          cites: cites ?? null,
          route: route ?? null,
        };
      }),
    );
    const checker = personId(plan.demo.nominated.checker);
    const reveal = {
      id: newId('reveal'),
      caseId: plan.id,
      personId: checker,
      documentId: doc.document,
      round: 1,
      sheets: governing(doc),
      at: revealedAt,
    };
    await addReveal(
      trx,
      reveal,
      entries.map(({ entry, compared }) => ({ entryId: entry.id, ...compared })),
    );
  }
}

/** Writes how an entry that lay outside its tolerance was reconciled. */
export async function reconcile(plan: CasePlan, checks: readonly DocumentCheck[]): Promise<void> {
  if (plan.stage === 'check') return;
  for (const { entries, revealedAt } of checks) {
    for (const { entry, compared } of entries) {
      if (compared.within) continue;
      const text = rich(
        'The first figure of the originator was corrected; the second round agrees with mine.',
      );
      await addReconciliation(plan.world.trx, { entryId: entry.id, byId: entry.by, at: revealedAt, text });
    }
  }
}
