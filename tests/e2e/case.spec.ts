/* One real change from the idea to the revision in force: four people, four browsers, the mails of each gate. */
import { join } from 'node:path';
import { openDatabase } from '@data/connection';
import { verifyTrail } from '@data/trail';
import { expect, test } from '../support/fixtures';
import { startServer, type TestServer } from '../support/server';
import {
  analysis,
  approval,
  bothTruths,
  check,
  confirm,
  draft,
  field,
  type Four,
  reveal,
  trail,
  unseen,
} from './support/gates';
import { closeBrowsers, signInByPage } from './support/people';

test.afterEach(closeBrowsers);

/** A site of its own: another case on the system would keep its results from this one's checker. */
let server: TestServer;
test.beforeAll(async () => {
  server = await startServer();
});
test.afterAll(async () => {
  await server.stop();
});

async function chainIsWhole(): Promise<boolean> {
  const db = openDatabase(join(server.dataDir, 'setwright.db'));
  try {
    const { id } = (await db('sites').where({ slug: 'ketterwold' }).first()) as { id: string };
    return (await verifyTrail(db, id)).ok;
  } finally {
    await db.destroy();
  }
}

test('a change goes through every gate and ends as the next revision in force', async ({ browser }) => {
  test.setTimeout(300_000);
  const four: Four = {
    owen: await signInByPage(browser, server, 'Owen Tarrant'),
    ilse: await signInByPage(browser, server, 'Ilse Fennimore'),
    grace: await signInByPage(browser, server, 'Grace Okonta'),
    tomas: await signInByPage(browser, server, 'Tomas Adeyre'),
  };
  const number = await test.step('draft', () => draft(server, four));
  const gates = { analysis, unseen, reveal, check, approval, bothTruths, field, confirm, trail };
  for (const [gate, pass] of Object.entries(gates)) await test.step(gate, () => pass(server, number, four));
  expect(await chainIsWhole()).toBe(true);
});
