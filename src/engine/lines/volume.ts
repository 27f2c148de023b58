/* Specific volume of a flowing mixture against pressure: straight in 1/P between known points, so that all integrals are closed. */

/** Between `low` and `high` (Pa): v = a + b/P, m³/kg; b ≥ 0. */
export type VolumePiece = { low: number; high: number; a: number; b: number };

/** v(P) over all pressures: pieces from low to high pressure, the first from 0, the last to infinity. */
export type VolumeCurve = readonly VolumePiece[];

/** A point of an isentrope or isenthalpe: P Pa absolute, v m³/kg, T K where known. */
export type VolumePoint = { P: number; v: number; T?: number };

function piece(low: VolumePoint, high: VolumePoint): VolumePiece {
  const b = Math.max(0, (low.v - high.v) / (1 / low.P - 1 / high.P));
  return { low: low.P, high: high.P, a: high.v - b / high.P, b };
}

/**
 * The curve through at least two points, each at another pressure; below the first it goes on with the first piece.
 * @returns undefined when the points do not describe a fluid whose volume grows as pressure falls
 */
export function volumeCurve(points: readonly VolumePoint[]): VolumeCurve | undefined {
  const sorted = points.toSorted((p, q) => p.P - q.P);
  const pieces: VolumePiece[] = [];
  for (let i = 1; i < sorted.length; i += 1) {
    const [low, high] = [sorted[i - 1], sorted[i]];
    if (!low || !high || !(low.P > 0) || !(low.v > 0) || !(high.v > 0)) return undefined;
    if (!(high.P > low.P) || high.v > low.v) return undefined;
    pieces.push(piece(low, high));
  }
  const first = pieces[0];
  const last = pieces.at(-1);
  if (!first || !last) return undefined;
  first.low = 0;
  return closed(pieces, last);
}

/** Goes on above the last piece: with it while its volume stays positive, else as a gas, v ∝ 1/P. */
function closed(pieces: VolumePiece[], last: VolumePiece): VolumePiece[] {
  const { high, a, b } = last;
  last.high = a >= 0 ? Number.POSITIVE_INFINITY : high;
  if (a < 0) pieces.push({ low: high, high: Number.POSITIVE_INFINITY, a: 0, b: a * high + b });
  return pieces;
}

/** The curve of the omega form v/v0 = ω (P0/P − 1) + 1; ω ≥ 0. Source: API 520-1 Annex C (two-point form), from memory. */
export function omegaCurve(P0: number, v0: number, omega: number): VolumeCurve {
  const piece: VolumePiece = { low: 0, high: P0, a: v0 * (1 - omega), b: v0 * omega * P0 };
  return closed([piece], piece);
}

/** A liquid that does not change its volume. */
export function liquidCurve(rho: number): VolumeCurve {
  return [{ low: 0, high: Number.POSITIVE_INFINITY, a: 1 / rho, b: 0 }];
}

function pieceAt(curve: VolumeCurve, P: number): VolumePiece | undefined {
  return curve.find((one) => P <= one.high) ?? curve.at(-1);
}

/** Specific volume at P, m³/kg. */
export function volumeAt(curve: VolumeCurve, P: number): number {
  const at = pieceAt(curve, P);
  return at === undefined ? Number.NaN : at.a + at.b / P;
}

/** Mach number of the homogeneous mixture at P: G √|dv/dP| = G √b/P; at a point of the curve, that of the piece above it. */
export function homogeneousMach(curve: VolumeCurve, G: number, P: number): number {
  const at = pieceAt(curve, P * (1 + 1e-12));
  return at === undefined ? Number.NaN : (G * Math.sqrt(at.b)) / P;
}

/** The lowest pressure not below `end` from which a flux G can come without passing its limit anywhere above, Pa. */
export function limitPressure(curve: VolumeCurve, G: number, end: number): number {
  let lowest = end;
  for (const { low, high, b } of curve) {
    const limit = G * Math.sqrt(b);
    if (limit > low && high > lowest) lowest = Math.max(lowest, Math.min(limit, high));
  }
  return lowest;
}

/** ∫ dP/v over one piece of the curve, kg·Pa/m³. v = a + b/P. */
function pieceIntegral({ a, b }: VolumePiece, from: number, to: number): number {
  if (b === 0) return (to - from) / a;
  const small = Math.abs(a) * to < 1e-7 * b;
  if (small) return (to * to - from * from) / (2 * b);
  return (to - from) / a - (b / (a * a)) * Math.log((a * to + b) / (a * from + b));
}

/** ∫ ρ dP from `from` to `to` ≥ from, kg·Pa/m³. */
export function densityIntegral(curve: VolumeCurve, from: number, to: number): number {
  let sum = 0;
  for (const one of curve) {
    const lo = Math.max(from, one.low);
    const hi = Math.min(to, one.high);
    if (hi > lo) sum += pieceIntegral(one, lo, hi);
  }
  return sum;
}
