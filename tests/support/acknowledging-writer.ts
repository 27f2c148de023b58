/* A process that writes trail entries and prints the number of each once it is committed, until it is killed. */
import { openDatabase, transaction } from '../../src/data/connection';
import { newId, nowInstant } from '../../src/data/ids';
import { createSite } from '../../src/data/site';
import { appendTrail } from '../../src/data/trail';

const db = openDatabase(process.argv[2] ?? '');
const siteId = newId('site');
const barometer = { value: 0.918, unit: 'bar_abs' };
await createSite(db, { id: siteId, slug: 'k', name: 'K', timeZone: 'Europe/Vienna', barometer, facts: {} });
for (;;) {
  const entry = {
    siteId,
    at: nowInstant(),
    act: 'case.raised',
    byId: 'system',
    subject: 's',
    body: { changes: [] },
  };
  const { seq } = await transaction(db, (trx) => appendTrail(trx, { ...entry, hides: false }));
  process.stdout.write(`${seq}\n`);
}
