/* The outbox: notices written within an act, and the mails by which they leave. */
import { type Id, type Instant } from '@domain/case';
import { type Db } from './connection';
import { newId } from './ids';
import { findAll, findOne, fromColumns, insert, type New, updateWhere } from './mapping';
import { type MailRow, MAILS, type NoticeRow, NOTICES, type SendState } from './tables/outbox';

export type { MailRow, NoticeRow, SendState } from './tables/outbox';

/** Writes a notice; call it inside the act's transaction. */
export async function addNotice(trx: Db, row: Omit<New<NoticeRow>, 'id' | 'state' | 'mailId'>): Promise<Id> {
  const id = newId('notice');
  await insert(trx, NOTICES, { id, state: 'queued', ...row });
  return id;
}

/** Notices that wait, have no mail yet and may go out by now, oldest first. */
export async function waitingNotices(db: Db, now: Instant, limit = 200): Promise<NoticeRow[]> {
  const rows = (await db(NOTICES.name)
    .where({ state: 'queued', mail_id: null })
    .where('after', '<=', now)
    .orderBy('id')
    .limit(limit)) as Record<string, unknown>[];
  return rows.map((row) => fromColumns(NOTICES, row));
}

/** Makes one mail to a person of one or more notices. */
export async function makeMail(
  trx: Db,
  mail: { toId: Id; messageId: string; nextAt: Instant; madeAt: Instant },
  noticeIds: readonly Id[],
): Promise<Id> {
  const id = newId('mail');
  await insert(trx, MAILS, { id, state: 'queued', ...mail });
  await trx(NOTICES.name).whereIn('id', noticeIds).update({ mail_id: id });
  return id;
}

/** Mails to send now: queued or failed ones whose next try has come, oldest first. */
export async function mailsToSend(db: Db, now: Instant, limit = 50): Promise<MailRow[]> {
  const rows = (await db(MAILS.name)
    .whereIn('state', ['queued', 'failed'])
    .where('next_at', '<=', now)
    .orderBy('next_at')
    .limit(limit)) as Record<string, unknown>[];
  return rows.map((row) => fromColumns(MAILS, row));
}

/** A mail by its id. */
export function findMail(db: Db, id: Id): Promise<MailRow | undefined> {
  return findOne(db, MAILS, { id });
}

/** The notices that a mail carries. */
export function noticesOfMail(db: Db, mailId: Id): Promise<NoticeRow[]> {
  return findAll(db, NOTICES, { mailId });
}

/** Moves a mail and the notices it carries to a state. */
export async function markMail(
  trx: Db,
  id: Id,
  state: SendState,
  patch: Partial<Pick<MailRow, 'tries' | 'nextAt' | 'error' | 'deliveredAt'>> = {},
): Promise<void> {
  await updateWhere(trx, MAILS, { id }, { state, ...patch });
  await updateWhere(trx, NOTICES, { mailId: id }, { state });
}

/** Mails that stood as being sent when the server stopped go back to the queue; the Message-ID stays. Gives how many. */
export async function requeueInterrupted(trx: Db, now: Instant): Promise<number> {
  const stuck = await findAll(trx, MAILS, { state: 'sending' });
  for (const mail of stuck) await markMail(trx, mail.id, 'queued', { nextAt: now });
  return stuck.length;
}

/** The notices of a case, oldest first. */
export function noticesOfCase(db: Db, caseId: Id): Promise<NoticeRow[]> {
  return findAll(db, NOTICES, { caseId });
}

/** A person's latest notices, youngest first. */
export async function noticesTo(db: Db, toId: Id, limit = 100): Promise<NoticeRow[]> {
  const rows = (await db(NOTICES.name).where({ to_id: toId }).orderBy('id', 'desc').limit(limit)) as Record<
    string,
    unknown
  >[];
  return rows.map((row) => fromColumns(NOTICES, row));
}

/** How many notices stand in each state. */
export async function noticeCounts(db: Db): Promise<Record<SendState, number>> {
  const counts: Record<SendState, number> = { queued: 0, sending: 0, delivered: 0, failed: 0, dead: 0 };
  const rows = (await db(NOTICES.name).select('state').count('* as n').groupBy('state')) as unknown as {
    state: SendState;
    n: number;
  }[];
  for (const row of rows) counts[row.state] = row.n;
  return counts;
}
