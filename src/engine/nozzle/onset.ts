/* Where an isentrope begins to flash or to condense: the kink of the mass flux along a nozzle. */
import { type FluidState, type PropertySource } from '../properties/types';

/** The line at which the isentrope enters the two-phase region: bubble points of the liquid, dew points of the vapour. */
export type Side = 'liquid' | 'vapour';

/** Whether liquid and vapour stand together, neither of them alone. */
export const isTwoPhase = (state: FluidState): boolean => state.x !== undefined && state.x > 0 && state.x < 1;

/** Width in ln P to which an onset is found. */
const ONSET_WIDTH = 1e-8;
const MAX_ONSET_STEPS = 60;

/**
 * The pressure between hi and lo at which the isentrope of entropy s meets the bubble or the dew line. Entropy along either
 * line is smooth, so false position with the weights of Anderson and Björck (BIT 13 (1973) 253) needs few saturation states.
 */
function onsetPressure(
  source: PropertySource,
  s: number,
  side: Side,
  [hi, lo]: [number, number],
): number | undefined {
  const distance = (lnP: number) => (source.saturation(Math.exp(lnP))?.[side].s ?? Number.NaN) - s;
  let [x1, x2] = [Math.log(hi), Math.log(lo)];
  let [f1, f2] = [distance(x1), distance(x2)];
  if (!(f1 * f2 < 0)) return undefined;
  for (let i = 0; i < MAX_ONSET_STEPS && Math.abs(x2 - x1) > ONSET_WIDTH; i += 1) {
    const x = x2 - (f2 * (x2 - x1)) / (f2 - f1);
    const f = distance(x);
    if (Number.isNaN(f)) return undefined;
    if (f === 0 || Math.abs(x - x2) < ONSET_WIDTH) return Math.exp(x);
    if (f * f2 < 0) {
      [x1, f1] = [x2, f2];
    } else {
      const weight = 1 - f / f2;
      f1 *= weight > 0 ? weight : 0.5;
    }
    [x2, f2] = [x, f];
  }
  return Math.exp(x2);
}

/** The onset by halving on whether the state is two-phase, for isentropes that come from above the critical pressure. */
function onsetByPhase(
  source: PropertySource,
  s: number,
  [hi, lo]: [number, number],
): { P: number; side: Side } | undefined {
  let [single, double] = [hi, lo];
  let last = source.atPS(double, s);
  for (let i = 0; i < 40 && single / double > 1 + 1e-7; i += 1) {
    const P = Math.sqrt(single * double);
    const state = source.atPS(P, s);
    if (!state) return undefined;
    if (isTwoPhase(state)) [double, last] = [P, state];
    else single = P;
  }
  return last && { P: double, side: (last.x ?? 0) < 0.5 ? 'liquid' : 'vapour' };
}

/** From which side the isentrope has entered the two-phase region at P. */
export function sideOf(source: PropertySource, inlet: FluidState, P: number): Side {
  return (source.atPS(P, inlet.s)?.x ?? 1) < 0.5 ? 'liquid' : 'vapour';
}

/** Where the phase changes between two pressures of the path, with the state on the side of saturation. */
export function onset(
  source: PropertySource,
  inlet: FluidState,
  between: [number, number],
  side: Side,
): FluidState | undefined {
  const direct = onsetPressure(source, inlet.s, side, between);
  const found = direct === undefined ? onsetByPhase(source, inlet.s, between) : { P: direct, side };
  const state = found && source.saturation(found.P)?.[found.side];
  if (!state || !found) return undefined;
  const { P, T, rho, h, s } = state;
  return { P, T, rho, h, s, x: found.side === 'liquid' ? 0 : 1 };
}

/** The bubble point on the way down from a liquid inlet below the critical pressure, when it lies above the back pressure. */
export function bubbleBelow(source: PropertySource, inlet: FluidState, Pb: number): FluidState | undefined {
  const sat = inlet.P < source.critical.P ? source.saturation(inlet.P) : undefined;
  const low = source.saturation(Pb);
  if (!sat || !low || inlet.s >= sat.liquid.s || inlet.s <= low.liquid.s) return undefined;
  return onset(source, inlet, [inlet.P, Pb], 'liquid');
}
