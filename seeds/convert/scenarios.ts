/* Scenarios: 31 causes of the invented site and five keys of the supplement as dispositions of our 35 keys. */
import { type ExternalSheet, type Scenario, type Status } from '@domain/basis';
import { SCENARIOS } from '@domain/scenarios';
import supplement from '../data/supplement/scenarios.json';
import utilities from '../data/supplement/utilities.json';
import { answerOf } from './answers';
import { type DemoCause, type DemoResults, type DemoSystem } from './demo-types';
import { placeOf } from './equipment';
import { SITE_STUDY } from './external';
import { compact, plainQ, rich } from './figures';
import { documentId, idOf, utilityId } from './ids';
import { ONCE_CAUSES, scenarioKey } from './keys';
import { boundOf, sourceId } from './sources';

type Extra = { disposition: string; reason: string; source?: string; conditions?: string[]; like?: string };
const EXTRA: Record<string, Record<string, Extra> | undefined> = supplement.extra as never;
const BOUNDS: Record<string, Record<string, string | undefined> | undefined> = supplement.bounds as never;
const TWICE: Record<string, Record<string, string[] | undefined> | undefined> = supplement.twice as never;
type Condition = { tag: string; kind: string; holds: string[] };
const CONDITIONS: Record<string, Condition[] | undefined> = supplement.conditions as never;
const OF_SCENARIO: Record<string, string | undefined> = utilities.ofScenario;
const USERS = new Map(utilities.utilities.map((utility) => [utility.tag, utility.users]));
const STATUSES: Status[] = ['normal', 'start-up', 'shutdown', 'standby', 'isolated', 'cleaning'];

/** Scenarios with the external sheets of their answers. */
export type Disposed = { scenarios: Scenario[]; sheets: ExternalSheet[] };

type Draft = {
  key: string;
  disposition: string;
  reason: string;
  bound?: string | undefined;
  twice?: string[] | undefined;
};

/** Every status is answered; the standard list says in which of them the scenario can arise. */
function statusesOf(key: string): Scenario['statuses'] {
  const listed = SCENARIOS.find((scenario) => scenario.key === key)?.statuses ?? [];
  return Object.fromEntries(STATUSES.map((status) => [status, listed.includes(status)]));
}

function dependsOn(system: DemoSystem, key: string): Scenario['dependsOn'] {
  const held = (CONDITIONS[system.id] ?? []).filter((condition) => condition.holds.includes(key));
  if (held.length === 0) return undefined;
  return held.map((condition) => ({
    id: idOf('dp', condition.tag),
    kind: condition.kind as NonNullable<Scenario['dependsOn']>[number]['kind'],
    tag: condition.tag,
    condition: idOf('fc', condition.tag),
  }));
}

/** A reason that rests on a thing in the field is a control; one that rests on physics needs no kind of its own. */
function whyOf(draft: Draft, controlled: boolean): Scenario['why'] {
  if (draft.disposition === 'not-applicable') return 'absent';
  if (draft.disposition !== 'not-credible') return undefined;
  if (draft.twice) return 'double-jeopardy';
  return controlled ? 'controlled' : undefined;
}

function boundary(system: DemoSystem, tag: string | undefined): Pick<Scenario, 'bound' | 'sources'> {
  const bound = tag === undefined ? undefined : boundOf(system, tag);
  if (!bound) return {};
  const path = `sources/${sourceId(bound.tag)}/pressure`;
  const limit = placeOf(`${bound.limits}/${bound.side ?? 'body'}`);
  return {
    sources: [sourceId(bound.tag)],
    bound: {
      figure: { use: path },
      live: { doc: documentId(system.id), path, taken: plainQ(bound.pressure) },
      limit: { equipment: limit.equipment, side: limit.side ?? '', of: 'mawp' },
    },
  };
}

function utilityOf(system: DemoSystem, key: string): string | undefined {
  const tag = OF_SCENARIO[key];
  return tag !== undefined && USERS.get(tag)?.includes(system.id) === true ? utilityId(tag) : undefined;
}

