/* Lucia on Knex: session ids that it sees are hashes, the token itself stands only in the cookie. */
import { type Adapter, type DatabaseSession, Lucia, TimeSpan } from 'lucia';
import { type Db } from '@data/connection';
import { findPersonWithSecrets } from '@data/people';
import { nowInstant } from '@data/ids';
import { type SessionRow } from './session-rows';
import * as rows from './session-rows';

type SessionAttributes = { agent: string; createdAt: string; seenAt: string };

declare module 'lucia' {
  interface Register {
    Lucia: ReturnType<typeof createLucia>;
    DatabaseSessionAttributes: SessionAttributes;
  }
}

/** Name of the session cookie. */
export const SESSION_COOKIE = 'setwright_session';

/** Hours that a session lasts without use; it is renewed when half of them have passed. */
export const SESSION_HOURS = 8;

const toLucia = (row: SessionRow): DatabaseSession => ({
  id: row.id,
  userId: row.personId,
  expiresAt: new Date(row.expiresAt),
  attributes: { agent: row.agent, createdAt: row.createdAt, seenAt: row.seenAt },
});

/** What Lucia asks of a database; a retired person has no session. */
export function knexAdapter(db: Db): Adapter {
  return {
    async getSessionAndUser(id) {
      const session = await rows.findSession(db, id);
      const person = session && (await findPersonWithSecrets(db, session.personId));
      const active = person && person.retiredAt === null;
      return [session ? toLucia(session) : null, active ? { id: person.id, attributes: {} } : null];
    },
    getUserSessions: async (personId) => (await rows.sessionsOf(db, personId, nowInstant())).map(toLucia),
    setSession: ({ id, userId, expiresAt, attributes }) =>
      rows.addSession(db, { id, personId: userId, expiresAt: expiresAt.toISOString(), ...attributes }),
    updateSessionExpiration: (id, expiresAt) =>
      rows.touchSession(db, id, { expiresAt: expiresAt.toISOString() }),
    deleteSession: (id) => rows.endSession(db, id),
    deleteUserSessions: async (personId) => void (await rows.endSessionsOf(db, personId)),
    deleteExpiredSessions: async () => void (await rows.sweepSessions(db, nowInstant())),
  };
}

/** Lucia with our cookie: HttpOnly, SameSite=Lax, Secure when people use https. */
export function createLucia(db: Db, options: { secure: boolean }) {
  return new Lucia(knexAdapter(db), {
    sessionExpiresIn: new TimeSpan(SESSION_HOURS, 'h'),
    sessionCookie: {
      name: SESSION_COOKIE,
      attributes: { secure: options.secure, sameSite: 'lax', path: '/' },
    },
    getSessionAttributes: ({ agent, createdAt, seenAt }) => ({ agent, createdAt, seenAt }),
  });
}
