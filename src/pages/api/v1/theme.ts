/* POST /api/v1/theme: the ground of the pages, light, dark or as the system, kept in a cookie. */
import { type APIRoute } from 'astro';
import { ok } from '@domain/result';
import { themeSchema } from '@services/administer/bodies';
import { answer, readBody, refuse } from '@/http';

const YEAR = 31_536_000;

export const POST: APIRoute = async (context) => {
  const body = await readBody(context, themeSchema);
  if (!body.ok) return refuse(context, body.problem);
  const { theme } = body.value;
  const secure = context.locals.config.secure ? '; Secure' : '';
  const cookie = `theme=${theme}; Path=/; Max-Age=${YEAR}; SameSite=Lax; HttpOnly${secure}`;
  return answer(context, ok({ theme }), { headers: { 'Set-Cookie': cookie }, back: '/account' });
};
