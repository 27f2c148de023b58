/* GET /api/v1/sites/{site}/cases/{number}/open-points: what keeps the waiting gate shut. */
import { type APIRoute } from 'astro';
import { casePage } from '@services/views/case/frame';
import { json, refuse, siteActor } from '@/http/index';

export const GET: APIRoute = async (context) => {
  const asked = siteActor(context);
  if (!asked.ok) return refuse(context, asked.problem);
  const { ctx, actor } = asked.value;
  const found = await casePage(ctx, actor, context.params['number'] ?? '');
  if (!found.ok) return refuse(context, found.problem);
  const { frame } = found.value;
  return json({ stage: frame.stage, gate: frame.gate?.gate ?? null, openPoints: frame.machine.open });
};
