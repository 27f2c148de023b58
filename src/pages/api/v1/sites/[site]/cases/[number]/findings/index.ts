/* GET and POST /api/v1/sites/{site}/cases/{number}/findings: the threads of a case, and a new one at a place. */
import { type APIRoute } from 'astro';
import { raiseFindingSchema } from '@services/check/bodies';
import { raiseFinding } from '@services/check/findings';
import { findingsView } from '@services/views/case/findings';
import { openCase } from '@services/views/case/open';
import { answer, etagOf, json, refuse, siteActor, writeOf } from '@/http/index';

export const GET: APIRoute = async (context) => {
  const asked = siteActor(context);
  if (!asked.ok) return refuse(context, asked.problem);
  const { ctx, actor } = asked.value;
  const opened = await openCase(ctx, actor, context.params['number'] ?? '');
  if (!opened.ok) return refuse(context, opened.problem);
  const { findings, counts } = findingsView(opened.value);
  return json({ findings, counts }, { headers: { ETag: etagOf('case', opened.value.file.row.version) } });
};

export const POST: APIRoute = async (context) => {
  const number = context.params['number'] ?? '';
  const sent = await writeOf(context, raiseFindingSchema, 'case');
  const asked = siteActor(context);
  if (!asked.ok) return refuse(context, asked.problem);
  const { ctx, actor } = asked.value;
  const result = await raiseFinding(ctx, actor, number, sent);
  return answer(context, result, { status: 201, back: `/s/${actor.site.slug}/cases/${number}/findings` });
};
