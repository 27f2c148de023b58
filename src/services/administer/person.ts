/* What all acts on people share: who may, whom it is about, the version it was made on, the entry in the trail. */
import { can, type Instant } from '@domain/case';
import { fail, type Failed, ok, type Result } from '@domain/result';
import { type Db } from '@data/connection';
import { findPerson, peopleOfSite, type Person, roleHistory, rolesOf } from '@data/people';
import { findSites } from '@data/site';
import { appendTrail, type TrailBody } from '@data/trail';
import { type Actor, type Ctx, instant, whoOf } from '../context';
import { stale } from '../one-act';

/** What every act on a person answers. */
export type PersonWritten = { id: string; name: string; version: number };

/** Whether the actor administers people here; `subject` is the person whose roles change. */
export function mayAdminister(actor: Actor, subject?: string): Result<null> {
  const may = can(whoOf(actor), 'administer', { seats: [], ...(subject === undefined ? {} : { subject }) });
  return may.ok ? ok(null) : fail(may.code, may.sentence);
}

/** A person who has, or had, a role at the actor's site; UNKNOWN otherwise, as for an id that nobody has. */
export async function personHere(db: Db, actor: Actor, id: string): Promise<Result<Person>> {
  const person = await findPerson(db, id);
  const here = person && (await roleHistory(db, id)).some((grant) => grant.siteId === actor.site.id);
  return person && here ? ok(person) : fail('UNKNOWN', `${actor.site.name} has no such person.`);
}

/** The refusal of a write on an older version; it carries the fields as they stand now. */
export function staleness(person: Person, version: number): Failed | undefined {
  if (person.version === version) return undefined;
  const { name, job, phone, deputyId } = person;
  return stale(`The record of ${name}`, person.version, { name, job, phone, deputy: deputyId });
}

/**
 * The record of a person belongs to every site where they have a role. A coordinator changes what counts everywhere (name,
 * sign-in) only while they are coordinator at each of those sites.
 */
export async function mayChangeRecord(db: Db, actor: Actor, person: Person): Promise<Result<null>> {
  const elsewhere = (await rolesOf(db, person.id)).filter((grant) => grant.siteId !== actor.site.id);
  const own = (await rolesOf(db, actor.person.id)).filter((grant) => grant.role === 'coordinator');
  const foreign = elsewhere.filter((grant) => !own.some((mine) => mine.siteId === grant.siteId));
  if (foreign.length === 0 || person.id === actor.person.id) return ok(null);
  const sites = await findSites(db, [...new Set(foreign.map((grant) => grant.siteId))]);
  const where = sites.map((site) => site.name).join(', ');
  return fail(
    'NOT_PERMITTED',
    `${person.name} also has roles at ${where}, where you are not site coordinator. You can change the roles here, not the person’s record.`,
  );
}

/** A deputy must be an active person of the site, and someone else. */
export async function deputyFault(
  db: Db,
  actor: Actor,
  deputy: string | null | undefined,
  of?: string,
): Promise<Failed | undefined> {
  if (deputy === null || deputy === undefined) return undefined;
  const people = await peopleOfSite(db, actor.site.id);
  const found = people.some((one) => one.id === deputy && one.retiredAt === null && one.id !== of);
  const sentence = 'A deputy is another active person of this site.';
  return found
    ? undefined
    : fail('SCHEMA', sentence, { errors: [{ path: 'deputy', code: 'unknown', sentence }] });
}

/** Appends what was done to a person to the trail of the site. */
export async function noteInTrail(
  trx: Db,
  ctx: Ctx,
  actor: Actor,
  act: string,
  subject: string,
  changes: TrailBody['changes'],
): Promise<Instant> {
  const at = instant(ctx);
  await appendTrail(trx, {
    siteId: actor.site.id,
    at,
    act,
    byId: actor.person.id,
    seat: null,
    caseId: null,
    subject,
    body: { changes },
    hides: false,
  });
  return at;
}
