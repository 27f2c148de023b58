/* Identifiers: a short prefix that says what it names, and a ULID that sorts by birth. */
import { randomFillSync } from 'node:crypto';
import { monotonicFactory } from 'ulid';

const PREFIXES = {
  site: 'site',
  unit: 'unit',
  utility: 'util',
  person: 'per',
  personRole: 'role',
  delegation: 'dlg',
  qualification: 'qual',
  document: 'doc',
  alias: 'alias',
  revision: 'rev',
  siteRules: 'rules',
  case: 'case',
  seat: 'seat',
  affected: 'aff',
  question: 'ask',
  signature: 'sig',
  void: 'void',
  due: 'due',
  dueEvent: 'dev',
  agreement: 'agr',
  unseen: 'uns',
  reveal: 'rvl',
  reconciliation: 'rec',
  view: 'view',
  finding: 'fnd',
  post: 'post',
  fieldEntry: 'fe',
  discrepancy: 'dis',
  device: 'fd',
  place: 'plc',
  test: 'test',
  inKind: 'ink',
  impairment: 'imp',
  sighting: 'sgt',
  file: 'file',
  attachment: 'att',
  notice: 'ntc',
  mail: 'mail',
  moved: 'mvd',
  trail: 'trl',
  element: 'el',
  form: 'form',
  paper: 'pap',
} as const;

export type IdKind = keyof typeof PREFIXES;

/** Random bytes are drawn many at a time: asking the system for each character of an identifier costs more than the rest of it. */
const pool = new Uint32Array(512);
let left = 0;

function random(): number {
  if (left === 0) {
    randomFillSync(pool);
    left = pool.length;
  }
  left -= 1;
  return (pool[left] ?? 0) / 2 ** 32;
}

const next = monotonicFactory(random);

/** A new identifier of a kind, e.g. `case_01KBD…`; later ones sort after earlier ones within this process. */
export function newId(kind: IdKind): string {
  return `${PREFIXES[kind]}_${next()}`;
}

/** The present instant, UTC, ISO text with milliseconds: the form of every instant in the database. */
export function nowInstant(): string {
  return new Date().toISOString();
}
