/* POST /api/v1/sites/{site}/people/{person}/{deactivate|reactivate|invite}: acts on one person. */
import { type APIRoute } from 'astro';
import { fail, type Result } from '@domain/result';
import { nothingSchema } from '@services/administer/bodies';
import { inviteAgain } from '@services/administer/invite';
import { deactivatePerson, reactivatePerson } from '@services/administer/leave';
import { type PersonWritten } from '@services/administer/person';
import { type Actor, type Ctx } from '@services/context';
import { type Write } from '@services/one-act';
import { answer, refuse, siteActor, writeOf } from '@/http';

type Act = (ctx: Ctx, actor: Actor, id: string, sent: Write<unknown>) => Promise<Result<PersonWritten>>;
const ACTS = new Map<string, { act: Act; done: string }>([
  ['deactivate', { act: deactivatePerson, done: 'deactivated' }],
  ['reactivate', { act: reactivatePerson, done: 'reactivated' }],
  ['invite', { act: inviteAgain, done: 'invited' }],
]);

export const POST: APIRoute = async (context) => {
  const sent = await writeOf(context, nothingSchema, 'person');
  const asked = siteActor(context);
  if (!asked.ok) return refuse(context, asked.problem);
  const known = ACTS.get(context.params['act'] ?? '');
  if (!known)
    return refuse(context, fail('UNKNOWN', 'A person is deactivated, reactivated or invited.').problem);
  const { ctx, actor } = asked.value;
  const id = context.params['person'] ?? '';
  const result = await known.act(ctx, actor, id, sent);
  return answer(context, result, { back: `/s/${actor.site.slug}/people/${id}?done=${known.done}` });
};
