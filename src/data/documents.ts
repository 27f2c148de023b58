/* Documents (systems and headers) and the tags they had before. */
import { type Id } from '@domain/case';
import { type Db } from './connection';
import { newId } from './ids';
import { findAll, findIn, findOne, insert, type New, updateVersioned } from './mapping';
import { ALIASES, type DocumentKind, type DocumentRow, DOCUMENTS } from './tables/documents';

export type { DocumentKind, DocumentRow, Grade } from './tables/documents';

/** Adds a document. */
export function createDocument(db: Db, row: New<DocumentRow>): Promise<void> {
  return insert(db, DOCUMENTS, row);
}

/** A document by its id. */
export function findDocument(db: Db, id: Id): Promise<DocumentRow | undefined> {
  return findOne(db, DOCUMENTS, { id });
}

/** Documents by their ids. */
export function findDocuments(db: Db, ids: readonly Id[]): Promise<DocumentRow[]> {
  return findIn(db, DOCUMENTS, 'id', ids);
}

/** A document by its tag at a site. */
export function findDocumentByTag(
  db: Db,
  siteId: Id,
  kind: DocumentKind,
  tag: string,
): Promise<DocumentRow | undefined> {
  return findOne(db, DOCUMENTS, { siteId, kind, tag });
}

/** The document that had this tag before it was renamed, for redirects. */
export async function findByFormerTag(
  db: Db,
  siteId: Id,
  kind: DocumentKind,
  tag: string,
): Promise<DocumentRow | undefined> {
  const alias = await findOne(db, ALIASES, { siteId, kind, tag });
  return alias && findDocument(db, alias.documentId);
}

/** All documents of a kind at a site, by tag; retired ones too. */
export function listDocuments(db: Db, siteId: Id, kind?: DocumentKind): Promise<DocumentRow[]> {
  return findAll(db, DOCUMENTS, kind ? { siteId, kind } : { siteId }, 'tag');
}

/** Changes a document at the version that was read; false when another write came first. A new tag keeps the old as alias. */
export async function updateDocument(
  trx: Db,
  before: DocumentRow,
  patch: Partial<Omit<DocumentRow, 'id' | 'version'>>,
): Promise<boolean> {
  if (!(await updateVersioned(trx, DOCUMENTS, before.id, before.version, patch))) return false;
  if (patch.tag !== undefined && patch.tag !== before.tag) {
    const { siteId, kind, tag, id } = before;
    await trx(ALIASES.name).where({ site_id: siteId, kind }).whereIn('tag', [tag, patch.tag]).delete();
    await insert(trx, ALIASES, { id: newId('alias'), siteId, kind, tag, documentId: id });
  }
  return true;
}
