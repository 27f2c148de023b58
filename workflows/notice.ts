/* A notice in the outbox: queued, being sent, delivered, or failed and tried again until given up. */
import { setup } from 'xstate';
import { step, type Step } from './next';

export const NOTICE_EVENTS = ['SEND', 'ACK', 'FAIL', 'RETRY', 'GIVE_UP', 'RESEND'] as const;
export type NoticeEvent = { type: (typeof NOTICE_EVENTS)[number] };
export type NoticeState = 'queued' | 'sending' | 'failed' | 'dead' | 'delivered';

export const noticeMachine = setup({ types: {} as { events: NoticeEvent } }).createMachine({
  id: 'notice',
  initial: 'queued',
  states: {
    queued: { on: { SEND: 'sending' } },
    sending: { on: { ACK: 'delivered', FAIL: 'failed' } },
    failed: { on: { RETRY: 'queued', GIVE_UP: 'dead' } },
    dead: { on: { RESEND: 'queued' } },
    delivered: { type: 'final' },
  },
});

/** One event of a notice; a refused one leaves the state as it is. */
export function nextNotice(state: NoticeState, event: NoticeEvent['type']): Step<NoticeState> {
  return step(noticeMachine, state, { type: event });
}
