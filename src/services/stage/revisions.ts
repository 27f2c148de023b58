/* What an act does to the revisions of a case: working copies, approval, issue, drop, and back to working. */
import { hashOf } from '@domain/basis';
import { putCaseDocument } from '@data/cases';
import { newId } from '@data/ids';
import {
  bodyOf,
  insertRevision,
  issueRevision as issue,
  markRevision,
  type RevisionRow,
} from '@data/revisions';
import { keepEvaluation } from '@data/evaluations';
import { catalogHash } from '@domain/evaluate';
import { type CaseDocumentFile } from '../case-file';
import { judgementHashOf } from '../evaluate-document';
import { projectDocument } from '../projections';
import { type StageWrite } from './types';

function changed(write: StageWrite, what: string): Error {
  return new Error(`${what} of case ${write.file.row.number} changed within its own act`);
}

async function copyOf(write: StageWrite, from: RevisionRow, baseId: string): Promise<string> {
  const body = await bodyOf(write.trx, from.id);
  if (!body) throw new Error(`revision ${from.id} has no body to work on`);
  const id = newId('revision');
  await insertRevision(write.trx, {
    id,
    documentId: from.documentId,
    number: null,
    state: 'working',
    caseId: write.file.row.id,
    baseId,
    documentHash: from.documentHash ?? hashOf('document', body),
    importsHash: from.importsHash,
    rulesId: write.file.rulesRow.id,
    body,
  });
  return id;
}

/** Gives each document of the case a working revision, copied from what is in force now. */
export async function makeWorkingRevisions(write: StageWrite): Promise<void> {
  for (const one of write.file.documents) {
    const base = one.inForce ?? one.base;
    if (one.working || !base) continue;
    const workingId = await copyOf(write, base, base.id);
    await putCaseDocument(write.trx, { ...one.row, baseId: base.id, workingId });
  }
}

/** Keeps the evaluation that a signature binds, with its sheets. */
export async function keepBound(write: StageWrite, one: CaseDocumentFile): Promise<void> {
  const { after, working } = one;
  if (!after || !working?.documentHash) return;
  await keepEvaluation(
    write.trx,
    {
      key: after.evaluation.key,
      documentHash: working.documentHash,
      importsHash: hashOf('imports', after.imports),
      judgementHash: judgementHashOf(write.file.rules),
      catalogHash: catalogHash(),
      engine: after.evaluation.engine,
      figures: after.evaluation.figures,
      outcomes: after.outcomes,
      sheets: after.evaluation.sheets,
      at: write.at,
    },
    after.evaluation.methods,
  );
  if (working.evaluationKey === after.evaluation.key) return;
  if (
    working.state === 'working' &&
    !(await markRevision(write.trx, working.id, working.version, { evaluationKey: after.evaluation.key }))
  )
    throw changed(write, `The working revision ${working.id}`);
  working.evaluationKey = after.evaluation.key;
  if (working.state === 'working') working.version += 1;
}

/** Signed by all: the revisions are approved and wait for the field. */
export async function approveRevisions(write: StageWrite): Promise<void> {
  for (const one of write.file.documents) {
    if (one.working?.state !== 'working') continue;
    const { id, version } = one.working;
    if (!(await markRevision(write.trx, id, version, { state: 'approved', approvedAt: write.at })))
      throw changed(write, `Revision ${id}`);
    one.working.version += 1;
    await putCaseDocument(write.trx, { ...one.row, state: 'approved' });
    await projectDocument(write.trx, one.document.id, write.file.rules);
  }
}

/** The document that an act names by its tag; of a case with one document that one. */
export function documentOf(file: StageWrite['file'], tag: string | undefined): CaseDocumentFile | undefined {
  if (tag === undefined) return file.documents.length === 1 ? file.documents[0] : undefined;
  return file.documents.find((one) => one.document.tag === tag || one.document.id === tag);
}

async function issueOne(write: StageWrite, one: CaseDocumentFile): Promise<void> {
  if (!one.working) throw new Error(`system ${one.document.tag} has no revision to issue`);
  await issue(write.trx, one.working, { at: write.at, inPlantFrom: one.row.actedAt ?? write.at });
  await putCaseDocument(write.trx, { ...one.row, state: 'issued' });
  await projectDocument(write.trx, one.document.id, write.file.rules);
}

/** The named revision comes into force; the former one is superseded. */
export async function issueRevision(write: StageWrite): Promise<void> {
  const one = documentOf(write.file, write.body.document);
  if (one) await issueOne(write, one);
}

/** Nothing on the plant changes: every revision of the case comes into force with the last signature. */
export async function issueRevisions(write: StageWrite): Promise<void> {
  for (const one of write.file.documents) {
    if (one.row.state === 'open' || one.row.state === 'approved') await issueOne(write, one);
  }
}

async function dropOne(write: StageWrite, one: CaseDocumentFile): Promise<void> {
  if (one.working && one.working.state !== 'dropped') {
    if (!(await markRevision(write.trx, one.working.id, one.working.version, { state: 'dropped' })))
      throw changed(write, `Revision ${one.working.id}`);
  }
  await putCaseDocument(write.trx, { ...one.row, state: 'dropped' });
  await projectDocument(write.trx, one.document.id, write.file.rules);
}

/** The named revision is given up; others of the case are issued. */
export async function dropRevision(write: StageWrite): Promise<void> {
  const one = documentOf(write.file, write.body.document);
  if (one) await dropOne(write, one);
}

/** Every revision of the case that is not issued is given up. */
export async function dropRevisions(write: StageWrite): Promise<void> {
  for (const one of write.file.documents) if (one.row.state !== 'issued') await dropOne(write, one);
}

/** After a return from the field: signed revisions are dropped, and copies of them are worked on. */
export async function reviveWorkingRevisions(write: StageWrite): Promise<void> {
  for (const one of write.file.documents) {
    if (one.working?.state !== 'approved' || one.row.state !== 'approved') continue;
    const { working } = one;
    if (!(await markRevision(write.trx, working.id, working.version, { state: 'dropped' })))
      throw changed(write, `Revision ${working.id}`);
    const workingId = await copyOf(write, working, one.row.baseId ?? working.id);
    await putCaseDocument(write.trx, { ...one.row, state: 'open', workingId });
    await projectDocument(write.trx, one.document.id, write.file.rules);
  }
}
