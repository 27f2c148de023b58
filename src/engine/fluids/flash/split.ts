/* Splitting a feed by its K-values, and successive substitution of them at a pressure and temperature. */
import { evaluatePhase } from '../cubic/phase';
import { setTemperature } from '../cubic/thermal';
import { at } from '../cubic/vector';
import { vapourShare } from './rachford-rice';
import { type Work } from './work';

/** Below this largest |ln K| the two phases are one and the same. */
export const TRIVIAL = 1e-4;

/** The largest |ln K| of the two phases. */
export function spread({ m, lnK }: Work): number {
  let most = 0;
  for (let i = 0; i < m.n; i += 1) most = Math.max(most, Math.abs(at(lnK, i)));
  return most;
}

/** Wilson's K-values at P and T. */
export function wilson({ m, lnK }: Work, P: number, T: number): void {
  for (let i = 0; i < m.n; i += 1)
    lnK[i] = Math.log(at(m.Pc, i) / P) + 5.373 * (1 + at(m.omega, i)) * (1 - at(m.Tc, i) / T);
}

/** Fills l, v and the compositions of both phases from ln K and a share of vapour (which may lie outside 0…1). */
export function divide(work: Work, beta: number): void {
  const { m, lnK, l, v, liquid, vapour } = work;
  for (let i = 0; i < m.n; i += 1) {
    const k = Math.expm1(at(lnK, i));
    const x = at(m.z, i) / (1 + beta * k);
    const y = x * (k + 1);
    liquid.x[i] = x;
    vapour.x[i] = y;
    l[i] = (1 - beta) * x;
    v[i] = beta * y;
  }
}

/** Evaluates both phases at P and the temperature set; false where one has no root. */
export function evaluateBoth({ m, t, liquid, vapour }: Work, P: number): boolean {
  return evaluatePhase(m, t, P, 'liquid', liquid) && evaluatePhase(m, t, P, 'vapour', vapour);
}

/** Takes ln K from the fugacity coefficients of the two phases; the largest change. */
function substitute({ m, lnK, liquid, vapour }: Work): number {
  let change = 0;
  for (let i = 0; i < m.n; i += 1) {
    const next = at(liquid.lnphi, i) - at(vapour.lnphi, i);
    change = Math.max(change, Math.abs(next - at(lnK, i)));
    lnK[i] = next;
  }
  return change;
}

/**
 * Successive substitution from the K-values that stand in `work`, at most `limit` times, until they move by less than
 * `enough`. Gives the share of vapour (outside 0…1: one phase), or undefined when the phases fell together.
 */
export function substituteK(
  work: Work,
  P: number,
  T: number,
  limit: number,
  enough: number,
): number | undefined {
  setTemperature(work.m, work.t, T);
  let beta = vapourShare(work.m.z, work.lnK, work.m.n);
  for (let i = 0; i < limit && beta !== undefined; i += 1) {
    divide(work, beta);
    if (!evaluateBoth(work, P)) return undefined;
    const change = substitute(work);
    if (spread(work) < TRIVIAL) return undefined;
    beta = vapourShare(work.m.z, work.lnK, work.m.n);
    if (change < enough) break;
  }
  if (beta !== undefined) divide(work, beta);
  return beta;
}
