/* Draws seen, signed and tolerance of a field entry on one line, to scale. */
import { formatNumber } from '@engine/quantity';
import { escapeText, path, px, text } from '../pictures/draw';

/** All in one unit. */
export type Gap = {
  seen: number;
  signed: number;
  /** Half width of the tolerance. */
  tolerance: number;
  /** "± 3 %". */
  toleranceWords: string;
  decimals?: number;
};

const WIDTH = 358;

/** The signed value in the middle, the tolerance as a dashed box, what is seen as an oxide line with a ring. */
export function gapPicture({ seen, signed, tolerance, toleranceWords, decimals = 1 }: Gap): string {
  const reach = Math.max(Math.abs(seen - signed), tolerance, Math.abs(signed) * 1e-6) * 1.3;
  const x = (value: number) => px(WIDTH / 2 + ((value - signed) / reach) * (WIDTH / 2 - 24));
  const [from, to, at, mid] = [x(signed - tolerance), x(signed + tolerance), x(seen), x(signed)];
  const near = Math.abs(at - mid) < 34;
  const drawn = [
    path('ax', `M1 27H${WIDTH - 1}`),
    tolerance > 0 ? path('tol', `M${from} 19H${to}V35H${from}Z`) : '',
    path('ap', `M${mid} 14V40`),
    path('se', `M${at} 14V40M${px(at - 5)} 27a5 5 0 1 0 10 0a5 5 0 1 0 -10 0`),
    text('', at, near ? 46 : 9, formatNumber(seen, decimals), 'middle'),
    text('', mid, 9, formatNumber(signed, decimals), 'middle'),
    tolerance > 0 ? text('', Math.max(to, mid + 60), 13, toleranceWords, 'end') : '',
  ];
  const said = `seen ${formatNumber(seen, decimals)}, signed ${formatNumber(signed, decimals)}, tolerance ${toleranceWords}`;
  return `<svg class="f-gap" viewBox="0 0 ${WIDTH} 46" role="img" aria-label="${escapeText(said)}">${drawn.join('')}</svg>`;
}
