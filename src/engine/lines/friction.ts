/* Darcy friction factor of round pipes: laminar, Colebrook–White, and a straight blend between them. */

/** Below this Reynolds number flow is taken as laminar, above the second one as turbulent (common practice). */
export const LAMINAR_UP_TO = 2300;
/** From this Reynolds number on the Colebrook–White equation stands alone (common practice). */
export const TURBULENT_FROM = 4000;

/** Reynolds number 4 W/(π D μ); W kg/s, D m, mu Pa·s, all positive. */
export function reynolds(W: number, D: number, mu: number): number {
  return (4 * W) / (Math.PI * D * mu);
}

/**
 * Colebrook–White by Newton's method on x = 1/√f, to the last digits of a double in at most six steps.
 * @param Re Reynolds number, > 0
 * @param relative roughness over bore, 0 ≤ relative < 1
 */
export function colebrook(Re: number, relative: number): number {
  const a = relative / 3.7;
  const b = 2.51 / Re;
  let x = -1.8 * Math.log10(a ** 1.11 + 6.9 / Re);
  if (!(x > 0.5)) x = 0.5;
  for (let round = 0; round < 6; round += 1) {
    const inside = a + b * x;
    const off = x + 2 * Math.log10(inside);
    const step = off / (1 + (2 / Math.LN10) * (b / inside));
    x -= step;
    if (!(x > 1e-3)) x = 1e-3;
    if (Math.abs(step) <= 1e-13 * x) break;
  }
  return 1 / x ** 2;
}

/**
 * Darcy friction factor: 64/Re up to Re 2 300, Colebrook–White from 4 000, a straight line between the two ends so that
 * the loss never falls when the flow rises. Source: textbook (Colebrook 1939); the blend is common practice, no source.
 */
export function frictionFactor(Re: number, relative: number): number {
  if (Re <= LAMINAR_UP_TO) return 64 / Re;
  if (Re >= TURBULENT_FROM) return colebrook(Re, relative);
  const low = 64 / LAMINAR_UP_TO;
  const share = (Re - LAMINAR_UP_TO) / (TURBULENT_FROM - LAMINAR_UP_TO);
  return low + share * (colebrook(TURBULENT_FROM, relative) - low);
}
