/* The ops that undo ops. */
import { fail, ok, type Result } from '@domain/result';
import { applyOne, siblingBefore, type Op } from './ops';
import { getAt, idOf, joinPath, splitPath } from './paths';

/** `was` of an op that undoes another: absent is told as null. */
function orNull(value: unknown): unknown {
  return value ?? null;
}

/** Puts an element back where it stood: added at the end, then moved behind its old sibling. */
function restored(document: unknown, path: string, value: unknown): Op[] {
  const { parent, last } = splitPath(path);
  const list = getAt(document, parent);
  const before = siblingBefore(document, path);
  const wasLast = Array.isArray(list) && idOf(list.at(-1)) === last;
  const add: Op = { op: 'add', path: parent, value };
  return before === undefined || wasLast ? [add] : [add, { op: 'move', path, value: before }];
}

function inverseOf(document: unknown, op: Op): Op[] {
  if (op.op === 'add')
    return [{ op: 'remove', path: joinPath(op.path, idOf(op.value) ?? ''), was: op.value }];
  if (op.op === 'move')
    return [{ op: 'move', path: op.path, value: orNull(siblingBefore(document, op.path)), was: op.value }];
  const old = getAt(document, op.path);
  const inList = Array.isArray(getAt(document, splitPath(op.path).parent));
  if (op.op === 'remove') {
    if (old === undefined) return [];
    return inList ? restored(document, op.path, old) : [{ op: 'set', path: op.path, value: old, was: null }];
  }
  return old === undefined
    ? [{ op: 'remove', path: op.path, was: op.value }]
    : [{ op: 'set', path: op.path, value: old, was: op.value }];
}

/**
 * The ops that lead back from `ops` applied to this document, in order. A list that an `add` has made stays, empty.
 * Fails as the ops would.
 */
export function invertOps(document: unknown, ops: readonly Op[]): Result<Op[]> {
  const back: Op[][] = [];
  let now: unknown = document;
  for (const op of ops) {
    const next = applyOne(now, op);
    if (!next.ok) return fail(next.problem.code, next.problem.detail, next.problem);
    back.unshift(inverseOf(now, op));
    now = next.value;
  }
  return ok(back.flat());
}
