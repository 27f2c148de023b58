/* A set of site rules: drafted, signed by two, in effect from its day, superseded by the next. */
import { setup } from 'xstate';
import { step, type Step } from './next';

export const SITE_RULES_EVENTS = ['SIGN_1', 'DROP', 'SIGN_2', 'TAKE_EFFECT', 'SUPERSEDE'] as const;
export type SiteRulesEvent = { type: (typeof SITE_RULES_EVENTS)[number] };
export type SiteRulesState = 'drafted' | 'half-signed' | 'signed' | 'in-effect' | 'superseded' | 'dropped';

export const siteRulesMachine = setup({ types: {} as { events: SiteRulesEvent } }).createMachine({
  id: 'site-rules',
  initial: 'drafted',
  states: {
    drafted: { on: { SIGN_1: 'half-signed', DROP: 'dropped' } },
    'half-signed': { on: { SIGN_2: 'signed', DROP: 'dropped' } },
    signed: { on: { TAKE_EFFECT: 'in-effect' } },
    'in-effect': { on: { SUPERSEDE: 'superseded' } },
    superseded: { type: 'final' },
    dropped: { type: 'final' },
  },
});

/** One event of a site rules; a refused one leaves the state as it is. */
export function nextSiteRules(state: SiteRulesState, event: SiteRulesEvent['type']): Step<SiteRulesState> {
  return step(siteRulesMachine, state, { type: event });
}
