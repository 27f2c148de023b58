/* Fills the placeholders of a rule's statement with the values of a hit, units shown. */
import { formatNumber, formatQuantity, type Q } from '@engine/quantity';

/** A value as the sentence shows it: "3.5 barg"; a bare number where the statement says the unit itself ("{x} %"). */
function shown(value: Q | string, unitFollows: boolean): string {
  if (typeof value === 'string') return value;
  if (unitFollows || value.unit === '-' || value.unit === '') return formatNumber(value.value);
  return formatQuantity(value);
}

/** The statement with its {placeholders} filled; one without a value stays readable as a dash. */
export function fill(statement: string, values: Record<string, Q | string>): string {
  const sentence = statement.replace(/\{(\w+)\}(?=(.{0,8}))/g, (_all, name: string, next: string) => {
    const value = values[name];
    if (value === undefined) return '—';
    const unitFollows =
      typeof value === 'object' &&
      (/^ ?%/.test(next) || next.startsWith(' kJ/kg') || next.startsWith(' min'));
    return shown(value, unitFollows);
  });
  return sentence.charAt(0).toUpperCase() + sentence.slice(1);
}
