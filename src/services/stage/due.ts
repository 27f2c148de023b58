/* Due items that an act of the stage table makes. */
import { addDays } from '@domain/dates';
import { richFromText } from '@domain/text';
import { addDue, moveDue } from '@data/due';
import { newId } from '@data/ids';
import { type StageWrite } from './types';

/** What approvers ask for with their signature. */
export async function makeRequirements(write: StageWrite): Promise<void> {
  for (const one of write.body.requirements ?? []) {
    await addDue(write.trx, {
      id: newId('due'),
      siteId: write.file.site.id,
      kind: 'approval-requirement',
      caseId: write.file.row.id,
      text: one.text,
      ownerId: one.owner,
      due: one.due,
      closes: one.bars === 'start-up' ? 'field' : null,
      bars: one.bars ?? null,
      state: 'open',
      askedBy: write.actor.person.id,
      askedAt: write.at,
    });
  }
}

/** Inherited failures of a rule that the approver takes on as deficiencies: owner, interim measure, day. */
export async function signDeficiencies(write: StageWrite): Promise<void> {
  for (const one of write.body.deficiencies ?? []) {
    const found = write.facts.documents.flatMap((document) =>
      document.outcomes
        .filter((outcome) => outcome.hash === one.outcome)
        .map((outcome) => ({ document, outcome })),
    )[0];
    if (!found) continue;
    await addDue(write.trx, {
      id: newId('due'),
      siteId: write.file.site.id,
      kind: 'deficiency',
      caseId: write.file.row.id,
      documentId: found.document.document,
      subject: found.outcome.subject,
      text: found.outcome.sentence,
      ownerId: one.owner,
      due: one.due,
      state: 'open',
      interim: richFromText(one.interim),
      outcome: one.outcome,
      signatureId: write.signature ?? null,
      askedBy: write.actor.person.id,
      askedAt: write.at,
    });
  }
  await signWaiting(write);
}

/** Deficiencies that were written down before and wait for an approver's signature are signed with the approval. */
async function signWaiting(write: StageWrite): Promise<void> {
  const waiting = write.file.due.filter(
    (item) => item.kind === 'deficiency' && item.signatureId === null && item.state === 'open',
  );
  for (const item of waiting) {
    const event = { at: write.at, byId: write.actor.person.id, event: 'signed', text: null };
    await moveDue(write.trx, item.id, item.version, { signatureId: write.signature ?? null }, event);
  }
}

/** Papers marked "after" fall due once the change is in force. */
export async function makeDueItemsAfterStartUp(write: StageWrite): Promise<void> {
  const days = write.file.rules.conduct['afterStartUpDays'];
  const due = addDays(write.today, typeof days === 'number' ? days : 30);
  const open = write.file.row.brief.papers.filter(
    (paper) => paper.when === 'after' && !['issued', 'cancelled'].includes(paper.state),
  );
  for (const paper of open) {
    await addDue(write.trx, {
      id: newId('due'),
      siteId: write.file.site.id,
      kind: 'paper',
      caseId: write.file.row.id,
      text: `Issue ${paper.kind} ${paper.reference}${paper.to === '' ? '' : `, ${paper.to}`}`,
      ownerId: write.file.row.raisedBy,
      due,
      state: 'open',
      askedBy: write.actor.person.id,
      askedAt: write.at,
    });
  }
}

/** Papers that must be issued before start-up wait for the originator as due items that hold it. */
export async function makeStartUpPapers(write: StageWrite): Promise<void> {
  const open = write.file.row.brief.papers.filter(
    (paper) =>
      paper.when === 'before-start-up' &&
      paper.kind !== 'none' &&
      !['issued', 'cancelled'].includes(paper.state),
  );
  for (const paper of open) {
    const subject = `brief/papers/${paper.id}`;
    if (write.file.due.some((item) => item.subject === subject)) continue;
    await addDue(write.trx, {
      id: newId('due'),
      siteId: write.file.site.id,
      kind: 'paper',
      caseId: write.file.row.id,
      subject,
      text: `Issue ${paper.kind} ${paper.reference}${paper.to === '' ? '' : `, ${paper.to}`}`,
      ownerId: write.file.row.raisedBy,
      due: addDays(write.today, 30),
      bars: 'start-up',
      closes: 'field',
      state: 'open',
      askedBy: write.actor.person.id,
      askedAt: write.at,
    });
  }
}
