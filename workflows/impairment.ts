/* An impairment: the time during which a device in service is isolated or away, handed over from shift to shift. */
import { setup } from 'xstate';
import { step, type Step } from './next';

export const IMPAIRMENT_EVENTS = ['HAND_OVER', 'END'] as const;
export type ImpairmentEvent = { type: (typeof IMPAIRMENT_EVENTS)[number] };
export type ImpairmentState = 'open' | 'ended';

export const impairmentMachine = setup({ types: {} as { events: ImpairmentEvent } }).createMachine({
  id: 'impairment',
  initial: 'open',
  states: {
    open: { on: { HAND_OVER: 'open', END: 'ended' } },
    ended: { type: 'final' },
  },
});

/** One event of a impairment; a refused one leaves the state as it is. */
export function nextImpairment(
  state: ImpairmentState,
  event: ImpairmentEvent['type'],
): Step<ImpairmentState> {
  return step(impairmentMachine, state, { type: event });
}
