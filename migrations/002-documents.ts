/* Relief bases and headers as documents with revisions; what pins their evaluation; site rules. */
import { type Knex } from 'knex';
import { forwardsOnly, neverDeleted, run } from './support/sql';

const DOCUMENTS = [
  `CREATE TABLE documents (
    id TEXT PRIMARY KEY,
    site_id TEXT NOT NULL REFERENCES sites (id),
    kind TEXT NOT NULL CHECK (kind IN ('system', 'header')),
    tag TEXT NOT NULL,
    name TEXT NOT NULL,
    unit_id TEXT NOT NULL REFERENCES units (id),
    owner_id TEXT REFERENCES people (id),
    grade TEXT NOT NULL CHECK (grade IN ('tag-only', 'copied-in', 'worked')),
    in_force_id TEXT REFERENCES revisions (id),
    retired_at TEXT,
    version INTEGER NOT NULL DEFAULT 1,
    UNIQUE (site_id, kind, tag)
  ) STRICT`,
  `CREATE TABLE document_aliases (
    id TEXT PRIMARY KEY,
    site_id TEXT NOT NULL REFERENCES sites (id),
    kind TEXT NOT NULL,
    tag TEXT NOT NULL,
    document_id TEXT NOT NULL REFERENCES documents (id),
    UNIQUE (site_id, kind, tag)
  ) STRICT`,
  `CREATE TABLE revisions (
    id TEXT PRIMARY KEY,
    document_id TEXT NOT NULL REFERENCES documents (id),
    number INTEGER,
    state TEXT NOT NULL CHECK (state IN ('working', 'approved', 'in-force', 'superseded', 'dropped')),
    case_id TEXT REFERENCES cases (id),
    base_id TEXT REFERENCES revisions (id),
    body BLOB,
    document_hash TEXT,
    imports_hash TEXT REFERENCES import_sets (hash),
    rules_id TEXT REFERENCES site_rules (id),
    evaluation_key TEXT,
    approved_at TEXT,
    in_plant_from TEXT,
    known_from TEXT,
    superseded_at TEXT,
    held INTEGER NOT NULL DEFAULT 1 CHECK (held IN (0, 1)),
    note TEXT,
    version INTEGER NOT NULL DEFAULT 1,
    CHECK ((number IS NOT NULL) = (state IN ('in-force', 'superseded'))),
    CHECK ((body IS NULL) = (document_hash IS NULL)),
    CHECK (held = (body IS NOT NULL))
  ) STRICT`,
  `CREATE UNIQUE INDEX revisions_number ON revisions (document_id, number) WHERE number IS NOT NULL`,
  `CREATE UNIQUE INDEX revisions_in_force ON revisions (document_id) WHERE state = 'in-force'`,
  `CREATE UNIQUE INDEX revisions_open ON revisions (case_id, document_id) WHERE state IN ('working', 'approved')`,
  `CREATE INDEX revisions_case ON revisions (case_id)`,
];

const EVALUATIONS = [
  `CREATE TABLE import_sets (hash TEXT PRIMARY KEY, body TEXT NOT NULL) STRICT`,
  `CREATE TABLE evaluations (
    key TEXT PRIMARY KEY,
    document_hash TEXT NOT NULL,
    imports_hash TEXT NOT NULL,
    judgement_hash TEXT NOT NULL,
    catalog_hash TEXT NOT NULL,
    engine TEXT NOT NULL,
    figures TEXT NOT NULL,
    outcomes TEXT NOT NULL,
    sheets BLOB,
    at TEXT NOT NULL
  ) STRICT`,
  `CREATE INDEX evaluations_judgement ON evaluations (judgement_hash)`,
  `CREATE INDEX evaluations_document ON evaluations (document_hash)`,
  `CREATE TABLE evaluation_methods (
    method TEXT NOT NULL,
    key TEXT NOT NULL REFERENCES evaluations (key) ON DELETE CASCADE,
    PRIMARY KEY (method, key)
  ) STRICT, WITHOUT ROWID`,
];

