/* How numbers and quantities are printed: thin-space thousands, a true minus, sensible digits. */
import { type Q } from './types';
import { unitLabel } from './convert';

const THIN_SPACE = '\u2009';
const MINUS = '\u2212';
const SIGNIFICANT = 4;

function sensibleDecimals(value: number): number {
  const size = Math.abs(value);
  if (size === 0 || size >= 1000) return 0;
  return Math.min(8, Math.max(0, SIGNIFICANT - 1 - Math.floor(Math.log10(size))));
}

/**
 * A number for readers: thousands by thin space (U+2009), minus U+2212. Without `decimals`, four significant
 * digits (whole numbers from 1 000 up) with needless zeros dropped.
 */
export function formatNumber(value: number, decimals?: number): string {
  if (!Number.isFinite(value)) return value > 0 ? '∞' : value < 0 ? `${MINUS}∞` : '–';
  let fixed = Math.abs(value).toFixed(decimals ?? sensibleDecimals(value));
  if (decimals === undefined && fixed.includes('.')) fixed = fixed.replace(/\.?0+$/, '');
  const [whole = '0', fraction] = fixed.split('.');
  const grouped = whole.replace(/\B(?=(\d{3})+$)/g, THIN_SPACE);
  const negative = value < 0 && /[1-9]/.test(fixed);
  return `${negative ? MINUS : ''}${grouped}${fraction === undefined ? '' : `.${fraction}`}`;
}

/** A quantity for readers: "12.50 barg", "1 234 kg/h", "0.975". */
export function formatQuantity(q: Q, opts: { decimals?: number } = {}): string {
  const label = unitLabel(q.unit);
  const space = label === '°' ? '' : ' ';
  return `${formatNumber(q.value, opts.decimals)}${label === '' ? '' : space + label}`;
}
