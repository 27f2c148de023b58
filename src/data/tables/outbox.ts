/* Rows of the outbox, of the trail and of the upkeep. */
import { type Hash, type Id, type Instant, type Notice, type SheetKey, type TrailEntry } from '@domain/case';
import { table } from '../mapping';

export type SendState = Notice['state'];
export type NoticeRow = {
  id: Id;
  siteId: Id | null;
  caseId: Id | null;
  event: string;
  toId: Id;
  urgency: Notice['urgency'];
  subject: string;
  body: string;
  after: Instant;
  state: SendState;
  mailId: Id | null;
  at: Instant;
};
export type MailRow = {
  id: Id;
  toId: Id;
  /** The Message-ID, the same at every try. */
  messageId: string;
  state: SendState;
  tries: number;
  nextAt: Instant;
  error: string | null;
  madeAt: Instant;
  deliveredAt: Instant | null;
};

export type TrailBody = { changes: TrailEntry['changes']; why?: string; from?: string };
export type TrailRow = {
  id: Id;
  siteId: Id;
  seq: number;
  at: Instant;
  act: string;
  /** A person, or `system`. */
  byId: Id;
  seat: string | null;
  caseId: Id | null;
  subject: string;
  body: TrailBody;
  hides: boolean;
  prev: Hash;
  hash: Hash;
};
export type TrailHeadRow = { siteId: Id; seq: number; hash: Hash; mailedAt: Instant | null };

export type IdempotencyRow = {
  personId: Id;
  key: string;
  route: string;
  bodyHash: Hash;
  status: number;
  answer: unknown;
  at: Instant;
};
export type JobRow = { name: string; dueAt: Instant; ranAt: Instant | null; state: unknown };
export type MovedResultRow = {
  id: Id;
  evaluationKey: Hash;
  documentId: Id | null;
  sheetKey: SheetKey;
  old: unknown;
  new: unknown;
  shift: number | null;
  verdictMoved: boolean;
  dueId: Id | null;
  at: Instant;
};

export const NOTICES = table<NoticeRow>('notices');
export const MAILS = table<MailRow>('mails');
export const TRAIL = table<TrailRow>('trail', { json: ['body'], flags: ['hides'] });
export const TRAIL_HEADS = table<TrailHeadRow>('trail_heads');
export const IDEMPOTENCY = table<IdempotencyRow>('idempotency', { json: ['answer'] });
export const JOBS = table<JobRow>('jobs', { json: ['state'] });
export const MOVED_RESULTS = table<MovedResultRow>('moved_results', { json: ['old', 'new'], flags: ['verdictMoved'] });
