/* Who hears of an event: the seats whose turn it is, or those who wait for the answer. */
import { type SeatRole, type Stage } from '@domain/case';
import { type NoticeEvent, type NoticePerson, type NoticeSeat } from './types';

/** The seat that acts in a stage. */
const TURN: Partial<Record<Stage, SeatRole>> = {
  draft: 'originator',
  scenarios: 'originator',
  check: 'checker',
  approval: 'approver',
  field: 'operations',
};

function held(seats: readonly NoticeSeat[], ...roles: SeatRole[]): NoticeSeat[] {
  return seats.filter((seat) => roles.includes(seat.role));
}

/** The seats that an event speaks to. A returned case speaks to its originator as well as to the seat whose turn it is again. */
export function recipients(event: NoticeEvent): NoticeSeat[] {
  const { seats } = event.case;
  switch (event.event) {
    case 'case.nominated':
      return event.seats;
    case 'case.waits-for-analysis':
    case 'case.signed':
    case 'case.refused':
    case 'case.finding-raised':
      return held(seats, 'originator');
    case 'case.waits-for-check':
      return held(seats, 'checker');
    case 'case.waits-for-signature':
      return held(seats, 'approver');
    case 'case.waits-in-field':
      return held(seats, 'operations');
    case 'case.discrepancy-found':
      return held(seats, 'operations', 'originator', 'approver');
    case 'case.returned':
    case 'case.resumed':
      return held(seats, 'originator', TURN[event.to] ?? 'originator');
    case 'case.finding-answered':
      return [{ role: seatOf(seats, event.raisedBy), person: event.raisedBy }];
    case 'case.in-force':
    case 'case.held':
    case 'case.withdrawn':
      return [...seats];
  }
}

function seatOf(seats: readonly NoticeSeat[], person: NoticePerson): SeatRole {
  return seats.find((seat) => seat.person.id === person.id)?.role ?? 'checker';
}
