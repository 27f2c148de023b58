/* From an act to the notices that its transaction queues. */
import { type SeatRole } from '@domain/case';
import { addWorkingDays } from '@domain/dates';
import {
  noticesFor,
  queueNotices,
  type NoticeCase,
  type NoticeEvent,
  type NoticePerson,
  type NoticeSeat,
} from '@notices/index';
import { type SeatRow } from '@data/cases';
import { type Db } from '@data/connection';
import { findPeople } from '@data/people';
import { type CaseFile, nameIn } from './case-file';
import { type Actor, type Ctx, instant, today } from './context';

/** The part of an event that is its own; the case, who acted and the due day are added here. */
export type Happened = NoticeEvent extends infer E
  ? E extends NoticeEvent
    ? Omit<E, 'case' | 'by' | 'due'>
    : never
  : never;

const WORKING_DAYS: Partial<Record<NoticeEvent['event'], { key: string; days: number }>> = {
  'case.waits-for-check': { key: 'checkDue', days: 5 },
  'case.waits-for-signature': { key: 'approvalDue', days: 3 },
  'case.finding-raised': { key: 'findingDue', days: 10 },
};

function dueOf(file: CaseFile, event: NoticeEvent['event'], day: string): string | undefined {
  const row = WORKING_DAYS[event];
  if (!row) return undefined;
  const value = file.rules.conduct[row.key];
  return addWorkingDays(day, typeof value === 'number' ? value : row.days);
}

/** Open seats with the names of their holders. */
export async function noticeSeats(db: Db, seats: readonly SeatRow[]): Promise<NoticeSeat[]> {
  const open = seats.filter((seat) => !seat.untilAt);
  const people = await findPeople(db, [...new Set(open.map((seat) => seat.personId))]);
  const named = new Map(people.map((person) => [person.id, person.name]));
  return open.map((seat) => ({
    role: seat.role,
    person: { id: seat.personId, name: named.get(seat.personId) ?? seat.personId },
  }));
}

async function noticeCase(db: Db, file: CaseFile, seats: readonly SeatRow[]): Promise<NoticeCase> {
  return {
    id: file.row.id,
    number: file.row.number,
    title: file.row.title,
    class: file.row.class,
    site: file.site.slug,
    systems: file.documents.map((one) => one.document.tag),
    seats: await noticeSeats(db, seats),
  };
}

/** Queues the notices of one event in the transaction of the act. `seats` are those after the act, where it changed them. */
export async function notify(
  trx: Db,
  ctx: Ctx,
  actor: Actor,
  file: CaseFile,
  happened: Happened,
  seats: readonly SeatRow[] = file.seats,
): Promise<void> {
  const due = dueOf(file, happened.event, today(ctx, file.site));
  const event = {
    ...happened,
    case: await noticeCase(trx, file, seats),
    by: { id: actor.person.id, name: actor.person.name },
    ...(due !== undefined ? { due } : {}),
  } as NoticeEvent;
  await queueNotices(trx, noticesFor(event, ctx.baseUrl), { siteId: file.site.id, at: instant(ctx) });
}

/** A person of the case as notices name them. */
export function noticePerson(file: CaseFile, id: string): NoticePerson {
  return { id, name: nameIn(file, id) };
}

/** The open seats of one role. */
export function seatsInRole(file: Pick<CaseFile, 'seats'>, role: SeatRole): SeatRow[] {
  return file.seats.filter((seat) => seat.role === role && !seat.untilAt);
}
