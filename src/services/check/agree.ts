/* Agreements of sheets: a checker agrees a sheet at the very hash that was in view, and may undo it. */
import { type ActBody } from '@domain/case';
import { fail, ok, type Result } from '@domain/result';
import { addAgreement, undoAgreement as undoRow } from '@data/check';
import { type CaseFile } from '../case-file';
import { type Actor, type Ctx, instant, today } from '../context';
import { gateFacts } from '../gate-facts';
import { isHiddenFrom } from '../hidden-view';
import { type Write } from '../one-act';
import { documentOf } from '../stage/revisions';
import { caseWrite } from './case-write';
import { checkerFacts } from './unseen';

export type AgreedAnswer = { number: string; version: number; sheet: string; agreed: boolean };
export type SheetAt = { number: string; document: string; sheet: string };

function sheetOf(file: CaseFile, at: SheetAt) {
  const one = documentOf(file, at.document);
  const sheet = one?.after?.evaluation.sheets[at.sheet];
  return one && sheet ? { one, sheet } : undefined;
}

const MISSING = 'This case has no such sheet.';

/** Agrees one sheet. DIFFERS when the sheet has changed since it was in view, HIDDEN while the unseen check is not done. */
export function agreeSheet(
  ctx: Ctx,
  actor: Actor,
  at: SheetAt,
  sent: Write<ActBody<'agree'>>,
): Promise<Result<AgreedAnswer>> {
  return caseWrite(
    ctx,
    actor,
    { number: at.number, act: 'agree', sent, facts: checkerFacts },
    async (trx, of) => {
      const found = sheetOf(of.file, at);
      if (!found) return fail('UNKNOWN', MISSING);
      const facts = await gateFacts(trx, of.file, today(ctx, actor.site), false);
      if (isHiddenFrom(facts, actor))
        return fail('HIDDEN', 'Finish the unseen check first: this sheet is hidden from you until then.');
      if (found.sheet.hash !== of.body.hash)
        return fail('DIFFERS', 'The sheet has changed since you had it in view. Look at it again.', {
          present: { hash: found.sheet.hash },
        });
      const { document } = found.one;
      await addAgreement(trx, {
        caseId: of.file.row.id,
        documentId: document.id,
        sheetKey: at.sheet,
        sheetHash: found.sheet.hash,
        personId: actor.person.id,
        at: instant(ctx),
      });
      const changes = [{ path: `agreements/${document.tag}/${at.sheet}`, new: found.sheet.hash }];
      return ok({
        tell: { act: 'sheet.agreed', seat: 'checker', changes },
        answer: { sheet: at.sheet, agreed: true },
      });
    },
  );
}

/** Undoes an agreement; the row of the agreement stays. */
export function undoAgreement(
  ctx: Ctx,
  actor: Actor,
  at: SheetAt,
  sent: Write<unknown>,
): Promise<Result<AgreedAnswer>> {
  return caseWrite(
    ctx,
    actor,
    { number: at.number, act: 'undo-agreement', sent, facts: checkerFacts },
    async (trx, of) => {
      const one = documentOf(of.file, at.document);
      const given = of.file.agreements
        .filter((row) => row.documentId === one?.document.id && row.sheetKey === at.sheet)
        .at(-1);
      if (!one || !given) return fail('UNKNOWN', 'This sheet is not agreed.');
      await undoRow(trx, given, actor.person.id, instant(ctx));
      const changes = [{ path: `agreements/${one.document.tag}/${at.sheet}`, old: given.sheetHash }];
      return ok({
        tell: { act: 'agreement.undone', seat: 'checker', changes },
        answer: { sheet: at.sheet, agreed: false },
      });
    },
  );
}
