/* Counts the writes of a connection, so that what was read before a write is not taken for what stands after it. */
import { type Knex } from 'knex';

const counts = new WeakMap<object, { writes: number }>();

const WRITES = /^\s*(?:insert|update|delete|replace|create|drop|alter)\b/i;

function rootOf(db: Knex): object {
  return db.client.config as object;
}

/** Starts counting; called once as the database is opened. */
export function countWrites(db: Knex): void {
  const count = { writes: 0 };
  counts.set(rootOf(db), count);
  db.on('query', ({ sql }: { sql: string }) => {
    if (WRITES.test(sql)) count.writes += 1;
  });
}

/**
 * How many writes this process has sent to the database. All writes of a server go through its one connection, so that a
 * read that starts after a write already finds the count moved. -1 when nothing counts (a database opened by hand).
 */
export function writesOf(db: Knex): number {
  return counts.get(rootOf(db))?.writes ?? -1;
}
