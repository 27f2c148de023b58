/* Finding where a function is nought, inside a bracket, with a tolerance and a cap, and saying so when it fails. */

/** What a search found, or why it found nothing. */
export type Root = { ok: true; x: number; iterations: number } | { ok: false; reason: string };

/** Tolerance on x (absolute plus relative) and the greatest number of iterations. */
export type RootOptions = { tolerance?: number; maxIterations?: number };

type Bracket = { a: number; fa: number; b: number; fb: number };

/** A secant step where it stays inside the middle of the bracket, else bisection: cannot leave the bracket. */
function nextGuess({ a, fa, b, fb }: Bracket, slow: boolean): number {
  const middle = a + (b - a) / 2;
  if (slow) return middle;
  const secant = b - (fb * (b - a)) / (fb - fa);
  const inside = secant > Math.min(a, b) && secant < Math.max(a, b);
  return inside ? secant : middle;
}

/**
 * The root of `f` between `lo` and `hi`, whose values must differ in sign. Bisection is forced whenever a step
 * fails to halve the bracket, so the cap of 200 is never met by a continuous function.
 */
export function findRoot(f: (x: number) => number, lo: number, hi: number, options: RootOptions = {}): Root {
  const { tolerance = 1e-12, maxIterations = 200 } = options;
  let bracket: Bracket = { a: lo, fa: f(lo), b: hi, fb: f(hi) };
  if (bracket.fa === 0) return { ok: true, x: lo, iterations: 0 };
  if (bracket.fb === 0) return { ok: true, x: hi, iterations: 0 };
  if (!Number.isFinite(bracket.fa) || !Number.isFinite(bracket.fb))
    return { ok: false, reason: `The function has no value at ${lo} or at ${hi}.` };
  if (Math.sign(bracket.fa) === Math.sign(bracket.fb))
    return { ok: false, reason: `No root lies between ${lo} and ${hi}: the function keeps its sign.` };
  let slow = false;
  for (let iterations = 1; iterations <= maxIterations; iterations += 1) {
    const width = Math.abs(bracket.b - bracket.a);
    if (width <= tolerance * (1 + Math.abs(bracket.b)))
      return { ok: true, x: Math.abs(bracket.fa) < Math.abs(bracket.fb) ? bracket.a : bracket.b, iterations };
    const x = nextGuess(bracket, slow);
    const fx = f(x);
    if (fx === 0) return { ok: true, x, iterations };
    if (!Number.isFinite(fx)) return { ok: false, reason: `The function has no value at ${x}.` };
    const { a, fa, b, fb } = bracket;
    bracket = Math.sign(fx) === Math.sign(fa) ? { a: x, fa: fx, b, fb } : { a, fa, b: x, fb: fx };
    slow = Math.abs(bracket.b - bracket.a) > width / 2;
  }
  return { ok: false, reason: `No root was found in ${maxIterations} iterations; the search was given up.` };
}
