/* Fluids with exact laws, by which the nozzle is held against closed formulas. */
import {
  type FluidState,
  type PhaseState,
  type PropertySource,
} from '../../../../src/engine/properties/types';

const R = 8314.462618;

/** An ideal gas of constant heat capacity: molar mass kg/kmol, ratio of specific heats. */
export function idealGas(M: number, k: number): PropertySource {
  const r = R / M;
  const cp = (k * r) / (k - 1);
  const atPT = (P: number, T: number): PhaseState => ({
    P,
    T,
    rho: P / (r * T),
    h: cp * T,
    s: cp * Math.log(T) - r * Math.log(P),
    cp,
    cv: cp - r,
    w: Math.sqrt(k * r * T),
  });
  return {
    name: 'ideal gas',
    source: 'exact law',
    M,
    critical: { P: 1, T: 1 },
    pure: true,
    atPT,
    atPx: () => undefined,
    atPH: (P, h) => atPT(P, h / cp),
    atPS: (P, s) => atPT(P, Math.exp((s + r * Math.log(P)) / cp)),
    saturation: () => undefined,
  };
}

/**
 * A fluid on one isentrope (s = 0): an incompressible liquid above the saturation pressure Ps, and below it the omega law
 * v/v_s = ω (Ps/P − 1) + 1. Its enthalpy is the integral of v dP, so that every closed formula of the method holds exactly.
 */
export function omegaFluid(
  omega: number,
  Ps: number,
  vs: number,
): PropertySource & { inlet(P0: number): FluidState } {
  const enthalpy = (P: number): number =>
    P >= Ps ? vs * (P - Ps) : vs * ((1 - omega) * (P - Ps) + omega * Ps * Math.log(P / Ps));
  const volume = (P: number): number => (P >= Ps ? vs : vs * (omega * (Ps / P - 1) + 1));
  const at = (P: number): FluidState => ({ P, T: 300, rho: 1 / volume(P), h: enthalpy(P), s: 0 });
  const phase = (P: number, s: number): PhaseState => ({ ...at(P), s, cp: 2000, cv: 2000, w: 1000 });
  return {
    name: 'omega fluid',
    source: 'exact law',
    M: 50,
    critical: { P: 1e9, T: 1e4 },
    pure: true,
    inlet: (P0) => (P0 > Ps ? at(P0) : { ...at(P0), x: 0 }),
    atPT: (P) => phase(P, 0),
    atPx: (P, x) => ({ ...at(P), x }),
    atPH: () => undefined,
    atPS: (P) => (P > Ps ? at(P) : { ...at(P), x: 1 - P / Ps }),
    // The bubble entropy crosses that of the path at Ps: below it the liquid has more to give than it holds.
    saturation: (P) => ({ liquid: phase(P, (P - Ps) * 1e-3), vapour: phase(P, 1e6) }),
  };
}
