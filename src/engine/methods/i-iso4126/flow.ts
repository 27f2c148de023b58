/* Bare arithmetic of ISO 4126-1: bar absolute, kg/h, mm² of actual flow area, certified derated coefficient. */
import { criticalRatio, nozzleFunction } from '../a-gas/flow';

/** C of ISO 4126-1: 3.948 √(k (2/(k+1))^((k+1)/(k−1))) (constant from memory). */
export function isoC(k: number): number {
  return 3.948 * nozzleFunction(k);
}

/** Theoretical factor for subcritical flow Kb; 1 at or below the critical ratio. `r` = pb/p0, below 1. */
export function isoKb(k: number, r: number): number {
  if (r <= criticalRatio(k) || Math.abs(k - 1) < 1e-6)
    return r <= criticalRatio(k) ? 1 : Math.sqrt(2 * Math.E * r ** 2 * -Math.log(r));
  const through = ((2 * k) / (k - 1)) * (r ** (2 / k) - r ** ((k + 1) / k));
  return Math.sqrt(through) / nozzleFunction(k);
}

/** Required flow area for gas, mm². */
export function isoGasArea(s: {
  Qm: number;
  p0: number;
  T: number;
  Z: number;
  M: number;
  C: number;
  Kdr: number;
  Kb: number;
}): number {
  return s.Qm / (s.p0 * s.C * s.Kdr * s.Kb * Math.sqrt(s.M / (s.Z * s.T)));
}

/** Required flow area for steam by its specific volume v in m³/kg, mm². */
export function isoSteamArea(s: {
  Qm: number;
  p0: number;
  v: number;
  C: number;
  Kdr: number;
  Kb: number;
}): number {
  return s.Qm / (0.2883 * s.C * s.Kdr * s.Kb * Math.sqrt(s.p0 / s.v));
}

/** Required flow area for liquid of density rho in kg/m³, mm². */
export function isoLiquidArea(s: {
  Qm: number;
  p0: number;
  pb: number;
  rho: number;
  Kdr: number;
  Kv: number;
}): number {
  return s.Qm / (1.61 * s.Kdr * s.Kv * Math.sqrt((s.p0 - s.pb) * s.rho));
}
