/* The isobar, leg by leg through the regions, and the state on it that has a given enthalpy or entropy. */
import { type FluidState, type PhaseState } from '../properties/types';
import { region1, region2, region5 } from './basic';
import { CRITICAL, LIMITS_P, LIMITS_T } from './constants';
import { region3At } from './regions';
import { boundaryTemperature, LOWEST_SATURATION, saturationTemperature } from './saturation';

/** Which property is given. */
export type Given = 'h' | 's';

/** A state, or on which side of the formulation's range the given value lies. */
export type Found = FluidState | 'below' | 'above';

/** A stretch of an isobar inside one region; `boils` and `condenses` mark an end that is saturated. */
type Leg = { lo: number; hi: number; at: (T: number) => PhaseState; boils?: boolean; condenses?: boolean };

const MOST_STEPS = 80;
const CLOSE = 1e-13;

/** States of region 3 along an isobar; each search for density starts from the one before. */
function alongRegion3(P: number, vapour: boolean): (T: number) => PhaseState {
  let near: number | undefined;
  return (T) => {
    const state = region3At(P, T, vapour, near);
    near = state.rho;
    return state;
  };
}

/** The legs of the isobar, by rising temperature. */
function legs(P: number, coldest: number): Leg[] {
  const { one, two, five } = LIMITS_T;
  const liquid = (T: number) => region1(P, T);
  const steam = (T: number) => region2(P, T);
  const hot: Leg[] = P <= LIMITS_P.five ? [{ lo: two, hi: five, at: (T) => region5(P, T) }] : [];
  if (P < LOWEST_SATURATION) return [{ lo: LIMITS_T.lowest, hi: two, at: steam }, ...hot];
  const boiling = P < CRITICAL.P ? saturationTemperature(P) : undefined;
  if (boiling !== undefined && boiling <= one)
    return [
      { lo: coldest, hi: boiling, at: liquid, boils: true },
      { lo: boiling, hi: two, at: steam, condenses: true },
      ...hot,
    ];
  const edge = boundaryTemperature(P);
  const dense = alongRegion3(P, false);
  const around: Leg[] =
    boiling === undefined
      ? [{ lo: one, hi: edge, at: dense }]
      : [
          { lo: one, hi: boiling, at: dense, boils: true },
          { lo: boiling, hi: edge, at: alongRegion3(P, true), condenses: true },
        ];
  return [{ lo: coldest, hi: one, at: liquid }, ...around, { lo: edge, hi: two, at: steam }, ...hot];
}

/** The pure-phase states at both ends of boiling at P, below the critical pressure; undefined elsewhere. */
export function boilingEnds(P: number): { liquid: PhaseState; vapour: PhaseState } | undefined {
  const T = P < CRITICAL.P ? saturationTemperature(P) : undefined;
  if (T === undefined) return undefined;
  if (T <= LIMITS_T.one) return { liquid: region1(P, T), vapour: region2(P, T) };
  return { liquid: region3At(P, T, false), vapour: region3At(P, T, true) };
}

/** A mass share of one state in another at the same pressure and temperature. */
export function blend(a: FluidState, b: FluidState, share: number): FluidState {
  const mean = (p: number, q: number) => p + share * (q - p);
  const v = mean(1 / a.rho, 1 / b.rho);
  return { P: a.P, T: a.T, rho: 1 / v, h: mean(a.h, b.h), s: mean(a.s, b.s) };
}

/** Newton steps in temperature along one leg, kept inside a bracket; the slope of h is cp, that of s is cp/T. */
function solveLeg(
  leg: Leg,
  ends: { first: PhaseState; last: PhaseState },
  given: Given,
  value: number,
): FluidState {
  let { lo, hi } = leg;
  const from = ends.first[given];
  let T = lo + ((hi - lo) * (value - from)) / (ends.last[given] - from);
  let state = ends.first;
  for (let step = 0; step < MOST_STEPS; step += 1) {
    state = leg.at(T);
    const off = value - state[given];
    if (off > 0) lo = T;
    else hi = T;
    const newton = T + (given === 'h' ? off / state.cp : (off * T) / state.cp);
    if (Math.abs(newton - T) <= CLOSE * T || hi - lo <= CLOSE * T) break;
    T = newton > lo && newton < hi && step % 6 !== 5 ? newton : (lo + hi) / 2;
  }
  return { P: state.P, T: state.T, rho: state.rho, h: state.h, s: state.s };
}

/** How far h in J/kg or s in J/(kg·K) may lie beyond the ends of an isobar and still count as the end. */
function rounding(value: number): number {
  return 1e-9 + 1e-12 * Math.abs(value);
}

/**
 * The state at P in Pa where h in J/kg or s in J/(kg·K) has the given value: found leg by leg, so that boiling needs no
 * iteration. Where two basic equations leave a gap on their common boundary (at most some 100 J/kg, far below their
 * uncertainty), the state is a blend of both; where they overlap, the region of lower temperature is taken. `coldest`
 * lets a search look a little below the range.
 */
export function onIsobar(P: number, given: Given, value: number, coldest: number = LIMITS_T.lowest): Found {
  let before: PhaseState | undefined;
  let boiled = false;
  for (const leg of legs(P, coldest)) {
    const first = leg.at(leg.lo);
    if (value < first[given]) {
      if (before === undefined) return first[given] - value <= rounding(value) ? plain(first) : 'below';
      const share = (value - before[given]) / (first[given] - before[given]);
      const state = blend(before, first, share);
      return boiled ? { ...state, x: share } : state;
    }
    const last = leg.at(leg.hi);
    const saturated = leg.condenses === true && value === first[given];
    if (value < last[given] || (value === last[given] && leg.boils !== true))
      return saturated ? { ...plain(first), x: 1 } : solveLeg(leg, { first, last }, given, value);
    before = last;
    boiled = leg.boils === true;
  }
  return before !== undefined && value - before[given] <= rounding(value) ? plain(before) : 'above';
}

function plain({ P, T, rho, h, s }: FluidState): FluidState {
  return { P, T, rho, h, s };
}
