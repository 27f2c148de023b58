/* Whether a request that writes comes from our own pages. */

const SAFE_METHODS = new Set(['GET', 'HEAD', 'OPTIONS']);

/** True for a method that may write. */
export function isUnsafe(method: string): boolean {
  return !SAFE_METHODS.has(method.toUpperCase());
}

/**
 * True when the browser says that the request starts on our own pages, or was typed by the user. A browser without `Sec-Fetch-Site`
 * must send an `Origin` whose host is the `Host` it talks to. A program that sends neither header is no browser, so no page made it send
 * someone's cookie.
 */
export function comesFromHere(headers: Headers): boolean {
  const site = headers.get('sec-fetch-site');
  if (site !== null) return site === 'same-origin' || site === 'none';
  const origin = headers.get('origin');
  if (origin === null) return true;
  return URL.canParse(origin) && new URL(origin).host === headers.get('host');
}
