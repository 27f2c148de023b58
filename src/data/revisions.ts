/* Revisions of documents: working, approved, in force, superseded or dropped; bodies apart from the rows. */
import { type Basis } from '@domain/basis';
import { type Hash, type Id, type Instant } from '@domain/case';
import { type Header } from '@domain/header';
import { cached, opened, pack } from './bodies';
import { type Db } from './connection';
import { findOne, fromColumns, insert, type New, toColumns, updateVersioned, updateWhere } from './mapping';
import { DOCUMENTS, type RevisionRow, REVISIONS, type RevisionState, type StoredRevision } from './tables/documents';

export type { RevisionRow, RevisionState } from './tables/documents';

/** Every column but the body. */
const COLUMNS = [
  ...['id', 'document_id', 'number', 'state', 'case_id', 'base_id', 'document_hash', 'imports_hash', 'rules_id'],
  ...['evaluation_key', 'approved_at', 'in_plant_from', 'known_from', 'superseded_at', 'held', 'note', 'version'],
];

type Columns = Record<string, unknown>;
const read = (row: Columns): RevisionRow => fromColumns<RevisionRow>(REVISIONS, row);

/** A new revision to insert; without a body it is only known by number and note (`held` false). */
export type NewRevision = Omit<New<StoredRevision>, 'held' | 'body'> & { body?: Basis | Header };

/** Adds a revision. In force (or superseded with a body) it needs a signature row first: of its case, or of gate `grade`. */
export async function insertRevision(trx: Db, { body, ...row }: NewRevision): Promise<void> {
  await insert(trx, REVISIONS, { ...row, body: body ? pack(body) : null, held: body !== undefined });
}

/** A revision by its id. */
export async function findRevision(db: Db, id: Id): Promise<RevisionRow | undefined> {
  const row = (await db(REVISIONS.name).select(COLUMNS).where({ id }).first()) as Columns | undefined;
  return row && read(row);
}

/** A document's revision by its number. */
export async function findRevisionByNumber(db: Db, documentId: Id, number: number): Promise<RevisionRow | undefined> {
  const where = { document_id: documentId, number };
  const row = (await db(REVISIONS.name).select(COLUMNS).where(where).first()) as Columns | undefined;
  return row && read(row);
}

/** The revision in force, if there is one. */
export async function revisionInForce(db: Db, documentId: Id): Promise<RevisionRow | undefined> {
  const where = { document_id: documentId, state: 'in-force' };
  const row = (await db(REVISIONS.name).select(COLUMNS).where(where).first()) as Columns | undefined;
  return row && read(row);
}

/** All revisions of a document, numbered ones first and newest first; of one state when it is given. */
export async function revisionsOf(db: Db, documentId: Id, state?: RevisionState): Promise<RevisionRow[]> {
  const query = db(REVISIONS.name).select(COLUMNS).where({ document_id: documentId });
  if (state) void query.where({ state });
  const rows = (await query.orderByRaw('number IS NULL, number DESC, id DESC')) as Columns[];
  return rows.map(read);
}

/** All revisions that a case made, in the order of birth. */
export async function revisionsOfCase(db: Db, caseId: Id): Promise<RevisionRow[]> {
  const rows = (await db(REVISIONS.name).select(COLUMNS).where({ case_id: caseId }).orderBy('id')) as Columns[];
  return rows.map(read);
}

/** The body of a revision, frozen; undefined when it was never held. */
export async function bodyOf(db: Db, id: Id): Promise<Basis | Header | undefined> {
  const row = (await db(REVISIONS.name).select('document_hash').where({ id }).first()) as
    | { document_hash: Hash | null }
    | undefined;
  if (!row?.document_hash) return undefined;
  const known = cached(row.document_hash);
  if (known !== undefined) return known as Basis | Header;
  const stored = await findOne(db, REVISIONS, { id });
  return stored?.body ? (opened(row.document_hash, stored.body) as Basis | Header) : undefined;
}

/** The body of a revision of a system. */
export async function basisOf(db: Db, id: Id): Promise<Basis | undefined> {
  return (await bodyOf(db, id)) as Basis | undefined;
}

/** The body of a revision of a header. */
export async function headerOf(db: Db, id: Id): Promise<Header | undefined> {
  return (await bodyOf(db, id)) as Header | undefined;
}

/** What may change with a working body. */
export type WorkingPatch = {
  body: Basis | Header;
  documentHash: Hash;
  importsHash?: Hash | null;
  rulesId?: Id | null;
  evaluationKey?: Hash | null;
  baseId?: Id | null;
};

/** Writes a working revision at the version that was read; false when another write came first. */
export function writeWorking(trx: Db, id: Id, version: number, { body, ...patch }: WorkingPatch): Promise<boolean> {
  return updateVersioned(trx, REVISIONS, id, version, { ...patch, body: pack(body) });
}

/** Moves a revision on to approved or dropped, or marks it as already in the plant; false at another version. */
export function markRevision(
  trx: Db,
  id: Id,
  version: number,
  patch: Partial<Pick<RevisionRow, 'state' | 'approvedAt' | 'inPlantFrom' | 'knownFrom' | 'note' | 'evaluationKey'>>,
): Promise<boolean> {
  return updateVersioned(trx, REVISIONS, id, version, patch);
}

/** Brings a revision into force with the document's next number; the former one is superseded. Gives the number. */
export async function issueRevision(
  trx: Db,
  revision: RevisionRow,
  when: { at: Instant; inPlantFrom: Instant },
): Promise<number> {
  const { id, documentId } = revision;
  const highest = (await trx(REVISIONS.name).where({ document_id: documentId }).max('number as top').first()) as
    | { top: number | null }
    | undefined;
  const number = (highest?.top ?? 0) + 1;
  await updateWhere(
    trx,
    REVISIONS,
    { documentId, state: 'in-force' },
    { state: 'superseded', supersededAt: when.at },
  );
  await trx(REVISIONS.name)
    .where({ id })
    .update({
      ...toColumns(REVISIONS, { state: 'in-force', number, knownFrom: when.at, inPlantFrom: when.inPlantFrom }),
      version: revision.version + 1,
    });
  await trx(DOCUMENTS.name).where({ id: documentId }).update({ in_force_id: id }).increment('version', 1);
  return number;
}

/** Which revision stood in the plant on `asOf`, as far as was known at `known`; undefined before the first. */
export async function revisionAsOf(
  db: Db,
  documentId: Id,
  asOf: Instant,
  known: Instant = asOf,
): Promise<RevisionRow | undefined> {
  const row = (await db(REVISIONS.name)
    .select(COLUMNS)
    .where({ document_id: documentId })
    .whereNotNull('number')
    .where('in_plant_from', '<=', asOf)
    .where('known_from', '<=', known)
    .orderBy('in_plant_from', 'desc')
    .orderBy('number', 'desc')
    .first()) as Columns | undefined;
  return row && read(row);
}
