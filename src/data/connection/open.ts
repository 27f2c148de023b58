/* Opens the database file: one connection, pragmas set as it is made, a short wait for it. */
import { mkdirSync } from 'node:fs';
import { dirname } from 'node:path';
import { type Database } from 'better-sqlite3';
import knex, { type Knex } from 'knex';
import { ImmediateClient } from './client';
import { countWrites } from '../version';

/** A connection or a transaction: every repository function takes one first. Inside a transaction, pass the transaction. */
export type Db = Knex;

export type OpenOptions = {
  /** Milliseconds to wait for the one connection before a query fails; default 5,000. */
  acquireTimeout?: number;
  /** Milliseconds SQLite waits for another process's write lock; default 4,000. */
  busyTimeout?: number;
};

/** Sets what must hold on every connection; FULL, because an acknowledged write must survive a power cut. */
function prepare(connection: Database, busyTimeout: number): void {
  connection.pragma('journal_mode = WAL');
  connection.pragma('synchronous = FULL');
  connection.pragma('foreign_keys = ON');
  connection.pragma(`busy_timeout = ${busyTimeout}`);
}

/** The Knex configuration of a database file; knexfile.ts and openDatabase share it. */
export function databaseConfig(file: string, options: OpenOptions = {}): Knex.Config {
  const busyTimeout = options.busyTimeout ?? 4_000;
  return {
    client: ImmediateClient as unknown as typeof Knex.Client,
    connection: { filename: file },
    useNullAsDefault: true,
    acquireConnectionTimeout: options.acquireTimeout ?? 5_000,
    pool: {
      min: 1,
      max: 1,
      afterCreate: (connection: Database, done: (error: Error | null, connection: Database) => void) => {
        prepare(connection, busyTimeout);
        done(null, connection);
      },
    },
  };
}

/** Opens (and creates) the database in a file; close it with `await db.destroy()`, which folds the WAL back in. */
export function openDatabase(file: string, options: OpenOptions = {}): Db {
  if (file !== ':memory:') mkdirSync(dirname(file), { recursive: true });
  const db = knex(databaseConfig(file, options));
  countWrites(db);
  return db;
}

/** Runs `fn` in one write transaction: all of it is kept, or, when it throws, nothing. */
export function transaction<T>(db: Db, fn: (trx: Knex.Transaction) => Promise<T>): Promise<T> {
  return db.transaction(fn);
}
