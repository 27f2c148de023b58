/* The two unit systems in which the standards print their equations, and which one a sheet follows. */
import { type Inputs } from '../../sheet';

/** SI as the standards write it (kg/h, kPa, mm²), or US customary. */
export type System = 'SI' | 'US';

/** The units of a system's printed equations. */
export type SystemUnits = {
  W: string;
  P: string;
  Pg: string;
  dP: string;
  T: string;
  M: string;
  A: string;
  Q: string;
  C: string;
  L: string;
  area: string;
  heat: string;
  latent: string;
};

/** Units by system. */
export const SYSTEM_UNITS: Record<System, SystemUnits> = {
  SI: {
    W: 'kg/h',
    P: 'kPa_abs',
    Pg: 'kPa_g',
    dP: 'kPa',
    T: 'K',
    M: 'kg/kmol',
    A: 'mm2',
    Q: 'L/min',
    C: 'sqrt(kg*kmol*K)/(mm2*h*kPa)',
    L: 'm',
    area: 'm2',
    heat: 'W',
    latent: 'kJ/kg',
  },
  US: {
    W: 'lb/h',
    P: 'psia',
    Pg: 'psig',
    dP: 'psi',
    T: 'degR',
    M: 'lb/lbmol',
    A: 'in2',
    Q: 'US gpm',
    C: 'sqrt(lb*lbmol*degR)/(lbf*h)',
    L: 'ft',
    area: 'ft2',
    heat: 'Btu/h',
    latent: 'Btu/lb',
  },
};

const CUSTOMARY = /^(lb|psi|US|in|ft|Btu|MMBtu|degF|degR|dF|1\/degF)/;

/** The system of a sheet: that of the first named input that was given with a unit; SI when none was. */
export function systemOf(inputs: Inputs, names: readonly string[]): System {
  for (const name of names) {
    const given = inputs[name];
    if (typeof given === 'object' && given.unit !== '-') return CUSTOMARY.test(given.unit) ? 'US' : 'SI';
  }
  return 'SI';
}
