/* From the dimensionless Gibbs free energy γ(π, τ) to properties, for regions 1, 2 and 5: IAPWS R7-97(2012), Table 3. */
import { type PhaseState } from '../properties/types';
import { R } from './constants';
import { type Sums } from './series';

/** γ and its derivatives by π and τ, with the reduced pressure π and the inverse reduced temperature τ. */
export type Gibbs = {
  pi: number;
  tau: number;
  g: number;
  gp: number;
  gpp: number;
  gt: number;
  gtt: number;
  gpt: number;
};

/**
 * The state at P in Pa and T in K by the relations of Table 3, without viscosity. The relations of Tables 12 and 39 for
 * regions 2 and 5 are the same ones written out for γ = γ° + γʳ.
 */
export function stateOfGibbs(P: number, T: number, { pi, tau, g, gp, gpp, gt, gtt, gpt }: Gibbs): PhaseState {
  const RT = R * T;
  const isobaric = tau * tau * gtt;
  const mixed = gp - tau * gpt;
  return {
    P,
    T,
    rho: P / (pi * gp * RT),
    h: RT * tau * gt,
    s: R * (tau * gt - g),
    cp: -R * isobaric,
    cv: R * (-isobaric + (mixed * mixed) / gpp),
    w: Math.sqrt((RT * gp * gp) / ((mixed * mixed) / isobaric - gpp)),
  };
}

/** γ = ln π + Σ n τ^J + Σ n π^I y^J with y = τ − shift, from the sums of both parts: regions 2 and 5. */
export function gibbsOfParts(pi: number, tau: number, shift: number, ideal: Sums, residual: Sums): Gibbs {
  const y = tau - shift;
  return {
    pi,
    tau,
    g: Math.log(pi) + ideal.f + residual.f,
    gp: (1 + residual.x) / pi,
    gpp: (residual.xx - 1) / (pi * pi),
    gt: ideal.y / tau + residual.y / y,
    gtt: ideal.yy / (tau * tau) + residual.yy / (y * y),
    gpt: residual.xy / (pi * y),
  };
}
