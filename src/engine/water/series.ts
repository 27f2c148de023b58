/* Sums of n·x^I·y^J with their derivatives, by tables of powers: the form of every basic equation of the formulation. */

/** One term: the exponents of x and y, and its coefficient. */
export type Term = readonly [I: number, J: number, n: number];

/**
 * A sum and its derivatives, each multiplied by the powers of x and y that keep it a plain sum:
 * `x` is x·∂f/∂x, `xx` is x²·∂²f/∂x², `xy` is x·y·∂²f/∂x∂y, and so on.
 */
export type Sums = { f: number; x: number; xx: number; y: number; yy: number; xy: number };

/** Fills `powers` with base^(lowest), base^(lowest + 1), …; `lowest` is not above 0 and the list reaches base^0. */
function fillPowers(powers: Float64Array, base: number, lowest: number): void {
  powers[-lowest] = 1;
  let up = 1;
  for (let i = 1 - lowest; i < powers.length; i += 1) powers[i] = up *= base;
  let down = 1;
  const inverse = lowest < 0 ? 1 / base : 0;
  for (let i = -lowest - 1; i >= 0; i -= 1) powers[i] = down *= inverse;
}

/**
 * Turns a table of terms into a function that sums it at (x, y) with all derivatives to second order. Exponents are whole
 * numbers; a base of 0 is allowed only where no exponent of it is negative. The tables of powers are kept between calls,
 * which makes a call about ten times as fast as raising each power.
 */
export function series(terms: readonly Term[]): (x: number, y: number) => Sums {
  const count = terms.length;
  const lowestI = Math.min(0, ...terms.map((t) => t[0]));
  const lowestJ = Math.min(0, ...terms.map((t) => t[1]));
  const xs = new Float64Array(Math.max(0, ...terms.map((t) => t[0])) - lowestI + 1);
  const ys = new Float64Array(Math.max(0, ...terms.map((t) => t[1])) - lowestJ + 1);
  const I = Int32Array.from(terms, (t) => t[0]);
  const J = Int32Array.from(terms, (t) => t[1]);
  const n = Float64Array.from(terms, (t) => t[2]);
  return (x, y) => {
    fillPowers(xs, x, lowestI);
    fillPowers(ys, y, lowestJ);
    let [f, fx, fxx, fy, fyy, fxy] = [0, 0, 0, 0, 0, 0];
    for (let k = 0; k < count; k += 1) {
      const i = I[k] ?? 0;
      const j = J[k] ?? 0;
      const term = (n[k] ?? 0) * (xs[i - lowestI] ?? 0) * (ys[j - lowestJ] ?? 0);
      const byX = i * term;
      const byY = j * term;
      f += term;
      fx += byX;
      fxx += (i - 1) * byX;
      fy += byY;
      fyy += (j - 1) * byY;
      fxy += i * byY;
    }
    return { f, x: fx, xx: fxx, y: fy, yy: fyy, xy: fxy };
  };
}
