/* /api/v1/session: POST signs in, DELETE signs out. */
import { type APIRoute } from 'astro';
import { signIn, signOut } from '@auth/index';
import { signInSchema } from '@services/administer/bodies';
import { answer, json, localPath, readBody, readSent, refuse, seeOther, viaForm } from '@/http';

const AGENT_LIMIT = 300;

const enter: APIRoute = async (context) => {
  const body = await readBody(context, signInSchema);
  if (!body.ok) return refuse(context, body.problem, '/sign-in');
  const { auth, who, log } = context.locals;
  const { email, password } = body.value;
  const agent = (context.request.headers.get('user-agent') ?? '').slice(0, AGENT_LIMIT);
  const result = await signIn(auth, email, password, { ip: context.clientAddress, agent });
  if (!result.ok) {
    log.info({ code: result.problem.code }, 'sign-in refused');
    return answer(context, result, { page: '/sign-in' });
  }
  if (who) await signOut(auth, who.session.id);
  const { id, name } = result.value.person;
  const headers = { 'Set-Cookie': result.value.cookie };
  return answer(context, { ok: true, value: { person: { id, name } } }, { headers, back: '/' });
};

/** Signing out without a session is no fault: it has ended already. */
const leave: APIRoute = async (context) => {
  await readSent(context);
  const { auth, who, sent } = context.locals;
  const cookie = who
    ? await signOut(auth, who.session.id)
    : auth.lucia.createBlankSessionCookie().serialize();
  const headers = { 'Set-Cookie': cookie };
  return sent?.form === true
    ? seeOther(localPath(sent.back, '/sign-in'), headers)
    : json(null, { status: 204, headers });
};

export const POST: APIRoute = viaForm({ POST: enter, DELETE: leave });
export const DELETE: APIRoute = leave;
