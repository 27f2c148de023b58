/* Bodies of revisions as they are stored: gzipped JSON, with a small cache of parsed ones by hash. */
import { gunzipSync, gzipSync } from 'node:zlib';
import { type Hash } from '@domain/case';

const HELD_AT_MOST = 300;
const cache = new Map<Hash, unknown>();

/** Freezes a value all the way down: what is shared by the cache must not be changed by a reader. */
export function deepFreeze<T>(value: T): T {
  if (typeof value === 'object' && value !== null && !Object.isFrozen(value)) {
    Object.freeze(value);
    Object.values(value).forEach(deepFreeze);
  }
  return value;
}

/** A value as gzipped JSON. */
export function pack(value: unknown): Buffer {
  return gzipSync(JSON.stringify(value));
}

/** A value from gzipped JSON. */
export function unpack(bytes: Buffer): unknown {
  return JSON.parse(gunzipSync(bytes).toString('utf8'));
}

/** The cached body of a hash, if there; it becomes the youngest. */
export function cached(hash: Hash): unknown {
  const body = cache.get(hash);
  if (body === undefined) return undefined;
  cache.delete(hash);
  cache.set(hash, body);
  return body;
}

/** A stored body, parsed and frozen; kept in the cache, the oldest falls out. */
export function opened(hash: Hash, bytes: Buffer): unknown {
  const body = deepFreeze(unpack(bytes));
  cache.set(hash, body);
  const oldest = cache.keys().next();
  if (cache.size > HELD_AT_MOST && !oldest.done) cache.delete(oldest.value);
  return body;
}
