/* GET /api/v1/sites/{site}/cases/{number}: the case as its reader may see it. */
import { type APIRoute } from 'astro';
import { casePage } from '@services/views/case/frame';
import { etagOf, json, refuse, siteActor } from '@/http/index';

export const GET: APIRoute = async (context) => {
  const asked = siteActor(context);
  if (!asked.ok) return refuse(context, asked.problem);
  const { ctx, actor } = asked.value;
  const found = await casePage(ctx, actor, context.params['number'] ?? '');
  if (!found.ok) return refuse(context, found.problem);
  const { of, frame } = found.value;
  const { machine: _machine, rail: _rail, parts: _parts, cells: _cells, ...view } = frame;
  return json(
    { ...view, brief: of.hidden ? undefined : of.file.row.brief },
    { headers: { ETag: etagOf('case', frame.version) } },
  );
};
