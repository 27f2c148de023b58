/* PATCH /api/v1/sites/{site}/cases/{number}/brief: changes fields of the brief. */
import { type APIRoute } from 'astro';
import { briefBody } from '@services/edit/bodies';
import { editBrief } from '@services/edit/brief';
import { answer, etagOf, readBody, refuse, siteActor, versionFrom, viaForm } from '@/http/index';

export const PATCH: APIRoute = async (context) => {
  const body = await readBody(context, briefBody);
  const asked = siteActor(context);
  if (!asked.ok) return refuse(context, asked.problem);
  const { ctx, actor } = asked.value;
  const number = context.params['number'] ?? '';
  const result = await editBrief(ctx, actor, number, { body, version: versionFrom(context, 'case') });
  return answer(context, result, {
    back: `/s/${actor.site.slug}/cases/${number}`,
    ...(result.ok ? { headers: { ETag: etagOf('case', result.value.version) } } : {}),
  });
};

export const POST = viaForm({ PATCH });
