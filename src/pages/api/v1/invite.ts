/* POST /api/v1/invite: sets the password of whoever holds an invitation, and signs them in. */
import { type APIRoute } from 'astro';
import { acceptInvitation } from '@services/administer/account';
import { inviteSchema } from '@services/administer/bodies';
import { answer, readBody, readSent, refuse } from '@/http';

/** The page of the invitation, found again by what was sent; an odd token is not put into an address. */
function pageOf(body: unknown): string {
  const token = typeof body === 'object' && body !== null && 'token' in body ? body.token : undefined;
  return typeof token === 'string' && /^[\w-]{1,200}$/.test(token) ? `/invite/${token}` : '/problem';
}

export const POST: APIRoute = async (context) => {
  const body = await readBody(context, inviteSchema);
  const sent = await readSent(context);
  const page = pageOf(sent.ok ? sent.value.body : undefined);
  if (!body.ok) return refuse(context, body.problem, page);
  const agent = context.request.headers.get('user-agent') ?? '';
  const from = { ip: context.clientAddress, agent };
  const result = await acceptInvitation(context.locals.auth, body.value, from);
  if (!result.ok) return answer(context, result, { page });
  const { id, name } = result.value.person;
  const headers = { 'Set-Cookie': result.value.cookie };
  return answer(context, { ok: true, value: { person: { id, name } } }, { headers, back: '/' });
};
