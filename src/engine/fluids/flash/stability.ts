/* Whether one phase is stable, by the tangent plane of Michelsen (1982). */
import { evaluatePhase } from '../cubic/phase';
import { setTemperature } from '../cubic/thermal';
import { at } from '../cubic/vector';
import { wilson } from './split';
import { type Work } from './work';

const MAX_ITERATIONS = 150;

/**
 * Looks for a phase that would form from the feed; `side` says whether the trial starts light or dense. Gives Σ W of the
 * stationary point (above 1: the feed splits), its composition in `trial.x`; 1 when the trial fell back on the feed.
 */
function tangent(work: Work, P: number, side: 'vapour' | 'liquid'): number {
  const { m, t, single, trial, lnK } = work;
  const sign = side === 'vapour' ? 1 : -1;
  for (let i = 0; i < m.n; i += 1) trial.x[i] = at(m.z, i) * Math.exp(sign * at(lnK, i));
  let before = 0;
  for (let k = 0; k < MAX_ITERATIONS; k += 1) {
    let total = 0;
    for (let i = 0; i < m.n; i += 1) total += at(trial.x, i);
    for (let i = 0; i < m.n; i += 1) trial.x[i] = at(trial.x, i) / total;
    if (!evaluatePhase(m, t, P, 'stable', trial)) return 1;
    let change = 0;
    let away = 0;
    let sum = 0;
    for (let i = 0; i < m.n; i += 1) {
      const next = at(m.z, i) * Math.exp(at(single.lnphi, i) - at(trial.lnphi, i));
      change = Math.max(change, Math.abs(Math.log(next / (at(trial.x, i) * total))));
      away = Math.max(away, Math.abs(Math.log(next / at(m.z, i))));
      trial.x[i] = next;
      sum += next;
    }
    if (!Number.isFinite(sum)) return 1;
    if (away < 1e-4) return 1;
    // Once the sum stays above one and still rises, the feed is known to split.
    if (change < 1e-9 || (sum > 1 + 1e-6 && k > 8 && sum >= before)) return sum;
    before = sum;
  }
  return before;
}

/** Puts ln K of the trial against the feed into `work.lnK`. */
function takeK({ m, trial, lnK }: Work, side: 'vapour' | 'liquid'): void {
  const sign = side === 'vapour' ? 1 : -1;
  for (let i = 0; i < m.n; i += 1) lnK[i] = sign * Math.log(at(trial.x, i) / at(m.z, i));
}

/**
 * Whether the feed splits at P and T. `work.single` is left evaluated there; when it splits, `work.lnK` holds K-values to
 * start from. Undefined when the feed has no phase at all there.
 */
export function splits(work: Work, P: number, T: number): boolean | undefined {
  const { m, t, single } = work;
  setTemperature(m, t, T);
  if (!evaluatePhase(m, t, P, 'stable', single)) return undefined;
  for (const side of ['vapour', 'liquid'] as const) {
    wilson(work, P, T);
    if (tangent(work, P, side) > 1 + 1e-9) {
      takeK(work, side);
      return true;
    }
  }
  return false;
}
