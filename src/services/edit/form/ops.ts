/* A form about a document as operations on it: figures, words, dispositions, answers, justifications. */
import {
  type Basis,
  applyOps,
  getAt,
  isFigure,
  type Op,
  type Path,
  splitPath,
  STATUSES,
} from '@domain/basis';
import { fail, type FieldError, ok, type Result } from '@domain/result';
import { type Outcome } from '@domain/rulebook';
import { type Q } from '@engine/quantity';
import { methodById } from '@engine/catalog';
import { readCalc, readDepends, readNewAnswer, readRemoved } from './answers';
import { type Asked, askedOf } from './fields';
import { readFigure } from './figure';
import { readJustification, readMadeOf } from './justify';
import { kindAt, readFlags, readWord } from './word';

type Typed = readonly (readonly [string, string])[];
type Read = { ops: Op[]; errors: FieldError[] };

/** What a form is read against. */
export type FormOf = {
  document: Basis;
  outcomes: readonly Outcome[];
  barometer: Q;
  by: { person: string; on: string };
};

/** The words that an input of a method may be; nothing for one that is a figure. */
export function wordsOfInput(document: Basis, path: Path): string[] | undefined {
  const { parent, last } = splitPath(path);
  if (splitPath(parent).last !== 'inputs') return undefined;
  const calc = getAt(document, splitPath(parent).parent);
  const method = typeof calc === 'object' && calc !== null && 'method' in calc ? String(calc.method) : '';
  return methodById(method)?.inputs.find((input) => input.name === last)?.words;
}

function readInputWord(document: Basis, path: Path, asked: Asked): Op[] {
  const found = getAt(document, path);
  const word = (asked.set ?? '').trim();
  const present = typeof found === 'object' && found !== null && 'word' in found ? found.word : undefined;
  if (word === '') return found === undefined ? [] : [{ op: 'remove', path, was: found }];
  return word === present ? [] : [{ op: 'set', path, value: { word }, was: found ?? null }];
}

function readPlace(document: Basis, path: Path, asked: Asked): Read {
  if (asked.calc !== undefined) return { ops: readCalc(document, path, asked), errors: [] };
  if (asked.flags) return { ops: readFlags(document, path, asked.flags, STATUSES), errors: [] };
  if (asked.list) return { ops: readDepends(document, path, asked.list), errors: [] };
  if (asked.set === undefined && !isFigure(getAt(document, path))) return { ops: [], errors: [] };
  const kind = kindAt(document, path);
  if (kind === undefined) {
    const sentence = 'The relief basis has no such field.';
    return { ops: [], errors: [{ path, code: 'SCHEMA', sentence }] };
  }
  if (wordsOfInput(document, path)) return { ops: readInputWord(document, path, asked), errors: [] };
  if (kind === 'figure') return readFigure(document, path, asked);
  return { ops: readWord(document, path, asked), errors: [] };
}

/** Changes of the way of a calculation come first: figures may be typed for the new way in the same form. */
function inOrder(asked: Map<Path, Asked>): [Path, Asked][] {
  return [...asked].sort(([, a], [, b]) => Number(b.calc !== undefined) - Number(a.calc !== undefined));
}

function readPlaces(of: FormOf, typed: Typed): { read: Read; document: Basis } {
  const read: Read = { ops: [], errors: [] };
  let document = of.document;
  for (const [path, asked] of inOrder(askedOf(typed))) {
    const one = readPlace(document, path, asked);
    read.ops.push(...one.ops);
    read.errors.push(...one.errors);
    if (one.ops.length === 0) continue;
    const next = applyOps(document, one.ops, { barometer: of.barometer });
    if (next.ok) document = next.value;
    else read.errors.push(...(next.problem.errors ?? []));
  }
  return { read, document };
}

/** Everything that a form changes. The first thing that cannot be read names its code; every one is told beside its field. */
export function opsOfForm(of: FormOf, typed: Typed): Result<{ ops: Op[] }> {
  const { read, document } = readPlaces(of, typed);
  const first = read.errors[0];
  if (first) {
    const codes = read.errors.map((error) => error.code);
    const code = codes.every((one) => one === 'VALUE_IMPOSSIBLE')
      ? 'VALUE_IMPOSSIBLE'
      : codes.every((one) => one === 'UNIT_AMBIGUOUS')
        ? 'UNIT_AMBIGUOUS'
        : 'SCHEMA';
    return fail(code, first.sentence, { errors: read.errors });
  }
  const ops = [
    ...read.ops,
    ...readNewAnswer(document, typed),
    ...readRemoved(document, typed),
    ...readJustification(document, of.outcomes, typed, of.by),
    ...readMadeOf(document, typed),
  ];
  return ok({ ops });
}
