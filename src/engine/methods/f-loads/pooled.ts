/* Method f.pooled: loads of one common cause that reach a device or header together. */
import { type Method } from '../../catalog/types';
import { type SheetBuilder, workSheet } from '../../sheet';
import { input, optional, output } from '../common/describe';
import { countNumbered, numbered } from '../common/numbered';
import { SYSTEM_UNITS, systemOf } from '../common/system';

/** One load: any one unit of mass flow, K (or °R), kg/kmol. */
export type PooledLoad = { W: number; T: number; M: number; Z: number; k: number };

/** The mixture of several ideal gases: mass flow, molar mass, temperature by heat balance (by moles unless all k are above 1), Z by moles. */
export function pool(loads: readonly PooledLoad[]): PooledLoad {
  const sum = (of: (load: PooledLoad) => number) => loads.reduce((total, load) => total + of(load), 0);
  const moles = (load: PooledLoad) => load.W / load.M;
  const warm = loads.every((load) => load.k > 1);
  const heat = (load: PooledLoad) => (warm ? load.k / (load.k - 1) : 1);
  const n = sum(moles);
  const capacity = sum((load) => moles(load) * heat(load)) / n;
  const W = sum((load) => load.W);
  return {
    W,
    M: W / n,
    T: sum((load) => moles(load) * heat(load) * load.T) / (n * capacity),
    Z: sum((load) => moles(load) * load.Z) / n,
    k: warm ? capacity / (capacity - 1) : 1,
  };
}

const list = (n: number, of: (i: number) => string) =>
  Array.from({ length: n }, (_, i) => of(i + 1)).join(' + ');

/** The mixture's state as steps; k weighs the temperatures when it was given. */
function stateSteps(
  sheet: SheetBuilder,
  loads: readonly PooledLoad[],
  mixed: PooledLoad,
  unit: string,
): void {
  const n = loads.length;
  const at = (name: string, i: number) => numbered(name, i);
  sheet.step(
    { key: 'Mm', tex: 'M_m', meaning: 'molar mass of the mixture', value: mixed.M, unit: 'kg/kmol' },
    (v) => `\\frac{${v('Wm')}}{${list(n, (i) => `\\frac{${v(at('W', i))}}{${v(at('M', i))}}`)}}`,
  );
  const warm = loads.every((load) => load.k > 1);
  const weight = (v: (key: string) => string, i: number) =>
    `\\frac{${v(at('W', i))}}{${v(at('M', i))}}${warm ? ` \\frac{${v(at('k', i))}}{${v(at('k', i))}-1}` : ''}`;
  sheet.step(
    {
      key: 'Tm',
      tex: 'T_m',
      meaning: warm ? 'temperature of the mixture, by heat balance' : 'temperature of the mixture, by moles',
      value: mixed.T,
      unit,
    },
    (v) => `\\frac{${list(n, (i) => `${weight(v, i)} ${v(at('T', i))}`)}}{${list(n, (i) => weight(v, i))}}`,
  );
  if (warm) sheet.output('k', mixed.k);
  sheet.output('Z', mixed.Z);
}

/** f.pooled: simultaneous loads pooled. */
export const POOLED: Method = {
  id: 'f.pooled',
  version: 1,
  topic: 'f.pooled',
  title: 'Simultaneous loads pooled',
  editions: ['API 521, 5th to 7th edition (approach)'],
  source:
    'API Standard 521: loads of one common cause add, independent ones do not (approach from memory); mass and heat balance of ideal gases',
  validity:
    'Gases that mix without condensing; loads at the same moment unless their timing is shown; loads of independent causes are never added. Liquid adds by mass only.',
  inputs: [
    input('W', 'first load (W_2, W_3 … of further ones, and so for T, M, Z, k)', 'mass-flow', {
      rangeKey: 'reliefLoad',
      each: 'load',
    }),
    input('T', 'temperature of the load', 'temperature', { rangeKey: 'relievingTemperature', each: 'load' }),
    input('M', 'molar mass of the load', 'molar-mass', { rangeKey: 'molarMass', each: 'load' }),
    optional('Z', 'compressibility factor of the load (1 when not given)', 'dimensionless', {
      rangeKey: 'z',
      each: 'load',
    }),
    optional('k', 'ideal-gas ratio of specific heats of the load', 'dimensionless', {
      rangeKey: 'kIdeal',
      each: 'load',
    }),
  ],
  outputs: [
    output('relief_load', 'sum of the loads', 'mass-flow'),
    output('M', 'molar mass of the mixture', 'molar-mass'),
    output('T', 'temperature of the mixture', 'temperature'),
    output('Z', 'compressibility factor, mean by moles', 'dimensionless'),
    output('k', 'ratio of specific heats of the mixture', 'dimensionless'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const u = SYSTEM_UNITS[systemOf(inputs, ['W'])];
      const count = Math.max(1, countNumbered(sheet, 'W'));
      const loads = Array.from({ length: count }, (_, i): PooledLoad => {
        const read = (
          name: string,
          unit: string,
          bounds: { above?: number; min?: number; fallback?: number },
        ) => sheet.number(numbered(name, i + 1), unit, bounds, `${name}_{${i + 1}}`);
        return {
          W: read('W', u.W, { above: 0 }),
          T: read('T', u.T, { above: 0 }),
          M: read('M', u.M, { above: 0 }),
          Z: read('Z', '-', { above: 0, fallback: 1 }),
          k: read('k', '-', { min: 1, fallback: 1 }),
        };
      });
      const mixed = pool(loads);
      const W = sheet.step(
        { key: 'Wm', tex: 'W', meaning: 'sum of the loads', value: mixed.W, unit: u.W },
        (v) => list(count, (i) => v(numbered('W', i))),
      );
      stateSteps(sheet, loads, mixed, u.T);
      sheet.output('relief_load', W, u.W);
      sheet.output('M', mixed.M, u.M);
      sheet.output('T', mixed.T, u.T);
    });
  },
};
