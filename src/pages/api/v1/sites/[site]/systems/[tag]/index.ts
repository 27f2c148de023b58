/* A system: the document of its revision in force, or of `?revision=`. */
import { type APIRoute } from 'astro';
import { revisionAsked, systemDocument } from '@services/views/system';
import { answer, refuse, siteActor } from '@/http';

export const GET: APIRoute = async (context) => {
  const at = siteActor(context);
  if (!at.ok) return refuse(context, at.problem);
  const { ctx, actor } = at.value;
  const { searchParams } = context.url;
  const tag = context.params['tag'] ?? '';
  return answer(context, await systemDocument(ctx, actor, tag, revisionAsked(searchParams)));
};
