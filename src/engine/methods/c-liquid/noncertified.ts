/* Method c.liquid-noncertified: liquid relief through valves that need no capacity certification. */
import { type Method } from '../../catalog/types';
import { type SheetBuilder, workSheet } from '../../sheet';
import { input, optional, output } from '../common/describe';
import { letterStep } from '../common/letter-step';
import { SYSTEM_UNITS, type System, systemOf } from '../common/system';
import { nonCertifiedArea } from './flow';
import { readFlow } from './read-flow';

const CLAUSE = 'API 520-1, sizing for liquid relief, valves not requiring capacity certification';

type Flow = Parameters<typeof nonCertifiedArea>[0];

/** The coefficient and the correction factors. */
function readFactors(sheet: SheetBuilder): Pick<Flow, 'Kd' | 'Kw' | 'Kc' | 'Kv' | 'Kp'> {
  const share = { above: 0, max: 1 };
  return {
    Kp: sheet.number('Kp', '-', share, 'K_p'),
    Kd: sheet.number('Kd', '-', { ...share, fallback: 0.62 }, 'K_d'),
    Kw: sheet.number('Kw', '-', { ...share, fallback: 1 }, 'K_w'),
    Kc: sheet.number('Kc', '-', { ...share, fallback: 1 }, 'K_c'),
    Kv: sheet.number('Kv', '-', { ...share, fallback: 1 }, 'K_v'),
  };
}

function areaStep(sheet: SheetBuilder, flow: Flow, system: System): number {
  const value = nonCertifiedArea(flow, system);
  const unit = SYSTEM_UNITS[system].A;
  return sheet.step(
    { key: 'A', meaning: 'required effective area', value, unit, clause: CLAUSE, memory: true },
    (v) => {
      const factors = ['Kd', 'Kw', 'Kc', 'Kv', 'Kp'].map(v).join(' \\cdot ');
      const front =
        system === 'SI'
          ? `\\frac{11.78 \\cdot ${v('Q')}}{${factors}}`
          : `\\frac{${v('Q')}}{38 \\cdot ${factors}}`;
      return `${front} \\sqrt{\\frac{${v('G')}}{1.25 \\cdot ${v('set_pressure')} - ${v('back_pressure')}}}`;
    },
  );
}

/** c.liquid-noncertified: the older liquid equation with 25 % overpressure basis and Kp. */
export const LIQUID_NONCERTIFIED: Method = {
  id: 'c.liquid-noncertified',
  version: 1,
  topic: 'c.liquid-noncertified',
  title: 'Liquid: required area, valves without capacity certification',
  editions: ['API 520-1, 7th to 9th edition'],
  source: 'API Standard 520 Part I, 7th to 9th edition 5.9 (from memory)',
  validity:
    'Valves without capacity certification; p is the SET pressure; Kp from the standard’s figure (1.0 at 25 % overpressure, 0.60 at 10 %, from memory).',
  inputs: [
    optional('Q', 'required volume flow at the inlet (or give W and rho)', 'volume-flow'),
    optional('W', 'required relief load', 'mass-flow', { rangeKey: 'reliefLoad' }),
    optional('rho', 'liquid density', 'density', { rangeKey: 'liquidDensity' }),
    optional('G', 'relative density to water (or give rho)', 'dimensionless'),
    input('set_pressure', 'set pressure', 'pressure-gauge', { rangeKey: 'setPressure' }),
    optional('back_pressure', 'total back pressure, gauge', 'pressure-gauge'),
    input('Kp', 'overpressure factor from the figure', 'dimensionless'),
    optional('Kd', 'effective coefficient of discharge (0.62 when not given)', 'dimensionless', {
      rangeKey: 'kdLiquid',
    }),
    optional('Kw', 'back-pressure factor (1 when not given)', 'dimensionless', { rangeKey: 'kw' }),
    optional('Kc', 'combination factor (1 when not given)', 'dimensionless', { rangeKey: 'kc' }),
    optional('Kv', 'viscosity factor (1 when not given)', 'dimensionless', { rangeKey: 'kv' }),
  ],
  outputs: [
    output('Q', 'volume flow, when W and rho were given', 'volume-flow'),
    output('A_required', 'required effective area', 'area'),
    output('orifice_letter', 'smallest sufficient letter'),
    output('orifice_effective_area', 'its effective area', 'area'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const system = systemOf(inputs, ['Q', 'W', 'set_pressure']);
      const { Q, G } = readFlow(sheet, system);
      const set = sheet.number('set_pressure', SYSTEM_UNITS[system].Pg, { above: 0 }, 'p');
      const back = sheet.number('back_pressure', SYSTEM_UNITS[system].Pg, { fallback: 0 }, 'p_b');
      if (back >= 1.25 * set)
        sheet.refuse(
          'NO_FLOW',
          'back_pressure',
          'The back pressure is not below 1.25 times the set pressure: nothing can flow.',
        );
      const area = areaStep(sheet, { Q, G, set, back, ...readFactors(sheet) }, system);
      sheet.output('A_required', area, SYSTEM_UNITS[system].A);
      letterStep(sheet, area, system);
    });
  },
};
