/* POST /api/v1/sites/{site}/cases/{number}/copy: copies a refused or withdrawn case to a new draft. */
import { type APIRoute } from 'astro';
import { ACT_BODIES } from '@domain/case';
import { copyCase } from '@services/edit/raise';
import { answer, onceFrom, readBody, refuse, siteActor } from '@/http/index';

export const POST: APIRoute = async (context) => {
  const body = await readBody(context, ACT_BODIES.copy);
  const asked = siteActor(context);
  if (!asked.ok) return refuse(context, asked.problem);
  const { ctx, actor } = asked.value;
  const number = context.params['number'] ?? '';
  const result = await copyCase(ctx, actor, number, { once: onceFrom(context), body });
  const to = result.ok ? result.value.number : number;
  return answer(context, result, { status: 201, back: `/s/${actor.site.slug}/cases/${to}` });
};
