/* Evaluations, outcomes, differences, register rows and trail entries as the hidden view lets them through. */
import { type Id, type TrailEntry } from '@domain/case';
import { type Evaluation } from '@domain/evaluate';
import { type Outcome } from '@domain/rulebook/types';
import { type Change } from '@domain/difference';
import { HIDDEN_WORD, maskProse } from './prose';
import { type HiddenSet, isHidden, isHiddenCase, type Withheld, WITHHELD } from './hidden';

/** What is left of an evaluation: which sheets there are and by which method, no result, no verdict, no governing mark. */
export type HiddenEvaluation = Withheld & { sheets: { key: string; hidden: true }[] };

/** An evaluation without anything that follows from it; keys of sheets are those of the scenarios that anyone can read. */
export function maskEvaluation(evaluation: Evaluation): HiddenEvaluation {
  const keys = Object.keys(evaluation.sheets).filter((key) => /^(limit|load|size):/.test(key));
  return { hidden: true, sheets: keys.sort().map((key) => ({ key, hidden: true })) };
}

/** An outcome that keeps its code and place; values and sentence are withheld, severity stays because it opens a gate. */
export function maskOutcome(outcome: Outcome): Outcome {
  return {
    ...outcome,
    values: {},
    hash: '',
    sentence: `${outcome.tag}: the rule “${outcome.code}” is not met.`,
  };
}

/** A difference that keeps what was touched, not from what to what. */
export function maskChange(change: Change): Change {
  const { old: _old, now: _now, words: _words, ...rest } = change;
  return { ...rest, label: maskProse(change.label), old: HIDDEN_WORD, now: HIDDEN_WORD };
}

/** Register columns that are results; the same for systems, relief points and scenarios. */
export const RESULT_COLUMNS = [
  'governing',
  'required',
  'installed',
  'use',
  'margin',
  'verdict',
  'letter',
  'area',
  'rated',
  'capacity',
  'inletLoss',
  'builtUp',
  'total',
  'backPressure',
  'p1',
  'load',
  'reaction',
  'headroom',
  'back',
  'relieving',
  'governs',
  'stops',
  'justifies',
  'set',
  'mawp',
] as const;

/** A register row whose result columns are null: last in every order, matched by no filter. `more` names columns of one list. */
export function maskRow<R extends object>(row: R, more: readonly string[] = []): R {
  const columns = new RegExp(`^(${[...RESULT_COLUMNS, ...more].join('|')})($|_|[A-Z])`);
  const kept = Object.entries(row).map(([key, value]) => [
    key,
    columns.test(key) ? null : (value as unknown),
  ]);
  return { ...(Object.fromEntries(kept) as R), hidden: true };
}

/** Rows of hidden documents masked, the others as they are. */
export function projectRows<R extends object>(
  rows: readonly R[],
  documentOf: (row: R) => Id,
  hidden: HiddenSet,
): R[] {
  return rows.map((row) => (isHidden(hidden, documentOf(row)) ? maskRow(row) : row));
}

/** A trail entry that hides: the act stays, what changed and why does not. */
export function maskTrail(entry: TrailEntry, hidden: HiddenSet): TrailEntry {
  const touches = entry.hides && (isHiddenCase(hidden, entry.case) || isHidden(hidden, entry.subject));
  if (!touches) return entry;
  const { why: _why, ...rest } = entry;
  return { ...rest, changes: [] };
}

/** What `project` shows of a value that belongs to a document: itself, or what the mask leaves of it. */
export function project<T, M>(
  value: T,
  of: { document?: Id; case?: Id },
  hidden: HiddenSet,
  masked: (value: T) => M,
): T | M {
  return isHidden(hidden, of.document) || isHiddenCase(hidden, of.case) ? masked(value) : value;
}

/** The withheld marker in place of a value of a hidden document. */
export function projectValue<T>(value: T, document: Id, hidden: HiddenSet): T | Withheld {
  return isHidden(hidden, document) ? WITHHELD : value;
}
