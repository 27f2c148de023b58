/* What every service needs: the database, the clock, where we are reached, and who asks. */
import { type Role, type Who } from '@domain/case';
import { dayIn } from '@domain/dates';
import { type Db } from '@data/connection';
import { type SiteRow } from '@data/tables/people';

/** The outside world of a service. `now` is injected so that tests decide what day it is; `baseUrl` is where links of notices lead. */
export type Ctx = { db: Db; now: () => Date; baseUrl: string };

/** A person acting at one site: roles there, and the people they stand in for today. */
export type Actor = {
  person: { id: string; name: string; email: string };
  site: SiteRow;
  roles: readonly Role[];
  standsFor: readonly string[];
};

/** The actor as the table of permissions reads them. */
export function whoOf(actor: Actor): Who {
  return { id: actor.person.id, roles: actor.roles, standsFor: actor.standsFor };
}

/** The present instant as it stands in the database: UTC, ISO text with milliseconds. */
export function instant(ctx: Ctx): string {
  return ctx.now().toISOString();
}

/** Today at a site, `2026-03-16`: a day turns at midnight of the site, not of the server. */
export function today(ctx: Ctx, site: Pick<SiteRow, 'timeZone'>): string {
  return dayIn(instant(ctx), site.timeZone);
}
