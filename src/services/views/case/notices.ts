/* Who was told what about a case, when, and whether it was delivered. */
import { findPeople } from '@data/people';
import { findMail, noticesOfCase } from '@data/outbox';
import { type OpenedCase } from './open';
import { plainOf } from './prose';
import { instantWords } from './when';

export type NoticeLine = {
  id: string;
  to: string;
  subject: string;
  body: string;
  urgency: string;
  at: string;
  state: string;
  delivered?: string;
  tries: number;
  error?: string;
  failed: boolean;
};

const STATES: Record<string, string> = {
  queued: 'waits in the outbox',
  sending: 'is being sent',
  delivered: 'delivered',
  failed: 'failed, is tried again',
  dead: 'not delivered, given up',
};

/** The notices of the case, youngest first; while the reader's view is hidden without any figure. */
export async function noticesView(of: OpenedCase): Promise<NoticeLine[]> {
  const { db } = of.ctx;
  const rows = (await noticesOfCase(db, of.file.row.id)).toReversed();
  const people = await findPeople(db, [...new Set(rows.map((row) => row.toId))]);
  const names = new Map(people.map((person) => [person.id, person.name]));
  const ids = [...new Set(rows.flatMap((row) => row.mailId ?? []))];
  const mails = new Map(
    (await Promise.all(ids.map((id) => findMail(db, id)))).flatMap((one) => (one ? [[one.id, one]] : [])),
  );
  const zone = of.file.site.timeZone;
  return rows.map((row) => {
    const mail = row.mailId === null ? undefined : mails.get(row.mailId);
    return {
      id: row.id,
      to: names.get(row.toId) ?? row.toId,
      subject: plainOf(of, row.subject),
      body: plainOf(of, row.body),
      urgency: row.urgency === 'at-once' ? 'at once' : 'with the daily mail',
      at: instantWords(row.at, zone),
      state: STATES[row.state] ?? row.state,
      ...(mail?.deliveredAt ? { delivered: instantWords(mail.deliveredAt, zone) } : {}),
      tries: mail?.tries ?? 0,
      ...(mail?.error ? { error: mail.error } : {}),
      failed: row.state === 'failed' || row.state === 'dead',
    };
  });
}
