/* POST …/field/discrepancies/{k}/fix: what was put right. */
import { type APIRoute } from 'astro';
import { fixSchema } from '@services/field/bodies';
import { fixDiscrepancy } from '@services/field/discrepancies';
import { answer, refuse, siteActor, writeOf } from '@/http/index';

export const POST: APIRoute = async (context) => {
  const number = context.params['number'] ?? '';
  const sent = await writeOf(context, fixSchema, 'case');
  const asked = siteActor(context);
  if (!asked.ok) return refuse(context, asked.problem);
  const { ctx, actor } = asked.value;
  const at = { number, discrepancy: Number(context.params['k']) };
  const result = await fixDiscrepancy(ctx, actor, at, sent);
  return answer(context, result, { back: `/s/${actor.site.slug}/cases/${number}/field` });
};
