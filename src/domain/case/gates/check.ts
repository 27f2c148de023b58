/* Gate of the calculation check: the unseen check is complete and agrees, every changed sheet is agreed, nothing moved. */
import { type OpenPoint } from '@domain/result';
import { agreementPoints } from '../agreements';
import { type DocumentFacts, type GateFacts, nameOf, placeIn, point } from '../gate-facts';
import { unseenPoints } from '../unseen-points';
import { outcomePoints } from './outcomes';

/** A system whose base is no longer what stands: another revision was issued or waits to be installed. */
export function movedBasis(of: DocumentFacts, facts: GateFacts): OpenPoint[] {
  const where = placeIn(facts, 'differences', of);
  const points: OpenPoint[] = [];
  if (of.inForce !== undefined && of.inForce !== of.base && of.state !== 'issued')
    points.push(
      point(
        'basis-moved',
        `${of.tag} was issued in another revision after this case began: carry the case over, then check again what it touches.`,
        where,
      ),
    );
  if (of.pendingCase !== undefined && of.state !== 'issued')
    points.push(
      point(
        'basis-moved',
        `${of.tag} has a signed revision of ${of.pendingCase} that waits to be installed: compare with it first.`,
        where,
      ),
    );
  return points;
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
