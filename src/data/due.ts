/* Due items and what happened to them. */
import { type Day, type Id } from '@domain/case';
import { type Db } from './connection';
import { newId } from './ids';
import { findAll, findOne, fromColumns, insert, type New, updateVersioned } from './mapping';
import { DUE_EVENTS, DUE_ITEMS, type DueEventRow, type DueRow } from './tables/cases';

export type { DueEventRow, DueRow } from './tables/cases';

/** Adds a due item. */
export function addDue(trx: Db, row: New<DueRow>): Promise<void> {
  return insert(trx, DUE_ITEMS, row);
}

/** A due item by its id. */
export function findDue(db: Db, id: Id): Promise<DueRow | undefined> {
  return findOne(db, DUE_ITEMS, { id });
}

/** Changes a due item at the version that was read and notes what happened; false when another write came first. */
export async function moveDue(
  trx: Db,
  id: Id,
  version: number,
  patch: Partial<DueRow>,
  event: Omit<New<DueEventRow>, 'id' | 'dueId'>,
): Promise<boolean> {
  if (!(await updateVersioned(trx, DUE_ITEMS, id, version, patch))) return false;
  await insert(trx, DUE_EVENTS, { id: newId('dueEvent'), dueId: id, ...event });
  return true;
}

/** What happened to a due item, oldest first. */
export function dueEvents(db: Db, dueId: Id): Promise<DueEventRow[]> {
  return findAll(db, DUE_EVENTS, { dueId });
}

export type DueFilter = {
  siteId?: Id;
  ownerId?: Id;
  caseId?: Id;
  documentId?: Id;
  states?: readonly DueRow['state'][];
  /** Due on this day or earlier. */
  until?: Day;
};

/** Due items that match, the soonest first. */
export async function listDue(db: Db, filter: DueFilter): Promise<DueRow[]> {
  const query = db(DUE_ITEMS.name);
  if (filter.siteId) void query.where({ site_id: filter.siteId });
  if (filter.ownerId) void query.where({ owner_id: filter.ownerId });
  if (filter.caseId) void query.where({ case_id: filter.caseId });
  if (filter.documentId) void query.where({ document_id: filter.documentId });
  if (filter.states) void query.whereIn('state', filter.states);
  if (filter.until) void query.where('due', '<=', filter.until);
  const rows = (await query.orderBy('due').orderBy('id')) as Record<string, unknown>[];
  return rows.map((row) => fromColumns(DUE_ITEMS, row));
}
