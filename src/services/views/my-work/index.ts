/* My work: what waits for a person by due date, what waits with others, and the days ahead. No result enters its words. */
import { type Finding } from '@domain/case';
import { addDays, daysBetween, isOverdue } from '@domain/dates';
import { maskProse } from '@domain/hidden';
import { ok, type Result } from '@domain/result';
import { casesOfPerson, type CaseRow, findCases, openSeatsOf, type SeatRow } from '@data/cases';
import { type DueRow, listDue } from '@data/due';
import { findingsOf } from '@data/findings';
import { findPeople } from '@data/people';
import { type Actor, type Ctx, today } from '../../context';
import { type Hidden, hiddenOf } from '../../hidden-view';
import { dayAt, longDay, shortDay } from '../days';
import { DUE_KINDS, dueText, whenOf } from './due-words';
import { railAt, turnOf, waitsFor } from './turn';

export type WorkLine = {
  when: { day: string; more?: string; late?: boolean };
  title: string;
  href: string;
  tag?: string;
  text?: string;
  stands?: { at?: number; held?: boolean; words: string };
};
export type OtherLine = {
  number: string;
  href: string;
  title: string;
  stands: { at?: number; held?: boolean; words: string };
  waitsFor: string;
  since: string;
};
export type AheadLine = { date: string; late: boolean; what: string; of: string; href: string };
export type MyWorkView = {
  day: string;
  heading: string;
  cells: { label: string; fact: string; num: boolean }[];
  waiting: WorkLine[];
  others: OtherLine[];
  ahead: AheadLine[];
};

const FINAL = new Set(['withdrawn', 'refused', 'removed', 'in-force']);
const WORDS = ['No', 'One', 'Two', 'Three', 'Four', 'Five', 'Six', 'Seven', 'Eight', 'Nine', 'Ten'];

type Known = {
  ctx: Ctx;
  actor: Actor;
  day: string;
  hidden: Hidden;
  persons: string[];
  cases: CaseRow[];
  seats: SeatRow[];
  due: DueRow[];
  names: ReadonlyMap<string, string>;
};

async function gather(ctx: Ctx, actor: Actor): Promise<Known> {
  const persons = [actor.person.id, ...actor.standsFor];
  const own = await Promise.all(persons.map((id) => casesOfPerson(ctx.db, actor.site.id, id)));
  const seated = [...new Map(own.flat().map((row) => [row.id, row])).values()];
  const due = await listDue(ctx.db, { siteId: actor.site.id, states: ['open', 'done'] });
  const mine = due.filter(
    (item) => persons.includes(item.ownerId) || seated.some((row) => row.id === item.caseId),
  );
  const more = await findCases(
    ctx.db,
    mine.flatMap((item) =>
      item.caseId && !seated.some((row) => row.id === item.caseId) ? [item.caseId] : [],
    ),
  );
  const cases = [...seated, ...more];
  const seats = await openSeatsOf(
    ctx.db,
    cases.map((row) => row.id),
  );
  const people = await findPeople(ctx.db, [...new Set(seats.map((seat) => seat.personId))]);
  return {
    ...{ ctx, actor, persons, cases, seats, due: mine },
    day: today(ctx, actor.site),
    hidden: await hiddenOf(ctx, actor),
    names: new Map(people.map((person) => [person.id, person.name])),
  };
}

const seatsIn = (of: Known, row: CaseRow) => of.seats.filter((seat) => seat.caseId === row.id);
const caseHref = (of: Known, row: CaseRow, part = '') =>
  `/s/${of.actor.site.slug}/cases/${row.number}${part}`;

/** The title of a case; figures are taken out while it is hidden. */
const titleOf = (of: Known, row: CaseRow) => (of.hidden.cases.has(row.id) ? maskProse(row.title) : row.title);

type Dated = { due: string; line: WorkLine };

/** A case without a date of its own stands by the day since which it waits. */
function caseTurns(of: Known): Dated[] {
  return of.cases.flatMap((row) => {
    const turn = turnOf(row, seatsIn(of, row), of.persons);
    if (!turn) return [];
    const dated = of.due.find(
      (item) => item.caseId === row.id && item.state === 'open' && DUE_OF_STAGE[row.stage] === item.kind,
    );
    const rail = railAt(row);
    const line: WorkLine = {
      when: dated ? whenOf(dated.due, of.day) : { day: 'Since', more: shortDay(row.stageAt) },
      title: `${turn.task}: ${titleOf(of, row)}`,
      href: caseHref(of, row, turn.part),
      tag: row.number,
      text: `${rail.words} since ${dayAt(row.stageAt, of.actor.site.timeZone)}.`,
      stands: rail,
    };
    return [{ due: dated?.due ?? addDays(row.stageAt.slice(0, 10), 14), line }];
  });
}

const DUE_OF_STAGE: Record<string, DueRow['kind']> = {
  scenarios: 'analysis',
  draft: 'analysis',
  check: 'check',
  'due-for-removal': 'removal',
};

