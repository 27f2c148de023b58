/* Writes the registers: one document and truth at a time, replaced as a whole; and what depends on a tag. */
import { type Id, type Instant } from '@domain/case';
import { type Db } from './connection';
import { sightingsOf } from './field';
import { findAll, insertMany, type New } from './mapping';
import { P_DEPENDS, type DependRow, REGISTERS, type Truth } from './tables/registers';
import { type RegisterRows } from './registers';

/** What a document contributes to the registers for one truth; a row's document and truth are filled in. */
export type Projection = {
  [N in keyof RegisterRows]?: readonly Omit<New<RegisterRows[N]>, 'documentId' | 'truth'>[];
} & { depends?: readonly Omit<DependRow, 'documentId' | 'truth'>[] };

const NAMES = ['systems', 'points', 'scenarios', 'conditions', 'headers'] as const;

/** Takes a document's rows of one truth out of every register. */
export async function clearProjection(trx: Db, documentId: Id, truth: Truth): Promise<void> {
  const where = { document_id: documentId, truth };
  for (const name of NAMES) await trx(REGISTERS[name].table.name).where(where).delete();
  await trx(P_DEPENDS.name).where(where).delete();
}

type Condition = NonNullable<Projection['conditions']>[number];

/** Field conditions with when each was last seen, which the document does not know. */
async function withSightings(trx: Db, documentId: Id, rows: readonly Condition[]): Promise<Condition[]> {
  if (rows.length === 0) return [];
  const last = new Map((await sightingsOf(trx, documentId)).map((sighting) => [sighting.condition, sighting]));
  return rows.map((row) => {
    const { at, agrees } = last.get(row.elementId) ?? { at: null, agrees: null };
    return { seenAt: at, agrees, ...row };
  });
}

/** Replaces a document's rows of one truth in every register; field conditions keep when they were last seen. */
export async function writeProjection(
  trx: Db,
  documentId: Id,
  truth: Truth,
  projection: Projection,
): Promise<void> {
  await clearProjection(trx, documentId, truth);
  const conditions = await withSightings(trx, documentId, projection.conditions ?? []);
  for (const name of NAMES) {
    const given = name === 'conditions' ? conditions : (projection[name] ?? []);
    const rows = given.map((row) => ({ ...row, documentId, truth }));
    await insertMany(trx, REGISTERS[name].table as never, rows as never);
  }
  const depends = (projection.depends ?? []).map((row) => ({ ...row, documentId, truth }));
  await insertMany(trx, P_DEPENDS, depends);
}

/** Empties every register, before all documents are projected anew. */
export async function clearAllProjections(trx: Db): Promise<void> {
  for (const name of NAMES) await trx(REGISTERS[name].table.name).delete();
  await trx(P_DEPENDS.name).delete();
}

/** Notes in the register that a field condition was seen. */
export async function markConditionSeen(
  trx: Db,
  documentId: Id,
  condition: Id,
  seen: { at: Instant; agrees: boolean },
): Promise<void> {
  await trx(REGISTERS.conditions.table.name)
    .where({ document_id: documentId, element_id: condition })
    .update({ seen_at: seen.at, agrees: Number(seen.agrees) });
}

/** What rests on a tag at a site, in both truths. */
export function dependsOn(db: Db, siteId: Id, tag: string): Promise<DependRow[]> {
  return findAll(db, P_DEPENDS, { siteId, tag }, 'documentId');
}
