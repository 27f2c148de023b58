/* The figures of a property sheet: what may be given of one's own, and what the sheet answers. */
import { type MethodInput, type MethodOutput } from '../../catalog/types';
import { optional, output } from '../common/describe';
import { type Figure } from './fluid';

/** The figures that may come from the library or from the user. */
export const FIGURES = {
  M: { name: 'M', meaning: 'molar mass', tex: 'M', unit: 'kg/kmol' },
  density: { name: 'density', meaning: 'density', tex: '\\rho', unit: 'kg/m3' },
  Z: { name: 'Z', meaning: 'compressibility factor', tex: 'Z', unit: '-' },
  k: { name: 'k', meaning: 'ideal-gas ratio of specific heats', tex: 'k', unit: '-' },
  n: { name: 'isentropic_exponent', meaning: 'isentropic exponent', tex: 'n', unit: '-' },
  w: { name: 'sonic_velocity', meaning: 'speed of sound', tex: 'w', unit: 'm/s' },
  mu: { name: 'mu', meaning: 'viscosity', tex: '\\mu', unit: 'cP' },
} as const satisfies Record<string, Figure>;

/** The user's own figures, as from a simulation. */
export const OWN_INPUTS: readonly MethodInput[] = [
  optional('own_M', 'own molar mass', 'molar-mass', { rangeKey: 'molarMass' }),
  optional('own_density', 'own density at relief', 'density'),
  optional('own_Z', 'own compressibility factor', 'dimensionless', { rangeKey: 'z' }),
  optional('own_k', 'own ideal-gas ratio of specific heats', 'dimensionless', { rangeKey: 'kIdeal' }),
  optional('own_isentropic_exponent', 'own isentropic exponent', 'dimensionless', {
    rangeKey: 'isentropicExponent',
  }),
  optional('own_sonic_velocity', 'own speed of sound', 'velocity'),
  optional('own_mu', 'own viscosity', 'viscosity'),
];

/** What p.fluid-properties answers. */
export const PROPERTY_OUTPUTS: readonly MethodOutput[] = [
  output('P1', 'pressure, absolute', 'pressure-absolute'),
  output('source', 'where the governing figures come from'),
  output('phase', 'what stands at this pressure and temperature'),
  output('M', 'molar mass', 'molar-mass'),
  output('density', 'density', 'density'),
  output('Z', 'compressibility factor', 'dimensionless'),
  output('k', 'ideal-gas ratio of specific heats at this temperature', 'dimensionless'),
  output('cp', 'real heat capacity at constant pressure', 'heat-capacity'),
  output('cv', 'real heat capacity at constant volume', 'heat-capacity'),
  output('cp_over_cv', 'ratio of real specific heats', 'dimensionless'),
  output('isentropic_exponent', 'isentropic exponent of the real fluid', 'dimensionless'),
  output('sonic_velocity', 'speed of sound', 'velocity'),
  output('mu', 'viscosity', 'viscosity'),
  output('density_rackett', 'density of the saturated liquid by the Rackett equation', 'density'),
  output('expansion_coefficient', 'cubic expansion coefficient of the liquid', 'cubic-expansion'),
  output('compressibility', 'isothermal compressibility of the liquid', 'compressibility'),
  output('vapour_fraction', 'vapour fraction by mass of two phases', 'dimensionless'),
  output('density_liquid', 'density of the liquid of two phases', 'density'),
  output('density_vapour', 'density of the vapour of two phases', 'density'),
  output(
    'enthalpy',
    'enthalpy (ideal gas at 298.15 K is nought; of water, the liquid at its triple point)',
    'specific-energy',
  ),
  output(
    'entropy',
    'entropy (ideal gas at 298.15 K and 1 bar is nought; of water, the liquid at its triple point)',
    'heat-capacity',
  ),
];
