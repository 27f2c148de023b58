/* The open points of every gate: one list for the machine, the page, the refusal and the tests. */
import { type OpenPoint } from '@domain/result';
import { approvalPoints } from './gates/approval';
import { checkPoints } from './gates/check';
import { draftPoints, peoplePoints } from './gates/draft';
import { fieldPoints } from './gates/field';
import { caseOutcomePoints } from './gates/outcomes';
import { scenariosPoints } from './gates/scenarios';
import { type Gate, type GateFacts } from './gate-facts';
import { type Id, type Stage } from './types';

function once(points: readonly OpenPoint[]): OpenPoint[] {
  const seen = new Set<string>();
  return points.filter((each) => {
    const key = `${each.code}\n${each.where}\n${each.sentence}`;
    return seen.has(key) ? false : (seen.add(key), true);
  });
}

/**
 * What keeps a gate shut; empty when it may be passed. A rule speaks at its gate and at every later one before the field;
 * an emergency that was authorised meets the open points of its draft at the gate of the scenarios. The gate of the field
 * is asked for one system (`document`); without one it gives those of all systems not yet issued.
 */
export function openPoints(gate: Gate, facts: GateFacts, document?: Id): OpenPoint[] {
  if (gate === 'field') {
    const asked = facts.documents.filter((of) =>
      document ? of.document === document : ['open', 'approved'].includes(of.state),
    );
    return once([
      ...peoplePoints(facts),
      ...asked.flatMap((of) => fieldPoints(of, facts)),
      ...caseOutcomePoints('field', facts),
    ]);
  }
  const points = draftPoints(facts);
  if (gate !== 'draft') points.push(...scenariosPoints(facts));
  if (gate === 'check' || gate === 'approval') points.push(...checkPoints(facts));
  if (gate === 'approval') points.push(...approvalPoints(facts));
  return once([...points, ...caseOutcomePoints(gate, facts)]);
}

/** The gate that a stage waits at; none for stages that are not left by a gate of these. */
export function gateOf(stage: Stage): Gate | undefined {
  return stage === 'draft' ||
    stage === 'scenarios' ||
    stage === 'check' ||
    stage === 'approval' ||
    stage === 'field'
    ? stage
    : undefined;
}
