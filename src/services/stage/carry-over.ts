/* Carries a case over to a revision that was issued meanwhile: a three-way merge of the working revision. */
import { type Basis, hashOf } from '@domain/basis';
import { type Conflict, merge3 } from '@domain/difference';
import { putCaseDocument } from '@data/cases';
import { type Db } from '@data/connection';
import { basisOf, writeWorking } from '@data/revisions';
import { type CaseDocumentFile } from '../case-file';
import { documentOf } from './revisions';
import { type StageWrite } from './types';

/** The working revision merged onto what is in force now; undefined when the base has not moved or a body is missing. */
export async function mergeOnto(
  db: Db,
  one: CaseDocumentFile,
): Promise<{ merged: Basis; conflicts: Conflict[] } | undefined> {
  if (!one.working || !one.base || !one.inForce || one.inForce.id === one.base.id) return undefined;
  const [base, ours, theirs] = await Promise.all([
    basisOf(db, one.base.id),
    basisOf(db, one.working.id),
    basisOf(db, one.inForce.id),
  ]);
  return base && ours && theirs ? merge3(base, ours, theirs) : undefined;
}

/** Writes the merge: the case now starts from the revision in force. Where both sides changed the same figure, ours stays in the working revision. */
export async function carryOver(write: StageWrite): Promise<void> {
  const one = documentOf(write.file, write.body.document);
  const merge = one && (await mergeOnto(write.trx, one));
  if (!one?.working || !one.inForce || !merge) return;
  const { id, version } = one.working;
  const written = await writeWorking(write.trx, id, version, {
    body: merge.merged,
    documentHash: hashOf('document', merge.merged),
    importsHash: one.inForce.importsHash,
    baseId: one.inForce.id,
    evaluationKey: null,
  });
  if (!written) throw new Error(`working revision ${id} changed within its own act`);
  await putCaseDocument(write.trx, { ...one.row, baseId: one.inForce.id });
}
