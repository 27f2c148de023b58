/* One figure of a document as it is edited: what it is called, what stands there, and what the typed text comes to. */
import { type Dimension, dimensionOf, formatQuantity, type Q, readTyped } from '@engine/quantity';
import { methodById } from '@engine/catalog';
import {
  type Basis,
  childOf,
  describePath,
  expectedAt,
  getAt,
  isFigure,
  isKnown,
  type KnownFigure,
  type Origin,
  rangeKeyAt,
  splitPath,
} from '@domain/basis';
import { checkRange, type JudgementRules } from '@domain/rules';

/** What a person has typed for one figure; kept as typed, right or wrong. */
export type Typed = { text: string; kind: Origin['kind'] | ''; ref: string };
export type Field = {
  path: string;
  label: string;
  where: string;
  /** The value that stands there, in words; a reason when it is not known. */
  present: string;
  /** The unit that a bare number means. */
  unit: string;
  dimensions: Dimension[];
  rangeKey?: string;
  start: Typed;
};
export type Read =
  | { state: 'same' }
  | { state: 'right'; figure: KnownFigure; warning?: string }
  | { state: 'wrong'; sentence: string };

const PRESSURES: readonly Dimension[] = ['pressure-gauge', 'pressure-absolute'];

/** The row of a method's input that a path stands for; nothing for other figures. */
function inputOf(doc: Basis, path: string) {
  const { parent, last } = splitPath(path);
  const { parent: calc, last: holder } = splitPath(parent);
  const method = holder === 'inputs' ? childOf(getAt(doc, calc), 'method') : undefined;
  const inputs = typeof method === 'string' ? methodById(method)?.inputs : undefined;
  return inputs?.find(({ name }) => name === last);
}

function dimensionsOf(doc: Basis, path: string, unit: string | undefined): Dimension[] {
  const expected = expectedAt(path, doc)?.dimension ?? [];
  const own = (unit && dimensionOf(unit)) ?? inputOf(doc, path)?.dimension;
  const all = own && !expected.includes(own) ? [own, ...expected] : expected;
  return all.some((one) => PRESSURES.includes(one)) ? [...new Set([...all, ...PRESSURES])] : all;
}

/** The digits of a quantity: as printed where they say more than the number. */
function digitsOf({ value, text }: Q): string {
  return text !== undefined && Number(text) === value ? text : String(value);
}

/** A copied figure that gets another value is a copy no more: its origin is asked again. */
function startOf(figure: KnownFigure | undefined): Typed {
  const origin = figure?.origin;
  return {
    text: figure ? digitsOf(figure) : '',
    kind: origin && origin.kind !== 'figure' ? origin.kind : '',
    ref: origin && origin.kind !== 'figure' ? origin.ref : '',
  };
}

/** The field of a path, or nothing where no figure can be typed (another kind of value, or taken from elsewhere). */
export function fieldOf(doc: Basis, path: string): Field | undefined {
  const value = getAt(doc, path);
  const figure = isFigure(value) ? value : undefined;
  if (value !== undefined && !figure) return undefined;
  const known = figure && isKnown(figure) ? figure : undefined;
  const unit = known?.unit ?? expectedAt(path, doc)?.unit;
  const dimensions = dimensionsOf(doc, path, unit);
  if (unit === undefined || dimensions.length === 0) return undefined;
  const missing = figure && !isKnown(figure) ? `not known: ${figure.unknown}` : 'not stated';
  const { label, where } = describePath(doc, path);
  return {
    path,
    label: label.replaceAll('_', ' '),
    where,
    present: known ? formatQuantity(known) : missing,
    unit,
    dimensions,
    rangeKey: rangeKeyAt(path, doc) ?? inputOf(doc, path)?.rangeKey,
    start: startOf(known),
  };
}

function sameAsStart(typed: Typed, start: Typed): boolean {
  return typed.text.trim() === start.text && typed.kind === start.kind && typed.ref.trim() === start.ref;
}

/** The number as typed, when its digits say more than the number itself ("5.10"). */
function textOf(typed: string, value: number): string | undefined {
  const digits = /^[+-]?\d+(?:\.\d+)?/.exec(typed.trim())?.[0];
  return digits !== undefined && Number(digits) === value && digits !== String(value) ? digits : undefined;
}

function originOf(typed: Typed, doc: Basis, path: string): Origin | undefined {
  if (typed.kind === '') return undefined;
  const value = getAt(doc, path);
  const old = isFigure(value) && isKnown(value) ? value.origin : undefined;
  const same = old?.kind === typed.kind && old.ref === typed.ref.trim();
  return same ? old : { kind: typed.kind, ref: typed.ref.trim() };
}

/** Reads what was typed: nothing new, a figure (perhaps an unusual one), or the sentence that says what would be right. */
export function readField(field: Field, typed: Typed, doc: Basis, rules: JudgementRules): Read {
  if (sameAsStart(typed, field.start)) return { state: 'same' };
  const read = readTyped(typed.text, { dimension: field.dimensions, unit: field.unit });
  if (!read.ok) return { state: 'wrong', sentence: read.sentence };
  const { value, unit } = read.q;
  const site = { barometer: rules.barometer, ranges: rules.ranges };
  const check = field.rangeKey
    ? checkRange(field.rangeKey, { value, unit }, site, field.label)
    : { verdict: 'possible' as const, sentence: undefined };
  if (check.verdict === 'impossible')
    return { state: 'wrong', sentence: check.sentence ?? 'This is impossible.' };
  const text = textOf(typed.text, value);
  const origin = originOf(typed, doc, field.path);
  const figure = { value, unit, ...(text ? { text } : {}), ...(origin ? { origin } : {}) };
  return { state: 'right', figure, ...(check.sentence ? { warning: check.sentence } : {}) };
}
