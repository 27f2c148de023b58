/* Rules on the completeness of dispositions: decided, for every status, with a reason that says something. */
import { type Scenario } from '@domain/basis';
import { plainText } from '@domain/text';
import { SCENARIOS } from '@domain/scenarios';
import { onScenario, param } from '../reading';
import { type Hit, rule, type RuleContext } from '../types';

const STANDARD = new Map(SCENARIOS.map((scenario) => [scenario.key, scenario]));

/** True for a scenario that is decided and not credible. */
export function setAside(scenario: Scenario): boolean {
  return scenario.disposition !== undefined && scenario.disposition !== 'credible';
}

export const scenarioUndecided = rule(
  {
    code: 'scenario-undecided',
    subject: 'scenario',
    statement: '{scenario} has no decision.',
    condition:
      'A scenario of the site’s list has no disposition, or was added to the list after the revision.',
    severity: 'stop',
    gate: 'scenarios',
    source: 'trade practice; ASME VIII-1 UG-125(a)(1) [S]',
  },
  (ctx) => {
    const missing = ctx.rules.scenarios
      .filter(({ key }) => !ctx.doc.scenarios.some((scenario) => scenario.key === key))
      .map(({ key }): Hit => ({
        subject: `scenarios/${key}`,
        tag: key,
        values: { scenario: STANDARD.get(key)?.name ?? key },
      }));
    const open = ctx.doc.scenarios
      .filter((scenario) => scenario.disposition === undefined)
      .map((scenario) => onScenario(scenario, {}));
    return [...open, ...missing];
  },
);

export const scenarioStatusMissing = rule(
  {
    code: 'scenario-status-missing',
    subject: 'scenario',
    statement: '{scenario} is decided for normal operation only.',
    condition:
      'For one of normal, start-up, shutdown, standby, isolated, cleaning or regeneration, it is left blank whether the scenario applies.',
    severity: 'stop',
    gate: 'scenarios',
    source: 'CSB Williams Geismar recommendation to API 521 [P]',
  },
  (ctx) =>
    ctx.doc.scenarios
      .filter((scenario) => scenario.disposition !== undefined)
      .flatMap((scenario): Hit[] => {
        const blank = ctx.rules.statuses.filter((status) => scenario.statuses[status] === undefined);
        if (blank.length === 0) return [];
        const more = `Not answered: ${blank.join(', ')}.`;
        return [
          onScenario(
            scenario,
            { blank: blank.join(', ') },
            { more, field: `scenarios/${scenario.id}/statuses` },
          ),
        ];
      }),
);

/** Tags of a basis that a reason may name. */
function tagsOf(ctx: RuleContext): string[] {
  const { equipment, sources, reliefPoints, isolations, references, fieldConditions } = ctx.doc;
  const tagged = [...equipment, ...sources, ...reliefPoints, ...fieldConditions].map((item) => item.tag);
  const valves = isolations.flatMap((valve) => valve.tag ?? []);
  return [...tagged, ...valves, ...references.map((reference) => reference.title)].filter(
    (tag) => tag.length > 2,
  );
}

function namesSomething(scenario: Scenario, text: string, tags: readonly string[]): boolean {
  if (/\d/.test(text) || JSON.stringify(scenario.reason).includes('"figure"')) return true;
  return tags.some((tag) => text.includes(tag));
}

/** Why the reason of a scenario says too little; nothing when it says enough. */
function thinness(ctx: RuleContext, scenario: Scenario, tags: readonly string[]): string | undefined {
  const text = plainText(scenario.reason).trim();
  const least = param(ctx, 'reasonLength', 40);
  if (text.length < least) return `It has ${String(text.length)} of ${String(least)} characters.`;
  if (/\{[^}]+\}/.test(text)) return 'A placeholder is not filled in.';
  if (STANDARD.get(scenario.key)?.sentences.some((sentence) => sentence.text === text) === true)
    return 'It is the starting sentence as offered.';
  if (!namesSomething(scenario, text, tags)) return 'It names no figure, tag or reference.';
  if (scenario.disposition !== 'below-limit') return undefined;
  return scenario.bound === undefined
    ? 'A bound below the limit rests on a live figure with its tag.'
    : undefined;
}

export const scenarioReasonThin = rule(
  {
    code: 'scenario-reason-thin',
    subject: 'scenario',
    statement: 'The reason given for setting {scenario} aside says too little.',
    condition:
      'The scenario is set aside, and the reason is shorter than 40 characters, or is a starting sentence with a blank left in it, or names no figure, tag or reference, or stays below the limit without a live figure and its tag.',
    severity: 'stop',
    gate: 'scenarios',
    source: 'trade practice; [P]',
    parameter: 'reasonLength',
  },
  (ctx) => {
    const tags = tagsOf(ctx);
    return ctx.doc.scenarios.filter(setAside).flatMap((scenario): Hit[] => {
      const more = thinness(ctx, scenario, tags);
      return more === undefined
        ? []
        : [onScenario(scenario, {}, { more, field: `scenarios/${scenario.id}/reason` })];
    });
  },
);

export const doubleJeopardyUnsupported = rule(
  {
    code: 'double-jeopardy-unsupported',
    subject: 'scenario',
    statement:
      '{scenario} is set aside as two independent failures, but one may be hidden or share a scenario.',
    condition:
      'The reason is two independent failures, and one of these is left open: the first, the second, that they share no utility, person or instrument, that neither is hidden. Check valves, regulators in series and standby pumps count as hidden.',
    severity: 'stop',
    gate: 'scenarios',
    source: 'API 521 6th 4.2.3 as quoted: latent failures are existing conditions [S]',
  },
  (ctx) =>
    ctx.doc.scenarios
      .filter((scenario) => setAside(scenario) && scenario.why === 'double-jeopardy')
      .filter(
        ({ twice }) =>
          twice === undefined ||
          twice.first.trim() === '' ||
          twice.second.trim() === '' ||
          twice.shared !== 'none' ||
          twice.hidden !== 'no',
      )
      .map((scenario) => onScenario(scenario, {}, { field: `scenarios/${scenario.id}/twice` })),
);

export const commonCauseUnlinked = rule(
  {
    code: 'common-cause-unlinked',
    subject: 'scenario',
    statement: "{utility} failure is credible here but is not tied to the site's utility {u}.",
    condition:
      'The loss of a utility is credible and no utility is named, or the utility does not list this system among its users; likewise fire by its zone.',
    severity: 'stop',
    gate: 'scenarios',
    source: 'API 521 common causes; trade practice [P]',
  },
  (ctx) =>
    ctx.doc.scenarios
      .filter((scenario) => scenario.disposition === 'credible' && scenario.utility === undefined)
      .flatMap((scenario): Hit[] => {
        const u = STANDARD.get(scenario.key)?.utility;
        if (u === undefined || scenario.key.startsWith('fire')) return [];
        const utility = u.replace('-', ' ');
        const values = { utility: utility.charAt(0).toUpperCase() + utility.slice(1), u: utility };
        return [onScenario(scenario, values, { field: `scenarios/${scenario.id}/utility` })];
      }),
);
