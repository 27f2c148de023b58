/* Numbers and units as they stand in the TeX of a sheet. */

/** Significant digits of a printed number; whole numbers keep all theirs. */
const DIGITS = 6;
const POWERS = [1, 10, 100, 1e3, 1e4, 1e5, 1e6, 1e7, 1e8, 1e9] as const;
const THIN_SPACE = '\\,';

/** Decimals with which a number from 1e-4 to 1e9 shows its significant digits. */
function decimalsOf(size: number): number {
  let decimals = DIGITS - 1;
  if (size >= 1) for (let limit = 10; size >= limit && decimals > 0; limit *= 10) decimals -= 1;
  else for (let limit = 1; size < limit && decimals < 9; limit /= 10) decimals += 1;
  return decimals;
}

/** A whole number with its thousands set apart. */
function grouped(whole: number): string {
  if (whole < 1000) return String(whole);
  const head = Math.floor(whole / 1000);
  const tail = whole - head * 1000;
  return grouped(head) + THIN_SPACE + (tail < 10 ? '00' : tail < 100 ? '0' : '') + String(tail);
}

/**
 * A number in TeX: six significant digits without needless zeros, thousands by a thin space, powers of ten written out.
 * Written by whole-number arithmetic, because a sheet prints dozens and a site has tens of thousands of sheets.
 */
export function texNumber(value: number): string {
  if (value === 0) return '0';
  const size = Math.abs(value);
  if (!(size < 1e9 && size >= 1e-4)) {
    const [mantissa = '0', exponent = '0'] = value.toExponential(4).split('e');
    return `${Number(mantissa)}\\times 10^{${Number(exponent)}}`;
  }
  const decimals = decimalsOf(size);
  const power = POWERS[decimals] ?? 1;
  const scaled = Math.round(size * power);
  const whole = Math.floor(scaled / power);
  let fraction = scaled - whole * power;
  const sign = value < 0 ? '-' : '';
  if (fraction === 0) return sign + grouped(whole);
  let places = decimals;
  for (; fraction % 10 === 0; fraction /= 10) places -= 1;
  const leading = (POWERS[places] ?? 1) + fraction;
  return `${sign}${grouped(whole)}.${String(leading).slice(1)}`;
}
