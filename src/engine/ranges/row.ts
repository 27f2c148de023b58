/* One row of the ranges of inputs. */

/** Impossible below, implausible below, implausible above, impossible above; in the unit of the row. */
export type Range = readonly [number, number, number, number];

/**
 * A range key: what it measures, the unit its range is stated in, and the same in other kinds of unit in which the
 * trade enters it. `open`: the lowest possible value itself is impossible too (">0").
 */
export type RangeRow = {
  key: string;
  meaning: string;
  unit: string;
  range: Range;
  open?: boolean;
  also?: readonly { unit: string; range: Range }[];
};

/** Writes a row down. */
export function row(
  key: string,
  meaning: string,
  unit: string,
  range: Range,
  more: Pick<RangeRow, 'open' | 'also'> = {},
): RangeRow {
  return { key, meaning, unit, range, ...more };
}
