/* A bracketed fixed point: the back pressure that a flow makes, where the flow in turn depends on the back pressure. */

export type FixedPoint =
  | { converged: true; value: number; rounds: number }
  | { converged: false; value: number; rounds: number; why: string };

export const CAP = 50;
export const TOLERANCE = 1e-6;

type Bracket = { lo: number; hi: number };

/**
 * Solves x = next(x) inside [lo, hi] by a secant step that falls back to bisection whenever it would leave the bracket.
 * Relative tolerance 1e-6, at most 50 rounds. Never throws: says in a sentence why it did not converge.
 * A `next` that does not depend on x is met at the first round.
 */
export function solveFixedPoint(next: (x: number) => number, start: number, range: Bracket): FixedPoint {
  let bracket: Bracket = { ...range };
  let previous: { x: number; off: number } | undefined;
  let x = Math.min(Math.max(start, range.lo), range.hi);
  for (let round = 1; round <= CAP; round += 1) {
    const reached = next(x);
    if (!Number.isFinite(reached)) {
      return {
        converged: false,
        value: x,
        rounds: round,
        why: 'the back pressure could not be worked at this flow',
      };
    }
    const off = reached - x;
    if (Math.abs(off) <= TOLERANCE * Math.max(Math.abs(x), 1e-12))
      return { converged: true, value: x, rounds: round };
    bracket = off > 0 ? { lo: x, hi: bracket.hi } : { lo: bracket.lo, hi: x };
    if (bracket.hi - bracket.lo <= TOLERANCE * Math.abs(x)) {
      return {
        converged: false,
        value: x,
        rounds: round,
        why: 'the back pressure ended on the edge of its range',
      };
    }
    const guess = previous ? secant(previous, { x, off }) : reached;
    previous = { x, off };
    x = guess > bracket.lo && guess < bracket.hi ? guess : edgeOrMiddle(guess, reached, bracket);
  }
  return {
    converged: false,
    value: x,
    rounds: CAP,
    why: `the back pressure did not settle in ${String(CAP)} rounds`,
  };
}

function secant(a: { x: number; off: number }, b: { x: number; off: number }): number {
  const slope = b.off - a.off;
  return slope === 0 ? Number.NaN : b.x - (b.off * (b.x - a.x)) / slope;
}

function edgeOrMiddle(guess: number, reached: number, bracket: Bracket): number {
  if (guess === reached && reached >= bracket.hi) return bracket.hi;
  if (guess === reached && reached <= bracket.lo) return bracket.lo;
  return (bracket.lo + bracket.hi) / 2;
}
