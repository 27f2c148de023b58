/* Method c.backpressure-factor: Kw of balanced valves in liquid service from the curve of the standard. */
import { type Method } from '../../catalog/types';
import { workSheet } from '../../sheet';
import { input, output } from '../common/describe';
import { gaugePressure } from '../common/pressures';
import { SYSTEM_UNITS, systemOf } from '../common/system';
import { balancedKw } from './flow';

/** c.backpressure-factor: Kw of a balanced valve in liquid service. */
export const LIQUID_BACKPRESSURE: Method = {
  id: 'c.backpressure-factor',
  version: 1,
  topic: 'c.backpressure-factor',
  title: 'Back-pressure factor Kw of balanced valves (liquid)',
  editions: ['API 520-1, 7th to 10th edition'],
  source: 'API Standard 520 Part I, figure for Kw, as digitised in the open library CalebBell/fluids',
  validity:
    'Back pressure up to 50 % of set; 1 below 15 %; chart reading 2 %. The maker’s curve takes precedence.',
  inputs: [
    input('set_pressure', 'set pressure', 'pressure-gauge', { rangeKey: 'setPressure' }),
    input('back_pressure', 'total back pressure', 'pressure-gauge'),
  ],
  outputs: [output('Kw', 'back-pressure factor', 'dimensionless')],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const system = systemOf(inputs, ['set_pressure']);
      const set = sheet.number('set_pressure', SYSTEM_UNITS[system].Pg, { above: 0 }, 'p_{set}');
      const back = gaugePressure(sheet, 'back_pressure', 'p_b', system);
      const percent = sheet.step(
        {
          key: 'percent',
          tex: 'b',
          meaning: 'gauge back pressure in percent of set',
          value: (100 * back) / set,
          unit: '%',
        },
        (v) => `100 \\cdot \\frac{${v('back_pressure')}}{${v('set_pressure')}}`,
      );
      const Kw = balancedKw(percent);
      if (Kw === undefined)
        return sheet.refuse(
          'OUTSIDE_CURVE',
          'back_pressure',
          'The curve for Kw reaches from 0 to 50 % back pressure; use the maker’s curve outside of it.',
        );
      sheet.step(
        {
          key: 'Kw',
          tex: 'K_w',
          meaning: 'back-pressure factor read from the curve',
          value: Kw,
          unit: '-',
          clause: 'API 520-1, figure for Kw',
        },
        (v) => `\\text{curve at } ${v('percent')}\\,\\%`,
      );
      sheet.output('Kw', Kw);
    });
  },
};
