/* Cases with their documents, seats and affected systems; signatures; due items; relief questions. */
import { type Knex } from 'knex';
import { appendOnly, forwardsOnly, neverDeleted, run } from './support/sql';

const CASES = [
  `CREATE TABLE counters (
    site_id TEXT NOT NULL REFERENCES sites (id),
    name TEXT NOT NULL,
    last INTEGER NOT NULL,
    PRIMARY KEY (site_id, name)
  ) STRICT, WITHOUT ROWID`,
  `CREATE TABLE cases (
    id TEXT PRIMARY KEY,
    site_id TEXT NOT NULL REFERENCES sites (id),
    number TEXT NOT NULL,
    title TEXT NOT NULL,
    class TEXT NOT NULL CHECK (class IN
      ('permanent', 'temporary', 'emergency', 'first-issue', 'correction', 'revalidation')),
    stage TEXT NOT NULL CHECK (stage IN ('draft', 'scenarios', 'check', 'approval', 'field', 'in-force',
      'due-for-removal', 'removed', 'on-hold', 'withdrawn', 'refused')),
    held_from TEXT,
    snapshot TEXT NOT NULL,
    brief TEXT NOT NULL,
    brief_hash TEXT NOT NULL,
    starts_on TEXT,
    ends_on TEXT,
    acted_at TEXT,
    closed_at TEXT,
    raised_by TEXT NOT NULL REFERENCES people (id),
    raised_at TEXT NOT NULL,
    stage_at TEXT NOT NULL,
    copied_from TEXT REFERENCES cases (id),
    replaces_id TEXT REFERENCES cases (id),
    rules_id TEXT REFERENCES site_rules (id),
    authorised TEXT,
    extensions TEXT NOT NULL DEFAULT '[]',
    version INTEGER NOT NULL DEFAULT 1,
    UNIQUE (site_id, number),
    CHECK ((stage = 'on-hold') = (held_from IS NOT NULL))
  ) STRICT`,
  `CREATE INDEX cases_stage ON cases (site_id, stage)`,
  `CREATE INDEX cases_ends ON cases (ends_on)`,
  `CREATE TABLE case_documents (
    case_id TEXT NOT NULL REFERENCES cases (id),
    document_id TEXT NOT NULL REFERENCES documents (id),
    why TEXT NOT NULL CHECK (why IN ('own', 'affected')),
    base_id TEXT REFERENCES revisions (id),
    working_id TEXT REFERENCES revisions (id),
    state TEXT NOT NULL CHECK (state IN ('open', 'approved', 'issued', 'dropped')),
    acted_at TEXT,
    PRIMARY KEY (case_id, document_id)
  ) STRICT, WITHOUT ROWID`,
  `CREATE INDEX case_documents_document ON case_documents (document_id)`,
  `CREATE TABLE seats (
    id TEXT PRIMARY KEY,
    case_id TEXT NOT NULL REFERENCES cases (id),
    role TEXT NOT NULL CHECK (role IN ('originator', 'checker', 'approver', 'operations')),
    person_id TEXT NOT NULL REFERENCES people (id),
    part TEXT,
    from_at TEXT NOT NULL,
    until_at TEXT
  ) STRICT`,
  `CREATE UNIQUE INDEX seats_open ON seats (case_id, role, person_id) WHERE until_at IS NULL`,
  `CREATE INDEX seats_person ON seats (person_id, role)`,
  `CREATE TABLE affected (
    id TEXT PRIMARY KEY,
    case_id TEXT NOT NULL REFERENCES cases (id),
    document_id TEXT NOT NULL REFERENCES documents (id),
    why TEXT NOT NULL,
    figures_hash TEXT NOT NULL,
    answer TEXT CHECK (answer IN ('included', 'not-affected')),
    reason TEXT,
    by_id TEXT REFERENCES people (id),
    at TEXT,
    version INTEGER NOT NULL DEFAULT 1,
    UNIQUE (case_id, document_id)
  ) STRICT`,
  `CREATE TABLE questions (
    id TEXT PRIMARY KEY,
    site_id TEXT NOT NULL REFERENCES sites (id),
    asked_by TEXT NOT NULL REFERENCES people (id),
    at TEXT NOT NULL,
    changes TEXT NOT NULL,
    result TEXT NOT NULL,
    case_id TEXT REFERENCES cases (id)
  ) STRICT`,
];

