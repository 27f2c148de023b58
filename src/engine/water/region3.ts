/* Region 3, around the critical point: the basic equation in density and temperature, and its properties. */
import { type PhaseState } from '../properties/types';
import { CRITICAL, R } from './constants';
import { series } from './series';
import { REGION_3, REGION_3_LOG } from './table-3';

const sum3 = series(REGION_3);

/** φ(δ, τ) and its derivatives by δ and τ, at δ = ρ/ρc and τ = Tc/T. */
export type Helmholtz = {
  delta: number;
  tau: number;
  f: number;
  fd: number;
  fdd: number;
  ft: number;
  ftt: number;
  fdt: number;
};

/** Region 3 by density in kg/m³ and temperature in K: Eq. (28). */
export function helmholtz3(rho: number, T: number): Helmholtz {
  const delta = rho / CRITICAL.rho;
  const tau = CRITICAL.T / T;
  const sum = sum3(delta, tau);
  return {
    delta,
    tau,
    f: REGION_3_LOG * Math.log(delta) + sum.f,
    fd: (REGION_3_LOG + sum.x) / delta,
    fdd: (sum.xx - REGION_3_LOG) / (delta * delta),
    ft: sum.y / tau,
    ftt: sum.yy / (tau * tau),
    fdt: sum.xy / (delta * tau),
  };
}

/** Pressure in Pa at this density and temperature, and its derivative by density at constant temperature. */
export function pressure3(rho: number, T: number): { P: number; slope: number } {
  const { delta, fd, fdd } = helmholtz3(rho, T);
  return { P: rho * R * T * delta * fd, slope: R * T * (2 * delta * fd + delta * delta * fdd) };
}

/**
 * The state by density and temperature by the relations of Table 31, without viscosity. At the critical point itself cp is
 * infinite and the sound speed has no meaning.
 */
export function region3(rho: number, T: number): PhaseState {
  const { delta, tau, f, fd, fdd, ft, ftt, fdt } = helmholtz3(rho, T);
  const RT = R * T;
  const isochoric = tau * tau * ftt;
  const mixed = delta * fd - delta * tau * fdt;
  const stiffness = 2 * delta * fd + delta * delta * fdd;
  return {
    P: rho * RT * delta * fd,
    T,
    rho,
    h: RT * (tau * ft + delta * fd),
    s: R * (tau * ft - f),
    cp: R * (-isochoric + (mixed * mixed) / stiffness),
    cv: -R * isochoric,
    w: Math.sqrt(RT * (stiffness - (mixed * mixed) / isochoric)),
  };
}
