/* The systems that a change reaches beyond its own: neighbours of its bases and members of the headers they discharge to. */
import { type ActBody, can } from '@domain/case';
import { hashOf } from '@domain/basis';
import { fail, ok, type Result } from '@domain/result';
import { answerAffected as answerRow, putAffected, putCaseDocument, updateCase } from '@data/cases';
import { type Db } from '@data/connection';
import { type DocumentRow, findDocument, findDocuments } from '@data/documents';
import { basisOf, headerOf } from '@data/revisions';
import { appendTrail } from '@data/trail';
import { loadCaseFile, onFile } from '../case-file';
import { type Actor, type Ctx, instant, whoOf } from '../context';
import { answeredBefore, inOneAct, stale, type Write } from '../one-act';

type Reasons = Map<string, string[]>;

function note(reasons: Reasons, document: string, why: string): void {
  const known = reasons.get(document) ?? [];
  if (!known.includes(why)) reasons.set(document, [...known, why]);
}

async function headerMembers(db: Db, headerId: string, of: DocumentRow, reasons: Reasons): Promise<void> {
  const header = await findDocument(db, headerId);
  const body = header?.inForceId ? await headerOf(db, header.inForceId) : undefined;
  for (const member of body?.members ?? []) {
    if (header && member.system !== of.id)
      note(reasons, member.system, `shares ${header.tag} with ${of.tag}`);
  }
}

async function reachOf(db: Db, systems: readonly DocumentRow[]): Promise<Reasons> {
  const reasons: Reasons = new Map();
  for (const one of systems) {
    const body = one.inForceId ? await basisOf(db, one.inForceId) : undefined;
    for (const neighbour of body?.neighbours ?? []) note(reasons, neighbour.with, neighbour.what);
    for (const pinned of body?.imports ?? []) await headerMembers(db, pinned.header, one, reasons);
  }
  systems.forEach((one) => reasons.delete(one.id));
  return reasons;
}

/** Notes every system that a case on these systems reaches; a system whose reasons moved must be answered anew. */
export async function noteAffected(
  trx: Db,
  siteId: string,
  caseId: string,
  systems: readonly DocumentRow[],
): Promise<void> {
  const reasons = await reachOf(trx, systems);
  const known = await findDocuments(trx, [...reasons.keys()]);
  for (const one of known) {
    if (one.kind !== 'system' || one.siteId !== siteId || one.retiredAt !== null) continue;
    const why = reasons.get(one.id) ?? [];
    await putAffected(trx, {
      caseId,
      documentId: one.id,
      why,
      figuresHash: hashOf('affected', { why, revision: one.inForceId }),
    });
  }
}

export type Answered = { number: string; version: number };

/** Answers for one affected system: included (it joins the case) or not affected, with a reason. */
export async function answerAffected(
  ctx: Ctx,
  actor: Actor,
  number: string,
  sent: Write<ActBody<'answer-affected'>>,
): Promise<Result<Answered>> {
  const before = sent.once.ok ? await answeredBefore<Answered>(ctx, actor, sent.once.value) : undefined;
  if (before) return before;
  const file = await loadCaseFile(ctx.db, actor.site, number);
  if (!file) return fail('UNKNOWN', `This site has no case ${number}.`);
  const may = can(whoOf(actor), 'answer-affected', onFile(file));
  if (!may.ok) return fail(may.code, may.sentence);
  if (!sent.body.ok) return sent.body;
  if (!sent.version.ok) return sent.version;
  if (!sent.once.ok) return sent.once;
  const body = sent.body.value;
  const row = file.affected.find((one) => one.documentId === body.document);
  const document = file.affectedDocuments.find((one) => one.id === body.document);
  if (!row || !document) return fail('UNKNOWN', 'This case does not reach that system.');
  if (file.row.version !== sent.version.value) return stale(`Case ${number}`, file.row.version);
  const at = instant(ctx);
  return inOneAct(ctx, actor, sent.once.value, async (trx) => {
    const answer = { answer: body.answer, reason: body.reason ?? null, byId: actor.person.id, at };
    if (!(await answerRow(trx, row.id, row.version, answer)))
      return stale(`The answer for ${document.tag}`, row.version + 1);
    if (body.answer === 'included' && !file.documents.some((one) => one.document.id === document.id)) {
      await putCaseDocument(trx, {
        caseId: file.row.id,
        documentId: document.id,
        why: 'affected',
        baseId: document.inForceId,
        workingId: null,
        state: 'open',
        actedAt: null,
      });
    }
    if (!(await updateCase(trx, file.row.id, file.row.version, {})))
      return stale(`Case ${number}`, file.row.version + 1);
    await appendTrail(trx, {
      siteId: file.site.id,
      at,
      act: 'affected.answered',
      byId: actor.person.id,
      seat: 'originator',
      caseId: file.row.id,
      subject: `cases/${number}`,
      body: {
        changes: [{ path: `affected/${document.tag}`, old: row.answer, new: body.answer }],
        ...(body.reason !== undefined ? { why: body.reason } : {}),
      },
      hides: false,
    });
    return ok({ number, version: file.row.version + 1 });
  });
}
