/* POST …/field/discrepancies/{k}/see-again: the line as it is now. */
import { type APIRoute } from 'astro';
import { seeAgainSchema } from '@services/field/bodies';
import { seeAgain } from '@services/field/discrepancies';
import { withPhotographs } from '@/http/photographs';
import { answer, refuse, siteActor, writeOf } from '@/http/index';

export const POST: APIRoute = async (context) => {
  const number = context.params['number'] ?? '';
  const asked = siteActor(context);
  if (!asked.ok) return refuse(context, asked.problem);
  const { ctx, actor } = asked.value;
  const kept = await withPhotographs(context, ctx, actor, number);
  const sent = await writeOf(context, seeAgainSchema, 'case');
  if (!kept.ok) return refuse(context, kept.problem);
  const at = { number, discrepancy: Number(context.params['k']) };
  const result = await seeAgain(ctx, actor, at, sent);
  return answer(context, result, { back: `/s/${actor.site.slug}/cases/${number}/field` });
};
