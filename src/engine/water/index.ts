/* Water and steam by the IAPWS industrial formulation, as a source of properties. */
import { type FluidState, type PhaseState, type PropertySource, type Saturation } from '../properties/types';
import { CRITICAL, LIMITS_P, MOLAR_MASS } from './constants';
import { onIsentrope } from './isentrope';
import { blend, boilingEnds, type Given, onIsobar } from './isobar';
import { regionAt, stateAt } from './regions';
import { viscosity } from './viscosity';

/** A state of which every figure is finite (at the critical point cp is not), with its viscosity where the release covers it; else undefined. */
function complete(state: PhaseState | undefined): PhaseState | undefined {
  if (state === undefined || !isSound(state)) return undefined;
  if (!(state.cp > 0 && state.cp < Infinity && state.cv > 0 && state.w > 0)) return undefined;
  const mu = viscosity(state.rho, state.T);
  return mu === undefined ? state : { ...state, mu };
}

function isSound({ T, rho, h, s }: FluidState): boolean {
  return Number.isFinite(T) && Number.isFinite(rho) && Number.isFinite(h) && Number.isFinite(s);
}

function saturation(P: number): Saturation | undefined {
  const ends = boilingEnds(P);
  const liquid = complete(ends?.liquid);
  const vapour = complete(ends?.vapour);
  if (liquid === undefined || vapour === undefined) return undefined;
  return { liquid: { ...liquid, x: 0 }, vapour: { ...vapour, x: 1 } };
}

function atPx(P: number, x: number): FluidState | undefined {
  const ends = x >= 0 && x <= 1 ? boilingEnds(P) : undefined;
  return ends && { ...blend(ends.liquid, ends.vapour, x), x };
}

function along(P: number, given: Given, value: number): FluidState | undefined {
  if (!(P >= LIMITS_P.least && P <= LIMITS_P.most && Number.isFinite(value))) return undefined;
  const found = onIsobar(P, given, value);
  return typeof found === 'object' && isSound(found) ? found : undefined;
}

/**
 * The state with enthalpy h in J/kg and entropy s in J/(kg·K), in one or two phases; undefined where the formulation has
 * none (and below 1 Pa).
 */
export function atHS(h: number, s: number): FluidState | undefined {
  return onIsentrope(h, s);
}

/** The region of a state, 1 to 5; 4 where liquid and vapour stand together. */
export function regionOf(state: FluidState): 1 | 2 | 3 | 4 | 5 | undefined {
  return state.x === undefined ? regionAt(state.P, state.T) : 4;
}

/**
 * Water and steam: regions 1 to 5 of IAPWS-IF97, 273.15 to 1073.15 K up to 100 MPa and to 2273.15 K up to 50 MPa. States by
 * enthalpy or entropy are found by iterating the basic equations, so they agree with `atPT` to rounding. At saturation cp, cv
 * and w are those of each phase alone.
 */
export const WATER: PropertySource = {
  name: 'Water and steam',
  source:
    'IAPWS-IF97 (IAPWS R7-97(2012)), basic equations of regions 1 to 5; viscosity by IAPWS R12-08 without critical enhancement',
  M: MOLAR_MASS,
  critical: { P: CRITICAL.P, T: CRITICAL.T },
  pure: true,
  atPT: (P, T) => complete(stateAt(P, T)),
  atPx,
  atPH: (P, h) => along(P, 'h', h),
  atPS: (P, s) => along(P, 's', s),
  saturation,
};
