/* /api/v1/sites/{site}/people/{person}: GET shows one, PATCH changes some fields, PUT all of them. */
import { type APIRoute } from 'astro';
import { type z } from 'zod';
import { changePersonSchema, wholePersonSchema } from '@services/administer/bodies';
import { changePerson } from '@services/administer/change-person';
import { personView } from '@services/administer/views';
import { answer, etagOf, refuse, siteActor, viaForm, writeOf } from '@/http';

export const GET: APIRoute = async (context) => {
  const asked = siteActor(context);
  if (!asked.ok) return refuse(context, asked.problem);
  const view = await personView(asked.value.ctx, asked.value.actor, context.params['person'] ?? '');
  const headers: Record<string, string> = view.ok ? { ETag: etagOf('person', view.value.version) } : {};
  return answer(context, view, { headers });
};

/** Both ways to change a record differ only in what is left out. */
function changing(schema: z.ZodType<z.output<typeof changePersonSchema>>): APIRoute {
  return async (context) => {
    const { body, version } = await writeOf(context, schema, 'person');
    const asked = siteActor(context);
    if (!asked.ok) return refuse(context, asked.problem);
    const { ctx, actor } = asked.value;
    const id = context.params['person'] ?? '';
    const result = await changePerson(ctx, actor, id, { body, version });
    const headers: Record<string, string> = result.ok ? { ETag: etagOf('person', result.value.version) } : {};
    return answer(context, result, { headers, back: `/s/${actor.site.slug}/people/${id}?done=changed` });
  };
}

export const PATCH: APIRoute = changing(changePersonSchema);
export const PUT: APIRoute = changing(wholePersonSchema);
export const POST: APIRoute = viaForm({ PATCH, PUT });
