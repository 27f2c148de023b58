/* Writes that people make at the same time, twice, or just before the machine dies. */
import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { createInterface } from 'node:readline';
import { fileURLToPath } from 'node:url';
import { describe, expect, test } from 'vitest';
import * as cases from '@data/cases';
import { openDatabase } from '@data/connection';
import { newId, nowInstant } from '@data/ids';
import * as idempotency from '@data/idempotency';
import * as outbox from '@data/outbox';
import { verifyTrail } from '@data/trail';
import { freshFile, smallWorld } from '../../support/database';
import { addCase } from '../../support/records';

test('identifiers carry what they name and sort by birth', () => {
  const ids = Array.from({ length: 500 }, () => newId('case'));
  expect(ids).toEqual([...ids].sort());
  expect(new Set(ids).size).toBe(500);
  expect(ids[0]).toMatch(/^case_[0-9A-HJKMNP-TV-Z]{26}$/);
});

describe('the optimistic lock', () => {
  test('lets the first write through and refuses the second', async () => {
    const world = await smallWorld();
    const id = await addCase(world, 'KW-2026-001');
    expect(await cases.updateCase(world.db, id, 1, { title: 'First' })).toBe(true);
    expect(await cases.updateCase(world.db, id, 1, { title: 'Second' })).toBe(false);
    expect(await cases.findCase(world.db, id)).toMatchObject({ title: 'First', version: 2, extensions: [] });
  });

  test('case numbers are counted a site and year, and seeds may set them off', async () => {
    const { db, siteId } = await smallWorld();
    expect(await cases.nextCaseNumber(db, siteId, 'KW', 2026)).toBe('KW-2026-001');
    await cases.raiseCaseCounter(db, siteId, 2026, 15);
    await cases.raiseCaseCounter(db, siteId, 2026, 3);
    expect(await cases.nextCaseNumber(db, siteId, 'KW', 2026)).toBe('KW-2026-016');
    expect(await cases.nextCaseNumber(db, siteId, 'KW', 2027)).toBe('KW-2027-001');
  });
});

test('a key answers the same request again and refuses another one', async () => {
  const { db, people } = await smallWorld();
  const asked = { personId: people.originator, key: 'k1', route: 'POST /cases', bodyHash: 'h' };
  expect(await idempotency.checkRepeat(db, asked)).toEqual({ kind: 'new' });
  await idempotency.keepAnswer(db, { ...asked, status: 201, answer: { number: 'KW-2026-001' }, at: nowInstant() });
  const again = { kind: 'same', status: 201, answer: { number: 'KW-2026-001' } };
  expect(await idempotency.checkRepeat(db, asked)).toEqual(again);
  expect(await idempotency.checkRepeat(db, { ...asked, bodyHash: 'x' })).toEqual({ kind: 'other' });
  expect(await idempotency.checkRepeat(db, { ...asked, personId: people.checker })).toEqual({ kind: 'new' });
  expect(await idempotency.sweepAnswers(db, '9999')).toBe(1);
});

test('a notice waits, leaves by one mail, and an interrupted mail goes back with its Message-ID', async () => {
  const { db, people, siteId } = await smallWorld();
  const at = '2026-03-16T08:00:00.000Z';
  const notice = { siteId, event: 'gate.passed', toId: people.checker, urgency: 'at-once' as const, subject: 's', body: 'b' };
  const id = await outbox.addNotice(db, { ...notice, after: at, at });
  expect(await outbox.waitingNotices(db, '2026-03-16T07:59:59.000Z')).toEqual([]);
  expect((await outbox.waitingNotices(db, at)).map((row) => row.id)).toEqual([id]);
  const mail = await outbox.makeMail(db, { toId: people.checker, messageId: '<1@x>', nextAt: at, madeAt: at }, [id]);
  expect(await outbox.waitingNotices(db, at)).toEqual([]);
  await outbox.markMail(db, mail, 'sending', { tries: 1 });
  expect(await outbox.mailsToSend(db, at)).toEqual([]);
  expect(await outbox.requeueInterrupted(db, at)).toBe(1);
  expect(await outbox.mailsToSend(db, at)).toMatchObject([{ id: mail, messageId: '<1@x>', tries: 1 }]);
  await outbox.markMail(db, mail, 'delivered', { deliveredAt: at });
  expect(await outbox.noticeCounts(db)).toMatchObject({ delivered: 1, queued: 0 });
});

test('every write that was acknowledged is there after the process was killed', async () => {
  const file = await freshFile();
  const writer = fileURLToPath(new URL('../../support/acknowledging-writer.ts', import.meta.url));
  const child = spawn(process.execPath, ['--import', 'tsx', writer, file], { stdio: ['ignore', 'pipe', 'inherit'] });
  let acknowledged = 0;
  for await (const line of createInterface({ input: child.stdout })) {
    acknowledged = Number(line);
    if (acknowledged >= 25) break;
  }
  child.kill('SIGKILL');
  if (child.exitCode === null && child.signalCode === null) await once(child, 'exit');
  const db = openDatabase(file);
  const [counted] = (await db('trail').count('* as n')) as unknown as { n: number }[];
  expect(acknowledged).toBeGreaterThanOrEqual(25);
  expect(counted?.n).toBeGreaterThanOrEqual(acknowledged);
  const { id } = (await db('sites').first('id')) as { id: string };
  expect(await verifyTrail(db, id)).toMatchObject({ ok: true, seq: counted?.n });
  expect(await db.raw('PRAGMA integrity_check')).toEqual([{ integrity_check: 'ok' }]);
  await db.destroy();
});
