/* Gathers what the gates read from the records of a case. */
import { type GateFacts, type DocumentFacts, type Role } from '@domain/case';
import { type Evaluation } from '@domain/evaluate';
import { RULEBOOK } from '@domain/rulebook';
import { type SiteRules } from '@domain/rules';
import { openCasesOf } from '@data/cases';
import { type Db } from '@data/connection';
import { peopleOfSite } from '@data/people';
import { type CaseDocumentFile, type CaseFile, domainCase } from './case-file';
import { discrepanciesAsDomain, entriesAsDomain, linesAsDomain } from './field-records';
import { dueAsDomain, findingAsDomain } from './case-records';
import { validSignatures } from './signed';
import { staleFigures } from './stale';
import { unseenEntries } from './unseen-records';

const RULE_GATES = Object.fromEntries(RULEBOOK.map((rule) => [rule.code, rule.gate]));

function conduct(rules: SiteRules, key: string, otherwise: number): number {
  const value = rules.conduct[key] ?? rules.judgement.parameters[key];
  return typeof value === 'number' ? value : otherwise;
}

/** How many approvers must sign: the rule of the site, one more where a case holds several systems and the site says so. */
export function approversNeeded(file: Pick<CaseFile, 'rules' | 'documents'>): number {
  const single = conduct(file.rules, 'approvers', 1);
  const several = conduct(file.rules, 'approversSeveralSystems', single);
  return file.documents.length > 1 ? Math.max(single, several) : single;
}

async function pendingCases(db: Db, file: CaseFile): Promise<Map<string, string>> {
  const open = await openCasesOf(
    db,
    file.documents.map((one) => one.document.id),
  );
  const pending = open.filter((one) => one.caseId !== file.row.id && one.stage === 'field');
  return new Map(pending.map((one) => [one.documentId, one.number]));
}

function movedFigures(
  before: Evaluation | undefined,
  after: Evaluation | undefined,
): { path: string; sentence: string }[] {
  if (!before || !after) return [];
  const paths = Object.keys(after.figures).filter(
    (path) => path.endsWith('#verdict') || path.includes('#A_required') || path.includes('#P1'),
  );
  return paths.flatMap((path) => {
    const was = before.figures[path];
    const now = after.figures[path];
    if (was === undefined || now === undefined || same(was, now)) return [];
    return [{ path, sentence: 'A correction may not move a result, limit or verdict, and this one does.' }];
  });
}

type Figure = Evaluation['figures'][string];

function same(a: Figure, b: Figure): boolean {
  if (typeof a === 'string' || typeof b === 'string') return a === b;
  return a.unit === b.unit && Math.abs(a.value - b.value) <= Math.abs(b.value) * 0.001;
}

function documentFacts(
  file: CaseFile,
  one: CaseDocumentFile,
  pending: ReadonlyMap<string, string>,
): DocumentFacts {
  const pendingCase = pending.get(one.document.id);
  return {
    document: one.document.id,
    tag: one.document.tag,
    state: one.row.state,
    base: one.row.baseId ?? '',
    ...(one.document.inForceId ? { inForce: one.document.inForceId } : {}),
    ...(pendingCase !== undefined ? { pendingCase } : {}),
    ...(one.after ? { doc: one.after.body, evaluation: one.after.evaluation } : {}),
    ...(one.before ? { baseDoc: one.before.body, baseEvaluation: one.before.evaluation } : {}),
    outcomes: one.after?.outcomes ?? [],
    stale: one.after ? staleFigures(one.after, file.row.brief) : [],
    ...(file.row.class === 'correction'
      ? { moved: movedFigures(one.before?.evaluation, one.after?.evaluation) }
      : {}),
  };
}

function authorsOf(file: CaseFile): { person: string; document: string; sheet: string }[] {
  return file.documents.flatMap((one) =>
    (one.after?.body.externalSheets ?? []).flatMap((sheet) =>
      sheet.person ? [{ person: sheet.person, document: one.document.id, sheet: sheet.id }] : [],
    ),
  );
}

/** Who saw which results of this case, and who was let in by a reveal. */
export function seenOf(file: CaseFile): Pick<GateFacts, 'views' | 'reveals'> {
  const told = (one: { documentId: string; personId: string; at: string }) => ({
    document: one.documentId,
    person: one.personId,
    at: one.at,
  });
  return { views: file.looks.map(told), reveals: file.reveals.map(told) };
}

/** Everything the gates of a case read, as of a day; `hidden` is whether the reader's view of this case is hidden. */
export async function gateFacts(db: Db, file: CaseFile, today: string, hidden: boolean): Promise<GateFacts> {
  const pending = await pendingCases(db, file);
  const people = await peopleOfSite(db, file.site.id);
  const roles: Record<string, readonly Role[]> = Object.fromEntries(
    people.map((person) => [person.id, person.retiredAt ? [] : person.roles]),
  );
  const documents = [...file.documents.map((one) => one.document), ...file.affectedDocuments];
  return {
    today,
    case: domainCase(file),
    names: Object.fromEntries([
      ...people.map((one) => [one.id, one.name]),
      ...documents.map((one) => [one.id, one.tag]),
    ]),
    roles,
    rules: {
      approvers: approversNeeded(file),
      affectedAnswerAge: conduct(file.rules, 'affectedAnswerAge', 90),
      temporaryMax: conduct(file.rules, 'temporaryMax', 90),
      extensionsMax: conduct(file.rules, 'extensionsMax', 1),
      approvalAge: conduct(file.rules, 'approvalAge', 12),
      shortfallMax: conduct(file.rules, 'shortfallMax', 90),
      reasonLength: conduct(file.rules, 'reasonLength', 40),
    },
    ruleGates: RULE_GATES,
    documents: file.documents.map((one) => documentFacts(file, one, pending)),
    signatures: validSignatures(file),
    agreements: file.agreements.map((one) => ({
      case: one.caseId,
      document: one.documentId,
      sheet: one.sheetKey,
      hash: one.sheetHash,
      by: one.personId,
      at: one.at,
    })),
    unseen: unseenEntries(file),
    findings: file.findings.map(findingAsDomain),
    dueItems: file.due.map(dueAsDomain),
    field: {
      lines: linesAsDomain(file.lines),
      entries: entriesAsDomain(file.entries),
      discrepancies: discrepanciesAsDomain(file.discrepancies),
    },
    barometer: file.site.barometer,
    authors: authorsOf(file),
    ...seenOf(file),
    hidden,
  };
}
