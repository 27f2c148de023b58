/* Units as a document of cases writes them: read by key or by spelling, and results brought into the unit asked for. */
import { convert, dimensionOf, type Q } from '../quantity';
import { unitFromWords } from '../quantity/words';
import { type CalcValue } from './value';

/** The key of a unit as written (`kPa abs` → `kPa_abs`), or the text itself when no unit is called so. */
export function readUnit(text: string): string {
  return dimensionOf(text) === undefined ? (unitFromWords(text) ?? text) : text;
}

/** Flow coefficients are printed in m³/h in the trade and are the unit Kv here: the number is the same. */
function isCoefficient(from: string, to: string): boolean {
  return from === 'Kv' && to === 'm3/h';
}

const READINGS: readonly (string | undefined)[] = ['pressure-gauge', 'pressure-absolute'];

/** The number in the unit asked for, or undefined when the unit measures something else. Gauge ↔ absolute by `barometer`. */
export function inUnit(value: number, from: string, to: string, barometer: Q): number | undefined {
  if (from === to || isCoefficient(from, to)) return value;
  const [have, want] = [dimensionOf(from), dimensionOf(to)];
  if (have === undefined || want === undefined) return undefined;
  if (have !== want && !(READINGS.includes(have) && READINGS.includes(want))) return undefined;
  return convert({ value, unit: from }, to, { barometer });
}

/** A result (a number or a list) in the unit asked for; words and flags as they are; undefined when the unit does not fit. */
export function asAsked(given: CalcValue, asked: string, barometer: Q): CalcValue | undefined {
  const from = given.unit ?? '-';
  const to = readUnit(asked);
  const one = (value: unknown) => (typeof value === 'number' ? inUnit(value, from, to, barometer) : value);
  const list: readonly unknown[] = Array.isArray(given.value) ? given.value : [given.value];
  if (!list.some((value) => typeof value === 'number')) return given;
  const values = list.map(one);
  if (values.includes(undefined)) return undefined;
  return { value: (Array.isArray(given.value) ? values : values[0]) as CalcValue['value'], unit: asked };
}
