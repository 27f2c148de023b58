/* Bare arithmetic of the omega method for two-phase and flashing flow: critical pressure ratio, mass flux, both regimes. */

/**
 * The omega equation of state v/v0 = ω (P0/P − 1) + 1 put into the isentropic homogeneous nozzle: Leung, AIChE J. 32 (1986)
 * 1743, and API 520-1 Annex C (Annex D of the 7th edition). Pressures Pa absolute, volumes m³/kg, fluxes kg/(m²·s).
 */
export type OmegaFlow = {
  flux: number;
  /** Critical pressure over inlet pressure. */
  ratio: number;
  critical: boolean;
};

/** ln η + 1 − η without loss of figures near η = 1. */
function logGap(eta: number): number {
  const gap = 1 - eta;
  if (gap > 0.02) return Math.log(eta) + gap;
  let term = -gap * gap;
  let sum = term / 2;
  for (let n = 3; n <= 9; n += 1) {
    term *= gap;
    sum += term / n;
  }
  return sum;
}

/** η² + (ω² − 2ω)(1 − η)² + 2ω² (ln η + 1 − η): rises with η, nought at the critical ratio. */
function residual(omega: number, eta: number): number {
  const gap = 1 - eta;
  return eta * eta + omega * (omega - 2) * gap * gap + 2 * omega * omega * logGap(eta);
}

function slope(omega: number, eta: number): number {
  const gap = 1 - eta;
  return (2 * omega * omega * gap * gap) / eta + 4 * omega * gap + 2 * eta;
}

/** A starting value: the explicit fit where it holds, the limits of small and of large omega elsewhere. */
function firstRatio(omega: number): number {
  if (omega < 0.5) return Math.sqrt(2 * omega) / (1 + Math.sqrt(2 * omega));
  if (omega > 100) return Math.max(0.5, 1 - Math.cbrt(1.5 / (omega * omega)));
  return omegaRatioFit(omega);
}

/**
 * The critical pressure ratio η_c, the root of η² + (ω² − 2ω)(1 − η)² + 2ω² ln η + 2ω² (1 − η) = 0; 0 at ω = 0, 1/√e at
 * ω = 1. ω ≥ 0. Newton steps held inside a bracket, at most 60.
 */
export function omegaRatio(omega: number): number {
  if (!(omega > 0)) return 0;
  let lo = 0;
  let hi = 1;
  let eta = firstRatio(omega);
  for (let i = 0; i < 60; i += 1) {
    const f = residual(omega, eta);
    if (f > 0) hi = eta;
    else lo = eta;
    const next = eta - f / slope(omega, eta);
    const inside = next > lo && next < hi ? next : (lo + hi) / 2;
    const step = Math.abs(inside - eta);
    eta = inside;
    if (step <= 1e-9 * eta) break;
  }
  return eta;
}

/** The explicit fit of the critical pressure ratio that API 520-1 prints (from memory), good to 3·10⁻⁴ for ω from 0.5 to 100. */
export function omegaRatioFit(omega: number): number {
  const base = 1 + (1.0446 - 0.0093431 * Math.sqrt(omega)) * omega ** -0.56261;
  return base ** (-0.70356 + 0.014685 * Math.log(omega));
}

/**
 * Mass flux over √(P0/v0) at the throat pressure ratio η, for an inlet that is saturated or two-phase.
 * With ω = 1 it is that of an isothermal gas, with ω = 0 that of a liquid that does not flash. 0 < η ≤ 1.
 */
export function omegaShape(omega: number, eta: number): number {
  const work = 1 - eta - omega * logGap(eta);
  return Math.sqrt(2 * work) / (omega * (1 / eta - 1) + 1);
}

/** Mass flux of a saturated or two-phase inlet; `ratio` as found by the caller. */
export function omegaFluxAt(omega: number, P0: number, v0: number, Pb: number, ratio: number): OmegaFlow {
  const back = Math.max(0, Pb / P0);
  const critical = back <= ratio;
  const eta = critical ? ratio : back;
  const flux = back >= 1 ? 0 : omegaShape(omega, eta) * Math.sqrt(P0 / v0);
  return { flux, ratio, critical };
}

/** Mass flux of a saturated or two-phase inlet against a back pressure. P0, Pb in Pa, v0 in m³/kg, ω ≥ 0. */
export function omegaFlux(omega: number, P0: number, v0: number, Pb: number): OmegaFlow {
  return omegaFluxAt(omega, P0, v0, Pb, omegaRatio(omega));
}

/** A liquid that is subcooled at the inlet: density kg/m³, saturation pressure Ps at the inlet temperature, ω_s. */
export type SubcooledInlet = { P0: number; rho0: number; Ps: number; omegaS: number };

/** The flux of a subcooled inlet, and whether it flashes ahead of the throat (low) or at it or not at all (high). */
export type SubcooledFlow = OmegaFlow & { low: boolean };

/** The saturation pressure over inlet pressure between low and high subcooling, 2ω_s/(1 + 2ω_s). */
export function transitionRatio(omegaS: number): number {
  return (2 * omegaS) / (1 + 2 * omegaS);
}

/**
 * The critical ratio of low subcooling, the root of [(ω + 1/ω − 2)/(2η_s)] η² − 2(ω − 1) η + ω η_s ln(η/η_s) + 1.5 ω η_s − 1 = 0;
 * the left side never falls with η. η_s from 2ω/(1 + 2ω) to 1, where it meets the ratio of a saturated inlet.
 */
export function lowSubcoolingRatio(omegaS: number, etaS: number): number {
  const w = omegaS;
  const front = (w + 1 / w - 2) / (2 * etaS);
  const f = (eta: number) =>
    front * eta * eta - 2 * (w - 1) * eta + w * etaS * Math.log(eta / etaS) + 1.5 * w * etaS - 1;
  let lo = 0;
  let hi = etaS;
  let eta = etaS * firstRatio(w);
  for (let i = 0; i < 100; i += 1) {
    const value = f(eta);
    if (value > 0) hi = eta;
    else lo = eta;
    const rise = 2 * front * eta - 2 * (w - 1) + (w * etaS) / eta;
    const next = eta - value / rise;
    const inside = next > lo && next < hi ? next : (lo + hi) / 2;
    const step = Math.abs(inside - eta);
    eta = inside;
    if (step <= 1e-9 * eta) break;
  }
  return eta;
}

/** Mass flux over √(P0 ρ0) at the throat ratio η of an inlet whose saturation ratio is η_s: all liquid down to η_s. */
export function subcooledShape(omegaS: number, etaS: number, eta: number): number {
  if (eta >= etaS) return Math.sqrt(2 * (1 - eta));
  const below = eta / etaS;
  const flash = etaS * (1 - below - omegaS * logGap(below));
  return Math.sqrt(2 * (1 - etaS + flash)) / (omegaS * (etaS / eta - 1) + 1);
}

/** Mass flux of a liquid subcooled at the inlet, against a back pressure in Pa. Ps ≤ P0, ω_s > 0. */
export function subcooledFlux(inlet: SubcooledInlet, Pb: number): SubcooledFlow {
  const { P0, rho0, Ps, omegaS } = inlet;
  const etaS = Ps / P0;
  const low = etaS > transitionRatio(omegaS);
  const ratio = low ? lowSubcoolingRatio(omegaS, etaS) : etaS;
  const back = Math.max(0, Pb / P0);
  const critical = back <= ratio;
  const eta = critical ? ratio : back;
  const flux = back >= 1 ? 0 : subcooledShape(omegaS, etaS, eta) * Math.sqrt(P0 * rho0);
  return { flux, ratio, critical, low };
}
