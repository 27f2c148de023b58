/* POST /api/v1/sites/{site}/cases/{number}/seats: nominates the people of a case. */
import { type APIRoute } from 'astro';
import { seatsBody } from '@services/edit/bodies';
import { nominate } from '@services/edit/seats';
import { answer, refuse, siteActor, writeOf } from '@/http/index';

export const POST: APIRoute = async (context) => {
  const sent = await writeOf(context, seatsBody, 'case');
  const asked = siteActor(context);
  if (!asked.ok) return refuse(context, asked.problem);
  const { ctx, actor } = asked.value;
  const number = context.params['number'] ?? '';
  const result = await nominate(ctx, actor, number, sent);
  return answer(context, result, { back: `/s/${actor.site.slug}/cases/${number}#people` });
};
