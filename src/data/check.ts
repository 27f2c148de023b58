/* The unseen check: entries, reveals, comparisons, first looks; and agreements of sheets. */
import { type Id, type Instant } from '@domain/case';
import { type Db } from './connection';
import { newId } from './ids';
import { findAll, findIn, fromColumns, insert, insertMany, type New, toColumns } from './mapping';
import {
  type AgreementRow,
  AGREEMENTS,
  type ComparisonRow,
  COMPARISONS,
  type ReconciliationRow,
  RECONCILIATIONS,
  type RevealRow,
  REVEALS,
  UNSEEN,
  type UnseenRow,
  type ViewRow,
  VIEWS,
} from './tables/check';

export type { AgreementRow, ComparisonRow, ReconciliationRow, RevealRow, UnseenRow, ViewRow } from './tables/check';

/** An entry with what it was compared with and how a difference was reconciled. */
export type UnseenWithFate = UnseenRow & { comparison: ComparisonRow | null; reconciliations: ReconciliationRow[] };

/** Adds the checker's entries. */
export function addUnseen(trx: Db, rows: readonly New<UnseenRow>[]): Promise<void> {
  return insertMany(trx, UNSEEN, rows);
}

/** The entries of a case, oldest first, with what became of them. */
export async function unseenOf(db: Db, caseId: Id): Promise<UnseenWithFate[]> {
  const entries = await findAll(db, UNSEEN, { caseId });
  const ids = entries.map((entry) => entry.id);
  const comparisons = await findIn(db, COMPARISONS, 'entryId', ids);
  const reconciliations = await findIn(db, RECONCILIATIONS, 'entryId', ids);
  return entries.map((entry) => ({
    ...entry,
    comparison: comparisons.find((row) => row.entryId === entry.id) ?? null,
    reconciliations: reconciliations.filter((row) => row.entryId === entry.id),
  }));
}

/** Records a reveal with the comparison of every entry that it brought to light. */
export async function addReveal(
  trx: Db,
  reveal: New<RevealRow>,
  comparisons: readonly Omit<New<ComparisonRow>, 'revealId' | 'at'>[],
): Promise<void> {
  await insert(trx, REVEALS, reveal);
  const rows = comparisons.map((row) => ({ ...row, revealId: reveal.id, at: reveal.at }));
  await insertMany(trx, COMPARISONS, rows);
}

/** The reveals of a case, oldest first. */
export function revealsOf(db: Db, caseId: Id): Promise<RevealRow[]> {
  return findAll(db, REVEALS, { caseId });
}

/** Records how a difference was reconciled. */
export function addReconciliation(trx: Db, row: Omit<New<ReconciliationRow>, 'id'>): Promise<void> {
  return insert(trx, RECONCILIATIONS, { id: newId('reconciliation'), ...row });
}

/** Notes that someone looked at results; only the first look of its kind is kept. */
export async function noteView(db: Db, view: Omit<New<ViewRow>, 'id'>): Promise<void> {
  const columns = toColumns(VIEWS, { id: newId('view'), ...view });
  await db(VIEWS.name).insert(columns).onConflict().ignore();
}

/** What a person first looked at of the given documents, and when. */
export async function viewsOf(db: Db, personId: Id, documentIds: readonly Id[]): Promise<ViewRow[]> {
  const rows = (await db(VIEWS.name)
    .where({ person_id: personId })
    .whereIn('document_id', documentIds)
    .orderBy('at')) as Record<string, unknown>[];
  return rows.map((row) => fromColumns(VIEWS, row));
}

/** Adds an agreement of a sheet. */
export async function addAgreement(trx: Db, row: Omit<New<AgreementRow>, 'id' | 'undoesId'>): Promise<Id> {
  const id = newId('agreement');
  await insert(trx, AGREEMENTS, { id, ...row });
  return id;
}

/** Undoes an agreement with a row of its own. */
export async function undoAgreement(trx: Db, agreement: AgreementRow, personId: Id, at: Instant): Promise<void> {
  const { caseId, documentId, sheetKey, sheetHash, id } = agreement;
  const row = { id: newId('agreement'), caseId, documentId, sheetKey, sheetHash, personId, at, undoesId: id };
  await insert(trx, AGREEMENTS, row);
}

/** The agreements of a case that no one undid, oldest first; whether a hash still stands is the domain's question. */
export async function agreementsOf(db: Db, caseId: Id): Promise<AgreementRow[]> {
  const rows = await findAll(db, AGREEMENTS, { caseId });
  const undone = new Set(rows.map((row) => row.undoesId));
  return rows.filter((row) => row.undoesId === null && !undone.has(row.id));
}

/** Every agreement and undoing of a case, oldest first, for the record. */
export function agreementRecord(db: Db, caseId: Id): Promise<AgreementRow[]> {
  return findAll(db, AGREEMENTS, { caseId });
}
