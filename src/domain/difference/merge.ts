/* Carrying a change over to a document that moved meanwhile: three-way merge on paths of ids. */
import { describePath } from '@domain/basis/describe';
import type { Path } from '@domain/basis/figures';
import { childOf, idOf, isFields, joinPath } from '@domain/basis/paths';
import { differsWhole, isSame, sharedOrder } from './difference';
import type { CompareContext } from './same';

/**
 * Something that both sides did differently: `change` another value on each, `removal` changed on one side and removed
 * on the other, `order` two new orders. The merged document holds ours until a person decides.
 */
export type Conflict = {
  path: Path;
  label: string;
  where: string;
  kind: 'change' | 'removal' | 'order';
  base?: unknown;
  ours?: unknown;
  theirs?: unknown;
};
export type Merged<T> = { merged: T; conflicts: Conflict[] };

type Three = { base: unknown; ours: unknown; theirs: unknown };
type Work = { conflicts: (Three & Pick<Conflict, 'path' | 'kind'>)[]; context: CompareContext };

function conflict(work: Work, kind: Conflict['kind'], path: Path, three: Three): unknown {
  work.conflicts.push({ ...three, kind, path });
  return three.ours;
}

function mergeFields(work: Work, path: Path, { base, ours, theirs }: Three): unknown {
  const names = new Set([ours, theirs, base].flatMap((one) => (isFields(one) ? Object.keys(one) : [])));
  const merged: Record<string, unknown> = {};
  for (const name of names) {
    const value = mergeAt(work, joinPath(path, name), {
      base: childOf(base, name),
      ours: childOf(ours, name),
      theirs: childOf(theirs, name),
    });
    if (value !== undefined) merged[name] = value;
  }
  return merged;
}

const isOrdered = (one: readonly string[], other: readonly string[]) => one.join('\n') === other.join('\n');

/** The order of the merged ids: that of the side which re-ordered; what the other side added stands behind its neighbour. */
function orderOf(
  work: Work,
  path: Path,
  lists: { base: unknown[]; ours: unknown[]; theirs: unknown[] },
  kept: Set<string>,
): string[] {
  const { base, ours, theirs } = lists;
  const oursMoved = !isOrdered(sharedOrder(base, ours), sharedOrder(ours, base));
  const theirsMoved = !isOrdered(sharedOrder(base, theirs), sharedOrder(theirs, base));
  const apart = !isOrdered(sharedOrder(ours, theirs), sharedOrder(theirs, ours));
  if (oursMoved && theirsMoved && apart) {
    conflict(work, 'order', path, { base: base.map(idOf), ours: ours.map(idOf), theirs: theirs.map(idOf) });
  }
  const [first, second] = theirsMoved && !oursMoved ? [theirs, ours] : [ours, theirs];
  return [second, base]
    .reduce<string[]>(
      (order, list) =>
        woven(
          order,
          list.map((one) => idOf(one) ?? ''),
        ),
      first.map((one) => idOf(one) ?? ''),
    )
    .filter((id) => kept.has(id));
}

/** One order with the ids of another that it lacks, each behind the neighbour that it had there. */
function woven(order: readonly string[], other: readonly string[]): string[] {
  const result = [...order];
  other.forEach((id, index) => {
    if (result.includes(id)) return;
    const before = other.slice(0, index).findLast((one) => result.includes(one));
    result.splice(before === undefined ? 0 : result.indexOf(before) + 1, 0, id);
  });
  return result;
}

function mergeLists(work: Work, path: Path, three: Three): unknown {
  const [base, ours, theirs] = [three.base, three.ours, three.theirs].map((one) =>
    Array.isArray(one) ? (one as unknown[]) : [],
  ) as [unknown[], unknown[], unknown[]];
  const merged = new Map<string, unknown>();
  for (const id of new Set([...ours, ...theirs, ...base].map((one) => idOf(one) ?? ''))) {
    const value = mergeAt(work, joinPath(path, id), {
      base: childOf(base, id),
      ours: childOf(ours, id),
      theirs: childOf(theirs, id),
    });
    if (value !== undefined) merged.set(id, value);
  }
  return orderOf(work, path, { base, ours, theirs }, new Set(merged.keys())).map((id) => merged.get(id));
}

/** True for two branches of the same kind that can be merged field by field. */
function canGoInside({ base, ours, theirs }: Three): boolean {
  return (
    !differsWhole(ours, theirs) &&
    (base === undefined || (!differsWhole(base, ours) && !differsWhole(base, theirs)))
  );
}

function mergeAt(work: Work, path: Path, three: Three): unknown {
  const { base, ours, theirs } = three;
  if (isSame(ours, theirs, work.context) || isSame(base, theirs, work.context)) return ours;
  if (isSame(base, ours, work.context)) return theirs;
  if (ours === undefined || theirs === undefined) return conflict(work, 'removal', path, three);
  if (!canGoInside(three)) return conflict(work, 'change', path, three);
  return Array.isArray(ours) ? mergeLists(work, path, three) : mergeFields(work, path, three);
}

/**
 * Merges what `ours` and `theirs` each changed since `base`. The same change on both sides is one change; change
 * against change, change against removal and order against order are conflicts, listed with both sides; nothing is
 * dropped in silence. The merged document is not yet checked for ids that point nowhere (checkReferences does that).
 */
export function merge3<T extends object>(
  base: T,
  ours: T,
  theirs: T,
  context: CompareContext = {},
): Merged<T> {
  const work: Work = { conflicts: [], context };
  const merged = mergeAt(work, '', { base, ours, theirs }) as T;
  const conflicts = work.conflicts.map((one) => ({
    ...one,
    ...describePath(one.ours === undefined ? base : ours, one.path),
  }));
  return { merged, conflicts };
}
