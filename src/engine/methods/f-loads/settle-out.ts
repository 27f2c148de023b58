/* Method f.settle-out: the pressure at which a stopped compressor loop comes to rest. */
import { type Method } from '../../catalog/types';
import { fromSI } from '../../quantity';
import { type SheetBuilder, workSheet } from '../../sheet';
import { GAS_CONSTANT } from '../a-gas/flow';
import { input, optional, output } from '../common/describe';
import { countNumbered, numbered } from '../common/numbered';
import { absoluteIn } from '../common/pressures';

/** A part of the loop: kPa absolute, m³, K. */
export type LoopPart = { P: number; V: number; T: number; Z: number };

/** The amount of gas of a part, P V/(Z R T), kmol. */
export function amount({ P, V, T, Z }: LoopPart): number {
  return (1000 * P * V) / (Z * GAS_CONSTANT * T);
}

/** Mean of a property over the parts, weighted by their amounts (adiabatic mixing at equal molar heat). */
export function meanBy(parts: readonly LoopPart[], pick: (part: LoopPart) => number): number {
  const total = parts.reduce((sum, part) => sum + amount(part), 0);
  return parts.reduce((sum, part) => sum + amount(part) * pick(part), 0) / total;
}

/** Settle-out pressure in kPa absolute at temperature T and compressibility Z: Z R T Σn/ΣV. */
export function settleOut(parts: readonly LoopPart[], T: number, Z: number): number {
  const total = parts.reduce((sum, part) => sum + amount(part), 0);
  return (Z * GAS_CONSTANT * T * total) / 1000 / parts.reduce((sum, part) => sum + part.V, 0);
}

function readPart(sheet: SheetBuilder, n: number): LoopPart {
  const V = sheet.number(numbered('volume', n), 'm3', { above: 0 }, `V_{${n}}`);
  const P = absoluteIn(sheet, numbered('P', n), `P_{${n}}`, 'kPa_abs');
  const T = sheet.number(numbered('T', n), 'K', { above: 0 }, `T_{${n}}`);
  const Z = sheet.number(numbered('Z', n), '-', { above: 0 }, `Z_{${n}}`);
  const part = { P, V, T, Z };
  sheet.step(
    {
      key: `n_${n}`,
      tex: `n_{${n}}`,
      meaning: `amount of gas in part ${n}`,
      value: amount(part),
      unit: 'kmol',
    },
    (v) =>
      `\\frac{1000 \\cdot ${v(numbered('P', n))} \\cdot ${v(numbered('volume', n))}}{${v(numbered('Z', n))} \\cdot ${v('R')} \\cdot ${v(numbered('T', n))}}`,
  );
  return part;
}

/** Temperature or compressibility after settling: as given, or the mean by amount. */
function meanStep(sheet: SheetBuilder, parts: readonly LoopPart[], name: 'T' | 'Z', words: string): number {
  const unit = name === 'T' ? 'K' : '-';
  if (sheet.has(`${name}_settled`))
    return sheet.number(`${name}_settled`, unit, { above: 0 }, `${name}_{so}`);
  return sheet.step(
    {
      key: `${name}_settled`,
      tex: `${name}_{so}`,
      meaning: `${words}, mean by amount of gas`,
      value: meanBy(parts, (part) => part[name]),
      unit,
    },
    (v) => {
      const all = parts.map((_, i) => i + 1);
      return `\\frac{${all.map((n) => `${v(`n_${n}`)} \\cdot ${v(numbered(name, n))}`).join(' + ')}}{${all.map((n) => v(`n_${n}`)).join(' + ')}}`;
    },
  );
}

/** Whether the valve lifts, when its set pressure is known. */
function judge(sheet: SheetBuilder, pressure: number): void {
  if (!sheet.has('set_pressure')) return;
  const set = absoluteIn(sheet, 'set_pressure', 'P_{set}', 'kPa_abs');
  sheet.output('relief_needed', pressure > set);
  if (pressure > 0.9 * set && pressure <= set)
    sheet.warn(
      'CLOSE_TO_SET',
      'The loop settles above 90 % of the set pressure: check the assumptions and leakage of the valve.',
      'up to 90 % of set',
    );
}

/** f.settle-out: settle-out pressure of a compressor loop. */
export const SETTLE_OUT: Method = {
  id: 'f.settle-out',
  version: 1,
  topic: 'f.settle-out',
  title: 'Settle-out pressure of a stopped compressor loop',
  editions: ['gas law with compressibility'],
  source:
    'Balance of mass and energy of the parts of a closed loop that equalises, gas law with Z (common practice, no source)',
  validity:
    'One gas, no flow in or out, no liquid; equal molar heat in all parts; heat of the metal neglected unless T_settled is given, which may raise the pressure of a cold loop as it warms.',
  inputs: [
    input(
      'volume',
      'volume of the first part (volume_2, volume_3 … of further parts, and so for P, T, Z)',
      'volume',
      { rangeKey: 'volume', each: 'part' },
    ),
    input('P', 'pressure of the part', 'pressure-absolute', { each: 'part' }),
    input('T', 'temperature of the part', 'temperature', { each: 'part' }),
    input('Z', 'compressibility factor of the part', 'dimensionless', { rangeKey: 'z', each: 'part' }),
    optional('M', 'molar mass, for the mass in the loop', 'molar-mass', { rangeKey: 'molarMass' }),
    optional('T_settled', 'temperature after settling (mean by amount when not given)', 'temperature'),
    optional('Z_settled', 'compressibility after settling (mean by amount when not given)', 'dimensionless', {
      rangeKey: 'z',
    }),
    optional('set_pressure', 'set pressure of the valve on the loop', 'pressure-gauge', {
      rangeKey: 'setPressure',
    }),
    optional('atmospheric_pressure', 'barometric pressure', 'pressure-absolute', { rangeKey: 'barometer' }),
  ],
  outputs: [
    output('settle_out_pressure', 'settle-out pressure', 'pressure-absolute'),
    output('settle_out_temperature', 'settle-out temperature', 'temperature'),
    output('mass', 'gas in the loop', 'mass'),
    output('relief_needed', 'whether it passes the set pressure'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      sheet.keep('R', GAS_CONSTANT);
      const count = Math.max(2, countNumbered(sheet, 'volume'));
      const parts = Array.from({ length: count }, (_, i) => readPart(sheet, i + 1));
      const T = meanStep(sheet, parts, 'T', 'temperature');
      const Z = meanStep(sheet, parts, 'Z', 'compressibility factor');
      const all = parts.map((_, i) => i + 1);
      const P = sheet.step(
        {
          key: 'Pso',
          tex: 'P_{so}',
          meaning: 'settle-out pressure',
          value: settleOut(parts, T, Z),
          unit: 'kPa_abs',
        },
        (v) =>
          `\\frac{${v('Z_settled')} \\cdot ${v('R')} \\cdot ${v('T_settled')} \\cdot (${all.map((n) => v(`n_${n}`)).join(' + ')})}{1000 \\cdot (${all.map((n) => v(numbered('volume', n))).join(' + ')})}`,
      );
      sheet.output('settle_out_pressure', P, 'kPa_abs');
      sheet.output('settle_out_temperature', T, 'K');
      if (sheet.has('M')) {
        const M = sheet.number('M', 'kg/kmol', { above: 0 });
        const mass = M * parts.reduce((sum, part) => sum + amount(part), 0);
        const unit = sheet.quantity('M').unit.startsWith('lb') ? 'lb' : 'kg';
        sheet.output('mass', fromSI(mass, unit).value, unit);
      }
      judge(sheet, P);
    });
  },
};
