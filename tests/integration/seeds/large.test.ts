/* The larger seed: systems varied from the invented ones, each a basis of the schema with its register rows. */
import { expect, test } from 'vitest';
import { basisSchema } from '@domain/basis';
import { migrate, openDatabase } from '@data/connection';
import { basisOf, findRevision } from '@data/revisions';
import { seedLarge } from '../../../seeds';

test('forty varied systems stand beside the invented site', async () => {
  const db = openDatabase(':memory:');
  await migrate(db);
  await seedLarge(db, {
    today: '2026-03-16',
    systems: 40,
    hashPassword: (password) => Promise.resolve(password),
  });
  expect(await db('p_systems').where({ truth: 'in-force' }).pluck('tag')).toHaveLength(58);
  const ids = (await db('revisions').where('note', 'Made for the benchmarks.').pluck('id')) as string[];
  expect(ids).toHaveLength(40);
  const body = await basisOf(db, ids[0]!);
  expect(basisSchema.safeParse(body).error?.issues ?? []).toEqual([]);
  expect((await findRevision(db, ids[0]!))!.state).toBe('in-force');
  const hashes = (await db('revisions')
    .whereIn('id', ids)
    .distinct('document_hash')
    .pluck('document_hash')) as string[];
  expect(hashes).toHaveLength(40);
  expect(await db.raw('PRAGMA foreign_key_check')).toEqual([]);
  await db.destroy();
}, 120_000);
