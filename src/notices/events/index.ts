/* From what happened to the notices that go out: event → recipients → words. Pure: services queue the drafts in the same transaction as the act. */
import { type SeatRole } from '@domain/case';
import { recipients } from './recipients';
import { noticeText } from './texts';
import { type NoticeDraft, type NoticeEvent, type NoticeEventName } from './types';

export {
  type NoticeCase,
  type NoticeDraft,
  type NoticeEvent,
  type NoticeEventName,
  type NoticePerson,
  type NoticeSeat,
} from './types';

/** Events that are mailed at once; the others may wait for a person's daily digest. */
const AT_ONCE: readonly NoticeEventName[] = ['case.waits-for-signature', 'case.discrepancy-found'];

const CAUTION =
  'Setwright is an aid to qualified engineers. It approves nothing: people do. This message holds no figures; read them in the case.';

const MONTHS = 'January February March April May June July August September October November December'.split(
  ' ',
);

/** `2026-03-20` → `20 March 2026`. */
function dayInWords(day: string): string {
  const [year, month, date] = day.split('-');
  return `${Number(date)} ${MONTHS[Number(month) - 1] ?? month ?? ''} ${year ?? ''}`;
}

function body(event: NoticeEvent, name: string, role: SeatRole, baseUrl: string): string {
  const text = noticeText(event, role);
  const { number, title, systems, site } = event.case;
  const part = text.part === '' ? '' : `/${text.part}`;
  const when =
    event.due === undefined
      ? 'By when: as soon as you can, no date is set.'
      : `By when: ${dayInWords(event.due)}.`;
  return [
    `${name},`,
    text.happened,
    `Case ${number}: ${title}\n${systems.length === 1 ? 'System' : 'Systems'}: ${systems.join(', ')}`,
    text.todo === undefined ? 'You need do nothing.' : `What you are to do: ${text.todo}\n${when}`,
    `${baseUrl}/s/${site}/cases/${number}${part}`,
    `-- \n${CAUTION}`,
  ].join('\n\n');
}

/**
 * The notices of one event, one a person even where someone holds two of the seats.
 * @param baseUrl address of the product as people reach it, without a slash at the end
 */
export function noticesFor(event: NoticeEvent, baseUrl: string): NoticeDraft[] {
  const seats = recipients(event);
  const first = seats.filter(
    ({ person }, index) => seats.findIndex((other) => other.person.id === person.id) === index,
  );
  return first.map(({ person, role }) => ({
    event: event.event,
    to: person.id,
    case: event.case.id,
    urgency: AT_ONCE.includes(event.event) ? 'at-once' : 'digest',
    subject: `${event.case.number}: ${noticeText(event, role).subject}`,
    body: body(event, person.name, role, baseUrl),
  }));
}
