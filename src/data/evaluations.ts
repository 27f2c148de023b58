/* Kept evaluations and the import sets that they rest on. */
import { type Hash } from '@domain/case';
import { pack, unpack } from './bodies';
import { type Db } from './connection';
import { findOne, type New, toColumns } from './mapping';
import { type EvaluationRow, EVALUATIONS, IMPORT_SETS } from './tables/documents';

/** An evaluation with its sheets opened; null when only figures and outcomes were kept. */
export type KeptEvaluation = Omit<EvaluationRow, 'sheets'> & { sheets: unknown };

/** Keeps an evaluation under its key; sheets only when a signature binds it. An evaluation that stands gains sheets at most. */
export async function keepEvaluation(
  trx: Db,
  row: Omit<New<EvaluationRow>, 'sheets'> & { sheets?: unknown },
  methods: readonly string[],
): Promise<void> {
  const sheets = row.sheets === undefined || row.sheets === null ? null : pack(row.sheets);
  const columns = toColumns(EVALUATIONS, { ...row, sheets });
  const insertion = trx(EVALUATIONS.name).insert(columns).onConflict('key');
  await (sheets ? insertion.merge(['sheets']) : insertion.ignore());
  const lines = [...new Set(methods)].map((method) => ({ method, key: row.key }));
  if (lines.length > 0) {
    await trx('evaluation_methods').insert(lines).onConflict(['method', 'key']).ignore();
  }
}

/** A kept evaluation by its key. */
export async function findEvaluation(db: Db, key: Hash): Promise<KeptEvaluation | undefined> {
  const row = await findOne(db, EVALUATIONS, { key });
  return row && { ...row, sheets: row.sheets ? unpack(row.sheets) : null };
}

/** Keys of the kept evaluations that used one of the methods (`a.gas@1`). */
export async function keysUsing(db: Db, methods: readonly string[]): Promise<Hash[]> {
  const rows = await db<{ key: Hash }>('evaluation_methods').distinct('key').whereIn('method', methods);
  return rows.map((row) => row.key);
}

/** Forgets kept evaluations of drafts that are no one's present one; those with sheets stay, a signature binds them. */
export function sweepEvaluations(trx: Db, before: string): Promise<number> {
  return Promise.resolve(
    trx(EVALUATIONS.name)
      .whereNull('sheets')
      .where('at', '<', before)
      .whereNotIn('key', trx('revisions').select('evaluation_key').whereNotNull('evaluation_key'))
      .delete(),
  );
}

/** Keeps an import set under its hash. */
export async function keepImports(trx: Db, hash: Hash, body: unknown): Promise<void> {
  await trx(IMPORT_SETS.name).insert(toColumns(IMPORT_SETS, { hash, body })).onConflict('hash').ignore();
}

/** The import set of a hash. */
export async function findImports(db: Db, hash: Hash): Promise<unknown> {
  return (await findOne(db, IMPORT_SETS, { hash }))?.body;
}
