/* GET /api/v1/sites/{site}/cases/{number}/trail: the record of a case, youngest first, `?before=` for the next page. */
import { type APIRoute } from 'astro';
import { openCase } from '@services/views/case/open';
import { trailView } from '@services/views/case/trail';
import { answer, refuse, siteActor } from '@/http/index';

export const GET: APIRoute = async (context) => {
  const asked = siteActor(context);
  if (!asked.ok) return refuse(context, asked.problem);
  const { ctx, actor } = asked.value;
  const opened = await openCase(ctx, actor, context.params['number'] ?? '');
  if (!opened.ok) return refuse(context, opened.problem);
  const before = Number(context.url.searchParams.get('before') ?? Number.NaN);
  const view = await trailView(opened.value, Number.isInteger(before) && before > 0 ? before : undefined);
  return answer(context, view);
};
