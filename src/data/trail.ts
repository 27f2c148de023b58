/* The trail: appends an entry bound to the one before it, verifies the chain, reads it. */
import { createHash } from 'node:crypto';
import { type Hash, type Id, type Instant } from '@domain/case';
import { type Db } from './connection';
import { newId } from './ids';
import { findOne, fromColumns, type New, toColumns } from './mapping';
import { TRAIL, TRAIL_HEADS, type TrailHeadRow, type TrailRow } from './tables/outbox';

export type { TrailBody, TrailHeadRow, TrailRow } from './tables/outbox';

/** What an act writes into the trail; number, hashes and id are given here. */
export type NewTrailEntry = Omit<New<TrailRow>, 'id' | 'seq' | 'prev' | 'hash'>;

type Columns = Record<string, unknown>;
const BEGINNING: Hash = '0'.repeat(64);
const HASHED = ['site_id', 'seq', 'at', 'act', 'by_id', 'seat', 'case_id', 'subject', 'body', 'hides', 'prev'];

/** SHA-256 over the stored columns in their order, the former hash last. */
function hashOfColumns(columns: Columns): Hash {
  const text = JSON.stringify(HASHED.map((name) => columns[name] ?? null));
  return createHash('sha256').update(text).digest('hex');
}

/** Appends an entry at the end of the site's chain; call it inside the act's transaction, once per act. */
export async function appendTrail(trx: Db, entry: NewTrailEntry): Promise<TrailRow> {
  const head = await trailHead(trx, entry.siteId);
  const seq = (head?.seq ?? 0) + 1;
  const row = { ...entry, id: newId('trail'), seq, prev: head?.hash ?? BEGINNING };
  const columns: Columns = toColumns(TRAIL, row);
  const hash = hashOfColumns(columns);
  await trx(TRAIL.name).insert({ ...columns, hash });
  await trx(TRAIL_HEADS.name).insert({ site_id: entry.siteId, seq, hash }).onConflict('site_id').merge(['seq', 'hash']);
  return fromColumns(TRAIL, { seat: null, case_id: null, ...columns, hash });
}

/** The number and hash of a site's newest entry. */
export function trailHead(db: Db, siteId: Id): Promise<TrailHeadRow | undefined> {
  return findOne(db, TRAIL_HEADS, { siteId });
}

export type ChainCheck = { ok: true; seq: number; hash: Hash } | { ok: false; seq: number; sentence: string };

/** Walks a site's chain from its beginning and says where it first breaks, or that it is whole up to its head. */
export async function verifyTrail(db: Db, siteId: Id): Promise<ChainCheck> {
  let seq = 0;
  let hash = BEGINNING;
  for (;;) {
    const where = db(TRAIL.name).where({ site_id: siteId }).where('seq', '>', seq);
    const rows = (await where.orderBy('seq').limit(1_000)) as Columns[];
    for (const row of rows) {
      seq += 1;
      if (row['seq'] !== seq) return { ok: false, seq, sentence: `Entry ${seq} of the trail is missing.` };
      if (row['prev'] !== hash) return { ok: false, seq, sentence: `Entry ${seq} does not follow the one before it.` };
      hash = hashOfColumns(row);
      if (row['hash'] !== hash) return { ok: false, seq, sentence: `Entry ${seq} of the trail was changed.` };
    }
    if (rows.length < 1_000) break;
  }
  const head = await trailHead(db, siteId);
  const whole = (head?.seq ?? 0) === seq && (head?.hash ?? BEGINNING) === hash;
  return whole ? { ok: true, seq, hash } : { ok: false, seq, sentence: `The trail ends at entry ${seq}, its head says otherwise.` };
}

export type TrailFilter = {
  caseId?: Id;
  byId?: Id;
  subject?: string;
  act?: string;
  from?: Instant;
  until?: Instant;
  /** Only entries before this number, for the next page. */
  before?: number;
  limit?: number;
};

/** Entries of a site that match, youngest first. */
export async function readTrail(db: Db, siteId: Id, filter: TrailFilter = {}): Promise<TrailRow[]> {
  const query = db(TRAIL.name).where({ site_id: siteId });
  if (filter.caseId) void query.where({ case_id: filter.caseId });
  if (filter.byId) void query.where({ by_id: filter.byId });
  if (filter.subject) void query.where({ subject: filter.subject });
  if (filter.act) void query.where({ act: filter.act });
  if (filter.from) void query.where('at', '>=', filter.from);
  if (filter.until) void query.where('at', '<=', filter.until);
  if (filter.before) void query.where('seq', '<', filter.before);
  const rows = (await query.orderBy('seq', 'desc').limit(filter.limit ?? 200)) as Columns[];
  return rows.map((row) => fromColumns(TRAIL, row));
}
