/* The invented site in a database of its own, and its people as they ask the views. */
import { type Role } from '@domain/case';
import { type Db } from '@data/connection';
import { findPersonByEmail, rolesOf } from '@data/people';
import { findSiteBySlug } from '@data/site';
import { type Actor, type Ctx } from '@services/context';
import { seedDemo } from '../../../seeds';
import { freshDatabase } from '../../support/database';

export const TODAY = '2026-03-24';

export type Demo = { db: Db; ctx: Ctx; actor(name: string): Promise<Actor> };

/** Seeds the invented site as of TODAY; `actor('ilse.fennimore')` is that person acting there. */
export async function demoSite(): Promise<Demo> {
  const db = await freshDatabase();
  await seedDemo(db, { today: TODAY, hashPassword: () => Promise.resolve('not a password') });
  const ctx: Ctx = { db, now: () => new Date(`${TODAY}T10:00:00.000Z`), baseUrl: 'http://localhost' };
  return {
    db,
    ctx,
    async actor(name) {
      const person = await findPersonByEmail(db, `${name}@ketterwold.example`);
      const site = await findSiteBySlug(db, 'ketterwold');
      if (!person || !site) throw new Error(`${name} is not of the invented site`);
      const roles: Role[] = (await rolesOf(db, person.id)).map((grant) => grant.role);
      return {
        person: { id: person.id, name: person.name, email: person.email },
        site,
        roles,
        standsFor: [],
      };
    },
  };
}

/** The address of a query. */
export const asked = (query = ''): URLSearchParams => new URLSearchParams(query);
