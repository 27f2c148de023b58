/* Reading a document by path: field names and ids joined by "/", never an index. */
import type { Path } from './figures';

type Fields = Record<string, unknown>;

/** True for a plain object (not a list, not null). */
export function isFields(value: unknown): value is Fields {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

/** The id of an element of a list: its `id`, or the element itself when the list holds ids or words. */
export function idOf(element: unknown): string | undefined {
  if (typeof element === 'string') return element;
  if (!isFields(element)) return undefined;
  const id = element['id'];
  return typeof id === 'string' ? id : undefined;
}

/** The parts of a path; an empty path is the document itself. */
export function partsOf(path: Path): string[] {
  return path === '' ? [] : path.split('/');
}

/** One step down: a field of an object, or the element of a list with that id. */
export function childOf(value: unknown, part: string): unknown {
  if (Array.isArray(value)) return value.find((element) => idOf(element) === part);
  if (isFields(value) && Object.hasOwn(value, part)) return value[part];
  return undefined;
}

/**
 * What stands at a path of a document; nothing when the path leads nowhere.
 * @example getAt(basis, 'reliefPoints/rp_k3/set') → { value: 12.5, unit: 'bar_g' }
 */
export function getAt(document: unknown, path: Path): unknown {
  let value = document;
  for (const part of partsOf(path)) {
    value = childOf(value, part);
    if (value === undefined) return undefined;
  }
  return value;
}

/** The path without its last part, and that part. */
export function splitPath(path: Path): { parent: Path; last: string } {
  const at = path.lastIndexOf('/');
  return at < 0 ? { parent: '', last: path } : { parent: path.slice(0, at), last: path.slice(at + 1) };
}

/** Joins a path and one more part. */
export function joinPath(parent: Path, part: string): Path {
  return parent === '' ? part : `${parent}/${part}`;
}

/** Turns a path with indexes (as a schema complains) into one with ids, as far as the document has them. */
export function pathOfIndexes(document: unknown, parts: readonly PropertyKey[]): Path {
  const named: string[] = [];
  let value: unknown = document;
  for (const part of parts) {
    const list = Array.isArray(value) ? (value as unknown[]) : undefined;
    value = list ? list[Number(part)] : childOf(value, String(part));
    named.push(list ? (idOf(value) ?? String(part)) : String(part));
  }
  return named.join('/');
}

/** Every value of a document with its path, leaves and branches, in stored order; `enter` says whether to go inside. */
export function* walk(
  value: unknown,
  enter: (value: unknown) => boolean,
  path: Path = '',
): Generator<{ path: Path; value: unknown }> {
  yield { path, value };
  if (!enter(value)) return;
  if (Array.isArray(value)) {
    for (const element of value as unknown[]) {
      const id = idOf(element);
      if (id !== undefined && isFields(element)) yield* walk(element, enter, joinPath(path, id));
    }
  } else if (isFields(value)) {
    for (const [name, field] of Object.entries(value)) {
      if (field !== undefined) yield* walk(field, enter, joinPath(path, name));
    }
  }
}
