/* A request context for tests of the HTTP helpers: what a page or an endpoint would hand over. */
import { type Context } from '@/http';

export type Given = { method?: string; headers?: Record<string, string>; body?: BodyInit };

/** Makes a context; `rewritten` tells where a refused form was sent. */
export function contextOf({ method = 'POST', headers = {}, body }: Given): Context & { rewritten: string[] } {
  const rewritten: string[] = [];
  return {
    request: new Request('http://localhost/api/v1/things', { method, headers, body: body ?? null }),
    url: new URL('http://localhost/api/v1/things'),
    locals: { requestId: 'abc' } as App.Locals,
    rewritten,
    rewrite: (to) => {
      rewritten.push(to instanceof Request ? `${to.method} ${new URL(to.url).pathname}` : String(to));
      return Promise.resolve(new Response('page', { status: 409 }));
    },
  };
}

export const JSON_TYPE = { 'Content-Type': 'application/json' };
export const FORM_TYPE = { 'Content-Type': 'application/x-www-form-urlencoded' };
