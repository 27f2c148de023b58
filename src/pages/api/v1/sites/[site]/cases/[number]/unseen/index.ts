/* POST /api/v1/sites/{site}/cases/{number}/unseen: the checker's own readings, choices and figures, as values or as typed. */
import { type APIRoute } from 'astro';
import { enterTypedUnseen, unseenBodySchema } from '@services/check/unseen-typed';
import { answer, refuse, siteActor, writeOf } from '@/http/index';

export const POST: APIRoute = async (context) => {
  const number = context.params['number'] ?? '';
  const sent = await writeOf(context, unseenBodySchema, 'case');
  const asked = siteActor(context);
  if (!asked.ok) return refuse(context, asked.problem);
  const { ctx, actor } = asked.value;
  const result = await enterTypedUnseen(ctx, actor, number, sent);
  return answer(context, result, { back: `/s/${actor.site.slug}/cases/${number}/unseen` });
};
