/* Numbers and units as they stand in the TeX of a sheet. */

/** A number in TeX: six significant digits, thousands by a thin space, powers of ten written out. */
export function texNumber(value: number): string {
  if (value === 0) return '0';
  const size = Math.abs(value);
  if (size >= 1e9 || size < 1e-4) {
    const [mantissa = '0', exponent = '0'] = value.toExponential(4).split('e');
    return `${Number(mantissa)}\\times 10^{${Number(exponent)}}`;
  }
  const digits = Math.max(0, 5 - Math.floor(Math.log10(size)));
  const [whole = '0', fraction] = String(Number(value.toFixed(digits))).split('.');
  const grouped = whole.replace(/\B(?=(\d{3})+$)/g, '\\,');
  return fraction === undefined ? grouped : `${grouped}.${fraction}`;
}
