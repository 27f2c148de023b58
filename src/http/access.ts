/* Which routes a visitor who is not signed in may see. Everything that is not named here is denied. */

const PUBLIC = new Set([
  '/sign-in',
  '/first-coordinator',
  '/invite/[token]',
  '/health',
  '/403',
  '/404',
  '/500',
  '/problem',
  '/favicon.ico',
]);
const PUBLIC_POSTS = new Set(['/api/v1/session', '/api/v1/first-coordinator', '/api/v1/invite']);
const CATCHER = new Set(['/mail', '/mail/message', '/mail/messages.json']);

/** A route as Astro matched it (`/s/[site]/cases/[number]`): never the text of the address, which can be written in many ways. */
export type Route = { pattern: string; method: string };

/**
 * True when the route is served without a sign-in.
 * @param catcherOpen the mail catcher runs and only this machine reaches the server
 */
export function isPublic({ pattern, method }: Route, catcherOpen: boolean): boolean {
  if (PUBLIC.has(pattern)) return true;
  if (PUBLIC_POSTS.has(pattern)) return method === 'POST';
  return catcherOpen && CATCHER.has(pattern);
}
