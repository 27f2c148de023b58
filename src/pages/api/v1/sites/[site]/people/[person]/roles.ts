/* PUT /api/v1/sites/{site}/people/{person}/roles: all roles that the person has at the site from now on. */
import { type APIRoute } from 'astro';
import { rolesSchema } from '@services/administer/bodies';
import { setRoles } from '@services/administer/change-person';
import { answer, etagOf, refuse, siteActor, viaForm, writeOf } from '@/http';

export const PUT: APIRoute = async (context) => {
  const { body, version } = await writeOf(context, rolesSchema, 'person');
  const asked = siteActor(context);
  if (!asked.ok) return refuse(context, asked.problem);
  const { ctx, actor } = asked.value;
  const id = context.params['person'] ?? '';
  const result = await setRoles(ctx, actor, id, { body, version });
  const headers: Record<string, string> = result.ok ? { ETag: etagOf('person', result.value.version) } : {};
  return answer(context, result, { headers, back: `/s/${actor.site.slug}/people/${id}?done=roles` });
};

export const POST: APIRoute = viaForm({ PUT });
