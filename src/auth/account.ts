/* A person's account: password, invitation, retirement, and the first site coordinator of an empty installation. */
import { randomBytes } from 'node:crypto';
import { type Id, type Instant } from '@domain/case';
import { type Failed, fail, ok, type Result } from '@domain/result';
import { type Db, transaction } from '@data/connection';
import { newId, nowInstant } from '@data/ids';
import * as people from '@data/people';
import { createSite, findSiteBySlug, type SiteRow } from '@data/site';
import { appendTrail } from '@data/trail';
import { type Auth } from './auth';
import { hashPassword, passwordFaults } from './credentials';
import { confirmPassword } from './session';
import { addToken, endSessionsOf, findToken, hashToken, useToken } from './session-rows';

const INVITE_DAYS = 7;
const RESET_HOURS = 2;

function badPassword(password: string, email: string): Failed | null {
  const errors = passwordFaults(password, email);
  return errors[0] ? fail('SCHEMA', errors[0].sentence, { errors }) : null;
}

async function setPassword(trx: Db, personId: Id, passwordHash: string): Promise<void> {
  await trx('people').where({ id: personId }).update({ password_hash: passwordHash }).increment('version', 1);
}

/** Tells the trail of every site of a person what was done to their way in; never the secret itself. */
async function tellSites(trx: Db, personId: Id, act: string): Promise<void> {
  const sites = new Set((await people.rolesOf(trx, personId)).map((grant) => grant.siteId));
  for (const siteId of sites) {
    const entry = { siteId, at: nowInstant(), act, byId: personId, subject: personId, body: { changes: [] } };
    await appendTrail(trx, { ...entry, hides: false });
  }
}

/** Changes a person's own password; every other session of theirs ends. Gives how many ended. */
export async function changePassword(
  auth: Auth,
  asked: { personId: Id; sessionId: string; present: string; next: string; ip: string },
): Promise<Result<{ ended: number }>> {
  const person = await people.findPerson(auth.db, asked.personId);
  if (!person) return fail('UNKNOWN', 'There is no such person.');
  const confirmed = await confirmPassword(auth, asked.personId, asked.present, asked.ip);
  if (!confirmed.ok) return confirmed;
  const bad = badPassword(asked.next, person.email);
  if (bad) return bad;
  const hashed = await hashPassword(asked.next);
  return transaction(auth.db, async (trx) => {
    await setPassword(trx, asked.personId, hashed);
    await tellSites(trx, asked.personId, 'password.changed');
    return ok({ ended: await endSessionsOf(trx, asked.personId, asked.sessionId) });
  });
}

/** Makes a one-time token by which a person sets a password: an invitation (7 days) or a reset (2 hours). */
export async function makeToken(trx: Db, personId: Id, kind: 'invite' | 'reset'): Promise<string> {
  const token = randomBytes(32).toString('base64url');
  const hours = kind === 'invite' ? INVITE_DAYS * 24 : RESET_HOURS;
  const expiresAt = new Date(Date.now() + hours * 3_600_000).toISOString();
  await addToken(trx, { hash: hashToken(token), kind, personId, expiresAt });
  return token;
}

/** Sets the password of whoever holds a token that is neither used nor expired; their other sessions end. */
export async function acceptToken(
  auth: Auth,
  token: string,
  password: string,
): Promise<Result<people.Person>> {
  const stale = fail(
    'UNKNOWN',
    'This link was used already or has expired. Ask the site coordinator for a new one.',
  );
  const row = await findToken(auth.db, token, ['invite', 'reset'], nowInstant());
  const person = row && (await people.findPerson(auth.db, row.personId));
  if (!row || !person || person.retiredAt !== null) return stale;
  const bad = badPassword(password, person.email);
  if (bad) return bad;
  const hashed = await hashPassword(password);
  return transaction(auth.db, async (trx) => {
    if (!(await useToken(trx, row.hash, nowInstant()))) return stale;
    await setPassword(trx, person.id, hashed);
    await tellSites(trx, person.id, row.kind === 'invite' ? 'invitation.accepted' : 'password.changed');
    await endSessionsOf(trx, person.id);
    return ok(person);
  });
}

/** Retires a person inside an act: the record stays, their sessions end at once. */
export async function deactivate(trx: Db, personId: Id, at: Instant): Promise<void> {
  await people.retirePerson(trx, personId, at);
  await endSessionsOf(trx, personId);
}

export type FirstCoordinator = {
  email: string;
  name: string;
  password: string;
  site: Pick<SiteRow, 'slug' | 'name' | 'timeZone' | 'barometer' | 'facts'>;
  /** What else begins with the site, in the same transaction: its rules. */
  begin?: (trx: Db, made: { siteId: Id; personId: Id; at: Instant }) => Promise<void>;
};

/** Creates site and first site coordinator of an empty installation; refused as soon as anyone exists. */
export async function createFirstCoordinator(
  auth: Auth,
  asked: FirstCoordinator,
): Promise<Result<{ person: people.Person; siteId: Id }>> {
  const bad = badPassword(asked.password, asked.email);
  if (bad) return bad;
  const passwordHash = await hashPassword(asked.password);
  return transaction(auth.db, async (trx) => {
    if (!(await people.nobodyYet(trx))) {
      return fail('NOT_PERMITTED', 'This installation has people already; a site coordinator gives roles.');
    }
    const at = nowInstant();
    const personId = newId('person');
    const siteId = (await findSiteBySlug(trx, asked.site.slug))?.id ?? newId('site');
    if (!(await findSiteBySlug(trx, asked.site.slug))) await createSite(trx, { id: siteId, ...asked.site });
    await people.createPerson(trx, { id: personId, email: asked.email, name: asked.name, passwordHash });
    const grant = {
      personId,
      siteId,
      role: 'coordinator' as const,
      fromDay: at.slice(0, 10),
      grantedBy: null,
    };
    await people.grantRole(trx, grant);
    const body = { changes: [], why: 'The first site coordinator of an empty installation.' };
    const entry = { siteId, at, act: 'person.first-coordinator', byId: personId, subject: personId, body };
    await appendTrail(trx, { ...entry, hides: false });
    await asked.begin?.(trx, { siteId, personId, at });
    const person = await people.findPerson(trx, personId);
    return person ? ok({ person, siteId }) : fail('INTERNAL', 'The person was not written.');
  });
}
