/* Deactivates a person who has left, and takes them back: the record and everything they signed stay. */
import { fail, ok, type Result } from '@domain/result';
import { deactivate } from '@auth/index';
import { type Db } from '@data/connection';
import { type Person, updatePerson } from '@data/people';
import { type Actor, type Ctx, instant } from '../context';
import { inOneAct, stale, type Write } from '../one-act';
import {
  mayAdminister,
  mayChangeRecord,
  noteInTrail,
  personHere,
  type PersonWritten,
  staleness,
} from './person';

type Sent = Write<unknown>;

/** Checks in the order of refusals, then writes within one transaction. */
async function onPerson(
  ctx: Ctx,
  actor: Actor,
  id: string,
  sent: Sent,
  write: (trx: Db, person: Person) => Promise<Result<PersonWritten>>,
): Promise<Result<PersonWritten>> {
  const may = mayAdminister(actor, id);
  if (!may.ok) return may;
  const { body, version, once } = sent;
  if (!body.ok) return body;
  if (!once.ok) return once;
  return inOneAct(ctx, actor, once.value, async (trx) => {
    const found = await personHere(trx, actor, id);
    if (!found.ok) return found;
    const owned = await mayChangeRecord(trx, actor, found.value);
    if (!owned.ok) return owned;
    if (!version.ok) return version;
    return staleness(found.value, version.value) ?? write(trx, found.value);
  });
}

/** Deactivates a person: their sessions end at once, they can't sign in, history stays. Never oneself. */
export function deactivatePerson(
  ctx: Ctx,
  actor: Actor,
  id: string,
  sent: Sent,
): Promise<Result<PersonWritten>> {
  return onPerson(ctx, actor, id, sent, async (trx, person) => {
    if (person.retiredAt !== null) return fail('SCHEMA', `${person.name} is deactivated already.`);
    await deactivate(trx, id, instant(ctx));
    await noteInTrail(trx, ctx, actor, 'person.deactivated', id, []);
    return ok({ id, name: person.name, version: person.version + 1 });
  });
}

/** Takes a deactivated person back, with the roles that were not ended. */
export function reactivatePerson(
  ctx: Ctx,
  actor: Actor,
  id: string,
  sent: Sent,
): Promise<Result<PersonWritten>> {
  return onPerson(ctx, actor, id, sent, async (trx, person) => {
    if (person.retiredAt === null) return fail('SCHEMA', `${person.name} is active.`);
    if (!(await updatePerson(trx, id, person.version, { retiredAt: null })))
      return stale(person.name, person.version + 1);
    await noteInTrail(trx, ctx, actor, 'person.reactivated', id, []);
    return ok({ id, name: person.name, version: person.version + 1 });
  });
}
