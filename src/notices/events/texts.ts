/* The words of each notice: what happened, what to do, where. Without figures, because a checker whose view is hidden reads them too. */
import { type SeatRole, type Stage } from '@domain/case';
import { type NoticeEvent } from './types';

/** One notice's own words: the subject after the case number, what happened, what the receiver is to do (absent: nothing), the part of the case to open. */
export type NoticeText = { subject: string; happened: string; todo?: string; part: string };

const STAGE_WORDS: Record<Stage, string> = {
  draft: 'draft',
  scenarios: 'scenario analysis',
  check: 'calculation check',
  approval: 'approval',
  field: 'field verification',
  'in-force': 'in force',
  'due-for-removal': 'due for removal',
  removed: 'removed',
  'on-hold': 'on hold',
  withdrawn: 'withdrawn',
  refused: 'refused',
};

const LATER: Record<SeatRole, string> = {
  originator: 'Describe the change and answer what the gate of the draft still asks.',
  checker:
    'Nothing is to be done yet: another notice comes when the case waits for your check. From now on its results are hidden from you.',
  approver: 'Nothing is to be done yet: another notice comes when the case waits for your signature.',
  operations: 'Nothing is to be done yet: another notice comes when the case waits in the field.',
};

function gateText(event: NoticeEvent, who: string): NoticeText | undefined {
  switch (event.event) {
    case 'case.waits-for-analysis':
      return {
        subject: 'waits for your scenario analysis',
        happened: `${who} passed the draft.`,
        todo: 'Give every scenario a disposition with a reason, and every credible one its calculation sheet.',
        part: 'scenarios',
      };
    case 'case.waits-for-check':
      return {
        subject: 'waits for your check',
        happened: `${who} finished the scenario analysis.`,
        todo: 'Do the unseen check first: your own readings, choices and figures. Then agree the sheets, or raise findings.',
        part: 'unseen',
      };
    case 'case.waits-for-signature':
      return {
        subject: 'waits for your signature',
        happened: `${who} passed the calculation check.`,
        todo: 'Read the summary and sign, return or refuse. Signing needs your password on that page.',
        part: 'summary',
      };
    case 'case.waits-in-field':
      return {
        subject: 'waits in the field',
        happened: `${who} signed: the change may be installed.`,
        todo: 'Enter in the field sheet what you see at each relief point, before start-up. Confirm when nothing differs.',
        part: 'field',
      };
    default:
      return undefined;
  }
}

function stopText(event: NoticeEvent, who: string): NoticeText | undefined {
  switch (event.event) {
    case 'case.returned':
      return {
        subject: `came back to ${STAGE_WORDS[event.to]}`,
        happened: `${who} returned the case to ${STAGE_WORDS[event.to]}. The reason stands in the case.`,
        todo: 'Read the reason and the findings, mend what they ask, and pass the gate again.',
        part: 'findings',
      };
    case 'case.refused':
      return {
        subject: 'was refused',
        happened: `${who} refused the case. The reason stands in the case. What is in force stays as it is.`,
        todo: 'Nothing may be installed. You may copy the case to a new draft.',
        part: '',
      };
    case 'case.discrepancy-found':
      return {
        subject: 'a discrepancy holds the start-up',
        happened: `${who} saw at ${event.relief} something else than was signed.`,
        todo: 'Do not start up. Operations mend the field and see it again, or send the case back.',
        part: 'field',
      };
    case 'case.held':
      return {
        subject: 'is on hold',
        happened: `${who} put the case on hold. The reason stands in the case.`,
        part: '',
      };
    case 'case.withdrawn':
      return {
        subject: 'was withdrawn',
        happened: `${who} withdrew the case. What is in force stays as it is.`,
        part: '',
      };
    default:
      return undefined;
  }
}

/** The words of an event for one receiver's seat. */
export function noticeText(event: NoticeEvent, role: SeatRole): NoticeText {
  const who = event.by?.name ?? 'Setwright';
  const found = gateText(event, who) ?? stopText(event, who);
  if (found) return found;
  switch (event.event) {
    case 'case.nominated':
      return {
        subject: `you are nominated ${role === 'operations' ? 'for operations' : role}`,
        happened: `${who} nominated you ${role === 'operations' ? 'for operations' : `as ${role}`}.`,
        todo: LATER[role],
        part: 'brief',
      };
    case 'case.signed':
      return { subject: 'was signed', happened: `${who} signed the case.`, part: 'summary' };
    case 'case.in-force':
      return {
        subject: `${event.system} is in force`,
        happened: `${who} confirmed the field sheet of ${event.system}: its new revision is in force.`,
        part: '',
      };
    case 'case.finding-raised':
      return {
        subject: `finding ${event.finding} was raised`,
        happened: `${who} raised finding ${event.finding}${event.mustFix ? ', which must be fixed' : ''}.`,
        todo: 'Answer the finding.',
        part: 'findings',
      };
    case 'case.finding-answered':
      return {
        subject: `finding ${event.finding} was answered`,
        happened: `${who} answered your finding ${event.finding}.`,
        todo: 'Close the finding, or open it again with your reason.',
        part: 'findings',
      };
    case 'case.resumed':
      return {
        subject: `goes on in ${STAGE_WORDS[event.to]}`,
        happened: `${who} took the case off hold: it goes on in ${STAGE_WORDS[event.to]}.`,
        part: '',
      };
    default:
      throw new Error(`No words for the notice ${event.event}.`);
  }
}