const SIGNATURES = [
  `CREATE TABLE signatures (
    id TEXT PRIMARY KEY,
    case_id TEXT REFERENCES cases (id),
    rules_id TEXT REFERENCES site_rules (id),
    document_id TEXT REFERENCES documents (id),
    gate TEXT NOT NULL,
    person_id TEXT NOT NULL REFERENCES people (id),
    name TEXT NOT NULL,
    role TEXT NOT NULL,
    meaning TEXT NOT NULL,
    at TEXT NOT NULL,
    zone TEXT NOT NULL,
    bound TEXT NOT NULL,
    content_hash TEXT NOT NULL,
    page_hash TEXT NOT NULL,
    factor TEXT NOT NULL CHECK (factor IN ('password', 'password+code')),
    for_id TEXT REFERENCES people (id)
  ) STRICT`,
  `CREATE INDEX signatures_case ON signatures (case_id, gate)`,
  `CREATE INDEX signatures_document ON signatures (document_id)`,
  `CREATE TABLE signature_voids (
    id TEXT PRIMARY KEY,
    signature_id TEXT NOT NULL REFERENCES signatures (id),
    at TEXT NOT NULL,
    cause TEXT NOT NULL,
    trail_id TEXT REFERENCES trail (id)
  ) STRICT`,
  `CREATE INDEX signature_voids_of ON signature_voids (signature_id)`,
];

const DUE = [
  `CREATE TABLE due_items (
    id TEXT PRIMARY KEY,
    site_id TEXT NOT NULL REFERENCES sites (id),
    kind TEXT NOT NULL CHECK (kind IN ('start-up', 'approval-requirement', 'pssr', 'training', 'paper',
      'deficiency', 'answer', 'confirmation', 'analysis', 'check', 'removal', 'revalidation', 'moved-result',
      'own-note')),
    case_id TEXT REFERENCES cases (id),
    document_id TEXT REFERENCES documents (id),
    subject TEXT,
    text TEXT NOT NULL,
    owner_id TEXT NOT NULL REFERENCES people (id),
    due TEXT NOT NULL,
    due_at TEXT,
    closes TEXT,
    bars TEXT CHECK (bars IN ('extension', 'start-up')),
    state TEXT NOT NULL DEFAULT 'open' CHECK (state IN ('open', 'done', 'accepted', 'waived')),
    evidence TEXT,
    interim TEXT,
    outcome TEXT,
    asked_by TEXT NOT NULL REFERENCES people (id),
    asked_at TEXT NOT NULL,
    signature_id TEXT REFERENCES signatures (id),
    version INTEGER NOT NULL DEFAULT 1
  ) STRICT`,
  `CREATE INDEX due_items_owner ON due_items (owner_id, state, due)`,
  `CREATE INDEX due_items_case ON due_items (case_id)`,
  `CREATE INDEX due_items_document ON due_items (document_id)`,
  `CREATE TABLE due_events (
    id TEXT PRIMARY KEY,
    due_id TEXT NOT NULL REFERENCES due_items (id),
    at TEXT NOT NULL,
    by_id TEXT REFERENCES people (id),
    event TEXT NOT NULL,
    text TEXT
  ) STRICT`,
  `CREATE INDEX due_events_of ON due_events (due_id)`,
];

/** Makes the tables. */
export async function up(knex: Knex): Promise<void> {
  await run(knex, [...CASES, ...SIGNATURES, ...DUE]);
  await appendOnly(knex, ['signatures', 'signature_voids', 'due_events']);
  await neverDeleted(knex, ['cases', 'case_documents', 'seats', 'due_items']);
}

export const down = forwardsOnly;
