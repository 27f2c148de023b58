/* The unseen check: entries in their order, the reveal, and reconciling what differs. */
import {
  type ActBody,
  type DocumentFacts,
  type GateFacts,
  lookedFirst,
  unseenDifferences,
  unseenState,
  type UnseenItem,
} from '@domain/case';
import { fail, ok, type Result } from '@domain/result';
import { cleanRich } from '@domain/text';
import { addReconciliation, addReveal, addUnseen, viewsOf, type UnseenRow } from '@data/check';
import { type Db } from '@data/connection';
import { newId } from '@data/ids';
import { type New } from '@data/mapping';
import { type CaseFile } from '../case-file';
import { type Actor, type Ctx, instant, today } from '../context';
import { gateFacts, seenOf } from '../gate-facts';
import { type Write } from '../one-act';
import { type Allowed, caseWrite } from './case-write';

type Entry = ActBody<'unseen'>['entries'][number];
export type UnseenAnswer = { number: string; version: number; left: number };

function externalAuthors(file: CaseFile): string[] {
  return file.documents.flatMap((one) =>
    (one.after?.body.externalSheets ?? []).flatMap((sheet) => sheet.person ?? []),
  );
}

/** Facts of the checker's acts: who wrote a sheet, and who saw the originator's figures first. */
export function checkerFacts(file: CaseFile): { authors: string[]; lookedFirst: string[] } {
  return { authors: externalAuthors(file), lookedFirst: lookedFirst(seenOf(file)) };
}

function itemOf(of: DocumentFacts, entry: Entry, facts: GateFacts): UnseenItem | undefined {
  const state = unseenState(of, facts);
  return state.mayEnter.find((item) => item.scope === entry.scope);
}

function roundOf(file: CaseFile, entry: Entry): number {
  return (
    file.unseen.filter((one) => one.documentId === entry.document && one.scope === entry.scope).length + 1
  );
}

type Placed = { entry: Entry; item: UnseenItem };

function placed(facts: GateFacts, entries: readonly Entry[]): Result<Placed[]> {
  const found: Placed[] = [];
  for (const [index, entry] of entries.entries()) {
    const of = facts.documents.find((one) => one.document === entry.document);
    const item = of && itemOf(of, entry, facts);
    const path = `entries/${String(index)}`;
    if (!item) {
      const sentence = 'This is not asked now: readings and choices come first, then the figures, each once.';
      return fail('SCHEMA', sentence, { errors: [{ path, code: 'not-asked', sentence }] });
    }
    const wantsWord = item.ask.kind === 'word';
    if (wantsWord !== (entry.word !== undefined)) {
      const sentence = wantsWord
        ? `${item.label}: choose one.`
        : `${item.label}: enter a figure with its unit.`;
      return fail('SCHEMA', sentence, { errors: [{ path, code: 'kind', sentence }] });
    }
    found.push({ entry, item });
  }
  return ok(found);
}

async function rowsOf(
  ctx: Ctx,
  of: Allowed<ActBody<'unseen'>>,
  actor: Actor,
  list: readonly Placed[],
): Promise<New<UnseenRow>[]> {
  const looked = await viewsOf(
    ctx.db,
    actor.person.id,
    of.file.documents.map((one) => one.document.id),
  );
  return list.map(({ entry, item }) => ({
    id: newId('unseen'),
    caseId: of.file.row.id,
    documentId: entry.document,
    scope: entry.scope,
    layer: item.layer,
    quantity: item.quantity,
    value: entry.value ?? null,
    word: entry.word ?? null,
    cites: entry.cites ?? null,
    round: roundOf(of.file, entry),
    byId: actor.person.id,
    at: instant(ctx),
    firstView: looked.find((view) => view.documentId === entry.document)?.at ?? null,
    route: null,
    sheetId: null,
  }));
}

/** Enters readings, choices or figures. What is not asked at this point is refused, so that nothing is entered out of order. */
export function enterUnseen(
  ctx: Ctx,
  actor: Actor,
  number: string,
  sent: Write<ActBody<'unseen'>>,
): Promise<Result<UnseenAnswer>> {
  return caseWrite(ctx, actor, { number, act: 'unseen', sent, facts: checkerFacts }, async (trx, of) => {
    const facts = await gateFacts(trx, of.file, today(ctx, actor.site), true);
    const list = placed(facts, of.body.entries);
    if (!list.ok) return list;
    await addUnseen(trx, await rowsOf({ ...ctx, db: trx }, of, actor, list.value));
    const left =
      facts.documents.reduce((sum, one) => sum + unseenState(one, facts).missing.length, 0) -
      list.value.length;
    const changes = list.value.map(({ item }) => ({ path: `unseen/${item.scope}`, new: 'entered' }));
    return ok({ tell: { act: 'unseen.entered', seat: 'checker', changes }, answer: { left } });
  });
}

