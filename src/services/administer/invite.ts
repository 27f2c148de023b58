/* Invites a person by mail to set a password; an earlier invitation stops working. */
import { type Instant } from '@domain/case';
import { fail, ok, type Result } from '@domain/result';
import { makeToken } from '@auth/index';
import { type Db } from '@data/connection';
import { updateWhere } from '@data/mapping';
import { addNotice } from '@data/outbox';
import { findPersonWithSecrets } from '@data/people';
import { TOKENS } from '@data/tables/people';
import { type Actor, type Ctx, instant } from '../context';
import { inOneAct, type Write } from '../one-act';
import { mayAdminister, noteInTrail, personHere, type PersonWritten } from './person';

/** Words of the mail. The link is the only way in, so nothing else of the site is said. */
function letter(actor: Actor, name: string, link: string): { subject: string; body: string } {
  return {
    subject: `${actor.site.name}: you are invited to Setwright`,
    body: [
      `${name},`,
      `${actor.person.name} has given you a role at ${actor.site.name}. Set your password within seven days, then you are signed in:`,
      link,
      'The link works once. If it has expired, ask the site coordinator for a new one.',
    ].join('\n\n'),
  };
}

/** Makes a new invitation and queues its mail in the transaction of the act. The token itself stands in the mail only. */
export async function sendInvitation(
  trx: Db,
  ctx: Ctx,
  actor: Actor,
  person: { id: string; name: string },
): Promise<void> {
  const at: Instant = instant(ctx);
  await updateWhere(trx, TOKENS, { personId: person.id, kind: 'invite', usedAt: null }, { usedAt: at });
  const token = await makeToken(trx, person.id, 'invite');
  const words = letter(actor, person.name, `${ctx.baseUrl}/invite/${token}`);
  await addNotice(trx, {
    siteId: actor.site.id,
    event: 'person.invited',
    toId: person.id,
    urgency: 'at-once',
    ...words,
    after: at,
    at,
  });
}

/** Invites a person anew who has not set a password yet. */
export async function inviteAgain(
  ctx: Ctx,
  actor: Actor,
  id: string,
  sent: Pick<Write<unknown>, 'body' | 'once'>,
): Promise<Result<PersonWritten>> {
  const may = mayAdminister(actor);
  if (!may.ok) return may;
  const { body, once } = sent;
  if (!body.ok) return body;
  if (!once.ok) return once;
  return inOneAct(ctx, actor, once.value, async (trx) => {
    const found = await personHere(trx, actor, id);
    if (!found.ok) return found;
    const person = found.value;
    const secrets = await findPersonWithSecrets(trx, id);
    if (person.retiredAt !== null || secrets?.passwordHash != null) {
      const why = person.retiredAt === null ? 'has a password already' : 'is deactivated';
      return fail('SCHEMA', `${person.name} ${why}; only a person who has yet to sign in is invited.`);
    }
    await sendInvitation(trx, ctx, actor, person);
    await noteInTrail(trx, ctx, actor, 'person.invited', id, []);
    return ok({ id, name: person.name, version: person.version });
  });
}
