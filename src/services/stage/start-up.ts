/* What operations owe every change before start-up: the safety review, and people who know of it. */
import { type DueKind } from '@domain/case';
import { addDays } from '@domain/dates';
import { addDue } from '@data/due';
import { newId } from '@data/ids';
import { seatsInRole } from '../notify';
import { type StageWrite } from './types';

const ITEMS: readonly { kind: DueKind; text: string }[] = [
  { kind: 'pssr', text: 'Pre-startup safety review (PSSR) held in the field, its points closed' },
  { kind: 'training', text: 'Everyone on shift informed of the change and trained where it asks for it' },
];

const DAYS = 14;

/**
 * Makes the safety review and the training as due items of operations that hold start-up. One that is still open is
 * kept; after a return from the field what was done before counts no more, and is owed anew.
 */
export async function makeStartUpReview(write: StageWrite): Promise<void> {
  const owner = seatsInRole(write.file, 'operations')[0]?.personId;
  if (owner === undefined) return;
  const { starts } = write.file.row.brief;
  for (const { kind, text } of ITEMS) {
    const open = write.file.due.some(
      (item) => item.kind === kind && item.caseId === write.file.row.id && item.state === 'open',
    );
    if (open) continue;
    await addDue(write.trx, {
      id: newId('due'),
      siteId: write.file.site.id,
      kind,
      caseId: write.file.row.id,
      text,
      ownerId: owner,
      due: starts !== undefined && starts > write.today ? starts : addDays(write.today, DAYS),
      bars: 'start-up',
      closes: 'field',
      state: 'open',
      askedBy: write.actor.person.id,
      askedAt: write.at,
    });
  }
}
