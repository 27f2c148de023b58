/* Which flow a pipe carries: that of one device, or of all credited members of a group whose lines run through it. */
import { type Group, type Id, type ReliefPoint } from '@domain/basis';
import { lineOf, type Pipe } from './piping';
import { creditedMembers, type CredibleAnswer, type Work } from './work';

/** Flows of the credited members of a group, kg/s, by relief point. */
export type MemberFlows = ReadonlyMap<Id, number>;

/** Whether the line of a point on this side runs through a pipe: its own segment, or the network of the header it ends in. */
function runsThrough(work: Work, point: ReliefPoint, pipe: Pipe, side: 'inlet' | 'outlet'): boolean {
  const line = lineOf(work.basis, point, side);
  if (!line) return false;
  const header = /^imports\/([^/]+)\//.exec(pipe.at)?.[1];
  return header === undefined ? line.path.includes(pipe.segment.id) : line.end?.header === header;
}

/** The credited members of the group of an answer. */
export function membersOf(work: Work, ca: CredibleAnswer): ReliefPoint[] {
  const group: Group | undefined = ca.group;
  return group ? creditedMembers(work.lookup, group, ca.answer).map(({ point }) => point) : [];
}

/**
 * The flow in a pipe of a point's line. A pipe of its own carries the point's own flow. A shared one carries all credited members
 * that run through it; a point that is not credited (a spare, a device without credit) has the group's flow there, or its own
 * where that is more.
 */
export function flowIn(
  work: Work,
  point: ReliefPoint,
  own: number,
  members: { points: readonly ReliefPoint[]; flows: MemberFlows },
  side: 'inlet' | 'outlet',
): (pipe: Pipe) => number {
  return (pipe) => {
    const through = members.points.filter((one) => runsThrough(work, one, pipe, side));
    const sum = (of: readonly ReliefPoint[]) =>
      of.reduce((total, one) => total + (members.flows.get(one.id) ?? 0), 0);
    if (!through.some((one) => one.id === point.id)) return Math.max(own, sum(through));
    return own + sum(through.filter((one) => one.id !== point.id));
  };
}
