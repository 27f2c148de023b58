/* The frictionless homogeneous-equilibrium nozzle, integrated along the isentrope of any fluid whose properties are known. */
import { type FluidState, type PropertySource } from '../properties/types';
import { firstMaximum } from './maximum';
import { bubbleBelow, isTwoPhase, onset, sideOf } from './onset';

/** A state on the isentrope with its velocity from rest, m/s, and its mass flux, kg/(m²·s). */
export type PathState = FluidState & { velocity: number; flux: number };

/**
 * The throat: where the mass flux is first at its greatest as the pressure falls, or the back pressure when it is reached
 * before. `atOnset` says that the throat lies where the fluid begins to flash or to condense: the flux has a kink there.
 */
export type Throat = PathState & { choked: boolean; atOnset: boolean };

/** Width in ln P to which the throat is found; the flux is flat there, so that it is exact to about its square. */
const THROAT_WIDTH = 2e-4;
const FIRST_STEP = 0.03;
/** Down to an onset, again with the onset known, and below it. */
const MAX_STRETCHES = 4;

/** The state at P (Pa) on the isentrope of an inlet at rest, with velocity and flux; undefined outside the formulation. */
export function pathState(source: PropertySource, inlet: FluidState, P: number): PathState | undefined {
  const state = P === inlet.P ? inlet : source.atPS(P, inlet.s);
  return state && moving(inlet, state);
}

function moving(inlet: FluidState, state: FluidState): PathState {
  const velocity = Math.sqrt(2 * Math.max(0, inlet.h - state.h));
  return { ...state, velocity, flux: state.rho * velocity };
}

/** What a stretch of one phase region gives: its maximum, or between which pressures the phase changes unforeseen. */
type Stretch = { peak: Throat } | { change: [number, number] } | undefined;

/** Looks for the maximum from `start` down to Pb, or to the onset that is known to lie ahead. */
function stretch(
  way: { source: PropertySource; inlet: FluidState; Pb: number },
  start: PathState,
  ahead?: PathState,
): Stretch {
  const { source, inlet, Pb } = way;
  const end = Math.log(start.P / (ahead?.P ?? Pb));
  const seen = new Map<number, PathState>([[0, start]]);
  if (ahead) seen.set(end, ahead);
  let change: [number, number] | undefined;
  const flux = (y: number): number | undefined => {
    const known = seen.get(y);
    if (known) return known.flux;
    const state = pathState(source, inlet, y === end ? Pb : start.P * Math.exp(-y));
    if (!state) return undefined;
    if (start.x === undefined && isTwoPhase(state) && !ahead) {
      const above = [...seen.values()].map((one) => one.P).filter((P) => P > state.P);
      change = [Math.min(...above), state.P];
      return undefined;
    }
    seen.set(y, state);
    return state.flux;
  };
  const peak = firstMaximum(flux, end, { first: start.flux, step: FIRST_STEP, tolerance: THROAT_WIDTH });
  if (!peak) return change && { change };
  const state = seen.get(peak.y);
  return state && { peak: { ...state, choked: peak.inside, atOnset: peak.y === 0 } };
}

/**
 * The throat of a frictionless nozzle from a stagnation state, homogeneous and in equilibrium: the first maximum of
 * ρ √(2 (h0 − h)) along the isentrope above the back pressure Pb (Pa). Undefined where properties end before it is found.
 * Source: API 520-1 Annex B and C, numerical integration (from memory).
 */
export function hemThroat(source: PropertySource, inlet: FluidState, Pb: number): Throat | undefined {
  let start = moving(inlet, inlet);
  if (!(Pb < inlet.P)) return { ...start, choked: false, atOnset: false };
  const way = { source, inlet, Pb };
  const along = (state: FluidState | undefined) => state && moving(inlet, state);
  let ahead = inlet.x === undefined ? along(bubbleBelow(source, inlet, Pb)) : undefined;
  for (let i = 0; i < MAX_STRETCHES; i += 1) {
    const found = stretch(way, start, ahead);
    if (!found) return undefined;
    if ('change' in found) {
      ahead = along(onset(source, inlet, found.change, sideOf(source, inlet, found.change[1])));
      if (!ahead) return undefined;
    } else if (found.peak.choked || !ahead) {
      return found.peak;
    } else {
      [start, ahead] = [ahead, undefined];
    }
  }
  return undefined;
}
