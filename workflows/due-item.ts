/* A due item: open, done by its owner, accepted by who asked for it; overdue is derived from the day, never a state. */
import { setup } from 'xstate';
import { step, type Step } from './next';

export const DUE_ITEM_EVENTS = ['DO', 'WAIVE', 'ACCEPT', 'REJECT'] as const;
export type DueItemEvent = { type: (typeof DUE_ITEM_EVENTS)[number] };
export type DueItemState = 'open' | 'done' | 'accepted' | 'waived';

export const dueItemMachine = setup({ types: {} as { events: DueItemEvent } }).createMachine({
  id: 'due-item',
  initial: 'open',
  states: {
    open: { on: { DO: 'done', WAIVE: 'waived' } },
    done: { on: { ACCEPT: 'accepted', REJECT: 'open' } },
    accepted: { type: 'final' },
    waived: { type: 'final' },
  },
});

/** One event of a due item; a refused one leaves the state as it is. */
export function nextDueItem(state: DueItemState, event: DueItemEvent['type']): Step<DueItemState> {
  return step(dueItemMachine, state, { type: event });
}
