/* Notices of seeded cases: those that went out, and those that wait to be sent. */
import { newId } from '@data/ids';
import { insert } from '@data/mapping';
import { MAILS, NOTICES } from '@data/tables/outbox';
import { moveText } from '../cases/dates';
import { personId } from '../convert';
import { type CasePlan } from './plan';
import { SITE_ID } from './world';

type Sent = { to: string; at: string; subject: string; delivered: boolean };

async function writeMail(plan: CasePlan, sent: Sent): Promise<string> {
  const id = newId('mail');
  await insert(plan.world.trx, MAILS, {
    id,
    toId: sent.to,
    messageId: `<${id}@ketterwold.example>`,
    state: 'delivered',
    nextAt: sent.at,
    madeAt: sent.at,
    deliveredAt: sent.at,
    tries: 1,
  });
  return id;
}

async function writeNotice(plan: CasePlan, sent: Sent): Promise<void> {
  const { demo, world } = plan;
  const place = `/s/ketterwold/cases/${demo.id}`;
  await insert(world.trx, NOTICES, {
    id: newId('notice'),
    siteId: SITE_ID,
    caseId: plan.id,
    event: sent.subject.includes('signature') ? 'case.waits-for-signature' : 'case.told',
    toId: sent.to,
    urgency: sent.subject.includes('signature') || sent.subject.includes('held') ? 'at-once' : 'digest',
    subject: sent.subject,
    body: `${sent.subject}.\n\n${demo.id} ${demo.title}\n${place}\n`,
    after: sent.at,
    at: sent.at,
    state: sent.delivered ? 'delivered' : 'queued',
    mailId: sent.delivered ? await writeMail(plan, sent) : null,
  });
}

/** Writes the notices of a case, one a person. */
export async function writeNotices(plan: CasePlan): Promise<void> {
  const { demo, world } = plan;
  const year = Number(demo.raised_on.slice(0, 4));
  for (const notice of demo.notices) {
    const at = world.shift.instant(notice.at);
    const subject = moveText(notice.subject, world.shift, year);
    for (const person of notice.to) {
      await writeNotice(plan, { to: personId(person), at, subject, delivered: notice.state === 'delivered' });
    }
  }
}
