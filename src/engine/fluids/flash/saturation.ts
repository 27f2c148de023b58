/* Bubble and dew temperature of a mixture at a pressure: full Newton on ln K and ln T. */
import { fugacityDerivatives } from '../cubic/derivatives';
import { type Mixture } from '../cubic/mixture';
import { setTemperature } from '../cubic/thermal';
import { at, solveLinear } from '../cubic/vector';
import { evaluateBoth, spread, TRIVIAL, wilson } from './split';
import { type Work } from './work';

/** The end of boiling that is sought: the first bubble of the feed as liquid, or the last drop of the feed as vapour. */
export type End = 'bubble' | 'dew';

const MAX_ITERATIONS = 40;

/** Wilson's estimate of the bubble or dew temperature, K. */
export function estimate({ n, z, Tc, Pc, omega }: Mixture, P: number, end: End): number {
  const sign = end === 'bubble' ? 1 : -1;
  let low = 1;
  let high = 5000;
  for (let i = 0; i < 60; i += 1) {
    const T = Math.sqrt(low * high);
    let sum = 0;
    for (let j = 0; j < n; j += 1) {
      const lnK = Math.log(at(Pc, j) / P) + 5.373 * (1 + at(omega, j)) * (1 - at(Tc, j) / T);
      sum += at(z, j) * Math.exp(sign * lnK);
    }
    if (sum > 1 === (end === 'bubble')) high = T;
    else low = T;
  }
  return Math.sqrt(low * high);
}

/** Sets both compositions from ln K, the feed being the phase that is all there; Σ of the other, before scaling. */
function compositions({ m, lnK, liquid, vapour }: Work, end: End): number {
  const [feed, other, sign] = end === 'bubble' ? [liquid, vapour, 1] : [vapour, liquid, -1];
  let sum = 0;
  for (let i = 0; i < m.n; i += 1) {
    feed.x[i] = at(m.z, i);
    const amount = at(m.z, i) * Math.exp(sign * at(lnK, i));
    other.x[i] = amount;
    sum += amount;
  }
  for (let i = 0; i < m.n; i += 1) other.x[i] = at(other.x, i) / sum;
  return sum;
}

/** Fills the Newton system for ln K_i and ln T. */
function fill(work: Work, T: number, end: End, sum: number): void {
  const { m, liquid, vapour, liquidSlopes, vapourSlopes, lnK, matrix, step } = work;
  const { n } = m;
  const width = n + 1;
  const [other, slopes, sign] = end === 'bubble' ? [vapour, vapourSlopes, 1] : [liquid, liquidSlopes, -1];
  for (let i = 0; i < n; i += 1) {
    step[i] = -(at(lnK, i) + at(vapour.lnphi, i) - at(liquid.lnphi, i));
    for (let j = 0; j < n; j += 1)
      matrix[i * width + j] = (i === j ? 1 : 0) + at(slopes.byMoles, i * n + j) * at(other.x, j);
    matrix[i * width + n] = T * (at(vapourSlopes.byT, i) - at(liquidSlopes.byT, i));
    matrix[n * width + i] = sign * at(other.x, i) * sum;
  }
  matrix[n * width + n] = 0;
  step[n] = 1 - sum;
}

/** Warms T and ln K by substitution, moving T by the slope of ln Σ: what Newton needs to start near. */
function warm(work: Work, P: number, start: number, end: End): number | undefined {
  const { m, t, lnK, liquid, vapour } = work;
  const sign = end === 'bubble' ? 1 : -1;
  let T = start;
  for (let k = 0; k < 6; k += 1) {
    compositions(work, end);
    setTemperature(m, t, T);
    if (!evaluateBoth(work, P)) return undefined;
    fugacityDerivatives(m, t, liquid, work.liquidSlopes);
    fugacityDerivatives(m, t, vapour, work.vapourSlopes);
    let sum = 0;
    let slope = 0;
    for (let i = 0; i < m.n; i += 1) {
      lnK[i] = at(liquid.lnphi, i) - at(vapour.lnphi, i);
      const amount = at(m.z, i) * Math.exp(sign * at(lnK, i));
      sum += amount;
      slope += sign * amount * T * (at(work.liquidSlopes.byT, i) - at(work.vapourSlopes.byT, i));
    }
    const move = (-Math.log(sum) * sum) / slope;
    if (!Number.isFinite(move)) return undefined;
    T *= Math.exp(Math.max(-0.05, Math.min(0.05, move)));
  }
  return T;
}

function newton(work: Work, P: number, start: number, end: End): number | undefined {
  const { m, t, lnK, step } = work;
  let T = start;
  for (let i = 0; i < MAX_ITERATIONS; i += 1) {
    const sum = compositions(work, end);
    setTemperature(m, t, T);
    if (!evaluateBoth(work, P)) return undefined;
    fugacityDerivatives(m, t, work.liquid, work.liquidSlopes);
    fugacityDerivatives(m, t, work.vapour, work.vapourSlopes);
    fill(work, T, end, sum);
    if (!solveLinear(work.matrix, step, m.n + 1)) return undefined;
    let most = Math.abs(at(step, m.n)) * 10;
    for (let j = 0; j < m.n; j += 1) most = Math.max(most, Math.abs(at(step, j)));
    const share = Math.min(1, 1 / most);
    for (let j = 0; j < m.n; j += 1) lnK[j] = at(lnK, j) + share * at(step, j);
    T *= Math.exp(share * at(step, m.n));
    if (!(T > 1 && T < 1e4) || spread(work) < TRIVIAL) return undefined;
    if (most < 1e-9) {
      compositions(work, end);
      setTemperature(m, t, T);
      return evaluateBoth(work, P) ? T : undefined;
    }
  }
  return undefined;
}

/** From Wilson's estimate at P; undefined when it does not converge to two different phases. */
function direct(work: Work, P: number, end: End): number | undefined {
  const start = estimate(work.m, P, end);
  wilson(work, P, start);
  const warmed = warm(work, P, start, end);
  return warmed === undefined || spread(work) < 0.01 ? undefined : newton(work, P, warmed, end);
}

/**
 * Bubble or dew temperature at P, with the phases in `work.liquid` and `work.vapour`. Near the critical point, where a
 * direct search falls on equal phases, P is approached from below in steps of a fifth, each from the last. Undefined
 * where the mixture has no such point at P.
 */
export function saturationTemperature(work: Work, P: number, end: End): number | undefined {
  const found = direct(work, P, end);
  if (found !== undefined) return found;
  let from = P / 2;
  let T = direct(work, from, end);
  for (let i = 0; i < 4 && T === undefined; i += 1) {
    from /= 2;
    T = direct(work, from, end);
  }
  for (let i = 0; i < 30 && T !== undefined && from < P; i += 1) {
    from = Math.min(P, from * 1.2);
    T = newton(work, from, T, end);
  }
  return T;
}
