/* The outbox: notices and the mails that carry them; kept answers to repeated requests; jobs; moved results. */
import { type Knex } from 'knex';
import { forwardsOnly, neverDeleted, run } from './support/sql';

const OUTBOX = [
  `CREATE TABLE mails (
    id TEXT PRIMARY KEY,
    to_id TEXT NOT NULL REFERENCES people (id),
    message_id TEXT NOT NULL UNIQUE,
    state TEXT NOT NULL DEFAULT 'queued' CHECK (state IN ('queued', 'sending', 'delivered', 'failed', 'dead')),
    tries INTEGER NOT NULL DEFAULT 0,
    next_at TEXT NOT NULL,
    error TEXT,
    made_at TEXT NOT NULL,
    delivered_at TEXT
  ) STRICT`,
  `CREATE INDEX mails_next ON mails (state, next_at)`,
  `CREATE TABLE notices (
    id TEXT PRIMARY KEY,
    site_id TEXT REFERENCES sites (id),
    case_id TEXT REFERENCES cases (id),
    event TEXT NOT NULL,
    to_id TEXT NOT NULL REFERENCES people (id),
    urgency TEXT NOT NULL CHECK (urgency IN ('at-once', 'digest')),
    subject TEXT NOT NULL,
    body TEXT NOT NULL,
    after TEXT NOT NULL,
    state TEXT NOT NULL DEFAULT 'queued' CHECK (state IN ('queued', 'sending', 'delivered', 'failed', 'dead')),
    mail_id TEXT REFERENCES mails (id),
    at TEXT NOT NULL
  ) STRICT`,
  `CREATE INDEX notices_waiting ON notices (state, after)`,
  `CREATE INDEX notices_case ON notices (case_id)`,
  `CREATE INDEX notices_to ON notices (to_id, at)`,
  `CREATE INDEX notices_mail ON notices (mail_id)`,
];

const UPKEEP = [
  `CREATE TABLE idempotency (
    person_id TEXT NOT NULL,
    key TEXT NOT NULL,
    route TEXT NOT NULL,
    body_hash TEXT NOT NULL,
    status INTEGER NOT NULL,
    answer TEXT NOT NULL,
    at TEXT NOT NULL,
    PRIMARY KEY (person_id, key)
  ) STRICT, WITHOUT ROWID`,
  `CREATE INDEX idempotency_at ON idempotency (at)`,
  `CREATE TABLE jobs (
    name TEXT PRIMARY KEY,
    due_at TEXT NOT NULL,
    ran_at TEXT,
    state TEXT NOT NULL DEFAULT '{}'
  ) STRICT`,
  `CREATE TABLE moved_results (
    id TEXT PRIMARY KEY,
    evaluation_key TEXT NOT NULL,
    document_id TEXT REFERENCES documents (id),
    sheet_key TEXT NOT NULL,
    old TEXT NOT NULL,
    new TEXT NOT NULL,
    shift REAL,
    verdict_moved INTEGER NOT NULL CHECK (verdict_moved IN (0, 1)),
    due_id TEXT REFERENCES due_items (id),
    at TEXT NOT NULL
  ) STRICT`,
  `CREATE INDEX moved_results_document ON moved_results (document_id)`,
];

/** Makes the tables. */
export async function up(knex: Knex): Promise<void> {
  await run(knex, [...OUTBOX, ...UPKEEP]);
  await neverDeleted(knex, ['mails', 'notices']);
}

export const down = forwardsOnly;
