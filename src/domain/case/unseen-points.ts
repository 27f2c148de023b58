/* Open points of the unseen check: what is not worked yet, and after the reveal what differs and is not reconciled. */
import { type OpenPoint } from '@domain/result';
import { type DocumentFacts, type GateFacts, placeIn, point } from './gate-facts';
import { lengthOf } from './rich-text';
import { unseenDifferences, unseenState } from './unseen';

/** Points of one system. Nothing here tells a figure, nor which sheet governs before the checker has chosen. */
export function unseenPoints(of: DocumentFacts, facts: GateFacts): OpenPoint[] {
  const state = unseenState(of, facts);
  const missing = state.missing.map((item) =>
    point(
      'unseen-check-missing',
      `${item.label} has not been ${item.layer === 'choice' ? 'chosen' : item.layer === 'reading' ? 'read' : 'worked'} by the checker before seeing it.`,
      placeIn(facts, 'unseen', of, item.scope),
    ),
  );
  if (missing.length > 0) return missing;
  if (!state.revealed)
    return [
      point(
        'unseen-check-missing',
        `The unseen check of ${of.tag} is entered: reveal the originator’s figures and compare.`,
        placeIn(facts, 'unseen', of),
      ),
    ];
  return unseenDifferences(of, facts)
    .filter(({ entry, compared }) => !compared.within && lengthOf(entry.reconciled?.text) === 0)
    .map(({ item, compared }) => {
      const sentence = facts.hidden ? `Checker and originator differ on ${item.label}.` : compared.sentence;
      return point(
        'unseen-check-apart',
        `${sentence} Correct it, or reconcile it in writing.`,
        placeIn(facts, 'unseen', of, item.scope),
      );
    });
}
