/* Changing a document by small operations on paths, each with what it found there; and undoing them. */
import { z } from 'zod';
import { headerSchema, type Header } from '@domain/header/header';
import { fail, ok, type Result } from '@domain/result';
import type { RangeContext } from '@engine/ranges';
import { basisSchema, type Basis } from './basis';
import { sameContent } from './canonical';
import { describePath } from './describe';
import { capital } from './fields';
import type { Path } from './figures';
import { impossibleFigures } from './impossible';
import { parseWith } from './parse';
import { childOf, getAt, idOf, isFields, partsOf, splitPath } from './paths';

/**
 * One change. `set` a field or replace an element; `add` an element to the list at `path` (its id in the value);
 * `remove` a field or an element; `move` the element at `path` behind the sibling `value` (an id; null: to the front).
 * `was`: what stood there when the change was made (null: nothing); checked when given.
 */
export const opSchema = z.strictObject({
  op: z.enum(['set', 'add', 'remove', 'move']),
  path: z.string().min(1).max(400),
  value: z.unknown().optional(),
  was: z.unknown().optional(),
});
export type Op = { op: 'set' | 'add' | 'remove' | 'move'; path: Path; value?: unknown; was?: unknown };

/** Names that would reach an object's own machinery instead of a field. */
const FORBIDDEN: ReadonlySet<string> = new Set(['__proto__', 'constructor', 'prototype']);

/** The document with one child of the parent changed; what is beside the path is shared, not copied. */
function changeAt(value: unknown, parts: readonly string[], change: (parent: unknown) => unknown): unknown {
  const [part, ...rest] = parts;
  if (part === undefined) return change(value);
  if (Array.isArray(value))
    return value.map((element: unknown) =>
      idOf(element) === part ? changeAt(element, rest, change) : element,
    );
  const fields = isFields(value) ? value : {};
  return { ...fields, [part]: changeAt(fields[part], rest, change) };
}

function without(parent: unknown, last: string): unknown {
  if (Array.isArray(parent)) return parent.filter((element) => idOf(element) !== last);
  return Object.fromEntries(Object.entries(isFields(parent) ? parent : {}).filter(([name]) => name !== last));
}

function replaced(parent: unknown, last: string, value: unknown): unknown {
  if (Array.isArray(parent))
    return parent.map((element: unknown) => (idOf(element) === last ? value : element));
  return { ...(isFields(parent) ? parent : {}), [last]: value };
}

function moved(parent: unknown, last: string, after: unknown): unknown {
  if (!Array.isArray(parent)) return parent;
  const element = parent.find((one) => idOf(one) === last) as unknown;
  const others = parent.filter((one) => idOf(one) !== last) as unknown[];
  const at = after === null ? 0 : others.findIndex((one) => idOf(one) === after) + 1;
  return [...others.slice(0, at), element, ...others.slice(at)];
}

/** The id of the sibling before an element; null for the first; nothing when it is not in a list. */
export function siblingBefore(document: unknown, path: Path): string | null | undefined {
  const { parent, last } = splitPath(path);
  const list = getAt(document, parent);
  if (!Array.isArray(list)) return undefined;
  const at = list.findIndex((element) => idOf(element) === last);
  return at < 0 ? undefined : at === 0 ? null : idOf(list[at - 1] as unknown);
}

/** What an op finds at its place, in the terms of its `was`. */
function present(document: unknown, op: Op): unknown {
  if (op.op === 'move') return siblingBefore(document, op.path);
  if (op.op === 'add') return childOf(getAt(document, op.path), idOf(op.value) ?? '');
  return getAt(document, op.path);
}

type Fault = { stale: boolean; sentence: string };

/** False when the way to a place leads through an element that a list no longer has, or through a word. */
function reachable(document: unknown, path: Path): boolean {
  let value = document;
  for (const part of partsOf(path)) {
    const next = childOf(value, part);
    if (next === undefined) return !Array.isArray(value) && isFields(value ?? {});
    value = next;
  }
  return typeof value === 'object';
}

