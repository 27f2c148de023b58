/* POST /api/v1/password: changes one's own password; the other sessions end. */
import { type APIRoute } from 'astro';
import { fail } from '@domain/result';
import { changeOwnPassword } from '@services/administer/account';
import { passwordSchema } from '@services/administer/bodies';
import { answer, readBody, refuse } from '@/http';

const page = '/account';

export const POST: APIRoute = async (context) => {
  const body = await readBody(context, passwordSchema);
  const { auth, who } = context.locals;
  if (!who) return refuse(context, fail('SIGN_IN', 'You are not signed in, or no longer.').problem);
  if (!body.ok) return refuse(context, body.problem, page);
  const result = await changeOwnPassword(auth, who, body.value, context.clientAddress);
  const ended = result.ok ? result.value.ended : 0;
  return answer(context, result, { page, back: `/account?changed=password&ended=${ended}` });
};
