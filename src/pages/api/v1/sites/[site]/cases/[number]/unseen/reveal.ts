/* POST /api/v1/sites/{site}/cases/{number}/unseen/reveal: shows both sides of one system once everything is entered. */
import { type APIRoute } from 'astro';
import { ACT_BODIES } from '@domain/case';
import { revealUnseen } from '@services/check/unseen';
import { answer, refuse, siteActor, writeOf } from '@/http/index';

export const POST: APIRoute = async (context) => {
  const number = context.params['number'] ?? '';
  const sent = await writeOf(context, ACT_BODIES.reveal, 'case');
  const asked = siteActor(context);
  if (!asked.ok) return refuse(context, asked.problem);
  const { ctx, actor } = asked.value;
  const result = await revealUnseen(ctx, actor, number, sent);
  return answer(context, result, { back: `/s/${actor.site.slug}/cases/${number}/unseen` });
};
