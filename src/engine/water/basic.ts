/* The basic equations of regions 1, 2 and 5 as functions of pressure in Pa and temperature in K. */
import { type PhaseState } from '../properties/types';
import { type Gibbs, gibbsOfParts, stateOfGibbs } from './gibbs';
import { series } from './series';
import { REGION_1 } from './table-1';
import { REGION_2_IDEAL, REGION_2_RESIDUAL } from './table-2';
import { REGION_5_IDEAL, REGION_5_RESIDUAL } from './table-5';

const sum1 = series(REGION_1);
const ideal2 = series(REGION_2_IDEAL);
const residual2 = series(REGION_2_RESIDUAL);
const ideal5 = series(REGION_5_IDEAL);
const residual5 = series(REGION_5_RESIDUAL);

/** Reducing quantities p* (Pa) and T* (K) of the regions with a Gibbs equation. */
export const REDUCING = {
  1: { P: 16.53e6, T: 1386 },
  2: { P: 1e6, T: 540 },
  5: { P: 1e6, T: 1000 },
} as const;

/** Region 1, liquid: γ(π, τ) by Eq. (7), which holds from 273.15 to 623.15 K and from saturation to 100 MPa. */
export function gibbs1(P: number, T: number): Gibbs {
  const pi = P / REDUCING[1].P;
  const tau = REDUCING[1].T / T;
  const x = 7.1 - pi;
  const y = tau - 1.222;
  const sum = sum1(x, y);
  return {
    pi,
    tau,
    g: sum.f,
    gp: -sum.x / x,
    gpp: sum.xx / (x * x),
    gt: sum.y / y,
    gtt: sum.yy / (y * y),
    gpt: -sum.xy / (x * y),
  };
}

/** Region 2, steam to 1073.15 K: γ(π, τ) by Eqs. (15) to (17). */
export function gibbs2(P: number, T: number): Gibbs {
  const pi = P / REDUCING[2].P;
  const tau = REDUCING[2].T / T;
  return gibbsOfParts(pi, tau, 0.5, ideal2(1, tau), residual2(pi, tau - 0.5));
}

/** Region 5, steam from 1073.15 to 2273.15 K, to 50 MPa: γ(π, τ) by Eqs. (32) to (34). */
export function gibbs5(P: number, T: number): Gibbs {
  const pi = P / REDUCING[5].P;
  const tau = REDUCING[5].T / T;
  return gibbsOfParts(pi, tau, 0, ideal5(1, tau), residual5(pi, tau));
}

/** The liquid of region 1 at P and T. */
export function region1(P: number, T: number): PhaseState {
  return stateOfGibbs(P, T, gibbs1(P, T));
}

/** The steam of region 2 at P and T. */
export function region2(P: number, T: number): PhaseState {
  return stateOfGibbs(P, T, gibbs2(P, T));
}

/** The steam of region 5 at P and T. */
export function region5(P: number, T: number): PhaseState {
  return stateOfGibbs(P, T, gibbs5(P, T));
}
