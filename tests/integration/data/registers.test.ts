/* The registers: order, filters, pages, counts, search; what is hidden stays out of all of them; fast at 2,000 systems. */
import { beforeAll, describe, expect, test } from 'vitest';
import { transaction } from '@data/connection';
import { addSighting } from '@data/field';
import { insertMany } from '@data/mapping';
import * as projections from '@data/projections';
import * as registers from '@data/registers';
import { search, writeSearch } from '@data/search';
import { DOCUMENTS } from '@data/tables/documents';
import { REGISTERS, type SystemRow } from '@data/tables/registers';
import { smallWorld, type World } from '../../support/database';
import { addSystem } from '../../support/records';

type Part = Partial<SystemRow> & { use: number | null };

const row = ({ siteId, unitId }: World, tag: string, part: Part) => ({
  ...{ elementId: '', siteId, unitId, tag, name: `System ${tag}`, service: 'Acetone', grade: 'worked' as const },
  ...{ points: 1, devices: `PSV-${tag}`, stops: 0, justifies: 0, verdict: 'adequate' as const },
  ...part,
});

/** Four systems; SYS-3 is not sized. Gives tag → document id. */
async function fourSystems(world: World): Promise<Record<string, string>> {
  const uses: Record<string, number | null> = { 'SYS-1': 0.72, 'SYS-2': 1.18, 'SYS-3': null, 'SYS-4': 0.95 };
  const verdicts = { 'SYS-1': 'adequate', 'SYS-2': 'inadequate', 'SYS-3': 'not-sized', 'SYS-4': 'marginal' } as const;
  const ids: Record<string, string> = {};
  for (const [tag, use] of Object.entries(uses)) {
    const id = await addSystem(world, tag);
    ids[tag] = id;
    const verdict = verdicts[tag as keyof typeof verdicts];
    await projections.writeProjection(world.db, id, 'in-force', { systems: [row(world, tag, { use, verdict })] });
  }
  return ids;
}

describe('a register', () => {
  let world: World;
  let ids: Record<string, string>;
  beforeAll(async () => {
    world = await smallWorld();
    ids = await fourSystems(world);
  });
  const list = (query: Partial<registers.RegisterQuery> = {}) =>
    registers.listRegister(world.db, 'systems', { siteId: world.siteId, ...query });
  const tags = async (query: Partial<registers.RegisterQuery>) => (await list(query)).rows.map(({ tag }) => tag);

  test('is in the order of tags, or of any column with empty values last', async () => {
    expect(await tags({})).toEqual(['SYS-1', 'SYS-2', 'SYS-3', 'SYS-4']);
    expect(await tags({ sort: 'use', direction: 'desc' })).toEqual(['SYS-2', 'SYS-4', 'SYS-1', 'SYS-3']);
    expect(await tags({ sort: 'use' })).toEqual(['SYS-1', 'SYS-4', 'SYS-2', 'SYS-3']);
    expect(await tags({ sort: 'tag; DROP TABLE sites', direction: 'desc' })).toEqual(['SYS-4', 'SYS-3', 'SYS-2', 'SYS-1']);
  });

  test('filters by value, list, range and words', async () => {
    expect(await tags({ filters: { verdict: 'marginal' } })).toEqual(['SYS-4']);
    expect(await tags({ filters: { verdict: ['marginal', 'inadequate'] } })).toEqual(['SYS-2', 'SYS-4']);
    expect(await tags({ filters: { use: { min: 0.9, max: 1 } } })).toEqual(['SYS-4']);
    expect(await tags({ text: 'psv-sys-2 acetone' })).toEqual(['SYS-2']);
    expect(await tags({ text: '%' })).toEqual([]);
    expect((await list({ filters: { verdict: 'marginal' } })).total).toBe(1);
  });

  test.each(['asc', 'desc'] as const)('pages %s without a gap or a repetition', async (direction) => {
    const seen: string[] = [];
    let cursor: string | undefined;
    do {
      const page = await list({ sort: 'use', direction, limit: 1, ...(cursor ? { cursor } : {}) });
      expect(page.total).toBe(4);
      seen.push(...page.rows.map(({ tag }) => tag));
      cursor = page.next ?? undefined;
    } while (cursor);
    expect(seen).toEqual(await tags({ sort: 'use', direction }));
    expect(await tags({ cursor: 'nonsense' })).toHaveLength(4);
    const back: string[] = [];
    let before = (await list({ sort: 'use', direction, limit: 3 })).next ?? undefined;
    expect((await list({ sort: 'use', direction, limit: 3 })).previous).toBeNull();
    let page = await list({ sort: 'use', direction, limit: 3, ...(before ? { cursor: before } : {}) });
    before = page.previous ?? undefined;
    while (before) {
      page = await list({ sort: 'use', direction, limit: 1, before });
      expect(page.next).not.toBeNull();
      back.unshift(...page.rows.map(({ tag }) => tag));
      before = page.previous ?? undefined;
    }
    expect(back).toEqual(seen.slice(0, 3));
  });

  test('keeps the results of a hidden document out of rows, order, filters and counts', async () => {
    const hidden = new Set([ids['SYS-2']!]);
    const found = (await list({ hidden })).rows.find(({ tag }) => tag === 'SYS-2');
    expect(found).toMatchObject({ hidden: true, use: null, verdict: null, stops: null, name: 'System SYS-2' });
    expect(await tags({ hidden, sort: 'use', direction: 'desc' })).toEqual(['SYS-4', 'SYS-1', 'SYS-2', 'SYS-3']);
    expect(await tags({ hidden, filters: { verdict: 'inadequate' } })).toEqual([]);
    expect(await tags({ hidden, filters: { use: { min: 0 } } })).toEqual(['SYS-1', 'SYS-4']);
    const counts = await registers.countBy(world.db, 'systems', { siteId: world.siteId, hidden }, 'verdict');
    expect(counts.map(({ value }) => value).sort()).toEqual(['adequate', 'marginal', 'not-sized']);
  });

  test.each(Object.keys(REGISTERS) as registers.RegisterName[])('%s: every column lists, hidden or not', async (name) => {
    for (const column of REGISTERS[name].columns) {
      const query = { siteId: world.siteId, sort: column, hidden: new Set(['doc_x']), filters: { [column]: 'x' } };
      expect(await registers.listRegister(world.db, name, query)).toMatchObject({ rows: [], total: 0 });
    }
    const listed = await registers.listRegister(world.db, name, { siteId: world.siteId, hidden: new Set(['doc_x']) });
    const open = await registers.listRegister(world.db, name, { siteId: world.siteId });
    expect(listed).toEqual(open);
  });

  test('an approved truth stands beside the one in force and goes without it', async () => {
    const id = ids['SYS-1']!;
    await projections.writeProjection(world.db, id, 'approved', { systems: [row(world, 'SYS-1', { use: 0.91 })] });
    expect(await tags({ truth: 'approved' })).toEqual(['SYS-1']);
    const [approved] = await registers.registerRowsOf(world.db, 'systems', [id], 'approved');
    expect(approved).toMatchObject({ use: 0.91, truth: 'approved', documentId: id });
    await projections.clearProjection(world.db, id, 'approved');
    expect(await registers.registerRowsOf(world.db, 'systems', [id], 'approved')).toEqual([]);
    expect(await tags({})).toHaveLength(4);
  });
});

