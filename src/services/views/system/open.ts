/* Opens a system for a reader: the revision that is shown, what follows from it, and what is withheld from them. */
import { type Basis } from '@domain/basis';
import { type Evaluation } from '@domain/evaluate';
import { maskDocument, readingsOf } from '@domain/hidden';
import { type Outcome } from '@domain/rulebook';
import { type SiteRules } from '@domain/rules';
import { fail, ok, type Result } from '@domain/result';
import { findCases, openCasesOf } from '@data/cases';
import { noteView } from '@data/check';
import { type DocumentRow, findByFormerTag, findDocumentByTag, listDocuments } from '@data/documents';
import { findRevisionByNumber, type RevisionRow, revisionsOf } from '@data/revisions';
import { listUnits } from '@data/site';
import { rulesOf } from '../../case-file';
import { type Actor, type Ctx, instant } from '../../context';
import { evaluateRevision } from '../../evaluate-document';
import { hiddenOf } from '../../hidden-view';

/** A revision as the reader may see it: of a hidden document the body is masked, and there is neither an evaluation nor an outcome. */
export type Seen = { revision: RevisionRow; body: Basis; evaluation?: Evaluation; outcomes: Outcome[] };

export type OpenedSystem = {
  ctx: Ctx;
  actor: Actor;
  document: DocumentRow;
  rules: SiteRules;
  revisions: RevisionRow[];
  unit: { tag: string; name: string };
  hidden: boolean;
  /** The revision that the page shows; absent before the first issue, and where its body was never held. */
  shown?: Seen;
  shownRevision?: RevisionRow;
  approved?: Seen;
  cases: { number: string; stage: string; title: string; id: string }[];
  /** Numbers of the cases that made the revisions, by their ids. */
  caseNumbers: ReadonlyMap<string, string>;
  /** Tags of documents of the site, by id: headers, neighbours. */
  tags: ReadonlyMap<string, { tag: string; kind: string }>;
};

/** What a revision shows the reader. */
export async function seenOf(
  of: { ctx: Ctx; rules: SiteRules; hidden: boolean },
  revision: RevisionRow,
  prior?: RevisionRow,
): Promise<Seen | undefined> {
  const worked = await evaluateRevision(of.ctx.db, revision, of.rules, prior);
  if (!worked) return undefined;
  const { body, evaluation, outcomes } = worked;
  if (!of.hidden) return { revision, body, evaluation, outcomes };
  // Which rule speaks, and on what, would tell the result as well as its figures do.
  return { revision, body: maskDocument(body, readingsOf(body)), outcomes: [] };
}

async function find(ctx: Ctx, actor: Actor, tag: string): Promise<Result<DocumentRow>> {
  const document = await findDocumentByTag(ctx.db, actor.site.id, 'system', tag);
  if (document) return ok(document);
  const renamed = await findByFormerTag(ctx.db, actor.site.id, 'system', tag);
  if (renamed) return fail('UNKNOWN', `${tag} is called ${renamed.tag} now.`, { present: renamed.tag });
  return fail('UNKNOWN', `This site has no system ${tag.slice(0, 60)}.`);
}

async function pick(
  ctx: Ctx,
  document: DocumentRow,
  number: number | undefined,
): Promise<Result<RevisionRow | undefined>> {
  if (number === undefined) {
    const revisions = await revisionsOf(ctx.db, document.id, 'in-force');
    return ok(revisions[0]);
  }
  const found = await findRevisionByNumber(ctx.db, document.id, number);
  return found ? ok(found) : fail('UNKNOWN', `${document.tag} has no revision ${String(number)}.`);
}

/** Who has looked at a waiting change cannot be nominated as its checker afterwards. */
async function noteLook(ctx: Ctx, actor: Actor, revision: RevisionRow): Promise<void> {
  if (!actor.roles.includes('checker') || revision.caseId === null) return;
  const { documentId, caseId } = revision;
  await noteView(ctx.db, { personId: actor.person.id, caseId, documentId, what: 'system', at: instant(ctx) });
}

/** Tags by document id, of everything that a basis of this site may point at. */
async function tagsOf(ctx: Ctx, siteId: string): Promise<OpenedSystem['tags']> {
  const documents = await listDocuments(ctx.db, siteId);
  return new Map(documents.map((one) => [one.id, { tag: one.tag, kind: one.kind }]));
}

/** Opens a system by its tag, at its revision in force or at a numbered one. UNKNOWN for a tag or number that is not there. */
export async function openSystem(
  ctx: Ctx,
  actor: Actor,
  tag: string,
  revision?: number,
): Promise<Result<OpenedSystem>> {
  const found = await find(ctx, actor, tag);
  if (!found.ok) return found;
  const document = found.value;
  const picked = await pick(ctx, document, revision);
  if (!picked.ok) return picked;
  const hidden = (await hiddenOf(ctx, actor)).documents.has(document.id);
  const { rules } = await rulesOf(ctx.db, actor.site.id);
  const revisions = await revisionsOf(ctx.db, document.id);
  const of = { ctx, rules, hidden };
  const waiting = revisions.find((one) => one.state === 'approved');
  const inForce = revisions.find((one) => one.state === 'in-force');
  const approved = waiting && (await seenOf(of, waiting, inForce));
  const shown = picked.value && (await seenOf(of, picked.value));
  if (waiting && !hidden) await noteLook(ctx, actor, waiting);
  const units = await listUnits(ctx.db, actor.site.id);
  const unit = units.find((one) => one.id === document.unitId);
  const open = await openCasesOf(ctx.db, [document.id]);
  const made = await findCases(ctx.db, [...new Set(revisions.flatMap((one) => one.caseId ?? []))]);
  return ok({
    ...{ ctx, actor, document, rules, revisions, hidden },
    unit: { tag: unit?.tag ?? '', name: unit?.name ?? '' },
    ...(shown ? { shown } : {}),
    ...(picked.value ? { shownRevision: picked.value } : {}),
    ...(approved ? { approved } : {}),
    cases: open.map((one) => ({ number: one.number, stage: one.stage, title: one.title, id: one.caseId })),
    caseNumbers: new Map(made.map((one) => [one.id, one.number])),
    tags: await tagsOf(ctx, actor.site.id),
  });
}
