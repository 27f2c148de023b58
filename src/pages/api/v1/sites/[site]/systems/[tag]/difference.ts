/* What differs between two revisions, `?from=3&to=4`. */
import { type APIRoute } from 'astro';
import { systemDifference } from '@services/views/system';
import { answer, refuse, siteActor } from '@/http';

export const GET: APIRoute = async (context) => {
  const at = siteActor(context);
  if (!at.ok) return refuse(context, at.problem);
  const { ctx, actor } = at.value;
  const { searchParams } = context.url;
  const tag = context.params['tag'] ?? '';
  return answer(context, await systemDifference(ctx, actor, tag, searchParams));
};
