/* A copy of the invented site for one test file, and its endpoints asked as a signed-in person would. */
import { copyFileSync, mkdtempSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { type APIContext, type APIRoute } from 'astro';
import { type Role } from '@domain/case';
import { type Db, openDatabase } from '@data/connection';
import { findPersonByEmail, rolesOf } from '@data/people';
import { findSiteBySlug } from '@data/site';
import { ensureTemplate } from '../../support/prepare';

export const SITE = 'ketterwold';

/** A database of its own with the invented site. */
export async function seededDatabase(): Promise<Db> {
  const file = join(mkdtempSync(join(tmpdir(), 'setwright-case-')), 'setwright.db');
  copyFileSync(await ensureTemplate('demo'), file);
  return openDatabase(file);
}

/** The person of an address at the site, as the middleware would hand them over. */
async function whoIs(db: Db, email: string): Promise<unknown> {
  const person = await findPersonByEmail(db, email);
  const site = await findSiteBySlug(db, SITE);
  if (!person || !site) throw new Error(`The invented site has no ${email}.`);
  const roles: Role[] = (await rolesOf(db, person.id)).map((one) => one.role);
  const { id, name } = person;
  return { person: { id, name, email }, sites: [{ site, roles }], standsInFor: [] };
}

export type Asked = {
  who?: string;
  params?: Record<string, string>;
  method?: string;
  json?: unknown;
  text?: string;
  form?: readonly (readonly [string, string])[];
  headers?: Record<string, string>;
  site?: string;
};

let keys = 0;

function bodyOf(asked: Asked): { body?: string; type?: string } {
  if (asked.form)
    return {
      body: new URLSearchParams(asked.form.map(([a, b]) => [a, b])).toString(),
      type: 'application/x-www-form-urlencoded',
    };
  if (asked.text !== undefined) return { body: asked.text, type: 'application/json' };
  return asked.json === undefined ? {} : { body: JSON.stringify(asked.json), type: 'application/json' };
}

/** Asks an endpoint. A form is posted as the script of the pages posts it. */
export async function ask(db: Db, route: APIRoute, asked: Asked): Promise<Response> {
  keys += 1;
  const { body, type } = bodyOf(asked);
  const headers = {
    'Idempotency-Key': `case-edit-test-${String(keys)}`,
    Accept: 'application/problem+json',
    ...(type ? { 'Content-Type': type } : {}),
    ...asked.headers,
  };
  const url = new URL(`http://localhost/api/v1/sites/${SITE}/cases`);
  const method = asked.method ?? (body === undefined ? 'GET' : 'POST');
  const context = {
    request: new Request(url, { method, headers, ...(body === undefined ? {} : { body }) }),
    url,
    params: { site: asked.site ?? SITE, ...asked.params },
    locals: {
      db,
      clock: () => new Date(),
      config: { baseUrl: 'https://setwright.example' },
      requestId: 'test',
      who: asked.who === undefined ? undefined : await whoIs(db, `${asked.who}@ketterwold.example`),
    },
  };
  return route(context as unknown as APIContext) as Promise<Response>;
}

/** The body of an answer, loosely typed. */
export async function told(response: Response): Promise<Record<string, unknown>> {
  return (await response.json()) as Record<string, unknown>;
}
