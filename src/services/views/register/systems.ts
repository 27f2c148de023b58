/* The register of systems: a page of rows with the truth in force and, where one waits, the approved one. */
import { ok, type Result } from '@domain/result';
import { findCases } from '@data/cases';
import { type Listed, listRegister, registerRowsOf, type SystemRow } from '@data/registers';
import { type Actor, type Ctx } from '../../context';
import { type Hidden, hiddenOf } from '../../hidden-view';
import { addressOf, aroundOf, type CaseLink, openCaseLinks, seenDocuments, type Around } from './around';
import { type Ask, PAGE_SIZE, queryOf, readAsk } from './ask';
import { type Cell, headUnit, type Sized, sizedOf } from './figures';
import { remembered } from './remembered';

/** The approved truth of a row: what will hold once it is installed. */
export type Waiting = Sized & { case?: CaseLink };

export type SystemLine = Sized & {
  tag: string;
  href: string;
  name: string;
  unit: string;
  devices: string;
  revision: string;
  hidden: boolean;
  cases: CaseLink[];
  waiting?: Waiting;
};

/** A page of a register. */
export type RegisterView<L> = {
  path: string;
  ask: Ask;
  around: Around;
  rows: L[];
  matching: number;
  /** Units that stand in the heads of their columns. */
  heads: { set?: string; required?: string; installed?: string };
  /** The addresses of the pages around this one, and of the first when this is a later one. */
  next?: string;
  previous?: string;
  start?: string;
  csv: string;
  clear: string;
};

/** Cells lose the unit that the head of their column says. */
export function underHead(cell: Cell | undefined, head: string | undefined): Cell | undefined {
  return cell && head !== undefined ? { ...cell, unit: '' } : cell;
}

/** The parts of a page that every register shares. */
export function pageOf<L>(
  path: string,
  ask: Ask,
  around: Around,
  found: { rows: readonly unknown[]; total: number; next: string | null; previous: string | null },
): Omit<RegisterView<L>, 'rows' | 'heads'> {
  const from = { ...ask, after: '', before: '' };
  const first = found.previous === null ? 1 : ask.first;
  const n = String(first + PAGE_SIZE);
  const back = String(Math.max(1, first - PAGE_SIZE));
  return {
    path,
    ask: { ...ask, first },
    around,
    matching: found.total,
    csv: addressOf(from, `${path}.csv`),
    clear: path,
    ...(found.next === null ? {} : { next: addressOf(from, path, { after: found.next, n }) }),
    ...(found.previous === null
      ? {}
      : {
          previous: addressOf(from, path, { before: found.previous, n: back }),
          start: addressOf(from, path),
        }),
  };
}

function lineOf(
  row: Listed<SystemRow>,
  site: string,
  ask: Ask,
  of: {
    units: ReadonlyMap<string, string>;
    cases: ReadonlyMap<string, CaseLink[]>;
    waiting: ReadonlyMap<string, Waiting>;
  },
): SystemLine {
  const waiting = of.waiting.get(row.documentId);
  return {
    ...sizedOf(row, { si: row.installedSi, unit: row.installedUnit }, ask.figures),
    tag: row.tag,
    href: `/s/${site}/systems/${encodeURIComponent(row.tag)}`,
    name: row.name,
    unit: of.units.get(row.unitId) ?? '',
    devices: row.devices ?? '',
    revision: row.revision === null ? '–' : String(row.revision),
    hidden: row.hidden,
    cases: of.cases.get(row.documentId) ?? [],
    ...(waiting ? { waiting } : {}),
  };
}

/** The cases that approved revisions belong to, by document. */
export async function approvedCases(
  ctx: Ctx,
  actor: Actor,
  rows: readonly Pick<SystemRow, 'documentId' | 'caseId'>[],
): Promise<Map<string, CaseLink>> {
  const found = await findCases(
    ctx.db,
    rows.flatMap((row) => row.caseId ?? []),
  );
  return new Map(
    rows.flatMap((row) => {
      const one = found.find((each) => each.id === row.caseId);
      const href = `/s/${actor.site.slug}/cases/${one?.number ?? ''}`;
      return one ? [[row.documentId, { number: one.number, href }] as const] : [];
    }),
  );
}

async function waitingOf(
  ctx: Ctx,
  actor: Actor,
  ask: Ask,
  documents: readonly string[],
): Promise<Map<string, Waiting>> {
  const rows = await registerRowsOf(ctx.db, 'systems', documents, 'approved');
  const cases = await approvedCases(ctx, actor, rows);
  return new Map(
    rows.map((row) => {
      const link = cases.get(row.documentId);
      const sized = sizedOf(row, { si: row.installedSi, unit: row.installedUnit }, ask.figures);
      return [row.documentId, { ...sized, ...(link ? { case: link } : {}) }];
    }),
  );
}

/** Units move from the rows to the heads of columns that have only one. */
export function headed<L extends Sized & { waiting?: Waiting; set?: Cell }>(
  rows: readonly L[],
): { rows: L[]; heads: RegisterView<L>['heads'] } {
  const both = rows.flatMap((row) => [row, ...(row.waiting ? [row.waiting] : [])]);
  const required = headUnit(both.map((row) => row.required));
  const installed = headUnit(both.map((row) => row.installed));
  const set = headUnit(rows.map((row) => row.set));
  const bare = <S extends Sized>(row: S): S => ({
    ...row,
    ...(row.required ? { required: underHead(row.required, required) } : {}),
    ...(row.installed ? { installed: underHead(row.installed, installed) } : {}),
  });
  return {
    rows: rows.map((row) => ({
      ...bare(row),
      ...(row.waiting ? { waiting: bare(row.waiting) } : {}),
      ...(row.set ? { set: underHead(row.set, set) } : {}),
    })),
    heads: {
      ...(set ? { set } : {}),
      ...(required ? { required } : {}),
      ...(installed ? { installed } : {}),
    },
  };
}

/** The register of systems as its address asks for it; results of hidden documents are absent from rows, order and filters. */
export async function systemsView(
  ctx: Ctx,
  actor: Actor,
  search: URLSearchParams,
): Promise<Result<RegisterView<SystemLine>>> {
  const ask = readAsk('systems', search);
  const hidden = await hiddenOf(ctx, actor);
  const asked = `systems ${search.toString()}`;
  return ok(await remembered(ctx, actor, hidden, asked, () => page(ctx, actor, hidden, ask)));
}

async function page(ctx: Ctx, actor: Actor, hidden: Hidden, ask: Ask): Promise<RegisterView<SystemLine>> {
  const kind = { name: 'systems', kindColumn: 'governingName', anyKind: 'Any scenario' } as const;
  const [around, found] = await Promise.all([
    aroundOf(ctx, actor, hidden, kind),
    listRegister(ctx.db, 'systems', queryOf(ask, actor, hidden, kind.kindColumn)),
  ]);
  const documents = found.rows.map((row) => row.documentId);
  const of = {
    units: new Map(around.units.map((unit) => [unit.id, unit.tag])),
    cases: await openCaseLinks(ctx, actor, documents),
    waiting: await waitingOf(ctx, actor, ask, seenDocuments(found.rows)),
  };
  const lines = found.rows.map((row) => lineOf(row, actor.site.slug, ask, of));
  const path = `/s/${actor.site.slug}/register/systems`;
  return { ...pageOf<SystemLine>(path, ask, around, found), ...headed(lines) };
}
