/* One homogeneous phase by the Peng–Robinson equation: volume, fugacity coefficients and residual properties. */
import { R } from './constants';
import { type Mixture } from './mixture';
import { attraction, compressibility, type Roots } from './roots';
import { type Thermal } from './thermal';
import { at, dot } from './vector';

/** Which root of the cubic: the densest, the lightest, or the one of lower Gibbs energy. */
export type RootChoice = 'liquid' | 'vapour' | 'stable';

/** A phase without translation of volume: per kmol, J and m³; residuals against the ideal gas at the same T and P. */
export type Phase = {
  T: number;
  P: number;
  x: Float64Array;
  a: number;
  /** First and second slope of the attraction a in T. */
  a1: number;
  a2: number;
  b: number;
  B: number;
  Z: number;
  V: number;
  /** ln[(Z + δ1 B)/(Z + δ2 B)]. */
  log: number;
  /** Σ_j x_j √a_j (1 − k_ij) and its slope in T. */
  S: Float64Array;
  S1: Float64Array;
  lnphi: Float64Array;
  hRes: number;
  sRes: number;
};

/** An empty phase for `n` components. */
export function newPhase(n: number): Phase {
  const empty = () => new Float64Array(n);
  const numbers = { T: 0, P: 0, a: 0, a1: 0, a2: 0, b: 0, B: 0, Z: 0, V: 0, log: 0, hRes: 0, sRes: 0 };
  return { ...numbers, x: empty(), S: empty(), S1: empty(), lnphi: empty() };
}

const roots: Roots = { low: 0, high: 0 };
const WIDTH = 2 * Math.SQRT2;

/** Residual Gibbs energy over RT of a root. */
function gibbs(Z: number, A: number, B: number): number {
  return Z - 1 - Math.log(Z - B) - (A / (WIDTH * B)) * attraction(Z, B);
}

function chooseRoot(A: number, B: number, choice: RootChoice): number {
  if (choice === 'liquid' || roots.low === roots.high) return roots.low;
  if (choice === 'vapour') return roots.high;
  // At saturation itself both are equal but for rounding; the vapour is meant there.
  return gibbs(roots.low, A, B) < gibbs(roots.high, A, B) - 1e-10 ? roots.low : roots.high;
}

/** Attraction and covolume of the composition in `phase.x`. */
function mix(m: Mixture, t: Thermal, phase: Phase): void {
  const { n, share } = m;
  const { x, S, S1 } = phase;
  let a = 0;
  let a1 = 0;
  let a2 = 0;
  for (let i = 0; i < n; i += 1) {
    let s = 0;
    let s1 = 0;
    for (let j = 0; j < n; j += 1) {
      const w = at(x, j) * at(share, i * n + j);
      s += w * at(t.q, j);
      s1 += w * at(t.q1, j);
    }
    S[i] = s;
    S1[i] = s1;
    const xi = at(x, i);
    a += xi * at(t.q, i) * s;
    a1 += xi * at(t.q1, i) * s;
    a2 += xi * (at(t.q2, i) * s + at(t.q1, i) * s1);
  }
  phase.a = a;
  phase.a1 = 2 * a1;
  phase.a2 = 2 * a2;
  phase.b = dot(x, m.b, n);
}

/**
 * Fills `phase` (its composition stands in `phase.x`) at the temperature of `t` and the pressure P in Pa.
 * False where no root exists or a figure is not finite.
 */
export function evaluatePhase(m: Mixture, t: Thermal, P: number, choice: RootChoice, phase: Phase): boolean {
  mix(m, t, phase);
  const { T } = t;
  const { a, a1, b } = phase;
  const RT = R * T;
  const A = (a * P) / (RT * RT);
  const B = (b * P) / RT;
  if (!(A > 0 && B > 0 && compressibility(A, B, roots))) return false;
  const Z = chooseRoot(A, B, choice);
  const log = attraction(Z, B);
  const depth = A / (WIDTH * B);
  const lnZB = Math.log(Z - B);
  phase.T = T;
  phase.P = P;
  phase.B = B;
  phase.Z = Z;
  phase.V = (Z * RT) / P;
  phase.log = log;
  phase.hRes = RT * (Z - 1) + ((T * a1 - a) / (WIDTH * b)) * log;
  phase.sRes = R * lnZB + (a1 / (WIDTH * b)) * log;
  for (let i = 0; i < m.n; i += 1) {
    const ratio = at(m.b, i) / b;
    const pull = (2 * at(t.q, i) * at(phase.S, i)) / a - ratio;
    phase.lnphi[i] = ratio * (Z - 1) - lnZB - depth * pull * log;
  }
  return Number.isFinite(phase.hRes) && Number.isFinite(phase.sRes) && Number.isFinite(lnZB);
}

/** Slopes of pressure: in T at constant volume (Pa/K) and in V at constant temperature (Pa·kmol/m³). */
export function pressureSlopes({ T, V, a, a1, b }: Phase): { PT: number; PV: number } {
  const D = V * V + 2 * b * V - b * b;
  const PT = R / (V - b) - a1 / D;
  const PV = (-R * T) / (V - b) ** 2 + (2 * a * (V + b)) / (D * D);
  return { PT, PV };
}
