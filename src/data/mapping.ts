/* Rows of the database as typed objects: snake_case to camelCase, JSON columns parsed, 0/1 as booleans. */
import { type Db } from './connection';

/** A table: its name and which of its columns hold JSON or a yes/no. */
export type Table<R extends object> = {
  name: string;
  json: ReadonlySet<string>;
  flags: ReadonlySet<string>;
  /** Only carries the row type. */
  row?: R;
};

type Nullable<R> = { [K in keyof R]-?: null extends R[K] ? K : never }[keyof R];
type Defaulted = 'version' | 'posts' | 'handovers' | 'extensions' | 'tries';

/** A row to insert: what may be null, and what has a default, may be left out. */
export type New<R> = Omit<R, Nullable<R> | Defaulted> & Partial<Pick<R, Nullable<R> | (Defaulted & keyof R)>>;

type Columns = Record<string, unknown>;

/** Declares a table. */
export function table<R extends object>(
  name: string,
  options: { json?: (keyof R & string)[]; flags?: (keyof R & string)[] } = {},
): Table<R> {
  return { name, json: new Set(options.json), flags: new Set(options.flags) };
}

const snakes = new Map<string, string>();
const camels = new Map<string, string>();

/** `sheetHash` → `sheet_hash`. */
export function snake(name: string): string {
  const known = snakes.get(name);
  if (known !== undefined) return known;
  const made = name.replace(/[A-Z]/g, (letter) => `_${letter.toLowerCase()}`);
  snakes.set(name, made);
  return made;
}

function camel(name: string): string {
  const known = camels.get(name);
  if (known !== undefined) return known;
  const made = name.replace(/_([a-z])/g, (_, letter: string) => letter.toUpperCase());
  camels.set(name, made);
  return made;
}

function toValue(of: Table<object>, key: string, value: unknown): unknown {
  if (value === null) return null;
  if (of.json.has(key)) return JSON.stringify(value);
  return of.flags.has(key) ? Number(value) : value;
}

/** An object as columns; absent (undefined) keys are left out, JSON is written as text. */
export function toColumns<R extends object>(of: Table<R>, part: NoInfer<Partial<R> | New<R>>): Columns {
  const columns: Columns = {};
  for (const [key, value] of Object.entries(part)) {
    if (value !== undefined) columns[snake(key)] = toValue(of as Table<object>, key, value);
  }
  return columns;
}

/** A row of the database as an object. */
export function fromColumns<R extends object>(of: Table<R>, columns: Columns): R {
  const object: Columns = {};
  for (const [column, value] of Object.entries(columns)) {
    const key = camel(column);
    if (value !== null && of.json.has(key)) object[key] = JSON.parse(String(value));
    else object[key] = value !== null && of.flags.has(key) ? value === 1 : value;
  }
  return object as R;
}

/** Inserts one row. */
export async function insert<R extends object>(db: Db, into: Table<R>, row: NoInfer<New<R>>): Promise<void> {
  await db(into.name).insert(toColumns(into, row));
}

/** Inserts many rows, in chunks that stay below SQLite's limit of variables. */
export async function insertMany<R extends object>(db: Db, into: Table<R>, rows: readonly NoInfer<New<R>>[]): Promise<void> {
  const columns = rows.map((row) => toColumns(into, row));
  for (let start = 0; start < columns.length; start += 100) {
    await db(into.name).insert(columns.slice(start, start + 100));
  }
}

/** The first row that matches, or undefined. */
export async function findOne<R extends object>(db: Db, from: Table<R>, where: NoInfer<Partial<R>>): Promise<R | undefined> {
  const row = (await db(from.name).where(toColumns(from, where)).first()) as Columns | undefined;
  return row && fromColumns(from, row);
}

/** All rows that match, in the order of a column (by birth when it is the id). */
export async function findAll<R extends object>(
  db: Db,
  from: Table<R>,
  where: NoInfer<Partial<R>>,
  order: keyof R & string = 'id' as keyof R & string,
): Promise<R[]> {
  const rows = (await db(from.name).where(toColumns(from, where)).orderBy(snake(order))) as Columns[];
  return rows.map((row) => fromColumns(from, row));
}

/** All rows whose column holds one of the values. */
export async function findIn<R extends object>(
  db: Db,
  from: Table<R>,
  column: keyof R & string,
  values: readonly string[],
): Promise<R[]> {
  if (values.length === 0) return [];
  const rows = (await db(from.name).whereIn(snake(column), values).orderBy(snake(column))) as Columns[];
  return rows.map((row) => fromColumns(from, row));
}

/** Changes the rows that match; gives how many there were. */
export function updateWhere<R extends object>(db: Db, of: Table<R>, where: NoInfer<Partial<R>>, patch: NoInfer<Partial<R>>): Promise<number> {
  return Promise.resolve(db(of.name).where(toColumns(of, where)).update(toColumns(of, patch)));
}

/**
 * The optimistic lock: changes a row only while it still has the version that was read, and counts the version up.
 * @returns false when another write came first (the caller answers STALE)
 */
export async function updateVersioned<R extends { id: string; version: number }>(
  db: Db,
  of: Table<R>,
  id: string,
  version: number,
  patch: NoInfer<Partial<R>>,
): Promise<boolean> {
  const columns = { ...toColumns(of, patch), version: version + 1 };
  return (await db(of.name).where({ id, version }).update(columns)) === 1;
}
