/* Bare arithmetic of a gas-filled vessel in a fire, in both printed forms. */
import { gasC } from '../a-gas/flow';
import { type System } from '../common/system';

/**
 * Printed constants of API 521 for unwetted vessels (from memory): the factor of load and F′ (the SI one from the US one
 * by conversion) and the least F′ where nothing better is known.
 */
export const UNWETTED_FORMS: Record<System, { factor: number; least: number }> = {
  SI: { factor: 0.2772, least: 182 },
  US: { factor: 0.1406, least: 0.01 },
};

/** A gas in a fire: P1 absolute and temperatures absolute in the system's units, area in m² or ft². */
export type GasInFire = { M: number; P1: number; area: number; T1: number; Twall: number };

/** Relief load in kg/h or lb/h: c √(M P1) A′ (Tw − T1)^1.25 / T1^1.1506. Ideal gas; 0 when the gas is as hot as the wall. */
export function unwettedLoad(s: GasInFire, system: System): number {
  const { M, P1, area, T1, Twall } = s;
  const rise = Math.max(0, Twall - T1);
  return (UNWETTED_FORMS[system].factor * Math.sqrt(M * P1) * area * rise ** 1.25) / T1 ** 1.1506;
}

/** The operating environment factor F′ before its lower limit: c/(C Kd) · (Tw − T1)^1.25 / T1^0.6506. */
export function fPrime(s: { k: number; Kd: number; T1: number; Twall: number }, system: System): number {
  const { factor } = UNWETTED_FORMS[system];
  const rise = Math.max(0, s.Twall - s.T1);
  return (factor / (gasC(s.k, system) * s.Kd)) * (rise ** 1.25 / s.T1 ** 0.6506);
}

/** Required effective area in mm² or in²: F′ A′/√P1. */
export function unwettedArea(F: number, area: number, P1: number): number {
  return (F * area) / Math.sqrt(P1);
}

/** Temperature of a closed gas when its pressure reaches P1, from its normal state; all absolute. */
export function heatedTo(T: number, P: number, P1: number): number {
  return (T * P1) / P;
}
