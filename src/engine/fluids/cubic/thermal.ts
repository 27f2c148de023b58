/* What a mixture has by temperature alone: attraction of each component with its slopes, and its ideal gas. */
import { idealGas, idealGasReference, type IdealGas } from './ideal-gas';
import { type Mixture } from './mixture';
import { at } from './vector';

/** √a_i with first and second slope in T; h/R, s/R and cp/R of each ideal gas. */
export type Thermal = {
  T: number;
  q: Float64Array;
  q1: Float64Array;
  q2: Float64Array;
  h: Float64Array;
  s: Float64Array;
  cp: Float64Array;
  reference: readonly IdealGas[];
};

/** An empty store for a mixture, to be filled by `setTemperature`. */
export function newThermal(mixture: Mixture): Thermal {
  const empty = () => new Float64Array(mixture.n);
  const reference = mixture.cp.map(idealGasReference);
  return {
    T: Number.NaN,
    q: empty(),
    q1: empty(),
    q2: empty(),
    h: empty(),
    s: empty(),
    cp: empty(),
    reference,
  };
}

const gas: IdealGas = { cp: 0, h: 0, s: 0 };

/**
 * Fills the store at T (K). Twu's alpha function: α = Tr^(N(M−1)) exp(L(1 − Tr^(NM))); the root of a goes by √α,
 * whose logarithm has the slopes used here.
 */
export function setTemperature(mixture: Mixture, store: Thermal, T: number): void {
  if (store.T === T) return;
  store.T = T;
  for (let i = 0; i < mixture.n; i += 1) {
    const lnTr = Math.log(T / at(mixture.Tc, i));
    const low = at(mixture.twuLow, i);
    const high = at(mixture.twuHigh, i);
    const power = at(mixture.twuL, i) * Math.exp(high * lnTr);
    const q = at(mixture.rootA, i) * Math.exp((low * lnTr + at(mixture.twuL, i) - power) / 2);
    const slope = (low - high * power) / 2;
    store.q[i] = q;
    store.q1[i] = (q * slope) / T;
    store.q2[i] = (q * (slope * slope - slope - (high * high * power) / 2)) / (T * T);
    const fit = mixture.cp[i];
    const zero = store.reference[i];
    if (fit === undefined || zero === undefined) continue;
    idealGas(fit, T, gas);
    store.h[i] = gas.h - zero.h;
    store.s[i] = gas.s - zero.s;
    store.cp[i] = gas.cp;
  }
}
