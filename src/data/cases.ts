/* Cases with their documents, seats and affected systems. */
import { type Id, type Instant, type SeatRole, type Stage } from '@domain/case';
import { type Db } from './connection';
import { newId } from './ids';
import { findAll, findIn, findOne, fromColumns, insert, type New, toColumns, updateVersioned, updateWhere } from './mapping';
import {
  AFFECTED,
  type AffectedRow,
  CASE_DOCUMENTS,
  type CaseDocumentRow,
  type CaseRow,
  CASES,
  type QuestionRow,
  QUESTIONS,
  type SeatRow,
  SEATS,
} from './tables/cases';

export type { AffectedRow, Authorised, CaseDocumentRow, CaseRow, QuestionRow, SeatRow } from './tables/cases';

/** Counts a counter of a site up and gives its new value; the first is 1. */
export async function nextCount(trx: Db, siteId: Id, name: string): Promise<number> {
  const [row] = await trx('counters')
    .insert({ site_id: siteId, name, last: 1 })
    .onConflict(['site_id', 'name'])
    .merge({ last: trx.raw('counters.last + 1') })
    .returning('last');
  return Number((row as { last: number }).last);
}

/** The next case number of a site and year, e.g. `KW-2026-003`. */
export async function nextCaseNumber(trx: Db, siteId: Id, letters: string, year: number): Promise<string> {
  const count = await nextCount(trx, siteId, `case-${year}`);
  return `${letters}-${year}-${String(count).padStart(3, '0')}`;
}

/** Makes sure that the counter of a year stands at least at `last`; for seeds that bring numbers with them. */
export async function raiseCaseCounter(trx: Db, siteId: Id, year: number, last: number): Promise<void> {
  await trx('counters')
    .insert({ site_id: siteId, name: `case-${year}`, last })
    .onConflict(['site_id', 'name'])
    .merge({ last: trx.raw('max(counters.last, excluded.last)') });
}

/** Adds a case. */
export function createCase(trx: Db, row: New<CaseRow>): Promise<void> {
  return insert(trx, CASES, row);
}

/** A case by its id. */
export function findCase(db: Db, id: Id): Promise<CaseRow | undefined> {
  return findOne(db, CASES, { id });
}

/** A case by its number at a site. */
export function findCaseByNumber(db: Db, siteId: Id, number: string): Promise<CaseRow | undefined> {
  return findOne(db, CASES, { siteId, number });
}

/** Cases by their ids. */
export function findCases(db: Db, ids: readonly Id[]): Promise<CaseRow[]> {
  return findIn(db, CASES, 'id', ids);
}

/** Changes a case at the version that was read; false when another write came first. */
export function updateCase(trx: Db, id: Id, version: number, patch: Partial<CaseRow>): Promise<boolean> {
  return updateVersioned(trx, CASES, id, version, patch);
}

/** Cases of a site, newest number first; of some stages when they are given. */
export async function listCases(db: Db, siteId: Id, stages?: readonly Stage[]): Promise<CaseRow[]> {
  const query = db(CASES.name).where({ site_id: siteId });
  if (stages) void query.whereIn('stage', stages);
  const rows = (await query.orderBy('number', 'desc')) as Record<string, unknown>[];
  return rows.map((row) => fromColumns(CASES, row));
}

/** Cases of a site in which a person holds an open seat, newest number first. */
export async function casesOfPerson(db: Db, siteId: Id, personId: Id, role?: SeatRole): Promise<CaseRow[]> {
  const seats = db(SEATS.name).select('case_id').where({ person_id: personId }).whereNull('until_at');
  if (role) void seats.where({ role });
  const rows = (await db(CASES.name)
    .where({ site_id: siteId })
    .whereIn('id', seats)
    .orderBy('number', 'desc')) as Record<string, unknown>[];
  return rows.map((row) => fromColumns(CASES, row));
}

