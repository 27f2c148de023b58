/* Pages at hand: what was rendered for one reader a moment ago is sent again while nothing was written, with fresh keys in its forms. */
import { type APIContext, type MiddlewareNext } from 'astro';
import { writesOf } from '@data/version';
import { withFreshKeys } from '@services/form-key';

type Kept = { writes: number; until: number; html: string; headers: [string, string][] };

/** Short, because a page also knows the hour: this carries a rush of readers, it is not an archive. Milliseconds. */
const KEPT_FOR = 10_000;
/** Characters held in all; the oldest pages go first. */
const HELD_AT_MOST = 24_000_000;

const pages = new Map<string, Kept>();
let held = 0;

function drop(key: string): void {
  held -= pages.get(key)?.html.length ?? 0;
  pages.delete(key);
}

function keep(key: string, page: Kept): void {
  drop(key);
  pages.set(key, page);
  held += page.html.length;
  for (const oldest of pages.keys()) {
    if (held <= HELD_AT_MOST) return;
    drop(oldest);
  }
}

/** Whose page this is, in which colours; undefined for what is never kept: other methods, visitors, programs. */
function keyOf({ request, locals, url, cookies }: APIContext): string | undefined {
  if (request.method !== 'GET' || !locals.who || locals.who.renewed || !url.pathname.startsWith('/s/'))
    return undefined;
  const { session, person } = locals.who;
  return JSON.stringify([session.id, person.id, cookies.get('theme')?.value ?? '', url.pathname, url.search]);
}

function answered({ html, headers }: Kept): Response {
  return new Response(withFreshKeys(html), { status: 200, headers });
}

/**
 * Answers a page of a site for the person who asks, from memory when the same person had it less than ten seconds ago and
 * this process has written nothing since. Only whole pages answered 200 are kept; a redirect, a refusal, a file never is.
 */
export async function keptPage(context: APIContext, next: MiddlewareNext): Promise<Response> {
  const key = keyOf(context);
  const writes = writesOf(context.locals.db);
  if (key === undefined || writes < 0) return next();
  const known = pages.get(key);
  if (known && known.writes === writes && known.until > performance.now()) return answered(known);
  const response = await next();
  const isPage =
    response.status === 200 && (response.headers.get('content-type') ?? '').startsWith('text/html');
  if (!isPage || response.headers.has('set-cookie')) return response;
  const page: Kept = {
    writes,
    until: performance.now() + KEPT_FOR,
    html: await response.text(),
    headers: [...response.headers],
  };
  if (writesOf(context.locals.db) === writes) keep(key, page);
  return answered(page);
}
