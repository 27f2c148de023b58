/* Findings with their threads. */
import { type Id } from '@domain/case';
import { type Db } from './connection';
import { newId } from './ids';
import { findAll, findIn, findOne, insert, type New, updateVersioned } from './mapping';
import { FINDING_POSTS, type FindingPostRow, type FindingRow, FINDINGS } from './tables/check';

export type { FindingPostRow, FindingRow } from './tables/check';

export type FindingWithPosts = FindingRow & { posts: FindingPostRow[] };
type Post = Omit<New<FindingPostRow>, 'id' | 'findingId'>;

/** Raises a finding with its first post and the case's next number; gives the number. */
export async function raiseFinding(trx: Db, row: Omit<New<FindingRow>, 'number'>, post: Post): Promise<number> {
  const top = (await trx(FINDINGS.name).where({ case_id: row.caseId }).max('number as top').first()) as
    | { top: number | null }
    | undefined;
  const number = (top?.top ?? 0) + 1;
  await insert(trx, FINDINGS, { ...row, number });
  await addPost(trx, row.id, post);
  return number;
}

/** Adds a post to the thread of a finding. */
export function addPost(trx: Db, findingId: Id, post: Post): Promise<void> {
  return insert(trx, FINDING_POSTS, { id: newId('post'), findingId, ...post });
}

/** Changes a finding at the version that was read; false when another write came first. */
export function updateFinding(trx: Db, id: Id, version: number, patch: Partial<FindingRow>): Promise<boolean> {
  return updateVersioned(trx, FINDINGS, id, version, patch);
}

/** A finding of a case by its number. */
export async function findFinding(db: Db, caseId: Id, number: number): Promise<FindingWithPosts | undefined> {
  const row = await findOne(db, FINDINGS, { caseId, number });
  return row && { ...row, posts: await findAll(db, FINDING_POSTS, { findingId: row.id }) };
}

/** The findings of a case by number, each with its thread. */
export async function findingsOf(db: Db, caseId: Id): Promise<FindingWithPosts[]> {
  const rows = await findAll(db, FINDINGS, { caseId }, 'number');
  const ids = rows.map((row) => row.id);
  const posts = (await findIn(db, FINDING_POSTS, 'findingId', ids)).sort((a, b) => (a.id < b.id ? -1 : 1));
  return rows.map((row) => ({ ...row, posts: posts.filter((post) => post.findingId === row.id) }));
}
