/* Where an act leads, asked of the case machine that runs beside the page. */
import { useActorRef, useSelector } from '@xstate/react';
import { caseMachine } from '@workflows/case';
import { type MachineProps } from './groups';
import { leadsTo, snapshotOf } from './next-stage';

export type ActNextProps = {
  acts: readonly string[];
  machine: MachineProps;
  children: (next: ReadonlyMap<string, string>) => React.ReactNode;
};

/** Runs the machine from the stage of the page and says for each act where it would lead. */
export function ActNext({ acts, machine, children }: ActNextProps) {
  const actor = useActorRef(caseMachine, { snapshot: snapshotOf(machine), input: machine.context });
  const snapshot = useSelector(actor, (present) => present);
  const next = new Map<string, string>();
  for (const act of acts) {
    const sentence = leadsTo(act, machine, snapshot);
    if (sentence) next.set(act, sentence);
  }
  return <>{children(next)}</>;
}
