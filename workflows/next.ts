/* One pure step of any machine: may the event happen, what comes of it, and which effects the caller must write. */
import {
  transition,
  type AnyMachineSnapshot,
  type AnyStateMachine,
  type EventFromLogic,
  type SnapshotFrom,
} from 'xstate';

export type Next<M extends AnyStateMachine> = { can: boolean; snapshot: SnapshotFrom<M>; effects: string[] };

/** Takes one event. A refused event leaves the snapshot as it is and has no effects. Never throws on a refused event. */
export function next<M extends AnyStateMachine>(
  machine: M,
  snapshot: SnapshotFrom<M>,
  event: EventFromLogic<M>,
): Next<M> {
  const present: AnyMachineSnapshot = snapshot;
  if (!present.can(event)) return { can: false, snapshot, effects: [] };
  const [after, actions] = transition(machine, snapshot, event);
  return { can: true, snapshot: after, effects: actions.map((action) => action.type) };
}

export type Step<S extends string> = { can: boolean; state: S };

/** One event of a small machine, which is nothing but its state. */
export function step<M extends AnyStateMachine, S extends string>(
  machine: M,
  state: S,
  event: EventFromLogic<M>,
): Step<S> {
  const snapshot = machine.resolveState({ value: state, context: {} }) as SnapshotFrom<M>;
  const after = next(machine, snapshot, event);
  const reached: AnyMachineSnapshot = after.snapshot;
  return { can: after.can, state: reached.value as S };
}
