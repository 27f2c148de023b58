/* From a phase of the cubic equation to the state of a kilogram, with the translation of volume. */
import { type PhaseState } from '../../properties/types';
import { phaseViscosity } from '../viscosity';
import { P_REFERENCE, R } from './constants';
import { type Mixture } from './mixture';
import { type Phase, pressureSlopes } from './phase';
import { type Thermal } from './thermal';
import { at, dot } from './vector';

/** Enthalpy, entropy, volume per kmol of a phase, and what else a flash balances. */
export type Molar = { h: number; s: number; v: number; M: number };

/** J/kmol, J/(kmol·K), m³/kmol and kg/kmol of a phase, volume translated (which moves h by −cP and leaves s). */
export function molar(m: Mixture, t: Thermal, phase: Phase): Molar {
  const { x } = phase;
  const c = dot(x, m.c, m.n);
  let mixing = 0;
  for (let i = 0; i < m.n; i += 1) {
    const xi = at(x, i);
    if (xi > 0) mixing -= xi * Math.log(xi);
  }
  const h = R * dot(x, t.h, m.n) + phase.hRes - c * phase.P;
  const s = R * (dot(x, t.s, m.n) + mixing - Math.log(phase.P / P_REFERENCE)) + phase.sRes;
  return { h, s, v: phase.V - c, M: dot(x, m.M, m.n) };
}

/** Heat capacities of a phase, J/(kmol·K). */
export function heatCapacities(m: Mixture, t: Thermal, phase: Phase): { cp: number; cv: number } {
  const { T, a2, b, log } = phase;
  const { PT, PV } = pressureSlopes(phase);
  const cv = R * (dot(phase.x, t.cp, m.n) - 1) + ((T * a2) / (2 * Math.SQRT2 * b)) * log;
  return { cv, cp: cv - (T * PT * PT) / PV };
}

/** The state of a kilogram; undefined where the phase is not mechanically stable or has no physical heat capacity. */
export function phaseState(m: Mixture, t: Thermal, phase: Phase): PhaseState | undefined {
  const { h, s, v, M } = molar(m, t, phase);
  const { cp, cv } = heatCapacities(m, t, phase);
  const { PV } = pressureSlopes(phase);
  if (!(PV < 0 && cv > 0 && cp > 0 && v > 0)) return undefined;
  const w = Math.sqrt((-v * v * PV * (cp / cv)) / M);
  const rho = M / v;
  const mu = phaseViscosity(m, phase);
  const state = { P: phase.P, T: phase.T, rho, h: h / M, s: s / M, cp: cp / M, cv: cv / M, w };
  if (!Object.values(state).every(Number.isFinite)) return undefined;
  return mu === undefined ? state : { ...state, mu };
}
