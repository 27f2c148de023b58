/* Bare arithmetic of a vent: air through an open pallet, and the pressure at which its weight or spring lets go. */
import { nozzleFlux } from '../a-gas/flow';
import { AIR_K, AIR_MOLAR_MASS } from './air';

/** Standard gravity, m/s². */
export const GRAVITY = 9.80665;

/**
 * Theoretical mass flux of air through a vent, kg/(m²·s), from the higher to the lower of two absolute pressures in Pa, at the
 * temperature T in K, and whether it chokes. 0 when both are equal.
 */
export function ventFlux(inside: number, outside: number, T: number): { flux: number; choked: boolean } {
  const P1 = Math.max(inside, outside);
  const P2 = Math.min(inside, outside);
  return nozzleFlux({ P1, P2, T, Z: 1, M: AIR_MOLAR_MASS, k: AIR_K });
}

/** Flow area that a vent needs, m²: mass flow in kg/s, coefficient above 0, flux above 0. */
export function ventArea(mass: number, Kd: number, flux: number): number {
  return mass / (Kd * flux);
}

/** Pressure difference at which a loaded pallet lets go, Pa: weight (kg) and spring force (N) over the seat area (m²). */
export function palletSet(mass: number, spring: number, seatArea: number): number {
  return (mass * GRAVITY + spring) / seatArea;
}

/** How far a vent is open at a pressure difference: shut below its set, claimed only from its certified full flow on. */
export function palletState(pressure: number, set: number, full: number): 'shut' | 'opening' | 'full' {
  if (pressure < set) return 'shut';
  return pressure < full ? 'opening' : 'full';
}
