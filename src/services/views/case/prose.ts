/* A person's text as a page shows it: its live figures with what they say today, or without any figure for a reader whose view is hidden. */
import { type Rich } from '@domain/text';
import { figureMoved, figuresIn, richFromText } from '@domain/text';
import { maskProse, maskRich } from '@domain/hidden';
import { sheetLabel } from '@domain/projections';
import { formatQuantity } from '@engine/quantity';
import { type CaseDocumentFile } from '../../case-file';
import { presentFigure } from '../../stale';
import { type OpenedCase } from './open';

/** A live figure of a text, by its path and side: as the text says it, and what stands there now where that is something else. */
export type ProseFigure = {
  path: string;
  side: string;
  doc: string;
  text: string;
  sheet?: string;
  href?: string;
  now?: string;
};
export type Prose = { rich: Rich; figures: ProseFigure[] };

/** The address below which the parts of a case lie. */
export function baseOf(of: OpenedCase): string {
  return `/s/${of.file.site.slug}/cases/${of.file.row.number}`;
}

/** The address of one sheet of a case. */
export function sheetHref(of: OpenedCase, one: CaseDocumentFile, key: string): string {
  const query = of.file.documents.length > 1 ? `?system=${encodeURIComponent(one.document.tag)}` : '';
  return `${baseOf(of)}/sheets/${encodeURIComponent(key)}${query}`;
}

function sheetTitled(one: CaseDocumentFile, key: string): string {
  const stands = one.after ?? one.before;
  return stands ? sheetLabel(stands.body, key) : key;
}

/** A text of a case or of one of its systems. */
export function proseOf(of: OpenedCase, rich: Rich | undefined, one?: CaseDocumentFile): Prose {
  const text = rich ?? richFromText('');
  if (of.hidden) return { rich: maskRich(text), figures: [] };
  const figures = figuresIn(text).map((node): ProseFigure => {
    const { doc, path, affirmed, decimals } = node.attrs;
    const own = doc === 'this' ? one : of.file.documents.find((each) => each.document.id === doc);
    const truth = node.attrs.side === 'base' ? own?.before : own?.after;
    const present = truth && presentFigure(truth, node);
    const moved = truth !== undefined && figureMoved(node, present);
    const key = /^sheets\/(.+)#/.exec(path)?.[1];
    const now = typeof present === 'object' ? formatQuantity(present) : (present ?? 'nothing');
    return {
      path,
      side: node.attrs.side,
      doc,
      text: formatQuantity(affirmed, decimals === undefined ? {} : { decimals }),
      ...(key !== undefined && own
        ? { sheet: `sheet “${sheetTitled(own, key)}”`, href: sheetHref(of, own, key) }
        : {}),
      ...(moved ? { now } : {}),
    };
  });
  return { rich: text, figures };
}

/** A plain text with its figures taken out for a reader whose view is hidden. */
export function plainOf(of: Pick<OpenedCase, 'hidden'>, text: string): string {
  return of.hidden ? maskProse(text) : text;
}
