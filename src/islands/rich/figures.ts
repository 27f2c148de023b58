/* The figures that may stand in a text: what the page offers, and what a live figure of the text says beside them. */
import { formatQuantity, type Q } from '@engine/quantity';
import { figureMoved, type FigureNode } from '@domain/text/read';

/** One figure that the page offers. `doc` and `side` default to the document at hand. */
export type OfferedFigure = {
  path: string;
  label: string;
  value: Q;
  doc?: string;
  side?: 'this' | 'base';
  decimals?: number;
};

type Attrs = FigureNode['attrs'];

function isOffered(value: unknown): value is OfferedFigure {
  if (typeof value !== 'object' || value === null) return false;
  const { path, label, value: q } = value as Partial<Record<keyof OfferedFigure, unknown>>;
  if (typeof path !== 'string' || typeof label !== 'string' || typeof q !== 'object' || q === null)
    return false;
  return 'value' in q && typeof q.value === 'number' && 'unit' in q && typeof q.unit === 'string';
}

/** The figures offered by a `data-figures` attribute; what is not a figure is left out. */
export function offeredIn(json: string | undefined): OfferedFigure[] {
  if (!json) return [];
  try {
    const list: unknown = JSON.parse(json);
    return Array.isArray(list) ? list.filter(isOffered) : [];
  } catch {
    return [];
  }
}

/** The attributes of a live figure that affirms what is offered now. */
export function affirm(offered: OfferedFigure): Attrs {
  const { doc = 'this', side = 'this', path, decimals, value } = offered;
  const affirmed = { value: value.value, unit: value.unit };
  return { doc, side, path, affirmed, ...(decimals === undefined ? {} : { decimals }) };
}

/** How a figure reads in the text. */
export function figureText({ affirmed, decimals }: Attrs): string {
  return formatQuantity(affirmed, decimals === undefined ? {} : { decimals });
}

/** The offered figure that a live figure follows, if the page offers it. */
export function offeredFor(attrs: Attrs, offered: readonly OfferedFigure[]): OfferedFigure | undefined {
  return offered.find(
    (one) =>
      one.path === attrs.path &&
      (one.side ?? 'this') === attrs.side &&
      ((one.doc ?? 'this') === attrs.doc || attrs.doc === 'this' || one.doc === undefined),
  );
}

/** The offered figure when the text says another value than it; nothing while they agree or when it is not offered. */
export function movedTo(attrs: Attrs, offered: readonly OfferedFigure[]): OfferedFigure | undefined {
  const present = offeredFor(attrs, offered);
  return present && figureMoved({ type: 'figure', attrs }, present.value) ? present : undefined;
}
