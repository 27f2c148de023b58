/* A finding: open, answered by the originator, closed by the one who raised it or a successor. */
import { setup } from 'xstate';
import { step, type Step } from './next';

export const FINDING_EVENTS = ['ANSWER', 'CLOSE', 'REOPEN'] as const;
export type FindingEvent = { type: (typeof FINDING_EVENTS)[number] };
export type FindingState = 'open' | 'answered' | 'closed';

export const findingMachine = setup({ types: {} as { events: FindingEvent } }).createMachine({
  id: 'finding',
  initial: 'open',
  states: {
    open: { on: { ANSWER: 'answered' } },
    answered: { on: { CLOSE: 'closed', REOPEN: 'open' } },
    closed: { on: { REOPEN: 'open' } },
  },
});

/** One event of a finding; a refused one leaves the state as it is. */
export function nextFinding(state: FindingState, event: FindingEvent['type']): Step<FindingState> {
  return step(findingMachine, state, { type: event });
}
