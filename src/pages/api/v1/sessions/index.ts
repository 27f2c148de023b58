/* /api/v1/sessions: GET lists one's own sessions, DELETE ends all but the one that asks. */
import { type APIRoute } from 'astro';
import { listSessions, revokeOthers } from '@auth/index';
import { fail, ok } from '@domain/result';
import { answer, json, readSent, refuse, viaForm } from '@/http';

const SIGN_IN = fail('SIGN_IN', 'You are not signed in, or no longer.').problem;

export const GET: APIRoute = async (context) => {
  const { auth, who } = context.locals;
  if (!who) return refuse(context, SIGN_IN);
  return json({ sessions: await listSessions(auth, who.person.id, who.session.id) });
};

export const DELETE: APIRoute = async (context) => {
  const sent = await readSent(context);
  const { auth, who } = context.locals;
  if (!who) return refuse(context, SIGN_IN);
  if (!sent.ok) return refuse(context, sent.problem);
  const ended = await revokeOthers(auth, who.person.id, who.session.id);
  return answer(context, ok({ ended }), { back: `/account?ended=${ended}` });
};

export const POST: APIRoute = viaForm({ DELETE });
