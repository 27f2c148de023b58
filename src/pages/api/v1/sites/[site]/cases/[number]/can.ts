/* GET /api/v1/sites/{site}/cases/{number}/can: every act with yes, or the reason why not. */
import { type APIRoute } from 'astro';
import { casePage } from '@services/views/case/frame';
import { json, refuse, siteActor } from '@/http/index';

export const GET: APIRoute = async (context) => {
  const asked = siteActor(context);
  if (!asked.ok) return refuse(context, asked.problem);
  const { ctx, actor } = asked.value;
  const found = await casePage(ctx, actor, context.params['number'] ?? '');
  return found.ok ? json({ acts: found.value.frame.acts }) : refuse(context, found.problem);
};
