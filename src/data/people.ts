/* People, their roles at a site, and for whom they stand in. */
import { type Day, type Id, type Instant, type Role } from '@domain/case';
import { type Db } from './connection';
import { newId } from './ids';
import { findAll, findIn, findOne, fromColumns, insert, type New, updateVersioned, updateWhere } from './mapping';
import {
  type DelegationRow,
  DELEGATIONS,
  PEOPLE,
  PERSON_ROLES,
  type PersonRoleRow,
  type PersonRow,
} from './tables/people';

export type { DelegationRow, PersonRoleRow, PersonRow } from './tables/people';

/** A person as others may see them: no password, no second factor. */
export type Person = Omit<PersonRow, 'passwordHash' | 'totp'>;

/** Leaves out what no one else may see. */
export function withoutSecrets({ passwordHash: _, totp: __, ...person }: PersonRow): Person {
  return person;
}

/** Adds a person. */
export function createPerson(trx: Db, row: New<PersonRow>): Promise<void> {
  return insert(trx, PEOPLE, { ...row, email: row.email.trim().toLowerCase() });
}

/** A person with secrets, by id: for sign-in only; elsewhere take `findPerson`. */
export function findPersonWithSecrets(db: Db, id: Id): Promise<PersonRow | undefined> {
  return findOne(db, PEOPLE, { id });
}

/** A person with secrets, by e-mail: for sign-in only. */
export function findPersonByEmail(db: Db, email: string): Promise<PersonRow | undefined> {
  return findOne(db, PEOPLE, { email: email.trim().toLowerCase() });
}

/** A person by id. */
export async function findPerson(db: Db, id: Id): Promise<Person | undefined> {
  const row = await findPersonWithSecrets(db, id);
  return row && withoutSecrets(row);
}

/** People by their ids. */
export async function findPeople(db: Db, ids: readonly Id[]): Promise<Person[]> {
  return (await findIn(db, PEOPLE, 'id', ids)).map(withoutSecrets);
}

/** True when the installation has no person yet. */
export async function nobodyYet(db: Db): Promise<boolean> {
  return (await db(PEOPLE.name).first('id')) === undefined;
}

/** Changes a person at the version that was read; false when another write came first. */
export function updatePerson(trx: Db, id: Id, version: number, patch: Partial<PersonRow>): Promise<boolean> {
  return updateVersioned(trx, PEOPLE, id, version, patch);
}

/** Gives a person a role at a site; nothing happens when they have it. */
export async function grantRole(
  trx: Db,
  grant: { personId: Id; siteId: Id; role: Role; fromDay: Day; grantedBy: Id | null },
): Promise<void> {
  const { personId, siteId, role } = grant;
  if (await findOne(trx, PERSON_ROLES, { personId, siteId, role, toDay: null })) return;
  await insert(trx, PERSON_ROLES, { id: newId('personRole'), ...grant });
}

/** Ends a role of a person at a site; that they had it stays in the record. */
export async function endRole(trx: Db, personId: Id, siteId: Id, role: Role, toDay: Day): Promise<void> {
  await updateWhere(trx, PERSON_ROLES, { personId, siteId, role, toDay: null }, { toDay });
}

/** The open roles of a person, at every site. */
export async function rolesOf(db: Db, personId: Id): Promise<{ siteId: Id; role: Role }[]> {
  const rows = await findAll(db, PERSON_ROLES, { personId, toDay: null });
  return rows.map(({ siteId, role }) => ({ siteId, role }));
}

/** Every role that a person ever had, oldest first. */
export function roleHistory(db: Db, personId: Id): Promise<PersonRoleRow[]> {
  return findAll(db, PERSON_ROLES, { personId });
}

/** The people of a site by name, with their open roles; retired ones too. */
export async function peopleOfSite(db: Db, siteId: Id): Promise<(Person & { roles: Role[] })[]> {
  const grants = await findAll(db, PERSON_ROLES, { siteId });
  const people = await findPeople(db, [...new Set(grants.map((grant) => grant.personId))]);
  return people
    .map((person) => ({
      ...person,
      roles: grants.filter((grant) => grant.personId === person.id && !grant.toDay).map((grant) => grant.role),
    }))
    .sort((a, b) => a.name.localeCompare(b.name));
}

/** Active people of a site who have a role, by name: who may be nominated. */
export async function peopleWithRole(db: Db, siteId: Id, role: Role): Promise<Person[]> {
  const people = await peopleOfSite(db, siteId);
  return people
    .filter((person) => person.retiredAt === null && person.roles.includes(role))
    .map(({ roles: _, ...person }) => person);
}

/** Retires a person: their record stays. (Their sessions are ended by the auth module.) */
export async function retirePerson(trx: Db, id: Id, at: Instant): Promise<void> {
  await trx(PEOPLE.name).where({ id }).update({ retired_at: at }).increment('version', 1);
}

/** Adds a delegation: `toId` stands in for `fromId` in one role at one site, on the days given. */
export function addDelegation(trx: Db, row: Omit<New<DelegationRow>, 'id'>): Promise<void> {
  return insert(trx, DELEGATIONS, { id: newId('delegation'), ...row });
}

/** For whom a person stands in on a day. */
export async function standsInFor(db: Db, personId: Id, day: Day): Promise<DelegationRow[]> {
  const rows = (await db(DELEGATIONS.name)
    .where({ to_id: personId })
    .where('from_day', '<=', day)
    .where('to_day', '>=', day)) as Record<string, unknown>[];
  return rows.map((row) => fromColumns(DELEGATIONS, row));
}
