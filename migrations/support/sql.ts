/* What the migrations share: run statements in order, make tables append-only, refuse to go back. */
import { type Knex } from 'knex';

/** Runs statements one after the other. */
export async function run(knex: Knex, statements: readonly string[]): Promise<void> {
  for (const statement of statements) await knex.raw(statement);
}

/** Makes tables append-only: every UPDATE and DELETE is aborted by a trigger. */
export async function appendOnly(knex: Knex, tables: readonly string[]): Promise<void> {
  for (const table of tables) {
    for (const event of ['UPDATE', 'DELETE']) {
      await knex.raw(
        `CREATE TRIGGER ${table}_no_${event.toLowerCase()} BEFORE ${event} ON ${table}
         BEGIN SELECT RAISE(ABORT, '${table} is append-only'); END`,
      );
    }
  }
}

/** Makes tables undeletable: what belongs to the record retires, it is never removed. */
export async function neverDeleted(knex: Knex, tables: readonly string[]): Promise<void> {
  for (const table of tables) {
    await knex.raw(
      `CREATE TRIGGER ${table}_no_delete BEFORE DELETE ON ${table}
       BEGIN SELECT RAISE(ABORT, 'rows of ${table} are never deleted'); END`,
    );
  }
}

/** The `down` of every migration: a schema only goes forwards; to go back, restore a backup. */
export function forwardsOnly(): Promise<void> {
  return Promise.reject(new Error('Migrations only go forwards: restore a backup instead.'));
}
