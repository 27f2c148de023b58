/* POST /api/v1/sites/{site}/due-items: a note to oneself, or what an approver asks for in a case. */
import { type APIRoute } from 'astro';
import { askDue } from '@services/due/ask';
import { askSchema } from '@services/due/bodies';
import { answer, refuse, siteActor, writeOf } from '@/http/index';

export const POST: APIRoute = async (context) => {
  const sent = await writeOf(context, askSchema, 'due');
  const asked = siteActor(context);
  if (!asked.ok) return refuse(context, asked.problem);
  const { ctx, actor } = asked.value;
  const result = await askDue(ctx, actor, sent);
  return answer(context, result, { status: 201, back: `/s/${actor.site.slug}/due` });
};
