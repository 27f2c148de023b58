/* `npm run seed`: makes a new database with the invented site; `npm run seed:large` adds two thousand systems varied from it. */
import { existsSync, mkdirSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { dirname, join, resolve } from 'node:path';
import { fileURLToPath } from 'node:url';
import { hashPassword } from '@auth/index';
import { migrate, openDatabase } from '@data/connection';
import { seedDemo, type SeededSite, seedLarge } from '../seeds';

const root = dirname(dirname(fileURLToPath(import.meta.url)));
const dataDir = resolve(process.env['SETWRIGHT_DATA_DIR'] ?? join(root, 'data'));
const file = join(dataDir, 'setwright.db');

const large = process.argv.includes('--large');

/** A seed that breaks off must not look like a database: it is made under another name and renamed when it is whole. */
async function makeDatabase(unfinished: string): Promise<SeededSite> {
  const db = openDatabase(unfinished);
  try {
    await migrate(db);
    const options = { today: new Date().toISOString().slice(0, 10), hashPassword };
    const seeded = await seedDemo(db, options);
    if (large) await seedLarge(db, options);
    await db.raw('ANALYZE');
    return seeded;
  } finally {
    await db.destroy();
  }
}

/** Adds the larger plant to a database that is there already. */
async function enlarge(): Promise<number> {
  const db = openDatabase(file);
  try {
    await migrate(db);
    const added = await seedLarge(db, { today: new Date().toISOString().slice(0, 10), hashPassword });
    await db.raw('ANALYZE');
    process.stdout.write(`Added ${String(added)} systems to ${file}.\n`);
    return 0;
  } finally {
    await db.destroy();
  }
}

async function main(): Promise<number> {
  if (existsSync(file)) {
    if (large) return enlarge();
    process.stderr.write(
      `${file} exists already; nothing was changed. Delete it, or set SETWRIGHT_DATA_DIR to another folder.\n`,
    );
    return 1;
  }
  mkdirSync(dataDir, { recursive: true });
  const unfinished = `${file}.unfinished`;
  for (const end of ['', '-wal', '-shm']) rmSync(unfinished + end, { force: true });
  const seeded = await makeDatabase(unfinished);
  // Kept beside the database: `npm start` prints these, the tests sign in with them.
  writeFileSync(join(dataDir, 'sign-ins.json'), `${JSON.stringify(seeded, null, 2)}\n`);
  renameSync(unfinished, file);
  process.stdout.write(`Loaded ${seeded.site} with ${seeded.people.length} people into ${file}.\n`);
  return 0;
}

process.exitCode = await main();
