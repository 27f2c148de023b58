/* Gate of the approval: the check stands, approvers are named, what failed before has an owner. */
import { type OpenPoint } from '@domain/result';
import { type GateFacts, placeIn, point } from '../gate-facts';
import { deficiencyPoints, outcomePoints } from './outcomes';

/**
 * Signatures of earlier gates that no longer bind what stands now. The check's is asked for, not the scenario analysis's: a
 * clean carry-over goes back to the check alone, whose signature binds everything that the earlier one did.
 */
export function voidedPoints(facts: GateFacts, gates: readonly string[]): OpenPoint[] {
  return gates
    .filter((gate) => !facts.signatures.some((signature) => signature.gate === gate && signature.valid))
    .map((gate) =>
      point(
        'signature-void',
        `The signature of the gate ${gate} no longer binds what stands here: that gate must be passed again.`,
        placeIn(facts, 'summary'),
      ),
    );
}

/** People in seats as approver who have not signed yet; the site rules ask for a number of them. */
export function missingApprovers(facts: GateFacts): { asked: number; named: number; unsigned: string[] } {
  const seats = facts.case.seats.filter((seat) => seat.role === 'approver' && !seat.until);
  const unsigned = seats
    .filter(
      (seat) =>
        !facts.signatures.some(
          (each) => each.gate === 'approval' && each.valid && (each.for ?? each.person) === seat.person,
        ),
    )
    .map((seat) => seat.person);
  return { asked: facts.rules.approvers, named: seats.length, unsigned };
}

function approvers(facts: GateFacts): OpenPoint[] {
  const { asked, named } = missingApprovers(facts);
  if (named >= asked) return [];
  const sentence = `The site asks for ${String(asked)} approvers and ${String(named)} ${named === 1 ? 'is' : 'are'} nominated.`;
  return [point('approver-missing', sentence, placeIn(facts, 'brief', undefined, 'people'))];
}

function emergency(facts: GateFacts): OpenPoint[] {
  const { authorised } = facts.case;
  if (facts.case.class !== 'emergency' || authorised?.how !== 'spoken') return [];
  return [
    point(
      'authorisation-unconfirmed',
      'The spoken authorisation is not confirmed by signature yet.',
      placeIn(facts, 'brief', undefined, 'authorisation'),
    ),
  ];
}

/** All that keeps the approval from being signed. */
export function approvalPoints(facts: GateFacts): OpenPoint[] {
  const open = facts.documents.filter((of) => of.state !== 'dropped');
  return [
    ...voidedPoints(facts, ['check']),
    ...approvers(facts),
    ...emergency(facts),
    ...open.flatMap((of) => [...deficiencyPoints(of, facts, false), ...outcomePoints('approval', of, facts)]),
  ];
}
