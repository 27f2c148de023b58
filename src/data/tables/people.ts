/* Rows about sites and people. */
import { type Q } from '@engine/quantity';
import { type Day, type Id, type Instant, type Role } from '@domain/case';
import { table } from '../mapping';

export type SiteRow = {
  id: Id;
  slug: string;
  name: string;
  timeZone: string;
  barometer: Q;
  elevation: Q | null;
  managerId: Id | null;
  /** What else the site says of itself: letters of its case numbers (`caseLetters`), terms, tagline … */
  facts: Record<string, unknown>;
  version: number;
};
export type UnitRow = { id: Id; siteId: Id; tag: string; name: string; units: 'SI' | 'US'; version: number };
export type UtilityRow = { id: Id; siteId: Id; kind: string; tag: string; name: string; body: unknown; version: number };

export type PersonRow = {
  id: Id;
  email: string;
  name: string;
  phone: string | null;
  job: string | null;
  deputyId: Id | null;
  passwordHash: string | null;
  totp: unknown;
  /** Local time of the daily digest, `HH:MM`; null: no digest, everything at once. */
  digestAt: string | null;
  retiredAt: Instant | null;
  version: number;
};
export type PersonRoleRow = {
  id: Id;
  personId: Id;
  siteId: Id;
  role: Role;
  fromDay: Day;
  toDay: Day | null;
  grantedBy: Id | null;
};
export type DelegationRow = {
  id: Id;
  fromId: Id;
  toId: Id;
  role: Role;
  siteId: Id;
  fromDay: Day;
  toDay: Day;
  grantedBy: Id | null;
};
/** `id` is the SHA-256 of the cookie's token: whoever reads the database cannot sign in with it. */
export type SessionRow = {
  id: string;
  personId: Id;
  expiresAt: Instant;
  createdAt: Instant;
  seenAt: Instant;
  agent: string;
};
export type TokenRow = {
  hash: string;
  kind: 'invite' | 'reset' | 'calendar';
  personId: Id;
  expiresAt: Instant | null;
  usedAt: Instant | null;
};

export const SITES = table<SiteRow>('sites', { json: ['barometer', 'elevation', 'facts'] });
export const UNITS = table<UnitRow>('units');
export const UTILITIES = table<UtilityRow>('utilities', { json: ['body'] });
export const PEOPLE = table<PersonRow>('people', { json: ['totp'] });
export const PERSON_ROLES = table<PersonRoleRow>('person_roles');
export const DELEGATIONS = table<DelegationRow>('delegations');
export const SESSIONS = table<SessionRow>('sessions');
export const TOKENS = table<TokenRow>('tokens');
