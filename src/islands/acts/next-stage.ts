/* Asks the case machine, restored in the browser, where an act would take the case. */
import { type Role, type SeatRole, STAGE_WORDS, type Stage } from '@domain/case';
import { type CaseEvent, caseSnapshot, type CaseSnapshot, nextCase, stageOf } from '@workflows/case';
import { type MachineProps } from './groups';

const GATE: Readonly<Record<string, CaseEvent['type']>> = {
  'PASS-draft': 'PASS',
  'PASS-draft-graded': 'PASS',
  'PASS-scenarios': 'PASS',
  'PASS-check': 'PASS',
};
const RETURNS: Readonly<Record<string, readonly Stage[]>> = {
  'RETURN-own': ['draft', 'scenarios'],
  'RETURN-check': ['draft', 'scenarios'],
  'RETURN-approval': ['draft', 'scenarios', 'check'],
  'RETURN-field': ['draft', 'scenarios', 'check', 'approval'],
};
/** Stands for the words that the person has not written yet: without them no guard would let the act pass. */
const WORDS_TO_COME = 'to be written';

type By = { actor: { id: string; roles: readonly Role[]; seats: readonly SeatRole[] } };

/** The snapshot that the page's case stands in. */
export function snapshotOf(machine: MachineProps): CaseSnapshot {
  return caseSnapshot(machine.stage as Stage, machine.context);
}

function byOf({ actor }: MachineProps): By {
  return { actor: { id: actor.id, roles: actor.roles as Role[], seats: actor.seats as SeatRole[] } };
}

/** The events that an act may become; none for acts that leave the stage alone. */
export function eventsOf(act: string, machine: MachineProps): CaseEvent[] {
  const by = byOf(machine);
  const { open, context } = machine;
  if (GATE[act]) return [{ type: 'PASS', open, ...by }];
  if (act === 'SIGN') return [true, false].map((plant) => ({ type: 'SIGN', last: true, plant, open, ...by }));
  const to = RETURNS[act];
  if (to) return to.map((stage) => ({ type: 'RETURN', to: stage, reason: WORDS_TO_COME, ...by }));
  if (act === 'ISSUE' || act === 'REMOVE')
    return context.documents.map(({ id }) => ({ type: act, document: id, open, ...by }));
  if (act === 'DROP')
    return context.documents.map(({ id }) => ({ type: act, document: id, reason: WORDS_TO_COME, ...by }));
  if (act === 'HOLD') return [{ type: act, reason: WORDS_TO_COME, review: '', ...by }];
  if (act === 'WITHDRAW' || act === 'REFUSE') return [{ type: act, reason: WORDS_TO_COME, ...by }];
  return act === 'RESUME' ? [{ type: act, ...by }] : [];
}

/** The stages an act would lead to, in words; `undefined` when the act is not the machine's, empty when it refuses now. */
export function stagesAfter(
  act: string,
  machine: MachineProps,
  snapshot: CaseSnapshot,
): string[] | undefined {
  const events = eventsOf(act, machine);
  if (events.length === 0) return undefined;
  const after = events.map((event) => nextCase(snapshot, event)).filter(({ can }) => can);
  return [...new Set(after.map(({ snapshot: next }) => STAGE_WORDS[stageOf(next)]))];
}

/** Stages that a case is in rather than goes to. */
const ENDS: ReadonlySet<string> = new Set(['on hold', 'withdrawn', 'refused', 'removed'] as const);

/** Where an act leads, as a sentence. */
export function leadsTo(act: string, machine: MachineProps, snapshot: CaseSnapshot): string | undefined {
  const stages = stagesAfter(act, machine, snapshot);
  if (!stages || stages.length === 0) return undefined;
  const now = STAGE_WORDS[stageOf(snapshot)];
  const places = stages.filter((stage) => stage !== now);
  if (places.length === 0) return `The case stays in ${now}.`;
  const ifLast = act === 'SIGN' ? ', once every approver has signed' : '';
  const [only] = places;
  if (places.length === 1 && only !== undefined && ENDS.has(only)) return `The case is then ${only}.`;
  return `The case then goes ${places.map((stage) => (stage === 'in force' ? 'into force' : `to ${stage}`)).join(' or ')}${ifLast}.`;
}
