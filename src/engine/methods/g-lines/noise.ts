/* Method g.noise: sound pressure level of a discharge to the atmosphere. */
import { type Method } from '../../catalog/types';
import { noiseAt, noiseAt30, noiseChart } from '../../lines/discharge';
import { type SheetBuilder, workSheet } from '../../sheet';
import { GAS_CONSTANT } from '../a-gas/flow';
import { GAS_INPUTS, input, optional, output } from '../common/describe';
import { absoluteIn } from '../common/pressures';

const CLAUSE = 'API 521, noise level 30 m from the stack tip';

/** The speed of sound as given, or of the ideal gas with Z. */
function soundSpeed(sheet: SheetBuilder): number {
  if (sheet.has('c') || !sheet.has('k')) return sheet.number('c', 'm/s', { above: 0 });
  const T = sheet.number('T', 'K', { above: 0 });
  const Z = sheet.number('Z', '-', { above: 0 });
  const M = sheet.number('M', 'kg/kmol', { above: 0 });
  const k = sheet.number('k', '-', { min: 1 });
  sheet.keep('R', GAS_CONSTANT, 'R');
  return sheet.step(
    { key: 'c', meaning: 'speed of sound', value: Math.sqrt((k * Z * GAS_CONSTANT * T) / M), unit: 'm/s' },
    (v) => `\\sqrt{\\frac{${v('k')} \\cdot ${v('Z')} \\cdot ${v('R')} \\cdot ${v('T')}}{${v('M')}}}`,
  );
}

/** g.noise: level 30 m from the tip and at a distance. */
export const NOISE: Method = {
  id: 'g.noise',
  version: 1,
  topic: 'g.noise',
  title: 'Noise of a discharge to the atmosphere',
  editions: ['API 521, 6th and 7th edition'],
  source:
    'API Standard 521, figure of sound pressure level at 30 m (from memory); two-line fit of the figure as printed in a public fluid-mechanics library',
  validity:
    'Jet from the tip only, free field, no absorption by air or ground, no directivity; about 1 dB by the reading of the figure; pressure ratio above 1. The valve itself and the pipe wall add to it.',
  inputs: [
    input('W', 'mass flow', 'mass-flow'),
    input('P1', 'pressure ahead of the let-down', 'pressure-absolute'),
    input('P2', 'pressure behind it', 'pressure-absolute'),
    optional('c', 'speed of sound of the gas (worked from k, Z, T and M when not given)', 'velocity'),
    ...GAS_INPUTS.map((one) => ({ ...one, required: false })),
    optional('r', 'distance from the tip (30 m when not given)', 'length'),
    optional('atmospheric_pressure', 'barometric pressure', 'pressure-absolute', { rangeKey: 'barometer' }),
  ],
  outputs: [
    output('L_chart', 'level of the figure', 'sound-level'),
    output('L30', 'level 30 m from the tip', 'sound-level'),
    output('L_at_r', 'level at the distance', 'sound-level'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const W = sheet.number('W', 'kg/s', { above: 0 });
      const P1 = absoluteIn(sheet, 'P1', 'p_1', 'kPa_abs');
      const P2 = absoluteIn(sheet, 'P2', 'p_2', 'kPa_abs');
      const c = soundSpeed(sheet);
      const r = sheet.number('r', 'm', { above: 0, fallback: 30 });
      if (P1 <= P2)
        sheet.refuse(
          'NO_FLOW',
          'P2',
          'The pressure behind is not below the pressure ahead: nothing is let down.',
        );
      const ratio = P1 / P2;
      const chart = sheet.step(
        {
          key: 'L',
          meaning: 'level of the figure',
          value: noiseChart(ratio),
          unit: 'dB',
          clause: CLAUSE,
          memory: true,
        },
        (v) =>
          ratio < 2.92
            ? `87.9084 \\log_{10}\\frac{${v('P1')}}{${v('P2')}} + 12.7647`
            : `4.8239 \\log_{10}\\frac{${v('P1')}}{${v('P2')}} + 51.6217`,
      );
      const level = sheet.step(
        {
          key: 'L30',
          tex: 'L_{30}',
          meaning: 'level 30 m from the tip',
          value: noiseAt30(ratio, W, c),
          unit: 'dB',
          clause: CLAUSE,
          memory: true,
        },
        (v) => `${v('L')} + 10 \\log_{10}\\frac{${v('W')} \\cdot ${v('c')}^2}{2}`,
      );
      const there = sheet.step(
        {
          key: 'Lr',
          tex: 'L_{r}',
          meaning: 'level at the distance',
          value: noiseAt(level, r),
          unit: 'dB',
          clause: 'spherical spreading',
        },
        (v) => `${v('L30')} - 20 \\log_{10}\\frac{${v('r')}}{30}`,
      );
      sheet.output('L_chart', chart, 'dB');
      sheet.output('L30', level, 'dB');
      sheet.output('L_at_r', there, 'dB');
      if (r < 30)
        sheet.warn('NEAR_FIELD', 'Nearer than 30 m the spreading law is not shown to hold.', '30 m and more');
    });
  },
};
