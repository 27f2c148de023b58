/* Gate of the scenario analysis: every scenario decided, every credible one sized, nothing stale, the rulebook answered. */
import { type Answer, type Scenario } from '@domain/basis';
import { type OpenPoint } from '@domain/result';
import { SCENARIOS } from '@domain/scenarios';
import { type DocumentFacts, type GateFacts, placeIn, placeOfPath, point } from '../gate-facts';
import { lengthOf } from '../rich-text';
import { outcomePoints } from './outcomes';

const NAMES = new Map(SCENARIOS.map((each) => [each.key, each.name]));

/** The trade's name of a scenario. */
export function scenarioName(scenario: Pick<Scenario, 'id' | 'key'>): string {
  const instance = scenario.id.split('~')[1];
  const name = NAMES.get(scenario.key) ?? scenario.key.replace(/-/g, ' ');
  return instance === undefined ? name : `${name} (${instance})`;
}

/** True when the rulebook has already said this of that scenario; then its outcome, inherited or not, decides. */
function said(of: DocumentFacts, code: string, scenario: Scenario): boolean {
  return of.outcomes.some(
    (outcome) => outcome.code === code && outcome.subject.startsWith(`scenarios/${scenario.id}`),
  );
}

function decided(of: DocumentFacts, facts: GateFacts, scenario: Scenario): OpenPoint[] {
  const where = placeIn(facts, 'scenarios', of, scenario.id);
  const before = of.baseDoc?.scenarios.find((each) => each.id === scenario.id);
  const name = scenarioName(scenario);
  if (!scenario.disposition) {
    const inherited = before !== undefined && !before.disposition;
    return said(of, 'scenario-undecided', scenario) || inherited
      ? []
      : [point('scenario-undecided', `${name} of ${of.tag} has no decision.`, where)];
  }
  if (lengthOf(scenario.reason) > 0 || said(of, 'scenario-reason-thin', scenario)) return [];
  const inherited = before?.disposition === scenario.disposition && lengthOf(before.reason) === 0;
  return inherited ? [] : [point('scenario-reason-thin', `${name} of ${of.tag} has no reason.`, where)];
}

function sized(of: DocumentFacts, facts: GateFacts, scenario: Scenario, answer: Answer): OpenPoint[] {
  const where = placeIn(facts, 'scenarios', of, scenario.id);
  const name = `${scenarioName(scenario)} of ${of.tag}`;
  if (!answer.group) return [point('group-missing', `${name}: no group of relief points answers it.`, where)];
  const key = `size:${scenario.id}/${answer.id}`;
  const sheet = of.evaluation?.sheets[key];
  if (sheet && !sheet.refused) return [];
  const before = of.baseEvaluation?.sheets[key];
  if (before?.refused) return [];
  const why = sheet?.refused && !facts.hidden ? ` ${sheet.refused.text}` : '';
  return [point('sheet-incomplete', `${name}: its sheet has no result.${why}`, where)];
}

function scenarioPoints(of: DocumentFacts, facts: GateFacts): OpenPoint[] {
  return (of.doc?.scenarios ?? []).flatMap((scenario) => {
    const points = decided(of, facts, scenario);
    if (scenario.disposition !== 'credible') return points;
    const before = of.baseDoc?.scenarios.find((each) => each.id === scenario.id);
    const inherited = before?.disposition === 'credible' && before.answers.length === 0;
    if (scenario.answers.length === 0 && !inherited) {
      const where = placeIn(facts, 'scenarios', of, scenario.id);
      return [
        ...points,
        point(
          'sheet-incomplete',
          `${scenarioName(scenario)} of ${of.tag} is credible and has no sheet.`,
          where,
        ),
      ];
    }
    return [...points, ...scenario.answers.flatMap((answer) => sized(of, facts, scenario, answer))];
  });
}

function hygiene(of: DocumentFacts, facts: GateFacts): OpenPoint[] {
  const stale = (of.stale ?? []).map((each) => {
    const sentence = facts.hidden
      ? `A live figure of ${of.tag} no longer agrees with its sheet.`
      : each.sentence;
    return point('figure-stale', sentence, placeOfPath(facts, of, each.path));
  });
  const conflicts = of.conflicts ?? 0;
  const merge =
    conflicts > 0
      ? [
          point(
            'merge-unfinished',
            `${String(conflicts)} conflicts on ${of.tag} with the revision in force are not decided.`,
            placeIn(facts, 'differences', of),
          ),
        ]
      : [];
  const moves = facts.case.class === 'correction' ? (of.moved ?? []) : [];
  const moved = moves.map((each) => {
    const sentence = facts.hidden
      ? `A correction may not move a result of ${of.tag}, and this one does.`
      : each.sentence;
    return point('correction-moves-result', sentence, placeOfPath(facts, of, each.path));
  });
  return [...stale, ...merge, ...moved];
}

/** All that keeps the scenario analysis of one system from the check. */
export function documentPoints(of: DocumentFacts, facts: GateFacts): OpenPoint[] {
  return [...scenarioPoints(of, facts), ...hygiene(of, facts), ...outcomePoints('scenarios', of, facts)];
}

/** All that keeps the scenario analysis of the case from the check. */
export function scenariosPoints(facts: GateFacts): OpenPoint[] {
  return facts.documents.filter((of) => of.state !== 'dropped').flatMap((of) => documentPoints(of, facts));
}
