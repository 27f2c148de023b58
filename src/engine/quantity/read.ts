/* Reading what a person types into a quantity field, and saying in a sentence what is wrong with it. */
import { dimensionOf, unitLabel } from './convert';
import { type Dimension, type Q } from './types';
import { unitFromWords } from './words';

/** What a field expects: the dimensions it takes, and the unit that a bare number means. */
export type Expected = { dimension: Dimension | Dimension[]; unit: string };

/** The outcome of reading: a quantity, or a code with a sentence for the person. */
export type ReadResult =
  | { ok: true; q: Q }
  | {
      ok: false;
      code: 'NOT_A_NUMBER' | 'UNIT_AMBIGUOUS' | 'UNIT_UNKNOWN' | 'WRONG_DIMENSION';
      sentence: string;
    };

type Failure = Extract<ReadResult, { ok: false }>;

const SPACES = /[\s\u00a0\u2009\u202f']/g;
/** A sign, then digits grouped in threes by spaces, or digits with points and commas; then an exponent. */
const NUMBER =
  /^\s*([+\-\u2212]?\s*(?:\d{1,3}(?:[\s\u00a0\u2009\u202f']\d{3}(?!\d))+(?:[.,]\d+)?|\d[\d.,]*|[.,]\d+)(?:[eE][+\-\u2212]?\d+)?)/;

const NAMES: Partial<Record<Dimension, string>> = {
  'pressure-gauge': 'a gauge pressure',
  'pressure-absolute': 'an absolute pressure',
  'pressure-difference': 'a pressure difference',
  'temperature-difference': 'a temperature difference',
  dimensionless: 'a plain number',
};

/** The dimension in words, with its article. */
function nameOf(dimension: Dimension): string {
  const plain = dimension.replace(/-/g, ' ');
  return NAMES[dimension] ?? `${/^[aeiou]/.test(plain) ? 'an' : 'a'} ${plain}`;
}

function fail(code: Failure['code'], sentence: string): Failure {
  return { ok: false, code, sentence };
}

/** The number in a text with any thousands and decimal marks; undefined = no number, a list = readings to choose from. */
function readNumber(raw: string): number | undefined | [string, string] {
  const text = raw.replace(SPACES, '').replace(/\u2212/g, '-');
  const commas = text.split(',').length - 1;
  const dots = text.split('.').length - 1;
  if (commas === 1 && dots === 0 && /^[+-]?[1-9]\d{0,2},\d{3}$/.test(text))
    return [text.replace(',', ''), text.replace(',', '.')];
  const commaDecimal = commas === 1 && text.lastIndexOf(',') > text.lastIndexOf('.');
  const marks = commaDecimal ? /\./g : /,/g;
  const grouped = commaDecimal ? dots > 0 : commas > 0;
  const whole = text.split(commaDecimal ? ',' : '.')[0] ?? '';
  if (grouped && !/^[+-]?\d{1,3}(?:[.,]\d{3})+$/.test(whole)) return undefined;
  const plain = text.replace(marks, '').replace(',', '.');
  return /^[+-]?(?:\d+\.?\d*|\.\d+)(?:[eE][+-]?\d+)?$/.test(plain) ? Number(plain) : undefined;
}

/** The key a typed unit stands for in a field that takes these dimensions (a difference field reads °C as a step). */
function unitFor(word: string, takes: readonly Dimension[]): string | undefined {
  const key = unitFromWords(word);
  const differenceOnly = takes.includes('temperature-difference') && !takes.includes('temperature');
  if (differenceOnly && (key === 'degC' || key === 'K')) return 'dK';
  if (differenceOnly && (key === 'degF' || key === 'degR')) return 'dF';
  if (key === 'deg' && takes.includes('temperature')) return undefined;
  return key;
}

/** Whether a bare bar, psi or kPa leaves open what is meant. */
function isAmbiguous(key: string, takes: readonly Dimension[]): boolean {
  const readings = takes.includes('pressure-gauge') || takes.includes('pressure-absolute');
  return dimensionOf(key) === 'pressure-difference' && readings;
}

function ambiguous(number: string, key: string): Failure {
  const gauge = key === 'psi' ? 'psig' : `${key}_g`;
  const absolute = key === 'psi' ? 'psia' : `${key}_abs`;
  const [bare, asGauge, asAbsolute] = [key, gauge, absolute].map(unitLabel);
  return fail(
    'UNIT_AMBIGUOUS',
    `${number} ${bare}: gauge or absolute? Write ${number} ${asGauge} or ${number} ${asAbsolute}.`,
  );
}

/**
 * Reads typed text such as "12.5 bar(g)", "180 psig", "75 °C", "1 250,5 kg/h". A bare number takes `expected.unit`.
 * Bare bar, psi or kPa for a pressure reading is ambiguous. Every refusal says what would be right.
 */
export function readTyped(text: string, expected: Expected): ReadResult {
  const takes = Array.isArray(expected.dimension) ? expected.dimension : [expected.dimension];
  const usual = unitLabel(expected.unit);
  const typed = text.trim();
  const match = NUMBER.exec(typed);
  const example = usual === '' ? 'such as 0.85' : `with its unit, such as 12.5 ${usual}`;
  if (!match?.[1]) {
    const what = typed === '' ? 'Nothing was typed' : `"${typed}" does not begin with a number`;
    return fail('NOT_A_NUMBER', `${what}. Write a number ${example}.`);
  }
  const number = match[1].trim();
  const value = readNumber(number);
  if (Array.isArray(value))
    return fail('NOT_A_NUMBER', `${number} can be read two ways. Write ${value[0]} or ${value[1]}.`);
  if (value === undefined || !Number.isFinite(value))
    return fail('NOT_A_NUMBER', `"${number}" is not a number. Write a number ${example}.`);
  return withUnit(value, number, typed.slice(match[0].length).trim(), takes, expected.unit);
}

function withUnit(
  value: number,
  number: string,
  word: string,
  takes: readonly Dimension[],
  usual: string,
): ReadResult {
  const wanted = takes.map(nameOf).join(' or ');
  const key = word === '' ? usual : unitFor(word, takes);
  if (key === undefined)
    return fail(
      'UNIT_UNKNOWN',
      `The unit "${word}" is not known here. This is ${wanted}, usually in ${unitLabel(usual) || 'plain numbers'}.`,
    );
  if (isAmbiguous(key, takes)) return ambiguous(number, key);
  const dimension = dimensionOf(key);
  if (dimension === undefined || !takes.includes(dimension)) {
    const got = dimension === undefined ? 'nothing known' : nameOf(dimension);
    return fail(
      'WRONG_DIMENSION',
      `${unitLabel(key) || 'No unit'} measures ${got}; this is ${wanted}, usually in ${unitLabel(usual) || 'plain numbers'}.`,
    );
  }
  // The digits as typed say how exactly they are known; the unit stands beside them.
  return { ok: true, q: { value, unit: key, text: number.trim() } };
}
