/* Reading pressures on a sheet: gauge or absolute, each step from one to the other shown. */
import { dimensionOf, formatQuantity, type Q, unitLabel } from '../../quantity';
import { type SheetBuilder } from '../../sheet';
import { SYSTEM_UNITS, type System } from './system';

/** The standard atmosphere as the conventions of the reference cases fix it. */
const STANDARD: Record<string, number> = { kPa_abs: 101.325, bar_abs: 1.01325, psia: 14.7 };

/** The barometric pressure in the system's absolute unit; the standard atmosphere, with a warning, when not given. */
export function barometer(sheet: SheetBuilder, system: System): number {
  return barometerIn(sheet, SYSTEM_UNITS[system].P);
}

/** The same in kPa_abs, bar_abs or psia. */
export function barometerIn(sheet: SheetBuilder, unit: string): number {
  if (sheet.has('atmospheric_pressure'))
    return sheet.number('atmospheric_pressure', unit, { above: 0 }, 'p_{atm}');
  const assumed = STANDARD[unit] ?? 101.325;
  const text = `No barometric pressure was given; ${assumed} ${unitLabel(unit)} is used. A site above sea level has less.`;
  if (!sheet.warnings.some((w) => w.code === 'BAROMETER_ASSUMED')) sheet.warn('BAROMETER_ASSUMED', text);
  return sheet.keep('atmospheric_pressure', assumed, 'p_{atm}');
}

function isGauge(q: Q): boolean {
  return dimensionOf(q.unit) === 'pressure-gauge';
}

/** A symbol with a mark in its index: `P_1` → `P_{1,g}`. */
function marked(tex: string, mark: string): string {
  return tex.replace(/_(\w)$/, '_{$1}').replace(/\}$/, `,${mark}}`);
}

/** An absolute pressure in the system's unit, given as absolute or as gauge (then the conversion is a step). */
export function absolutePressure(sheet: SheetBuilder, name: string, tex: string, system: System): number {
  return absoluteIn(sheet, name, tex, SYSTEM_UNITS[system].P);
}

/** The same in any absolute unit that has a gauge twin (kPa_abs, bar_abs, psia). */
export function absoluteIn(sheet: SheetBuilder, name: string, tex: string, unit: string): number {
  if (!isGauge(sheet.quantity(name))) return sheet.number(name, unit, { above: 0 }, tex);
  const atmosphere = barometerIn(sheet, unit);
  const gauge = sheet.number(name, unit === 'psia' ? 'psig' : unit.replace('_abs', '_g'), {}, tex);
  const value = gauge + atmosphere;
  if (value <= 0)
    sheet.refuse('VALUE_IMPOSSIBLE', name, `${name} is below absolute vacuum at this barometric pressure.`);
  sheet.keep(`${name} gauge`, gauge, marked(tex, 'g'));
  return sheet.step(
    { key: name, tex, meaning: 'as an absolute pressure', value, unit },
    (v) => `${v(`${name} gauge`)} + ${v('atmospheric_pressure')}`,
  );
}

/** A gauge pressure, given as gauge or as absolute (then the conversion is a step of the sheet). */
export function gaugePressure(sheet: SheetBuilder, name: string, tex: string, system: System): number {
  const { P, Pg } = SYSTEM_UNITS[system];
  const given = sheet.quantity(name);
  if (dimensionOf(given.unit) !== 'pressure-absolute') return sheet.number(name, Pg, {}, tex);
  const atmosphere = barometer(sheet, system);
  const absolute = sheet.number(name, P, { above: 0 }, tex);
  sheet.keep(`${name} absolute`, absolute, marked(tex, 'abs'));
  return sheet.step(
    { key: name, tex, meaning: 'as a gauge pressure', value: absolute - atmosphere, unit: Pg },
    (v) => `${v(`${name} absolute`)} - ${v('atmospheric_pressure')}`,
  );
}

/**
 * The relieving pressure, absolute: `P1` as given, or set pressure × (1 + overpressure) + barometer.
 * Gives the output `P1`.
 */
export function relievingAbsolute(sheet: SheetBuilder, system: System): number {
  const { P, Pg } = SYSTEM_UNITS[system];
  if (sheet.has('P1')) {
    const given = absolutePressure(sheet, 'P1', 'P_1', system);
    sheet.output('P1', given, P);
    return given;
  }
  if (!sheet.has('set_pressure'))
    sheet.refuse(
      'INPUT_MISSING',
      'P1',
      'The relieving pressure (P1), or set_pressure with overpressure, is missing.',
    );
  const set = sheet.number('set_pressure', Pg, { above: 0 }, 'p_{set}');
  const over = sheet.number('overpressure', '-', { min: 0, max: 1 }, 'x_{over}');
  const atmosphere = barometer(sheet, system);
  const value = sheet.step(
    {
      key: 'P1',
      tex: 'P_1',
      meaning: 'relieving pressure, absolute',
      value: set * (1 + over) + atmosphere,
      unit: P,
    },
    (v) => `${v('set_pressure')} \\cdot (1 + ${v('overpressure')}) + ${v('atmospheric_pressure')}`,
  );
  sheet.output('P1', value, P);
  return value;
}

/** A pressure for a sentence: as it was typed when it was typed as absolute, else as worked. */
export function shownPressure(sheet: SheetBuilder, name: string, value: number, unit: string): string {
  const given = sheet.inputs[name];
  const typed = typeof given === 'object' && dimensionOf(given.unit) === dimensionOf(unit);
  return formatQuantity(typed ? given : { value, unit });
}
