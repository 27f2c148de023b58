/* Live figures in texts that no longer show what the evaluation gives. */
import { getAt, quantityOf, type Basis } from '@domain/basis';
import { type Brief } from '@domain/case';
import { figureMoved, figuresIn, type FigureNode, type Rich } from '@domain/text';
import { type Q } from '@engine/quantity';
import { type Evaluated } from './evaluate-document';

type Place = { path: string; text: Rich };

/** Every text of a basis that may hold live figures, with its place. */
export function textsOf(body: Basis): Place[] {
  return [
    { path: 'boundary', text: body.boundary.text },
    ...body.scenarios.map((one) => ({ path: `scenarios/${one.id}`, text: one.reason })),
    ...body.assumptions.map((one) => ({ path: `assumptions/${one.id}`, text: one.text })),
    ...body.justifications.map((one) => ({ path: `justifications/${one.id}`, text: one.text })),
    ...body.once.map((one) => ({ path: `once/${one.id}`, text: one.answer })),
  ];
}

/** What a live figure shows today: a result by its path, or a figure of the document itself. */
export function presentFigure(evaluated: Evaluated, node: FigureNode): Q | string | undefined {
  const result = evaluated.evaluation.figures[node.attrs.path];
  if (result !== undefined) return result;
  const value = getAt(evaluated.body, node.attrs.path);
  if (typeof value === 'string') return value;
  if (typeof value !== 'object' || value === null || !('value' in value)) return undefined;
  return quantityOf(value as Parameters<typeof quantityOf>[0]);
}

function staleIn(evaluated: Evaluated, place: Place): { path: string; sentence: string }[] {
  return figuresIn(place.text)
    .filter(
      (node) =>
        (node.attrs.doc === 'this' || node.attrs.doc === evaluated.body.id) && node.attrs.side === 'this',
    )
    .filter((node) => figureMoved(node, presentFigure(evaluated, node)))
    .map((node) => ({
      path: place.path,
      sentence: `A live figure in this text (${node.attrs.path}) has moved since the text was affirmed: read the text again, then affirm the figure.`,
    }));
}

/** The stale live figures of a basis and of the brief of its case. */
export function staleFigures(evaluated: Evaluated, brief: Brief): { path: string; sentence: string }[] {
  const own = [brief.whatChanges, brief.technicalBasis, brief.effect].map((text) => ({
    path: 'brief',
    text: text as Rich,
  }));
  return [...textsOf(evaluated.body), ...own].flatMap((place) => staleIn(evaluated, place));
}
