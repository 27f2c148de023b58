/* Changes a person's record (name, job, telephone, deputy) and their roles at the site. */
import { type Role } from '@domain/case';
import { ok, type Result } from '@domain/result';
import { type Db } from '@data/connection';
import { endRole, grantRole, type Person, rolesOf, updatePerson } from '@data/people';
import { type TrailBody } from '@data/trail';
import { type Actor, type Ctx, today } from '../context';
import { inOneAct, stale, type Write } from '../one-act';
import { type ChangePerson, type SetRoles } from './bodies';
import {
  deputyFault,
  mayAdminister,
  mayChangeRecord,
  noteInTrail,
  personHere,
  type PersonWritten,
  staleness,
} from './person';

function changesOf(person: Person, patch: ChangePerson): TrailBody['changes'] {
  const old: Record<keyof ChangePerson, string | null> = { ...person, deputy: person.deputyId };
  return (Object.keys(patch) as (keyof ChangePerson)[])
    .filter((name) => patch[name] !== undefined && patch[name] !== old[name])
    .map((name) => ({ path: name, old: old[name], new: patch[name] }));
}

/** Writes the fields that differ at the version that was read; STALE carries the fields as they stand now. */
export async function changePerson(
  ctx: Ctx,
  actor: Actor,
  id: string,
  sent: Omit<Write<ChangePerson>, 'once'>,
): Promise<Result<PersonWritten>> {
  const may = mayAdminister(actor);
  if (!may.ok) return may;
  const { body, version } = sent;
  return inOneAct(ctx, actor, undefined, async (trx) => {
    const found = await personHere(trx, actor, id);
    if (!found.ok) return found;
    const person = found.value;
    const owned = await mayChangeRecord(trx, actor, person);
    if (!owned.ok) return owned;
    if (!body.ok) return body;
    if (!version.ok) return version;
    const older = staleness(person, version.value);
    if (older) return older;
    const fault = await deputyFault(trx, actor, body.value.deputy, id);
    if (fault) return fault;
    const changes = changesOf(person, body.value);
    if (changes.length === 0) return ok({ id, name: person.name, version: person.version });
    const { deputy, ...rest } = body.value;
    const patch = { ...rest, ...(deputy === undefined ? {} : { deputyId: deputy }) };
    if (!(await updatePerson(trx, id, person.version, patch))) return stale(person.name, person.version + 1);
    await noteInTrail(trx, ctx, actor, 'person.changed', id, changes);
    return ok({ id, name: patch.name ?? person.name, version: person.version + 1 });
  });
}

/** Gives and ends roles until the person has exactly those asked for; one entry in the trail a role. */
async function moveRoles(
  trx: Db,
  ctx: Ctx,
  actor: Actor,
  personId: string,
  wanted: readonly Role[],
): Promise<boolean> {
  const siteId = actor.site.id;
  const day = today(ctx, actor.site);
  const open = (await rolesOf(trx, personId)).filter((one) => one.siteId === siteId).map((one) => one.role);
  const given = [...new Set(wanted)].filter((role) => !open.includes(role));
  const ended = open.filter((role) => !wanted.includes(role));
  for (const role of given) {
    await grantRole(trx, { personId, siteId, role, fromDay: day, grantedBy: actor.person.id });
    await noteInTrail(trx, ctx, actor, 'role.granted', personId, [{ path: 'roles', new: role }]);
  }
  for (const role of ended) {
    await endRole(trx, personId, siteId, role, day);
    await noteInTrail(trx, ctx, actor, 'role.ended', personId, [{ path: 'roles', old: role }]);
  }
  return given.length + ended.length > 0;
}

/** Sets the roles of a person at the site. Nobody sets their own. An ended role stays in the record. */
export async function setRoles(
  ctx: Ctx,
  actor: Actor,
  id: string,
  sent: Omit<Write<SetRoles>, 'once'>,
): Promise<Result<PersonWritten>> {
  const may = mayAdminister(actor, id);
  if (!may.ok) return may;
  const { body, version } = sent;
  return inOneAct(ctx, actor, undefined, async (trx) => {
    const found = await personHere(trx, actor, id);
    if (!found.ok) return found;
    const person = found.value;
    if (!body.ok) return body;
    if (!version.ok) return version;
    const older = staleness(person, version.value);
    if (older) return older;
    const moved = await moveRoles(trx, ctx, actor, id, body.value.roles);
    if (moved && !(await updatePerson(trx, id, person.version, {})))
      return stale(person.name, person.version + 1);
    return ok({ id, name: person.name, version: person.version + (moved ? 1 : 0) });
  });
}
