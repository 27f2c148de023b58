/* Density of a saturated liquid by the Rackett equation in the form of Spencer and Danner (1972), beside the equation of state. */
import { R } from './cubic/constants';
import { type Mixture } from './cubic/mixture';
import { at } from './cubic/vector';

/**
 * Density of the saturated liquid at T, kg/m³: v = R Σ(x Tc/Pc) Z_RA^(1 + (1 − Tr)^(2/7)), with Z_RA and Tc weighted by
 * mole fraction in a mixture. Undefined above the critical temperature or when a substance has no Z_RA.
 */
export function rackettDensity({ n, z, substances, Tc, Pc, M }: Mixture, T: number): number | undefined {
  let factor = 0;
  let Tcm = 0;
  let scale = 0;
  let mass = 0;
  for (let i = 0; i < n; i += 1) {
    const own = substances[i]?.zra?.[0];
    if (own === undefined) return undefined;
    const share = at(z, i);
    factor += share * own;
    Tcm += share * at(Tc, i);
    scale += (share * at(Tc, i)) / at(Pc, i);
    mass += share * at(M, i);
  }
  if (!(T > 0 && T < Tcm)) return undefined;
  return mass / (R * scale * factor ** (1 + (1 - T / Tcm) ** (2 / 7)));
}
