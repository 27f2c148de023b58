/* Brings a database to the present schema, the one way for server, scripts and tests; and says whether it is there. */
import { existsSync, readdirSync } from 'node:fs';
import { type Knex } from 'knex';
import { type Db } from './open';

type Named = { name: string; load: () => Promise<Knex.Migration> };

/* In the built server the migrations are bundled; in a script or a bare test they are files beside the sources. */
const bundled = import.meta.env
  ? import.meta.glob<Knex.Migration>('../../../migrations/*.ts')
  : undefined;

const byName = (a: Named, b: Named): number => (a.name < b.name ? -1 : 1);

function fromBundle(modules: Record<string, () => Promise<Knex.Migration>>): Named[] {
  return Object.entries(modules).map(([path, load]) => ({ name: path.slice(path.lastIndexOf('/') + 1), load }));
}

function fromFolder(): Named[] {
  const folder = new URL('../../../migrations/', import.meta.url);
  if (!existsSync(folder)) return [];
  const names = readdirSync(folder).filter((name) => name.endsWith('.ts'));
  return names.map((name) => ({ name, load: () => import(new URL(name, folder).href) as Promise<Knex.Migration> }));
}

/** All migrations in order; the names are the file names, the same from a script and from the built server. */
export const migrationSource: Knex.MigrationSource<Named> = {
  getMigrations: () => Promise.resolve((bundled ? fromBundle(bundled) : fromFolder()).sort(byName)),
  getMigrationName: (migration) => migration.name,
  getMigration: (migration) => migration.load(),
};

const CONFIG = { migrationSource, tableName: 'migrations' };

/**
 * Migrates to the newest schema. Foreign keys are off meanwhile (a table that is rebuilt would take its children
 * with it) and every reference is checked before they are on again.
 * @throws Error naming the first broken reference
 */
export async function migrate(db: Db): Promise<void> {
  await db.raw('PRAGMA foreign_keys = OFF');
  try {
    await db.migrate.latest(CONFIG);
    const broken = await db.raw<{ table: string; rowid: number; parent: string }[]>('PRAGMA foreign_key_check');
    const first = broken[0];
    if (first) {
      throw new Error(`Row ${first.rowid} of ${first.table} refers to a missing row of ${first.parent}.`);
    }
  } finally {
    await db.raw('PRAGMA foreign_keys = ON');
  }
}

/** True when the database answers and has every migration that this program knows; for /health. */
export async function schemaIsCurrent(db: Db): Promise<boolean> {
  try {
    const [, pending] = (await db.migrate.list(CONFIG)) as [unknown[], unknown[]];
    return pending.length === 0;
  } catch {
    return false;
  }
}
