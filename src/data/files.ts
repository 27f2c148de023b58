/* Rows about files and what they are attached to; the bytes lie elsewhere under their hash. */
import { type Id, type Instant } from '@domain/case';
import { type Db } from './connection';
import { findAll, findOne, fromColumns, insert, type New, toColumns, updateWhere } from './mapping';
import { type AttachmentRow, ATTACHMENTS, type FileRow, FILES } from './tables/field';

export type { AttachmentRow, FileRow } from './tables/field';

/** Notes a file whose bytes were written; the same bytes again give the row that is there. */
export async function noteFile(trx: Db, row: New<FileRow>): Promise<FileRow | undefined> {
  await trx(FILES.name).insert(toColumns(FILES, row)).onConflict('sha256').ignore();
  return findOne(trx, FILES, { sha256: row.sha256 });
}

/** A file by its id. */
export function findFile(db: Db, id: Id): Promise<FileRow | undefined> {
  return findOne(db, FILES, { id });
}

/** Marks a file as referred to, or as swept. */
export async function markFile(trx: Db, id: Id, state: FileRow['state']): Promise<void> {
  await updateWhere(trx, FILES, { id }, { state });
}

/** Attaches a file to something and marks it as referred to. */
export async function attach(trx: Db, row: New<AttachmentRow>): Promise<void> {
  await insert(trx, ATTACHMENTS, row);
  await markFile(trx, row.fileId, 'referred');
}

/** What is attached to something, oldest first. */
export function attachmentsOf(db: Db, ofId: string): Promise<AttachmentRow[]> {
  return findAll(db, ATTACHMENTS, { ofId });
}

/** Files that no one refers to and that came before an instant: their bytes may go. */
export async function unreferredFiles(db: Db, before: Instant): Promise<FileRow[]> {
  const rows = (await db(FILES.name).where({ state: 'held' }).where('at', '<', before)) as Record<string, unknown>[];
  return rows.map((row) => fromColumns(FILES, row));
}