/** Why an op can't be applied to this document; nothing when it can. */
function faultOf(document: unknown, op: Op): Fault | undefined {
  const label = capital(describePath(document, op.path).label);
  if (partsOf(op.path).some((part) => FORBIDDEN.has(part))) {
    return { stale: false, sentence: `"${op.path}" is not a place of a document.` };
  }
  const parent = op.op === 'add' ? op.path : splitPath(op.path).parent;
  if (!reachable(document, parent)) {
    return { stale: true, sentence: `${label}: what this change belongs to is no longer there.` };
  }
  const holder = getAt(document, parent);
  return op.op === 'add' ? faultOfAdd(holder, op, label) : faultInHolder(holder, op, label);
}

function faultInHolder(holder: unknown, op: Op, label: string): Fault | undefined {
  const { last } = splitPath(op.path);
  const list = Array.isArray(holder) ? (holder as unknown[]) : undefined;
  if (list && childOf(list, last) === undefined)
    return { stale: true, sentence: `${label} is no longer there.` };
  if (op.op === 'set' && op.value === undefined) {
    return { stale: false, sentence: `${label}: a change needs its new value.` };
  }
  if (op.op === 'set' && list && idOf(op.value) !== last) {
    return { stale: false, sentence: `${label}: an element keeps its id.` };
  }
  if (op.op === 'move' && !(list && isSibling(list, op.value, last))) {
    return { stale: true, sentence: `${label}: the place to move it to is no longer there.` };
  }
  return undefined;
}

function isSibling(list: readonly unknown[], after: unknown, last: string): boolean {
  return after === null || (after !== last && list.some((element) => idOf(element) === after));
}

function faultOfAdd(list: unknown, op: Op, label: string): Fault | undefined {
  const id = idOf(op.value);
  if (list !== undefined && !Array.isArray(list))
    return { stale: false, sentence: `${label} is not a list.` };
  if (id === undefined) return { stale: false, sentence: `${label}: what is added needs an id.` };
  if (Array.isArray(list) && list.some((element) => idOf(element) === id))
    return { stale: true, sentence: `${label}: "${id}" is already there.` };
  return undefined;
}

function changed(document: unknown, op: Op): unknown {
  if (op.op === 'add')
    return changeAt(document, partsOf(op.path), (list) => [
      ...(Array.isArray(list) ? (list as unknown[]) : []),
      op.value,
    ]);
  const { parent, last } = splitPath(op.path);
  return changeAt(document, partsOf(parent), (holder) => {
    if (op.op === 'remove') return without(holder, last);
    return op.op === 'set' ? replaced(holder, last, op.value) : moved(holder, last, op.value);
  });
}

/** Applies one op to a plain document, its `was` checked; the shape of the outcome is not. */
export function applyOne(document: unknown, op: Op): Result<unknown> {
  const fault = faultOf(document, op);
  const found = present(document, op) ?? null;
  const stale = op.was !== undefined && !sameContent(op.was ?? null, found);
  if (!fault && !stale) return ok(changed(document, op));
  const sentence = stale
    ? `${capital(describePath(document, op.path).label)} has changed since you read it.`
    : (fault?.sentence ?? '');
  const code = stale || fault?.stale ? 'STALE' : 'SCHEMA';
  return fail(code, sentence, {
    errors: [{ path: op.path, code, sentence }],
    ...(code === 'STALE' ? { present: found } : {}),
  });
}

function applyWith<T>(
  schema: z.ZodType<T>,
  document: T,
  ops: readonly Op[],
  context: RangeContext,
  what: string,
): Result<T> {
  let now: unknown = document;
  for (const op of ops) {
    const next = applyOne(now, op);
    if (!next.ok) return next;
    now = next.value;
  }
  const parsed = parseWith(schema, now, what);
  if (!parsed.ok) return parsed;
  const errors = impossibleFigures(now, ops, context);
  return errors.length === 0 ? parsed : fail('VALUE_IMPOSSIBLE', errors[0]?.sentence ?? '', { errors });
}

/**
 * Applies ops in order, all or none. STALE when an op's `was` is not what stands there (with the present value), SCHEMA
 * for a wrong shape, VALUE_IMPOSSIBLE for a figure outside its possible range; the errors name field and remedy.
 */
export function applyOps(document: Basis, ops: readonly Op[], context: RangeContext = {}): Result<Basis> {
  return applyWith(basisSchema, document, ops, context, 'relief basis');
}

/** The same for a header. */
export function applyHeaderOps(
  document: Header,
  ops: readonly Op[],
  context: RangeContext = {},
): Result<Header> {
  return applyWith(headerSchema, document, ops, context, 'header');
}
