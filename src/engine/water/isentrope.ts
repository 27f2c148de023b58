/* The state with a given enthalpy and entropy, searched along the isentrope. */
import { type FluidState } from '../properties/types';
import { CRITICAL, LIMITS_P, LIMITS_T } from './constants';
import { onIsobar } from './isobar';

/** How far below 273.15 K the search may look on its way, K: near 0 °C the entropy of water is not monotone in pressure. */
const MARGIN = 10;
const MOST_STEPS = 120;
const CLOSE = 1e-12;

/** A step of Newton's rule towards enthalpy h: dh = v dp along an isentrope; in ln p for steam, whose h goes with ln p. */
function newtonPressure(state: FluidState, h: number): number {
  const dP = (h - state.h) * state.rho;
  return state.rho > CRITICAL.rho
    ? state.P + dP
    : state.P * Math.exp(Math.max(-5, Math.min(5, dP / state.P)));
}

/**
 * The state with h in J/kg and s in J/(kg·K). At constant entropy enthalpy rises with pressure everywhere, so that one
 * bracketed search in pressure serves all regions. Undefined where no state of the formulation has both.
 */
export function onIsentrope(h: number, s: number): FluidState | undefined {
  if (!Number.isFinite(h) || !Number.isFinite(s)) return undefined;
  let lo: number = LIMITS_P.least;
  let hi: number = LIMITS_P.most;
  let P = Math.sqrt(lo * hi);
  let best: FluidState | undefined;
  for (let step = 0; step < MOST_STEPS && hi - lo > CLOSE * hi; step += 1) {
    const state = onIsobar(P, 's', s, LIMITS_T.lowest - MARGIN);
    let next = Math.sqrt(lo * hi);
    if (state === 'below') lo = P;
    else if (state === 'above') hi = P;
    else {
      best = state;
      if (state.h < h) lo = P;
      else hi = P;
      const newton = newtonPressure(state, h);
      if (Math.abs(newton - P) <= CLOSE * P) break;
      next = newton > lo && newton < hi && step % 6 !== 5 ? newton : Math.sqrt(lo * hi);
    }
    P = next;
  }
  if (best === undefined || Math.abs(best.h - h) > 1e-7 * (Math.abs(h) + 1e3)) return undefined;
  return best.T >= LIMITS_T.lowest - 1e-6 ? best : undefined;
}
