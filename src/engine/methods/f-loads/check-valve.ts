/* Method f.check-valve-reverse-flow: leaking check valves as one orifice of a share of the nominal diameter. */
import { type Method } from '../../catalog/types';
import { workSheet } from '../../sheet';
import { input, optional, output } from '../common/describe';
import { fluxSteps, HIGH_SIDE_INPUTS, loadOutput, PHASES } from './orifice';
import { openEnd } from './tube-rupture';

/** f.check-valve-reverse-flow: reverse flow through leaking check valves. */
export const CHECK_VALVE: Method = {
  id: 'f.check-valve-reverse-flow',
  version: 1,
  topic: 'f.check-valve-reverse-flow',
  title: 'Reverse flow through leaking check valves',
  editions: ['API 521, 5th to 7th edition'],
  source:
    'API Standard 521, check valves in series as one orifice of one tenth of the largest nominal diameter (from memory)',
  validity:
    'Two or more check valves in series that are looked after; a single one is taken as fully open. Cd is an input.',
  inputs: [
    input('check_valve_nominal_diameter', 'nominal diameter of the largest check valve', 'length', {
      rangeKey: 'nominalSize',
    }),
    optional('leak_share', 'share of the diameter that leaks (0.1 when not given)', 'dimensionless', {
      rangeKey: 'checkLeak',
    }),
    input('Cd', 'coefficient of the leak', 'dimensionless', { rangeKey: 'orificeCd' }),
    ...HIGH_SIDE_INPUTS,
  ],
  outputs: [
    output('equivalent_orifice_diameter', 'diameter of the orifice', 'length'),
    output('choked', 'whether the gas is choked'),
    output('reverse_flow', 'reverse flow', 'mass-flow'),
    output('relief_load', 'reverse flow as the relief load', 'mass-flow'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const nominal = sheet.number('check_valve_nominal_diameter', 'mm', { above: 0 }, 'D_n');
      const share = sheet.number('leak_share', '-', { above: 0, max: 1, fallback: 0.1 }, 's');
      const Cd = sheet.number('Cd', '-', { above: 0, max: 1 }, 'C_d');
      const d = sheet.step(
        {
          key: 'd',
          meaning: 'diameter of the equivalent orifice',
          value: nominal * share,
          unit: 'mm',
          clause: 'API 521, check valves',
          memory: true,
        },
        (v) => `${v('leak_share')} \\cdot ${v('check_valve_nominal_diameter')}`,
      );
      const flux = fluxSteps(sheet, sheet.word('phase', PHASES, 'liquid'));
      const W = sheet.step(
        { key: 'W', meaning: 'reverse flow', value: openEnd(Cd, d / 1000, flux), unit: 'kg/h' },
        (v) =>
          `3600 \\cdot ${v('Cd')} \\cdot \\frac{\\pi}{4} \\left(\\frac{${v('d')}}{1000}\\right)^2 \\cdot ${v('G')}`,
      );
      sheet.output('equivalent_orifice_diameter', d, 'mm');
      loadOutput(sheet, 'reverse_flow', W);
      loadOutput(sheet, 'relief_load', W);
    });
  },
};
