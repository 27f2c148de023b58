/* What differs between two documents, field by field on paths of ids. */
import { describePath } from '@domain/basis/describe';
import type { Path } from '@domain/basis/figures';
import { isLeaf, isRich, wayOfCalc } from '@domain/basis/leaves';
import { childOf, idOf, isFields, joinPath, partsOf } from '@domain/basis/paths';
import { sectionsOf } from '@domain/basis/schema-walk';
import { sameLeaf, type CompareContext } from './same';
import { wordDiff, type WordPart } from './words';

/**
 * One difference. `moved`: another value in the same place; `added`, `removed`: a field or an element; `order`: the
 * same elements in another order (old and now are their ids). `words` stands beside moved texts.
 */
export type Change = {
  path: Path;
  label: string;
  where: string;
  kind: 'moved' | 'added' | 'removed' | 'order';
  old?: unknown;
  now?: unknown;
  words?: WordPart[];
};

/** A difference without its words. */
export type BareChange = Pick<Change, 'path' | 'kind' | 'old' | 'now'>;

/** Differs as a whole: a leaf, another kind of value, a calculation had in another way. */
export function differsWhole(one: unknown, other: unknown): boolean {
  return (
    isLeaf(one) ||
    isLeaf(other) ||
    Array.isArray(one) !== Array.isArray(other) ||
    wayOfCalc(one) !== wayOfCalc(other)
  );
}

function* inLists(
  one: readonly unknown[],
  other: readonly unknown[],
  path: Path,
  context: CompareContext,
): Generator<BareChange> {
  for (const element of one) {
    const id = idOf(element) ?? '';
    yield* changesAt(element, childOf(other, id), joinPath(path, id), context);
  }
  const known = new Set(one.map(idOf));
  for (const element of other) {
    const id = idOf(element);
    if (!known.has(id)) yield { path: joinPath(path, id ?? ''), kind: 'added', now: element };
  }
  const old = sharedOrder(one, other);
  const now = sharedOrder(other, one);
  if (old.join() !== now.join()) yield { path, kind: 'order', old, now };
}

/** The ids of the first list that the second has too, in the first's order. */
export function sharedOrder(one: readonly unknown[], other: readonly unknown[]): string[] {
  const there = new Set(other.map(idOf));
  return one.flatMap((element) => {
    const id = idOf(element);
    return id !== undefined && there.has(id) ? [id] : [];
  });
}

/** Every difference at or below a place. */
export function* changesAt(
  one: unknown,
  other: unknown,
  path: Path,
  context: CompareContext,
): Generator<BareChange> {
  if (one === other) return;
  if (one === undefined) yield { path, kind: 'added', now: other };
  else if (other === undefined) yield { path, kind: 'removed', old: one };
  else if (differsWhole(one, other)) {
    if (!sameLeaf(one, other, context)) yield { path, kind: 'moved', old: one, now: other };
  } else if (Array.isArray(one) && Array.isArray(other)) yield* inLists(one, other, path, context);
  else if (isFields(one) && isFields(other)) {
    for (const name of new Set([...Object.keys(one), ...Object.keys(other)])) {
      yield* changesAt(one[name], other[name], joinPath(path, name), context);
    }
  }
}

/** True when nothing differs between two values. */
export function isSame(one: unknown, other: unknown, context: CompareContext): boolean {
  return changesAt(one, other, '', context).next().done === true;
}

function named(change: BareChange, base: object, ours: object): Change {
  const described = describePath(change.kind === 'removed' ? base : ours, change.path);
  const rich = change.kind === 'moved' && isRich(change.old) && isRich(change.now);
  return { ...change, ...described, ...(rich ? { words: wordDiff(change.old, change.now) } : {}) };
}

/**
 * The differences between two bases (or two headers), sorted by section of the document, with labels in the trade's
 * words. `context.barometer` lets a gauge pressure equal an absolute one.
 */
export function difference(base: object, ours: object, context: CompareContext = {}): Change[] {
  const sections = sectionsOf(ours);
  const placeOf = (path: Path) => sections.indexOf(partsOf(path)[0] ?? '');
  return [...changesAt(base, ours, '', context)]
    .sort((one, other) => placeOf(one.path) - placeOf(other.path))
    .map((change) => named(change, base, ours));
}
