/* Gate of the draft: the change is described, its people are independent, everything it may affect has an answer. */
import { daysBetween } from '@domain/dates';
import { type OpenPoint } from '@domain/result';
import { type GateFacts, nameOf, placeIn, point } from '../gate-facts';
import { conflictsOf, lookedFirst } from '../independence';
import { lengthOf } from '../rich-text';
import { SEAT_ROLES, type SeatRole } from '../types';

/** A paper of this kind says that no procedure and no drawing is touched. */
export const NO_PAPERS = 'none';

function described({ case: of, ...facts }: GateFacts): OpenPoint[] {
  const { brief } = of;
  const where = placeIn({ case: of, ...facts }, 'brief');
  const missing: [boolean, string][] = [
    [lengthOf(brief.whatChanges) > 0, 'what changes and why'],
    [lengthOf(brief.technicalBasis) > 0, 'its technical basis'],
    [lengthOf(brief.effect) > 0, 'its effect on safety and health'],
    [brief.papers.length > 0, 'which procedures and drawings it touches (or that it touches none)'],
    [brief.timeNeeded.trim() !== '', 'the time it needs'],
    [of.documents.length > 0, 'which systems it changes'],
  ];
  return missing
    .filter(([there]) => !there)
    .map(([, item]) => point('change-not-described', `The case does not yet say ${item}.`, where));
}

/** Seats that must be filled: a graded first issue needs an approver only. */
function seatsAsked(facts: GateFacts): readonly SeatRole[] {
  return isGraded(facts) ? ['originator', 'approver'] : SEAT_ROLES;
}

/** True for a first issue of systems that are not worked here: an approver's one signature issues it for its grade. */
export function isGraded(facts: Pick<GateFacts, 'case' | 'documents'>): boolean {
  return (
    facts.case.class === 'first-issue' && facts.documents.every((of) => of.doc && of.doc.grade !== 'worked')
  );
}

/** Seats that are empty or held by someone who may not hold them; asked at every gate. */
export function peoplePoints(facts: GateFacts): OpenPoint[] {
  const where = placeIn(facts, 'brief', undefined, 'people');
  const open = facts.case.seats.filter((seat) => !seat.until);
  const empty = seatsAsked(facts)
    .filter((role) => !open.some((seat) => seat.role === role))
    .map((role) => point('seat-empty', `Nobody is nominated as ${role} yet.`, where));
  const conflicts = conflictsOf({
    seats: facts.case.seats,
    roles: facts.roles,
    authors: facts.authors,
    lookedFirst: lookedFirst(facts),
    names: facts.names,
  });
  return [...empty, ...conflicts.map((each) => point('people-not-independent', each.sentence, where))];
}

function affected(facts: GateFacts): OpenPoint[] {
  return facts.case.affected.flatMap((each) => {
    const where = placeIn(facts, 'changes', undefined, `affected-${each.document}`);
    const name = nameOf(facts, each.document);
    const why = facts.hidden || each.why.length === 0 ? '' : ` (${each.why.join('; ')})`;
    if (!each.answer)
      return [
        point(
          'affected-unreviewed',
          `${name} may be affected${why} and nobody has said whether it is.`,
          where,
        ),
      ];
    if (each.answer === 'not-affected' && (each.reason ?? '').trim().length < facts.rules.reasonLength)
      return [
        point(
          'affected-unreviewed',
          `${name} is said not to be affected; say why in at least ${String(facts.rules.reasonLength)} characters.`,
          where,
        ),
      ];
    const age = each.at ? daysBetween(each.at, facts.today) : 0;
    if (age > facts.rules.affectedAnswerAge)
      return [
        point(
          'affected-unreviewed',
          `The answer for ${name} is ${String(age)} days old: answer again.`,
          where,
        ),
      ];
    return [];
  });
}

function temporary(facts: GateFacts): OpenPoint[] {
  const { brief, class: kind, extensions } = facts.case;
  if (kind !== 'temporary' && !(kind === 'emergency' && brief.ends)) return [];
  const where = placeIn(facts, 'brief', undefined, 'time');
  const asked: [boolean, string][] = [
    [brief.ends !== undefined, 'the day on which it ends'],
    [lengthOf(brief.removal) > 0, 'the steps of its removal'],
    [lengthOf(brief.safeguards) > 0, 'the extra safeguards while it lasts'],
    [brief.owner !== undefined, 'who owns it'],
  ];
  const missing = asked
    .filter(([there]) => !there)
    .map(([, item]) => point('temporary-limit', `A temporary change needs ${item}.`, where));
  const days = brief.ends ? daysBetween(brief.starts ?? facts.today, brief.ends) : 0;
  const max = facts.rules.temporaryMax;
  const rest: OpenPoint[] = [];
  if (days > max)
    rest.push(
      point(
        'temporary-limit',
        `A temporary change may last ${String(max)} days in all, and this one asks for ${String(days)}.`,
        where,
      ),
    );
  if (brief.ends && days < 0)
    rest.push(
      point(
        'temporary-limit',
        'The temporary change ends before it starts: correct one of the two days.',
        where,
      ),
    );
  if (extensions.length > facts.rules.extensionsMax)
    rest.push(
      point(
        'temporary-limit',
        `A temporary change may be extended ${String(facts.rules.extensionsMax)} times, and this one has ${String(extensions.length)} extensions.`,
        where,
      ),
    );
  return [...missing, ...rest];
}

function emergency(facts: GateFacts): OpenPoint[] {
  if (facts.case.class !== 'emergency' || lengthOf(facts.case.brief.substitute) > 0) return [];
  const where = placeIn(facts, 'brief', undefined, 'substitute');
  return facts.documents
    .filter((of) => of.protectionCut !== undefined)
    .map((of) => {
      const how = facts.hidden ? '' : ` (${of.protectionCut ?? ''})`;
      return point(
        'emergency-protection-cut',
        `The emergency change lowers relief capacity of ${of.tag}${how} and names no substitute.`,
        where,
      );
    });
}

/** All that keeps a draft from scenario analysis. */
export function draftPoints(facts: GateFacts): OpenPoint[] {
  return [
    ...described(facts),
    ...peoplePoints(facts),
    ...affected(facts),
    ...temporary(facts),
    ...emergency(facts),
  ];
}
