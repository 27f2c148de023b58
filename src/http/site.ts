/* From a request below /s/{site} to who acts there: the site, the roles, the context of the services. */
import { type APIContext } from 'astro';
import { type z } from 'zod';
import { fail, ok, type Result } from '@domain/result';
import { rolesAt } from '@auth/index';
import { type Actor, type Ctx } from '@services/context';
import { type Write } from '@services/one-act';
import { readBody } from './body';
import { onceFrom, versionFrom } from './conditional';
import { type Context } from './context';

type Asks = Pick<APIContext, 'locals' | 'params'>;

/** What the services need of this request. */
export function ctxOf({ locals }: Pick<APIContext, 'locals'>): Ctx {
  return { db: locals.db, now: locals.clock, baseUrl: locals.config.baseUrl };
}

/**
 * The person of a request acting at the site of its address. UNKNOWN for a site that does not exist and for one where
 * they have no role: a stranger learns nothing of it.
 */
export function siteActor(context: Asks): Result<{ ctx: Ctx; actor: Actor }> {
  const { who } = context.locals;
  if (!who) return fail('SIGN_IN', 'You are not signed in, or no longer. Sign in and send this again.');
  const slug = context.params['site'] ?? '';
  const roles = rolesAt(who, slug);
  const site = who.sites.find((one) => one.site.slug === slug)?.site;
  if (!site || roles.length === 0)
    return fail('UNKNOWN', 'There is no such site, or none where you have a role.');
  const { id, name, email } = who.person;
  const standsFor = who.standsInFor.filter((one) => one.siteId === site.id).map((one) => one.fromId);
  return ok({ ctx: ctxOf(context), actor: { person: { id, name, email }, site, roles, standsFor } });
}

/**
 * What a request sends to write, for a service that judges the asker first. `kind` is the kind of thing whose version it
 * carries (`case`, `revision`, `person` …).
 */
export async function writeOf<S extends z.ZodType>(
  context: Context,
  schema: S,
  kind: string,
): Promise<Write<z.output<S>>> {
  const body = await readBody(context, schema);
  return { body, version: versionFrom(context, kind), once: onceFrom(context) };
}
