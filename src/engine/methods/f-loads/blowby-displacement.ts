/* Method f.blowby-displacement: gas that blows by pushes out the liquid that stands before the relief device. */
import { type Method } from '../../catalog/types';
import { type SheetBuilder, workSheet } from '../../sheet';
import { GAS_CONSTANT } from '../a-gas/flow';
import { GAS_INPUTS, input, optional, output } from '../common/describe';
import { COEFFICIENTS, gasThrough } from './control-valve';
import { loadOutput } from './orifice';
import { readCoefficient, readPressures, readType, VALVE_INPUTS } from './valve-inputs';

/** Volume flow of a gas in m³/h: kg/h, K, kg/kmol, Pa absolute. */
export function gasVolume(W: number, T: number, Z: number, M: number, P: number): number {
  return (W * Z * GAS_CONSTANT * T) / (M * P);
}

/** Gas through the open level valve by IEC 60534-2-1, kg/h. */
function gasLoad(sheet: SheetBuilder): number {
  const T = sheet.number('T', 'K', { above: 0 });
  const Z = sheet.number('Z', '-', { above: 0 });
  const M = sheet.number('M', 'kg/kmol', { above: 0 });
  const k = sheet.number('k', '-', { min: 1 });
  const xT = sheet.number('xT', '-', { above: 0, max: 1 }, 'x_T');
  const type = readType(sheet);
  const C = readCoefficient(sheet, type);
  const r = gasThrough({ ...readPressures(sheet), T, Z, M, k, xT }, C, type);
  sheet.step(
    {
      key: 'xs',
      tex: 'x',
      meaning: `ratio of pressure drop to inlet pressure, ${r.choked ? 'held where it chokes' : 'not choked'}`,
      value: r.used,
      unit: '-',
      clause: 'IEC 60534-2-1:2011',
    },
    (v) =>
      `\\min\\left(\\frac{${v('P1')} - ${v('P2')}}{${v('P1')}},\\ \\frac{${v('k')}}{1.4} \\cdot ${v('xT')}\\right)`,
  );
  sheet.step(
    {
      key: 'Y',
      meaning: `expansion factor, ${r.choked ? 'choked' : 'not choked'}`,
      value: r.Y,
      unit: '-',
      clause: 'IEC 60534-2-1:2011',
    },
    (v) => `1 - \\frac{${v('xs')}}{3 \\cdot \\frac{${v('k')}}{1.4} \\cdot ${v('xT')}}`,
  );
  return sheet.step(
    {
      key: 'Wg',
      tex: 'W_g',
      meaning: 'gas through the open valve',
      value: r.W,
      unit: 'kg/h',
      clause: 'IEC 60534-2-1:2011',
      memory: true,
    },
    (v) =>
      `${v('coefficient')} \\cdot ${COEFFICIENTS[type].N8} \\cdot ${v('P1')} \\cdot ${v('Y')} \\sqrt{\\frac{${v('xs')} \\cdot ${v('M')}}{${v('T')} \\cdot ${v('Z')}}}`,
  );
}

/** Whether the liquid of the upstream vessel can fill the free volume downstream. */
function fills(sheet: SheetBuilder): void {
  if (!sheet.has('inventory') || !sheet.has('free_volume')) {
    sheet.warn(
      'FILLING_NOT_SHOWN',
      'Whether the low side can be liquid full was not shown: give inventory and free_volume; until then displacement is taken as credible.',
    );
    return;
  }
  const inventory = sheet.number('inventory', 'm3', { min: 0 }, 'V_{liq}');
  const free = sheet.number('free_volume', 'm3', { min: 0 }, 'V_{free}');
  const full = inventory >= free;
  sheet.say({
    symbol: 'V_{liq} \\text{ against } V_{free}',
    meaning: full
      ? 'the liquid fills the low side: it is displaced first'
      : 'the liquid does not fill the low side: gas reaches the device first',
    value: full ? 'full' : 'not full',
    tex: `${inventory.toPrecision(4)} ${full ? '\\ge' : '<'} ${free.toPrecision(4)}`,
  });
  sheet.output('fills', full);
  if (!full)
    sheet.warn(
      'GAS_GOVERNS',
      'The low side does not fill: work the gas load (f.gas-blowby); this liquid load does not arise.',
    );
}

/** f.blowby-displacement: liquid load in the first moments of gas blow-by. */
export const BLOWBY_DISPLACEMENT: Method = {
  id: 'f.blowby-displacement',
  version: 1,
  topic: 'f.blowby-displacement',
  title: 'Gas blow-by that displaces liquid first',
  editions: ['IEC 60534-2-1:2011; API 521, 5th to 7th edition (approach)'],
  source:
    'API Standard 521: with the low side liquid full, the entering gas displaces liquid at its own volume flow at relieving pressure (approach from memory); gas by IEC 60534-2-1',
  validity:
    'Low side liquid full when the gas arrives; gas at relieving pressure and its own temperature; no gas dissolves; x_T at full travel, valve in a line of its own size.',
  inputs: [
    ...VALVE_INPUTS.filter((one) => !['d', 'D1', 'D2'].includes(one.name)),
    ...GAS_INPUTS,
    input('xT', 'pressure ratio factor', 'dimensionless', { rangeKey: 'xT' }),
    optional('T_low', 'temperature of the gas at relieving pressure (its own when not given)', 'temperature'),
    optional('Z_low', 'compressibility there (its own when not given)', 'dimensionless', { rangeKey: 'z' }),
    input('rho', 'density of the displaced liquid', 'density', { rangeKey: 'liquidDensity' }),
    optional('inventory', 'liquid that can come over from the high side', 'volume', { rangeKey: 'volume' }),
    optional('free_volume', 'volume above the liquid on the low side', 'volume', { rangeKey: 'volume' }),
  ],
  outputs: [
    output('gas_load', 'gas through the open valve', 'mass-flow'),
    output('displacing_flow', 'volume flow of that gas at relieving pressure', 'volume-flow'),
    output('fills', 'whether the low side can be liquid full'),
    output('relief_load', 'liquid load while it is displaced', 'mass-flow'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const gas = gasLoad(sheet);
      const { P2 } = readPressures(sheet);
      const T = sheet.number('T', 'K', { above: 0 });
      const Z = sheet.number('Z', '-', { above: 0 });
      const M = sheet.number('M', 'kg/kmol', { above: 0 });
      const low = sheet.number('T_low', 'K', { above: 0, fallback: T }, 'T_{low}');
      const Zlow = sheet.number('Z_low', '-', { above: 0, fallback: Z }, 'Z_{low}');
      const rho = sheet.number('rho', 'kg/m3', { above: 0 }, '\\rho_l');
      sheet.keep('R', GAS_CONSTANT);
      const Q = sheet.step(
        {
          key: 'Q',
          meaning: 'volume flow of the gas at relieving pressure',
          value: gasVolume(gas, low, Zlow, M, P2 * 1000),
          unit: 'm3/h',
        },
        (v) =>
          `\\frac{${v('Wg')} \\cdot ${v('Z_low')} \\cdot ${v('R')} \\cdot ${v('T_low')}}{${v('M')} \\cdot 1000 \\cdot ${v('P2')}}`,
      );
      const W = sheet.step(
        { key: 'W', meaning: 'liquid displaced', value: Q * rho, unit: 'kg/h' },
        (v) => `${v('Q')} \\cdot ${v('rho')}`,
      );
      fills(sheet);
      sheet.output('displacing_flow', Q, 'm3/h');
      loadOutput(sheet, 'gas_load', gas);
      loadOutput(sheet, 'relief_load', W);
    });
  },
};
