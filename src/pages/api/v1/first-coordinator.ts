/* POST /api/v1/first-coordinator: site, rules and first site coordinator of an empty installation. */
import { type APIRoute } from 'astro';
import { firstSiteSchema } from '@services/administer/bodies';
import { makeFirstSite } from '@services/administer/first-site';
import { answer, readBody, refuse } from '@/http';

const page = '/first-coordinator';

export const POST: APIRoute = async (context) => {
  const body = await readBody(context, firstSiteSchema);
  if (!body.ok) return refuse(context, body.problem, page);
  const agent = context.request.headers.get('user-agent') ?? '';
  const made = await makeFirstSite(context.locals.auth, body.value, { ip: context.clientAddress, agent });
  if (!made.ok) return answer(context, made, { page });
  const { person, slug, cookie } = made.value;
  const value = { person: { id: person.id, name: person.name }, site: slug };
  return answer(
    context,
    { ok: true, value },
    { status: 201, headers: { 'Set-Cookie': cookie }, back: `/s/${slug}/people` },
  );
};
