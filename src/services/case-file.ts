/* Reads everything that is known of one case, once, for an act or a page. */
import { type Case, type On, onCase, type Seat, type Signature } from '@domain/case';
import { type SiteRules } from '@domain/rules';
import {
  affectedOf,
  type AffectedRow,
  caseDocuments,
  type CaseDocumentRow,
  type CaseRow,
  findCaseByNumber,
  seatsOf,
  type SeatRow,
} from '@data/cases';
import {
  agreementsOf,
  type AgreementRow,
  revealsOf,
  type ViewRow,
  viewsOf,
  type RevealRow,
  unseenOf,
  type UnseenWithFate,
} from '@data/check';
import { type Db } from '@data/connection';
import { type DocumentRow, findDocuments } from '@data/documents';
import { type DueRow, listDue } from '@data/due';
import {
  type DiscrepancyRow,
  discrepanciesOf,
  entriesOf,
  type FieldEntryRow,
  type FieldLineRow,
  linesOf,
} from '@data/field';
import { findingsOf, type FindingWithPosts } from '@data/findings';
import { findPeople, type Person } from '@data/people';
import { findRevision, type RevisionRow } from '@data/revisions';
import { signaturesOfCase, type SignatureWithVoids } from '@data/signatures';
import { rulesInEffect, type SiteRulesRow } from '@data/site';
import { type SiteRow } from '@data/tables/people';
import { type Evaluated, evaluateRevision } from './evaluate-document';

/** A document of a case: where it started, where it is going, what is in force now. */
export type CaseDocumentFile = {
  row: CaseDocumentRow;
  document: DocumentRow;
  base: RevisionRow | undefined;
  working: RevisionRow | undefined;
  inForce: RevisionRow | undefined;
  before: Evaluated | undefined;
  after: Evaluated | undefined;
};

export type CaseFile = {
  site: SiteRow;
  row: CaseRow;
  rules: SiteRules;
  rulesRow: SiteRulesRow;
  seats: SeatRow[];
  documents: CaseDocumentFile[];
  affected: AffectedRow[];
  affectedDocuments: DocumentRow[];
  signatures: SignatureWithVoids[];
  agreements: AgreementRow[];
  unseen: UnseenWithFate[];
  reveals: RevealRow[];
  /** When the checkers of the case were first shown results of its documents. */
  looks: ViewRow[];
  findings: FindingWithPosts[];
  due: DueRow[];
  lines: FieldLineRow[];
  entries: FieldEntryRow[];
  discrepancies: DiscrepancyRow[];
  people: ReadonlyMap<string, Person>;
};

/** The site rules in effect with their body typed. A site always has one set in effect: its making writes the first. */
export async function rulesOf(db: Db, siteId: string): Promise<{ row: SiteRulesRow; rules: SiteRules }> {
  const row = await rulesInEffect(db, siteId);
  if (!row) throw new Error(`site ${siteId} has no rules in effect`);
  return { row, rules: row.body as SiteRules };
}

async function documentFile(
  db: Db,
  row: CaseDocumentRow,
  document: DocumentRow,
  rules: SiteRules,
): Promise<CaseDocumentFile> {
  const find = async (id: string | null) => (id === null ? undefined : findRevision(db, id));
  const [base, working, inForce] = await Promise.all([
    find(row.baseId),
    find(row.workingId),
    find(document.inForceId),
  ]);
  const before = base && (await evaluateRevision(db, base, rules));
  const after = working && (await evaluateRevision(db, working, rules, base));
  return { row, document, base, working, inForce, before, after };
}

function personsIn(
  row: CaseRow,
  seats: readonly SeatRow[],
  findings: readonly FindingWithPosts[],
  due: readonly DueRow[],
): string[] {
  const ids = [
    row.raisedBy,
    ...seats.map((seat) => seat.personId),
    ...due.flatMap((item) => [item.ownerId, item.askedBy]),
  ];
  return [
    ...new Set([
      ...ids,
      ...findings.flatMap((finding) => [finding.raisedBy, ...finding.posts.map((post) => post.byId)]),
    ]),
  ];
}

/** Due items of the case, and the deficiencies of its systems, whichever case they came with. */
async function dueOf(db: Db, caseId: string, documents: readonly string[]): Promise<DueRow[]> {
  const own = await listDue(db, { caseId });
  const others = await Promise.all(documents.map((documentId) => listDue(db, { documentId })));
  const deficiencies = others.flat().filter((item) => item.kind === 'deficiency' && item.caseId !== caseId);
  return [...own, ...deficiencies];
}

