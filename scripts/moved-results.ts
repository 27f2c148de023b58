/* `npm run moved-results`: works every stored evaluation again by this engine and lists, by owner, what moved. */
import { existsSync } from 'node:fs';
import { dirname, join, resolve } from 'node:path';
import { fileURLToPath } from 'node:url';
import { migrate, openDatabase } from '@data/connection';
import { listSites } from '@data/site';
import { type MovedView, workMoved } from '@services/moved-results';

const root = dirname(dirname(fileURLToPath(import.meta.url)));
const dataDir = resolve(process.env['SETWRIGHT_DATA_DIR'] ?? join(root, 'data'));
const file = join(dataDir, 'setwright.db');
const say = (text: string) => process.stdout.write(`${text}\n`);

function tell(site: string, { share, worked, without, revisions }: MovedView): void {
  say(`${site}: ${worked} stored evaluations worked again, ${without} revisions have none.`);
  say(
    revisions.length === 0
      ? `Nothing moved by more than ${share * 100} % and no verdict changed.`
      : `${revisions.length} moved by more than ${share * 100} % or changed a verdict.`,
  );
  let owner = '';
  for (const one of revisions) {
    if (one.owner !== owner) say(`\n${one.owner}`);
    owner = one.owner;
    say(`  ${one.tag} ${one.name}, ${one.revision}`);
    for (const line of one.lines) say(`    ${line.what}: ${line.old} → ${line.now} ${line.shift}`.trimEnd());
  }
}

async function main(): Promise<number> {
  if (!existsSync(file)) {
    process.stderr.write(`There is no database at ${file}; set SETWRIGHT_DATA_DIR to its folder.\n`);
    return 1;
  }
  const db = openDatabase(file);
  try {
    await migrate(db);
    const ctx = { db, now: () => new Date(), baseUrl: '' };
    const each = (done: number) => {
      if (process.stderr.isTTY && done % 50 === 0) process.stderr.write(`\r${done} worked`);
    };
    for (const site of await listSites(db)) tell(site.name, await workMoved(ctx, site, { each }));
    return 0;
  } finally {
    await db.destroy();
  }
}

process.exitCode = await main();
