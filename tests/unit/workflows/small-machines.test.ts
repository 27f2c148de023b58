/* The small machines: every step of the model's list happens, every other is refused, no state is out of reach. */
import { describe, expect, it } from 'vitest';
import { DISCREPANCY_EVENTS, nextDiscrepancy } from '@workflows/discrepancy';
import { DUE_ITEM_EVENTS, nextDueItem } from '@workflows/due-item';
import { FINDING_EVENTS, nextFinding } from '@workflows/finding';
import { IMPAIRMENT_EVENTS, nextImpairment } from '@workflows/impairment';
import { NOTICE_EVENTS, nextNotice } from '@workflows/notice';
import { nextSiteRules, SITE_RULES_EVENTS } from '@workflows/site-rules';

/** As the model writes them: from –EVENT→ to. */
const LISTS = {
  finding: 'open –ANSWER→ answered, answered –CLOSE→ closed, answered –REOPEN→ open, closed –REOPEN→ open',
  'due-item': 'open –DO→ done, done –ACCEPT→ accepted, done –REJECT→ open, open –WAIVE→ waived',
  notice:
    'queued –SEND→ sending, sending –ACK→ delivered, sending –FAIL→ failed, failed –RETRY→ queued, failed –GIVE_UP→ dead, dead –RESEND→ queued',
  discrepancy:
    'open –FIX→ fixed, fixed –SEE_AGAIN→ seen-again, open –SEND_BACK→ sent-back, open –ACCEPT→ accepted, fixed –REOPEN→ open',
  'site-rules':
    'drafted –SIGN_1→ half-signed, half-signed –SIGN_2→ signed, signed –TAKE_EFFECT→ in-effect, in-effect –SUPERSEDE→ superseded, drafted –DROP→ dropped, half-signed –DROP→ dropped',
  impairment: 'open –HAND_OVER→ open, open –END→ ended',
};
type Step = (state: never, event: never) => { can: boolean; state: string };
const MACHINES: [keyof typeof LISTS, Step, readonly string[]][] = [
  ['finding', nextFinding, FINDING_EVENTS],
  ['due-item', nextDueItem, DUE_ITEM_EVENTS],
  ['notice', nextNotice, NOTICE_EVENTS],
  ['discrepancy', nextDiscrepancy, DISCREPANCY_EVENTS],
  ['site-rules', nextSiteRules, SITE_RULES_EVENTS],
  ['impairment', nextImpairment, IMPAIRMENT_EVENTS],
];

describe.each(MACHINES)('%s', (name, step, events) => {
  const rows = LISTS[name].split(', ').map((row) => {
    const [, from = '', event = '', to = ''] = /^(\S+) –(\S+)→ (\S+)$/.exec(row) ?? [];
    return { from, event, to };
  });
  const states = [...new Set(rows.flatMap((row) => [row.from, row.to]))];

  it('knows exactly the events of the list', () => {
    expect([...events].sort()).toEqual([...new Set(rows.map((row) => row.event))].sort());
  });

  it('takes every step of the list and refuses every other', () => {
    for (const state of states)
      for (const event of events) {
        const row = rows.find((each) => each.from === state && each.event === event);
        expect(step(state as never, event as never), `${state} ${event}`).toEqual({
          can: Boolean(row),
          state: row ? row.to : state,
        });
      }
  });
});
