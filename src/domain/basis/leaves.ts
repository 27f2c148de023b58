/* What of a document is one leaf: it differs, merges and conflicts as a whole. */
import { originSchema, type F, type Input } from './figures';
import { isFields } from './paths';

const ORIGIN_KINDS: ReadonlySet<unknown> = new Set(originSchema.shape.kind.options);
const CALC_WAYS: ReadonlySet<unknown> = new Set(['method', 'given', 'external', 'sum', 'none']);

/** True for a figure: a quantity with or without origin, or one that was asked for and is not known. */
export function isFigure(value: unknown): value is F {
  if (!isFields(value)) return false;
  if (typeof value['unknown'] === 'string') return true;
  return typeof value['value'] === 'number' && typeof value['unit'] === 'string';
}

/** True for a rich text. */
export function isRich(value: unknown): value is { type: 'doc'; content: unknown[] } {
  return isFields(value) && value['type'] === 'doc' && Array.isArray(value['content']);
}

/** True for an input of a method that is not a figure: a path, a word, a flag or a list of ids. */
export function isWordInput(value: unknown): value is Exclude<Input, F> {
  if (!isFields(value)) return false;
  const names = Object.keys(value).filter((name) => name !== 'origin' && value[name] !== undefined);
  const [name] = names;
  return (
    names.length === 1 &&
    (name === 'use' || name === 'word' || name === 'flag' || (name === 'list' && Array.isArray(value[name])))
  );
}

function isOrigin(value: unknown): boolean {
  return (
    isFields(value) &&
    ORIGIN_KINDS.has(value['kind']) &&
    typeof value['ref'] === 'string' &&
    value['id'] === undefined
  );
}

function isFigureRef(value: unknown): boolean {
  return isFields(value) && typeof value['doc'] === 'string' && isFigure(value['taken']);
}

/** The way of a calculation (`by`), or nothing for anything else. */
export function wayOfCalc(value: unknown): string | undefined {
  if (!isFields(value)) return undefined;
  const way = value['by'];
  return typeof way === 'string' && CALC_WAYS.has(way) ? way : undefined;
}

/** True for a value that is never taken apart: a word, number or flag, a figure, an input, an origin, a rich text, a list of words. */
export function isLeaf(value: unknown): boolean {
  if (Array.isArray(value)) return value.length > 0 && value.every((element) => !isFields(element));
  if (!isFields(value)) return true;
  return isFigure(value) || isRich(value) || isWordInput(value) || isOrigin(value) || isFigureRef(value);
}
