/* The parts of the Content-Security-Policy that never change; astro.config.mjs and the middleware both read them. */

/** Everything but scripts and styles, whose hashes Astro adds page by page. */
export const POLICY = [
  "default-src 'none'",
  "base-uri 'none'",
  "connect-src 'self'",
  "font-src 'self'",
  "form-action 'self'",
  "frame-ancestors 'none'",
  "img-src 'self' data: blob:",
  "manifest-src 'self'",
  "object-src 'none'",
  "worker-src 'self'",
];
