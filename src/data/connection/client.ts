/* Knex's better-sqlite3 client with transactions that take the write lock at once, so that none fails half way. */
import Client from 'knex/lib/dialects/better-sqlite3/index.js';

type Query = { sql: string; bindings?: unknown[] };

/** Begins every transaction with BEGIN IMMEDIATE: a deferred one that reads first can be refused its lock later. */
export class ImmediateClient extends Client {
  override _query(connection: unknown, query: Query): Promise<unknown> {
    if (query.sql === 'BEGIN;') query.sql = 'BEGIN IMMEDIATE;';
    return super._query(connection, query);
  }
}
