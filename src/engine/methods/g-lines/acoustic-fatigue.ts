/* Method g.acoustic-fatigue: sound power inside a pipe behind a pressure let-down, held against a screening level. */
import { type Method } from '../../catalog/types';
import { soundPower, soundPowerAfter, soundSum } from '../../lines/discharge';
import { workSheet } from '../../sheet';
import { input, optional, output } from '../common/describe';
import { absoluteIn } from '../common/pressures';

const CLAUSE = 'Carucci and Mueller 1982; API 521';

/** g.acoustic-fatigue: sound power level of one source, after a length of pipe, against the screening level. */
export const ACOUSTIC_FATIGUE: Method = {
  id: 'g.acoustic-fatigue',
  version: 1,
  topic: 'g.acoustic-fatigue',
  title: 'Acoustic fatigue: screening by sound power',
  editions: ['Carucci and Mueller 1982'],
  source:
    'V. A. Carucci, R. T. Mueller, ASME 82-WA/PVP-8, 1982, sound power of a pressure reducing device; screening level 155 dB and 0.06 dB a diameter from the Energy Institute guideline (all from memory)',
  validity:
    'Gas let down through a valve, restriction or choked enlargement. A screening: above the level an analysis of welds, branches and wall thickness is due; it is no proof of failure.',
  inputs: [
    input('W', 'mass flow', 'mass-flow'),
    input('P1', 'pressure ahead of the let-down', 'pressure-absolute'),
    input('P2', 'pressure behind it', 'pressure-absolute'),
    input('T', 'temperature ahead of it', 'temperature', { rangeKey: 'relievingTemperature' }),
    input('M', 'molar mass', 'molar-mass', { rangeKey: 'molarMass' }),
    optional('L', 'length of pipe to the weld or branch looked at', 'length'),
    optional('D', 'inside diameter of that pipe', 'length', { rangeKey: 'bore' }),
    optional('other_sources', 'sound power level of other sources there', 'sound-level'),
    optional('level_limit', 'screening level (155 dB when not given)', 'sound-level'),
    optional('atmospheric_pressure', 'barometric pressure', 'pressure-absolute', { rangeKey: 'barometer' }),
  ],
  outputs: [
    output('PWL', 'sound power level of the source', 'sound-level'),
    output('PWL_at_L', 'sound power level after the pipe', 'sound-level'),
    output('PWL_total', 'sound power level with the other sources', 'sound-level'),
    output('below_screening_level', 'whether it is below the screening level'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const W = sheet.number('W', 'kg/s', { above: 0 });
      const P1 = absoluteIn(sheet, 'P1', 'p_1', 'kPa_abs');
      const P2 = absoluteIn(sheet, 'P2', 'p_2', 'kPa_abs');
      const T = sheet.number('T', 'K', { above: 0 });
      const M = sheet.number('M', 'kg/kmol', { above: 0 });
      if (P1 <= P2)
        sheet.refuse(
          'NO_FLOW',
          'P2',
          'The pressure behind is not below the pressure ahead: nothing is let down.',
        );
      const source = sheet.step(
        {
          key: 'PWL',
          tex: 'L_W',
          meaning: 'sound power level of the source',
          value: soundPower(W, P1, P2, T, M),
          unit: 'dB',
          clause: CLAUSE,
          memory: true,
        },
        (v) =>
          `10 \\log_{10}\\left[\\left(\\frac{${v('P1')} - ${v('P2')}}{${v('P1')}}\\right)^{3.6} ${v('W')}^2 \\left(\\frac{${v('T')}}{${v('M')}}\\right)^{1.2}\\right] + 126.1`,
      );
      let level = source;
      if (sheet.has('L')) {
        const L = sheet.number('L', 'm', { min: 0 });
        const D = sheet.number('D', 'm', { above: 0 });
        level = sheet.step(
          {
            key: 'PWL at',
            tex: 'L_{W,L}',
            meaning: 'sound power level after the pipe',
            value: soundPowerAfter(source, L, D),
            unit: 'dB',
            clause: CLAUSE,
            memory: true,
          },
          (v) => `${v('PWL')} - 0.06 \\, \\frac{${v('L')}}{${v('D')}}`,
        );
        sheet.output('PWL_at_L', level, 'dB');
      }
      sheet.keep('own', level, 'L_{W,own}');
      const other = sheet.has('other_sources')
        ? sheet.number('other_sources', 'dB', {}, 'L_{W,o}')
        : undefined;
      const total =
        other === undefined
          ? level
          : sheet.step(
              {
                key: 'sum',
                tex: 'L_{W,t}',
                meaning: 'sound power level with the other sources',
                value: soundSum([level, other]),
                unit: 'dB',
              },
              (v) => `10 \\log_{10}\\left(10^{${v('own')}/10} + 10^{${v('other_sources')}/10}\\right)`,
            );
      const limit = sheet.number('level_limit', 'dB', { above: 0, fallback: 155 }, 'L_{lim}');
      sheet.output('PWL', source, 'dB');
      sheet.output('PWL_total', total, 'dB');
      sheet.output('below_screening_level', total < limit);
      if (total >= limit)
        sheet.warn(
          'ACOUSTIC_FATIGUE',
          `The sound power level is ${total.toFixed(1)} dB, at or above ${limit} dB: welds, branches and wall thickness need an analysis.`,
        );
    });
  },
};
