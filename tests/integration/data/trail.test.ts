/* The trail: it chains, it verifies, and it tells where someone tampered with it. */
import { describe, expect, test } from 'vitest';
import { type Db, transaction } from '@data/connection';
import { appendTrail, readTrail, trailHead, verifyTrail } from '@data/trail';
import { smallWorld } from '../../support/database';

async function acts(db: Db, siteId: string, count: number): Promise<void> {
  for (let n = 1; n <= count; n += 1) {
    await transaction(db, (trx) =>
      appendTrail(trx, {
        ...{ siteId, at: `2026-03-16T08:00:0${n}.000Z`, act: 'case.raised', byId: 'system', subject: `s${n % 2}` },
        ...{ body: { changes: [{ path: 'brief/title', old: null, new: `Title ${n}` }], why: 'because' }, hides: n > 2 },
      }),
    );
  }
}

/** Someone with the file in hand takes the trigger away and writes. */
async function tamper(db: Db, statement: string): Promise<void> {
  await db.raw('DROP TRIGGER IF EXISTS trail_no_update');
  await db.raw('DROP TRIGGER IF EXISTS trail_no_delete');
  await db.raw(statement);
}

describe('the trail of a site', () => {
  test('is whole, numbered from 1, each entry bound to the one before', async () => {
    const { db, siteId } = await smallWorld();
    expect(await verifyTrail(db, siteId)).toMatchObject({ ok: true, seq: 0 });
    await acts(db, siteId, 4);
    const entries = await readTrail(db, siteId);
    expect(entries.map((entry) => entry.seq)).toEqual([4, 3, 2, 1]);
    expect(entries[0]?.prev).toBe(entries[1]?.hash);
    expect(entries[0]).toMatchObject({ hides: true, caseId: null, body: { why: 'because' } });
    expect(await verifyTrail(db, siteId)).toEqual({ ok: true, seq: 4, hash: entries[0]?.hash });
    expect(await trailHead(db, siteId)).toMatchObject({ seq: 4, hash: entries[0]?.hash });
    expect(await readTrail(db, siteId, { subject: 's1', before: 3 })).toHaveLength(1);
  });

  test('refuses changes', async () => {
    const { db, siteId } = await smallWorld();
    await acts(db, siteId, 1);
    await expect(db('trail').update({ subject: 'x' })).rejects.toThrow('trail is append-only');
    await expect(db('trail').delete()).rejects.toThrow('trail is append-only');
  });

  test.each([
    ['a changed body', `UPDATE trail SET body = replace(body, 'Title 2', 'Title 9') WHERE seq = 2`, 2, 'changed'],
    ['a changed person', `UPDATE trail SET by_id = 'per_x' WHERE seq = 3`, 3, 'changed'],
    ['a lost entry', 'DELETE FROM trail WHERE seq = 2', 2, 'missing'],
    ['a lost end', 'DELETE FROM trail WHERE seq = 4', 3, 'its head says otherwise'],
  ])('tells of %s', async (_, statement, seq, words) => {
    const { db, siteId } = await smallWorld();
    await acts(db, siteId, 4);
    await tamper(db, statement);
    const check = await verifyTrail(db, siteId);
    expect(check).toMatchObject({ ok: false, seq });
    expect(!check.ok && check.sentence).toContain(words);
  });

  test('an act that fails leaves no entry', async () => {
    const { db, siteId } = await smallWorld();
    const entry = { siteId, at: '2026-03-16T08:00:00.000Z', act: 'x', byId: 'system', subject: 's', body: { changes: [] } };
    const act = transaction(db, async (trx) => {
      await appendTrail(trx, { ...entry, hides: false });
      throw new Error('no');
    });
    await expect(act).rejects.toThrow('no');
    expect(await verifyTrail(db, siteId)).toMatchObject({ ok: true, seq: 0 });
  });
});