function answersOwed(of: Known, row: CaseRow, findings: readonly Finding['state'][]): Dated[] {
  const mine = seatsIn(of, row).some(
    (seat) => seat.role === 'originator' && of.persons.includes(seat.personId),
  );
  const open = findings.filter((state) => state === 'open').length;
  if (!mine || open === 0 || FINAL.has(row.stage)) return [];
  const line: WorkLine = {
    when: { day: 'Since', more: shortDay(row.stageAt) },
    title: `Answer ${open === 1 ? 'a finding' : `${String(open)} findings`}: ${titleOf(of, row)}`,
    href: caseHref(of, row, '/findings'),
    tag: row.number,
    stands: railAt(row),
  };
  return [{ due: addDays(row.stageAt.slice(0, 10), 14), line }];
}

async function findingsOwed(of: Known): Promise<Dated[]> {
  const open = of.cases.filter((row) => !FINAL.has(row.stage));
  const lists = await Promise.all(open.map((row) => findingsOf(of.ctx.db, row.id)));
  return open.flatMap((row, i) =>
    answersOwed(
      of,
      row,
      (lists[i] ?? []).map((one) => one.state),
    ),
  );
}

/** Due items that a case's own line tells already are left out. */
function dueOwned(of: Known): Dated[] {
  return of.due
    .filter((item) => item.state === 'open' && of.persons.includes(item.ownerId))
    .filter((item) => {
      const row = of.cases.find((one) => one.id === item.caseId);
      const told = row && DUE_OF_STAGE[row.stage] === item.kind && turnOf(row, seatsIn(of, row), of.persons);
      return !told;
    })
    .map((item) => {
      const row = of.cases.find((one) => one.id === item.caseId);
      const line: WorkLine = {
        when: whenOf(item.due, of.day),
        title: dueText(item, of.hidden),
        href: `/s/${of.actor.site.slug}/due#${item.id}`,
        ...(row ? { tag: row.number } : {}),
        text: `${DUE_KINDS[item.kind]}.`,
        ...(row ? { stands: railAt(row) } : {}),
      };
      return { due: item.due, line };
    });
}

function othersOf(of: Known): OtherLine[] {
  return of.cases
    .filter((row) => seatsIn(of, row).some((seat) => of.persons.includes(seat.personId)))
    .filter((row) => !turnOf(row, seatsIn(of, row), of.persons))
    .filter((row) => !FINAL.has(row.stage) || daysBetween(row.stageAt.slice(0, 10), of.day) < 90)
    .map((row) => ({
      number: row.number,
      href: caseHref(of, row),
      title: titleOf(of, row),
      stands: railAt(row),
      waitsFor: waitsFor(row, seatsIn(of, row), of.names),
      since: shortDay(row.stageAt),
    }));
}

function aheadOf(of: Known): AheadLine[] {
  const ends = of.cases
    .filter((row) => row.endsOn !== null && ['field', 'in-force', 'due-for-removal'].includes(row.stage))
    .map((row) => ({
      due: row.endsOn ?? '',
      what: `Temporary change ends: ${titleOf(of, row)}`,
      of: row.number,
      href: caseHref(of, row),
    }));
  const items = of.due
    .filter((item) => item.state === 'open' && !of.persons.includes(item.ownerId))
    .map((item) => ({
      due: item.due,
      what: dueText(item, of.hidden),
      of: of.cases.find((row) => row.id === item.caseId)?.number ?? DUE_KINDS[item.kind],
      href: `/s/${of.actor.site.slug}/due#${item.id}`,
    }));
  return [...ends, ...items]
    .filter((one) => daysBetween(of.day, one.due) <= 60)
    .sort((a, b) => a.due.localeCompare(b.due))
    .slice(0, 12)
    .map(({ due, ...one }) => {
      const days = daysBetween(of.day, due);
      const soon = days >= 0 && days <= 10 ? `, ${String(days)} ${days === 1 ? 'day' : 'days'}` : '';
      return { ...one, date: `${shortDay(due)}${soon}`, late: days <= 10 };
    });
}

/** "Three things wait for you". */
export function headingOf(count: number): string {
  if (count === 0) return 'Nothing waits for you';
  const word = WORDS[count] ?? String(count);
  return count === 1 ? `${word} thing waits for you` : `${word} things wait for you`;
}

/** A person's own page at a site. */
export async function myWorkView(ctx: Ctx, actor: Actor): Promise<Result<MyWorkView>> {
  const of = await gather(ctx, actor);
  const dated = [...caseTurns(of), ...(await findingsOwed(of)), ...dueOwned(of)].sort((a, b) =>
    a.due.localeCompare(b.due),
  );
  const others = othersOf(of);
  const owned = of.due.filter((item) => item.state === 'open' && of.persons.includes(item.ownerId));
  const late = owned.filter((item) => isOverdue(item.due, of.day)).length;
  const fact = (label: string, count: number) => ({ label, fact: String(count), num: true });
  return ok({
    day: longDay(of.day),
    heading: headingOf(dated.length),
    cells: [
      fact('Due today', owned.filter((item) => item.due === of.day).length),
      fact('Overdue', late),
      fact('Cases in your hands', caseTurns(of).length),
      fact('With others', others.length),
    ],
    waiting: dated.map((one) => one.line),
    others,
    ahead: aheadOf(of),
  });
}
