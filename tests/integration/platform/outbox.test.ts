/* The outbox on a real database, sent through a real SMTP server: one act's notices leave once, a failing server delays them, a crash loses none. */
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { migrate, openDatabase, transaction, type Db } from '@data/connection';
import { markMail, noticeCounts } from '@data/outbox';
import { createPerson, retirePerson } from '@data/people';
import { createSite } from '@data/site';
import {
  BACK_OFF,
  databaseOutbox,
  makeMailer,
  queueNotices,
  sendDue,
  startCatcher,
  type Catcher,
  type NoticeDraft,
} from '@notices/index';

const START = new Date('2026-03-16T07:00:00.000Z');
const quiet = { info: () => undefined, warn: () => undefined, error: () => undefined };
const NOTHING = {
  phone: null,
  job: null,
  deputyId: null,
  passwordHash: null,
  totp: null,
  digestAt: null,
  retiredAt: null,
};
const BASE = 'https://relief.example.org';
let folder: string;
let db: Db;
let catcher: Catcher;
let clock: Date;
const now = () => clock;

function draft(to: string, subject = 'KW-2026-003: waits for your check'): NoticeDraft {
  return { event: 'case.waits-for-check', to, case: null, urgency: 'digest', subject, body: 'What to do.' };
}

async function queue(...drafts: NoticeDraft[]): Promise<void> {
  await transaction(db, (trx) => queueNotices(trx, drafts, { siteId: 'site_1', at: clock.toISOString() }));
}

async function send(url = catcher.url): Promise<number> {
  const mailer = makeMailer(url, 'Setwright <setwright@example.org>');
  try {
    return await sendDue(databaseOutbox(db, BASE), mailer, now, quiet);
  } finally {
    mailer.close();
  }
}

beforeEach(async () => {
  clock = START;
  folder = await mkdtemp(join(tmpdir(), 'setwright-outbox-'));
  db = openDatabase(join(folder, 'setwright.db'));
  await migrate(db);
  await createSite(db, {
    id: 'site_1',
    slug: 'x',
    name: 'X',
    timeZone: 'UTC',
    barometer: { value: 1.01325, unit: 'bar_abs' },
    elevation: null,
    managerId: null,
    facts: {},
  });
  for (const id of ['per_c', 'per_a'])
    await createPerson(db, { id, email: `${id}@example.org`, name: id, ...NOTHING });
  catcher = await startCatcher(0, join(folder, 'mails.jsonl'), now);
});
afterEach(async () => {
  await catcher.close();
  await db.destroy();
  await rm(folder, { recursive: true, force: true });
});

describe('the outbox', () => {
  it('sends each notice once, to its person, with a Message-ID of the product’s host', async () => {
    await queue(draft('per_c'), draft('per_a', 'second'));
    expect(await send()).toBe(2);
    expect(await send()).toBe(0);
    const mails = catcher.list();
    expect(mails.map((mail) => [mail.to, mail.subject])).toEqual([
      [['per_a@example.org'], 'second'],
      [['per_c@example.org'], 'KW-2026-003: waits for your check'],
    ]);
    expect(mails[0]?.id).toMatch(/^<ntc_\w+@relief\.example\.org>$/);
    expect(await noticeCounts(db)).toMatchObject({ delivered: 2, queued: 0, sending: 0 });
  });

  it('sends nothing of an act that was rolled back', async () => {
    const act = transaction(db, async (trx) => {
      await queueNotices(trx, [draft('per_c')], { siteId: 'site_1', at: clock.toISOString() });
      throw new Error('the gate was shut');
    });
    await expect(act).rejects.toThrow('the gate was shut');
    expect(await send()).toBe(0);
  });

  it('waits after a failure and delivers when the server is back', async () => {
    await queue(draft('per_c'));
    await send('smtp://127.0.0.1:1');
    expect(await noticeCounts(db)).toMatchObject({ failed: 1 });
    expect(await send()).toBe(0);
    clock = new Date(START.getTime() + (BACK_OFF[0] ?? 0));
    expect(await send()).toBe(1);
    expect(catcher.list()).toHaveLength(1);
  });

  it('gives up after the last try', async () => {
    await queue(draft('per_c'));
    for (let tries = 0; tries <= BACK_OFF.length; tries += 1) {
      expect(await send('smtp://127.0.0.1:1')).toBe(1);
      clock = new Date(clock.getTime() + 24 * 3_600_000);
    }
    expect(await noticeCounts(db)).toMatchObject({ dead: 1 });
    expect(await send()).toBe(0);
  });

  it('sends again what a crash left in `sending`, under the same Message-ID, so that the receiver has it once', async () => {
    await queue(draft('per_c'));
    await send();
    const [mail] = (await db('mails').select('id')) as { id: string }[];
    await markMail(db, mail?.id ?? '', 'sending');
    await databaseOutbox(db, BASE).recover(now());
    expect(await send()).toBe(1);
    expect(catcher.list()).toHaveLength(1);
  });

  it('writes to no one who has left', async () => {
    await queue(draft('per_c'), draft('per_a'));
    await retirePerson(db, 'per_c', clock.toISOString());
    expect(await send()).toBe(1);
    expect(await noticeCounts(db)).toMatchObject({ dead: 1, delivered: 1 });
  });
});
