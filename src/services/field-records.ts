/* Rows of the field sheet as the domain reads them. */
import { type Discrepancy, type FieldEntry, type FieldLine } from '@domain/field';
import { type DiscrepancyRow, type FieldEntryRow, type FieldLineRow } from '@data/field';

/** Lines with what was signed: for the domain only, never for a page before the line was seen. */
export function linesAsDomain(rows: readonly FieldLineRow[]): FieldLine[] {
  return rows.map((row) => ({
    key: row.key,
    document: row.documentId,
    order: row.ord,
    group: row.grouped,
    label: row.label,
    ...(row.wants !== null ? { wants: row.wants } : {}),
    photo: row.photo,
    holds: row.holds,
  }));
}

/** What was seen. */
export function entriesAsDomain(rows: readonly FieldEntryRow[]): FieldEntry[] {
  return rows.map((row) => ({
    id: row.id,
    case: row.caseId,
    line: row.line,
    as: row.asWhat,
    ...(row.installer !== null ? { installer: row.installer } : {}),
    ...(row.seen !== null ? { seen: row.seen } : {}),
    ...(row.text !== null ? { text: row.text } : {}),
    files: row.files,
    ...(row.scan !== null ? { scan: row.scan } : {}),
    by: row.byId,
    saw: row.saw,
    got: row.got,
    device: row.device,
    ...(row.shownAt ? { shownAt: row.shownAt } : {}),
    ...(row.cannot ? { cannot: row.cannot } : {}),
  }));
}

/** Differences between what was seen and what was signed. */
export function discrepanciesAsDomain(rows: readonly DiscrepancyRow[]): Discrepancy[] {
  return rows.map((row) => ({
    id: row.id,
    number: row.number,
    entry: row.entryId,
    holds: row.holds,
    state: row.state,
    owner: row.ownerId,
    clears: row.clears,
    ...(row.findingId ? { finding: row.findingId } : {}),
    posts: row.posts,
  }));
}
