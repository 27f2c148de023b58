/* Rules on the completeness of scenarios (section M) and on what a disposition leans on. */
import { type Basis, richFromText, type Scenario, type Source } from '@domain/basis';
import { SCENARIOS } from '@domain/scenarios';
import { equipment, heat, q, scenario, tryRules, type Change } from './kit';

const REASON = 'Outlet valve HV-7 of C-1 stands open under lock number L-12, drawing 101-P-001.';
const set =
  (key: string, change: Partial<Scenario>): Change =>
  (b) =>
    void Object.assign(scenario(b, key), change);
const aside = (key: string, text: string, more: Partial<Scenario> = {}): Change =>
  set(key, { disposition: 'not-credible', reason: richFromText(text), ...more });

const CHECK: Source = {
  id: 'so_1',
  tag: 'CK-1',
  kind: 'check-valve',
  check: { dissimilar: true, inspected: '2025-05-01' },
};
const reverse =
  (valves: Source[]): Change =>
  (b: Basis) => {
    b.sources.push(...valves);
    aside(
      'check-valve-reverse-flow',
      'CK-1 and CK-2 in series keep the flow of P-7 from coming back, 101-P-001.',
      { sources: valves.map((valve) => valve.id) },
    )(b);
  };

tryRules('M. Scenarios', [
  {
    code: 'scenario-undecided',
    source: 'ASME VIII-1 UG-125(a)(1)',
    fires: set('vacuum', { disposition: undefined }),
    says: 'has no decision',
  },
  {
    code: 'scenario-undecided',
    source: 'a key of the site list without a scenario',
    fires: (b) => void (b.scenarios = b.scenarios.filter(({ key }) => key !== 'vacuum')),
    says: 'has no decision',
  },
  {
    code: 'scenario-status-missing',
    source: 'CSB Williams Geismar 2013: all operating statuses',
    fires: set('vacuum', { statuses: { normal: true } }),
    says: 'Not answered: start-up, shutdown, standby, isolated, cleaning.',
  },
  // 40 characters, and a figure, tag or reference.
  {
    code: 'scenario-reason-thin',
    source: 'at least 40 characters (practice)',
    fires: aside('vacuum', 'Cannot happen on C-1, drawing 7.'),
    says: 'It has 32 of 40 characters.',
  },
  {
    code: 'scenario-reason-thin',
    source: 'names a figure, tag or reference',
    fires: aside('vacuum', 'Such a thing has never happened to anyone here and will not.'),
    says: 'It names no figure, tag or reference.',
    quiet: aside('vacuum', 'Such a thing has never happened to C-1 and will not happen.'),
  },
  {
    code: 'scenario-reason-thin',
    source: 'an unfilled placeholder',
    fires: aside('vacuum', 'The highest source pressure {pmax} of P-7 is below the MAWP of 3.5 barg.'),
    says: 'A placeholder is not filled in.',
  },
  {
    code: 'scenario-reason-thin',
    source: 'below the limit without a live figure',
    fires: set('vacuum', {
      disposition: 'below-limit',
      reason: richFromText('The lowest pressure of 10 kPa below atmosphere stays above the rating.'),
    }),
    says: 'rests on a live figure',
    quiet: set('vacuum', {
      disposition: 'below-limit',
      reason: richFromText('The lowest pressure of 10 kPa below atmosphere stays above the rating.'),
      bound: { figure: q(1, 'bar_g'), limit: { equipment: 'eq_c1', side: 'sd_c1', of: 'mawp' } },
    }),
  },
  {
    code: 'double-jeopardy-unsupported',
    source: 'API 521 6th ed. 4.2.3, as quoted: latent failures are existing conditions',
    fires: set('vacuum', {
      disposition: 'not-credible',
      why: 'double-jeopardy',
      twice: { first: 'a', second: 'b', shared: 'none', hidden: 'yes' },
    }),
    quiet: set('vacuum', {
      disposition: 'not-credible',
      why: 'double-jeopardy',
      twice: { first: 'a', second: 'b', shared: 'none', hidden: 'no' },
    }),
  },
  {
    code: 'check-valve-credited',
    source: 'API 521 5th ed. 4.3.4.2, as quoted: one valve is no barrier',
    fires: reverse([CHECK]),
    quiet: reverse([CHECK, { ...CHECK, id: 'so_2', tag: 'CK-2' }]),
  },
  {
    code: 'check-valve-credited',
    source: 'no inspection record',
    fires: reverse([CHECK, { ...CHECK, id: 'so_2', tag: 'CK-2', check: { dissimilar: true } }]),
  },
  {
    code: 'active-safeguard-credited',
    source: 'API 521 5.4 5th ed., as quoted: 10 to 30 min, here 20',
    fires: set('vacuum', {
      safeguards: [{ id: 'sg_1', kind: 'person', minutes: q(15, 'min'), independentAlarm: true }],
    }),
    says: 'must act within 15 min',
    quiet: set('vacuum', {
      safeguards: [{ id: 'sg_1', kind: 'person', minutes: q(20, 'min'), independentAlarm: true }],
    }),
  },
  {
    code: 'reason-without-field-check',
    source: 'a lock that a scenario leans on is seen in the field',
    fires: aside('closed-outlet', REASON.replace('stands open under lock number', 'is locked open, number')),
    says: 'depends on “locked open”',
    quiet: (b) => {
      b.fieldConditions.push({
        id: 'fc_1',
        tag: 'HV-7',
        kind: 'lock-open',
        requires: { words: 'locked open' },
        photo: true,
      });
      aside('closed-outlet', REASON, {
        dependsOn: [{ id: 'dp_1', kind: 'lock-open', tag: 'HV-7', condition: 'fc_1' }],
      })(b);
    },
  },
  {
    code: 'reason-without-field-check',
    source: 'a condition that is not on the list',
    fires: aside('closed-outlet', REASON, {
      dependsOn: [{ id: 'dp_1', kind: 'lock-open', tag: 'HV-7', condition: 'fc_9' }],
    }),
    says: 'depends on HV-7',
  },
  {
    code: 'common-cause-unlinked',
    source: 'API 521, common causes',
    both: (b) =>
      void Object.assign(scenario(b, 'cooling-water-loss'), {
        disposition: 'credible',
        answers: heat(b).answers,
      }),
    fires: () => undefined,
    says: "is not tied to the site's utility",
    quiet: set('cooling-water-loss', { utility: 'ut_cw' }),
  },
  {
    code: 'tube-rupture-screen',
    // Low side tested at 5.3 barg, high side 12 barg.
    source: 'corrected test pressure, API 521 5th ed. 3.21, as quoted',
    both: (b) => {
      equipment(b).kind = 'exchanger';
      equipment(b).sides.push({
        id: 'sd_2',
        name: 'tubes',
        holds: 'elsewhere',
        ratings: [{ id: 'rt_2', mawp: q(12, 'bar_g'), at: q(200, 'degC') }],
      });
    },
    fires: () => undefined,
    says: 'The low side of C-1 was tested at 5.3 barg, below the high side',
    quiet: (b) => void Object.assign(b.equipment[0]?.sides[0] ?? {}, { test: q(12, 'bar_g') }),
  },
]);

// The fixture decides the whole list: a key that is added later leaves the rules above to speak.
tryRules('M. The list', [
  {
    code: 'scenario-undecided',
    source: `a scenario that a site adds to the ${String(SCENARIOS.length)} of the standard list`,
    fires: () => undefined,
    rules: { scenarios: [{ key: 'snow-load', added: '2026-01-01' }] },
    says: 'Snow-load has no decision',
    quiet: (b) => void b.scenarios.push({ ...scenario(b, 'vacuum'), id: 'snow-load', key: 'snow-load' }),
  },
]);
