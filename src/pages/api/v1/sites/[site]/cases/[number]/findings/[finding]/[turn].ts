/* POST /api/v1/sites/{site}/cases/{number}/findings/{k}/{answer|close|reopen}: the next post of a thread. */
import { type APIRoute } from 'astro';
import { type z } from 'zod';
import { fail } from '@domain/result';
import { type Rich } from '@domain/text';
import { answerFindingSchema, closeFindingSchema, reopenFindingSchema } from '@services/check/bodies';
import { turnFinding } from '@services/check/findings';
import { answer, refuse, siteActor, writeOf } from '@/http/index';

type Turn = Parameters<typeof turnFinding>[2]['turn'];
type Body = { text?: Rich; change?: string };
const TURNS = new Map<string, { turn: Turn; schema: z.ZodType<Body> }>([
  ['answer', { turn: 'answer-finding', schema: answerFindingSchema as z.ZodType<Body> }],
  ['close', { turn: 'close-finding', schema: closeFindingSchema as z.ZodType<Body> }],
  ['reopen', { turn: 'reopen-finding', schema: reopenFindingSchema as z.ZodType<Body> }],
]);

export const POST: APIRoute = async (context) => {
  const { number = '', finding = '', turn: word = '' } = context.params;
  const found = TURNS.get(word);
  const asked = siteActor(context);
  if (!asked.ok) return refuse(context, asked.problem);
  if (!found) return refuse(context, fail('UNKNOWN', `A finding has no act "${word.slice(0, 40)}".`).problem);
  const sent = await writeOf(context, found.schema, 'case');
  const { ctx, actor } = asked.value;
  const at = { number, finding: Number(finding), turn: found.turn };
  const back = `/s/${actor.site.slug}/cases/${number}/findings#finding-${finding}`;
  return answer(context, await turnFinding(ctx, actor, at, sent), { back });
};
