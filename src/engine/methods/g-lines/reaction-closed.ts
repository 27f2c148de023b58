/* Method g.reaction-force-closed: what a closed discharge can put on a leg of its piping while the flow comes up. */
import { type Method } from '../../catalog/types';
import { boreArea } from '../../lines';
import { fromSI } from '../../quantity';
import { workSheet } from '../../sheet';
import { input, optional, output } from '../common/describe';
import { absoluteIn } from '../common/pressures';
import { systemOf } from '../common/system';

/** g.reaction-force-closed: bound of the transient force on one leg; steady forces balance inside a closed system. */
export const REACTION_CLOSED: Method = {
  id: 'g.reaction-force-closed',
  version: 1,
  topic: 'g.reaction-force-closed',
  title: 'Force on a leg of a closed discharge while it opens',
  editions: ['API 520-2, 7th edition'],
  source:
    'API Standard 520 Part II: a closed discharge system has no steady thrust except at sudden enlargements; transient bound from the momentum equation on one leg (common practice, no source)',
  validity:
    'The front of the flow stands inside the leg: its whole momentum and the whole rise of pressure act on one elbow only. An upper bound of one leg; a dynamic analysis gives less. Steady flow leaves no net force on the piping as a whole.',
  inputs: [
    input('W', 'mass flow', 'mass-flow'),
    input('D', 'inside diameter of the leg', 'length', { rangeKey: 'bore' }),
    input('velocity', 'velocity in the leg at steady flow', 'velocity'),
    input('P', 'static pressure in the leg at steady flow', 'pressure-absolute'),
    input('P_before', 'pressure in the leg before the device opens', 'pressure-absolute'),
    optional('atmospheric_pressure', 'barometric pressure', 'pressure-absolute', { rangeKey: 'barometer' }),
  ],
  outputs: [
    output('transient_force', 'greatest force on the leg while the flow comes up', 'force'),
    output('steady_force', 'net force at steady flow', 'force'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const W = sheet.number('W', 'kg/s', { above: 0 });
      const D = sheet.number('D', 'm', { above: 0 });
      const velocity = sheet.number('velocity', 'm/s', { min: 0 }, 'v');
      const P = absoluteIn(sheet, 'P', 'p', 'kPa_abs');
      const before = absoluteIn(sheet, 'P_before', 'p_0', 'kPa_abs');
      const area = sheet.step(
        { key: 'A', meaning: 'cross-section', value: boreArea(D), unit: 'm2' },
        (v) => `\\frac{\\pi}{4} ${v('D')}^2`,
      );
      const newton = W * velocity + area * Math.max(0, P - before) * 1e3;
      const unit = systemOf(inputs, ['W']) === 'US' ? 'lbf' : 'N';
      const factor = fromSI(1, unit).value;
      const force = sheet.step(
        {
          key: 'F',
          meaning: 'greatest force on the leg while the flow comes up',
          value: newton * factor,
          unit,
          clause: 'momentum equation on one leg',
        },
        (v) =>
          `${unit === 'N' ? '' : `${factor.toPrecision(6)} \\left(`}${v('W')} \\cdot ${v('velocity')} + 10^3 \\cdot ${v('A')} \\, \\max(0,\\ ${v('P')} - ${v('P_before')})${unit === 'N' ? '' : '\\right)'}`,
      );
      sheet.output('transient_force', force, unit);
      sheet.output('steady_force', 0, unit);
    });
  },
};
