/* The unseen check and what surrounds it: entries, reveals, first looks, agreements; findings and their threads. */
import { type Knex } from 'knex';
import { appendOnly, forwardsOnly, neverDeleted, run } from './support/sql';

const UNSEEN = [
  `CREATE TABLE agreements (
    id TEXT PRIMARY KEY,
    case_id TEXT NOT NULL REFERENCES cases (id),
    document_id TEXT NOT NULL REFERENCES documents (id),
    sheet_key TEXT NOT NULL,
    sheet_hash TEXT NOT NULL,
    person_id TEXT NOT NULL REFERENCES people (id),
    at TEXT NOT NULL,
    undoes_id TEXT UNIQUE REFERENCES agreements (id)
  ) STRICT`,
  `CREATE INDEX agreements_case ON agreements (case_id, document_id)`,
  `CREATE TABLE unseen_entries (
    id TEXT PRIMARY KEY,
    case_id TEXT NOT NULL REFERENCES cases (id),
    document_id TEXT NOT NULL REFERENCES documents (id),
    scope TEXT NOT NULL,
    layer TEXT NOT NULL CHECK (layer IN ('reading', 'choice', 'figure')),
    quantity TEXT NOT NULL,
    value TEXT,
    word TEXT,
    cites TEXT,
    round INTEGER NOT NULL,
    by_id TEXT NOT NULL REFERENCES people (id),
    at TEXT NOT NULL,
    first_view TEXT,
    route TEXT,
    sheet_id TEXT,
    UNIQUE (case_id, document_id, scope, layer, quantity, round, by_id)
  ) STRICT`,
  `CREATE TABLE reveals (
    id TEXT PRIMARY KEY,
    case_id TEXT NOT NULL REFERENCES cases (id),
    person_id TEXT NOT NULL REFERENCES people (id),
    document_id TEXT NOT NULL REFERENCES documents (id),
    round INTEGER NOT NULL DEFAULT 1,
    sheets TEXT NOT NULL DEFAULT '{}',
    at TEXT NOT NULL
  ) STRICT`,
  `CREATE INDEX reveals_case ON reveals (case_id, document_id)`,
  `CREATE TABLE unseen_comparisons (
    entry_id TEXT PRIMARY KEY REFERENCES unseen_entries (id),
    reveal_id TEXT NOT NULL REFERENCES reveals (id),
    against TEXT,
    deviation REAL,
    within INTEGER NOT NULL CHECK (within IN (0, 1)),
    at TEXT NOT NULL
  ) STRICT`,
  `CREATE TABLE unseen_reconciliations (
    id TEXT PRIMARY KEY,
    entry_id TEXT NOT NULL REFERENCES unseen_entries (id),
    by_id TEXT NOT NULL REFERENCES people (id),
    at TEXT NOT NULL,
    text TEXT NOT NULL
  ) STRICT`,
  `CREATE INDEX unseen_reconciliations_of ON unseen_reconciliations (entry_id)`,
  `CREATE TABLE views (
    id TEXT PRIMARY KEY,
    person_id TEXT NOT NULL REFERENCES people (id),
    case_id TEXT REFERENCES cases (id),
    document_id TEXT NOT NULL REFERENCES documents (id),
    what TEXT NOT NULL,
    at TEXT NOT NULL
  ) STRICT`,
  `CREATE UNIQUE INDEX views_first ON views (person_id, ifnull(case_id, ''), document_id, what)`,
];

const FINDINGS = [
  `CREATE TABLE findings (
    id TEXT PRIMARY KEY,
    case_id TEXT NOT NULL REFERENCES cases (id),
    number INTEGER NOT NULL,
    weight TEXT NOT NULL CHECK (weight IN ('must-fix', 'should-fix', 'remark', 'question')),
    place TEXT NOT NULL,
    state TEXT NOT NULL DEFAULT 'open' CHECK (state IN ('open', 'answered', 'closed')),
    raised_by TEXT NOT NULL REFERENCES people (id),
    raised_at TEXT NOT NULL,
    successor_id TEXT REFERENCES people (id),
    version INTEGER NOT NULL DEFAULT 1,
    UNIQUE (case_id, number)
  ) STRICT`,
  `CREATE TABLE finding_posts (
    id TEXT PRIMARY KEY,
    finding_id TEXT NOT NULL REFERENCES findings (id),
    by_id TEXT NOT NULL REFERENCES people (id),
    at TEXT NOT NULL,
    text TEXT NOT NULL,
    change_path TEXT
  ) STRICT`,
  `CREATE INDEX finding_posts_of ON finding_posts (finding_id)`,
];

/** Makes the tables. */
export async function up(knex: Knex): Promise<void> {
  await run(knex, [...UNSEEN, ...FINDINGS]);
  await appendOnly(knex, [
    'agreements',
    'unseen_entries',
    'reveals',
    'unseen_comparisons',
    'unseen_reconciliations',
    'views',
    'finding_posts',
  ]);
  await neverDeleted(knex, ['findings']);
}

export const down = forwardsOnly;
