/* The trail of a site: one chain of entries, each bound to the one before it. */
import { type Knex } from 'knex';
import { appendOnly, forwardsOnly, run } from './support/sql';

const TRAIL = [
  `CREATE TABLE trail (
    id TEXT PRIMARY KEY,
    site_id TEXT NOT NULL REFERENCES sites (id),
    seq INTEGER NOT NULL,
    at TEXT NOT NULL,
    act TEXT NOT NULL,
    by_id TEXT NOT NULL,
    seat TEXT,
    case_id TEXT REFERENCES cases (id),
    subject TEXT NOT NULL,
    body TEXT NOT NULL,
    hides INTEGER NOT NULL CHECK (hides IN (0, 1)),
    prev TEXT NOT NULL,
    hash TEXT NOT NULL,
    UNIQUE (site_id, seq)
  ) STRICT`,
  `CREATE INDEX trail_case ON trail (case_id, seq)`,
  `CREATE INDEX trail_by ON trail (by_id, at)`,
  `CREATE INDEX trail_subject ON trail (subject)`,
  `CREATE TABLE trail_heads (
    site_id TEXT PRIMARY KEY REFERENCES sites (id),
    seq INTEGER NOT NULL,
    hash TEXT NOT NULL,
    mailed_at TEXT
  ) STRICT`,
];

/** Makes the tables. */
export async function up(knex: Knex): Promise<void> {
  await run(knex, TRAIL);
  await appendOnly(knex, ['trail']);
}

export const down = forwardsOnly;