const NAMES_SOMETHING = /\d/;

/** A reason that names no figure or tag names the drawing on which one sees it. */
function shownOn(draft: Draft, system: DemoSystem): string {
  if (draft.disposition === 'credible' || NAMES_SOMETHING.test(draft.reason)) return draft.reason;
  return `${draft.reason} See ${system.references[0] ?? system.id}.`;
}

function scenarioOf(draft: Draft, system: DemoSystem, answers: Scenario['answers']): Scenario {
  const [first, second] = draft.twice ?? [];
  const conditions = dependsOn(system, draft.key);
  const twice = first !== undefined && second !== undefined;
  return compact({
    id: draft.key,
    key: draft.key,
    statuses: statusesOf(draft.key),
    reason: rich(shownOn(draft, system)),
    utility: utilityOf(system, draft.key),
    answers,
    disposition: draft.disposition as Scenario['disposition'],
    why: whyOf(draft, conditions !== undefined),
    twice: twice ? { first, second, shared: 'none' as const, hidden: 'no' as const } : undefined,
    dependsOn: conditions,
    ...boundary(system, draft.bound),
  });
}

function dispositionOf(cause: DemoCause, system: DemoSystem): Draft {
  const bound = BOUNDS[system.id]?.[cause.cause];
  return {
    key: scenarioKey(cause.cause),
    disposition: bound === undefined ? cause.disposition.replace(' ', '-') : 'below-limit',
    reason: cause.reason,
    bound,
    twice: TWICE[system.id]?.[cause.cause],
  };
}

type Answers = { answers: Scenario['answers']; sheets: ExternalSheet[] };

function answersOf(cause: DemoCause, key: string, system: DemoSystem, results: DemoResults): Answers {
  const made = (cause.answers ?? []).map((answer) => {
    const result = results.causes[cause.cause]?.find((candidate) => candidate.group === answer.group);
    return answerOf(answer, { system, scenario: key, result, study: results.study ?? SITE_STUDY });
  });
  return { answers: made.map(({ answer }) => answer), sheets: made.flatMap(({ sheets }) => sheets) };
}

function extraOf(system: DemoSystem, results: DemoResults): Disposed[] {
  return Object.entries(EXTRA[system.id] ?? {}).map(([key, extra]) => {
    const draft = { key, disposition: extra.disposition, reason: extra.reason, bound: extra.source };
    const like = system.causes.find((cause) => cause.cause === extra.like);
    const { answers, sheets } = like ? answersOf(like, key, system, results) : { answers: [], sheets: [] };
    return { scenarios: [scenarioOf(draft, system, answers)], sheets };
  });
}

function ownOf(system: DemoSystem, results: DemoResults): Disposed[] {
  return system.causes
    .filter((cause) => !(cause.cause in ONCE_CAUSES))
    .map((cause) => {
      const draft = dispositionOf(cause, system);
      const { answers, sheets } = answersOf(cause, draft.key, system, results);
      const scenario = scenarioOf(draft, system, answers);
      const surge =
        cause.cause === 'explosion-surge'
          ? [scenarioOf({ ...draft, key: 'hydraulic-surge' }, system, [])]
          : [];
      return { scenarios: [scenario, ...surge], sheets };
    });
}

/** All dispositions of a system in the order of the standard list. */
export function scenariosOf(system: DemoSystem, results: DemoResults): Disposed {
  const made = [...ownOf(system, results), ...extraOf(system, results)];
  const order = new Map(SCENARIOS.map((scenario, index) => [scenario.key, index]));
  const place = (scenario: Scenario): number => order.get(scenario.key) ?? order.size;
  return {
    scenarios: made.flatMap(({ scenarios }) => scenarios).toSorted((a, b) => place(a) - place(b)),
    sheets: made.flatMap(({ sheets }) => sheets),
  };
}
