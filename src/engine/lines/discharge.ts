/* What a discharge does to its surroundings: thrust, noise, vibration of the pipe. */

/** Clauses of the printed forms; every constant here is from memory of the standard. */
export const DISCHARGE_CONSTANTS = {
  /** API 520-2, SI: F = 129 W √(kT/((k+1)M)) + 0.1 A P; N, kg/s, K, mm², barg. */
  momentumSI: 129,
  /** API 520-2, US: F = W/366 √(kT/((k+1)M)) + A P; lbf, lb/h, °R, in², psig. */
  momentumUS: 366,
  /** Carucci and Mueller 1982: PWL = 10 lg((Δp/p1)^3.6 W² (T/M)^1.2) + 126.1; kg/s, K, kg/kmol. */
  soundPower: 126.1,
} as const;

/** Momentum term of API 520-2 for sonic flow at the exit, N (SI: kg/s, K) or lbf (US: lb/h, °R). */
export function sonicMomentum(W: number, k: number, T: number, M: number, system: 'SI' | 'US'): number {
  const root = Math.sqrt((k * T) / ((k + 1) * M));
  return system === 'SI'
    ? DISCHARGE_CONSTANTS.momentumSI * W * root
    : (W / DISCHARGE_CONSTANTS.momentumUS) * root;
}

/** Thrust of an open discharge, N: W v + A (p − p_ambient); kg/s, m/s, m², Pa. */
export function thrust(W: number, velocity: number, A: number, exit: number, ambient: number): number {
  return W * velocity + A * (exit - ambient);
}

/** Homogeneous specific volume of vapour and liquid, m³/kg; x vapour mass fraction. */
export function homogeneousVolume(x: number, rhoG: number, rhoL: number): number {
  return x / rhoG + (1 - x) / rhoL;
}

/**
 * Sound pressure level of API 521's figure 30 m from the tip for W c²/2 = 1 W, dB, by a two-line fit of the figure as printed in a
 * public fluid-mechanics library; `ratio` = p1/p2 > 1. The lines meet at 2.92.
 */
export function noiseChart(ratio: number): number {
  const lg = Math.log10(ratio);
  return ratio < 2.92 ? 87.9084 * lg + 12.7647 : 4.8239 * lg + 51.6217;
}

/** Sound pressure level 30 m from the tip, dB: L + 10 lg(W c²/2); kg/s, m/s. Source: API 521 (from memory). */
export function noiseAt30(ratio: number, W: number, c: number): number {
  return noiseChart(ratio) + 10 * Math.log10((W * c * c) / 2);
}

/** Level at distance r (m) from that at `from`: −20 lg(r/from), spherical spreading without absorption. */
export function noiseAt(level: number, r: number, from = 30): number {
  return level - 20 * Math.log10(r / from);
}

/** Several levels together, dB, by energy. */
export function soundSum(levels: readonly number[]): number {
  return 10 * Math.log10(levels.reduce((sum, one) => sum + 10 ** (one / 10), 0));
}

/**
 * Sound power level that a pressure let-down makes inside the pipe, dB re 1e-12 W (Carucci and Mueller 1982, from memory).
 * W kg/s, pressures in one absolute unit with p1 > p2, T K upstream, M kg/kmol.
 */
export function soundPower(W: number, p1: number, p2: number, T: number, M: number): number {
  const energy = ((p1 - p2) / p1) ** 3.6 * W * W * (T / M) ** 1.2;
  return 10 * Math.log10(energy) + DISCHARGE_CONSTANTS.soundPower;
}

/** Sound power left after a length of straight pipe, dB: 0.06 dB a diameter (Energy Institute guideline, from memory). */
export function soundPowerAfter(level: number, L: number, D: number): number {
  return level - (0.06 * L) / D;
}
