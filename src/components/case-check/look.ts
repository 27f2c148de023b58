/* How the live figures of a projected text are looked up when it is rendered. */
import { type Prose } from '@services/views/case/prose';
import { type RichLook } from '../text/rich';

/** The look of one or more texts shown together. */
export function lookOf(...texts: Prose[]): RichLook {
  const figures = texts.flatMap((text) => text.figures);
  return {
    figure: (attrs) => {
      const found = figures.find(
        (one) => one.path === attrs['path'] && one.side === attrs['side'] && one.doc === attrs['doc'],
      );
      if (!found) return undefined;
      const { path: _path, side: _side, doc: _doc, ...figure } = found;
      return figure;
    },
  };
}
