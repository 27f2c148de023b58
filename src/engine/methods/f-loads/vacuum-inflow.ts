/* Method f.vacuum-inflow: gas that must come in so that the pressure falls no further. */
import { type Method } from '../../catalog/types';
import { fromSI } from '../../quantity';
import { type SheetBuilder, workSheet } from '../../sheet';
import { GAS_CONSTANT } from '../a-gas/flow';
import { input, optional, output } from '../common/describe';
import { absolutePressure } from '../common/pressures';

/** Shrinking of a gas of constant pressure in m³/h: m³, K an hour, K. */
export function shrinking(volume: number, coolingRate: number, T: number): number {
  return (volume * coolingRate) / T;
}

/** The three volumes that go: liquid drawn out, vapour condensed, gas that cools. m³/h. */
function volumes(sheet: SheetBuilder): number {
  const liquid = sheet.number('liquid_out', 'm3/h', { min: 0, fallback: 0 }, 'Q_{out}');
  const W = sheet.number('condensing_rate', 'kg/h', { min: 0, fallback: 0 }, 'W_{cond}');
  const rho =
    W === 0
      ? sheet.keep('rho_vapour', 1, '\\rho_v')
      : sheet.number('rho_vapour', 'kg/m3', { above: 0 }, '\\rho_v');
  const V = sheet.number('gas_volume', 'm3', { min: 0, fallback: 0 }, 'V');
  const rate =
    V === 0
      ? sheet.keep('cooling_rate', 0, '\\dot T')
      : sheet.number('cooling_rate', 'K/min', { min: 0 }, '\\dot T');
  const T =
    V === 0
      ? sheet.keep('gas_temperature', 1, 'T_v')
      : sheet.number('gas_temperature', 'K', { above: 0 }, 'T_v');
  return sheet.step(
    {
      key: 'Q',
      meaning: 'volume that goes: liquid out, vapour condensed, gas that cools',
      value: liquid + W / rho + shrinking(V, rate * 60, T),
      unit: 'm3/h',
    },
    (v) =>
      `${v('liquid_out')} + \\frac{${v('condensing_rate')}}{${v('rho_vapour')}} + 60 \\cdot \\frac{${v('gas_volume')} \\cdot ${v('cooling_rate')}}{${v('gas_temperature')}}`,
  );
}

/** f.vacuum-inflow: inflow that a vacuum device or make-up line must give. */
export const VACUUM_INFLOW: Method = {
  id: 'f.vacuum-inflow',
  version: 1,
  topic: 'f.vacuum-inflow',
  title: 'Vacuum: gas that must come in',
  editions: ['volume balance'],
  source:
    'Volume balance at the lowest pressure allowed: liquid drawn out, vapour condensed and gas that cools are made up by gas (common practice, no source); storage tanks have a method of their own',
  validity:
    'Constant pressure at the vacuum limit; ideal gas comes in at its own temperature; condensing and cooling rates are the greatest ones; nothing is made up by evaporation.',
  inputs: [
    optional('liquid_out', 'liquid drawn out', 'volume-flow'),
    optional('condensing_rate', 'vapour that condenses', 'mass-flow'),
    optional('rho_vapour', 'density of that vapour', 'density', { rangeKey: 'gasDensity' }),
    optional('gas_volume', 'volume of gas that cools', 'volume', { rangeKey: 'volume' }),
    optional('cooling_rate', 'its rate of cooling', 'temperature-rate'),
    optional('gas_temperature', 'its temperature', 'temperature'),
    input('P', 'lowest pressure allowed inside', 'pressure-absolute'),
    optional('atmospheric_pressure', 'barometric pressure', 'pressure-absolute', { rangeKey: 'barometer' }),
    input('T', 'temperature of the gas that comes in', 'temperature', { rangeKey: 'relievingTemperature' }),
    optional('M', 'its molar mass (28.97, air, when not given)', 'molar-mass', { rangeKey: 'molarMass' }),
  ],
  outputs: [
    output('inflow', 'volume flow in at the lowest pressure', 'volume-flow'),
    output('relief_load', 'mass flow in', 'mass-flow'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const Q = volumes(sheet);
      const P = absolutePressure(sheet, 'P', 'P', 'SI');
      const T = sheet.number('T', 'K', { above: 0 });
      const M = sheet.number('M', 'kg/kmol', { above: 0, fallback: 28.97 });
      sheet.keep('R', GAS_CONSTANT);
      const W = sheet.step(
        {
          key: 'W',
          meaning: 'gas that must come in',
          value: (Q * P * 1000 * M) / (GAS_CONSTANT * T),
          unit: 'kg/h',
        },
        (v) => `${v('Q')} \\cdot \\frac{1000 \\cdot ${v('P')} \\cdot ${v('M')}}{${v('R')} \\cdot ${v('T')}}`,
      );
      const given = sheet.inputs['condensing_rate'] ?? sheet.inputs['M'];
      const unit = typeof given === 'object' && given.unit.startsWith('lb') ? 'lb/h' : 'kg/h';
      sheet.output('inflow', Q, 'm3/h');
      sheet.output('relief_load', fromSI(W / 3600, unit).value, unit);
    });
  },
};
