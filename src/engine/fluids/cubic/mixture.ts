/* The constants of a mixture that do not change with temperature or pressure, laid out for fast loops. */
import { BINARY } from '../substances/binary';
import { type Correlation, type Substance } from '../substances/types';
import { OMEGA_A, OMEGA_B, R } from './constants';

/** Per component: M kg/kmol, Tc K, Pc Pa, a at Tc (J·m³/kmol²), b and c m³/kmol; `share` is 1 − k_ij by rows. */
export type Mixture = {
  n: number;
  substances: readonly Substance[];
  z: Float64Array;
  M: Float64Array;
  Tc: Float64Array;
  Pc: Float64Array;
  omega: Float64Array;
  rootA: Float64Array;
  b: Float64Array;
  c: Float64Array;
  /** Twu: exponents N(M−1) and NM of the reduced temperature, and L. */
  twuLow: Float64Array;
  twuHigh: Float64Array;
  twuL: Float64Array;
  share: Float64Array;
  cp: readonly Correlation[];
};

/** The interaction parameter of two substances, and whether a value is known (else 0). */
export function binaryParameter(one: string, other: string): { k: number; known: boolean } {
  const k = BINARY[one]?.[other] ?? BINARY[other]?.[one];
  return { k: k ?? 0, known: k !== undefined || one === other };
}

/** Constants of a mixture of substances with mole fractions `z` (same length, sum 1). */
export function mixtureOf(substances: readonly Substance[], z: readonly number[]): Mixture {
  const each = (of: (s: Substance) => number) => Float64Array.from(substances, of);
  const share = substances.flatMap((one) =>
    substances.map((two) => 1 - binaryParameter(one.name, two.name).k),
  );
  return {
    n: substances.length,
    substances,
    z: Float64Array.from(z),
    M: each((s) => s.M[0]),
    Tc: each((s) => s.Tc[0]),
    Pc: each((s) => s.Pc[0]),
    omega: each((s) => s.omega[0]),
    rootA: each((s) => Math.sqrt((OMEGA_A * (R * s.Tc[0]) ** 2) / s.Pc[0])),
    b: each((s) => (OMEGA_B * R * s.Tc[0]) / s.Pc[0]),
    c: each((s) => s.c[0]),
    twuL: each((s) => s.twu[0][0]),
    twuLow: each((s) => s.twu[0][2] * (s.twu[0][1] - 1)),
    twuHigh: each((s) => s.twu[0][2] * s.twu[0][1]),
    share: Float64Array.from(share),
    cp: substances.map((s) => s.cp),
  };
}
