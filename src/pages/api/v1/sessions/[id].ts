/* DELETE /api/v1/sessions/{id}: ends one of one's own sessions. */
import { type APIRoute } from 'astro';
import { revokeSession } from '@auth/index';
import { fail } from '@domain/result';
import { answer, readSent, refuse, viaForm } from '@/http';

export const DELETE: APIRoute = async (context) => {
  const sent = await readSent(context);
  const { auth, who } = context.locals;
  if (!who) return refuse(context, fail('SIGN_IN', 'You are not signed in, or no longer.').problem);
  if (!sent.ok) return refuse(context, sent.problem);
  const result = await revokeSession(auth, who.person.id, context.params['id'] ?? '');
  return answer(context, result, { status: 204, back: '/account?ended=1' });
};

export const POST: APIRoute = viaForm({ DELETE });
