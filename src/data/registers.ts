/* Lists of the registers: sorted, filtered, a page at a time, with results of hidden documents left out before either. */
import { type Id } from '@domain/case';
import { type Db } from './connection';
import { fromColumns, snake } from './mapping';
import {
  type ConditionRow,
  type HeaderRow,
  type PointRow,
  type Register,
  type RegisterHead,
  REGISTERS,
  type ScenarioRow,
  type SystemRow,
  type Truth,
} from './tables/registers';

export type {
  ConditionRow,
  DependRow,
  HeaderRow,
  PointRow,
  RegisterHead,
  ScenarioRow,
  SearchPage,
  SystemRow,
  Truth,
} from './tables/registers';

export type RegisterRows = {
  systems: SystemRow;
  points: PointRow;
  scenarios: ScenarioRow;
  conditions: ConditionRow;
  headers: HeaderRow;
};
export type RegisterName = keyof RegisterRows;

/** A row as it is shown: of a hidden document every result is null and `hidden` is true. */
export type Listed<R> = { [K in keyof R]: K extends keyof RegisterHead ? R[K] : R[K] | null } & { hidden: boolean };

type Scalar = string | number | boolean;
export type Filter = Scalar | readonly Scalar[] | { min?: string | number; max?: string | number };

export type RegisterQuery = {
  siteId: Id;
  truth?: Truth;
  /** Documents whose results the asker may not see: null in every row, last in every order, matched by no filter. */
  hidden?: ReadonlySet<Id>;
  sort?: string;
  direction?: 'asc' | 'desc';
  filters?: Record<string, Filter>;
  /** Words to be found in tag, name, service … */
  text?: string;
  cursor?: string;
  /** The page that ends right before this row; counts before `cursor`. */
  before?: string;
  limit?: number;
};

export type RegisterPage<R> = {
  rows: Listed<R>[];
  total: number;
  next: string | null;
  /** What `before` is for the page before this one; null on the first. */
  previous: string | null;
};

type Columns = Record<string, unknown>;
type Mark = [empty: number, value: string | number | null, tag: string, documentId: Id, elementId: Id];

/** Whether a register may be sorted and filtered by a column. */
export function hasColumn(name: RegisterName, column: string): boolean {
  return (REGISTERS[name].columns as readonly string[]).includes(column);
}

/** The register's table, of a site or of some documents, with the results of hidden documents emptied. */
function source(db: Db, name: RegisterName, query: RegisterQuery, documents?: readonly Id[]) {
  const register = REGISTERS[name] as unknown as Register<RegisterHead>;
  const hidden = [...(query.hidden ?? [])];
  const base = db(register.table.name).where({ truth: query.truth ?? 'in-force' });
  if (documents) void base.whereIn('document_id', documents);
  else void base.where({ site_id: query.siteId });
  if (hidden.length === 0) return base.select('*', db.raw('0 as hidden'));
  const listed = hidden.map(() => '?').join(', ');
  const emptied = register.results.map((column) =>
    db.raw(`CASE WHEN document_id IN (${listed}) THEN NULL ELSE ?? END AS ??`, [...hidden, snake(column), snake(column)]),
  );
  const kept = ['document_id', 'truth', 'element_id', 'site_id', 'unit_id', ...untouched(name)];
  return base.select(...new Set(kept), ...emptied, db.raw(`document_id IN (${listed}) AS hidden`, hidden));
}

const SHOWN: Record<RegisterName, readonly string[]> = {
  systems: ['tag', 'name', 'case_id', 'devices', 'revision', 'service', 'grade', 'owner_id', 'points', 'examined_on', 'in_force_since'],
  points: ['tag', 'name', 'system_tag', 'equipment', 'kind', 'purpose', 'service', 'discharges_to'],
  scenarios: ['tag', 'name', 'system_tag', 'key', 'ord', 'disposition', 'examined_on'],
  conditions: ['tag', 'name', 'system_tag', 'kind', 'requires', 'supports', 'round_months', 'seen_at', 'agrees'],
  headers: ['tag', 'name', 'revision', 'case_id', 'service', 'disposes_to', 'members', 'causes'],
};
const untouched = (name: RegisterName): readonly string[] => SHOWN[name];

const asNumber = (value: Scalar): string | number => (typeof value === 'boolean' ? Number(value) : value);

/** The rows that match filters and text, without order or page. */
function matching(db: Db, name: RegisterName, query: RegisterQuery) {
  const rows = db.from(source(db, name, query).as('r'));
  for (const [column, filter] of Object.entries(query.filters ?? {})) {
    if (!hasColumn(name, column)) continue;
    if (typeof filter !== 'object') void rows.where(snake(column), asNumber(filter));
    else if (Array.isArray(filter)) void rows.whereIn(snake(column), filter.map(asNumber));
    else {
      const { min, max } = filter as { min?: string | number; max?: string | number };
      if (min !== undefined) void rows.where(snake(column), '>=', min);
      if (max !== undefined) void rows.where(snake(column), '<=', max);
    }
  }
  for (const word of (query.text ?? '').split(/\s+/).filter(Boolean).slice(0, 8)) {
    const pattern = `%${word.replace(/[\\%_]/g, (sign) => `\\${sign}`)}%`;
    const columns = (REGISTERS[name].text as readonly string[]).map(snake);
    const anywhere = columns.map(() => `?? LIKE ? ESCAPE '\\'`).join(' OR ');
    void rows.whereRaw(`(${anywhere})`, columns.flatMap((column) => [column, pattern]));
  }
  return rows;
}

