/* Whether a person may do an act now, and if not, why not. */
import { type OpenPoint, type ProblemCode } from '@domain/result';
import { NEVER_TESTS } from './nevers';
import { ACTS, PERMISSIONS, rowOf, type Act } from './permission-table';
import { type Case, type Id, type Role, type Seat, type SeatRole, type Stage } from './types';
import { ACT_WORDS, anyOf, ROLE_WORDS, SEAT_WORDS, STAGE_WORDS } from './words';

export { ACTS, PERMISSIONS, rowOf, type Act };

/** Who asks: their roles at this site and the people they stand in for today. */
export type Who = { id: Id; roles: readonly Role[]; standsFor?: readonly Id[] };

/** What an act is done on. Facts that an act's row does not name may be left out; a named one that is missing forbids. */
export type On = {
  stage?: Stage;
  seats: readonly Seat[];
  /** replace-seat: the seat that changes hands. */
  replaced?: { person: Id; role: SeatRole };
  /** confirm-authorisation: who gave the spoken authorisation. */
  authoriser?: Id;
  /** RETURN-own: whether the checker has entered anything in this round. */
  unseenStands?: boolean;
  /** Who wrote the sheet, its inputs or the external calculation behind it. */
  authors?: readonly Id[];
  /** Who saw the originator's figures before entering their own. */
  lookedFirst?: readonly Id[];
  /** Findings: who raised it, and who succeeds them. */
  raisedBy?: Id;
  successor?: Id;
  /** People who installed what the line, or any line of the document, is about. */
  installers?: readonly Id[];
  /** Extensions: who asked; and who signed the approval or an extension before. */
  askedBy?: Id;
  signedBefore?: readonly Id[];
  /** Due items: owner and who asked for it (`askedBy`). */
  owner?: Id;
  /** Replacement in kind: who recorded it. Site rules: who drafted or signed first. */
  recordedBy?: Id;
  drafters?: readonly Id[];
  /** administer: the person whose roles change. */
  subject?: Id;
  /** True while the case is in this person's hidden view. */
  hidden?: boolean;
};

export type DenialCode = Extract<ProblemCode, 'NOT_PERMITTED' | 'NOT_INDEPENDENT' | 'WRONG_STAGE' | 'HIDDEN'>;
export type Denied = { ok: false; code: DenialCode; sentence: string };
export type Can = { ok: true } | Denied;

/** The person and everyone they stand in for: independence holds for all of them. */
export function personsOf(who: Who): readonly Id[] {
  return [who.id, ...(who.standsFor ?? [])];
}

/** Seats held now, own or by standing in. */
export function seatsOf(who: Who, seats: readonly Seat[]): SeatRole[] {
  const persons = personsOf(who);
  return seats.filter((seat) => !seat.until && persons.includes(seat.person)).map((seat) => seat.role);
}

function denied(code: DenialCode, sentence: string): Denied {
  return { ok: false, code, sentence };
}

function roleOrSeat(act: Act, who: Who, on: On): Denied | undefined {
  const row = rowOf(act);
  if (!row) return denied('NOT_PERMITTED', 'This is not an act that a person can do.');
  if (row.roles === 'any') {
    const own = act === 'session' || act === 'password';
    return own || who.roles.length > 0
      ? undefined
      : denied('NOT_PERMITTED', 'You have no role at this site.');
  }
  const roles = row.roles;
  if (!who.roles.some((role) => roles.includes(role))) {
    const needed = anyOf(roles.map((role) => ROLE_WORDS[role]));
    return denied('NOT_PERMITTED', `You need the role ${needed} at this site to ${ACT_WORDS[act]}.`);
  }
  const seats = row.seats;
  if (seats && !seatsOf(who, on.seats).some((seat) => seats.includes(seat))) {
    const needed = anyOf(seats.map((seat) => SEAT_WORDS[seat]));
    return denied('NOT_PERMITTED', `Only ${needed} of this case may ${ACT_WORDS[act]}, and you are not.`);
  }
  return undefined;
}

function never(act: Act, who: Who, on: On): Denied | undefined {
  for (const condition of rowOf(act)?.never ?? []) {
    const sentence = NEVER_TESTS[condition](who, on);
    if (!sentence) continue;
    return denied(
      condition === 'hidden' ? 'HIDDEN' : 'NOT_INDEPENDENT',
      `You cannot ${ACT_WORDS[act]}: ${sentence}`,
    );
  }
  return undefined;
}

function wrongStage(act: Act, on: On): Denied | undefined {
  const stages = rowOf(act)?.stages;
  if (stages === 'all' || !stages) return undefined;
  if (on.stage && stages.includes(on.stage)) return undefined;
  const when = anyOf(stages.map((stage) => STAGE_WORDS[stage]));
  const now = on.stage ? `the case is in ${STAGE_WORDS[on.stage]}` : 'there is no case';
  return denied('WRONG_STAGE', `To ${ACT_WORDS[act]} the case must be in ${when}; ${now}.`);
}

/**
 * Whether someone may do an act, in the order of the model: role, seat (NOT_PERMITTED), independence
 * (NOT_INDEPENDENT; HIDDEN for what the hidden view withholds), stage (WRONG_STAGE). Gates come after this.
 */
export function can(who: Who, act: Act, on: On): Can {
  return roleOrSeat(act, who, on) ?? never(act, who, on) ?? wrongStage(act, on) ?? { ok: true };
}

export type ActAnswer = {
  act: Act;
  words: string;
  ok: boolean;
  code?: DenialCode | 'GATE_SHUT';
  sentence?: string;
};

/** The acts that a case page offers, each with yes or the reason why not; a gate's open points shut its act. */
export function actsFor(
  who: Who,
  on: On,
  open: Partial<Record<Act, readonly OpenPoint[]>> = {},
): ActAnswer[] {
  return CASE_ACTS.map((act) => {
    const words = ACT_WORDS[act];
    const answer = can(who, act, on);
    if (!answer.ok) return { act, words, ok: false, code: answer.code, sentence: answer.sentence };
    const points = open[act] ?? [];
    if (points.length === 0) return { act, words, ok: true };
    const count = points.length === 1 ? 'One point is' : `${String(points.length)} points are`;
    return { act, words, ok: false, code: 'GATE_SHUT', sentence: `${count} still open at this gate.` };
  });
}

/** The acts that are tied to the stages of a case. */
export const CASE_ACTS: readonly Act[] = ACTS.filter((act) => Array.isArray(rowOf(act)?.stages));

/** What `can` needs to know of a case itself; the facts of the single act are added by the caller. */
export function onCase(of: Pick<Case, 'stage' | 'seats' | 'authorised' | 'extensions'>): On {
  const asked = of.extensions.findLast((extension) => !extension.signature)?.askedBy;
  return {
    stage: of.stage,
    seats: of.seats,
    ...(of.authorised ? { authoriser: of.authorised.by } : {}),
    ...(asked ? { askedBy: asked } : {}),
  };
}
