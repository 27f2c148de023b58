/* Changes the working revision of a system in a case by small operations on paths. */
import { applyOps, hashOf, invertOps, opSchema, parseBasis, type Basis, type Op } from '@domain/basis';
import { can, type Case } from '@domain/case';
import { fail, ok, type Result } from '@domain/result';
import { z } from 'zod';
import { writeWorking } from '@data/revisions';
import { appendTrail } from '@data/trail';
import { type CaseDocumentFile, type CaseFile, loadCaseFile, onFile } from '../case-file';
import { type Actor, type Ctx, instant, whoOf } from '../context';
import { workBody } from '../evaluate-document';
import { inOneAct, stale, type Write } from '../one-act';
import { documentOf } from '../stage/revisions';

/** The body of a change of a document. */
export const opsSchema = z.strictObject({
  ops: z
    .array(opSchema, { error: 'Send the changes as a list of ops.' })
    .min(1, 'Send at least one change.')
    .max(500, 'At most 500 changes are taken at once.'),
});
export type OpsBody = z.infer<typeof opsSchema>;
export type DocumentSaved = { system: string; version: number; outcomes: number; undo: Op[] };

type Working = CaseDocumentFile & {
  working: NonNullable<CaseDocumentFile['working']>;
  after: NonNullable<CaseDocumentFile['after']>;
};

function workingOf(file: CaseFile, tag: string): Result<Working> {
  const one = documentOf(file, tag);
  if (!one) return fail('UNKNOWN', `Case ${file.row.number} does not hold ${tag.slice(0, 60)}.`);
  const { working, after } = one;
  if (!working || !after) {
    const detail = `${tag} has no working revision yet: it is made when the draft is passed.`;
    return fail('WRONG_STAGE', detail);
  }
  return ok({ ...one, working, after });
}

/** What stands now at the places of ops that found something else, so that both sides can be shown field by field. */
function presentAt(problem: { errors?: { path: string }[] }, body: Basis): Record<string, unknown> {
  return { paths: (problem.errors ?? []).map((error) => error.path), document: body.tag };
}

function changed(body: Basis, ops: readonly Op[], file: CaseFile): Result<{ next: Basis; undo: Op[] }> {
  const undo = invertOps(body, ops);
  if (!undo.ok) return undo;
  const applied = applyOps(body, ops, { barometer: file.site.barometer });
  if (!applied.ok) return applied;
  const parsed = parseBasis(applied.value);
  return parsed.ok ? ok({ next: parsed.value, undo: undo.value }) : parsed;
}

/** Applies changes to the working revision of one system. STALE when the version or what stood there is another; impossible figures are refused beside their field. */
export async function editDocument(
  ctx: Ctx,
  actor: Actor,
  at: { number: string; system: string },
  sent: Omit<Write<OpsBody>, 'once'>,
): Promise<Result<DocumentSaved>> {
  const file = await loadCaseFile(ctx.db, actor.site, at.number);
  if (!file) return fail('UNKNOWN', `This site has no case ${at.number}.`);
  const may = can(whoOf(actor), 'edit-document', onFile(file));
  if (!may.ok) return fail(may.code, may.sentence);
  const found = workingOf(file, at.system);
  if (!found.ok) return found;
  if (!sent.body.ok) return sent.body;
  if (!sent.version.ok) return sent.version;
  const { working, after, before } = found.value;
  const ops = sent.body.value.ops as Op[];
  if (working.version !== sent.version.value)
    return stale(`The working revision of ${at.system}`, working.version, presentAt({}, after.body));
  const next = changed(after.body, ops, file);
  if (!next.ok) return next;
  const evaluated = workBody(next.value.next, after.imports, file.rules, before);
  return inOneAct(ctx, actor, undefined, async (trx) => {
    const patch = {
      body: next.value.next,
      documentHash: hashOf('document', next.value.next),
      evaluationKey: null,
    };
    if (!(await writeWorking(trx, working.id, working.version, patch)))
      return stale(`The working revision of ${at.system}`, working.version + 1);
    await appendTrail(trx, {
      siteId: file.site.id,
      at: instant(ctx),
      act: 'document.edited',
      byId: actor.person.id,
      seat: 'originator',
      caseId: file.row.id,
      subject: `cases/${at.number}/${at.system}`,
      body: {
        changes: ops.map((op) => ({
          path: op.path,
          old: op.was ?? null,
          new: op.op === 'remove' ? null : op.value,
        })),
      },
      hides: true,
    });
    return ok({
      system: at.system,
      version: working.version + 1,
      outcomes: evaluated.outcomes.length,
      undo: next.value.undo,
    });
  });
}

/** The stage in which documents are edited, for pages that say why not. */
export function isEditable(of: Pick<Case, 'stage'>): boolean {
  return of.stage === 'draft' || of.stage === 'scenarios';
}
