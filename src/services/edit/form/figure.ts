/* Reads one typed figure of a form: number, unit and origin, as an operation on the document. */
import {
  type Basis,
  type F,
  capital,
  describePath,
  expectedAt,
  getAt,
  isFigure,
  isKnown,
  type KnownFigure,
  type Op,
  type Origin,
  originSchema,
  type Path,
  splitPath,
} from '@domain/basis';
import { type FieldError } from '@domain/result';
import { methodById } from '@engine/catalog';
import { type Dimension, dimensionOf, displayUnit, type Q, readTyped } from '@engine/quantity';
import { type Asked } from './fields';

export type Read = { ops: Op[]; errors: FieldError[] };
export type Expects = { dimension: Dimension[]; unit: string };

const NOTHING: Read = { ops: [], errors: [] };
const KINDS = new Set<string>(originSchema.shape.kind.options);

/** The digits that a form shows of a figure: as typed where they were kept, else the plain number. */
export function digitsOf(figure: F | undefined): string {
  if (!figure || !isKnown(figure)) return '';
  return figure.text ?? String(figure.value);
}

/** The dimension of a method's input, which only the method knows. */
function expectsOfInput(document: Basis, path: Path): Expects | undefined {
  const { parent, last } = splitPath(path);
  const calc = getAt(document, splitPath(parent).parent);
  const method = typeof calc === 'object' && calc !== null && 'method' in calc ? calc.method : undefined;
  const dimension = methodById(String(method))?.inputs.find((input) => input.name === last)?.dimension;
  return dimension && { dimension: [dimension], unit: displayUnit(dimension, document.units) };
}

/** What a figure at this path may be entered in: by its range, by its method, or as it stands there now. */
export function expectsAt(document: Basis, path: Path): Expects | undefined {
  const ofField = expectedAt(path, document) ?? expectsOfInput(document, path);
  if (ofField) return ofField;
  const present = getAt(document, path);
  const unit = isFigure(present) && isKnown(present) ? present.unit : undefined;
  const dimension = unit === undefined ? undefined : dimensionOf(unit);
  return unit !== undefined && dimension ? { dimension: [dimension], unit } : undefined;
}

function originOf(asked: Asked, present: KnownFigure | undefined): Origin | undefined {
  const old = present?.origin;
  const kind = asked.kind ?? old?.kind ?? '';
  const ref = (asked.ref ?? old?.ref ?? '').trim();
  if (!KINDS.has(kind)) return kind === '' && ref === '' ? undefined : old;
  if (old?.kind === kind && old.ref === ref) return old;
  return { kind: kind as Origin['kind'], ref };
}

function sameOrigin(one: Origin | undefined, other: Origin | undefined): boolean {
  return one?.kind === other?.kind && (one?.ref ?? '') === (other?.ref ?? '');
}

/** The quantity of what was typed; its digits are kept where they say more than the number does ("5.10"). */
function withDigits(q: Q): Q {
  const { value, unit } = q;
  const digits = /^\S*/.exec(q.text ?? '')?.[0] ?? '';
  const said = Number(digits) === value && digits !== '' && digits !== String(value);
  return said ? { value, unit, text: digits } : { value, unit };
}

function sentence(document: Basis, path: Path, text: string): string {
  return `${capital(describePath(document, path).label)}: ${text}`;
}

/** An emptied field: the figure goes. One that was not there stays away. */
function emptied(path: Path, present: unknown): Read {
  if (present === undefined) return NOTHING;
  return { ops: [{ op: 'remove', path, was: present }], errors: [] };
}

/** The operation that a typed figure means; nothing when it says what stands there. */
export function readFigure(document: Basis, path: Path, asked: Asked): Read {
  const stored = getAt(document, path);
  const found = stored as F | undefined;
  const present = isFigure(stored) && isKnown(stored) ? stored : undefined;
  const text = (asked.set ?? '').trim();
  if (text === '') return found && !present ? NOTHING : emptied(path, found);
  const expects = expectsAt(document, path);
  if (!expects) {
    const told = sentence(document, path, 'no figure can stand here.');
    return { ops: [], errors: [{ path, code: 'SCHEMA', sentence: told }] };
  }
  const unit = asked.unit ?? present?.unit ?? expects.unit;
  const origin = originOf(asked, present);
  const untouched = present && text === digitsOf(present) && unit === present.unit;
  if (untouched && sameOrigin(origin, present.origin)) return NOTHING;
  const read = readTyped(text, { dimension: expects.dimension, unit });
  if (!read.ok)
    return {
      ops: [],
      errors: [{ path, code: read.code, sentence: sentence(document, path, read.sentence) }],
    };
  const q = untouched
    ? { value: present.value, unit, ...(present.text ? { text } : {}) }
    : withDigits(read.q);
  const value = { ...q, ...(origin ? { origin } : {}) };
  return { ops: [{ op: 'set', path, value, was: found ?? null }], errors: [] };
}
