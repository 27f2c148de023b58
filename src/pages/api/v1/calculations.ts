/* Works one method with the inputs sent: nothing is kept. */
import { type APIRoute } from 'astro';
import { z } from 'zod';
import { fail } from '@domain/result';
import { calculate } from '@services/views/methods';
import { answer, readBody, refuse } from '@/http';

const quantity = z.strictObject({
  value: z.number({ error: 'a quantity has a finite number as its value' }),
  unit: z.string().min(1).max(24),
});
const schema = z.strictObject({
  topic: z.string().min(1).max(80),
  inputs: z.record(
    z.string().min(1).max(80),
    z.union([quantity, z.string().max(400), z.number(), z.boolean()], {
      error: 'an input is { value, unit }, a number, a word, or true or false',
    }),
  ),
  edition: z.string().max(80).optional(),
});

export const POST: APIRoute = async (context) => {
  const { who } = context.locals;
  if (!who) return refuse(context, fail('SIGN_IN', 'Sign in first, then send this again.').problem);
  const body = await readBody(context, schema);
  if (!body.ok) return answer(context, body);
  const roles = who.sites.flatMap((one) => one.roles);
  return answer(context, calculate({ id: who.person.id, roles }, body.value));
};
