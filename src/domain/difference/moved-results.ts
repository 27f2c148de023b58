/* Results that moved between two evaluations: figures beyond a share, and verdicts. */
import { convert, dimensionOf, type Q } from '@engine/quantity';
import type { Path } from '@domain/basis/figures';
import type { Evaluation } from '@domain/evaluate/types';

/** `shift` is the change as a share of the old value (absent when one side has none, or a word). */
export type MovedResult = {
  path: Path;
  old?: Q | string;
  now?: Q | string;
  shift?: number;
  verdict: boolean;
};

/** The site's default share beyond which a result has moved (parameter engineShift). */
const SHIFT = 0.005;

function shiftOf(old: Q, now: Q): number | undefined {
  if (dimensionOf(old.unit) !== dimensionOf(now.unit)) return undefined;
  const value = old.unit === now.unit ? now.value : convert(now, old.unit);
  if (old.value === value) return 0;
  return old.value === 0 ? undefined : (value - old.value) / Math.abs(old.value);
}

function compare(
  path: Path,
  old: Q | string | undefined,
  now: Q | string | undefined,
  least: number,
): MovedResult[] {
  if (old === undefined || now === undefined || typeof old === 'string' || typeof now === 'string') {
    return old === now
      ? []
      : [
          {
            path,
            ...(old === undefined ? {} : { old }),
            ...(now === undefined ? {} : { now }),
            verdict: false,
          },
        ];
  }
  const shift = shiftOf(old, now);
  if (shift === undefined) return [{ path, old, now, verdict: false }];
  return Math.abs(shift) > least ? [{ path, old, now, shift, verdict: false }] : [];
}

type Verdicts = Record<string, { verdict: string }>;

function verdicts(list: string, before: Verdicts, after: Verdicts): MovedResult[] {
  return [...new Set([...Object.keys(before), ...Object.keys(after)])].flatMap((id) => {
    const old = before[id]?.verdict;
    const now = after[id]?.verdict;
    if (old === now) return [];
    return [{ path: `${list}/${id}`, ...(old ? { old } : {}), ...(now ? { now } : {}), verdict: true }];
  });
}

/** What moved from one evaluation to another: figures by more than `least` (a share), words, and verdicts of groups and relief points. */
export function movedResults(before: Evaluation, after: Evaluation, least = SHIFT): MovedResult[] {
  const paths = new Set([...Object.keys(before.figures), ...Object.keys(after.figures)]);
  const figures = [...paths].flatMap((path) =>
    compare(path, before.figures[path], after.figures[path], least),
  );
  return [
    ...verdicts('groups', before.groups, after.groups),
    ...verdicts('points', before.points, after.points),
    ...figures,
  ];
}
