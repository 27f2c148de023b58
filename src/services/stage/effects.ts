/* The effects that the machine of a case names, each one function that writes. */
import { voidSignature } from '@data/signatures';
import { type Stage } from '@domain/case';
import { carryOver } from './carry-over';
import { makeDueItemsAfterStartUp, makeRequirements, makeStartUpPapers, signDeficiencies } from './due';
import { makeStartUpReview } from './start-up';
import { makeFieldLines } from './field-lines';
import {
  approveRevisions,
  dropRevision,
  dropRevisions,
  issueRevision,
  issueRevisions,
  makeWorkingRevisions,
  reviveWorkingRevisions,
} from './revisions';
import { sign } from './sign';
import { type StageWrite } from './types';

/** Gates in the order in which a case passes them; a return to a stage voids the signatures of its gate and of every later one. */
const ORDER: readonly Stage[] = ['draft', 'scenarios', 'check', 'approval', 'field'];

async function voidSignatures(write: StageWrite): Promise<void> {
  const from = ORDER.indexOf(write.reached);
  const fallen = write.file.signatures.filter(
    (one) => one.voids.length === 0 && ORDER.indexOf(one.gate as Stage) >= from,
  );
  for (const one of fallen) {
    await voidSignature(write.trx, {
      signatureId: one.id,
      at: write.at,
      cause: write.body.reason ?? write.act,
    });
  }
}

async function startUpAndLines(write: StageWrite): Promise<void> {
  await makeStartUpPapers(write);
  await makeStartUpReview(write);
  await makeFieldLines(write);
}

/** Effects of acts that are offered here; the reason itself stands in the trail entry of the act. */
export const EFFECTS: Readonly<Record<string, ((write: StageWrite) => Promise<void>) | undefined>> = {
  sign,
  signGrade: sign,
  makeWorkingRevisions,
  signDeficiencies,
  makeRequirements,
  approveRevisions,
  makeFieldLines: startUpAndLines,
  issueRevision,
  issueRevisions,
  makeDueItemsAfterStartUp,
  dropRevision,
  dropRevisions,
  voidSignatures,
  reviveWorkingRevisions,
  carryOver,
};
