/* The stagnation state ahead of a nozzle, from pressure with temperature or quality, and which phase it is. */
import { findRoot } from '../numeric';
import { type FluidState, type PhaseState, type PropertySource, type Saturation } from '../properties/types';

/** Phases at rest ahead of the nozzle; `saturated liquid` and `saturated vapour` at the ends of the two-phase region. */
export type InletPhase =
  'subcooled liquid' | 'saturated liquid' | 'two-phase' | 'saturated vapour' | 'vapour' | 'supercritical';

/** The inlet: state, phase, and saturation at its pressure where that is below the critical one. */
export type Inlet = { state: FluidState; phase: InletPhase; saturation?: Saturation };

/** The inlet at P0 (Pa) and quality x0 from 0 to 1; undefined above the critical pressure. */
export function inletAtQuality(source: PropertySource, P0: number, x0: number): Inlet | undefined {
  const state = source.atPx(P0, x0);
  const saturation = source.saturation(P0);
  if (!state || !saturation) return undefined;
  const phase = x0 <= 0 ? 'saturated liquid' : x0 >= 1 ? 'saturated vapour' : 'two-phase';
  return { state: { ...state, x: x0 }, phase, saturation };
}

/** A mixture between its bubble and dew temperatures: the quality whose temperature is T0. */
function between(source: PropertySource, P0: number, T0: number, saturation: Saturation): Inlet | undefined {
  const off = (x: number) => (source.atPx(P0, x)?.T ?? Number.NaN) - T0;
  const found = findRoot(off, 0, 1, { tolerance: 1e-9, maxIterations: 80 });
  const state = found.ok ? source.atPx(P0, found.x) : undefined;
  return state && found.ok ? { state: { ...state, x: found.x }, phase: 'two-phase', saturation } : undefined;
}

function plain(state: PhaseState): FluidState {
  const { P, T, rho, h, s } = state;
  return { P, T, rho, h, s };
}

/** The inlet at P0 (Pa) and T0 (K); undefined where the formulation of the fluid does not reach. */
export function inletAtTemperature(source: PropertySource, P0: number, T0: number): Inlet | undefined {
  const saturation = source.saturation(P0);
  if (saturation && !source.pure && T0 > saturation.liquid.T && T0 < saturation.vapour.T)
    return between(source, P0, T0, saturation);
  const state = source.atPT(P0, T0);
  if (!state) return undefined;
  if (!saturation) {
    const liquid = T0 < source.critical.T;
    const phase =
      P0 > source.critical.P && !liquid ? 'supercritical' : liquid ? 'subcooled liquid' : 'vapour';
    return { state: plain(state), phase };
  }
  const phase = T0 < saturation.liquid.T ? 'subcooled liquid' : 'vapour';
  return { state: plain(state), phase, saturation };
}

/** The saturation pressure (bubble pressure of a mixture) at T below `below` (Pa), with its states; undefined where there is none. */
export function bubbleAt(
  source: PropertySource,
  T: number,
  below: number,
): { P: number; states: Saturation } | undefined {
  const hi = Math.min(below, source.critical.P * 0.9999);
  const off = (lnP: number) => (source.saturation(Math.exp(lnP))?.liquid.T ?? Number.NaN) - T;
  for (let lo = hi / 2; lo > hi * 1e-7; lo /= 4) {
    const low = off(Math.log(lo));
    if (!Number.isFinite(low)) return undefined;
    if (low > 0) continue;
    const found = findRoot(off, Math.log(lo), Math.log(hi), { tolerance: 1e-11, maxIterations: 80 });
    const P = found.ok ? Math.exp(found.x) : undefined;
    const states = P === undefined ? undefined : source.saturation(P);
    return P !== undefined && states ? { P, states } : undefined;
  }
  return undefined;
}
