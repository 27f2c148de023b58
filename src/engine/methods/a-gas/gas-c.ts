/* Method a.gas-C: the coefficient C of the ratio of specific heats, in both unit systems. */
import { type Method } from '../../catalog/types';
import { workSheet } from '../../sheet';
import { input, output } from '../common/describe';
import { SYSTEM_UNITS, type System } from '../common/system';
import { gasC, GAS_FORMS } from './flow';

/** a.gas-C: C as a function of k. */
export const GAS_C: Method = {
  id: 'a.gas-C',
  version: 1,
  topic: 'a.gas-C',
  title: 'Coefficient C of the ratio of specific heats',
  editions: ['API 520-1, 7th to 10th edition'],
  source: 'API Standard 520 Part I, coefficient C; constants 520 (US) and 0.03948 (SI) from memory',
  validity: 'Ideal-gas k from 1 up; at k = 1 the limit is taken.',
  // The published table runs beyond what a gas can be (k = 2), so the range of a gas is not asked of k here.
  inputs: [input('k', 'ideal-gas ratio of specific heats', 'dimensionless')],
  outputs: [
    output('C_US', 'C in US units', 'gas-constant-c'),
    output('C_SI', 'C in SI units', 'gas-constant-c'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const k = sheet.number('k', '-', { min: 1 });
      for (const system of ['US', 'SI'] as const satisfies readonly System[]) {
        sheet.keep('c', GAS_FORMS[system].c, String(GAS_FORMS[system].c));
        const unit = SYSTEM_UNITS[system].C;
        const value = sheet.step(
          {
            key: `C_${system}`,
            tex: `C_{${system}}`,
            meaning: `coefficient C, ${system} form`,
            value: gasC(k, system),
            unit,
            memory: true,
          },
          (v) =>
            `${v('c')} \\sqrt{${v('k')} \\left(\\frac{2}{${v('k')}+1}\\right)^{(${v('k')}+1)/(${v('k')}-1)}}`,
        );
        sheet.output(`C_${system}`, value, unit);
      }
    });
  },
};
