/* The register of relief points: each with its setting, its size and how far its group is used. */
import { ok, type Result } from '@domain/result';
import { listDocuments } from '@data/documents';
import { type Listed, listRegister, type PointRow, registerRowsOf } from '@data/registers';
import { type Actor, type Ctx } from '../../context';
import { type Hidden, hiddenOf } from '../../hidden-view';
import { aroundOf, type CaseLink, openCaseLinks, seenDocuments } from './around';
import { type Ask, queryOf, readAsk } from './ask';
import { type Cell, setCellOf, sizedOf } from './figures';
import { remembered } from './remembered';
import { approvedCases, headed, pageOf, type RegisterView, type SystemLine, type Waiting } from './systems';

export type PointLine = Omit<SystemLine, 'unit' | 'devices' | 'revision'> & {
  system: { tag: string; href: string };
  equipment: string;
  kind: string;
  set?: Cell;
  dischargesTo: string;
};

/** Required and installed area are those of the group; what is installed follows from required and use. */
function ofGroup(row: Pick<PointRow, 'requiredSi' | 'requiredUnit' | 'use'> | Listed<PointRow>) {
  const known = row.requiredSi !== null && row.use !== null && row.use > 0;
  return { si: known ? Number(row.requiredSi) / Number(row.use) : null, unit: row.requiredUnit };
}

type Of = {
  headers: ReadonlyMap<string, string>;
  cases: ReadonlyMap<string, CaseLink[]>;
  waiting: ReadonlyMap<string, Waiting>;
};

function lineOf(row: Listed<PointRow>, site: string, ask: Ask, of: Of): PointLine {
  const waiting = of.waiting.get(`${row.documentId} ${row.elementId}`);
  const set = setCellOf(row.setSi, row.setUnit, ask.figures);
  const system = `/s/${site}/systems/${encodeURIComponent(row.systemTag ?? '')}`;
  return {
    ...sizedOf(row, ofGroup(row), ask.figures),
    tag: row.tag,
    href: `${system}/relief-points#${row.elementId}`,
    name: row.name,
    hidden: row.hidden,
    system: { tag: row.systemTag ?? '', href: system },
    equipment: row.equipment ?? '',
    kind: row.kind ?? '',
    dischargesTo: of.headers.get(row.dischargesTo ?? '') ?? row.dischargesTo ?? '',
    cases: of.cases.get(row.documentId) ?? [],
    ...(set ? { set } : {}),
    ...(waiting ? { waiting } : {}),
  };
}

async function waitingOf(
  ctx: Ctx,
  actor: Actor,
  ask: Ask,
  documents: readonly string[],
): Promise<Map<string, Waiting>> {
  const systems = await registerRowsOf(ctx.db, 'systems', documents, 'approved');
  const cases = await approvedCases(ctx, actor, systems);
  const rows = await registerRowsOf(
    ctx.db,
    'points',
    systems.map((row) => row.documentId),
    'approved',
  );
  return new Map(
    rows.map((row) => {
      const link = cases.get(row.documentId);
      const sized = sizedOf(row, ofGroup(row), ask.figures);
      return [`${row.documentId} ${row.elementId}`, { ...sized, ...(link ? { case: link } : {}) }];
    }),
  );
}

/** The register of relief points as its address asks for it; results of hidden documents are absent from rows, order and filters. */
export async function pointsView(
  ctx: Ctx,
  actor: Actor,
  search: URLSearchParams,
): Promise<Result<RegisterView<PointLine>>> {
  const ask = readAsk('points', search);
  const hidden = await hiddenOf(ctx, actor);
  const asked = `points ${search.toString()}`;
  return ok(await remembered(ctx, actor, hidden, asked, () => page(ctx, actor, hidden, ask)));
}

async function page(ctx: Ctx, actor: Actor, hidden: Hidden, ask: Ask): Promise<RegisterView<PointLine>> {
  const kind = { name: 'points', kindColumn: 'kind', anyKind: 'Any kind' } as const;
  const [around, found, headers] = await Promise.all([
    aroundOf(ctx, actor, hidden, kind),
    listRegister(ctx.db, 'points', queryOf(ask, actor, hidden, kind.kindColumn)),
    listDocuments(ctx.db, actor.site.id, 'header'),
  ]);
  const documents = [...new Set(found.rows.map((row) => row.documentId))];
  const of = {
    headers: new Map(headers.map((header) => [header.id, header.tag])),
    cases: await openCaseLinks(ctx, actor, documents),
    waiting: await waitingOf(ctx, actor, ask, seenDocuments(found.rows)),
  };
  const lines = found.rows.map((row) => lineOf(row, actor.site.slug, ask, of));
  const path = `/s/${actor.site.slug}/register/relief-points`;
  return { ...pageOf<PointLine>(path, ask, around, found), ...headed(lines) };
}
