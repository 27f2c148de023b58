/* Adds a person to the site: record, roles, invitation; someone known at another site only gets the roles. */
import { fail, ok, type Result } from '@domain/result';
import { type Db } from '@data/connection';
import { newId } from '@data/ids';
import { createPerson, findPersonByEmail, grantRole, type PersonRow, rolesOf } from '@data/people';
import { type Actor, type Ctx, today } from '../context';
import { inOneAct, type Write } from '../one-act';
import { type AddPerson } from './bodies';
import { sendInvitation } from './invite';
import { deputyFault, mayAdminister, noteInTrail, type PersonWritten } from './person';

export type PersonAdded = PersonWritten & {
  /** False when the person has a password already, from another site. */
  invited: boolean;
};

function refused(path: string, sentence: string): Result<never> {
  return fail('SCHEMA', sentence, { errors: [{ path, code: 'taken', sentence }] });
}

async function giveRoles(trx: Db, ctx: Ctx, actor: Actor, personId: string, body: AddPerson): Promise<void> {
  const fromDay = today(ctx, actor.site);
  for (const role of body.roles) {
    await grantRole(trx, { personId, siteId: actor.site.id, role, fromDay, grantedBy: actor.person.id });
  }
}

/** The e-mail is known: the person joins this site with the record that they have. */
async function join(
  trx: Db,
  ctx: Ctx,
  actor: Actor,
  known: PersonRow,
  body: AddPerson,
): Promise<Result<PersonAdded>> {
  const may = mayAdminister(actor, known.id);
  if (!may.ok) return may;
  if (known.retiredAt !== null)
    return refused(
      'email',
      `${known.name} has this e-mail address and is deactivated; reactivate that record.`,
    );
  if ((await rolesOf(trx, known.id)).some((grant) => grant.siteId === actor.site.id))
    return refused('email', `${known.name} has this e-mail address and is at this site already.`);
  await giveRoles(trx, ctx, actor, known.id, body);
  await noteInTrail(trx, ctx, actor, 'person.joined', known.id, [{ path: 'roles', new: body.roles }]);
  const invited = known.passwordHash === null;
  if (invited) await sendInvitation(trx, ctx, actor, known);
  return ok({ id: known.id, name: known.name, version: known.version, invited });
}

async function make(trx: Db, ctx: Ctx, actor: Actor, body: AddPerson): Promise<Result<PersonAdded>> {
  const fault = await deputyFault(trx, actor, body.deputy);
  if (fault) return fault;
  const id = newId('person');
  const { name, email, job, phone, deputy } = body;
  await createPerson(trx, { id, name, email, job, phone, deputyId: deputy });
  await giveRoles(trx, ctx, actor, id, body);
  await noteInTrail(trx, ctx, actor, 'person.added', id, [
    { path: 'name', new: name },
    { path: 'email', new: email.toLowerCase() },
    { path: 'roles', new: body.roles },
  ]);
  await sendInvitation(trx, ctx, actor, { id, name });
  return ok({ id, name, version: 1, invited: true });
}

/** Adds a person and mails the invitation by which they set a password. */
export async function addPerson(
  ctx: Ctx,
  actor: Actor,
  sent: Pick<Write<AddPerson>, 'body' | 'once'>,
): Promise<Result<PersonAdded>> {
  const may = mayAdminister(actor);
  if (!may.ok) return may;
  const { body, once } = sent;
  if (!body.ok) return body;
  if (!once.ok) return once;
  return inOneAct(ctx, actor, once.value, async (trx) => {
    const known = await findPersonByEmail(trx, body.value.email);
    return known ? join(trx, ctx, actor, known, body.value) : make(trx, ctx, actor, body.value);
  });
}
