/* Changes of the invented site's cases: a path of keys, the old and the new value, taken in either direction. */
import { type DemoSystem } from '../convert';
import { type DemoCase, type DemoChange } from './demo-case-types';

const NAMES = ['tag', 'id', 'cause', 'group', 'revision', 'name'];
type Node = Record<string, unknown>;

function isNode(value: unknown): value is Node {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

function indexIn(list: unknown[], key: string): number {
  return list.findIndex((item) => isNode(item) && NAMES.some((name) => item[name] === key));
}

function child(of: unknown, key: string): unknown {
  if (Array.isArray(of)) return of[indexIn(of, key)];
  return isNode(of) ? of[key] : undefined;
}

/** A value of null in a list means that the item is not there. */
function setInList(list: unknown[], key: string, value: unknown): void {
  const at = indexIn(list, key);
  if (value === null) list.splice(at, 1);
  else if (at === -1) list.push(value);
  else list[at] = value;
}

function write(system: DemoSystem, path: string[], value: unknown): void {
  const key = path.at(-1) ?? '';
  let owner: unknown = system;
  for (const part of path.slice(0, -1)) owner = child(owner, part);
  if (Array.isArray(owner)) setInList(owner, key, value);
  else if (!isNode(owner)) throw new Error(`the invented site has nothing at ${path.join('/')}`);
  else if (value === null) Reflect.deleteProperty(owner, key);
  else owner[key] = value;
}

/** A changed figure says where it comes from; one that says nothing is the case's own. */
function withOrigin(change: DemoChange, value: unknown): unknown {
  if (!isNode(value) || typeof value['value'] !== 'number' || 'origin' in value) return value;
  return { ...value, origin: { kind: 'calculation', reference: `Change of the case: ${change.label}` } };
}

/** A copy of a system with the changes of a case made (`new`) or undone (`old`). */
export function changed(system: DemoSystem, changes: DemoChange[], side: 'old' | 'new'): DemoSystem {
  const copy = structuredClone(system);
  for (const change of changes) {
    if (change.system === system.id)
      write(copy, change.path, withOrigin(change, structuredClone(change[side])));
  }
  return copy;
}

/** All changes of a case: its own and those of the affected systems that it includes. */
export function changesOf(demo: DemoCase): DemoChange[] {
  return [...demo.changes, ...demo.ripple.flatMap((affected) => affected.changes)];
}

/** The systems of a case: its own, then the affected ones whose figures it changes. */
export function systemsOf(demo: DemoCase): { tag: string; why: 'own' | 'affected' }[] {
  const moved = [...new Set(changesOf(demo).map((change) => change.system))];
  const own = moved.filter((tag) => demo.changes.some((change) => change.system === tag));
  const affected = moved.filter((tag) => !own.includes(tag));
  return [
    ...own.map((tag) => ({ tag, why: 'own' as const })),
    ...affected.map((tag) => ({ tag, why: 'affected' as const })),
  ];
}
