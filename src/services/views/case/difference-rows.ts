/* Differences of two documents as rows of a table: where, old, now, unit, origin; texts by words. */
import { type Basis, capital, isFigure, isKnown, isRich } from '@domain/basis';
import { type Change, difference, type WordPart } from '@domain/difference';
import { HIDDEN_WORD, maskChange } from '@domain/hidden';
import { madeOfWords } from '../made-of';
import { type Shown } from '../shown';
import { toldApart } from '../told-apart';
import { shownAny } from './shown-values';

export type RowWords = { text: string; kind: 'same' | 'removed' | 'added' }[];
export type DifferenceRowView = {
  path: string;
  section: string;
  where: string;
  href: string;
  old?: string;
  now?: string;
  unit?: string;
  origin?: string;
  kind: 'changed' | 'added' | 'removed' | 'moved';
  set?: boolean;
  hidden?: boolean;
  words?: RowWords;
};

export const SECTION_WORDS: Readonly<Record<string, string>> = {
  boundary: 'Boundary',
  equipment: 'Equipment',
  sources: 'Sources',
  fluids: 'Fluids',
  reliefPoints: 'Relief points',
  groups: 'Groups',
  isolations: 'Isolation valves',
  interlocks: 'Interlocks',
  segments: 'Lines',
  lines: 'Lines',
  scenarios: 'Scenarios',
  externalSheets: 'External sheets',
  fieldConditions: 'Field conditions',
  references: 'References',
  once: 'Asked once a system',
  assumptions: 'Assumptions',
  justifications: 'Justifications',
  neighbours: 'Neighbours',
  imports: 'Headers',
};

const KINDS = { moved: 'changed', added: 'added', removed: 'removed', order: 'moved' } as const;

function wordsOf(parts: readonly WordPart[]): RowWords {
  return parts.map(({ kind, text }) => ({ text, kind: kind === 'equal' ? 'same' : kind }));
}

function textChange(change: Change): boolean {
  return isRich(change.old) || isRich(change.now);
}

/** Two figures apart by less than is printed get more digits, their typed ones left aside. */
function apart(change: Change, old: Shown | undefined, now: Shown | undefined): [string?, string?] {
  const [one, two] = [change.old, change.now];
  if (!old || !now || old.text !== now.text || old.unit !== now.unit) return [];
  if (!isFigure(one) || !isFigure(two) || !isKnown(one) || !isKnown(two)) return [];
  return one.value === two.value ? [] : toldApart({ ...one, unit: '-' }, { ...two, unit: '-' });
}

function rowOf(change: Change, base: Basis, ours: Basis, href: string): DifferenceRowView {
  const made = madeOfWords(base, ours, change.path);
  const old = change.old === undefined ? undefined : shownAny(base, change.old);
  const now = change.now === undefined ? undefined : shownAny(ours, change.now);
  const unit = now?.unit ?? old?.unit;
  const sameUnit = old?.unit === undefined || now?.unit === undefined || old.unit === now.unit;
  const inline = (shown: typeof old) =>
    shown && !sameUnit && shown.unit !== undefined ? `${shown.text} ${shown.unit}` : shown?.text;
  const [oldApart, nowApart] = apart(change, old, now);
  const oldText = made === undefined ? (oldApart ?? inline(old)) : 'the inputs of then';
  const nowText = made ?? nowApart ?? inline(now);
  return {
    path: change.path,
    section: SECTION_WORDS[change.path.split('/')[0] ?? ''] ?? 'System',
    where: capital(change.label).replaceAll('_', ' '),
    href,
    kind: KINDS[change.kind],
    ...(oldText === undefined ? {} : { old: oldText }),
    ...(nowText === undefined ? {} : { now: nowText }),
    ...(unit !== undefined && sameUnit ? { unit } : {}),
    ...((now?.origin ?? old?.origin) ? { origin: now?.origin ?? old?.origin ?? '' } : {}),
    ...(change.path.endsWith('/set') ? { set: true } : {}),
    ...(change.words ? { words: wordsOf(change.words) } : {}),
    ...(!change.words && textChange(change) ? { words: oneSided(change, base, ours) } : {}),
  };
}

function oneSided(change: Change, base: Basis, ours: Basis): RowWords {
  return change.now === undefined
    ? [{ text: shownAny(base, change.old).text, kind: 'removed' }]
    : [{ text: shownAny(ours, change.now).text, kind: 'added' }];
}

/**
 * Every difference between two documents as rows; `hrefOf` names the place that edits it. Hidden: what was touched, not
 * from what to what.
 */
export function differenceRows(
  base: Basis,
  ours: Basis,
  hrefOf: (change: Change) => string,
  hidden: boolean,
): DifferenceRowView[] {
  return difference(base, ours).map((change) => {
    const href = hrefOf(change);
    if (!hidden) return rowOf(change, base, ours, href);
    const masked = maskChange(change);
    return {
      path: change.path,
      section: SECTION_WORDS[change.path.split('/')[0] ?? ''] ?? 'System',
      where: capital(masked.label).replaceAll('_', ' '),
      href,
      kind: KINDS[change.kind],
      old: HIDDEN_WORD,
      now: HIDDEN_WORD,
      hidden: true,
    };
  });
}
