/* POST /api/v1/sites/{site}/cases/{number}/unseen/{id}/reconcile: says in writing why an entry and the sheet differ. */
import { type APIRoute } from 'astro';
import { reconcileSchema } from '@services/check/bodies';
import { reconcileUnseen } from '@services/check/unseen';
import { answer, refuse, siteActor, writeOf } from '@/http/index';

export const POST: APIRoute = async (context) => {
  const number = context.params['number'] ?? '';
  const sent = await writeOf(context, reconcileSchema, 'case');
  const asked = siteActor(context);
  if (!asked.ok) return refuse(context, asked.problem);
  const { ctx, actor } = asked.value;
  const result = await reconcileUnseen(ctx, actor, number, context.params['id'] ?? '', sent);
  return answer(context, result, { back: `/s/${actor.site.slug}/cases/${number}/unseen` });
};
