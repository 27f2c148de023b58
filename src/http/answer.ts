/* Turns what a service answers into HTTP: JSON for programs, 303 or a page with what was typed for a form. */
import { type APIRoute } from 'astro';
import { fail, type Problem, type Result } from '@domain/result';
import { readSent } from './body';
import { type Context } from './context';
import { problemResponse } from './problem';

export type AnswerOptions = {
  /** Status of a success, 200 unless given; 201 for something made. */
  status?: number;
  headers?: Record<string, string>;
  /** Where a form goes on to; the form's own `_back` comes first. */
  back?: string;
  /** The page that shows a refusal to a form, instead of `/problem`: it finds it at `locals.problem`, what was typed at `locals.sent`. */
  page?: string;
};

/** A link of ours as it stands, anything else (another site, a script) as the start page. */
export function localPath(path: string | null | undefined, otherwise = '/'): string {
  const here = 'http://here.invalid';
  if (path == null || !path.startsWith('/') || !URL.canParse(path, here)) return otherwise;
  const url = new URL(path, here);
  return url.origin === here && !url.pathname.startsWith('//')
    ? `${url.pathname}${url.search}${url.hash}`
    : otherwise;
}

/** A success as JSON, kept by no cache. */
export function json(value: unknown, options: AnswerOptions = {}): Response {
  const status = options.status ?? 200;
  const body = status === 204 ? null : JSON.stringify(value ?? null);
  return new Response(body, {
    status,
    headers: {
      'Content-Type': 'application/json; charset=utf-8',
      'Cache-Control': 'no-store',
      ...options.headers,
    },
  });
}

/** Where the browser goes next after a form. */
export function seeOther(path: string, headers: Record<string, string> = {}): Response {
  return new Response(null, {
    status: 303,
    headers: { Location: localPath(path), 'Cache-Control': 'no-store', ...headers },
  });
}

/** True for a form posted by src/scripts/act-form.ts, which shows a refusal itself and goes on by itself. */
function byScript(context: Context): boolean {
  return (context.request.headers.get('accept') ?? '').includes('application/problem+json');
}

/** A refusal: problem details for a program; for a form a page (src/pages/problem.astro) which keeps what was typed in view. */
export function refuse(context: Context, problem: Problem, page = '/problem'): Response | Promise<Response> {
  if (context.locals.sent?.form !== true || byScript(context))
    return problemResponse(problem, context.locals.requestId);
  context.locals.problem = problem;
  const { accept, cookie, host, referer } = Object.fromEntries(context.request.headers);
  const headers = Object.entries({ accept, cookie, host, referer }).filter(
    (entry): entry is [string, string] => entry[1] !== undefined,
  );
  return context.rewrite(new Request(new URL(page, context.url), { headers }));
}

/** Answers a result in the way that the request was made. Call it after the body was read. */
export function answer(
  context: Context,
  result: Result<unknown>,
  options: AnswerOptions = {},
): Response | Promise<Response> {
  if (!result.ok) return refuse(context, result.problem, options.page);
  const sent = context.locals.sent;
  if (sent?.form !== true) return json(result.value, options);
  const next = localPath(sent.back ?? options.back);
  return byScript(context)
    ? json({ next }, { headers: options.headers ?? {} })
    : seeOther(next, options.headers);
}

/** A POST that lets a form reach the other methods of a route by its field `_method`. */
export function viaForm(methods: Record<string, APIRoute>): APIRoute {
  return async (context) => {
    const sent = await readSent(context);
    if (!sent.ok) return refuse(context, sent.problem);
    const method = methods[sent.value.method ?? 'POST'];
    if (method) return method(context);
    return refuse(context, {
      ...fail('MALFORMED', `This address takes ${Object.keys(methods).join(', ')} as _method.`).problem,
    });
  };
}
