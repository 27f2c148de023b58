/* The registers: projections of documents in force and approved, what depends on what, and the full-text search. */
import { type Knex } from 'knex';
import { forwardsOnly, run } from './support/sql';

const HEAD = `
    document_id TEXT NOT NULL REFERENCES documents (id),
    truth TEXT NOT NULL CHECK (truth IN ('in-force', 'approved')),
    element_id TEXT NOT NULL DEFAULT '',
    site_id TEXT NOT NULL REFERENCES sites (id),
    unit_id TEXT NOT NULL REFERENCES units (id),
    tag TEXT NOT NULL,
    name TEXT NOT NULL DEFAULT '',`;
const KEY = `PRIMARY KEY (document_id, truth, element_id)`;
const VERDICT = `verdict TEXT NOT NULL CHECK (verdict IN ('adequate', 'marginal', 'inadequate', 'not-sized'))`;

const REGISTERS = [
  `CREATE TABLE p_systems (${HEAD}
    revision INTEGER, case_id TEXT, service TEXT NOT NULL DEFAULT '', grade TEXT NOT NULL,
    owner_id TEXT, points INTEGER NOT NULL DEFAULT 0, devices TEXT NOT NULL DEFAULT '',
    governing TEXT, governing_name TEXT, governing_group TEXT,
    load_si REAL, load_unit TEXT, required_si REAL, required_unit TEXT, installed_si REAL, installed_unit TEXT,
    letter TEXT, use REAL, margin REAL, ${VERDICT},
    stops INTEGER NOT NULL DEFAULT 0, justifies INTEGER NOT NULL DEFAULT 0,
    examined_on TEXT, in_force_since TEXT, ${KEY}) STRICT, WITHOUT ROWID`,
  `CREATE TABLE p_points (${HEAD}
    system_tag TEXT NOT NULL, equipment TEXT NOT NULL DEFAULT '', kind TEXT NOT NULL, purpose TEXT NOT NULL,
    service TEXT NOT NULL, set_si REAL, set_unit TEXT, letter TEXT, area_si REAL, area_unit TEXT,
    governing TEXT, governing_name TEXT, required_si REAL, required_unit TEXT,
    rated_si REAL, rated_unit TEXT, inlet_loss REAL, back_si REAL, back_unit TEXT,
    use REAL, margin REAL, ${VERDICT}, discharges_to TEXT NOT NULL DEFAULT '', ${KEY}) STRICT, WITHOUT ROWID`,
  `CREATE TABLE p_scenarios (${HEAD}
    system_tag TEXT NOT NULL, key TEXT NOT NULL, ord INTEGER NOT NULL, disposition TEXT, group_name TEXT,
    load_si REAL, load_unit TEXT, required_si REAL, required_unit TEXT, relieving_si REAL, relieving_unit TEXT,
    use REAL, ${VERDICT}, governs INTEGER NOT NULL DEFAULT 0 CHECK (governs IN (0, 1)),
    examined_on TEXT, ${KEY}) STRICT, WITHOUT ROWID`,
  `CREATE TABLE p_conditions (${HEAD}
    system_tag TEXT NOT NULL, kind TEXT NOT NULL, requires TEXT NOT NULL DEFAULT '',
    supports TEXT NOT NULL DEFAULT '[]', round_months REAL, seen_at TEXT, agrees INTEGER CHECK (agrees IN (0, 1)),
    ${KEY}) STRICT, WITHOUT ROWID`,
  `CREATE TABLE p_headers (${HEAD}
    revision INTEGER, case_id TEXT, service TEXT NOT NULL DEFAULT '', disposes_to TEXT NOT NULL DEFAULT '',
    members INTEGER NOT NULL DEFAULT 0, causes INTEGER NOT NULL DEFAULT 0, governing TEXT, governing_name TEXT,
    back_si REAL, back_unit TEXT, mach REAL, use REAL, ${VERDICT}, ${KEY}) STRICT, WITHOUT ROWID`,
  ...['systems', 'points', 'scenarios', 'conditions', 'headers'].map(
    (name) => `CREATE INDEX p_${name}_tag ON p_${name} (site_id, truth, tag)`,
  ),
  ...['systems', 'points', 'headers'].map(
    (name) => `CREATE INDEX p_${name}_use ON p_${name} (site_id, truth, use)`,
  ),
  `CREATE INDEX p_systems_verdict ON p_systems (site_id, truth, verdict)`,
];

const REACH = [
  `CREATE TABLE p_depends (
    id INTEGER PRIMARY KEY,
    site_id TEXT NOT NULL REFERENCES sites (id),
    tag TEXT NOT NULL,
    quantity TEXT NOT NULL DEFAULT '',
    document_id TEXT NOT NULL REFERENCES documents (id),
    truth TEXT NOT NULL CHECK (truth IN ('in-force', 'approved')),
    path TEXT NOT NULL,
    kind TEXT NOT NULL CHECK (kind IN ('load', 'bound', 'condition', 'origin', 'assumption', 'utility'))
  ) STRICT`,
  `CREATE INDEX p_depends_tag ON p_depends (site_id, tag)`,
  `CREATE INDEX p_depends_document ON p_depends (document_id, truth)`,
  `CREATE TABLE search_pages (
    id INTEGER PRIMARY KEY,
    kind TEXT NOT NULL,
    site_id TEXT NOT NULL REFERENCES sites (id),
    of_id TEXT NOT NULL,
    place TEXT NOT NULL,
    hides INTEGER NOT NULL CHECK (hides IN (0, 1)),
    title TEXT NOT NULL,
    body TEXT NOT NULL
  ) STRICT`,
  `CREATE INDEX search_pages_of ON search_pages (of_id)`,
  `CREATE VIRTUAL TABLE search USING fts5 (
    title, body, content = 'search_pages', content_rowid = 'id', tokenize = "unicode61 remove_diacritics 2")`,
  `CREATE TRIGGER search_pages_added AFTER INSERT ON search_pages
    BEGIN INSERT INTO search (rowid, title, body) VALUES (NEW.id, NEW.title, NEW.body); END`,
  `CREATE TRIGGER search_pages_gone AFTER DELETE ON search_pages
    BEGIN INSERT INTO search (search, rowid, title, body) VALUES ('delete', OLD.id, OLD.title, OLD.body); END`,
];

/** Makes the tables. */
export async function up(knex: Knex): Promise<void> {
  await run(knex, [...REGISTERS, ...REACH]);
}

export const down = forwardsOnly;
