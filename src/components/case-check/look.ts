/* How the live figures of a projected text are looked up when it is rendered. */
import { type Prose } from '@services/views/case/prose';
import { type RichLook } from '../text/rich';

/** The look of one or more texts shown together. */
export function lookOf(...texts: Prose[]): RichLook {
  const figures = texts.flatMap((text) => text.figures);
  return {
    figure: (attrs) => {
      const found = figures.find((one) => one.path === attrs['path']);
      if (!found) return undefined;
      const { path: _path, ...figure } = found;
      return figure;
    },
  };
}
