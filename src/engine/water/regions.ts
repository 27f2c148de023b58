/* Which region a pressure and a temperature fall in, and the state there. */
import { type PhaseState } from '../properties/types';
import { region1, region2, region5 } from './basic';
import { LIMITS_P, LIMITS_T } from './constants';
import { density3 } from './density3';
import { region3 } from './region3';
import { boundaryPressure, LOWEST_SATURATION, saturationTemperature } from './saturation';

/** The regions of the formulation with one phase. */
export type Region = 1 | 2 | 3 | 5;

/** Temperatures this close to saturation, K, count as saturated: rounding of Eqs. (30) and (31), not a property of water. */
const SATURATED = 1e-9;

/** Whether P and T stand on the vapour's side of saturation, or on it; below the lowest saturation pressure all is vapour. */
function isVapour(P: number, T: number): boolean {
  const boiling = saturationTemperature(P);
  return boiling === undefined ? P < LOWEST_SATURATION : T >= boiling - SATURATED;
}

/**
 * The region at P in Pa and T in K; undefined outside of the formulation. At saturation it is the vapour's; on the boundary
 * of two regions it is the one of lower number.
 */
export function regionAt(P: number, T: number): Region | undefined {
  if (!(P >= LIMITS_P.least && T >= LIMITS_T.lowest && T <= LIMITS_T.five)) return undefined;
  if (T > LIMITS_T.two) return P <= LIMITS_P.five ? 5 : undefined;
  if (P > LIMITS_P.most) return undefined;
  if (T > LIMITS_T.one) return T < LIMITS_T.three && P > boundaryPressure(T) ? 3 : 2;
  return isVapour(P, T) ? 2 : 1;
}

/** The state of region 3 at P and T on one side of saturation; its pressure is the one given. `near` as in `density3`. */
export function region3At(P: number, T: number, vapour: boolean, near?: number): PhaseState {
  const state = region3(density3(P, T, vapour, near), T);
  state.P = P;
  return state;
}

/** The state at P and T without viscosity; undefined outside of the formulation. */
export function stateAt(P: number, T: number): PhaseState | undefined {
  const region = regionAt(P, T);
  if (region === undefined) return undefined;
  if (region === 1) return region1(P, T);
  if (region === 2) return region2(P, T);
  return region === 3 ? region3At(P, T, isVapour(P, T)) : region5(P, T);
}
