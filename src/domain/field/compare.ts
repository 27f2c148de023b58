/* What was seen against what was signed: units apart and printed digits respected, so that only real differences hold. */
import {
  convert,
  dimensionOf,
  formatQuantity,
  type Q,
  type QuantityContext,
  unitLabel,
} from '@engine/quantity';
import { type FieldLine } from './types';

/** Share of a value within which two readings are the same; from the rule on field sheets. */
export const ROUNDING = 0.005;
/** The widest band that coarse printing can claim: "5" on a plate does not stand for 5.10. */
export const PRINTED_MOST = 0.01;

/** `tolerance` is in the unit of what was signed; 0 for words. */
export type Compared = { agrees: boolean; tolerance: number; sentence: string };

/** Half of the last digit as printed, in the unit of the quantity ("5.10" → 0.005; 150 → 0.5). */
export function halfDigit(q: Q): number {
  const text = (q.text ?? String(q.value)).replace(',', '.');
  const decimals = /^\s*[−-]?[\d\s  ]*\.(\d+)/.exec(text)?.[1]?.length ?? 0;
  return 0.5 * 10 ** -decimals;
}

/** A word as it is compared: case, blanks and the sign of multiplication do not matter. */
export function plainWord(word: string): string {
  return word
    .normalize('NFKC')
    .trim()
    .toLowerCase()
    .replace(/[×✕]/g, 'x')
    .replace(/\s*x\s*/g, 'x')
    .replace(/[\s_]+/g, ' ');
}

function compareFigures(wants: Q, seen: Q, context: QuantityContext | undefined): Compared {
  let value: number;
  try {
    value = convert(seen, wants.unit, context);
  } catch {
    const kinds = `${unitLabel(seen.unit)} and ${unitLabel(wants.unit)}`;
    return {
      agrees: false,
      tolerance: 0,
      sentence: `The units ${kinds} do not measure the same; enter it as the plate says.`,
    };
  }
  const scale =
    seen.value === 0
      ? 1
      : Math.abs((value - convert({ ...seen, value: 0 }, wants.unit, context)) / seen.value);
  const printed = Math.min(
    Math.max(halfDigit(seen) * scale, halfDigit(wants)),
    PRINTED_MOST * Math.abs(wants.value),
  );
  const tolerance = Math.max(printed, ROUNDING * Math.abs(wants.value));
  const off = Math.abs(value - wants.value);
  const agrees = off <= tolerance * (1 + 1e-9);
  const both = `seen ${shown(seen)}, signed ${shown(wants)}`;
  return {
    agrees,
    tolerance,
    sentence: agrees ? `Agrees within rounding: ${both}.` : `Differs by more than rounding: ${both}.`,
  };
}

function shown(q: Q): string {
  return q.text === undefined ? formatQuantity(q) : `${q.text} ${unitLabel(q.unit)}`.trim();
}

/**
 * Compares a reading with its line. A line without a signed value agrees with whatever is seen. Gauge against absolute
 * needs the barometer; without it, or with another kind of unit, the two differ.
 */
export function compareSeen(
  line: Pick<FieldLine, 'label' | 'wants'>,
  seen: Q | string,
  context?: QuantityContext,
): Compared {
  const { wants } = line;
  if (wants === undefined) return { agrees: true, tolerance: 0, sentence: 'Recorded.' };
  if (typeof wants === 'string' || typeof seen === 'string') {
    if (typeof wants !== typeof seen)
      return {
        agrees: false,
        tolerance: 0,
        sentence: `${line.label}: a ${typeof wants === 'string' ? 'word' : 'figure with its unit'} is asked.`,
      };
    const agrees = plainWord(String(wants)) === plainWord(String(seen));
    const both = `seen ${String(seen)}, signed ${String(wants)}`;
    return { agrees, tolerance: 0, sentence: agrees ? `Agrees: ${both}.` : `Differs: ${both}.` };
  }
  return compareFigures(wants, seen, context);
}

export type Ask =
  { kind: 'quantity'; dimension: string; unit: string } | { kind: 'word'; choices: readonly string[] };

const CHOICES: readonly (readonly [RegExp, readonly string[]])[] = [
  [/#(removed|transport)$/, ['removed', 'still in place']],
  [/#seals$/, ['intact', 'broken', 'missing']],
  [/#drawn(-inlet|-outlet)?$/, ['as drawn', 'differs']],
  [/#certificate$/, ['same as plate', 'differs', 'no certificate']],
  [/#discharge$/, ['clear', 'blocked', 'changed']],
  [/\/kept$/, ['open', 'shut', 'between']],
  [/\/bonnet\/vent$/, ['open', 'piped', 'plugged']],
  [/\/bonnet\/plug$/, ['in', 'out']],
  [/\/service$/, ['in-service', 'spare', 'out-of-service']],
];

/** How a line is asked before anything is shown: its kind and unit or its words, never the signed value. */
export function askOf(line: FieldLine): Ask {
  const { wants } = line;
  if (wants !== undefined && typeof wants !== 'string')
    return { kind: 'quantity', dimension: dimensionOf(wants.unit) ?? 'dimensionless', unit: wants.unit };
  return { kind: 'word', choices: CHOICES.find(([pattern]) => pattern.test(line.key))?.[1] ?? [] };
}
