/* GET, PATCH /api/v1/sites/{site}/cases/{number}/documents/{tag}: the working revision of a system in a case; changes it. */
import { type APIRoute } from 'astro';
import { editDocument, opsSchema } from '@services/edit/document';
import { editByForm } from '@services/edit/document-form';
import { workingView } from '@services/views/case/working';
import { casePage } from '@services/views/case/frame';
import {
  answer,
  etagOf,
  json,
  readBody,
  readSent,
  refuse,
  siteActor,
  versionFrom,
  viaForm,
} from '@/http/index';

export const GET: APIRoute = async (context) => {
  const asked = siteActor(context);
  if (!asked.ok) return refuse(context, asked.problem);
  const { ctx, actor } = asked.value;
  const found = await casePage(ctx, actor, context.params['number'] ?? '');
  if (!found.ok) return refuse(context, found.problem);
  const view = await workingView(found.value.of, context.params['tag'] ?? '');
  if (!view.ok) return refuse(context, view.problem);
  return json(view.value, { headers: { ETag: etagOf('revision', view.value.version) } });
};

export const PATCH: APIRoute = async (context) => {
  const sent = await readSent(context);
  const asked = siteActor(context);
  if (!asked.ok) return refuse(context, asked.problem);
  const { ctx, actor } = asked.value;
  const at = { number: context.params['number'] ?? '', system: context.params['tag'] ?? '' };
  const version = versionFrom(context, 'revision');
  const result =
    sent.ok && sent.value.form
      ? await editByForm(ctx, actor, at, { typed: sent.value.typed, version })
      : await editDocument(ctx, actor, at, { body: await readBody(context, opsSchema), version });
  return answer(context, result, {
    back: `/s/${actor.site.slug}/cases/${at.number}/changes?system=${encodeURIComponent(at.system)}`,
    ...(result.ok ? { headers: { ETag: etagOf('revision', result.value.version) } } : {}),
  });
};

export const POST = viaForm({ PATCH });