/** Puts a document into a case, or changes what the case says of it. */
export async function putCaseDocument(trx: Db, row: New<CaseDocumentRow>): Promise<void> {
  const columns = toColumns(CASE_DOCUMENTS, row);
  await trx(CASE_DOCUMENTS.name).insert(columns).onConflict(['case_id', 'document_id']).merge();
}

/** The documents of a case. */
export function caseDocuments(db: Db, caseId: Id): Promise<CaseDocumentRow[]> {
  return findAll(db, CASE_DOCUMENTS, { caseId }, 'documentId');
}

/** The cases that hold a document, with what each says of it. */
export function casesOfDocument(db: Db, documentId: Id): Promise<CaseDocumentRow[]> {
  return findAll(db, CASE_DOCUMENTS, { documentId }, 'caseId');
}

/** The open cases that hold one of the documents: their stage and number, for registers and conflicts. */
export async function openCasesOf(
  db: Db,
  documentIds: readonly Id[],
): Promise<{ documentId: Id; caseId: Id; number: string; stage: Stage; title: string }[]> {
  const rows = (await db('case_documents as d')
    .join('cases as c', 'c.id', 'd.case_id')
    .whereIn('d.document_id', documentIds)
    .whereIn('d.state', ['open', 'approved'])
    .whereNotIn('c.stage', ['withdrawn', 'refused', 'removed', 'in-force'])
    .select('d.document_id', 'd.case_id', 'c.number', 'c.stage', 'c.title')
    .orderBy('c.number')) as Record<string, unknown>[];
  return rows.map((row) => fromColumns({ name: '', json: new Set(), flags: new Set() }, row));
}

/** Gives someone a seat. */
export async function takeSeat(trx: Db, seat: Omit<New<SeatRow>, 'id'>): Promise<Id> {
  const id = newId('seat');
  await insert(trx, SEATS, { id, ...seat });
  return id;
}

/** Ends a seat; it stays in the record. */
export async function endSeat(trx: Db, id: Id, at: Instant): Promise<void> {
  await updateWhere(trx, SEATS, { id }, { untilAt: at });
}

/** The seats of a case, ended ones too. */
export function seatsOf(db: Db, caseId: Id): Promise<SeatRow[]> {
  return findAll(db, SEATS, { caseId });
}

/** The open seats of many cases. */
export async function openSeatsOf(db: Db, caseIds: readonly Id[]): Promise<SeatRow[]> {
  return (await findIn(db, SEATS, 'caseId', caseIds)).filter((seat) => seat.untilAt === null);
}

/** The systems that a case reaches, with the answers given. */
export function affectedOf(db: Db, caseId: Id): Promise<AffectedRow[]> {
  return findAll(db, AFFECTED, { caseId });
}

/** Notes a system that a case reaches, or that its reason moved (the answer then falls). */
export async function putAffected(trx: Db, row: Omit<New<AffectedRow>, 'id'>): Promise<void> {
  const before = await findOne(trx, AFFECTED, { caseId: row.caseId, documentId: row.documentId });
  if (!before) return insert(trx, AFFECTED, { id: newId('affected'), ...row });
  await updateVersioned(trx, AFFECTED, before.id, before.version, row as Partial<AffectedRow>);
}

/** Answers for a system that a case reaches; false at another version. */
export function answerAffected(
  trx: Db,
  id: Id,
  version: number,
  answer: Pick<AffectedRow, 'answer' | 'reason' | 'byId' | 'at'>,
): Promise<boolean> {
  return updateVersioned(trx, AFFECTED, id, version, answer);
}

/** Keeps a relief question with its table of movements. */
export function keepQuestion(trx: Db, row: New<QuestionRow>): Promise<void> {
  return insert(trx, QUESTIONS, row);
}

/** A kept relief question. */
export function findQuestion(db: Db, id: Id): Promise<QuestionRow | undefined> {
  return findOne(db, QUESTIONS, { id });
}