test('a field condition keeps when it was last seen when its document is projected anew', async () => {
  const world = await smallWorld();
  const { db, siteId, unitId, people } = world;
  const id = await addSystem(world, 'SYS-1');
  const head = { siteId, unitId, elementId: 'fc_1', tag: 'LO-114', name: 'Locked open', systemTag: 'SYS-1' };
  const condition = { ...head, kind: 'lock-open', requires: '', supports: ['fire'] };
  await projections.writeProjection(db, id, 'in-force', { conditions: [condition] });
  const at = '2026-03-16T08:00:00.000Z';
  const sighting = { documentId: id, condition: 'fc_1', at, byId: people.operations, agrees: false };
  await addSighting(db, sighting);
  await projections.markConditionSeen(db, id, 'fc_1', { at, agrees: false });
  const present = async () => (await registers.listRegister(db, 'conditions', { siteId })).rows;
  const marked = await present();
  expect(marked).toMatchObject([{ seenAt: at, agrees: false, supports: ['fire'] }]);
  await projections.writeProjection(db, id, 'in-force', { conditions: [condition] });
  expect(await present()).toEqual(marked);
});

describe('the search', () => {
  test('finds by the beginnings of words, marks them, and skips what is hidden', async () => {
    const world = await smallWorld();
    const { db, siteId } = world;
    const id = await addSystem(world, 'SYS-101');
    const page = { kind: 'system', siteId, place: 'systems/SYS-101', hides: false, title: 'SYS-101 Acetone column' };
    const sheet = { ...page, kind: 'sheet', hides: true, title: 'Sheet', body: 'Cooling water failure governs' };
    await writeSearch(db, id, [{ ...page, body: 'Reflux drum and condenser of C-101' }, sheet]);
    const [found] = await search(db, siteId, 'sys-101 reflux');
    expect(found).toMatchObject({ place: 'systems/SYS-101', ofId: id });
    expect(found?.snippet.filter(({ hit }) => hit)).toEqual([{ text: 'Reflux', hit: true }]);
    expect(await search(db, siteId, 'cool')).toHaveLength(1);
    expect(await search(db, siteId, 'cool', { hidden: new Set([id]) })).toEqual([]);
    expect(await search(db, siteId, 'condens', { hidden: new Set([id]) })).toHaveLength(1);
    expect(await search(db, siteId, '" OR ) NEAR * -')).toEqual([]);
    expect(await search(db, 'site_other', 'cool')).toEqual([]);
    await writeSearch(db, id, []);
    expect(await search(db, siteId, 'reflux')).toEqual([]);
  });
});

test('2,000 systems list, sort, filter and count in less than 10 ms', async () => {
  const world = await smallWorld();
  const { db, siteId, unitId } = world;
  const all = Array.from({ length: 2_000 }, (_, n) => ({ id: `doc_${n}`, tag: `SYS-${String(n).padStart(4, '0')}` }));
  await transaction(db, async (trx) => {
    const document = { siteId, unitId, kind: 'system' as const, name: 'x', grade: 'worked' as const };
    await insertMany(trx, DOCUMENTS, all.map((one) => ({ ...document, ...one })));
    const heads = all.map(({ id, tag }, n) => ({ ...row(world, tag, { use: (n * 37) % 130 / 100 }), documentId: id, truth: 'in-force' as const }));
    await insertMany(trx, REGISTERS.systems.table, heads);
  });
  const query = { siteId, sort: 'use', direction: 'desc' as const, filters: { use: { min: 0.2 } }, limit: 50 };
  const times: number[] = [];
  for (let run = 0; run < 15; run += 1) {
    const begin = performance.now();
    const page = await registers.listRegister(db, 'systems', query);
    times.push(performance.now() - begin);
    expect(page.rows).toHaveLength(50);
  }
  expect(Math.min(...times)).toBeLessThan(10);
});
