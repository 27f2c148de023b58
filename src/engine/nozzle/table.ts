/* Mass flux along an isentrope given as a table of pressure and specific volume: no property source is needed. */
import { firstMaximum } from './maximum';

/** An isentrope from the inlet down: pressures Pa absolute falling, specific volumes m³/kg. */
export type IsentropeTable = { P: readonly number[]; v: readonly number[] };

/** The throat on a table: index of the row, or a pressure between rows; flux in kg/(m²·s). */
export type TableThroat = { flux: number; P: number; v: number; choked: boolean };

const at = (list: readonly number[], i: number): number => list[i] ?? Number.NaN;

/** Twice the integral of −v dP from the first row down to each row, by trapezia, J/kg. */
export function trapezoidWork(table: IsentropeTable): number[] {
  const work = [0];
  for (let i = 1; i < table.P.length; i += 1)
    work.push(
      at(work, i - 1) + (at(table.v, i) + at(table.v, i - 1)) * (at(table.P, i - 1) - at(table.P, i)),
    );
  return work;
}

/** Mass flux at each row, √(2 Σ −v dP)/v: API 520-1 Annex B, numerical integration (from memory). */
export function trapezoidFluxes(table: IsentropeTable): number[] {
  return trapezoidWork(table).map((w, i) => Math.sqrt(w) / at(table.v, i));
}

/**
 * The row of greatest flux among those not below the back pressure; not choked where that is the last of them.
 * The table holds at least two rows, pressures falling; the first row is the inlet at rest.
 */
export function trapezoidThroat(table: IsentropeTable, Pb: number): TableThroat & { row: number } {
  const fluxes = trapezoidFluxes(table);
  let row = 0;
  let last = 0;
  for (let i = 1; i < fluxes.length && at(table.P, i) >= Pb; i += 1) {
    last = i;
    if (at(fluxes, i) > at(fluxes, row)) row = i;
  }
  return { flux: at(fluxes, row), P: at(table.P, row), v: at(table.v, row), choked: row < last, row };
}

/** Slopes dv/dP that keep a monotone curve monotone (Fritsch and Carlson, SIAM J. Numer. Anal. 17 (1980) 238). */
function monotoneSlopes({ P, v }: IsentropeTable): number[] {
  const secant = (i: number) => (at(v, i + 1) - at(v, i)) / (at(P, i + 1) - at(P, i));
  const width = (i: number) => at(P, i + 1) - at(P, i);
  const last = P.length - 1;
  const inner = (i: number): number => {
    const [a, b] = [secant(i - 1), secant(i)];
    if (a * b <= 0) return 0;
    const [wa, wb] = [2 * width(i) + width(i - 1), width(i) + 2 * width(i - 1)];
    return (wa + wb) / (wa / a + wb / b);
  };
  const end = (i: number, j: number): number => {
    const [near, far] = [secant(i), secant(j)];
    const slope = near + ((near - far) * width(i)) / (width(i) + width(j));
    if (slope * near <= 0) return 0;
    return Math.abs(slope) > 3 * Math.abs(near) ? 3 * near : slope;
  };
  if (last < 2) return P.map(() => secant(0));
  return P.map((_, i) => (i === 0 ? end(0, 1) : i === last ? end(last - 1, last - 2) : inner(i)));
}

/** The smooth curve between two rows: volume, and the integral of v from the upper pressure, at share t of the step. */
function within(
  table: IsentropeTable,
  slopes: readonly number[],
  i: number,
  t: number,
): { v: number; w: number } {
  const h = at(table.P, i + 1) - at(table.P, i);
  const [v0, v1, d0, d1] = [at(table.v, i), at(table.v, i + 1), h * at(slopes, i), h * at(slopes, i + 1)];
  const c2 = 3 * (v1 - v0) - 2 * d0 - d1;
  const c3 = d0 + d1 - 2 * (v1 - v0);
  const v = v0 + t * (d0 + t * (c2 + t * c3));
  const w = -h * t * (v0 + t * (d0 / 2 + t * (c2 / 3 + (t * c3) / 4)));
  return { v, w };
}

/**
 * The throat on a smooth monotone curve through the rows, integrated exactly: what finer rows would converge to.
 * Undefined where the table has fewer than two rows above the back pressure.
 */
export function smoothThroat(table: IsentropeTable, Pb: number): TableThroat | undefined {
  const slopes = monotoneSlopes(table);
  const work = [0];
  for (let i = 0; i + 1 < table.P.length; i += 1) work.push(at(work, i) + within(table, slopes, i, 1).w);
  const state = (P: number) => {
    let i = 0;
    while (i + 2 < table.P.length && at(table.P, i + 1) > P) i += 1;
    const t = (P - at(table.P, i)) / (at(table.P, i + 1) - at(table.P, i));
    const { v, w } = within(table, slopes, i, t);
    return { v, flux: Math.sqrt(2 * Math.max(0, at(work, i) + w)) / v };
  };
  const P0 = at(table.P, 0);
  const lowest = Math.max(Pb, at(table.P, table.P.length - 1));
  if (!(lowest < P0)) return undefined;
  const end = P0 - lowest;
  const peak = firstMaximum((y) => state(P0 - y).flux, end, {
    first: 0,
    step: end / 64,
    tolerance: end * 1e-5,
  });
  if (!peak) return undefined;
  return { flux: peak.f, P: P0 - peak.y, v: state(P0 - peak.y).v, choked: peak.inside };
}
