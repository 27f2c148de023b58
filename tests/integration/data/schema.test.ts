/* The schema: it comes up on an empty file, keeps its references, and its triggers refuse what the record forbids. */
import { describe, expect, test } from 'vitest';
import { migrate, openDatabase, schemaIsCurrent, transaction } from '@data/connection';
import { newId, nowInstant } from '@data/ids';
import { findDocument } from '@data/documents';
import * as revisions from '@data/revisions';
import { createRules, findRules, updateRules } from '@data/site';
import { voidSignature } from '@data/signatures';
import { freshDatabase, smallWorld, type World } from '../../support/database';
import { addCase, addSystem, bodyNamed, sign } from '../../support/records';

async function working(world: World, documentId: string, caseId: string): Promise<string> {
  const id = newId('revision');
  const body = bodyNamed('working');
  await revisions.insertRevision(world.db, { id, documentId, state: 'working', caseId, body, documentHash: `h${id}` });
  return id;
}
const present = async (world: World, id: string) => (await revisions.findRevision(world.db, id))!;
const now = () => ({ at: nowInstant(), inPlantFrom: nowInstant() });

describe('migrations', () => {
  test('come up on an empty database and are whole', async () => {
    const db = openDatabase(':memory:');
    expect(await schemaIsCurrent(db)).toBe(false);
    await migrate(db);
    expect(await schemaIsCurrent(db)).toBe(true);
    expect(await db.raw('PRAGMA integrity_check')).toEqual([{ integrity_check: 'ok' }]);
    expect(await db.raw('PRAGMA foreign_key_check')).toEqual([]);
    await db.destroy();
    expect(await schemaIsCurrent(db)).toBe(false);
  });

  test('leave foreign keys on, WAL and full synchronisation', async () => {
    const db = await freshDatabase();
    expect(await db.raw('PRAGMA foreign_keys')).toEqual([{ foreign_keys: 1 }]);
    expect(await db.raw('PRAGMA journal_mode')).toEqual([{ journal_mode: 'wal' }]);
    expect(await db.raw('PRAGMA synchronous')).toEqual([{ synchronous: 2 }]);
    await expect(db('units').insert({ id: 'u', site_id: 'none', tag: '1', name: 'x', units: 'SI' })).rejects.toThrow(
      /FOREIGN KEY/,
    );
  });

  test('refuse a database whose references are broken', async () => {
    const db = openDatabase(':memory:');
    await migrate(db);
    await db.raw('PRAGMA foreign_keys = OFF');
    await db('units').insert({ id: 'u', site_id: 'none', tag: '1', name: 'x', units: 'SI' });
    await expect(migrate(db)).rejects.toThrow('of units refers to a missing row of sites');
    await db.destroy();
  });

  test('a transaction that fails leaves nothing behind', async () => {
    const { db, siteId } = await smallWorld();
    const failed = transaction(db, async (trx) => {
      await trx('sites').where({ id: siteId }).update({ name: 'Elsewhere' });
      throw new Error('no');
    });
    await expect(failed).rejects.toThrow('no');
    expect(await db('sites').first('name')).toEqual({ name: 'Ketterwold Works' });
  });
});

test('a transaction takes the write lock as it begins, so two never read before one writes', async () => {
  const { db } = await smallWorld();
  const [file] = (await db.raw('PRAGMA database_list')) as { file: string }[];
  const other = openDatabase(file!.file, { busyTimeout: 50 });
  await transaction(db, async () => {
    await expect(transaction(other, (trx) => trx('sites').first())).rejects.toThrow(/locked/);
  });
  await other.destroy();
});

