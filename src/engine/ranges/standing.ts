/* Where a figure stands in the range of its key, in the few comparisons that every sheet can afford for every input. */
import { convert, dimensionOf, type Q } from '../quantity';
import { RANGES } from './check';
import { type Range } from './row';

/** Bounds in the unit of the figure, with the slack that keeps a converted bound inside; `open` excludes the least. */
type Bounds = { least: number; low: number; high: number; most: number; open: number };

/** 0.1 % of slack, as in the full check. */
const SLACK = 1e-3;

/** Bounds by key and unit; null where the figure's kind of unit is not that of the range. */
const known = new Map<string, Map<string, Bounds | null>>();

function boundsOf(range: Range, from: string, to: string, open: boolean): Bounds {
  const at = (bound: number, side: number) =>
    convert({ value: bound + side * Math.abs(bound) * SLACK, unit: from }, to);
  const [least, low, high, most] = range;
  const exact = convert({ value: least, unit: from }, to);
  return {
    ...{ least: at(least, -1), low: at(low, -1), high: at(high, 1), most: at(most, 1) },
    open: open ? exact : Number.NEGATIVE_INFINITY,
  };
}

function find(key: string, unit: string): Bounds | null {
  const row = Object.hasOwn(RANGES, key) ? RANGES[key] : undefined;
  const dimension = dimensionOf(unit);
  if (row === undefined || dimension === undefined) return null;
  const fence = [{ unit: row.unit, range: row.range }, ...(row.also ?? [])].find(
    (one) => dimensionOf(one.unit) === dimension,
  );
  return fence ? boundsOf(fence.range, fence.unit, unit, row.open ?? false) : null;
}

function remembered(key: string, unit: string): Bounds | null {
  let units = known.get(key);
  if (units === undefined) known.set(key, (units = new Map<string, Bounds | null>()));
  let bounds = units.get(unit);
  // Units are those of the table of units, so what is remembered stays small.
  if (bounds === undefined) units.set(unit, (bounds = find(key, unit)));
  return bounds;
}

/**
 * Where a figure stands in the range of its key, as `checkRange` judges it, without the sentence. `unknown`: the unit is
 * of another kind than the range, or a gauge reading meets an absolute range, which takes a barometer.
 */
export function standing(key: string, q: Q): 'possible' | 'implausible' | 'impossible' | 'unknown' {
  const bounds = remembered(key, q.unit);
  if (bounds === null) return 'unknown';
  const { value } = q;
  if (value < bounds.least || value > bounds.most || value <= bounds.open) return 'impossible';
  return value < bounds.low || value > bounds.high ? 'implausible' : 'possible';
}
