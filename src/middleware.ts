/* Every request passes here: request id, origin check, deny by default, errors told as problems, security headers, one log line. */
import { type APIContext, type MiddlewareNext } from 'astro';
import { defineMiddleware } from 'astro:middleware';
import { whoAsks } from '@auth/index';
import { nobodyYet } from '@data/people';
import { isPublic } from './http/access';
import { refuse } from './http/answer';
import { readSent } from './http/body';
import { secureHeaders } from './http/headers';
import { keptPage } from './http/kept-pages';
import { comesFromHere, isUnsafe } from './http/origin';
import { problemResponse } from './http/problem';
import { newRequestId } from './http/request-id';
import { unexpected } from './http/unexpected';
import { currentRuntime, type Runtime } from './runtime';

const FOREIGN =
  'This request was started by another site, so nothing was done. Open the page here and do it again from there.';

function isApi(context: APIContext): boolean {
  return context.url.pathname.startsWith('/api/');
}

/** Puts what every page and endpoint needs into `locals`. */
async function prepare(context: APIContext, runtime: Runtime): Promise<void> {
  const { locals } = context;
  locals.requestId = newRequestId();
  locals.db = runtime.db;
  locals.auth = runtime.auth;
  locals.config = runtime.config;
  locals.clock = runtime.clock;
  locals.catcher = runtime.catcher;
  locals.version = runtime.version;
  locals.log = runtime.log.child({ id: locals.requestId });
  locals.who = (await whoAsks(runtime.auth, context.request.headers.get('cookie'))) ?? undefined;
}

/** A visitor who is not signed in: programs are told, a form keeps what was typed, a page goes to the sign-in and comes back. */
async function deny(context: APIContext): Promise<Response> {
  if (!isApi(context)) {
    if (await nobodyYet(context.locals.db)) return context.redirect('/first-coordinator', 303);
    const next = isUnsafe(context.request.method) ? '/' : `${context.url.pathname}${context.url.search}`;
    return context.redirect(next === '/' ? '/sign-in' : `/sign-in?next=${encodeURIComponent(next)}`, 303);
  }
  if ((context.request.headers.get('content-type') ?? '').includes('form')) await readSent(context);
  return refuse(context, {
    code: 'SIGN_IN',
    detail: 'You are not signed in, or no longer. Sign in and send this again.',
  });
}

/** Answers of Astro without a body (unknown address, method that a route does not take) become problems for programs; a page told to a form stays. */
function toldAsProblem(context: APIContext, response: Response): Response {
  if (context.locals.problem) return response;
  if (!isApi(context) || response.status !== 404 || response.headers.get('content-type')?.includes('json'))
    return response;
  const detail = `There is nothing here that answers ${context.request.method} ${context.url.pathname.slice(0, 200)}.`;
  return problemResponse({ code: 'UNKNOWN', detail }, context.locals.requestId);
}

async function serve(context: APIContext, next: MiddlewareNext, runtime: Runtime): Promise<Response> {
  await prepare(context, runtime);
  const { request, locals, routePattern, url } = context;
  if (isUnsafe(request.method) && !comesFromHere(request.headers)) {
    return problemResponse({ code: 'NOT_PERMITTED', detail: FOREIGN }, locals.requestId);
  }
  const catcherOpen = runtime.catcher !== undefined && runtime.config.loopback;
  // An unknown address of the interface tells a stranger nothing, not even that it is unknown.
  const pattern = isApi(context) && routePattern === '/404' ? url.pathname : routePattern;
  if (!locals.who && !isPublic({ pattern, method: request.method }, catcherOpen)) return deny(context);
  return toldAsProblem(context, await keptPage(context, next));
}

/** One line a request; an address whose route holds a secret is logged as its route. */
function logRequest(context: APIContext, status: number, started: number): void {
  const { request, routePattern, url, locals } = context;
  const path = /secret|token/.test(routePattern) ? routePattern : url.pathname;
  const ms = Math.round((performance.now() - started) * 10) / 10;
  const level = status >= 500 ? 'error' : routePattern === '/health' ? 'debug' : 'info';
  locals.log[level]({ method: request.method, path, status, ms, person: locals.who?.person.id }, 'request');
}

async function served(context: APIContext, next: MiddlewareNext, runtime: Runtime): Promise<Response> {
  try {
    return await serve(context, next, runtime);
  } catch (error) {
    return unexpected(context, error, isApi(context));
  }
}

export const onRequest = defineMiddleware(async (context, next) => {
  // A rewrite (to the problem page, to the page of an error) comes through here again within the same request.
  if ((context.locals as Partial<App.Locals>).requestId !== undefined) return next();
  const started = performance.now();
  const runtime = await currentRuntime();
  const response = await served(context, next, runtime);
  if (!import.meta.env.DEV) secureHeaders(response.headers, runtime.config.secure);
  response.headers.set('X-Request-Id', context.locals.requestId);
  response.headers.delete('X-Astro-Rewrite');
  const renewed = context.locals.who?.renewed;
  if (renewed && !response.headers.has('Set-Cookie')) response.headers.append('Set-Cookie', renewed);
  logRequest(context, response.status, started);
  return response;
});
