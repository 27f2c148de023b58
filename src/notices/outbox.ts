/* The outbox on the database: services queue drafts within their act, the worker takes one mail at a time. */
import { type Id } from '@domain/case';
import { type Db, transaction } from '@data/connection';
import {
  addNotice,
  findMail,
  mailsToSend,
  makeMail,
  markMail,
  noticesOfMail,
  requeueInterrupted,
  waitingNotices,
  type MailRow,
} from '@data/outbox';
import { findPerson } from '@data/people';
import { type NoticeDraft } from './events';
import { type Outbox, type QueuedMail } from './worker';

/** Writes drafts into the outbox; call it inside the act's transaction. They leave from `at` on. */
export async function queueNotices(
  trx: Db,
  drafts: readonly NoticeDraft[],
  { siteId, at }: { siteId: Id; at: string },
): Promise<void> {
  for (const { event, to, case: caseId, urgency, subject, body } of drafts) {
    await addNotice(trx, { siteId, caseId, event, toId: to, urgency, subject, body, after: at, at });
  }
}

/** Gives each waiting notice its mail. The Message-ID is made from the notice, once, so that every try carries the same. */
async function makeMails(trx: Db, now: string, host: string): Promise<void> {
  for (const notice of await waitingNotices(trx, now)) {
    const messageId = `<${notice.id}@${host}>`;
    await makeMail(trx, { toId: notice.toId, messageId, nextAt: now, madeAt: now }, [notice.id]);
  }
}

/** What a mail says: its notice, or several under one subject. Undefined when no one is left to read it. */
async function letterOf(trx: Db, mail: MailRow): Promise<QueuedMail | undefined> {
  const person = await findPerson(trx, mail.toId);
  const notices = await noticesOfMail(trx, mail.id);
  const [first] = notices;
  if (!person || person.retiredAt !== null || !first) return undefined;
  return {
    id: mail.id,
    tries: mail.tries,
    messageId: mail.messageId,
    to: person.email,
    subject: notices.length === 1 ? first.subject : `${notices.length} notices`,
    text: notices.map((notice) => notice.body).join('\n\n\n'),
  };
}

/** Takes the next mail within one transaction; mails to people who have left are given up on the way. */
async function takeNext(trx: Db, now: string, host: string): Promise<QueuedMail | undefined> {
  await makeMails(trx, now, host);
  for (const mail of await mailsToSend(trx, now)) {
    const letter = await letterOf(trx, mail);
    await markMail(
      trx,
      mail.id,
      letter ? 'sending' : 'dead',
      letter ? {} : { error: 'The person has left.' },
    );
    if (letter) return letter;
  }
  return undefined;
}

/**
 * The outbox that the worker reads.
 * @param baseUrl address of the product; its host ends every Message-ID
 */
export function databaseOutbox(db: Db, baseUrl: string): Outbox {
  const host = new URL(baseUrl).hostname;
  return {
    async recover(now) {
      await transaction(db, (trx) => requeueInterrupted(trx, now.toISOString()));
    },
    async take(now) {
      const at = now.toISOString();
      // Looked at without the write lock: most of the time nothing waits.
      const waits = (await waitingNotices(db, at, 1)).length + (await mailsToSend(db, at, 1)).length > 0;
      return waits ? transaction(db, (trx) => takeNext(trx, at, host)) : undefined;
    },
    async delivered(id, now) {
      await transaction(db, (trx) =>
        markMail(trx, id, 'delivered', { deliveredAt: now.toISOString(), error: null }),
      );
    },
    async failed(id, error, _now, next) {
      await transaction(db, async (trx) => {
        const tries = ((await findMail(trx, id))?.tries ?? 0) + 1;
        const again = next ? { nextAt: next.toISOString() } : {};
        await markMail(trx, id, next ? 'failed' : 'dead', { tries, error, ...again });
      });
    },
  };
}
