/* GET /api/v1/sites/{site}/cases/{number}/field: the field sheet; what was signed only for lines that the reader has seen. */
import { type APIRoute } from 'astro';
import { fieldView } from '@services/views/case/field';
import { answer, etagOf, refuse, siteActor } from '@/http/index';

export const GET: APIRoute = async (context) => {
  const asked = siteActor(context);
  if (!asked.ok) return refuse(context, asked.problem);
  const { ctx, actor } = asked.value;
  const view = await fieldView(ctx, actor, context.params['number'] ?? '');
  if (!view.ok) return refuse(context, view.problem);
  return answer(context, view, { headers: { ETag: etagOf('case', view.value.version) } });
};
