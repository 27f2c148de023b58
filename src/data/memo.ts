/* Keeps what a read gave until the next write: reads of the same things by the same person are answered from memory. */
import { type Db } from './connection';
import { writesOf } from './version';

type Kept = { writes: number; until: number; value: Promise<unknown> };

const HELD_AT_MOST = 1_000;
const kept = new Map<string, Kept>();
const numbers = new WeakMap<object, number>();
let opened = 0;

/** A number for each open database, so that tests with several never share what was kept. */
function numberOf(db: Db): number {
  const config = db.client.config as object;
  const known = numbers.get(config);
  if (known !== undefined) return known;
  opened += 1;
  numbers.set(config, opened);
  return opened;
}

/**
 * The value of a read, from memory when nothing was written since and it is younger than `seconds` (reads that know the
 * day or the hour must not outlive it by much). `key` names the read and everything it depends on, the reader included.
 * Never call it inside a transaction: that reads what is not committed yet.
 */
export function untilNextWrite<T>(db: Db, key: readonly (string | number | boolean | null | undefined)[], read: () => Promise<T>, seconds = 30): Promise<T> {
  const writes = writesOf(db);
  if (writes < 0 || db.isTransaction === true) return read();
  const name = `${String(numberOf(db))}:${JSON.stringify(key)}`;
  const now = performance.now();
  const known = kept.get(name);
  if (known && known.writes === writes && known.until > now) return known.value as Promise<T>;
  const value = read();
  kept.delete(name);
  kept.set(name, { writes, until: now + seconds * 1_000, value });
  value.catch(() => kept.delete(name));
  const oldest = kept.keys().next();
  if (kept.size > HELD_AT_MOST && !oldest.done) kept.delete(oldest.value);
  return value;
}

const heldWith = new WeakMap<object, Map<string, Promise<unknown>>>();

/**
 * A value worked out of something that was itself read once and kept, such as an opened case: it is worked once for that
 * object and goes with it. What differs at every call, such as the key of a form, must not be part of it.
 */
export function keptWith<T>(owner: object, name: string, read: () => Promise<T>): Promise<T> {
  const held = heldWith.get(owner) ?? new Map<string, Promise<unknown>>();
  heldWith.set(owner, held);
  const known = held.get(name);
  if (known) return known as Promise<T>;
  const value = read();
  held.set(name, value);
  value.catch(() => held.delete(name));
  return value;
}
