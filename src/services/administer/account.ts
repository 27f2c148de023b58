/* A person's own account: who they are and where, their sessions, their password. */
import { ROLE_WORDS } from '@domain/case';
import { type Result } from '@domain/result';
import {
  acceptToken,
  type Auth,
  changePassword,
  type Current,
  type From,
  listSessions,
  openSession,
  type SignedIn,
} from '@auth/index';
import { findPeople } from '@data/people';
import { agentWords } from './agent-words';

export type AccountView = {
  name: string;
  email: string;
  job: string | null;
  phone: string | null;
  sites: { slug: string; name: string; roles: string }[];
  standsInFor: { name: string; role: string; until: string }[];
  sessions: { id: string; where: string; since: string; seen: string; here: boolean }[];
};

/** An instant as people write it, in a zone: `24 Mar 2026, 08:02`. */
export function timeIn(instant: string, zone: string): string {
  return new Intl.DateTimeFormat('en-GB', {
    timeZone: zone,
    day: 'numeric',
    month: 'short',
    year: 'numeric',
    hour: '2-digit',
    minute: '2-digit',
  }).format(new Date(instant));
}

/** What the account page shows. Times are those of the person's first site. */
export async function accountView(auth: Auth, who: Current): Promise<AccountView> {
  const { name, email, job, phone } = who.person;
  const zone = who.sites[0]?.site.timeZone ?? 'UTC';
  const sessions = await listSessions(auth, who.person.id, who.session.id);
  const named = await findPeople(
    auth.db,
    who.standsInFor.map((one) => one.fromId),
  );
  return {
    ...{ name, email, job, phone },
    sites: who.sites.map(({ site, roles }) => ({
      slug: site.slug,
      name: site.name,
      roles: roles.map((role) => ROLE_WORDS[role]).join(', '),
    })),
    standsInFor: who.standsInFor.map((one) => ({
      name: named.find((person) => person.id === one.fromId)?.name ?? 'someone',
      role: ROLE_WORDS[one.role],
      until: one.toDay,
    })),
    sessions: sessions.map((one) => ({
      id: one.id,
      where: agentWords(one.agent),
      since: timeIn(one.createdAt, zone),
      seen: timeIn(one.seenAt, zone),
      here: one.present,
    })),
  };
}

/** Changes the own password; the other sessions end. A wrong present password is told beside its field. */
export async function changeOwnPassword(
  auth: Auth,
  who: Current,
  body: { current: string; password: string },
  ip: string,
): Promise<Result<{ ended: number }>> {
  const changed = await changePassword(auth, {
    personId: who.person.id,
    sessionId: who.session.id,
    present: body.current,
    next: body.password,
    ip,
  });
  if (changed.ok || changed.problem.code !== 'PASSWORD_WRONG') return changed;
  const sentence = 'This is not your present password.';
  const errors = [{ path: 'current', code: 'wrong', sentence }];
  return { ok: false, problem: { ...changed.problem, detail: `${sentence} Nothing was changed.`, errors } };
}

/** Sets the password of whoever holds an invitation, and signs them in. */
export async function acceptInvitation(
  auth: Auth,
  body: { token: string; password: string },
  from: From,
): Promise<Result<SignedIn>> {
  const person = await acceptToken(auth, body.token, body.password);
  return person.ok
    ? { ok: true, value: await openSession(auth, person.value, from.agent) }
    : { ok: false, problem: person.problem };
}
