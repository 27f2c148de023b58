/* The machine of a case walked through the gates that the case has passed, so that its snapshot is one the machine can reach. */
import { type Role, type SeatRole, type Stage } from '@domain/case';
import {
  type CaseContext,
  type CaseEvent,
  caseMachine,
  type CaseSnapshot,
  initialSnapshot,
  nextCase,
  stageOf as stageOfSnapshot,
} from '@workflows/case';
import { personId } from '../convert';
import { rolesOf, seatsOf, stageOf } from '../load/plan';
import { type DemoCase } from './demo-case-types';

type Step = (demo: DemoCase, documents: readonly string[]) => CaseEvent;

/** An actor with the roles they have at the site and every seat they hold in the case. */
function actor(demo: DemoCase, person: string): { id: string; roles: Role[]; seats: SeatRole[] } {
  const seats = seatsOf(demo).filter((seat) => seat.person === person);
  return { id: personId(person), roles: rolesOf(person), seats: seats.map((seat) => seat.role) };
}

const by = (demo: DemoCase, role: SeatRole): string =>
  seatsOf(demo).find((seat) => seat.role === role)?.person ?? '';
const pass =
  (role: SeatRole): Step =>
  (demo) => ({ type: 'PASS', open: [], actor: actor(demo, by(demo, role)) });
const sign =
  (last: boolean): Step =>
  (demo) => ({ type: 'SIGN', last, plant: true, open: [], actor: actor(demo, by(demo, 'approver')) });
const issue: Step = (demo, documents) => ({
  type: 'ISSUE',
  document: documents[0] ?? '',
  open: [],
  actor: actor(demo, by(demo, 'operations')),
});
const withdraw: Step = (demo) => ({
  type: 'WITHDRAW',
  reason: demo.withdrawal?.reason ?? '',
  actor: actor(demo, by(demo, 'originator')),
});
const refuse: Step = (demo) => ({
  type: 'REFUSE',
  reason: demo.refusal?.reason ?? '',
  actor: actor(demo, by(demo, 'approver')),
});
const authorise: Step = (demo) => ({
  type: 'AUTHORISE',
  protectionKept: true,
  how: 'signed',
  actor: { id: personId(demo.authorised_by ?? ''), roles: rolesOf(demo.authorised_by ?? ''), seats: [] },
});
const act: Step = (demo, documents) => ({
  type: 'RECORD_ACTED',
  document: documents[0] ?? '',
  actor: actor(demo, by(demo, 'operations')),
});

const TO_APPROVAL = [pass('originator'), pass('originator'), pass('checker')];
const STEPS: Partial<Record<Stage, Step[]>> = {
  draft: [],
  scenarios: [pass('originator')],
  check: [pass('originator'), pass('originator')],
  approval: [...TO_APPROVAL, sign(false)],
  field: [...TO_APPROVAL, sign(true)],
  'in-force': [...TO_APPROVAL, sign(true), issue],
  withdrawn: [pass('originator'), withdraw],
  refused: [...TO_APPROVAL, refuse],
};

function stepsOf(demo: DemoCase): Step[] {
  return demo.emergency ? [authorise, act] : (STEPS[stageOf(demo)] ?? []);
}

/** The snapshot of a case in its stage. Throws when the machine refuses a step: the seed would lie about the case. */
export function snapshotOf(
  demo: DemoCase,
  documents: readonly string[],
  ends: string | undefined,
): CaseSnapshot {
  const context: CaseContext = {
    class: demo.class as CaseContext['class'],
    graded: false,
    acted: false,
    ...(ends === undefined ? {} : { ends }),
    extensions: 0,
    documents: documents.map((id) => ({ id, state: 'open' as const })),
    removed: [],
  };
  let snapshot = initialSnapshot(context);
  for (const step of stepsOf(demo)) {
    const event = step(demo, documents);
    const next = nextCase(snapshot, event);
    if (!next.can)
      throw new Error(`the machine refuses ${event.type} of ${demo.id} in ${stageOfSnapshot(snapshot)}`);
    snapshot = next.snapshot;
  }
  return snapshot;
}

/** A snapshot as it is stored. */
export function stored(snapshot: CaseSnapshot): unknown {
  return JSON.parse(JSON.stringify(caseMachine.getPersistedSnapshot(snapshot)));
}
