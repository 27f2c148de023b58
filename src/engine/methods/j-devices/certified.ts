/* Bare arithmetic of certified capacity: what a unit of coefficient times area passes of the fluid of a nameplate. */
import { nozzleFlux } from '../a-gas/flow';
import { steamKN } from '../b-steam/factors';

/** The share of the measured coefficient that may be certified: ASME XIII (formerly VIII-1 UG-131) and EN ISO 4126-1, from memory. */
export const DERATING = 0.9;

/** How far a single test may lie from the mean: ASME XIII and EN ISO 4126-1 allow 5 % (from memory). */
export const TEST_BAND = 0.05;

/** Standard atmosphere of nameplates, Pa. */
export const STANDARD_ATMOSPHERE = 101325;

/** Air of nameplates: 60 °F, dry (ASME: 520 °R, 28.97, C = 356). */
const PLATE_AIR = { T: 519.67 / 1.8, Z: 1, M: 28.97, k: 1.4 };

/** Water of nameplates, 70 °F, kg/m³. */
export const PLATE_WATER = 998;

/** The Napier constant of ASME, 51.5 lb/(h·in²·psi), in kg/(s·m²·Pa). */
export const NAPIER = (51.5 * 0.45359237) / 3600 / (0.0254 ** 2 * 6894.757293168);

/** Pressure at which a nameplate is rated, Pa absolute: set (Pa gauge) and overpressure, or set and its floor where that is more. */
export function platePressure(set: number, overpressure: number, floor: number): number {
  return set + Math.max(overpressure * set, floor) + STANDARD_ATMOSPHERE;
}

/** Flux of air of the nameplate, kg/(m²·s) for K = 1, at P1 Pa absolute against the atmosphere, and whether it is choked. */
export function airFlux(P1: number): { flux: number; choked: boolean } {
  return nozzleFlux({ P1, P2: STANDARD_ATMOSPHERE, ...PLATE_AIR });
}

/** Flux of saturated steam by Napier's equation, kg/(m²·s) for K = 1, with its KN; undefined above 22 057 kPa. */
export function steamFlux(P1: number): { flux: number; KN: number } | undefined {
  const KN = steamKN(P1 / 1000, 'SI');
  return KN === undefined ? undefined : { flux: NAPIER * P1 * KN, KN };
}

/** Flux of a liquid that does not flash, kg/(m²·s) for K = 1; pressures in Pa, density in kg/m³; 0 when nothing drives it. */
export function liquidFlux(P1: number, P2: number, rho: number): number {
  return Math.sqrt(2 * rho * Math.max(0, P1 - P2));
}

/** Mass flow of dry air at 0 °C, 101.325 kPa by its normal volume, in kg/s, with the molar mass of nameplates. */
export function plateAirMass(volume: number): number {
  return (volume * PLATE_AIR.M) / 22.413969545;
}

/** Mean of tests, the largest relative distance of one from it, and the certified coefficient 0.9 × mean. */
export function certifiedFrom(tests: readonly number[]): { mean: number; spread: number; certified: number } {
  const mean = tests.reduce((sum, one) => sum + one, 0) / tests.length;
  const spread = Math.max(...tests.map((one) => Math.abs(one / mean - 1)));
  return { mean, spread, certified: DERATING * mean };
}
