/* Straight-line interpolation in a curve and in a two-way table; outside of them there is no value. */

/** A curve by points, x rising. */
export type Curve = { x: readonly number[]; y: readonly number[] };

/** A two-way table: `values[i][j]` belongs to `rows[i]` and `columns[j]`, both rising. */
export type Table = {
  rows: readonly number[];
  columns: readonly number[];
  values: readonly (readonly number[])[];
};

/** Where a value lies in a rising list: the index below it and the share of the step; undefined outside. */
function place(list: readonly number[], value: number): { index: number; share: number } | undefined {
  const last = list.length - 1;
  for (let index = 0; index < last; index += 1) {
    const below = list[index];
    const above = list[index + 1];
    if (below === undefined || above === undefined) return undefined;
    if (value >= below && value <= above) return { index, share: (value - below) / (above - below) };
  }
  return undefined;
}

const between = (a: number, b: number, share: number): number => (share === 0 ? a : a + (b - a) * share);

/** The curve's value at `x`, by straight lines between its points; undefined outside of its points. */
export function interpolate(curve: Curve, x: number): number | undefined {
  const at = place(curve.x, x);
  const a = at && curve.y[at.index];
  const b = at && curve.y[at.index + 1];
  return at === undefined || a === undefined || b === undefined ? undefined : between(a, b, at.share);
}

/** The table's value at (row, column), bilinear between its nodes; undefined outside of the table. */
export function interpolateTable(table: Table, row: number, column: number): number | undefined {
  const at = place(table.rows, row);
  if (at === undefined) return undefined;
  const line = (index: number) => interpolate({ x: table.columns, y: table.values[index] ?? [] }, column);
  const a = line(at.index);
  const b = line(at.index + 1);
  return a === undefined || b === undefined ? undefined : between(a, b, at.share);
}