describe('append-only tables', () => {
  test('refuse every change and removal', async () => {
    const world = await smallWorld();
    const id = await sign(world, { gate: 'check' });
    const rows = world.db('signatures').where({ id });
    await expect(rows.clone().update({ meaning: 'x' })).rejects.toThrow('signatures is append-only');
    await expect(rows.clone().delete()).rejects.toThrow('signatures is append-only');
    expect(await rows.first()).toMatchObject({ meaning: 'I sign.' });
  });

  test('are all that the model calls so', async () => {
    const db = await freshDatabase();
    const triggers = (await db.raw(
      `SELECT tbl_name FROM sqlite_master WHERE type = 'trigger' AND name LIKE '%_no_update'`,
    )) as { tbl_name: string }[];
    const names = triggers.map((row) => row.tbl_name).sort();
    expect(names).toEqual(
      [
        ...['agreements', 'condition_sightings', 'device_tests', 'due_events', 'field_entries', 'finding_posts'],
        ...['in_kind', 'places', 'reveals', 'signature_voids', 'signatures', 'trail', 'unseen_comparisons'],
        ...['unseen_entries', 'unseen_reconciliations', 'views'],
      ].sort(),
    );
  });

  test('people, cases and revisions cannot be deleted', async () => {
    const world = await smallWorld();
    await expect(world.db('people').delete()).rejects.toThrow('never deleted');
    const caseId = await addCase(world, 'KW-2026-001');
    await expect(world.db('cases').where({ id: caseId }).delete()).rejects.toThrow('never deleted');
  });
});

