/* The registers for programs: rows with quantities in the units of their bases, a page at a time. */
import { type Verdict } from '@domain/evaluate';
import { ok, type Result } from '@domain/result';
import { fromSI, type Q } from '@engine/quantity';
import { type Listed, listRegister, type PointRow, type SystemRow } from '@data/registers';
import { type Actor, type Ctx } from '../../context';
import { hiddenOf } from '../../hidden-view';
import { queryOf, readAsk } from './ask';

export type RowsPage<R> = { rows: R[]; total: number; next: string | null };
type Sized = {
  governing: string | null;
  required: Q | null;
  use: number | null;
  margin: number | null;
  verdict: Verdict | null;
  /** True while results are withheld from the asker: they are null then. */
  hidden: boolean;
};
export type SystemEntry = Sized & {
  tag: string;
  name: string;
  service: string | null;
  revision: number | null;
  load: Q | null;
  installed: Q | null;
  letter: string | null;
};
export type PointEntry = Sized & {
  tag: string;
  system: string | null;
  equipment: string | null;
  kind: string | null;
  set: Q | null;
  area: Q | null;
  letter: string | null;
};

const quantity = (si: number | null, unit: string | null): Q | null =>
  si === null || unit === null ? null : fromSI(si, unit);

function sized(row: Listed<SystemRow> | Listed<PointRow>): Sized {
  return {
    governing: row.governingName,
    required: quantity(row.requiredSi, row.requiredUnit),
    use: row.use,
    margin: row.margin,
    verdict: row.verdict,
    hidden: row.hidden,
  };
}

/** Systems in force. `truth=approved` in the address gives those that are signed and wait to be installed. */
export async function systemRows(
  ctx: Ctx,
  actor: Actor,
  search: URLSearchParams,
): Promise<Result<RowsPage<SystemEntry>>> {
  const hidden = await hiddenOf(ctx, actor);
  const truth = search.get('truth') === 'approved' ? 'approved' : 'in-force';
  const query = queryOf(readAsk('systems', search), actor, hidden, 'governingName');
  const found = await listRegister(ctx.db, 'systems', { ...query, truth });
  const rows = found.rows.map((row) => ({
    ...sized(row),
    tag: row.tag,
    name: row.name,
    service: row.service,
    revision: row.revision,
    load: quantity(row.loadSi, row.loadUnit),
    installed: quantity(row.installedSi, row.installedUnit),
    letter: row.letter,
  }));
  return ok({ rows, total: found.total, next: found.next });
}

/** Relief points in force, or approved with `truth=approved`. */
export async function pointRows(
  ctx: Ctx,
  actor: Actor,
  search: URLSearchParams,
): Promise<Result<RowsPage<PointEntry>>> {
  const hidden = await hiddenOf(ctx, actor);
  const truth = search.get('truth') === 'approved' ? 'approved' : 'in-force';
  const query = queryOf(readAsk('points', search), actor, hidden, 'kind');
  const found = await listRegister(ctx.db, 'points', { ...query, truth });
  const rows = found.rows.map((row) => ({
    ...sized(row),
    tag: row.tag,
    system: row.systemTag,
    equipment: row.equipment,
    kind: row.kind,
    set: quantity(row.setSi, row.setUnit),
    area: quantity(row.areaSi, row.areaUnit),
    letter: row.letter,
  }));
  return ok({ rows, total: found.total, next: found.next });
}
