/* Sites, units, utilities; people, their roles, sessions and one-time tokens. */
import { type Knex } from 'knex';
import { forwardsOnly, neverDeleted, run } from './support/sql';

const SITES = [
  `CREATE TABLE sites (
    id TEXT PRIMARY KEY,
    slug TEXT NOT NULL UNIQUE,
    name TEXT NOT NULL,
    time_zone TEXT NOT NULL,
    barometer TEXT NOT NULL,
    elevation TEXT,
    manager_id TEXT REFERENCES people (id),
    facts TEXT NOT NULL DEFAULT '{}',
    version INTEGER NOT NULL DEFAULT 1
  ) STRICT`,
  `CREATE TABLE units (
    id TEXT PRIMARY KEY,
    site_id TEXT NOT NULL REFERENCES sites (id),
    tag TEXT NOT NULL,
    name TEXT NOT NULL,
    units TEXT NOT NULL CHECK (units IN ('SI', 'US')),
    version INTEGER NOT NULL DEFAULT 1,
    UNIQUE (site_id, tag)
  ) STRICT`,
  `CREATE TABLE utilities (
    id TEXT PRIMARY KEY,
    site_id TEXT NOT NULL REFERENCES sites (id),
    kind TEXT NOT NULL,
    tag TEXT NOT NULL,
    name TEXT NOT NULL,
    body TEXT NOT NULL DEFAULT '{}',
    version INTEGER NOT NULL DEFAULT 1,
    UNIQUE (site_id, kind, tag)
  ) STRICT`,
];

const PEOPLE = [
  `CREATE TABLE people (
    id TEXT PRIMARY KEY,
    email TEXT NOT NULL COLLATE NOCASE UNIQUE,
    name TEXT NOT NULL,
    phone TEXT,
    job TEXT,
    deputy_id TEXT REFERENCES people (id),
    password_hash TEXT,
    totp TEXT,
    digest_at TEXT,
    retired_at TEXT,
    version INTEGER NOT NULL DEFAULT 1
  ) STRICT`,
  `CREATE TABLE person_roles (
    id TEXT PRIMARY KEY,
    person_id TEXT NOT NULL REFERENCES people (id),
    site_id TEXT NOT NULL REFERENCES sites (id),
    role TEXT NOT NULL CHECK (role IN
      ('originator', 'checker', 'approver', 'operations', 'coordinator', 'auditor')),
    from_day TEXT NOT NULL,
    to_day TEXT,
    granted_by TEXT REFERENCES people (id)
  ) STRICT`,
  `CREATE UNIQUE INDEX person_roles_open ON person_roles (person_id, site_id, role) WHERE to_day IS NULL`,
  `CREATE INDEX person_roles_site ON person_roles (site_id, role)`,
  `CREATE TABLE delegations (
    id TEXT PRIMARY KEY,
    from_id TEXT NOT NULL REFERENCES people (id),
    to_id TEXT NOT NULL REFERENCES people (id),
    role TEXT NOT NULL,
    site_id TEXT NOT NULL REFERENCES sites (id),
    from_day TEXT NOT NULL,
    to_day TEXT NOT NULL,
    granted_by TEXT REFERENCES people (id),
    CHECK (from_id <> to_id AND from_day <= to_day)
  ) STRICT`,
  `CREATE INDEX delegations_to ON delegations (to_id, to_day)`,
  `CREATE TABLE qualifications (
    id TEXT PRIMARY KEY,
    person_id TEXT NOT NULL REFERENCES people (id),
    family TEXT NOT NULL,
    until TEXT
  ) STRICT`,
];

const SESSIONS = [
  `CREATE TABLE sessions (
    id TEXT PRIMARY KEY,
    person_id TEXT NOT NULL REFERENCES people (id),
    expires_at TEXT NOT NULL,
    created_at TEXT NOT NULL,
    seen_at TEXT NOT NULL,
    agent TEXT NOT NULL DEFAULT ''
  ) STRICT`,
  `CREATE INDEX sessions_person ON sessions (person_id)`,
  `CREATE TABLE tokens (
    hash TEXT PRIMARY KEY,
    kind TEXT NOT NULL CHECK (kind IN ('invite', 'reset', 'calendar')),
    person_id TEXT NOT NULL REFERENCES people (id),
    expires_at TEXT,
    used_at TEXT
  ) STRICT`,
];

/** Makes the tables. */
export async function up(knex: Knex): Promise<void> {
  await run(knex, [...SITES, ...PEOPLE, ...SESSIONS]);
  await neverDeleted(knex, ['sites', 'people', 'person_roles']);
}

export const down = forwardsOnly;
