/* Who may sit in which seat of a case: nobody judges what they made, at nomination and at every gate after it. */
import { type GateFacts } from './gate-facts';
import { type Id, type Role, type Seat, type SeatRole, type SheetKey } from './types';
import { ROLE_WORDS } from './words';

export type IndependenceFacts = {
  seats: readonly Seat[];
  /** Roles at the site of the people in seats. */
  roles: Readonly<Record<Id, readonly Role[]>>;
  /** Who wrote which sheet, its inputs or its external calculation. */
  authors?: readonly { person: Id; sheet: SheetKey }[];
  /** People who looked at the originator's figures before a nomination as checker. */
  lookedFirst?: readonly Id[];
  names: Readonly<Record<Id, string>>;
};
export type Conflict = { person: Id; role: SeatRole; sentence: string };

/** Seats that exclude each other; approver and operations do not, nor do two approvers. */
const APART: readonly (readonly [SeatRole, SeatRole])[] = [
  ['originator', 'checker'],
  ['originator', 'approver'],
  ['originator', 'operations'],
  ['checker', 'approver'],
  ['checker', 'operations'],
];

function bothSeats(facts: IndependenceFacts, name: (person: Id) => string): Conflict[] {
  const open = facts.seats.filter((seat) => !seat.until || seat.role === 'originator');
  return APART.flatMap(([first, second]) => {
    const firsts = open.filter((seat) => seat.role === first).map((seat) => seat.person);
    const both = [...new Set(open.filter((seat) => seat.role === second).map((seat) => seat.person))].filter(
      (person) => firsts.includes(person),
    );
    return both.map((person) => ({
      person,
      role: second,
      sentence: `${name(person)} cannot be ${second}: they already are ${first} in this case.`,
    }));
  });
}

/**
 * Every seat of a case that its holder may not have: two seats that exclude each other, a checker who wrote a checked
 * sheet or looked first, a holder without the role at the site. Empty when all are independent.
 */
export function conflictsOf(facts: IndependenceFacts): Conflict[] {
  const name = (person: Id): string => facts.names[person] ?? 'This person';
  const open = facts.seats.filter((seat) => !seat.until);
  const roleless = open
    .filter((seat) => !(facts.roles[seat.person] ?? []).includes(seat.role))
    .map((seat) => ({
      person: seat.person,
      role: seat.role,
      sentence: `${name(seat.person)} cannot be ${seat.role}: they do not have the role ${ROLE_WORDS[seat.role]} at this site.`,
    }));
  const checkers = open.filter((seat) => seat.role === 'checker').map((seat) => seat.person);
  const authors = checkers
    .filter((person) => facts.authors?.some((author) => author.person === person))
    .map((person) => ({
      person,
      role: 'checker' as const,
      sentence: `${name(person)} cannot be checker: they wrote a sheet that is checked, or the calculation behind it.`,
    }));
  const lookers = checkers
    .filter((person) => facts.lookedFirst?.includes(person))
    .map((person) => ({
      person,
      role: 'checker' as const,
      sentence: `${name(person)} cannot be checker: they have seen the originator’s figures of this case.`,
    }));
  return [...bothSeats(facts, name), ...roleless, ...authors, ...lookers];
}

/** Why a person may not take a seat beside those already given; empty when they may. */
export function conflictsOfSeat(person: Id, role: SeatRole, facts: IndependenceFacts): Conflict[] {
  const seats = [
    ...facts.seats.filter((seat) => !(seat.role === role && seat.person === person)),
    { id: '', role, person },
  ];
  return conflictsOf({ ...facts, seats }).filter((conflict) => conflict.person === person);
}

/** People who saw originator's figures before they had entered anything themselves and before a reveal. */
export function lookedFirst(facts: Pick<GateFacts, 'views' | 'reveals'>): string[] {
  return facts.views
    .filter((view) => {
      const own = (each: { document: string; at: string }): boolean =>
        each.document === view.document && each.at <= view.at;
      return !facts.reveals.some((each) => each.person === view.person && own(each));
    })
    .map((view) => view.person);
}
