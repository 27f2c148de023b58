/* GET, POST /api/v1/sites/{site}/cases: the cases of a site; raises one. */
import { type APIRoute } from 'astro';
import { raiseBody } from '@services/edit/bodies';
import { raiseCase } from '@services/edit/raise';
import { casesView } from '@services/views/case/list';
import { answer, json, onceFrom, readBody, refuse, seeOther, siteActor } from '@/http/index';

export const GET: APIRoute = async (context) => {
  const asked = siteActor(context);
  if (!asked.ok) return refuse(context, asked.problem);
  const { ctx, actor } = asked.value;
  return json(await casesView(ctx, actor, Object.fromEntries(context.url.searchParams)));
};

export const POST: APIRoute = async (context) => {
  const body = await readBody(context, raiseBody);
  const asked = siteActor(context);
  if (!asked.ok) return refuse(context, asked.problem);
  const { ctx, actor } = asked.value;
  const result = await raiseCase(ctx, actor, { body, once: onceFrom(context) });
  if (!result.ok) return refuse(context, result.problem);
  const path = `/s/${actor.site.slug}/cases/${result.value.number}`;
  const { sent } = context.locals;
  if (sent?.form !== true)
    return answer(context, result, {
      status: 201,
      headers: { Location: `/api/v1/sites/${actor.site.slug}/cases/${result.value.number}` },
    });
  const byScript = context.request.headers.get('accept')?.includes('application/problem+json');
  return byScript ? json({ next: path }) : seeOther(path);
};
