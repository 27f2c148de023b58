/* A stale save: which figures both sides changed, and the ops once somebody has chosen. */
import { formatQuantity } from '@engine/quantity';
import { type Basis, canonical, describePath, getAt, isFigure, isKnown, type Op } from '@domain/basis';

export type Side = 'ours' | 'theirs';
export type Clash = { path: string; label: string; was: string; ours: string; theirs: string };

/** A value of a document for reading: with its unit and its origin. */
export function shown(value: unknown): string {
  if (!isFigure(value)) return value === undefined || value === null ? 'nothing' : canonical(value);
  if (!isKnown(value)) return `not known: ${value.unknown}`;
  const from = value.origin ? `, ${value.origin.ref || value.origin.kind}` : '';
  return `${formatQuantity(value)}${from}`;
}

const same = (one: unknown, other: unknown) => canonical(one ?? null) === canonical(other ?? null);

/** The ops whose place was changed meanwhile to something else than ours. */
export function clashesOf(ops: readonly Op[], theirs: Basis): Clash[] {
  return ops.flatMap(({ path, value, was }) => {
    const there = getAt(theirs, path);
    if (same(there, was) || same(there, value)) return [];
    const { label } = describePath(theirs, path);
    return [
      { path, label: label.replaceAll('_', ' '), was: shown(was), ours: shown(value), theirs: shown(there) },
    ];
  });
}

/** The ops to send on the newer version: ours where nobody else wrote, the chosen side where somebody did. */
export function settled(ops: readonly Op[], theirs: Basis, chosen: Readonly<Record<string, Side>>): Op[] {
  const clashing = new Set(clashesOf(ops, theirs).map(({ path }) => path));
  return ops
    .filter(({ path }) => !clashing.has(path) || chosen[path] === 'ours')
    .map((op) => ({ ...op, was: getAt(theirs, op.path) ?? null }))
    .filter(({ value, was }) => !same(value, was));
}
