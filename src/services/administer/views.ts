/* The people of a site, as the site coordinator and as everyone else with a role there sees them. */
import { ROLE_WORDS, type Role, SEAT_WORDS } from '@domain/case';
import { ok, type Result } from '@domain/result';
import { casesOfPerson, seatsOf } from '@data/cases';
import { findPeople, findPersonWithSecrets, peopleOfSite, type Person } from '@data/people';
import { type Actor, type Ctx } from '../context';
import { mayAdminister, personHere } from './person';

export type PersonRowView = {
  id: string;
  name: string;
  job: string | null;
  roles: string[];
  active: boolean;
  /** Only for the site coordinator. */
  email?: string;
  phone?: string | null;
};
export type PeopleView = {
  people: PersonRowView[];
  active: number;
  mayChange: boolean;
  /** Why the asker may not change anything here. */
  whyNot?: string;
};

export type PersonView = Omit<PersonRowView, 'roles' | 'email' | 'phone'> & {
  version: number;
  email?: string;
  phone?: string | null;
  roles: Role[];
  deputy: { id: string; name: string } | null;
  mayChange: boolean;
  whyNot?: string;
  /** Absent where the asker may not change roles: their own. */
  rolesWhyNot?: string;
  /** An invitation was sent and no password is set yet. */
  waits: boolean;
  /** Seats that someone else would have to take: "KW-2026-003, the checker". */
  seats: { number: string; seat: string }[];
  /** Who may be named as deputy. */
  deputies: { id: string; name: string }[];
};

const sentenceOf = (result: Result<null>) => (result.ok ? undefined : result.problem.detail);

function rowOf(person: Person & { roles: Role[] }, full: boolean): PersonRowView {
  const { id, name, job, email, phone } = person;
  const roles = person.roles.map((role) => ROLE_WORDS[role]);
  const row = { id, name, job, roles, active: person.retiredAt === null };
  return full ? { ...row, email, phone } : row;
}

/** Everyone who has or had a role at the site, active ones first. Addresses and telephone numbers are for the coordinator. */
export async function peopleView(ctx: Ctx, actor: Actor): Promise<Result<PeopleView>> {
  const may = mayAdminister(actor);
  const people = (await peopleOfSite(ctx.db, actor.site.id)).map((person) => rowOf(person, may.ok));
  const active = people.filter((person) => person.active);
  const left = people.filter((person) => !person.active);
  const whyNot = sentenceOf(may);
  return ok({
    people: [...active, ...left],
    active: active.length,
    mayChange: may.ok,
    ...(whyNot === undefined ? {} : { whyNot }),
  });
}

async function openSeats(ctx: Ctx, actor: Actor, personId: string): Promise<PersonView['seats']> {
  const cases = await casesOfPerson(ctx.db, actor.site.id, personId);
  const open = cases.filter((one) => one.closedAt === null);
  const seats = await Promise.all(open.map((one) => seatsOf(ctx.db, one.id)));
  return open.flatMap((one, i) =>
    (seats[i] ?? [])
      .filter((seat) => seat.personId === personId && !seat.untilAt)
      .map((seat) => ({ number: one.number, seat: SEAT_WORDS[seat.role] })),
  );
}

async function deputyOf(ctx: Ctx, person: Person): Promise<PersonView['deputy']> {
  const [deputy] = person.deputyId === null ? [] : await findPeople(ctx.db, [person.deputyId]);
  return deputy ? { id: deputy.id, name: deputy.name } : null;
}

/** One person of the site. */
export async function personView(ctx: Ctx, actor: Actor, id: string): Promise<Result<PersonView>> {
  const found = await personHere(ctx.db, actor, id);
  if (!found.ok) return found;
  const person = found.value;
  const may = mayAdminister(actor);
  const own = mayAdminister(actor, id);
  const people = await peopleOfSite(ctx.db, actor.site.id);
  const secrets = await findPersonWithSecrets(ctx.db, id);
  const row = rowOf({ ...person, roles: [] }, may.ok);
  return ok({
    ...row,
    version: person.version,
    roles: people.find((one) => one.id === id)?.roles ?? [],
    deputy: await deputyOf(ctx, person),
    mayChange: may.ok,
    ...(may.ok ? {} : { whyNot: may.problem.detail }),
    ...(own.ok ? {} : { rolesWhyNot: own.problem.detail }),
    waits: secrets?.passwordHash == null && person.retiredAt === null,
    seats: await openSeats(ctx, actor, id),
    deputies: people
      .filter((one) => one.retiredAt === null && one.id !== id)
      .map((one) => ({ id: one.id, name: one.name })),
  });
}
