/* What happened to a case, as the notices need it: facts, seats and who acted; no figure of any result. */
import { type CaseClass, type Day, type Id, type SeatRole, type Stage } from '@domain/case';

export type NoticePerson = { id: Id; name: string };
export type NoticeSeat = { role: SeatRole; person: NoticePerson };

/** The case as every notice names it. `site` is the slug in addresses, `systems` are tags. */
export type NoticeCase = {
  id: Id;
  number: string;
  title: string;
  class: CaseClass;
  site: string;
  systems: string[];
  seats: NoticeSeat[];
};

/** What every event tells: the case after the act, who acted (absent for the system), and by when the receivers are to do their part. */
type Common = { case: NoticeCase; by?: NoticePerson; due?: Day };

export type NoticeEvent = Common &
  (
    | { event: 'case.nominated'; seats: NoticeSeat[] }
    | { event: 'case.waits-for-analysis' }
    | { event: 'case.waits-for-check' }
    | { event: 'case.returned'; to: Stage }
    | { event: 'case.waits-for-signature' }
    | { event: 'case.signed' }
    | { event: 'case.refused' }
    | { event: 'case.waits-in-field' }
    | { event: 'case.discrepancy-found'; relief: string }
    | { event: 'case.in-force'; system: string }
    | { event: 'case.finding-raised'; finding: number; mustFix: boolean }
    | { event: 'case.finding-answered'; finding: number; raisedBy: NoticePerson }
    | { event: 'case.held' }
    | { event: 'case.resumed'; to: Stage }
    | { event: 'case.withdrawn' }
  );

export type NoticeEventName = NoticeEvent['event'];

/** A notice before it is queued. */
export type NoticeDraft = {
  event: NoticeEventName;
  to: Id;
  case: Id | null;
  urgency: 'at-once' | 'digest';
  subject: string;
  body: string;
};
