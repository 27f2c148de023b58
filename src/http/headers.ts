/* Security headers of every answer, pages, interface and assets alike. */
import { POLICY } from './policy.mjs';

/** Headers that never depend on the answer. */
export const SECURITY_HEADERS: Readonly<Record<string, string>> = {
  'X-Content-Type-Options': 'nosniff',
  'X-Frame-Options': 'DENY',
  'Referrer-Policy': 'same-origin',
  'Cross-Origin-Opener-Policy': 'same-origin',
  'Cross-Origin-Resource-Policy': 'same-origin',
  'Permissions-Policy': 'camera=(self), geolocation=(), microphone=(), payment=(), usb=()',
};

const STRICT = [...POLICY, "script-src 'self'", "style-src 'self'"].join('; ');
/** Rendered formulas and server-made SVG position their parts by style attributes; a style sheet or element still needs its hash. */
const STYLE_ATTRIBUTES = "style-src-attr 'unsafe-inline'";

/** The policy of one answer: Astro's, which carries the hashes of its island bootstrap, else the one that allows no inline script at all. */
export function contentPolicy(fromAstro: string | null): string {
  return `${(fromAstro ?? STRICT).replace(/;\s*$/, '')}; ${STYLE_ATTRIBUTES}`;
}

/** Sets the security headers on an answer. Anything that is not an asset is kept by no cache. */
export function secureHeaders(headers: Headers, secure: boolean): void {
  for (const [name, value] of Object.entries(SECURITY_HEADERS)) headers.set(name, value);
  headers.set('Content-Security-Policy', contentPolicy(headers.get('Content-Security-Policy')));
  if (secure) headers.set('Strict-Transport-Security', 'max-age=31536000');
  if (!headers.has('Cache-Control')) headers.set('Cache-Control', 'no-store');
}
