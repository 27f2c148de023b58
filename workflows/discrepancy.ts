/* A discrepancy of the field sheet: open, put right and seen again, sent back to the case, or accepted. */
import { setup } from 'xstate';
import { step, type Step } from './next';

export const DISCREPANCY_EVENTS = ['FIX', 'SEND_BACK', 'ACCEPT', 'SEE_AGAIN', 'REOPEN'] as const;
export type DiscrepancyEvent = { type: (typeof DISCREPANCY_EVENTS)[number] };
export type DiscrepancyState = 'open' | 'fixed' | 'seen-again' | 'sent-back' | 'accepted';

export const discrepancyMachine = setup({ types: {} as { events: DiscrepancyEvent } }).createMachine({
  id: 'discrepancy',
  initial: 'open',
  states: {
    open: { on: { FIX: 'fixed', SEND_BACK: 'sent-back', ACCEPT: 'accepted' } },
    fixed: { on: { SEE_AGAIN: 'seen-again', REOPEN: 'open' } },
    'seen-again': { type: 'final' },
    'sent-back': { type: 'final' },
    accepted: { type: 'final' },
  },
});

/** One event of a discrepancy; a refused one leaves the state as it is. */
export function nextDiscrepancy(
  state: DiscrepancyState,
  event: DiscrepancyEvent['type'],
): Step<DiscrepancyState> {
  return step(discrepancyMachine, state, { type: event });
}
