/* Method c.viscosity-factor: Kv by the formulas of both editions. */
import { type Method } from '../../catalog/types';
import { workSheet } from '../../sheet';
import { input, output } from '../common/describe';
import { kv10, kv7 } from './flow';

/** c.viscosity-factor: Kv at a Reynolds number. */
export const VISCOSITY_FACTOR: Method = {
  id: 'c.viscosity-factor',
  version: 1,
  topic: 'c.viscosity-factor',
  title: 'Viscosity factor Kv',
  editions: ['API 520-1, 7th to 9th edition', 'API 520-1, 10th edition'],
  source: 'API Standard 520 Part I, both Kv formulas read in the open library CalebBell/fluids',
  validity: '7th to 9th edition capped at 1; 10th edition for Re above 80.',
  inputs: [input('Re', 'Reynolds number at the selected orifice', 'dimensionless')],
  outputs: [
    output('Kv_7th_to_9th_ed', 'viscosity factor, 7th to 9th editions', 'dimensionless'),
    output('Kv_10th_ed', 'viscosity factor, 10th edition', 'dimensionless'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const Re = sheet.number('Re', '-', { above: 0 });
      const seventh = sheet.step(
        {
          key: 'Kv7',
          tex: 'K_v',
          meaning: 'viscosity factor, 7th to 9th editions, not above 1',
          value: kv7(Re),
          unit: '-',
          clause: 'API 520-1, 7th to 9th edition, Kv',
        },
        (v) =>
          `\\min\\left(1, \\left(0.9935 + \\frac{2.878}{${v('Re')}^{0.5}} + \\frac{342.75}{${v('Re')}^{1.5}}\\right)^{-1}\\right)`,
      );
      const tenth = sheet.step(
        {
          key: 'Kv10',
          tex: 'K_v',
          meaning: 'viscosity factor, 10th edition',
          value: kv10(Re),
          unit: '-',
          clause: 'API 520-1, 10th edition, Kv',
        },
        (v) => `\\left(1 + \\frac{170}{${v('Re')}}\\right)^{-0.5}`,
      );
      if (Re < 80)
        sheet.warn(
          'RE_BELOW_RANGE',
          'The 10th edition formula for Kv is meant for Re above 80.',
          'Re above 80',
        );
      sheet.output('Kv_7th_to_9th_ed', seventh);
      sheet.output('Kv_10th_ed', tenth);
    });
  },
};
