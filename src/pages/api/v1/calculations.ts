/* Works the cases sent, each by its method: nothing is kept. */
import { type APIRoute } from 'astro';
import { z } from 'zod';
import { fail } from '@domain/result';
import { workCases } from '@services/calculations';
import { answer, readBody, refuse } from '@/http';

/** What a case must hold is said case by case in the answer, so that a bad one never stops the others. */
const schema = z.object({
  cases: z.array(z.unknown(), { error: 'a list of cases { id, topic, inputs, want }' }),
  sheet: z.boolean().optional(),
});

export const POST: APIRoute = async (context) => {
  const { who } = context.locals;
  if (!who) return refuse(context, fail('SIGN_IN', 'Sign in first, then send this again.').problem);
  const body = await readBody(context, schema);
  if (!body.ok) return answer(context, body);
  const roles = who.sites.flatMap((one) => one.roles);
  return answer(context, await workCases({ id: who.person.id, roles }, body.value));
};
