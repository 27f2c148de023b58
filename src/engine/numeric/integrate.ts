/* Integration by the double-exponential rule, which keeps its accuracy when the integrand bends sharply at an end. */

const STEP = 1 / 16;
const REACH = 3.4;

/** ∫ f over [a, b]; smooth inside, any integrable behaviour at the ends; relative accuracy about 1e-10. */
export function integrate(f: (x: number) => number, a: number, b: number): number {
  if (a === b) return 0;
  const half = (b - a) / 2;
  let sum = 0;
  for (let t = -REACH; t <= REACH + STEP / 2; t += STEP) {
    const inner = (Math.PI / 2) * Math.sinh(t);
    const weight = ((Math.PI / 2) * Math.cosh(t)) / Math.cosh(inner) ** 2;
    const edge = half / (Math.exp(Math.abs(inner)) * Math.cosh(inner));
    const x = inner < 0 ? a + edge : b - edge;
    sum += weight * f(x);
  }
  return sum * half * STEP;
}
