/* What operations see: field sheets, discrepancies; fitted devices, their places and tests; impairments; files. */
import { type Knex } from 'knex';
import { appendOnly, forwardsOnly, neverDeleted, run } from './support/sql';

const FILES = [
  `CREATE TABLE files (
    id TEXT PRIMARY KEY,
    site_id TEXT NOT NULL REFERENCES sites (id),
    sha256 TEXT NOT NULL UNIQUE,
    bytes INTEGER NOT NULL,
    type TEXT NOT NULL,
    name TEXT NOT NULL,
    state TEXT NOT NULL CHECK (state IN ('held', 'referred', 'swept')),
    by_id TEXT REFERENCES people (id),
    at TEXT NOT NULL
  ) STRICT`,
  `CREATE TABLE attachments (
    id TEXT PRIMARY KEY,
    file_id TEXT NOT NULL REFERENCES files (id),
    of_id TEXT NOT NULL,
    path TEXT,
    caption TEXT,
    shows TEXT NOT NULL CHECK (shows IN ('evidence', 'result')),
    by_id TEXT NOT NULL REFERENCES people (id),
    at TEXT NOT NULL
  ) STRICT`,
  `CREATE INDEX attachments_of ON attachments (of_id)`,
];

const SHEET = [
  `CREATE TABLE field_lines (
    case_id TEXT NOT NULL REFERENCES cases (id),
    document_id TEXT NOT NULL REFERENCES documents (id),
    key TEXT NOT NULL,
    ord INTEGER NOT NULL,
    grouped TEXT NOT NULL,
    label TEXT NOT NULL,
    wants TEXT,
    photo INTEGER NOT NULL CHECK (photo IN (0, 1)),
    holds INTEGER NOT NULL CHECK (holds IN (0, 1)),
    facts TEXT NOT NULL DEFAULT '{}',
    PRIMARY KEY (case_id, document_id, key)
  ) STRICT`,
  `CREATE TABLE field_entries (
    id TEXT PRIMARY KEY,
    client_id TEXT NOT NULL UNIQUE,
    case_id TEXT NOT NULL REFERENCES cases (id),
    document_id TEXT NOT NULL REFERENCES documents (id),
    line TEXT NOT NULL,
    as_what TEXT NOT NULL CHECK (as_what IN ('installer', 'verifier')),
    installer TEXT,
    seen TEXT,
    text TEXT,
    files TEXT NOT NULL DEFAULT '[]',
    scan TEXT,
    by_id TEXT NOT NULL REFERENCES people (id),
    saw TEXT NOT NULL,
    got TEXT NOT NULL,
    device TEXT NOT NULL,
    shown_at TEXT,
    cannot TEXT,
    agrees INTEGER CHECK (agrees IN (0, 1))
  ) STRICT`,
  `CREATE INDEX field_entries_line ON field_entries (case_id, document_id, line)`,
  `CREATE TABLE discrepancies (
    id TEXT PRIMARY KEY,
    case_id TEXT NOT NULL REFERENCES cases (id),
    document_id TEXT NOT NULL REFERENCES documents (id),
    number INTEGER NOT NULL,
    entry_id TEXT NOT NULL REFERENCES field_entries (id),
    holds INTEGER NOT NULL CHECK (holds IN (0, 1)),
    state TEXT NOT NULL DEFAULT 'open' CHECK (state IN ('open', 'fixed', 'seen-again', 'sent-back', 'accepted')),
    owner_id TEXT NOT NULL REFERENCES people (id),
    clears TEXT NOT NULL,
    finding_id TEXT REFERENCES findings (id),
    posts TEXT NOT NULL DEFAULT '[]',
    version INTEGER NOT NULL DEFAULT 1,
    UNIQUE (case_id, number)
  ) STRICT`,
];

const DEVICES = [
  `CREATE TABLE fitted_devices (
    id TEXT PRIMARY KEY,
    site_id TEXT NOT NULL REFERENCES sites (id),
    serial TEXT NOT NULL,
    maker TEXT,
    model TEXT,
    year INTEGER,
    code TEXT,
    plate TEXT NOT NULL DEFAULT '{}',
    version INTEGER NOT NULL DEFAULT 1
  ) STRICT`,
  `CREATE UNIQUE INDEX fitted_devices_serial ON fitted_devices (site_id, ifnull(maker, ''), serial)`,
  `CREATE TABLE places (
    id TEXT PRIMARY KEY,
    device_id TEXT NOT NULL REFERENCES fitted_devices (id),
    document_id TEXT NOT NULL REFERENCES documents (id),
    point TEXT NOT NULL,
    from_day TEXT NOT NULL,
    to_day TEXT,
    known_at TEXT NOT NULL,
    by_id TEXT REFERENCES people (id)
  ) STRICT`,
  `CREATE INDEX places_device ON places (device_id)`,
  `CREATE INDEX places_point ON places (document_id, point)`,
  `CREATE TABLE device_tests (
    id TEXT PRIMARY KEY,
    device_id TEXT NOT NULL REFERENCES fitted_devices (id),
    on_day TEXT NOT NULL,
    body TEXT NOT NULL,
    file_id TEXT REFERENCES files (id)
  ) STRICT`,
  `CREATE INDEX device_tests_device ON device_tests (device_id, on_day)`,
  `CREATE TABLE in_kind (
    id TEXT PRIMARY KEY,
    document_id TEXT NOT NULL REFERENCES documents (id),
    point TEXT NOT NULL,
    old_id TEXT REFERENCES fitted_devices (id),
    new_id TEXT NOT NULL REFERENCES fitted_devices (id),
    comparison TEXT NOT NULL,
    equal INTEGER NOT NULL CHECK (equal IN (0, 1)),
    by_id TEXT NOT NULL REFERENCES people (id),
    at TEXT NOT NULL,
    signature_id TEXT REFERENCES signatures (id)
  ) STRICT`,
  `CREATE TABLE impairments (
    id TEXT PRIMARY KEY,
    document_id TEXT NOT NULL REFERENCES documents (id),
    point TEXT NOT NULL,
    from_at TEXT NOT NULL,
    until_at TEXT NOT NULL,
    by_id TEXT NOT NULL REFERENCES people (id),
    cover TEXT NOT NULL CHECK (cover IN ('substitute', 'vented', 'attendant', 'none')),
    substitute TEXT,
    attendant TEXT,
    handovers TEXT NOT NULL DEFAULT '[]',
    ended_at TEXT,
    version INTEGER NOT NULL DEFAULT 1
  ) STRICT`,
  `CREATE INDEX impairments_open ON impairments (document_id) WHERE ended_at IS NULL`,
  `CREATE TABLE condition_sightings (
    id TEXT PRIMARY KEY,
    document_id TEXT NOT NULL REFERENCES documents (id),
    condition TEXT NOT NULL,
    at TEXT NOT NULL,
    by_id TEXT NOT NULL REFERENCES people (id),
    agrees INTEGER NOT NULL CHECK (agrees IN (0, 1)),
    entry_id TEXT REFERENCES field_entries (id)
  ) STRICT`,
  `CREATE INDEX condition_sightings_of ON condition_sightings (document_id, condition, at)`,
];

/** Makes the tables. */
export async function up(knex: Knex): Promise<void> {
  await run(knex, [...FILES, ...SHEET, ...DEVICES]);
  await appendOnly(knex, ['field_entries', 'places', 'device_tests', 'in_kind', 'condition_sightings']);
  await neverDeleted(knex, ['files', 'attachments', 'discrepancies', 'fitted_devices', 'impairments']);
}

export const down = forwardsOnly;
