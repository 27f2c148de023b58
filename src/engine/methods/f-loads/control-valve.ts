/* Bare arithmetic of control valves by IEC 60534-2-1: turbulent flow, choking, fittings. */

/** The kind of flow coefficient, with the printed constants of IEC 60534-2-1 for m³/h, kg/h, kPa and mm. */
export const COEFFICIENTS = {
  Kv: { N1: 0.1, N2: 0.0016, N5: 0.0018, N8: 1.1 },
  Cv: { N1: 0.0865, N2: 0.00214, N5: 0.00241, N8: 0.948 },
} as const;

/** Kv or Cv. */
export type CoefficientType = keyof typeof COEFFICIENTS;

/** Water to which the relative density refers in IEC 60534, kg/m³. */
export const REFERENCE_WATER = 999;

/** A valve of size d between pipes D1 and D2 (mm); without them it stands in a line of its own size. */
export type Fittings = { d: number; D1: number; D2: number };

/** Sums of loss and Bernoulli coefficients of the fittings: over both ends, and of the inlet alone. */
export function fittingSums({ d, D1, D2 }: Fittings): { all: number; inlet: number } {
  const loss = (D: number) => (1 - (d / D) ** 2) ** 2;
  const bernoulli = (D: number) => 1 - (d / D) ** 4;
  const inlet = 0.5 * loss(D1) + bernoulli(D1);
  return { all: inlet + loss(D2) - bernoulli(D2), inlet };
}

/** The piping geometry factor FP; 1 without fittings. */
export function pipingFactor(C: number, type: CoefficientType, fittings?: Fittings): number {
  if (!fittings) return 1;
  return 1 / Math.sqrt(1 + (fittingSums(fittings).all / COEFFICIENTS[type].N2) * (C / fittings.d ** 2) ** 2);
}

/** FLP, the recovery factor combined with fittings; equals FL without them. */
export function recoveryWithFittings(
  FL: number,
  C: number,
  type: CoefficientType,
  fittings?: Fittings,
): number {
  if (!fittings) return FL;
  const term = (FL ** 2 / COEFFICIENTS[type].N2) * fittingSums(fittings).inlet * (C / fittings.d ** 2) ** 2;
  return FL / Math.sqrt(1 + term);
}

/** xTP, the pressure ratio factor combined with fittings; equals xT without them. */
export function ratioWithFittings(xT: number, C: number, type: CoefficientType, fittings?: Fittings): number {
  if (!fittings) return xT;
  const term = (xT * fittingSums(fittings).inlet * (C / fittings.d ** 2) ** 2) / COEFFICIENTS[type].N5;
  return xT / pipingFactor(C, type, fittings) ** 2 / (1 + term);
}

/** FF, the critical pressure ratio factor of a liquid; pressures in one unit. */
export function liquidFF(Pv: number, Pc: number): number {
  return 0.96 - 0.28 * Math.sqrt(Pv / Pc);
}

/** A liquid at a control valve: kPa absolute, kg/m³. */
export type ValveLiquid = { P1: number; P2: number; rho: number; Pv: number; Pc: number; FL: number };

/** What a control valve passes of a liquid, m³/h, with its choking. */
export function liquidThrough(s: ValveLiquid, C: number, type: CoefficientType, fittings?: Fittings) {
  const FF = liquidFF(s.Pv, s.Pc);
  const FP = pipingFactor(C, type, fittings);
  const FLP = recoveryWithFittings(s.FL, C, type, fittings);
  const chokedDrop = (FLP / FP) ** 2 * (s.P1 - FF * s.Pv);
  const choked = s.P1 - s.P2 >= chokedDrop;
  const drop = Math.min(s.P1 - s.P2, chokedDrop);
  const Q = C * COEFFICIENTS[type].N1 * FP * Math.sqrt(drop / (s.rho / REFERENCE_WATER));
  return { FF, FP, FLP, chokedDrop, choked, drop, Q };
}

/** A gas at a control valve: kPa absolute, K, kg/kmol. */
export type ValveGas = { P1: number; P2: number; T: number; Z: number; M: number; k: number; xT: number };

/** What a control valve passes of a gas, kg/h, with its choking. Y uses xTP where fittings are given (2011 edition). */
export function gasThrough(s: ValveGas, C: number, type: CoefficientType, fittings?: Fittings) {
  const x = (s.P1 - s.P2) / s.P1;
  const FP = pipingFactor(C, type, fittings);
  const xTP = ratioWithFittings(s.xT, C, type, fittings);
  const xChoked = (s.k / 1.4) * xTP;
  const choked = x >= xChoked;
  const used = Math.min(x, xChoked);
  const Y = 1 - used / (3 * xChoked);
  const W = C * COEFFICIENTS[type].N8 * FP * s.P1 * Y * Math.sqrt((used * s.M) / (s.T * s.Z));
  return { x, xTP, xChoked, choked, used, Y, FP, W };
}
