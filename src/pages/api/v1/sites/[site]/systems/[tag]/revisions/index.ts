/* The revisions of a system. */
import { type APIRoute } from 'astro';
import { systemRevisions } from '@services/views/system';
import { answer, json, refuse, siteActor } from '@/http';

export const GET: APIRoute = async (context) => {
  const at = siteActor(context);
  if (!at.ok) return refuse(context, at.problem);
  const found = await systemRevisions(at.value.ctx, at.value.actor, context.params['tag'] ?? '');
  return found.ok ? json({ revisions: found.value.view?.revisions ?? [] }) : answer(context, found);
};
