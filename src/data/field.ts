/* Field sheets: lines, what was entered, discrepancies; and sightings of field conditions. */
import { type Id } from '@domain/case';
import { type Db } from './connection';
import { newId } from './ids';
import { findAll, findOne, insert, insertMany, type New, toColumns, updateVersioned } from './mapping';
import {
  DISCREPANCIES,
  type DiscrepancyRow,
  FIELD_ENTRIES,
  FIELD_LINES,
  type FieldEntryRow,
  type FieldLineRow,
  type SightingRow,
  SIGHTINGS,
} from './tables/field';

export type { DiscrepancyRow, FieldEntryRow, FieldLineRow, SightingRow } from './tables/field';

/** Makes the lines of a case's field sheet for a document anew. */
export async function replaceLines(
  trx: Db,
  caseId: Id,
  documentId: Id,
  lines: readonly Omit<New<FieldLineRow>, 'caseId' | 'documentId'>[],
): Promise<void> {
  await trx(FIELD_LINES.name).where({ case_id: caseId, document_id: documentId }).delete();
  const rows = lines.map((line) => ({ ...line, caseId, documentId }));
  await insertMany(trx, FIELD_LINES, rows);
}

/** The lines of a case's field sheet in order; of one document when it is given. */
export function linesOf(db: Db, caseId: Id, documentId?: Id): Promise<FieldLineRow[]> {
  return findAll(db, FIELD_LINES, documentId ? { caseId, documentId } : { caseId }, 'ord');
}

/**
 * Adds what someone entered; the same client id a second time adds nothing.
 * @returns the entry that stands, and whether it is new
 */
export async function addEntry(
  trx: Db,
  row: New<FieldEntryRow>,
): Promise<{ entry: FieldEntryRow | undefined; fresh: boolean }> {
  const before = await findOne(trx, FIELD_ENTRIES, { clientId: row.clientId });
  if (before) return { entry: before, fresh: false };
  await trx(FIELD_ENTRIES.name).insert(toColumns(FIELD_ENTRIES, row));
  return { entry: await findOne(trx, FIELD_ENTRIES, { id: row.id }), fresh: true };
}

/** All entries of a case, oldest first; of one document when it is given. */
export function entriesOf(db: Db, caseId: Id, documentId?: Id): Promise<FieldEntryRow[]> {
  return findAll(db, FIELD_ENTRIES, documentId ? { caseId, documentId } : { caseId });
}

/** Adds a discrepancy with the case's next number; gives the number. */
export async function addDiscrepancy(trx: Db, row: Omit<New<DiscrepancyRow>, 'number'>): Promise<number> {
  const top = (await trx(DISCREPANCIES.name).where({ case_id: row.caseId }).max('number as top').first()) as
    | { top: number | null }
    | undefined;
  const number = (top?.top ?? 0) + 1;
  await insert(trx, DISCREPANCIES, { ...row, number });
  return number;
}

/** Changes a discrepancy at the version that was read; false when another write came first. */
export function updateDiscrepancy(
  trx: Db,
  id: Id,
  version: number,
  patch: Partial<DiscrepancyRow>,
): Promise<boolean> {
  return updateVersioned(trx, DISCREPANCIES, id, version, patch);
}

/** A discrepancy of a case by its number. */
export function findDiscrepancy(db: Db, caseId: Id, number: number): Promise<DiscrepancyRow | undefined> {
  return findOne(db, DISCREPANCIES, { caseId, number });
}

/** The discrepancies of a case by number. */
export function discrepanciesOf(db: Db, caseId: Id): Promise<DiscrepancyRow[]> {
  return findAll(db, DISCREPANCIES, { caseId }, 'number');
}

/** Records that a field condition was seen. */
export function addSighting(trx: Db, row: Omit<New<SightingRow>, 'id'>): Promise<void> {
  return insert(trx, SIGHTINGS, { id: newId('sighting'), ...row });
}

/** When the field conditions of a document were seen, oldest first. */
export function sightingsOf(db: Db, documentId: Id): Promise<SightingRow[]> {
  return findAll(db, SIGHTINGS, { documentId }, 'at');
}
