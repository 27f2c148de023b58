/* Two figures that a reader compares: printed with as many digits as it takes to see that they differ. */
import { formatNumber, formatQuantity, type Q, unitLabel } from '@engine/quantity';

const MOST_DIGITS = 9;
export const SAME_WITHIN_ROUNDING = 'same within rounding';

function withDigits(q: Q, digits: number): string {
  const size = Math.abs(q.value);
  const before = size === 0 ? 1 : Math.floor(Math.log10(size)) + 1;
  const label = unitLabel(q.unit);
  return `${formatNumber(q.value, Math.max(0, digits - before))}${label === '' ? '' : `\u00a0${label}`}`;
}

/** Both figures in words; the second is "same within rounding" where nine digits do not tell them apart. */
export function toldApart(one: Q, two: Q): [string, string] {
  const plain: [string, string] = [formatQuantity(one), formatQuantity(two)];
  if (plain[0] !== plain[1]) return plain;
  for (let digits = 5; digits <= MOST_DIGITS; digits += 1) {
    const more: [string, string] = [withDigits(one, digits), withDigits(two, digits)];
    if (more[0] !== more[1]) return more;
  }
  return [plain[0], SAME_WITHIN_ROUNDING];
}
