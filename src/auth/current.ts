/* Who asks: the person behind a cookie, with their sites, roles there, and for whom they stand in. */
import { type Role } from '@domain/case';
import { nowInstant } from '@data/ids';
import { untilNextWrite } from '@data/memo';
import { type DelegationRow, findPerson, type Person, rolesOf, standsInFor } from '@data/people';
import { findSites, type SiteRow } from '@data/site';
import { type Auth } from './auth';
import { hashToken, touchSession } from './session-rows';

export type SiteRoles = { site: SiteRow; roles: Role[] };
export type Current = {
  person: Person;
  sites: SiteRoles[];
  session: { id: string; expiresAt: string; createdAt: string; agent: string };
  /** For whom the person stands in today. */
  standsInFor: DelegationRow[];
  /** A Set-Cookie value when the session was renewed; must never be logged. */
  renewed: string | null;
};

/** How stale the note of a session's last use may be, milliseconds: not every read should write. */
const SEEN_EVERY = 5 * 60_000;

async function sitesOf(auth: Auth, personId: string): Promise<SiteRoles[]> {
  const grants = await rolesOf(auth.db, personId);
  const sites = await findSites(auth.db, [...new Set(grants.map((grant) => grant.siteId))]);
  return sites.map((site) => ({
    site,
    roles: grants.filter((grant) => grant.siteId === site.id).map((grant) => grant.role),
  }));
}

/** How long a session is trusted without a look at its row, seconds: ending one is a write, which is seen at once. */
const TRUSTED_FOR = 20;

async function readPerson(auth: Auth, token: string): Promise<Current | null> {
  const { session } = await auth.lucia.validateSession(hashToken(token));
  const person = session && (await findPerson(auth.db, session.userId));
  if (!person) return null;
  const now = nowInstant();
  if (Date.parse(now) - Date.parse(session.seenAt) > SEEN_EVERY) {
    await touchSession(auth.db, session.id, { seenAt: now });
  }
  return {
    person,
    sites: await sitesOf(auth, person.id),
    session: {
      id: session.id,
      expiresAt: session.expiresAt.toISOString(),
      createdAt: session.createdAt,
      agent: session.agent,
    },
    standsInFor: await standsInFor(auth.db, person.id, now.slice(0, 10)),
    renewed: session.fresh ? auth.lucia.createSessionCookie(token).serialize() : null,
  };
}

/** The person who asks, from the Cookie header; null when no session stands behind it. */
export async function whoAsks(auth: Auth, cookieHeader: string | null | undefined): Promise<Current | null> {
  const token = auth.lucia.readSessionCookie(cookieHeader ?? '');
  if (!token) return null;
  const key = ['who', hashToken(token)];
  const current = await untilNextWrite(auth.db, key, () => readPerson(auth, token), TRUSTED_FOR);
  // What was kept may have run out since, and a renewed cookie is sent once only.
  if (current && Date.parse(current.session.expiresAt) <= Date.now()) return readPerson(auth, token);
  return current;
}

/** The person's roles at a site; empty when they have none there (the page then does not exist for them). */
export function rolesAt(current: Current, slug: string): Role[] {
  return current.sites.find(({ site }) => site.slug === slug)?.roles ?? [];
}
