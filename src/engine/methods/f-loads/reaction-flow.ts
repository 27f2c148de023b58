/* Bare arithmetic of reaction venting by the published simplified equations: tempered (Leung) and gassy systems. */
import { GAS_CONSTANT } from '../a-gas/flow';

/** A tempered system at the set pressure: kg, m³, W/kg, J/kg, m³/kg, J/(kg·K), K of overshoot. */
export type TemperedSystem = {
  mass: number;
  volume: number;
  q: number;
  latent: number;
  vfg: number;
  cp: number;
  dT: number;
};

/** Mean heat release per mass from the rates of temperature rise at set and at greatest pressure: ½ c (a + b), W/kg. */
export function meanHeatRelease(cp: number, atSet: number, atMost: number): number {
  return (cp * (atSet + atMost)) / 2;
}

/**
 * Mass flow in kg/s that holds a homogeneous, tempered system at its greatest pressure:
 * W = m₀ q / (√(V h_fg/(m₀ v_fg)) + √(c ΔT))². Leung, AIChE Journal 32 (1986) 1622. dT ≥ 0.
 */
export function temperedFlow(s: TemperedSystem): number {
  const swell = Math.sqrt((s.volume * s.latent) / (s.mass * s.vfg));
  return (s.mass * s.q) / (swell + Math.sqrt(s.cp * s.dT)) ** 2;
}

/**
 * Mass flux of a flashing liquid through a vent by the equilibrium rate model, kg/(m²·s): F (h_fg/v_fg)/√(c T).
 * Latent heat J/kg, v_fg m³/kg, c J/(kg·K), T K. Source: Fauske; quoted by Leung 1986 and by Crowl & Louvar.
 */
export function equilibriumRate(latent: number, vfg: number, cp: number, T: number, factor: number): number {
  return (factor * latent) / (vfg * Math.sqrt(cp * T));
}

/** Gas made per mass of reactant, kmol/(s·kg): free volume of the test m³, pressure rate Pa/s, gas temperature K, sample kg. */
export function gasRate(freeVolume: number, pressureRate: number, T: number, sample: number): number {
  return (freeVolume * pressureRate) / (GAS_CONSTANT * T * sample);
}

/** Its volume flow in the vessel, m³/s: kmol/(s·kg), mass kg, K, Pa absolute. */
export function gasFlow(rate: number, mass: number, T: number, P: number): number {
  return (rate * mass * GAS_CONSTANT * T) / P;
}
