/* Who sends an event to a machine, and whether the table of permissions lets them. */
import { rowOf, type Act, type Role, type SeatRole } from '@domain/case';

/** A person with their roles at the site and their seats in the case, or the program itself. */
export type Actor = { id: string; roles: readonly Role[]; seats: readonly SeatRole[] } | 'system';

const SEAT_LETTER: Record<string, SeatRole> = { o: 'originator', c: 'checker', p: 'operations' };

/**
 * True when role and seat fit the act and no seat of the actor forbids it. The facts of a single act (authors, installers
 * and the like) are judged by `can` of the domain before an event is sent.
 */
export function permitted(act: Act, actor: Actor): boolean {
  const row = rowOf(act);
  if (actor === 'system' || !row) return false;
  if (row.roles !== 'any' && !actor.roles.some((role) => row.roles.includes(role))) return false;
  if (row.seats && !actor.seats.some((seat) => row.seats?.includes(seat))) return false;
  return !row.never.some((condition) => {
    const seat = SEAT_LETTER[condition];
    return seat !== undefined && actor.seats.includes(seat);
  });
}
