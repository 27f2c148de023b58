/* PUT and DELETE /api/v1/sites/{site}/cases/{number}/agreements/{document}/{sheet}: agrees a sheet at the hash that was in view, or undoes it. */
import { type APIContext, type APIRoute } from 'astro';
import { z } from 'zod';
import { ACT_BODIES } from '@domain/case';
import { agreeSheet, type SheetAt, undoAgreement } from '@services/check/agree';
import { answer, refuse, siteActor, viaForm, writeOf } from '@/http/index';
import { sheetKeyOf } from '@/http/sheet-key';

function sheetAt({ params }: APIContext): SheetAt {
  return {
    number: params['number'] ?? '',
    document: params['document'] ?? '',
    sheet: sheetKeyOf(params['sheet']),
  };
}

function backTo(slug: string, at: SheetAt): string {
  return `/s/${slug}/cases/${at.number}/sheets/${encodeURIComponent(at.sheet)}`;
}

export const PUT: APIRoute = async (context) => {
  const sent = await writeOf(context, ACT_BODIES.agree, 'case');
  const asked = siteActor(context);
  if (!asked.ok) return refuse(context, asked.problem);
  const { ctx, actor } = asked.value;
  const at = sheetAt(context);
  return answer(context, await agreeSheet(ctx, actor, at, sent), { back: backTo(actor.site.slug, at) });
};

export const DELETE: APIRoute = async (context) => {
  const sent = await writeOf(context, z.strictObject({}), 'case');
  const asked = siteActor(context);
  if (!asked.ok) return refuse(context, asked.problem);
  const { ctx, actor } = asked.value;
  const at = sheetAt(context);
  return answer(context, await undoAgreement(ctx, actor, at, sent), { back: backTo(actor.site.slug, at) });
};

/** Forms without script reach both by `_method`. */
export const POST = viaForm({ PUT, DELETE });
