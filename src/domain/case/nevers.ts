/* The conditions that forbid an act whatever role and seat someone has: each answers a sentence when it forbids. */
import { type Never } from './permission-table';
import { type On, type Who } from './permissions';
import { type Id, type SeatRole } from './types';

type Test = (who: Who, on: On) => string | undefined;

const persons = (who: Who): Id[] => [who.id, ...(who.standsFor ?? [])];
const among = (who: Who, ids: readonly Id[] | undefined): boolean =>
  persons(who).some((person) => (ids ?? []).includes(person));

/** A former originator stays one: what they wrote is still in the case. */
function sits(role: SeatRole): Test {
  return (who, on) => {
    const holds = on.seats.some(
      (seat) =>
        seat.role === role && (!seat.until || role === 'originator') && persons(who).includes(seat.person),
    );
    if (!holds) return undefined;
    const own = on.seats.some((seat) => seat.role === role && seat.person === who.id);
    const seat = role === 'operations' ? 'operations' : `the ${role}`;
    return own ? `you are ${seat} of this case.` : `you stand in for ${seat} of this case.`;
  };
}

const replaced: Test = (who, on) => {
  if (!on.replaced) return 'it is not said who is replaced.';
  const judges =
    (on.replaced.role === 'checker' && on.stage === 'check') ||
    (on.replaced.role === 'approver' && on.stage === 'approval');
  return judges && persons(who).includes(on.replaced.person)
    ? 'the case waits for your own judgement; another must name your successor.'
    : undefined;
};

/** What forbids, by the words of the table. A fact that the row needs and the caller left out forbids too. */
export const NEVER_TESTS: Record<Never, Test> = {
  o: sits('originator'),
  c: sits('checker'),
  p: sits('operations'),
  'the one replaced': replaced,
  'not the authoriser': (who, on) =>
    on.authoriser !== undefined && persons(who).includes(on.authoriser)
      ? undefined
      : 'only the one who gave the spoken authorisation confirms it.',
  'an unseen entry stands': (_who, on) =>
    on.stage === 'check' && on.unseenStands !== false
      ? 'the checker has begun the unseen check; ask the checker to return it.'
      : undefined,
  'author of the sheet': (who, on) =>
    among(who, on.authors) ? 'you wrote this sheet or the calculation behind it.' : undefined,
  'one who looked first': (who, on) =>
    among(who, on.lookedFirst) ? 'you saw the originator’s figures before you entered your own.' : undefined,
  'author of a checked sheet': (who, on) =>
    among(who, on.authors) ? 'you wrote one of the sheets that are checked.' : undefined,
  'neither raised nor succeeds': (who, on) =>
    persons(who).some((person) => person === on.raisedBy || person === on.successor)
      ? undefined
      : 'only the one who raised the finding, or a named successor, settles it.',
  'installer of the line': (who, on) =>
    among(who, on.installers) ? 'you installed this, and another must verify it.' : undefined,
  'installer of any line': (who, on) =>
    among(who, on.installers) ? 'you installed part of what is confirmed here.' : undefined,
  'asked for it': (who, on) =>
    among(who, on.askedBy ? [on.askedBy] : []) ? 'you asked for the extension yourself.' : undefined,
  'signed before': (who, on) =>
    among(who, on.signedBefore)
      ? 'you signed the approval or an extension before; another approver extends.'
      : undefined,
  'not the owner': (who, on) =>
    on.owner !== undefined && persons(who).includes(on.owner)
      ? undefined
      : 'the due item belongs to someone else.',
  'the owner': (who, on) =>
    on.owner === undefined || persons(who).includes(on.owner) ? 'the due item is your own.' : undefined,
  'did not ask': (who, on) =>
    on.askedBy !== undefined && persons(who).includes(on.askedBy)
      ? undefined
      : 'someone else asked for this due item.',
  'who recorded it': (who, on) =>
    on.recordedBy === undefined || persons(who).includes(on.recordedBy)
      ? 'you recorded the replacement yourself.'
      : undefined,
  'drafted or signed first': (who, on) =>
    on.drafters === undefined || among(who, on.drafters)
      ? 'you drafted these rules or signed them first; the second signature is another person’s.'
      : undefined,
  'own roles': (who, on) =>
    on.subject !== undefined && persons(who).includes(on.subject)
      ? 'nobody changes their own roles.'
      : undefined,
  hidden: (_who, on) =>
    on.hidden === true ? 'its results are hidden from you until your unseen check is complete.' : undefined,
};