const RULES = [
  `CREATE TABLE site_rules (
    id TEXT PRIMARY KEY,
    site_id TEXT NOT NULL REFERENCES sites (id),
    number INTEGER NOT NULL,
    state TEXT NOT NULL CHECK (state IN
      ('drafted', 'half-signed', 'signed', 'in-effect', 'superseded', 'dropped')),
    body TEXT NOT NULL,
    judgement_hash TEXT NOT NULL,
    from_day TEXT NOT NULL,
    drafted_by TEXT REFERENCES people (id),
    version INTEGER NOT NULL DEFAULT 1,
    UNIQUE (site_id, number)
  ) STRICT`,
  `CREATE UNIQUE INDEX site_rules_in_effect ON site_rules (site_id) WHERE state = 'in-effect'`,
  `CREATE TRIGGER site_rules_frozen BEFORE UPDATE ON site_rules
    WHEN OLD.state <> 'drafted' AND (NEW.body <> OLD.body OR NEW.judgement_hash <> OLD.judgement_hash
      OR NEW.number <> OLD.number OR NEW.site_id <> OLD.site_id OR NEW.from_day <> OLD.from_day)
    BEGIN SELECT RAISE(ABORT, 'site rules are frozen once signed'); END`,
  `CREATE TRIGGER site_rules_forwards BEFORE UPDATE OF state ON site_rules
    WHEN OLD.state <> NEW.state AND OLD.state || '>' || NEW.state NOT IN
      ('drafted>half-signed', 'half-signed>signed', 'signed>in-effect', 'in-effect>superseded',
       'drafted>dropped', 'half-signed>dropped')
    BEGIN SELECT RAISE(ABORT, 'a set of site rules only moves forwards'); END`,
];

/* A signature that brings a revision into force: of its own case, or, for a revision without a case, of its grade. */
const SIGNED = `EXISTS (SELECT 1 FROM signatures s
  WHERE s.gate IN ('field', 'approval', 'grade', 'removal') AND s.case_id IS NEW.case_id
    AND (s.document_id = NEW.document_id OR (s.document_id IS NULL AND NEW.case_id IS NOT NULL))
    AND NOT EXISTS (SELECT 1 FROM signature_voids v WHERE v.signature_id = s.id))`;

const FREEZE = [
  `CREATE TRIGGER revisions_frozen BEFORE UPDATE ON revisions
    WHEN OLD.state <> 'working' AND (NEW.body IS NOT OLD.body OR NEW.document_hash IS NOT OLD.document_hash
      OR NEW.imports_hash IS NOT OLD.imports_hash OR NEW.rules_id IS NOT OLD.rules_id
      OR (OLD.evaluation_key IS NOT NULL AND NEW.evaluation_key IS NOT OLD.evaluation_key)
      OR (OLD.number IS NOT NULL AND NEW.number IS NOT OLD.number)
      OR NEW.base_id IS NOT OLD.base_id OR NEW.held <> OLD.held)
    BEGIN SELECT RAISE(ABORT, 'a revision is frozen once it is no longer working'); END`,
  `CREATE TRIGGER revisions_belong BEFORE UPDATE OF document_id, case_id ON revisions
    WHEN NEW.document_id <> OLD.document_id OR NEW.case_id IS NOT OLD.case_id
    BEGIN SELECT RAISE(ABORT, 'a revision stays with its document and case'); END`,
  `CREATE TRIGGER revisions_forwards BEFORE UPDATE OF state ON revisions
    WHEN OLD.state <> NEW.state AND OLD.state || '>' || NEW.state NOT IN
      ('working>approved', 'working>in-force', 'working>dropped', 'approved>in-force', 'approved>dropped',
       'in-force>superseded')
    BEGIN SELECT RAISE(ABORT, 'a revision only moves forwards'); END`,
  `CREATE TRIGGER revisions_signed BEFORE UPDATE OF state ON revisions
    WHEN NEW.state = 'in-force' AND OLD.state <> 'in-force' AND NOT ${SIGNED}
    BEGIN SELECT RAISE(ABORT, 'a revision comes into force only with a signature'); END`,
  `CREATE TRIGGER revisions_signed_at_birth BEFORE INSERT ON revisions
    WHEN (NEW.state = 'in-force' OR (NEW.state = 'superseded' AND NEW.held = 1)) AND NOT ${SIGNED}
    BEGIN SELECT RAISE(ABORT, 'a revision comes into force only with a signature'); END`,
];

/** Makes the tables; the triggers that ask for signatures refer to tables of the next migration. */
export async function up(knex: Knex): Promise<void> {
  await run(knex, [...DOCUMENTS, ...EVALUATIONS, ...RULES, ...FREEZE]);
  await neverDeleted(knex, ['documents', 'revisions', 'site_rules']);
}

export const down = forwardsOnly;
