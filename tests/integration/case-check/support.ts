/* A seeded site for tests of the check: people by name, a case whose unseen check is still to be done, and writes as they are sent. */
import { type Role } from '@domain/case';
import { ok } from '@domain/result';
import { type Db, migrate, openDatabase } from '@data/connection';
import { peopleOfSite } from '@data/people';
import { findSiteBySlug, type SiteRow } from '@data/site';
import { type Actor, type Ctx } from '@services/context';
import { loadCaseFile } from '@services/case-file';
import { type Write } from '@services/one-act';
import { casePage } from '@services/views/case/frame';
import { seedDemo } from '../../../seeds';

export const TODAY = '2026-03-16';
/** In scenario analysis with a checker who has entered nothing. */
export const HIDDEN_CASE = 'KW-2026-005';
/** In the calculation check, revealed. */
export const OPEN_CASE = 'KW-2026-008';

export type Place = { db: Db; site: SiteRow; ctx: Ctx; as(name: string): Promise<Actor> };

/** The invented site in memory, with one case moved to the check so that its unseen check can be worked. */
export async function seededPlace(): Promise<Place> {
  const db = openDatabase(':memory:');
  await migrate(db);
  await seedDemo(db, { today: TODAY, hashPassword: (password) => Promise.resolve(`hash of ${password}`) });
  await db('cases').where({ number: HIDDEN_CASE }).update({ stage: 'check' });
  const site = await findSiteBySlug(db, 'ketterwold');
  if (!site) throw new Error('The invented site was not seeded.');
  const ctx: Ctx = { db, now: () => new Date(`${TODAY}T09:00:00.000Z`), baseUrl: 'http://localhost' };
  const as = async (name: string): Promise<Actor> => {
    const found = (await peopleOfSite(db, site.id)).find((one) => one.name === name);
    if (!found) throw new Error(`No one is called ${name}.`);
    const { id, email } = found;
    return { person: { id, name, email }, site, roles: found.roles as Role[], standsFor: [] };
  };
  return { db, site, ctx, as };
}

let keys = 0;

/** A write as an endpoint hands it over, at the case's present version. */
export async function written<B>(
  { db, site }: Place,
  number: string,
  body: B,
  version?: number,
): Promise<Write<B>> {
  const file = await loadCaseFile(db, site, number);
  keys += 1;
  const once = {
    key: `test-key-${String(keys)}`,
    route: `POST ${number} ${String(keys)}`,
    bodyHash: String(keys),
  };
  return { body: ok(body), version: ok(version ?? file?.row.version ?? 0), once: ok(once) };
}

/** A case as it is opened for one reader. */
export async function opened(place: Place, actor: Actor, number: string) {
  const found = await casePage(place.ctx, actor, number);
  if (!found.ok) throw new Error(found.problem.detail);
  return found.value;
}
