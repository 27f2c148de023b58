/* Sessions and one-time tokens in the database; only hashes of what people hold are kept. */
import { createHash } from 'node:crypto';
import { type Id, type Instant } from '@domain/case';
import { type Db } from '@data/connection';
import { findAll, findOne, insert, updateWhere } from '@data/mapping';
import { type SessionRow, SESSIONS, type TokenRow, TOKENS } from '@data/tables/people';

export type { SessionRow, TokenRow } from '@data/tables/people';

/** SHA-256 of a token, hex: the form in which it is stored and looked up. */
export function hashToken(token: string): string {
  return createHash('sha256').update(token).digest('hex');
}

/** A session by its id (the hash of its token). */
export function findSession(db: Db, id: string): Promise<SessionRow | undefined> {
  return findOne(db, SESSIONS, { id });
}

/** A person's sessions that have not expired, youngest first. */
export async function sessionsOf(db: Db, personId: Id, now: Instant): Promise<SessionRow[]> {
  const rows = await findAll(db, SESSIONS, { personId }, 'createdAt');
  return rows.filter((row) => row.expiresAt > now).reverse();
}

/** Adds a session. */
export function addSession(db: Db, row: SessionRow): Promise<void> {
  return insert(db, SESSIONS, row);
}

/** Notes that a session was used, or moves its end. */
export async function touchSession(
  db: Db,
  id: string,
  patch: Partial<Pick<SessionRow, 'seenAt' | 'expiresAt'>>,
): Promise<void> {
  await updateWhere(db, SESSIONS, { id }, patch);
}

/** Ends one session. */
export async function endSession(db: Db, id: string): Promise<void> {
  await db(SESSIONS.name).where({ id }).delete();
}

/** Ends a person's sessions, all but one if it is named; gives how many ended. */
export function endSessionsOf(db: Db, personId: Id, but?: string): Promise<number> {
  const query = db(SESSIONS.name).where({ person_id: personId });
  if (but !== undefined) void query.whereNot({ id: but });
  return Promise.resolve(query.delete());
}

/** Forgets sessions that ended before an instant; gives how many. */
export function sweepSessions(db: Db, now: Instant): Promise<number> {
  return Promise.resolve(db(SESSIONS.name).where('expires_at', '<=', now).delete());
}

/** Keeps a one-time token by its hash. */
export function addToken(db: Db, row: Omit<TokenRow, 'usedAt'>): Promise<void> {
  return insert(db, TOKENS, row);
}

/** A token that is neither used nor expired. */
export async function findToken(
  db: Db,
  token: string,
  kinds: readonly TokenRow['kind'][],
  now: Instant,
): Promise<TokenRow | undefined> {
  const row = await findOne(db, TOKENS, { hash: hashToken(token) });
  const good = row && kinds.includes(row.kind) && row.usedAt === null && (row.expiresAt ?? '9') > now;
  return good ? row : undefined;
}

/** Uses a token up; false when someone else did so first. */
export async function useToken(trx: Db, hash: string, at: Instant): Promise<boolean> {
  return (await updateWhere(trx, TOKENS, { hash, usedAt: null }, { usedAt: at })) === 1;
}
