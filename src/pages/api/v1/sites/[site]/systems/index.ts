/* The register of systems for programs: filter, sort and cursor in the address. */
import { type APIRoute } from 'astro';
import { systemRows } from '@services/views/register';
import { answer, refuse, siteActor } from '@/http';

export const GET: APIRoute = async (context) => {
  const at = siteActor(context);
  if (!at.ok) return refuse(context, at.problem);
  return answer(context, await systemRows(at.value.ctx, at.value.actor, context.url.searchParams));
};
