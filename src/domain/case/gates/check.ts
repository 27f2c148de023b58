/* Gate of the calculation check: the unseen check is complete and agrees, every changed sheet is agreed, nothing moved. */
import { type OpenPoint } from '@domain/result';
import { agreementPoints } from '../agreements';
import { type DocumentFacts, type GateFacts, nameOf, placeIn, point } from '../gate-facts';
import { unseenPoints } from '../unseen-points';
import { outcomePoints } from './outcomes';

/**
 * A system whose base is no longer what is in force: another revision was issued meanwhile. A revision that is signed and
 * waits to be installed is shown, not asked about here: two cases may be approved in one order and installed in the other.
 */
export function movedBasis(of: DocumentFacts, facts: GateFacts): OpenPoint[] {
  if (of.inForce === undefined || of.inForce === of.base || of.state === 'issued') return [];
  return [
    point(
      'basis-moved',
      `${of.tag} was issued in another revision after this case began: carry the case over, then check again what it touches.`,
      placeIn(facts, 'differences', of),
    ),
  ];
}

/** Findings that must be settled first. */
export function findingPoints(facts: GateFacts): OpenPoint[] {
  return facts.findings
    .filter((finding) => finding.weight === 'must-fix' && finding.state !== 'closed')
    .map((finding) => {
      const waits =
        finding.state === 'open'
          ? 'it waits for an answer'
          : `it waits for ${nameOf(facts, finding.successor ?? finding.raisedBy)} to close it`;
      const where = placeIn(facts, 'findings', undefined, String(finding.number));
      return point(
        'finding-open',
        `Finding ${String(finding.number)} must be settled first: ${waits}.`,
        where,
      );
    });
}

/** All that keeps the calculation check from approval. */
export function checkPoints(facts: GateFacts): OpenPoint[] {
  const open = facts.documents.filter((of) => of.state !== 'dropped');
  return [
    ...open.flatMap((of) => movedBasis(of, facts)),
    ...open.flatMap((of) => unseenPoints(of, facts)),
    ...open.flatMap((of) => agreementPoints(of, facts)),
    ...findingPoints(facts),
    ...open.flatMap((of) => outcomePoints('check', of, facts)),
  ];
}
