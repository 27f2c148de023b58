/* Signing in and out, the list of sessions, and the password again for a signature. */
import { randomBytes } from 'node:crypto';
import { type Id } from '@domain/case';
import { fail, ok, type Result } from '@domain/result';
import { nowInstant } from '@data/ids';
import { findPersonByEmail, findPersonWithSecrets, type Person, withoutSecrets } from '@data/people';
import { type Auth } from './auth';
import { verifyPassword } from './credentials';
import { countAttempt, forgive } from './limits';
import { endSession, endSessionsOf, findSession, hashToken, sessionsOf } from './session-rows';

/** Where a request came from. */
export type From = { ip: string; agent: string };

/** A new session; `cookie` is the value of the Set-Cookie header and must never be logged. */
export type SignedIn = { person: Person; sessionId: string; cookie: string };

const WRONG = 'E-mail and password do not belong together. Check both and try again.';

/** Makes a session for a person who has proved who they are. */
export async function openSession(auth: Auth, person: Person, agent: string): Promise<SignedIn> {
  const token = randomBytes(32).toString('base64url');
  const at = nowInstant();
  const attributes = { agent: agent.slice(0, 300), createdAt: at, seenAt: at };
  const session = await auth.lucia.createSession(person.id, attributes, { sessionId: hashToken(token) });
  return { person, sessionId: session.id, cookie: auth.lucia.createSessionCookie(token).serialize() };
}

/** Signs a person in; an unknown e-mail, a retired person and a wrong password get the same answer in the same time. */
export async function signIn(
  auth: Auth,
  email: string,
  password: string,
  from: From,
): Promise<Result<SignedIn>> {
  const account = email.trim().toLowerCase().slice(0, 320);
  const refused = await countAttempt(auth.limits, account, from.ip);
  if (refused) return refused;
  const person = await findPersonByEmail(auth.db, account);
  const active = person?.retiredAt === null ? person : undefined;
  const right = await verifyPassword(active?.passwordHash, password);
  if (!active || !right) return fail('PASSWORD_WRONG', WRONG);
  await forgive(auth.limits, account, from.ip);
  return ok(await openSession(auth, withoutSecrets(active), from.agent));
}

/** Ends the session; gives the Set-Cookie value that takes the cookie away. */
export async function signOut(auth: Auth, sessionId: string): Promise<string> {
  await endSession(auth.db, sessionId);
  return auth.lucia.createBlankSessionCookie().serialize();
}

export type SessionView = {
  id: string;
  createdAt: string;
  seenAt: string;
  expiresAt: string;
  agent: string;
  present: boolean;
};

/** A person's sessions, youngest first; `present` marks the one that asks. */
export async function listSessions(auth: Auth, personId: Id, presentId: string): Promise<SessionView[]> {
  const rows = await sessionsOf(auth.db, personId, nowInstant());
  return rows.map(({ personId: _, ...row }) => ({ ...row, present: row.id === presentId }));
}

/** Ends one of a person's own sessions. */
export async function revokeSession(auth: Auth, personId: Id, sessionId: string): Promise<Result<null>> {
  const session = await findSession(auth.db, sessionId);
  if (session?.personId !== personId) return fail('UNKNOWN', 'This session has already ended.');
  await endSession(auth.db, sessionId);
  return ok(null);
}

/** Ends all of a person's sessions but the one that asks; gives how many ended. */
export function revokeOthers(auth: Auth, personId: Id, presentId: string): Promise<number> {
  return endSessionsOf(auth.db, personId, presentId);
}

/** Asks for the password again, as a signature does; counted like a sign-in. Never call it inside a transaction. */
export async function confirmPassword(
  auth: Auth,
  personId: Id,
  password: string,
  ip: string,
): Promise<Result<null>> {
  const person = await findPersonWithSecrets(auth.db, personId);
  const account = person?.email ?? personId;
  const refused = await countAttempt(auth.limits, account, ip);
  if (refused) return refused;
  if (!(await verifyPassword(person?.passwordHash, password))) {
    const errors = [{ path: 'password', code: 'wrong', sentence: 'The password is wrong.' }];
    return fail('PASSWORD_WRONG', 'The password is wrong; nothing was signed or changed.', { errors });
  }
  await forgive(auth.limits, account, ip);
  return ok(null);
}
