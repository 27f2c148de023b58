/* GET, POST /api/v1/sites/{site}/cases/{number}/affected: the systems that a case reaches; answers for one. */
import { type APIRoute } from 'astro';
import { affectedAnswerSchema } from '@domain/case';
import { answerAffected } from '@services/edit/affected';
import { affectedView } from '@services/views/case/affected';
import { casePage } from '@services/views/case/frame';
import { answer, json, refuse, siteActor, writeOf } from '@/http/index';

export const GET: APIRoute = async (context) => {
  const asked = siteActor(context);
  if (!asked.ok) return refuse(context, asked.problem);
  const { ctx, actor } = asked.value;
  const found = await casePage(ctx, actor, context.params['number'] ?? '');
  return found.ok ? json({ affected: affectedView(found.value.of) }) : refuse(context, found.problem);
};

export const POST: APIRoute = async (context) => {
  const sent = await writeOf(context, affectedAnswerSchema, 'case');
  const asked = siteActor(context);
  if (!asked.ok) return refuse(context, asked.problem);
  const { ctx, actor } = asked.value;
  const number = context.params['number'] ?? '';
  const result = await answerAffected(ctx, actor, number, sent);
  return answer(context, result, { back: `/s/${actor.site.slug}/cases/${number}#affected` });
};
