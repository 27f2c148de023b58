/* Viscosity of water and steam by the IAPWS formulation of 2008 (IAPWS R12-08), without its critical enhancement. */
import { CRITICAL } from './constants';
import { series, type Term } from './series';

/** Coefficients of the dilute-gas part, Table 1. */
const DILUTE = [1.67752, 2.20462, 0.6366564, -0.241605] as const;

/** Terms of the residual part: exponents of (1/T − 1) and (ρ − 1) in reduced quantities, Table 2. */
const RESIDUAL: readonly Term[] = [
  [0, 0, 0.520094],
  [1, 0, 0.0850895],
  [2, 0, -1.08374],
  [3, 0, -0.289555],
  [0, 1, 0.222531],
  [1, 1, 0.999115],
  [2, 1, 1.88797],
  [3, 1, 1.26613],
  [5, 1, 0.120573],
  [0, 2, -0.281378],
  [1, 2, -0.906851],
  [2, 2, -0.772479],
  [3, 2, -0.489837],
  [4, 2, -0.25704],
  [0, 3, 0.161913],
  [1, 3, 0.257399],
  [0, 4, -0.0325372],
  [3, 4, 0.0698452],
  [4, 5, 0.00872102],
  [3, 6, -0.00435673],
  [5, 6, -0.000593264],
];

const residual = series(RESIDUAL);

/** Temperatures between which the release states its uncertainty at the pressures of this formulation, K. */
const RANGE = { from: 273.15, to: 1173.15 } as const;

/**
 * Dynamic viscosity in Pa·s from density in kg/m³ and temperature in K, Eqs. (10) to (12) with μ₂ = 1, as the release allows
 * for industrial use: only close to the critical point (about 645.91 to 650.77 K and 245.8 to 405.3 kg/m³) would the left-out
 * factor add more than 2 %. Undefined outside of 273.15 to 1173.15 K and where the density is no positive number.
 */
export function viscosity(rho: number, T: number): number | undefined {
  if (!(T >= RANGE.from && T <= RANGE.to && rho > 0 && rho < 2000)) return undefined;
  const t = CRITICAL.T / T;
  const delta = rho / CRITICAL.rho;
  const [a, b, c, d] = DILUTE;
  const dilute = 100 / (Math.sqrt(t) * (a + t * (b + t * (c + t * d))));
  return 1e-6 * dilute * Math.exp(delta * residual(t - 1, delta - 1).f);
}
