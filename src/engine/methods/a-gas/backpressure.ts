/* Method a.backpressure-factor: Kb of balanced valves in gas service from the curves of the standard. */
import { type Method } from '../../catalog/types';
import { interpolate } from '../../numeric';
import { type SheetBuilder, workSheet } from '../../sheet';
import { input, output } from '../common/describe';
import { systemOf, SYSTEM_UNITS } from '../common/system';
import { gaugePressure } from '../common/pressures';
import { KB_10, KB_16 } from './kb-curves';

/** The overpressures the curves are drawn for. */
const CURVES = [
  { overpressure: 0.1, curve: KB_10 },
  { overpressure: 0.16, curve: KB_16 },
  { overpressure: 0.21, curve: undefined },
] as const;

/**
 * Kb of a balanced valve by the standard's curve; `percent` = 100 × gauge back pressure / gauge set pressure,
 * `overpressure` 0.10, 0.16 or 0.21. Undefined above 50 % or at another overpressure. 2 % reading accuracy.
 */
export function balancedKb(percent: number, overpressure: number): number | undefined {
  const row = CURVES.find((c) => Math.abs(c.overpressure - overpressure) < 1e-6);
  if (!row || percent > 50 || percent < 0) return undefined;
  if (!row.curve) return 1;
  const [first = 0, last = 0] = [row.curve.x[0], row.curve.x.at(-1)];
  if (percent < first) return 1;
  return interpolate(row.curve, Math.min(percent, last));
}

/** Reads the curve, or refuses outside of it. */
function curveStep(sheet: SheetBuilder, percent: number, overpressure: number): number {
  const Kb = balancedKb(percent, overpressure);
  if (Kb === undefined) {
    const text =
      'The curves for Kb reach from 0 to 50 % back pressure and are drawn for 10, 16 and 21 % overpressure; use the maker’s curve outside of them.';
    sheet.refuse('OUTSIDE_CURVE', percent > 50 || percent < 0 ? 'back_pressure' : 'overpressure', text);
  }
  return sheet.step(
    {
      key: 'Kb',
      tex: 'K_b',
      meaning: 'back-pressure factor read from the curve',
      value: Kb,
      unit: '-',
      clause: 'API 520-1, figure for Kb',
    },
    (v) => `\\text{curve at } ${v('percent')}\\,\\%`,
  );
}

/** a.backpressure-factor: Kb of a balanced valve in gas service. */
export const GAS_BACKPRESSURE: Method = {
  id: 'a.backpressure-factor',
  version: 1,
  topic: 'a.backpressure-factor',
  title: 'Back-pressure factor Kb of balanced valves (gas)',
  editions: ['API 520-1, 7th to 10th edition'],
  source: 'API Standard 520 Part I, figure for Kb, as digitised in the open library CalebBell/fluids',
  validity:
    'Back pressure up to 50 % of set, overpressure 10, 16 or 21 %; set pressures above 50 psig; chart reading 2 %. The maker’s curve takes precedence.',
  inputs: [
    input('set_pressure', 'set pressure', 'pressure-gauge', { rangeKey: 'setPressure' }),
    input('back_pressure', 'total back pressure', 'pressure-gauge'),
    input('overpressure', 'overpressure as a fraction of set', 'dimensionless', { rangeKey: 'overpressure' }),
  ],
  outputs: [
    output('gauge_back_pressure_percent', 'back pressure in percent of set, both gauge', 'dimensionless'),
    output('Kb', 'back-pressure factor', 'dimensionless'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const system = systemOf(inputs, ['set_pressure']);
      const set = sheet.number('set_pressure', SYSTEM_UNITS[system].Pg, { above: 0 }, 'p_{set}');
      const back = gaugePressure(sheet, 'back_pressure', 'p_b', system);
      const overpressure = sheet.number('overpressure', '-', { min: 0 }, 'x_{over}');
      const percent = sheet.step(
        {
          key: 'percent',
          tex: 'b',
          meaning: 'gauge back pressure in percent of set',
          value: (100 * back) / set,
          unit: '%',
        },
        (v) => `100 \\cdot \\frac{${v('back_pressure')}}{${v('set_pressure')}}`,
      );
      sheet.output('gauge_back_pressure_percent', percent, '%');
      const Kb = curveStep(sheet, percent, overpressure);
      sheet.output('Kb', Kb);
    });
  },
};
