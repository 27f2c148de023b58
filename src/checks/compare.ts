/* How a result is held against a check value: in the unit of the check value, within its stated tolerance. */
import { type CalcValue, inUnit } from '@engine/calc';
import { type Expected } from './case';

/** For gauge against absolute, which no check value asks for without its own barometer. */
const STANDARD = { value: 101.325, unit: 'kPa_abs' };
/** What the rounding of the comparison itself may take, beyond the tolerance. */
const ROUNDING = 1e-12;

/** One element held against its check value. `off` is |ours/expected − 1|, 0 or infinite for words. */
export type Compared = { expected: unknown; ours: unknown; off: number; within: boolean };

function one(actual: unknown, expected: unknown, from: string, wanted: Expected): Compared {
  if (typeof expected !== 'number') {
    const same = actual === expected;
    return { expected, ours: actual, off: same ? 0 : Number.POSITIVE_INFINITY, within: same };
  }
  const ours = typeof actual === 'number' ? inUnit(actual, from, wanted.unit, STANDARD) : undefined;
  if (ours === undefined) return { expected, ours: actual, off: Number.POSITIVE_INFINITY, within: false };
  const off = expected === 0 ? Math.abs(ours) : Math.abs(ours / expected - 1);
  return { expected, ours, off, within: off <= wanted.rel_tol * (1 + 1e-9) + ROUNDING };
}

/** Holds a result against a check value, element by element; a missing element is not within. */
export function compared(actual: CalcValue | undefined, wanted: Expected): Compared[] {
  const expected: readonly unknown[] = Array.isArray(wanted.value) ? wanted.value : [wanted.value];
  const value = actual?.value;
  const got: readonly unknown[] = Array.isArray(value) ? value : [value];
  const length = Math.max(expected.length, got.length);
  return Array.from({ length }, (_, i) => one(got[i], expected[i], actual?.unit ?? '-', wanted));
}
