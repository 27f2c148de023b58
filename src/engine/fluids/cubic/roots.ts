/* The compressibility factors that satisfy the cubic equation. */
import { DELTA1, DELTA2 } from './constants';

/** Smallest and greatest root above B; equal where only one exists. */
export type Roots = { low: number; high: number };

/** One Newton correction of a root (two are enough after the closed form). */
function polish(Z: number, c2: number, c1: number, c0: number): number {
  let z = Z;
  for (let i = 0; i < 3; i += 1) {
    const slope = (3 * z + 2 * c2) * z + c1;
    if (slope === 0) return z;
    const next = z - (((z + c2) * z + c1) * z + c0) / slope;
    if (!Number.isFinite(next)) return z;
    z = next;
  }
  return z;
}

/**
 * Fills `out` with the roots of Peng–Robinson at A = aP/(RT)² and B = bP/(RT), both above nought; false when none lies
 * above B (never for real inputs).
 */
export function compressibility(A: number, B: number, out: Roots): boolean {
  const c2 = B - 1;
  const c1 = A - 3 * B * B - 2 * B;
  const c0 = -B * (A - B - B * B);
  const p = c1 - (c2 * c2) / 3;
  const q = (2 * c2 * c2 * c2) / 27 - (c2 * c1) / 3 + c0;
  const discriminant = (q * q) / 4 + (p * p * p) / 27;
  const shift = -c2 / 3;
  if (discriminant >= 0) {
    const root = Math.sqrt(discriminant);
    const u = Math.cbrt(q > 0 ? -q / 2 - root : -q / 2 + root);
    const Z = polish(u === 0 ? shift : shift + u - p / (3 * u), c2, c1, c0);
    out.low = Z;
    out.high = Z;
    return Z > B;
  }
  const radius = 2 * Math.sqrt(-p / 3);
  const angle = Math.acos(Math.max(-1, Math.min(1, (3 * q) / (p * radius)))) / 3;
  const high = polish(shift + radius * Math.cos(angle), c2, c1, c0);
  const low = polish(shift + radius * Math.cos(angle + (2 * Math.PI) / 3), c2, c1, c0);
  out.high = high;
  out.low = low > B ? low : high;
  return high > B;
}

/** ln[(Z + δ1 B)/(Z + δ2 B)], the integral of the attraction. */
export function attraction(Z: number, B: number): number {
  return Math.log((Z + DELTA1 * B) / (Z + DELTA2 * B));
}
