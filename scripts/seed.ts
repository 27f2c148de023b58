/* `npm run seed`: makes a new database with the invented site. */
import { existsSync, mkdirSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { dirname, join, resolve } from 'node:path';
import { fileURLToPath } from 'node:url';
import { hashPassword } from '@auth/index';
import { migrate, openDatabase } from '@data/connection';
import { seedDemo, type SeededSite } from '../seeds';

const root = dirname(dirname(fileURLToPath(import.meta.url)));
const dataDir = resolve(process.env['SETWRIGHT_DATA_DIR'] ?? join(root, 'data'));
const file = join(dataDir, 'setwright.db');

/** A seed that breaks off must not look like a database: it is made under another name and renamed when it is whole. */
async function makeDatabase(unfinished: string): Promise<SeededSite> {
  const db = openDatabase(unfinished);
  try {
    await migrate(db);
    const seeded = await seedDemo(db, { today: new Date().toISOString().slice(0, 10), hashPassword });
    await db.raw('ANALYZE');
    return seeded;
  } finally {
    await db.destroy();
  }
}

async function main(): Promise<number> {
  if (process.argv.includes('--large')) {
    process.stderr.write('The seeds offer no larger site; nothing was changed.\n');
    return 1;
  }
  if (existsSync(file)) {
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
