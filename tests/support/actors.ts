/* People of the small world as the services see them: what the HTTP layer would hand over. */
import { type Role } from '@domain/case';
import { fail, ok, type Result } from '@domain/result';
import { newId } from '@data/ids';
import { createPerson, findPerson, grantRole } from '@data/people';
import { findSite } from '@data/site';
import { type Actor, type Ctx } from '@services/context';
import { type World } from './database';

/** The context of a service in a test: the real clock, links to a host of no one. */
export function ctxOfWorld(world: World): Ctx {
  return { db: world.db, now: () => new Date(), baseUrl: 'https://setwright.example' };
}

/** Adds a person with roles at the site of the world; gives the id. */
export async function addPersonWith(world: World, name: string, roles: readonly Role[]): Promise<string> {
  const id = newId('person');
  const email = `${name.toLowerCase().replaceAll(' ', '.')}@ketterwold.example`;
  await createPerson(world.db, { id, email, name });
  for (const role of roles) {
    await grantRole(world.db, {
      personId: id,
      siteId: world.siteId,
      role,
      fromDay: '2026-01-01',
      grantedBy: null,
    });
  }
  return id;
}

/** A person acting at the site of the world. */
export async function actorOf(world: World, personId: string, roles: readonly Role[]): Promise<Actor> {
  const person = await findPerson(world.db, personId);
  const site = await findSite(world.db, world.siteId);
  if (!person || !site) throw new Error('The small world lacks this person or its site.');
  return { person: { id: person.id, name: person.name, email: person.email }, site, roles, standsFor: [] };
}

let keys = 0;

/** What a well-made request sends. */
export function sentWith<B>(body: B, version?: number) {
  keys += 1;
  const missing: Result<number> = fail('VERSION_MISSING', 'No version was sent.');
  return {
    body: ok(body) as Result<B>,
    version: version === undefined ? missing : ok(version),
    once: ok({ key: `key-${String(keys)}`, route: 'POST /test', bodyHash: JSON.stringify(body) }),
  };
}
