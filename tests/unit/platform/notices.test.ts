/* Notices: who gets one, that it says what to do, by when and where, and that it carries no figure. */
import { describe, expect, it } from 'vitest';
import { noticesFor, type NoticeCase, type NoticeEvent } from '@notices/events';

const originator = { id: 'per_o', name: 'Ola' };
const checker = { id: 'per_c', name: 'Cem' };
const approver = { id: 'per_a', name: 'Ana' };
const operator = { id: 'per_p', name: 'Pia' };
const theCase: NoticeCase = {
  id: 'case_1',
  number: 'KW-2026-003',
  title: 'New impeller of the feed pump',
  class: 'permanent',
  site: 'ketterwold',
  systems: ['SYS-101'],
  seats: [
    { role: 'originator', person: originator },
    { role: 'checker', person: checker },
    { role: 'approver', person: approver },
    { role: 'operations', person: operator },
  ],
};
const facts = { case: theCase, by: originator, due: '2026-03-20' };
const ALL: [NoticeEvent, string[]][] = [
  [{ event: 'case.nominated', ...facts, seats: theCase.seats.slice(1) }, ['per_c', 'per_a', 'per_p']],
  [{ event: 'case.waits-for-analysis', ...facts }, ['per_o']],
  [{ event: 'case.waits-for-check', ...facts }, ['per_c']],
  [{ event: 'case.returned', ...facts, to: 'check' }, ['per_o', 'per_c']],
  [{ event: 'case.returned', ...facts, to: 'scenarios' }, ['per_o']],
  [{ event: 'case.waits-for-signature', ...facts }, ['per_a']],
  [{ event: 'case.signed', ...facts }, ['per_o']],
  [{ event: 'case.refused', ...facts }, ['per_o']],
  [{ event: 'case.waits-in-field', ...facts }, ['per_p']],
  [{ event: 'case.discrepancy-found', ...facts, relief: 'PSV-101A' }, ['per_o', 'per_a', 'per_p']],
  [{ event: 'case.in-force', ...facts, system: 'SYS-101' }, ['per_o', 'per_c', 'per_a', 'per_p']],
  [{ event: 'case.finding-raised', ...facts, finding: 2, mustFix: true }, ['per_o']],
  [{ event: 'case.finding-answered', ...facts, finding: 2, raisedBy: checker }, ['per_c']],
  [{ event: 'case.held', ...facts }, ['per_o', 'per_c', 'per_a', 'per_p']],
  [{ event: 'case.resumed', ...facts, to: 'approval' }, ['per_o', 'per_a']],
  [{ event: 'case.withdrawn', ...facts }, ['per_o', 'per_c', 'per_a', 'per_p']],
];
const BASE = 'https://relief.example.org';

describe('every event', () => {
  it.each(ALL)('$event speaks to whom it concerns', (event, expected) => {
    expect(noticesFor(event, BASE).map((notice) => notice.to)).toEqual(expected);
  });

  it.each(ALL)('$event names the case, says what to do and by when, and links to it', (event) => {
    for (const { subject, body } of noticesFor(event, BASE)) {
      expect(subject).toMatch(/^KW-2026-003: /);
      expect(body).toContain('New impeller of the feed pump');
      expect(body).toMatch(/What you are to do: .+\nBy when: 20 March 2026\.|You need do nothing\./);
      expect(body).toMatch(/^https:\/\/relief\.example\.org\/s\/ketterwold\/cases\/KW-2026-003(\/[a-z]+)?$/m);
    }
  });

  it.each(ALL)(
    '$event holds no figure with a unit and no verdict (MODEL section 5: notices to a hidden checker)',
    (event) => {
      for (const { subject, body } of noticesFor(event, BASE)) {
        expect(`${subject} ${body}`).not.toMatch(/\d\s?(%|mm|in|kg|lb|bar|psi|kPa|°)/);
        expect(`${subject} ${body}`).not.toMatch(/adequate|marginal|margin/);
      }
    },
  );
});

it('sends one notice to a person who holds two of the seats', () => {
  const twice = { ...theCase, seats: [...theCase.seats, { role: 'operations' as const, person: approver }] };
  const sent = noticesFor({ event: 'case.in-force', ...facts, case: twice, system: 'SYS-101' }, BASE);
  expect(sent.map((notice) => notice.to)).toEqual(['per_o', 'per_c', 'per_a', 'per_p']);
});

it('says so when no date is set', () => {
  const [notice] = noticesFor({ event: 'case.waits-for-check', case: theCase, by: originator }, BASE);
  expect(notice?.body).toContain('no date is set');
});

it('mails at once what waits for a signature or holds a start-up (PRACTICE section 4, mail)', () => {
  const urgent = ALL.filter(([event]) => noticesFor(event, BASE)[0]?.urgency === 'at-once').map(
    ([event]) => event.event,
  );
  expect(urgent).toEqual(['case.waits-for-signature', 'case.discrepancy-found']);
});
