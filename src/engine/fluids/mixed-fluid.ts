/* A mixture of the library as a source of properties. */
import { type FluidState, type PhaseState } from '../properties/types';
import { type Boundary, type CubicFluid, type Equilibrium, type TwoPhases } from './cubic-fluid';
import { type Mixture } from './cubic/mixture';
import { phaseState } from './cubic/state';
import { setTemperature } from './cubic/thermal';
import { dot } from './cubic/vector';
import { asOnePhase, byBracket, type Found, fromLast } from './flash/held';
import { type Hold } from './flash/newton';
import { flashPT, type Outcome } from './flash/pt';
import { type End, saturationTemperature } from './flash/saturation';
import { newWork } from './flash/work';
import { between } from './pure-fluid';
import { pressureInside, temperatureRange } from './range';

/** A phase of less than this many covolumes is a liquid: the critical volume is 3.95, liquids in a fire about 1.2 to 2. */
const LIQUID_LIKE = 2;

/** Kay's pseudo-critical point: says in what region a mixture is, no more. */
function pseudoCritical({ n, z, Tc, Pc }: Mixture): { P: number; T: number } {
  return { P: dot(z, Pc, n), T: dot(z, Tc, n) };
}

/**
 * The properties of a mixture, of vapour and one liquid: where two liquids part (water or glycol with hydrocarbons, cold
 * carbon dioxide with heavy ones) a second liquid is not looked for. A flash starts from where the last one ended, as a nozzle or a line asks for near states
 * one after the other; every answer is closed to rounding, so that the order of questions does not show in it.
 */
export function mixedFluid(mixture: Mixture, name: string, source: string): CubicFluid {
  const work = newWork(mixture);
  const { m, t } = work;
  const { low, high } = temperatureRange(mixture);
  const critical = pseudoCritical(mixture);
  const M = dot(m.z, m.M, m.n);
  let last: Found | undefined;

  const twoPhases = (beta: number): TwoPhases | undefined => {
    const liquid = phaseState(m, t, work.liquid);
    const vapour = phaseState(m, t, work.vapour);
    if (liquid === undefined || vapour === undefined) return undefined;
    const twoLiquids = work.vapour.V < LIQUID_LIKE * work.vapour.b;
    return { liquid, vapour, x: [...work.liquid.x], y: [...work.vapour.x], vapourMoles: beta, twoLiquids };
  };

  const stateOf = (T: number, outcome: Outcome): Equilibrium | undefined => {
    if (!(T >= low && T <= high)) return undefined;
    setTemperature(m, t, T);
    if (outcome.phases === 1) {
      const state = phaseState(m, t, work.single);
      return state && { state };
    }
    const two = twoPhases(outcome.beta);
    const share = (outcome.beta * dot(work.vapour.x, m.M, m.n)) / M;
    return two && { state: between(two.liquid, two.vapour, Math.min(1, share)), two };
  };

  const equilibrium = (P: number, T: number): Equilibrium | undefined => {
    if (!(pressureInside(P) && T >= low && T <= high)) return undefined;
    const outcome = flashPT(work, P, T);
    if (outcome === undefined) return undefined;
    last = { T, outcome };
    return stateOf(T, outcome);
  };

  const boundary = (P: number, end: End): Boundary | undefined => {
    if (!pressureInside(P)) return undefined;
    last = undefined;
    const T = saturationTemperature(work, P, end);
    if (T === undefined || T < low || T > high) return undefined;
    setTemperature(m, t, T);
    const two = twoPhases(end === 'bubble' ? 0 : 1);
    return two && { T, liquid: two.liquid, vapour: two.vapour, x: two.x, y: two.y };
  };

  const find = (P: number, hold: Hold): Found | undefined => {
    const start = last?.T ?? Math.min(Math.max(critical.T, low), high);
    const span = { low, high, start };
    if (last?.outcome.phases === 2) {
      const found = fromLast(work, P, start, hold);
      if (found !== undefined) return found;
    }
    if (hold.kind === 'h' || hold.kind === 's') {
      const found = asOnePhase(work, P, { kind: hold.kind, value: hold.value }, span);
      if (found !== undefined) return found;
    }
    return byBracket(work, P, hold, span);
  };

  const holding = (P: number, hold: Hold): Equilibrium | undefined => {
    if (!(pressureInside(P) && Number.isFinite(hold.value))) return undefined;
    last = find(P, hold);
    return last && stateOf(last.T, last.outcome);
  };

  const feed = (P: number, end: End): PhaseState | undefined => {
    const point = boundary(P, end);
    return end === 'bubble' ? point?.liquid : point?.vapour;
  };

  const atShare = (P: number, x: number): Equilibrium | undefined => {
    if (!(x >= 0 && x <= 1)) return undefined;
    if (x > 1e-6 && x < 1 - 1e-6) return holding(P, { kind: 'mass', value: x * M });
    const end = x < 0.5 ? 'bubble' : 'dew';
    const point = boundary(P, end);
    const state = end === 'bubble' ? point?.liquid : point?.vapour;
    if (point === undefined || state === undefined) return undefined;
    const { liquid, vapour } = point;
    const vapourMoles = end === 'bubble' ? 0 : 1;
    const two = { liquid, vapour, x: point.x, y: point.y, vapourMoles, twoLiquids: false };
    return {
      state: { P, T: state.T, rho: state.rho, h: state.h, s: state.s, x: end === 'bubble' ? 0 : 1 },
      two,
    };
  };

  const state = (found: Equilibrium | undefined): FluidState | undefined => found?.state;

  return {
    name,
    source,
    M,
    critical,
    pure: false,
    mixture,
    range: { low, high },
    equilibrium,
    boundary,
    atPT: (P, T) => {
      const found = equilibrium(P, T);
      return found?.two === undefined ? (found?.state as PhaseState | undefined) : undefined;
    },
    atPx: (P, x) => state(atShare(P, x)),
    atPH: (P, h) => state(holding(P, { kind: 'h', value: h * M })),
    atPS: (P, s) => state(holding(P, { kind: 's', value: s * M })),
    saturation: (P) => {
      const liquid = feed(P, 'bubble');
      const vapour = feed(P, 'dew');
      return liquid && vapour && { liquid, vapour };
    },
  };
}