describe('a revision', () => {
  test('comes into force with a signature of its case, gets its number then, and supersedes the former', async () => {
    const world = await smallWorld();
    const documentId = await addSystem(world, 'SYS-101');
    await sign(world, { gate: 'grade', documentId });
    const first = newId('revision');
    await revisions.insertRevision(world.db, {
      ...{ id: first, documentId, number: 4, state: 'in-force', body: bodyNamed('four'), documentHash: 'h4' },
      ...{ inPlantFrom: '2026-01-01T00:00:00.000Z', knownFrom: '2026-01-01T00:00:00.000Z' },
    });
    const caseId = await addCase(world, 'KW-2026-001');
    const id = await working(world, documentId, caseId);
    const revision = await present(world, id);
    const issue = () => transaction(world.db, (trx) => revisions.issueRevision(trx, revision, now()));
    await expect(issue()).rejects.toThrow(/signature/);
    expect((await present(world, first)).state).toBe('in-force');
    await sign(world, { gate: 'approval', caseId });
    expect(await issue()).toBe(5);
    expect((await present(world, first)).state).toBe('superseded');
    expect(await revisions.revisionInForce(world.db, documentId)).toMatchObject({ id, number: 5 });
  });

  test('numbers follow the highest', async () => {
    const world = await smallWorld();
    const documentId = await addSystem(world, 'SYS-101');
    const caseId = await addCase(world, 'KW-2026-001');
    const past = newId('revision');
    await revisions.insertRevision(world.db, { id: past, documentId, number: 4, state: 'superseded', note: 'On paper' });
    const id = await working(world, documentId, caseId);
    await sign(world, { gate: 'field', caseId, documentId });
    expect(await revisions.issueRevision(world.db, await present(world, id), now())).toBe(5);
    expect(await present(world, id)).toMatchObject({ state: 'in-force', number: 5, held: true });
    expect((await findDocument(world.db, documentId))?.inForceId).toBe(id);
    expect(await revisions.bodyOf(world.db, past)).toBeUndefined();
    expect(await revisions.basisOf(world.db, id)).toEqual({ schema: 1, name: 'working' });
    expect((await revisions.revisionsOf(world.db, documentId)).map((row) => row.number)).toEqual([5, 4]);
  });

  test('a void signature, or that of another case, brings nothing into force', async () => {
    const world = await smallWorld();
    const documentId = await addSystem(world, 'SYS-101');
    const caseId = await addCase(world, 'KW-2026-001');
    const other = await addCase(world, 'KW-2026-002');
    const id = await working(world, documentId, caseId);
    const signatureId = await sign(world, { gate: 'approval', caseId });
    await sign(world, { gate: 'approval', caseId: other });
    await sign(world, { gate: 'check', caseId });
    await voidSignature(world.db, { signatureId, at: nowInstant(), cause: 'A bound part moved.' });
    await expect(revisions.issueRevision(world.db, await present(world, id), now())).rejects.toThrow(/signature/);
  });

  test('is frozen once it is no longer working, and only moves forwards', async () => {
    const world = await smallWorld();
    const documentId = await addSystem(world, 'SYS-101');
    const caseId = await addCase(world, 'KW-2026-001');
    const id = await working(world, documentId, caseId);
    const edit = { body: bodyNamed('edited'), documentHash: 'edited' };
    expect(await revisions.writeWorking(world.db, id, 1, edit)).toBe(true);
    expect(await revisions.writeWorking(world.db, id, 1, edit)).toBe(false);
    expect(await revisions.markRevision(world.db, id, 2, { state: 'approved', approvedAt: nowInstant() })).toBe(true);
    const late = { body: bodyNamed('late'), documentHash: 'late' };
    await expect(revisions.writeWorking(world.db, id, 3, late)).rejects.toThrow(/frozen/);
    await expect(revisions.markRevision(world.db, id, 3, { state: 'working' })).rejects.toThrow(/forwards/);
    expect(await revisions.basisOf(world.db, id)).toEqual({ schema: 1, name: 'edited' });
    expect(await revisions.markRevision(world.db, id, 3, { state: 'dropped' })).toBe(true);
    await expect(revisions.markRevision(world.db, id, 4, { state: 'approved' })).rejects.toThrow(/forwards/);
  });

  test('a case has one open revision a document; a body that is handed out cannot be changed', async () => {
    const world = await smallWorld();
    const documentId = await addSystem(world, 'SYS-101');
    const caseId = await addCase(world, 'KW-2026-001');
    const id = await working(world, documentId, caseId);
    await expect(working(world, documentId, caseId)).rejects.toThrow(/UNIQUE/);
    const body = await revisions.basisOf(world.db, id);
    expect(() => Object.assign(body!, { name: 'x' })).toThrow(TypeError);
  });

  test('as of a day and as known on a day', async () => {
    const world = await smallWorld();
    const documentId = await addSystem(world, 'SYS-101');
    const row = { documentId, state: 'superseded' as const };
    const one = { ...row, id: 'rev_1', number: 1, inPlantFrom: '2020-01-01', knownFrom: '2020-01-05' };
    const two = { ...row, id: 'rev_2', number: 2, inPlantFrom: '2022-01-01', knownFrom: '2022-06-01' };
    for (const revision of [one, two]) await revisions.insertRevision(world.db, revision);
    const numberAt = async (asOf: string, known?: string) =>
      (await revisions.revisionAsOf(world.db, documentId, asOf, known))?.number;
    expect(await numberAt('2019-12-31', '2026-01-01')).toBeUndefined();
    expect(await numberAt('2022-02-01')).toBe(1);
    expect(await numberAt('2022-02-01', '2022-07-01')).toBe(2);
  });
});

test('site rules are frozen once signed', async () => {
  const { db, siteId } = await smallWorld();
  const id = newId('siteRules');
  const rules = { id, siteId, number: 1, state: 'drafted' as const, body: { a: 1 }, judgementHash: 'j', fromDay: '2026-01-01' };
  await createRules(db, rules);
  expect(await updateRules(db, id, 1, { body: { a: 2 } })).toBe(true);
  expect(await updateRules(db, id, 2, { state: 'half-signed' })).toBe(true);
  await expect(updateRules(db, id, 3, { body: { a: 3 } })).rejects.toThrow(/frozen/);
  await expect(updateRules(db, id, 3, { state: 'drafted' })).rejects.toThrow(/forwards/);
  expect((await findRules(db, id))?.body).toEqual({ a: 2 });
});