/** Loads a case of a site by its number; undefined when the site has no such case. */
export async function loadCaseFile(db: Db, site: SiteRow, number: string): Promise<CaseFile | undefined> {
  const row = await findCaseByNumber(db, site.id, number);
  if (!row) return undefined;
  const { rules, row: rulesRow } = await rulesOf(db, site.id);
  const rows = await caseDocuments(db, row.id);
  const affected = await affectedOf(db, row.id);
  const known = await findDocuments(db, [
    ...rows.map((one) => one.documentId),
    ...affected.map((one) => one.documentId),
  ]);
  const documents: CaseDocumentFile[] = [];
  for (const one of rows) {
    const document = known.find((candidate) => candidate.id === one.documentId);
    if (document) documents.push(await documentFile(db, one, document, rules));
  }
  documents.sort((a, b) => Number(a.row.why === 'affected') - Number(b.row.why === 'affected'));
  const seats = await seatsOf(db, row.id);
  const findings = await findingsOf(db, row.id);
  const due = await dueOf(
    db,
    row.id,
    rows.map((one) => one.documentId),
  );
  const people = await findPeople(db, personsIn(row, seats, findings, due));
  return {
    site,
    row,
    rules,
    rulesRow,
    seats,
    documents,
    affected,
    affectedDocuments: known.filter((document) => affected.some((one) => one.documentId === document.id)),
    signatures: await signaturesOfCase(db, row.id),
    agreements: await agreementsOf(db, row.id),
    unseen: await unseenOf(db, row.id),
    reveals: await revealsOf(db, row.id),
    looks: await looksOf(
      db,
      row.id,
      seats,
      rows.map((one) => one.documentId),
    ),
    findings,
    due,
    lines: await linesOf(db, row.id),
    entries: await entriesOf(db, row.id),
    discrepancies: await discrepanciesOf(db, row.id),
    people: new Map(people.map((person) => [person.id, person])),
  };
}

async function looksOf(
  db: Db,
  caseId: string,
  seats: readonly SeatRow[],
  documents: readonly string[],
): Promise<ViewRow[]> {
  const checkers = seats.filter((seat) => seat.role === 'checker' && !seat.untilAt);
  const found = await Promise.all(checkers.map((seat) => viewsOf(db, seat.personId, documents)));
  return found.flat().filter((view) => view.caseId === caseId);
}

/** Seats as the domain reads them. */
export function domainSeats(seats: readonly SeatRow[]): Seat[] {
  return seats.map((seat) => ({
    id: seat.id,
    role: seat.role,
    person: seat.personId,
    ...(seat.part ? { part: seat.part } : {}),
    ...(seat.untilAt ? { until: seat.untilAt } : {}),
  }));
}

/** The record of a case as the domain reads it. */
export function domainCase(file: CaseFile): Case {
  const { row } = file;
  return {
    id: row.id,
    number: row.number,
    class: row.class,
    stage: row.stage,
    ...(row.heldFrom ? { heldFrom: row.heldFrom } : {}),
    brief: row.brief,
    raisedBy: row.raisedBy,
    raisedAt: row.raisedAt,
    version: row.version,
    rules: file.rulesRow.number,
    documents: file.documents.map(({ row: one }) => ({
      document: one.documentId,
      why: one.why,
      base: one.baseId ?? '',
      working: one.workingId ?? '',
      state: one.state,
      ...(one.actedAt ? { actedAt: one.actedAt } : {}),
    })),
    seats: domainSeats(file.seats),
    affected: file.affected.map((one) => ({
      document: one.documentId,
      why: one.why,
      hash: one.figuresHash,
      ...(one.answer ? { answer: one.answer } : {}),
      ...(one.reason !== null ? { reason: one.reason } : {}),
      ...(one.byId ? { by: one.byId } : {}),
      ...(one.at ? { at: one.at } : {}),
    })),
    ...(row.authorised ? { authorised: row.authorised } : {}),
    extensions: row.extensions,
  };
}

/** What `can` needs to know of the case. */
export function onFile(file: CaseFile): On {
  return onCase(domainCase(file));
}

/** A signature as the domain reads it. */
export function domainSignature(one: SignatureWithVoids): Signature {
  return {
    id: one.id,
    ...(one.caseId ? { case: one.caseId } : {}),
    ...(one.documentId ? { document: one.documentId } : {}),
    gate: one.gate,
    person: one.personId,
    name: one.name,
    role: one.role,
    meaning: one.meaning,
    at: one.at,
    zone: one.zone,
    page: one.pageHash,
    hash: one.contentHash,
    bound: one.bound,
    factor: one.factor,
    ...(one.forId ? { for: one.forId } : {}),
  };
}

/** The name of a person of the case, or their id where the record has none. */
export function nameIn(file: Pick<CaseFile, 'people'>, id: string): string {
  return file.people.get(id)?.name ?? id;
}
