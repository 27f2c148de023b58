/* Method f.reaction-gassy: vent of a decomposition that makes permanent gas, by the peak gas rate of a test. */
import { type Method } from '../../catalog/types';
import { convert, fromSI } from '../../quantity';
import { type SheetBuilder, workSheet } from '../../sheet';
import { GAS_CONSTANT } from '../a-gas/flow';
import { input, optional, output } from '../common/describe';
import { absolutePressure } from '../common/pressures';
import { gasFlow, gasRate } from './reaction-flow';

const CLAUSE = 'peak gas rate, gassy systems';
const VENTINGS = ['two-phase', 'gas'] as const;

/** The peak gas rate of the charge from the test, scaled by mass: kmol/h. */
function testRate(sheet: SheetBuilder, mass: number): number {
  const V = sheet.number('test_free_volume', 'm3', { above: 0 }, 'V_t');
  const peak = sheet.number('pressure_rate', 'kPa/s', { above: 0 }, '\\dot P');
  const T = sheet.number('test_gas_temperature', 'K', { above: 0 }, 'T_t');
  const sample = sheet.number('sample_mass', 'kg', { above: 0 }, 'm_t');
  sheet.keep('R', GAS_CONSTANT);
  return sheet.step(
    {
      key: 'n',
      tex: '\\dot n',
      meaning: 'peak gas rate of the charge, from the test by mass',
      value: gasRate(V, peak * 1000, T, sample) * mass * 3600,
      unit: 'kmol/h',
      clause: CLAUSE,
    },
    (v) =>
      `3600 \\cdot \\frac{1000 \\cdot ${v('test_free_volume')} \\cdot ${v('pressure_rate')}}{${v('R')} \\cdot ${v('test_gas_temperature')}} \\cdot \\frac{${v('mass')}}{${v('sample_mass')}}`,
  );
}

/** The mass flow: contents carried out with the gas, or gas alone. kg/s; the gas rate in kmol/h. */
function loadStep(sheet: SheetBuilder, rate: number, mass: number, Q: number): number {
  if (sheet.word('venting', VENTINGS, 'two-phase') === 'gas') {
    sheet.warn(
      'GAS_ALONE',
      'Gas alone is vented only where a test or a level-swell calculation shows that the liquid stays: contents carried out ask for far more area.',
    );
    const M = sheet.number('M', 'kg/kmol', { above: 0 });
    return sheet.step(
      { key: 'W', meaning: 'gas load', value: (rate * M) / 3600, unit: 'kg/s', clause: CLAUSE },
      (v) => `\\frac{${v('n')} \\cdot ${v('M')}}{3600}`,
    );
  }
  const V = sheet.number('volume', 'm3', { above: 0 }, 'V');
  return sheet.step(
    {
      key: 'W',
      meaning: 'two-phase load: the gas carries the homogeneous contents with it',
      value: (Q * mass) / V,
      unit: 'kg/s',
      clause: CLAUSE,
    },
    (v) => `${v('Q')} \\cdot \\frac{${v('mass')}}{${v('volume')}}`,
  );
}

/** f.reaction-gassy: load and vent area of a gassy decomposition. */
export const REACTION_GASSY: Method = {
  id: 'f.reaction-gassy',
  version: 1,
  topic: 'f.reaction-gassy',
  title: 'Gassy decomposition: load from the peak gas rate',
  editions: ['HSE CRR 136/1998, gassy systems'],
  source:
    'J. Etchells and J. Wilday, “Workbook for chemical reactor relief system sizing”, HSE Contract Research Report 136/1998, gassy systems (equations from memory): volume flow of the gas at the greatest pressure times the mean density of the contents',
  validity:
    'Untempered system that makes permanent gas; peak rate of an open or closed test at low thermal inertia, the gas at the temperature of the free volume; scaled by mass; contents homogeneous and none lost before the peak, which is on the safe side. A hybrid system is worked as gassy at its peak rate with its vapour besides.',
  inputs: [
    input('mass', 'charge in the vessel', 'mass', { rangeKey: 'inventory' }),
    optional('volume', 'volume of the vessel, for two-phase venting', 'volume', { rangeKey: 'volume' }),
    input('sample_mass', 'mass of the sample in the test', 'mass'),
    input('test_free_volume', 'gas volume of the test', 'volume'),
    input('pressure_rate', 'greatest rate of pressure rise in the test', 'pressure-rate'),
    input('test_gas_temperature', 'temperature of the gas volume of the test', 'temperature'),
    input('P_max', 'greatest pressure allowed in the vessel', 'pressure-absolute'),
    optional('atmospheric_pressure', 'barometric pressure', 'pressure-absolute', { rangeKey: 'barometer' }),
    input('T', 'temperature of the contents at the peak', 'temperature', {
      rangeKey: 'relievingTemperature',
    }),
    optional('venting', 'what leaves: two-phase (when not given) or gas', undefined, {
      words: [...VENTINGS],
    }),
    optional('M', 'molar mass of the gas, for gas alone', 'molar-mass', { rangeKey: 'molarMass' }),
    optional('mass_flux', 'mass flux of the vent, from a nozzle sheet', 'mass-flux'),
  ],
  outputs: [
    output('gas_rate', 'peak gas rate of the charge', 'molar-flow'),
    output('gas_flow', 'volume flow of the gas at the greatest pressure', 'volume-flow'),
    output('relief_load', 'load', 'mass-flow'),
    output('A_required', 'area of the vent at the mass flux given', 'area'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const mass = sheet.number('mass', 'kg', { above: 0 }, 'm_0');
      const rate = testRate(sheet, mass);
      const P = absolutePressure(sheet, 'P_max', 'P_m', 'SI');
      const T = sheet.number('T', 'K', { above: 0 }, 'T_m');
      const Q = sheet.step(
        {
          key: 'Q',
          tex: 'Q_g',
          meaning: 'volume flow of the gas in the vessel',
          value: gasFlow(rate / 3600, 1, T, P * 1000),
          unit: 'm3/s',
          clause: CLAUSE,
        },
        (v) => `\\frac{${v('n')} \\cdot ${v('R')} \\cdot ${v('T')}}{3600 \\cdot 1000 \\cdot ${v('P_max')}}`,
      );
      const W = loadStep(sheet, rate, mass, Q);
      const unit = sheet.quantity('mass').unit === 'lb' ? 'lb/h' : 'kg/h';
      sheet.output('gas_rate', rate, 'kmol/h');
      sheet.output('gas_flow', convert({ value: Q, unit: 'm3/s' }, 'm3/h'), 'm3/h');
      sheet.output('relief_load', fromSI(W, unit).value, unit);
      if (!sheet.has('mass_flux')) return;
      const G = sheet.number('mass_flux', 'kg/(m2.s)', { above: 0 }, 'G');
      const A = sheet.step(
        { key: 'A', meaning: 'area of the vent', value: (W / G) * 1e6, unit: 'mm2' },
        (v) => `10^6 \\cdot \\frac{${v('W')}}{${v('mass_flux')}}`,
      );
      sheet.output('A_required', A, 'mm2');
    });
  },
};
