/* Method f.blocked-in-rise: how fast the pressure of a blocked-in liquid rises as it warms. */
import { type Method } from '../../catalog/types';
import { convert } from '../../quantity';
import { type SheetBuilder, workSheet } from '../../sheet';
import { input, optional, output } from '../common/describe';
import { gaugePressure } from '../common/pressures';

const CLAUSE = 'API 521, hydraulic expansion, pressure of a blocked-in liquid';

/** A closed cylinder of bore D and wall t (one unit), modulus E in Pa, Poisson's ratio: its gain of volume per pressure, 1/Pa. */
export function shellCompliance(D: number, wall: number, modulus: number, poisson: number): number {
  return (D / (wall * modulus)) * (1.25 - poisson);
}

/**
 * Pressure rise in Pa/K: (α_v − 3 α_m)/(χ + shell), cubic expansion of the liquid and linear one of the metal in 1/K,
 * compressibility of the liquid and compliance of the shell in 1/Pa. Source: thin closed cylinder, textbook; API 521 prints it
 * with (D/(2 E t)) (2.5 − 2 μ), which is the same.
 */
export function blockedInRise(alpha: number, metal: number, compressibility: number, shell: number): number {
  return (alpha - 3 * metal) / (compressibility + shell);
}

/** The compliance of the shell in 1/GPa; nought for a rigid wall, which is on the safe side. */
function shellStep(sheet: SheetBuilder): number {
  if (!sheet.has('wall')) {
    sheet.warn(
      'RIGID_WALL',
      'Without wall, bore and modulus the wall is taken as rigid: the pressure rises faster than it would.',
    );
    return sheet.keep('shell', 0, '0');
  }
  const D = sheet.number('D', 'mm', { above: 0 });
  const wall = sheet.number('wall', 'mm', { above: 0 }, 't');
  const E = sheet.number('modulus', 'MPa', { above: 0 }, 'E');
  const poisson = sheet.number('poisson', '-', { min: 0, max: 0.5, fallback: 0.3 }, '\\mu');
  return sheet.step(
    {
      key: 'shell',
      tex: '\\kappa_w',
      meaning: 'gain of volume of the wall with pressure',
      value: 1e9 * shellCompliance(D, wall, E * 1e6, poisson),
      unit: '1/GPa',
      clause: CLAUSE,
      memory: true,
    },
    (v) =>
      `1000 \\cdot \\frac{${v('D')}}{2 \\cdot ${v('modulus')} \\cdot ${v('wall')}} (2.5 - 2 \\cdot ${v('poisson')})`,
  );
}

/** The pressure after warming, and the warming that reaches the limit. */
function reach(sheet: SheetBuilder, rise: number): void {
  if (!sheet.has('p_start')) return;
  const start = gaugePressure(sheet, 'p_start', 'p_0', 'SI');
  if (sheet.has('temperature_rise')) {
    const dT = sheet.number('temperature_rise', 'dK', {}, '\\Delta T');
    const end = sheet.step(
      {
        key: 'p_end',
        tex: 'p_2',
        meaning: 'pressure after warming',
        value: start + rise * dT,
        unit: 'kPa_g',
        clause: CLAUSE,
      },
      (v) => `${v('p_start')} + ${v('slope')} \\cdot ${v('temperature_rise')}`,
    );
    sheet.output('end_pressure', end, 'kPa_g');
  }
  if (!sheet.has('limit') || rise <= 0) return;
  const limit = gaugePressure(sheet, 'limit', 'p_{lim}', 'SI');
  const dT = sheet.step(
    {
      key: 'dTlim',
      tex: '\\Delta T_{lim}',
      meaning: 'warming that reaches the limit',
      value: (limit - start) / rise,
      unit: 'dK',
    },
    (v) => `\\frac{${v('limit')} - ${v('p_start')}}{${v('slope')}}`,
  );
  sheet.output('warming_to_limit', dT, 'dK');
}

/** f.blocked-in-rise: pressure rise of a blocked-in liquid. */
export const BLOCKED_IN_RISE: Method = {
  id: 'f.blocked-in-rise',
  version: 1,
  topic: 'f.blocked-in-rise',
  title: 'Blocked-in liquid: pressure rise with temperature',
  editions: ['API 521, 5th to 7th edition'],
  source:
    'API Standard 521, pressure of blocked-in liquid: (α_v − 3 α_m)/(χ + D (2.5 − 2 μ)/(2 E t)) (as quoted publicly from the 5th edition; printed form from memory)',
  validity:
    'Liquid-full section without a gas pocket, wall as warm as the liquid, thin closed cylinder below yield; α and χ at the temperatures and pressures of the case; no leak.',
  inputs: [
    input('expansion_coefficient', 'cubic expansion coefficient of the liquid', 'cubic-expansion', {
      rangeKey: 'cubicExpansion',
    }),
    input('compressibility', 'isothermal compressibility of the liquid', 'compressibility', {
      rangeKey: 'liquidCompressibility',
    }),
    optional(
      'metal_expansion',
      'linear expansion coefficient of the wall (0, on the safe side, when not given)',
      'cubic-expansion',
      { rangeKey: 'metalExpansion' },
    ),
    optional('D', 'inside diameter', 'length', { rangeKey: 'bore' }),
    optional('wall', 'wall thickness', 'length', { rangeKey: 'wall' }),
    optional('modulus', 'modulus of elasticity of the wall', 'pressure-difference', { rangeKey: 'modulus' }),
    optional('poisson', 'Poisson’s ratio (0.3 when not given)', 'dimensionless', { rangeKey: 'poisson' }),
    optional('p_start', 'pressure at the start', 'pressure-gauge'),
    optional('temperature_rise', 'warming of the liquid', 'temperature-difference', {
      rangeKey: 'temperatureRise',
    }),
    optional('limit', 'pressure not to be passed', 'pressure-gauge'),
    optional('atmospheric_pressure', 'barometric pressure', 'pressure-absolute', { rangeKey: 'barometer' }),
  ],
  outputs: [
    output('rise_per_kelvin', 'pressure rise with temperature', 'pressure-per-temperature'),
    output('end_pressure', 'pressure after warming', 'pressure-gauge'),
    output('warming_to_limit', 'warming that reaches the limit', 'temperature-difference'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const alpha = sheet.number('expansion_coefficient', '1/K', { min: 0 }, '\\alpha_v');
      const chi = sheet.number('compressibility', '1/GPa', { above: 0 }, '\\chi');
      const metal = sheet.number('metal_expansion', '1/K', { min: 0, fallback: 0 }, '\\alpha_m');
      const shell = shellStep(sheet);
      const rise = sheet.step(
        {
          key: 'slope',
          tex: '\\frac{dp}{dT}',
          meaning: 'pressure rise with temperature',
          value: blockedInRise(alpha, metal, chi * 1e-9, shell * 1e-9) / 1000,
          unit: 'kPa/K',
          clause: CLAUSE,
          memory: true,
        },
        (v) =>
          `10^6 \\cdot \\frac{${v('expansion_coefficient')} - 3 \\cdot ${v('metal_expansion')}}{${v('compressibility')} + ${v('shell')}}`,
      );
      if (rise <= 0)
        sheet.warn(
          'NO_RISE',
          'The wall expands as much as the liquid: the pressure does not rise with temperature.',
        );
      const unit = sheet.quantity('expansion_coefficient').unit === '1/degF' ? 'psi/degF' : 'kPa/K';
      sheet.output('rise_per_kelvin', convert({ value: rise, unit: 'kPa/K' }, unit), unit);
      reach(sheet, rise);
    });
  },
};
