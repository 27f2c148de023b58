/* Method g.inlet-stability: figures that an engineering analysis of a spring valve behind its inlet line is made of. */
import { type Method } from '../../catalog/types';
import { boreArea } from '../../lines';
import { accelerationDrop, longestLine, quarterWave, returnTime } from '../../lines/stability';
import { type SheetBuilder, workSheet } from '../../sheet';
import { input, optional, output } from '../common/describe';
import { pressureOutput } from './pressures';

const ACOUSTIC = 'Smith, Burgess and Powers, Hydrocarbon Processing 2011; API 520-2';

/** The acoustic part: return time, longest line, natural frequency, and the fall of pressure while opening, kPa. */
function acousticSteps(sheet: SheetBuilder): number {
  const L = sheet.number('L', 'm', { above: 0 });
  const D = sheet.number('D', 'm', { above: 0 });
  const W = sheet.number('W', 'kg/s', { above: 0 });
  const c = sheet.number('c', 'm/s', { above: 0 });
  const t = sheet.number('opening_time', 's', { above: 0, fallback: 0.01 }, 't_o');
  if (!sheet.has('opening_time'))
    sheet.warn('OPENING_TIME_ASSUMED', 'No opening time was given; 10 ms is used. Ask the manufacturer.');
  const back = sheet.step(
    {
      key: 'tr',
      tex: 't_r',
      meaning: 'time of a pressure wave to the vessel and back',
      value: returnTime(L, c),
      unit: 's',
      clause: ACOUSTIC,
    },
    (v) => `\\frac{2 \\, ${v('L')}}{${v('c')}}`,
  );
  const longest = sheet.step(
    {
      key: 'Lmax',
      tex: 'L_{max}',
      meaning: 'longest line from which the wave is back while the valve opens',
      value: longestLine(c, t),
      unit: 'm',
      clause: ACOUSTIC,
      memory: true,
    },
    (v) => `\\frac{${v('c')} \\cdot ${v('opening_time')}}{2}`,
  );
  const G = sheet.step(
    { key: 'G', meaning: 'mass flux', value: W / boreArea(D), unit: 'kg/(m2.s)' },
    (v) => `\\frac{4 \\, ${v('W')}}{\\pi \\, ${v('D')}^2}`,
  );
  const drop = sheet.step(
    {
      key: 'drop',
      tex: '\\Delta p_a',
      meaning: 'fall of pressure at the valve while it opens',
      value: accelerationDrop(G, L, c, t) / 1e3,
      unit: 'kPa',
      clause: 'water-hammer theory, steady opening',
    },
    (v) =>
      `10^{-3} \\min\\left(${v('G')} \\cdot ${v('c')},\\ \\frac{2 \\, ${v('L')} \\cdot ${v('G')}}{${v('opening_time')}}\\right)`,
  );
  const frequency = sheet.step(
    {
      key: 'fq',
      tex: 'f_q',
      meaning: 'quarter-wave frequency of the line',
      value: quarterWave(L, c),
      unit: 'Hz',
    },
    (v) => `\\frac{${v('c')}}{4 \\, ${v('L')}}`,
  );
  sheet.output('return_time', back, 's');
  sheet.output('longest_line', longest, 'm');
  sheet.output('wave_returns_in_time', L <= longest);
  pressureOutput(sheet, 'acceleration_drop', drop, 'difference');
  sheet.output('quarter_wave_frequency', frequency, 'Hz');
  return drop;
}

/** Friction and acceleration against the blowdown, where set and blowdown are given. */
function blowdownSteps(sheet: SheetBuilder, drop: number): void {
  const set = sheet.number('set_pressure', 'kPa_g', { above: 0 }, 'p_{set}');
  const blowdown = sheet.number('blowdown', '-', { min: 0, max: 0.5 }, 'b');
  const loss = sheet.number('loss', 'kPa', { min: 0 }, '\\Delta p_f');
  const share = sheet.step(
    {
      key: 'fshare',
      tex: 'x_f',
      meaning: 'loss by friction as a fraction of set',
      value: loss / set,
      unit: '-',
    },
    (v) => `\\frac{${v('loss')}}{${v('set_pressure')}}`,
  );
  const left = sheet.step(
    {
      key: 'left',
      tex: 'b - x_f',
      meaning: 'blowdown left after friction, as a fraction of set',
      value: blowdown - share,
      unit: '-',
    },
    (v) => `${v('blowdown')} - ${v('fshare')}`,
  );
  sheet.output('loss_fraction_of_set', share);
  sheet.output('blowdown_left', left);
  const all = sheet.step(
    {
      key: 'both',
      tex: 'b - x_f - x_a',
      meaning: 'blowdown left after friction and acceleration',
      value: left - drop / set,
      unit: '-',
    },
    (v) => `${v('left')} - \\frac{${v('drop')}}{${v('set_pressure')}}`,
  );
  sheet.output('blowdown_left_with_acceleration', all);
}

/** g.inlet-stability: loss, wave return and acceleration against the blowdown; it supports an analysis and gives no verdict. */
export const INLET_STABILITY: Method = {
  id: 'g.inlet-stability',
  version: 1,
  topic: 'g.inlet-stability',
  title: 'Inlet line: figures for a stability analysis',
  editions: ['API 520-2, 7th edition'],
  source:
    'D. Smith, J. Burgess, C. Powers, Relief device inlet piping: beyond the 3 percent rule, Hydrocarbon Processing, November 2011 (from memory); water-hammer theory, textbook; API 520-2 (from memory)',
  validity:
    'Spring-loaded valves on gas or liquid, one bore taken for the line. Support for an engineering analysis, not a verdict: valve dynamics, coupling with the pipe, low-flow cases and inspection history are judged by an engineer.',
  inputs: [
    input('L', 'length of the inlet line', 'length', { rangeKey: 'inletLength' }),
    input('D', 'inside diameter of the line', 'length', { rangeKey: 'bore' }),
    input('W', 'rated flow', 'mass-flow'),
    input('c', 'speed of sound in the fluid', 'velocity', { rangeKey: 'soundSpeed' }),
    optional('opening_time', 'opening time of the valve (10 ms when not given)', 'time'),
    optional('set_pressure', 'set pressure', 'pressure-gauge', { rangeKey: 'setPressure' }),
    optional('blowdown', 'blowdown as a fraction of set', 'dimensionless', { rangeKey: 'blowdown' }),
    optional('loss', 'loss of the inlet line at rated flow', 'pressure-difference'),
    optional('atmospheric_pressure', 'barometric pressure', 'pressure-absolute', { rangeKey: 'barometer' }),
  ],
  outputs: [
    output('return_time', 'time of a pressure wave to the vessel and back', 'time'),
    output('longest_line', 'longest line from which the wave is back in time', 'length'),
    output('wave_returns_in_time', 'whether the line is not longer'),
    output('acceleration_drop', 'fall of pressure while the valve opens', 'pressure-difference'),
    output('quarter_wave_frequency', 'quarter-wave frequency of the line', 'rotation'),
    output('loss_fraction_of_set', 'loss as a fraction of set', 'dimensionless'),
    output('blowdown_left', 'blowdown left after friction', 'dimensionless'),
    output(
      'blowdown_left_with_acceleration',
      'blowdown left after friction and acceleration',
      'dimensionless',
    ),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const drop = acousticSteps(sheet);
      if (sheet.has('set_pressure') && sheet.has('blowdown') && sheet.has('loss')) blowdownSteps(sheet, drop);
      sheet.warn(
        'NO_VERDICT',
        'These figures support an engineering analysis of stability; they are no verdict on the valve.',
      );
    });
  },
};
