/* POST /api/v1/sites/{site}/cases/{number}/field/entries: what operations saw; a form may bring the photographs with it. */
import { type APIRoute } from 'astro';
import { entriesSchema } from '@services/field/bodies';
import { enterField } from '@services/field/enter';
import { withPhotographs } from '@/http/photographs';
import { answer, refuse, siteActor, writeOf } from '@/http/index';

export const POST: APIRoute = async (context) => {
  const number = context.params['number'] ?? '';
  const asked = siteActor(context);
  if (!asked.ok) return refuse(context, asked.problem);
  const { ctx, actor } = asked.value;
  const kept = await withPhotographs(context, ctx, actor, number);
  const sent = await writeOf(context, entriesSchema, 'case');
  if (!kept.ok) return refuse(context, kept.problem);
  const result = await enterField(ctx, actor, number, sent);
  return answer(context, result, { back: `/s/${actor.site.slug}/cases/${number}/field` });
};
