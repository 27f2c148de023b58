/* The seeded site: ten cases in their stages, signatures that hold, gates that agree with the story, dates that move. */
import { beforeAll, expect, test } from 'vitest';
import { type Gate, openPoints, type Stage } from '@domain/case';
import { caseMachine } from '@workflows/case';
import { listCases } from '@data/cases';
import { type Db, migrate, openDatabase } from '@data/connection';
import { findSiteBySlug, type SiteRow } from '@data/site';
import { verifyTrail } from '@data/trail';
import { type CaseFile, loadCaseFile } from '@services/case-file';
import { gateFacts } from '@services/gate-facts';
import { DEMO_PASSWORD, seedDemo } from '../../../seeds';

const TODAY = '2026-03-16';
const hashPassword = (password: string) => Promise.resolve(`hash of ${password}`);

async function seeded(today: string): Promise<Db> {
  const db = openDatabase(':memory:');
  await migrate(db);
  await seedDemo(db, { today, hashPassword });
  return db;
}

let db: Db;
let site: SiteRow;
beforeAll(async () => {
  db = await seeded(TODAY);
  site = (await findSiteBySlug(db, 'ketterwold'))!;
}, 120_000);

async function fileOf(number: string): Promise<CaseFile> {
  return (await loadCaseFile(db, site, number))!;
}

async function codesAt(number: string, gate: Gate): Promise<string[]> {
  const facts = await gateFacts(db, await fileOf(number), TODAY, false);
  return openPoints(gate, facts).map((point) => point.code);
}

const STAGES: [string, Stage][] = [
  ['KW-2026-016', 'draft'],
  ['KW-2026-005', 'scenarios'],
  ['KW-2026-008', 'check'],
  ['KW-2026-003', 'approval'],
  ['KW-2025-036', 'field'],
  ['KW-2025-038', 'in-force'],
  ['KW-2025-039', 'in-force'],
  ['KW-2026-015', 'scenarios'],
  ['KW-2026-002', 'withdrawn'],
  ['KW-2025-041', 'refused'],
];

test('ten people sign in with one password, in every role', async () => {
  const people = (await db('people').select('email', 'password_hash')) as {
    email: string;
    password_hash: string;
  }[];
  expect(people).toHaveLength(10);
  expect(people.every((person) => person.email.endsWith('@ketterwold.example'))).toBe(true);
  expect(new Set(people.map((person) => person.password_hash))).toEqual(
    new Set([`hash of ${DEMO_PASSWORD}`]),
  );
  const roles = (await db('person_roles').distinct('role').pluck('role')) as string[];
  expect(roles.sort()).toEqual(['approver', 'auditor', 'checker', 'coordinator', 'operations', 'originator']);
});

test('there are ten cases', async () => expect(await listCases(db, site.id)).toHaveLength(10));

test.each(STAGES)('%s stands in %s with a snapshot that restores there', async (number, stage) => {
  const { row } = await fileOf(number);
  expect(row.stage).toBe(stage);
  const restored = caseMachine.resolveState(row.snapshot as Parameters<typeof caseMachine.resolveState>[0]);
  expect(restored.value).toBe(stage);
});

test.each(STAGES)('%s has working revisions that differ from what they began from', async (number) => {
  const { documents } = await fileOf(number);
  expect(documents.length).toBeGreaterThan(0);
  for (const one of documents) expect(one.working!.documentHash).not.toBe(one.base!.documentHash);
});

const PASSED: [string, Gate][] = [
  ['KW-2026-008', 'scenarios'],
  ['KW-2025-036', 'approval'],
];
test.each(PASSED)('no rule or gate contradicts that %s has passed %s', async (number, gate) => {
  expect(await codesAt(number, gate)).toEqual([]);
});

test('KW-2026-003 waits only for its second approver', async () => {
  expect(await codesAt('KW-2026-003', 'scenarios')).toEqual([]);
  expect(await codesAt('KW-2026-003', 'approval')).toEqual([]);
});

test('open points are those of the story', async () => {
  expect(await codesAt('KW-2026-016', 'draft')).toEqual(['affected-unreviewed', 'affected-unreviewed']);
  expect(await codesAt('KW-2026-005', 'scenarios')).toEqual(['affected-unreviewed']);
  expect(await codesAt('KW-2026-008', 'check')).toEqual([
    'agreement-stale',
    'agreement-stale',
    'finding-open',
  ]);
  expect(await codesAt('KW-2025-036', 'field')).toEqual([
    'discrepancy-open',
    'discrepancy-open',
    'start-up-action-open',
  ]);
});

test('no new outcome stops a case that has left the scenario analysis', async () => {
  for (const [number, stage] of STAGES) {
    if (!['check', 'approval', 'field', 'in-force'].includes(stage)) continue;
    const { documents } = await fileOf(number);
    const stops = documents.flatMap((one) =>
      one.after!.outcomes.filter((outcome) => outcome.severity === 'stop' && !outcome.inherited),
    );
    expect([number, stops.map((outcome) => outcome.sentence)]).toEqual([number, []]);
  }
});

test('every signature that was not voided binds what stands now', async () => {
  for (const [number] of STAGES) {
    const file = await fileOf(number);
    const facts = await gateFacts(db, file, TODAY, false);
    const broken = facts.signatures.filter((signature) => !signature.valid);
    const voided = file.signatures
      .filter((signature) => signature.voids.length > 0)
      .map((signature) => signature.id);
    expect(broken.map((signature) => signature.id)).toEqual(voided);
  }
});

test('the trail is whole, and no reference of the database is broken', async () => {
  expect(await verifyTrail(db, site.id)).toMatchObject({ ok: true });
  expect(await db.raw('PRAGMA foreign_key_check')).toEqual([]);
});

test('every document has a revision in force; two have the body that their case began from', async () => {
  const without = await db('documents').whereNull('in_force_id').pluck('tag');
  expect(without).toEqual([]);
  const held = await db('revisions').where({ state: 'superseded', held: 1 }).orderBy('id').pluck('id');
  expect(held).toEqual(['rev_sys101_4', 'rev_sys404_2']);
  const known = await db('revisions')
    .where({ state: 'superseded', held: 0 })
    .whereNotNull('body')
    .pluck('id');
  expect(known).toEqual([]);
});

test('registers hold every system, relief point and scenario, and both truths of SYS-201', async () => {
  const systems = (await db('p_systems').where({ truth: 'in-force' }).pluck('tag')) as string[];
  expect(systems).toHaveLength(18);
  expect(await db('p_points').where({ truth: 'in-force' }).pluck('tag')).toHaveLength(37);
  expect(await db('p_scenarios').where({ truth: 'in-force' }).pluck('key')).toHaveLength(18 * 35);
  expect(await db('p_systems').where({ truth: 'approved' }).pluck('tag')).toEqual(['SYS-201']);
  expect(await db('p_headers').pluck('tag')).toEqual(['HDR-601', 'HDR-602']);
});

test('seeded on another day, the temporary case still ends in nine days and the emergency analysis is still owed', async () => {
  const later = await seeded('2027-11-02');
  const [ends] = (await later('cases').where({ number: 'KW-2025-039' }).pluck('ends_on')) as string[];
  expect(ends).toBe('2027-11-11');
  const [due] = (await later('due_items').where({ kind: 'analysis' }).pluck('due')) as string[];
  expect(due).toBe('2027-11-03');
  await later.destroy();
}, 120_000);
