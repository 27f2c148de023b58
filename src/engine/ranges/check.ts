/* All ranges of inputs by key, and the check of a figure against them. */
import { convert, dimensionOf, formatNumber, formatQuantity, unitLabel, type Q } from '../quantity';
import { OWN_RANGES } from './own';
import { type Range, type RangeRow } from './row';
import { RULEBOOK_RANGES } from './rulebook';

/** Every range by its key. */
export const RANGES: Readonly<Record<string, RangeRow>> = Object.fromEntries(
  [...RULEBOOK_RANGES, ...OWN_RANGES].map((row) => [row.key, row]),
);

/** What a check needs from the site: its barometer, and the ranges that it has narrowed or widened. */
export type RangeContext = { barometer?: Q; ranges?: Readonly<Record<string, Range>> };
/** `wrongUnit`: the figure is of another kind than the key; there was nothing to compare. */
export type RangeCheck = {
  verdict: 'possible' | 'implausible' | 'impossible';
  sentence?: string;
  wrongUnit?: true;
};

/** For a gauge reading against an absolute range when no site is known: the standard atmosphere, ISO 2533:1975. */
const STANDARD_ATMOSPHERE: Q = { value: 101.325, unit: 'kPa_abs' };
const PRESSURE_READINGS: ReadonlySet<string | undefined> = new Set(['pressure-gauge', 'pressure-absolute']);
/** 0.1 % of slack: a bound converted into another unit does not refuse the bound itself. */
const SLACK = 1e-3;

type Fence = { unit: string; range: Range };

/** The fence that speaks the figure's kind of unit, if one does. */
function fenceFor(row: RangeRow, q: Q, context: RangeContext): Fence | undefined {
  const fences: Fence[] = [
    { unit: row.unit, range: context.ranges?.[row.key] ?? row.range },
    ...(row.also ?? []),
  ];
  const dimension = dimensionOf(q.unit);
  const same = fences.find(
    (fence) => fence.unit === q.unit || (dimension && dimensionOf(fence.unit) === dimension),
  );
  if (same || !PRESSURE_READINGS.has(dimension)) return same;
  return fences.find((fence) => PRESSURE_READINGS.has(dimensionOf(fence.unit)));
}

function inUnit(value: number, fence: Fence, q: Q, barometer: Q): string {
  const there = q.unit === fence.unit ? value : convert({ value, unit: fence.unit }, q.unit, { barometer });
  return formatNumber(Number(there.toPrecision(4)));
}

/** "between 1 and 200 mm", "above 0 and up to 7 000 barg", in the unit in which the figure was entered. */
function between(row: RangeRow, fence: Fence, q: Q, barometer: Q, from: 0 | 1, to: 2 | 3): string {
  const low = inUnit(fence.range[from], fence, q, barometer);
  const high = inUnit(fence.range[to], fence, q, barometer);
  const unit = unitLabel(q.unit);
  const tail = unit === '' ? '' : ` ${unit}`;
  return from === 0 && row.open
    ? `above ${low} and up to ${high}${tail}`
    : `between ${low} and ${high}${tail}`;
}

/** Where a value lies in a range. */
function verdictOf(value: number, range: Range, open: boolean): RangeCheck['verdict'] {
  const slack = (bound: number) => Math.abs(bound) * SLACK;
  const [least, low, high, most] = range;
  if (open && value <= least) return 'impossible';
  if (value < least - slack(least) || value > most + slack(most)) return 'impossible';
  return value < low - slack(low) || value > high + slack(high) ? 'implausible' : 'possible';
}

/**
 * Checks a figure against the range of its key, units converted.
 * `label` names the field in the sentence (default: the meaning of the key). A key without range is always possible.
 */
export function checkRange(key: string, q: Q, context: RangeContext = {}, label?: string): RangeCheck {
  const row = Object.hasOwn(RANGES, key) ? RANGES[key] : undefined;
  if (!row) return { verdict: 'possible' };
  const said = label ?? row.meaning;
  const name = said.charAt(0).toUpperCase() + said.slice(1);
  const fence = fenceFor(row, q, context);
  if (!fence) {
    const units = [row.unit, ...(row.also ?? []).map((other) => other.unit)].map(
      (unit) => unitLabel(unit) || 'a plain number',
    );
    return {
      verdict: 'impossible',
      wrongUnit: true,
      sentence: `${name} can't be in ${unitLabel(q.unit) || 'a plain number'}; it is given in ${units.join(' or ')}.`,
    };
  }
  const barometer = context.barometer ?? STANDARD_ATMOSPHERE;
  const value = q.unit === fence.unit ? q.value : convert(q, fence.unit, { barometer });
  const verdict = verdictOf(value, fence.range, row.open ?? false);
  if (verdict === 'possible') return { verdict };
  const shown = formatQuantity(q);
  return verdict === 'impossible'
    ? {
        verdict,
        sentence: `${name} ${shown} is impossible: it lies ${between(row, fence, q, barometer, 0, 3)}.`,
      }
    : {
        verdict,
        sentence: `${name} ${shown} is unusual: it mostly lies ${between(row, fence, q, barometer, 1, 2)}.`,
      };
}

/** The units in which a figure of this key may be entered: the first is the usual one. */
export function unitsOfKey(key: string): string[] {
  const row = Object.hasOwn(RANGES, key) ? RANGES[key] : undefined;
  return row ? [row.unit, ...(row.also ?? []).map((other) => other.unit)] : [];
}
