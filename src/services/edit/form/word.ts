/* Reads a typed word, choice, flag or text of a form as an operation on the document. */
import { z } from 'zod';
import {
  type Basis,
  type Op,
  type Path,
  basisSchema,
  getAt,
  isRich,
  metaOf,
  plainText,
  schemaAt,
} from '@domain/basis';
import { richOfField } from '@domain/case';
import { everyNode, nodesOf, type Rich } from '@domain/text';
import { type Asked } from './fields';

function bare(schema: z.core.$ZodType | undefined): z.core.$ZodType | undefined {
  return schema instanceof z.ZodOptional ? bare(schema.unwrap()) : schema;
}

/** What kind of value stands at a path. */
export function kindAt(
  document: Basis,
  path: Path,
): 'figure' | 'rich' | 'flag' | 'number' | 'word' | undefined {
  const schema = schemaAt(basisSchema, path);
  if (!schema) return undefined;
  const { leaf } = metaOf(schema);
  if (leaf === 'figure' || leaf === 'input') return 'figure';
  if (leaf === 'rich' || isRich(getAt(document, path))) return 'rich';
  const inner = bare(schema);
  if (inner instanceof z.ZodBoolean) return 'flag';
  return inner instanceof z.ZodNumber ? 'number' : 'word';
}

/** The choices at a path, when only some words can stand there. */
export function choicesAt(path: Path): string[] {
  const inner = bare(schemaAt(basisSchema, path));
  return inner instanceof z.ZodEnum ? inner.options.map(String) : [];
}

const LIVE: ReadonlySet<string> = new Set(['figure', 'place', 'person']);

function holdsLive(text: Rich): boolean {
  return [...everyNode(nodesOf(text))].some((node) => LIVE.has(node.type));
}

/** A text as sent; words of a bare text area that did not change keep what is live in them. */
function richOp(path: Path, found: unknown, sent: string): Op[] {
  const value = richOfField(sent) as Rich;
  if (isRich(found)) {
    const same = plainText(found) === plainText(value);
    if (same && (holdsLive(found) || !sent.startsWith('{')) && !holdsLive(value)) return [];
    if (JSON.stringify(found) === JSON.stringify(value)) return [];
  }
  return [{ op: 'set', path, value, was: found ?? null }];
}

function valueOf(kind: 'flag' | 'number' | 'word', text: string): unknown {
  if (kind === 'flag') return text === 'yes';
  return kind === 'number' && Number.isFinite(Number(text)) ? Number(text) : text;
}

/** The operations that a typed word means; none when it says what stands there. The schema refuses a wrong one. */
export function readWord(document: Basis, path: Path, asked: Asked): Op[] {
  const kind = kindAt(document, path);
  const found = getAt(document, path);
  const text = (asked.set ?? '').trim();
  if (kind === 'rich') return richOp(path, found, asked.set ?? '');
  if (text === '') return found === undefined ? [] : [{ op: 'remove', path, was: found }];
  const value = kind === 'flag' || kind === 'number' ? valueOf(kind, text) : text;
  return value === found ? [] : [{ op: 'set', path, value, was: found ?? null }];
}

/** The flags of a record (the statuses in which a scenario holds): every one is answered by the form. */
export function readFlags(
  document: Basis,
  path: Path,
  names: readonly string[],
  all: readonly string[],
): Op[] {
  const found = getAt(document, path) as Record<string, boolean> | undefined;
  const value = Object.fromEntries(all.map((name) => [name, names.includes(name)]));
  const same = all.every((name) => (found?.[name] ?? false) === value[name]);
  return same ? [] : [{ op: 'set', path, value, was: found ?? null }];
}