function readMark(cursor: string | undefined): Mark | undefined {
  if (!cursor) return undefined;
  try {
    const mark: unknown = JSON.parse(Buffer.from(cursor, 'base64url').toString('utf8'));
    if (!Array.isArray(mark) || mark.length !== 5) return undefined;
    return mark.every((part) => part === null || ['string', 'number'].includes(typeof part)) ? (mark as Mark) : undefined;
  } catch {
    return undefined;
  }
}

function markOf(row: Columns, column: string): string {
  const value = (row[column] ?? null) as Mark[1];
  const mark: Mark = [
    value === null ? 1 : 0,
    value,
    String(row['tag']),
    String(row['document_id']),
    String(row['element_id']),
  ];
  return Buffer.from(JSON.stringify(mark)).toString('base64url');
}

const BEYOND = `(?? IS NULL) AWAY ? OR ((?? IS NULL) = ? AND
  (?? SIGN ? OR (?? IS ? AND (tag, document_id, element_id) AWAY (?, ?, ?))))`;

/**
 * A page of a register: rows in order (empty values last, then by tag), how many match in all, and the cursors of
 * the next page and of the one before. An unknown sort column or cursor gives the first page by tag.
 */
export async function listRegister<N extends RegisterName>(
  db: Db,
  name: N,
  query: RegisterQuery,
): Promise<RegisterPage<RegisterRows[N]>> {
  const limit = Math.min(Math.max(query.limit ?? 50, 1), 2_000);
  const column = snake(query.sort !== undefined && hasColumn(name, query.sort) ? query.sort : 'tag');
  const counted = (await matching(db, name, query).count('* as n').first()) as { n: number } | undefined;
  const back = readMark(query.before) !== undefined;
  const found = await inOrder(db, name, query, column, limit + 1);
  const more = found.length > limit;
  const page = back ? found.slice(0, limit).reverse() : found.slice(0, limit);
  const [first, last] = [page[0], page.at(-1)];
  const later = back || readMark(query.cursor) !== undefined;
  return {
    rows: await whole(db, name, query, page),
    total: counted?.n ?? 0,
    next: (back || more) && last ? markOf(last, column) : null,
    previous: (back ? more : later) && first ? markOf(first, column) : null,
  };
}

/** The keys of a page in order, nearest first when it goes back: narrow rows sort several times faster than whole ones. */
async function inOrder(
  db: Db,
  name: RegisterName,
  query: RegisterQuery,
  column: string,
  limit: number,
): Promise<Columns[]> {
  const descending = query.direction === 'desc';
  const rows = matching(db, name, query).select(...new Set(['document_id', 'element_id', 'tag', column]));
  const backwards = readMark(query.before);
  const back = backwards !== undefined;
  const mark = backwards ?? readMark(query.cursor);
  if (mark) {
    const [empty, value, ...last] = mark;
    const sql = BEYOND.replaceAll('AWAY', back ? '<' : '>').replace('SIGN', descending !== back ? '<' : '>');
    void rows.whereRaw(`(${sql})`, [column, empty, column, empty, column, value, column, value, ...last] as never[]);
  }
  const ties = ['tag', 'document_id', 'element_id'].map((tie) => (back ? `${tie} DESC` : tie)).join(', ');
  const order = `?? ${descending !== back ? 'DESC' : 'ASC'} NULLS ${back ? 'FIRST' : 'LAST'}, ${ties}`;
  return (await rows.orderByRaw(order, [column]).limit(limit)) as Columns[];
}

const keyOf = (row: Columns): string => `${String(row['document_id'])} ${String(row['element_id'])}`;

/** Whole rows for keys, in the order of the keys. */
async function whole<N extends RegisterName>(
  db: Db,
  name: N,
  query: RegisterQuery,
  keys: readonly Columns[],
): Promise<Listed<RegisterRows[N]>[]> {
  if (keys.length === 0) return [];
  const documents = [...new Set(keys.map((key) => String(key['document_id'])))];
  const rows = (await source(db, name, query, documents)) as Columns[];
  const byKey = new Map(rows.map((row) => [keyOf(row), row]));
  return keys.flatMap((key) => {
    const row = byKey.get(keyOf(key));
    return row ? [shown(name, row)] : [];
  });
}

function shown<N extends RegisterName>(name: N, row: Columns): Listed<RegisterRows[N]> {
  const register = REGISTERS[name] as unknown as Register<RegisterHead>;
  const { hidden, ...columns } = row;
  return { ...fromColumns(register.table, columns), hidden: hidden === 1 } as Listed<RegisterRows[N]>;
}

/** How many rows of a query hold each value of a column, most first; hidden results count under no value. */
export async function countBy(
  db: Db,
  name: RegisterName,
  query: RegisterQuery,
  column: string,
): Promise<{ value: string; count: number }[]> {
  if (!hasColumn(name, column)) return [];
  const key = snake(column);
  const rows = (await matching(db, name, query)
    .whereNotNull(key)
    .groupBy(key)
    .select(`${key} as value`)
    .count('* as n')
    .orderBy('n', 'desc')) as unknown as { value: string; n: number }[];
  return rows.map((row) => ({ value: String(row.value), count: row.n }));
}

/** The rows of some documents for one truth: a system's own rows, or the approved truth beside the one in force. */
export async function registerRowsOf<N extends RegisterName>(
  db: Db,
  name: N,
  documentIds: readonly Id[],
  truth: Truth,
): Promise<RegisterRows[N][]> {
  const register = REGISTERS[name] as unknown as Register<RegisterHead>;
  const rows = (await db(register.table.name)
    .where({ truth })
    .whereIn('document_id', documentIds)
    .orderBy(['document_id', 'tag', 'element_id'])) as Columns[];
  return rows.map((row) => fromColumns(register.table, row) as RegisterRows[N]);
}
