/* Method g.fitting-losses: the loss coefficients of the fittings of one bore, from the library, by the method chosen. */
import { type Method } from '../../catalog/types';
import {
  FITTING_METHODS,
  FITTING_SOURCES,
  fittingK,
  type FittingMethod,
  fittingNamed,
  FITTINGS,
  reynolds,
} from '../../lines';
import { turbulentFactor } from '../../lines/fittings';
import { type Fitting } from '../../lines/fitting-data';
import { type SheetBuilder, type Show, workSheet } from '../../sheet';
import { input, optional, output } from '../common/describe';
import { nameAt } from './series';

const KEYS = FITTINGS.map((one) => one.key);
const MOST_FITTINGS = 60;

/** The equation of one fitting's K by its method, in symbols and figures. */
function template(fitting: Fitting, method: FittingMethod): (v: Show) => string {
  const { K, diameters, twoK, threeK } = fitting;
  if (K !== undefined) return () => String(K);
  if (method === 'length') return (v) => `${diameters} \\cdot ${v('fT')}`;
  if (method === '2-K')
    return (v) =>
      `\\frac{${twoK?.K1}}{${v('Re')}} + ${twoK?.Kinf} \\left(1 + \\frac{0.0254}{${v('D')}}\\right)`;
  return (v) =>
    `\\frac{${threeK?.K1}}{${v('Re')}} + ${threeK?.Ki} \\left(1 + \\frac{${threeK?.Kd}}{${v('nominal')}^{0.3}}\\right)`;
}

type Place = { D: number; Re: number; nominal: number };

function fittingStep(sheet: SheetBuilder, index: number, method: FittingMethod, place: Place): number {
  const key = sheet.word(nameAt('fitting', index), KEYS);
  const fitting = fittingNamed(key);
  const K = fitting && fittingK(fitting, method, place);
  if (!fitting || K === undefined)
    return sheet.refuse(
      'NO_FIGURE',
      nameAt('fitting', index),
      `There is no published figure for “${fitting?.name ?? key}” by the method ${method}; choose another method or give its K.`,
    );
  const count = sheet.number(
    nameAt('count', index),
    '-',
    { min: 0, max: 1000, fallback: 1 },
    `n_{${index + 1}}`,
  );
  sheet.step(
    {
      key: `K ${index}`,
      tex: `K_{${index + 1}}`,
      meaning: `loss coefficient of ${fitting.name}`,
      value: K,
      unit: '-',
      clause: FITTING_SOURCES[fitting.K === undefined ? method : 'K'],
      memory: fitting.K !== undefined || method === 'length',
    },
    template(fitting, method),
  );
  return count * K;
}

/** g.fitting-losses: sum of the loss coefficients of the fittings of one bore. */
export const FITTING_LOSSES: Method = {
  id: 'g.fitting-losses',
  version: 1,
  topic: 'g.fitting-losses',
  title: 'Fittings: sum of the loss coefficients',
  editions: ['equivalent length', '2-K', '3-K'],
  source: `${FITTING_SOURCES['2-K']}; ${FITTING_SOURCES['3-K']}; ${FITTING_SOURCES.length}`,
  validity:
    'Clean steel, single phase, one bore. 2-K takes the inside bore, 3-K the nominal bore in inches (the inside bore when none is given). Entrances, exits and disks have a fixed K by every method.',
  inputs: [
    input('method', 'how the resistance is found', undefined, { words: [...FITTING_METHODS] }),
    input('D', 'inside diameter', 'length', { rangeKey: 'bore' }),
    optional('nominal', 'nominal bore (3-K)', 'length'),
    input('W', 'mass flow', 'mass-flow'),
    input('mu', 'viscosity', 'viscosity'),
    input('fitting', 'fitting', undefined, { words: KEYS, each: 'fitting' }),
    optional('count', 'how many of it (1 when not given)', 'dimensionless', { each: 'fitting' }),
  ],
  outputs: [
    output('Reynolds', 'Reynolds number', 'dimensionless'),
    output('sum_K', 'sum of the loss coefficients', 'dimensionless'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const method = sheet.word('method', FITTING_METHODS);
      const D = sheet.number('D', 'm', { above: 0 });
      const W = sheet.number('W', 'kg/s', { above: 0 });
      const mu = sheet.number('mu', 'Pa.s', { above: 0 }, '\\mu');
      const nominal = sheet.keep(
        'nominal',
        sheet.has('nominal') ? sheet.number('nominal', 'in', { above: 0 }) : D / 0.0254,
        'D_n',
      );
      const Re = sheet.step(
        { key: 'Re', meaning: 'Reynolds number', value: reynolds(W, D, mu), unit: '-' },
        (v) => `\\frac{4 \\, ${v('W')}}{\\pi \\cdot ${v('D')} \\cdot ${v('mu')}}`,
      );
      if (method === 'length')
        sheet.step(
          {
            key: 'fT',
            tex: 'f_T',
            meaning: 'friction factor of complete turbulence in clean steel',
            value: turbulentFactor(D),
            unit: '-',
            clause: 'Crane TP-410',
            memory: true,
          },
          (v) =>
            `\\frac{0.25}{\\left[\\log_{10}\\left(\\frac{4.57\\times 10^{-5}}{3.7 \\, ${v('D')}}\\right)\\right]^2}`,
        );
      const terms: number[] = [];
      for (let i = 0; i < MOST_FITTINGS && (i === 0 || sheet.has(nameAt('fitting', i))); i += 1)
        terms.push(fittingStep(sheet, i, method, { D, Re, nominal }));
      const sum = sheet.step(
        {
          key: 'sum',
          tex: '\\Sigma K',
          meaning: 'sum of the loss coefficients',
          value: terms.reduce((a, b) => a + b, 0),
          unit: '-',
        },
        (v) => terms.map((_, i) => `${v(nameAt('count', i))} \\cdot ${v(`K ${i}`)}`).join(' + '),
      );
      sheet.output('Reynolds', Re);
      sheet.output('sum_K', sum);
    });
  },
};
