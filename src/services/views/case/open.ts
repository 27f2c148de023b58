/* Opens a case for a reader: the records, what its gate reads, and whether its results are hidden from them. */
import { type GateFacts, unseenLeft } from '@domain/case';
import { fail, ok, type Result } from '@domain/result';
import { noteView } from '@data/check';
import { type CaseFile, loadCaseFile } from '../../case-file';
import { type Actor, type Ctx, instant, today } from '../../context';
import { gateFacts } from '../../gate-facts';
import { type Hidden, hiddenOf, isHiddenFrom } from '../../hidden-view';

/** A case as it was opened for one reader; services of its parts start from here, so that it is read once a request. */
export type OpenedCase = {
  ctx: Ctx;
  actor: Actor;
  file: CaseFile;
  facts: GateFacts;
  hidden: boolean;
  hiddenSet: Hidden;
  today: string;
};

/**
 * True when the reader checks this case and has worked it unseen to the end. Then another case that hides the same system
 * does not shut their own check: what they would see here they have seen.
 */
function hasRevealed(facts: GateFacts, actor: Actor): boolean {
  const persons = [actor.person.id, ...actor.standsFor];
  const checks = facts.case.seats.some(
    (seat) => seat.role === 'checker' && !seat.until && persons.includes(seat.person),
  );
  return checks && facts.reveals.length > 0 && !unseenLeft(facts);
}

/** Opens a case. UNKNOWN when the site has none of this number. */
export async function openCase(ctx: Ctx, actor: Actor, number: string): Promise<Result<OpenedCase>> {
  const file = await loadCaseFile(ctx.db, actor.site, number);
  if (!file) return fail('UNKNOWN', `This site has no case ${number}.`);
  const day = today(ctx, actor.site);
  const seen = await gateFacts(ctx.db, file, day, false);
  const hiddenSet = await hiddenOf(ctx, actor);
  const touched = file.documents.some((one) => hiddenSet.documents.has(one.document.id));
  const hidden = isHiddenFrom(seen, actor) || (touched && !hasRevealed(seen, actor));
  return ok({ ctx, actor, file, facts: { ...seen, hidden }, hidden, hiddenSet, today: day });
}

/**
 * Notes that the reader was shown results of the case: who has looked cannot be nominated as its checker afterwards.
 * Call it from every part that shows results, when they are not hidden from the reader.
 */
export async function noteLook(of: OpenedCase, what: string): Promise<void> {
  if (of.hidden) return;
  const seated = of.file.seats.some((seat) => seat.personId === of.actor.person.id && !seat.untilAt);
  if (seated || !of.actor.roles.includes('checker')) return;
  for (const one of of.file.documents) {
    await noteView(of.ctx.db, {
      personId: of.actor.person.id,
      caseId: of.file.row.id,
      documentId: one.document.id,
      what,
      at: instant(of.ctx),
    });
  }
}
