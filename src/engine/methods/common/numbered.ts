/* Numbered inputs: the first bare, further ones with _2, _3 … (points of a curve, parts of a loop, loads of a pool). */
import { type Bounds, type SheetBuilder } from '../../sheet';

/** The most members that one series of numbered inputs takes. */
export const MAX_NUMBERED = 30;

/** The name of the n-th member (n from 1): bare for the first. */
export function numbered(name: string, n: number): string {
  return n === 1 ? name : `${name}_${n}`;
}

/** How many members of a series were given: the first gap ends it. */
export function countNumbered(sheet: SheetBuilder, name: string): number {
  let count = 0;
  while (count < MAX_NUMBERED && sheet.has(numbered(name, count + 1))) count += 1;
  return count;
}

/** Reads the n-th member of a series in a unit; its symbol gets the index n. */
export function readNumbered(
  sheet: SheetBuilder,
  name: string,
  n: number,
  unit: string,
  bounds: Bounds,
  tex: string,
): number {
  return sheet.number(numbered(name, n), unit, bounds, `${tex}_{${n}}`);
}

/** One column of a table by points. */
export type Column = { name: string; unit: string; tex: string; bounds?: Bounds };

/**
 * A table by numbered points, one list a column, as many rows as the first column has. Refuses fewer rows than `least`
 * and a missing cell.
 */
export function readColumns(sheet: SheetBuilder, columns: readonly Column[], least: number): number[][] {
  const first = columns[0];
  if (!first) return [];
  const count = countNumbered(sheet, first.name);
  if (count < least)
    sheet.refuse(
      'INPUT_MISSING',
      numbered(first.name, count + 1),
      `At least ${least} points are needed; give ${columns.map((c) => numbered(c.name, count + 1)).join(', ')}.`,
    );
  return columns.map((column) =>
    Array.from({ length: count }, (_, i) =>
      readNumbered(sheet, column.name, i + 1, column.unit, column.bounds ?? {}, column.tex),
    ),
  );
}

/** Refuses a column that does not rise (or fall) from each point to the next. */
export function mustRun(
  sheet: SheetBuilder,
  name: string,
  values: readonly number[],
  way: 'rise' | 'fall',
): void {
  values.forEach((value, i) => {
    const before = values[i - 1];
    if (before === undefined) return;
    if (way === 'rise' ? value > before : value < before) return;
    sheet.refuse(
      'ORDER',
      numbered(name, i + 1),
      `${numbered(name, i + 1)} must be ${way === 'rise' ? 'above' : 'below'} the point before it: enter the points in order.`,
    );
  });
}
