/* Density in region 3 at a pressure and a temperature: the basic equation inverted by bounded Newton steps. */
import { CRITICAL, R } from './constants';
import { pressure3 } from './region3';

/** No density of region 3 reaches this, kg/m³: at 623.15 K and 100 MPa it is 765. */
const DENSEST = 800;
const MOST_STEPS = 80;
const CLOSE = 1e-13;

/** One Newton step from a density of a neighbouring state, onto the outer side of the root; undefined where it misleads. */
function outerStart(P: number, T: number, near: number, vapour: boolean): number | undefined {
  const at = pressure3(near, T);
  const next = near + (P - at.P) / at.slope;
  const fits = vapour ? near < CRITICAL.rho && next > 0 : near > CRITICAL.rho && next < DENSEST;
  return at.slope > 0 && fits ? next : undefined;
}

/**
 * Newton steps from a density outside of the root towards it. Below the critical temperature the isotherm is convex on the
 * liquid side and concave on the vapour side up to its turning point, so the steps come closer from one side and never pass
 * the root. Should rounding next to the critical point hide the root, the last density before the turn is taken.
 */
function approach(P: number, T: number, start: number, vapour: boolean): number {
  let rho = start;
  for (let step = 0; step < MOST_STEPS; step += 1) {
    const at = pressure3(rho, T);
    const next = rho + (P - at.P) / at.slope;
    const inward = vapour ? next > rho && next < CRITICAL.rho : next < rho && next > CRITICAL.rho;
    if (!(at.slope > 0) || !inward) return rho;
    if (Math.abs(next - rho) <= CLOSE * rho) return next;
    rho = next;
  }
  return rho;
}

/** Above the critical temperature pressure rises with density throughout: Newton steps kept inside a bracket. */
function bracketed(P: number, T: number, start: number): number {
  let lo = P / (2 * R * T);
  let hi = DENSEST;
  let rho = start;
  for (let step = 0; step < MOST_STEPS; step += 1) {
    const at = pressure3(rho, T);
    if (at.P < P) lo = rho;
    else hi = rho;
    const newton = rho + (P - at.P) / at.slope;
    if (Math.abs(newton - rho) <= CLOSE * rho) return newton;
    const useful = newton > lo && newton < hi && step % 8 !== 7;
    rho = useful ? newton : (lo + hi) / 2;
  }
  return rho;
}

/**
 * Density in kg/m³ at P in Pa and T in K inside region 3. Below the critical temperature `vapour` says on which side of
 * saturation; `near`, the density of a neighbouring state, shortens the search and does not change what is found.
 */
export function density3(P: number, T: number, vapour: boolean, near?: number): number {
  const thin = P / (R * T);
  if (T < CRITICAL.T) {
    const start = near === undefined ? undefined : outerStart(P, T, near, vapour);
    return approach(P, T, start ?? (vapour ? thin : DENSEST), vapour);
  }
  if (P === CRITICAL.P && T === CRITICAL.T) return CRITICAL.rho;
  return bracketed(P, T, near ?? (pressure3(CRITICAL.rho, T).P > P ? thin : CRITICAL.rho * 1.5));
}
