/* What a stretch of pipe is to the bare arithmetic: one bore, its resistance in velocity heads, the flow it carries. */

/**
 * A stretch of one bore; D m, N = f L/D + ΣK (velocity heads, ≥ 0), W kg/s. Listed from the device to the end. `Z` where the
 * compressibility factor is another one than the gas has at the device.
 */
export type LineSegment = { D: number; N: number; W: number; Z?: number };

/** A gas in a line: T K (stagnation temperature where flow is adiabatic), Z and k constant along the line, M kg/kmol. */
export type LineGas = { T: number; Z: number; M: number; k: number };

/** How the pressure passes an enlargement: unchanged, or by the momentum balance of a sudden enlargement. */
export type Enlargement = 'static' | 'momentum';

/** Cross-section of a bore, m². */
export function boreArea(D: number): number {
  return (Math.PI / 4) * D * D;
}

/** Mass flux of a segment, kg/(m²·s). */
export function fluxOf(segment: LineSegment): number {
  return segment.W / boreArea(segment.D);
}

/** Resistance in velocity heads: f L/D + ΣK. */
export function velocityHeads(f: number, L: number, D: number, sumK: number): number {
  return (f * L) / D + sumK;
}