async function writeReveal(
  trx: Db,
  ctx: Ctx,
  actor: Actor,
  file: CaseFile,
  facts: GateFacts,
  of: DocumentFacts,
): Promise<void> {
  const differences = unseenDifferences(of, facts, { barometer: file.site.barometer });
  const sheets = Object.fromEntries(
    Object.values(of.evaluation?.groups ?? {}).flatMap((group) => {
      const sheet = group.governing === undefined ? undefined : of.evaluation?.sheets[group.governing];
      return sheet ? [[sheet.key, sheet.hash]] : [];
    }),
  );
  const round = file.reveals.filter((one) => one.documentId === of.document).length + 1;
  const reveal = {
    id: newId('reveal'),
    caseId: file.row.id,
    personId: actor.person.id,
    documentId: of.document,
    round,
    sheets,
    at: instant(ctx),
  };
  const fresh = differences.filter(
    ({ entry }) => !file.unseen.some((one) => one.id === entry.id && one.comparison !== null),
  );
  await addReveal(
    trx,
    reveal,
    fresh.map(({ entry, theirs, compared }) => ({
      entryId: entry.id,
      against: theirs ?? null,
      deviation: compared.deviation ?? null,
      within: compared.within,
    })),
  );
}

/** Shows both sides of one system, once everything is entered; from here on its results are no longer hidden from the checker. */
export function revealUnseen(
  ctx: Ctx,
  actor: Actor,
  number: string,
  sent: Write<ActBody<'reveal'>>,
): Promise<Result<UnseenAnswer>> {
  return caseWrite(ctx, actor, { number, act: 'reveal', sent, facts: checkerFacts }, async (trx, of) => {
    const facts = await gateFacts(trx, of.file, today(ctx, actor.site), true);
    const document = facts.documents.find(
      (one) => one.document === of.body.document || one.tag === of.body.document,
    );
    if (!document) return fail('UNKNOWN', 'This case does not hold that system.');
    const state = unseenState(document, facts);
    if (state.step === 'done')
      return fail('WRONG_STAGE', `The figures of ${document.tag} are shown already.`);
    if (state.step !== 'reveal') {
      const openPoints = state.missing.map((item) => ({
        code: 'unseen-check-missing',
        sentence: `${item.label} is still to be entered.`,
        where: `cases/${number}/unseen`,
      }));
      return fail('GATE_SHUT', 'Something is still to be entered before both sides are shown.', {
        openPoints,
      });
    }
    await writeReveal(trx, ctx, actor, of.file, facts, document);
    return ok({
      tell: {
        act: 'unseen.revealed',
        seat: 'checker',
        changes: [{ path: `unseen/${document.tag}`, new: 'revealed' }],
      },
      answer: { left: 0 },
    });
  });
}

/** Reconciles in writing an entry that differs. */
export function reconcileUnseen(
  ctx: Ctx,
  actor: Actor,
  number: string,
  entryId: string,
  sent: Write<ActBody<'reconcile'>>,
): Promise<Result<UnseenAnswer>> {
  return caseWrite(ctx, actor, { number, act: 'reconcile', sent, facts: checkerFacts }, async (trx, of) => {
    const entry = of.file.unseen.find((one) => one.id === entryId);
    if (!entry) return fail('UNKNOWN', 'There is no such entry in this case.');
    if (!entry.comparison)
      return fail('WRONG_STAGE', 'This entry has not been compared yet: reveal the figures first.');
    await addReconciliation(trx, {
      entryId,
      byId: actor.person.id,
      at: instant(ctx),
      text: cleanRich(of.body.text),
    });
    return ok({
      tell: {
        act: 'unseen.reconciled',
        seat: 'checker',
        changes: [{ path: `unseen/${entry.scope}`, new: 'reconciled' }],
        hides: true,
      },
      answer: { left: 0 },
    });
  });
}
