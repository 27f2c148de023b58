/* Bare arithmetic of the pool-fire heat input and of the credit for insulation. */
import { type System } from '../common/system';

/** Printed constants of API 521 (from memory): heat input q = C·F·A^0.82, and the insulation factor. */
export const FIRE_FORMS: Record<
  System,
  { drained: number; undrained: number; flame: number; insulation: number }
> = {
  SI: { drained: 43200, undrained: 70900, flame: 904, insulation: 66570 },
  US: { drained: 21000, undrained: 34500, flame: 1660, insulation: 21000 },
};

/** The exponent of the wetted area in the pool-fire equation. */
export const FIRE_EXPONENT = 0.82;

/** Heat absorbed from a pool fire, W (area in m²) or Btu/h (area in ft²). `drained`: adequate drainage and fire fighting. */
export function fireHeat(area: number, F: number, drained: boolean, system: System): number {
  const { drained: good, undrained } = FIRE_FORMS[system];
  return (drained ? good : undrained) * F * area ** FIRE_EXPONENT;
}

/**
 * Environment factor F of insulation that stays in place, not above 1. SI: k in W/(m·K), T in °C, thickness in m;
 * US: k in Btu·in/(h·ft²·°F), T in °F, thickness in inches.
 */
export function insulationFactor(k: number, T: number, thickness: number, system: System = 'SI'): number {
  const { flame, insulation } = FIRE_FORMS[system];
  return Math.min(1, (k * (flame - T)) / (insulation * thickness));
}
