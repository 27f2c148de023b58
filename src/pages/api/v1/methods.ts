/* The methods of the engine, for programs. */
import { type APIRoute } from 'astro';
import { fail } from '@domain/result';
import { methodList } from '@services/views/methods';
import { answer, refuse } from '@/http';

export const GET: APIRoute = (context) => {
  const { who } = context.locals;
  if (!who) return refuse(context, fail('SIGN_IN', 'Sign in first, then send this again.').problem);
  const roles = who.sites.flatMap((one) => one.roles);
  return answer(context, methodList({ id: who.person.id, roles }));
};
