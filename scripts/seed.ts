/* `npm run seed`: makes a new database with the invented site; `--large` makes the one of 2,000 systems for the benchmarks. */
import { existsSync, mkdirSync, renameSync, rmSync } from 'node:fs';
import { dirname, join, resolve } from 'node:path';
import { fileURLToPath } from 'node:url';
import { migrate, openDatabase } from '@data/connection';

const root = dirname(dirname(fileURLToPath(import.meta.url)));
const dataDir = resolve(process.env['SETWRIGHT_DATA_DIR'] ?? join(root, 'data'));
const file = join(dataDir, 'setwright.db');
const large = process.argv.includes('--large');
const folders = large ? ['seeds', 'seeds/large'] : ['seeds'];

/** A seed that breaks off must not look like a database: it is made under another name and renamed when it is whole. */
async function makeDatabase(unfinished: string): Promise<string[]> {
  const db = openDatabase(unfinished);
  try {
    await migrate(db);
    const ran: string[] = [];
    for (const directory of folders) {
      const [names] = (await db.seed.run({ directory: join(root, directory), loadExtensions: ['.ts'] })) as [
        string[],
      ];
      ran.push(...names);
    }
    await db.raw('ANALYZE');
    return ran;
  } finally {
    await db.destroy();
  }
}

async function main(): Promise<number> {
  if (existsSync(file)) {
    process.stderr.write(
      `${file} exists already; nothing was changed. Delete it, or set SETWRIGHT_DATA_DIR to another folder.\n`,
    );
    return 1;
  }
  mkdirSync(dataDir, { recursive: true });
  const unfinished = `${file}.unfinished`;
  for (const end of ['', '-wal', '-shm']) rmSync(unfinished + end, { force: true });
  const ran = await makeDatabase(unfinished);
  renameSync(unfinished, file);
  process.stdout.write(`Loaded ${ran.length} seed ${ran.length === 1 ? 'file' : 'files'} into ${file}.\n`);
  return 0;
}

process.exitCode = await main();
