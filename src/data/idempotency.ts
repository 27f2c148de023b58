/* Answers kept by key, so that a request sent twice acts once; and small jobs with their next time. */
import { type Hash, type Id, type Instant } from '@domain/case';
import { type Db } from './connection';
import { findAll, findOne, insert, toColumns } from './mapping';
import { IDEMPOTENCY, type IdempotencyRow, type JobRow, JOBS } from './tables/outbox';

export type { IdempotencyRow, JobRow } from './tables/outbox';

export type Repeat =
  | { kind: 'new' }
  /** The same request was answered before: answer the same again. */
  | { kind: 'same'; status: number; answer: unknown }
  /** The key was used for something else. */
  | { kind: 'other' };

/** Whether a person's key was used before, and for the same route and body. */
export async function checkRepeat(
  db: Db,
  asked: { personId: Id; key: string; route: string; bodyHash: Hash },
): Promise<Repeat> {
  const { personId, key, route, bodyHash } = asked;
  const row = await findOne(db, IDEMPOTENCY, { personId, key });
  if (!row) return { kind: 'new' };
  const same = row.route === route && row.bodyHash === bodyHash;
  return same ? { kind: 'same', status: row.status, answer: row.answer } : { kind: 'other' };
}

/** Keeps the answer to a request; inside the act's transaction. */
export function keepAnswer(trx: Db, row: IdempotencyRow): Promise<void> {
  return insert(trx, IDEMPOTENCY, row);
}

/** Forgets answers older than an instant (48 hours ago); gives how many. */
export function sweepAnswers(trx: Db, before: Instant): Promise<number> {
  return Promise.resolve(trx(IDEMPOTENCY.name).where('at', '<', before).delete());
}

/** A job by its name. */
export function findJob(db: Db, name: string): Promise<JobRow | undefined> {
  return findOne(db, JOBS, { name });
}

/** Jobs whose time has come. */
export async function jobsDue(db: Db, now: Instant): Promise<JobRow[]> {
  return (await findAll(db, JOBS, {}, 'dueAt')).filter((job) => job.dueAt <= now);
}

/** Writes a job's next time and what it keeps in mind. */
export async function putJob(trx: Db, row: JobRow): Promise<void> {
  await trx(JOBS.name).insert(toColumns(JOBS, row)).onConflict('name').merge();
}
