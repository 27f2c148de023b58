/* A migrated database for a test: the template is made once a test worker, every test gets a copy of the file. */
import { copyFileSync, existsSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll } from 'vitest';
import { type Db, migrate, openDatabase } from '@data/connection';
import { newId } from '@data/ids';
import { createPerson, grantRole } from '@data/people';
import { createSite, createUnit } from '@data/site';

const folder = mkdtempSync(join(tmpdir(), 'setwright-test-'));
const template = join(folder, 'template.db');
const opened: Db[] = [];

afterAll(async () => {
  await Promise.all(opened.map((db) => db.destroy()));
  rmSync(folder, { recursive: true, force: true });
});

/** The path of a fresh copy of the migrated, empty database. */
export async function freshFile(): Promise<string> {
  if (!existsSync(template)) {
    const db = openDatabase(template);
    await migrate(db);
    await db.destroy();
  }
  const file = join(folder, `${newId('element')}.db`);
  copyFileSync(template, file);
  return file;
}

/** A migrated, empty database; it is closed when the test file has ended. */
export async function freshDatabase(): Promise<Db> {
  const db = openDatabase(await freshFile());
  opened.push(db);
  return db;
}

/** The ids of a small world: one site with a unit and four people, one a role. */
export type World = { db: Db; siteId: string; unitId: string; people: Record<Roles, string> };
type Roles = 'originator' | 'checker' | 'approver' | 'operations';

/** A fresh database with a site, a unit and four people, one for each role of a case; no one has a password. */
export async function smallWorld(): Promise<World> {
  const db = await freshDatabase();
  const siteId = newId('site');
  const unitId = newId('unit');
  const barometer = { value: 0.918, unit: 'bar_abs' };
  const site = { id: siteId, slug: 'ketterwold', name: 'Ketterwold Works', timeZone: 'Europe/Vienna' };
  await createSite(db, { ...site, barometer, facts: { caseLetters: 'KW' } });
  await createUnit(db, { id: unitId, siteId, tag: '100', name: 'Solvent recovery', units: 'SI' });
  const people = { originator: '', checker: '', approver: '', operations: '' };
  for (const role of Object.keys(people) as Roles[]) {
    const id = newId('person');
    await createPerson(db, { id, email: `${role}@ketterwold.example`, name: `The ${role}` });
    await grantRole(db, { personId: id, siteId, role, fromDay: '2026-01-01', grantedBy: null });
    people[role] = id;
  }
  return { db, siteId, unitId, people };
}
