/* The share of vapour that belongs to a set of K-values (Rachford and Rice). */
import { at } from '../cubic/vector';

const MAX_ITERATIONS = 100;

/**
 * The kmol of vapour per kmol of feed at which Σ z (K − 1)/(1 + β (K − 1)) = 0, between the poles (so it may lie outside
 * 0…1: then only one phase is there). Undefined when all K are on one side of 1.
 */
export function vapourShare(z: ArrayLike<number>, lnK: ArrayLike<number>, n: number): number | undefined {
  let least = Number.POSITIVE_INFINITY;
  let most = Number.NEGATIVE_INFINITY;
  for (let i = 0; i < n; i += 1) {
    least = Math.min(least, at(lnK, i));
    most = Math.max(most, at(lnK, i));
  }
  if (!(least < 0 && most > 0 && most < 600)) return undefined;
  let low = 1 / (1 - Math.exp(most));
  let high = 1 / (1 - Math.exp(least));
  let beta = Math.min(Math.max(0.5, low), high);
  for (let i = 0; i < MAX_ITERATIONS; i += 1) {
    let sum = 0;
    let slope = 0;
    for (let j = 0; j < n; j += 1) {
      const k = Math.expm1(at(lnK, j));
      const term = k / (1 + beta * k);
      sum += at(z, j) * term;
      slope -= at(z, j) * term * term;
    }
    if (sum > 0) low = beta;
    else high = beta;
    const next = beta - sum / slope;
    if (Math.abs(next - beta) < 1e-14 * (1 + Math.abs(beta))) return beta;
    beta = next > low && next < high ? next : (low + high) / 2;
  }
  return Number.isFinite(beta) ? beta : undefined;
}
