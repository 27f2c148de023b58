/* POST /api/v1/sites/{site}/due-items/{id}/{do|accept|reject|waive}: one turn of a due item. */
import { type APIRoute } from 'astro';
import { fail } from '@domain/result';
import { dueBodySchema, isDueAct } from '@services/due/bodies';
import { turnDue } from '@services/due/turn';
import { answer, refuse, siteActor, writeOf } from '@/http/index';

export const POST: APIRoute = async (context) => {
  const turn = context.params['act'] ?? '';
  const sent = await writeOf(context, dueBodySchema(turn), 'due');
  const asked = siteActor(context);
  if (!asked.ok) return refuse(context, asked.problem);
  if (!isDueAct(turn))
    return refuse(context, fail('UNKNOWN', `A due item has no act "${turn.slice(0, 40)}".`).problem);
  const { ctx, actor } = asked.value;
  const result = await turnDue(ctx, actor, { id: context.params['id'] ?? '', turn }, sent);
  return answer(context, result, { back: `/s/${actor.site.slug}/due` });
};
