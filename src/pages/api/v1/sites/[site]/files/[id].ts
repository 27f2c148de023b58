/* GET /api/v1/sites/{site}/files/{id}: a photograph, as it was received. */
import { type APIRoute } from 'astro';
import { photograph } from '@services/field/photographs';
import { refuse, siteActor } from '@/http/index';

export const GET: APIRoute = async (context) => {
  const asked = siteActor(context);
  if (!asked.ok) return refuse(context, asked.problem);
  const { ctx, actor } = asked.value;
  const found = await photograph(ctx, actor, context.locals.config.dataDir, context.params['id'] ?? '');
  if (!found.ok) return refuse(context, found.problem);
  const { type, bytes } = found.value;
  return new Response(Buffer.from(bytes), {
    headers: { 'Content-Type': type, 'Cache-Control': 'private, max-age=86400, immutable' },
  });
};
