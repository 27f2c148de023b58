/* Bare arithmetic of gas and vapour flow through a nozzle: API 520-1 forms in both unit systems, and coherent SI. */
import { type System } from '../common/system';

/** The universal gas constant, J/(kmol·K) (CODATA 2018). */
export const GAS_CONSTANT = 8314.462618;

/** The printed constants of API 520-1: C = c·√(…), and the subcritical constant. Both from memory of the standard. */
export const GAS_FORMS: Record<System, { c: number; subcritical: number }> = {
  SI: { c: 0.03948, subcritical: 17.9 },
  US: { c: 520, subcritical: 1 / 735 },
};

/** A gas at relief, in the units of the chosen form. */
export type GasFlow = {
  W: number;
  T: number;
  Z: number;
  M: number;
  k: number;
  P1: number;
  P2: number;
  Kd: number;
  Kb: number;
  Kc: number;
};

/** base^exponent for base > 0: some times as fast as the operator, and as exact where the exponents are of order ten. */
function power(base: number, exponent: number): number {
  return Math.exp(exponent * Math.log(base));
}

/** √(k (2/(k+1))^((k+1)/(k−1))), with its limit √(1/e) at k = 1. k > 0. */
export function nozzleFunction(k: number): number {
  if (Math.abs(k - 1) < 1e-6) return Math.sqrt(Math.exp(-1));
  return Math.sqrt(k * power(2 / (k + 1), (k + 1) / (k - 1)));
}

/** The coefficient C of API 520-1 for an ideal-gas ratio of specific heats k, in the system's units. */
export function gasC(k: number, system: System): number {
  return GAS_FORMS[system].c * nozzleFunction(k);
}

/** The critical pressure ratio (2/(k+1))^(k/(k−1)), with its limit 1/√e at k = 1. */
export function criticalRatio(k: number): number {
  if (Math.abs(k - 1) < 1e-6) return Math.exp(-0.5);
  return power(2 / (k + 1), k / (k - 1));
}

/** The coefficient of subcritical flow F2 at r = P2/P1, 0 < r < 1. */
export function gasF2(k: number, r: number): number {
  if (Math.abs(k - 1) < 1e-6) return Math.sqrt((r ** 2 * -Math.log(r)) / (1 - r));
  const log = Math.log(r);
  // 1 − r^((k−1)/k) by expm1, which keeps its digits where k is near 1 or r near 1.
  const expansion = -Math.expm1(((k - 1) / k) * log);
  return Math.sqrt(((k / (k - 1)) * Math.exp((2 / k) * log) * expansion) / (1 - r));
}

/** Required effective area for critical flow, or for a balanced valve with its Kb (API 520-1), in mm² or in². */
export function criticalArea(f: GasFlow, system: System): number {
  const { W, T, Z, M, k, P1, Kd, Kb, Kc } = f;
  return (W / (gasC(k, system) * Kd * P1 * Kb * Kc)) * Math.sqrt((T * Z) / M);
}

/** Required effective area for subcritical flow through a conventional or pilot-operated valve, in mm² or in². */
export function subcriticalArea(f: GasFlow, system: System): number {
  const { W, T, Z, M, k, P1, P2, Kd, Kc } = f;
  const constant = GAS_FORMS[system].subcritical;
  return ((constant * W) / (gasF2(k, P2 / P1) * Kd * Kc)) * Math.sqrt((T * Z) / (M * P1 * (P1 - P2)));
}

/** The required effective area by the regime that P2 gives, and which regime it is. P2 < P1. */
export function gasArea(f: GasFlow, system: System): { regime: 'critical' | 'subcritical'; area: number } {
  const critical = f.P2 <= criticalRatio(f.k) * f.P1;
  return critical
    ? { regime: 'critical', area: criticalArea(f, system) }
    : { regime: 'subcritical', area: subcriticalArea(f, system) };
}

/** A gas in coherent SI: Pa absolute, K, kg/kmol. */
export type GasState = { P1: number; P2: number; T: number; Z: number; M: number; k: number };

/**
 * Theoretical mass flux of an ideal gas with constant Z and k through a frictionless nozzle, kg/(m²·s), and whether
 * it is choked. 0 when P2 ≥ P1. Source: isentropic nozzle, any textbook of gas dynamics.
 */
export function nozzleFlux({ P1, P2, T, Z, M, k }: GasState): { flux: number; choked: boolean } {
  if (P2 >= P1) return { flux: 0, choked: false };
  const scale = P1 * Math.sqrt(M / (Z * GAS_CONSTANT * T));
  const r = P2 / P1;
  if (r <= criticalRatio(k)) return { flux: scale * nozzleFunction(k), choked: true };
  return { flux: scale * gasF2(k, r) * Math.sqrt(2 * (1 - r)), choked: false };
}
