/* POST /api/v1/sites/{site}/cases/{number}/acts/{act}: one act of the stage table. */
import { type APIRoute } from 'astro';
import { fail } from '@domain/result';
import { stageBodySchema } from '@services/stage/bodies';
import { stageAct } from '@services/stage/stage-act';
import { isStageAct } from '@services/stage/types';
import { answer, refuse, siteActor, writeOf } from '@/http/index';

export const POST: APIRoute = async (context) => {
  const act = context.params['act'] ?? '';
  const number = context.params['number'] ?? '';
  const sent = await writeOf(context, stageBodySchema(act), 'case');
  const asked = siteActor(context);
  if (!asked.ok) return refuse(context, asked.problem);
  if (!isStageAct(act))
    return refuse(context, fail('UNKNOWN', `A case has no act "${act.slice(0, 40)}".`).problem);
  const { ctx, actor } = asked.value;
  const result = await stageAct(ctx, context.locals.auth, actor, {
    number,
    act,
    ip: context.clientAddress,
    ...sent,
  });
  return answer(context, result, { back: `/s/${actor.site.slug}/cases/${number}` });
};
