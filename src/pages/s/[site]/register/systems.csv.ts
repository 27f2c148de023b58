/* Register of systems, as CSV. */
import { type APIRoute } from 'astro';
import { systemsCsv } from '@services/views/register';
import { refuse, siteActor } from '@/http';

export const GET: APIRoute = async (context) => {
  const at = siteActor(context);
  if (!at.ok) return refuse(context, at.problem);
  const { ctx, actor } = at.value;
  return new Response(await systemsCsv(ctx, actor, context.url.searchParams), {
    headers: {
      'Content-Type': 'text/csv; charset=utf-8',
      'Content-Disposition': `attachment; filename="${actor.site.slug}-systems.csv"`,
      'Cache-Control': 'no-store',
    },
  });
};
