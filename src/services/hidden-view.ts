/* Whose results are hidden from a person: every case that they check and have not finished working unseen. */
import { type GateFacts, unseenLeft } from '@domain/case';
import { casesOfPerson, type CaseRow } from '@data/cases';
import { untilNextWrite } from '@data/memo';
import { type CaseFile, loadCaseFile } from './case-file';
import { type Actor, type Ctx, today } from './context';
import { gateFacts } from './gate-facts';

/** Cases and documents whose results a person may not see now. */
export type Hidden = { cases: ReadonlySet<string>; documents: ReadonlySet<string> };

export const NOTHING_HIDDEN: Hidden = { cases: new Set(), documents: new Set() };

const UNSEEN_STAGES = ['draft', 'scenarios', 'check'];

function mayHide(row: CaseRow): boolean {
  return UNSEEN_STAGES.includes(row.stage === 'on-hold' ? (row.heldFrom ?? '') : row.stage);
}

/** True when the actor, or someone they stand in for, checks this case and has something left to enter. */
export function isHiddenFrom(facts: GateFacts, actor: Actor): boolean {
  const persons = [actor.person.id, ...actor.standsFor];
  const checks = facts.case.seats.some(
    (seat) => seat.role === 'checker' && !seat.until && persons.includes(seat.person),
  );
  return checks && unseenLeft(facts);
}

function documentsOf(file: CaseFile): string[] {
  return file.documents.map((one) => one.document.id);
}

/** Everything hidden from the actor at this site, worked anew after each write: it follows the person, whatever else they are. */
export function hiddenOf(ctx: Ctx, actor: Actor): Promise<Hidden> {
  const key = ['hidden', actor.site.id, actor.person.id, ...actor.standsFor, today(ctx, actor.site)];
  return untilNextWrite(ctx.db, key, () => workHidden(ctx, actor));
}

async function workHidden(ctx: Ctx, actor: Actor): Promise<Hidden> {
  const persons = [actor.person.id, ...actor.standsFor];
  const seated = await Promise.all(persons.map((id) => casesOfPerson(ctx.db, actor.site.id, id, 'checker')));
  const rows = new Map(
    seated
      .flat()
      .filter(mayHide)
      .map((row) => [row.number, row]),
  );
  const cases = new Set<string>();
  const documents = new Set<string>();
  for (const number of rows.keys()) {
    const file = await loadCaseFile(ctx.db, actor.site, number);
    if (!file) continue;
    const facts = await gateFacts(ctx.db, file, today(ctx, actor.site), false);
    if (!isHiddenFrom(facts, actor)) continue;
    cases.add(file.row.id);
    documentsOf(file).forEach((id) => documents.add(id));
  }
  return { cases, documents };
}
