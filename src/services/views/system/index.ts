/* The parts of a system's page, each as one view that holds only what its reader may see. */
import { ok, type Result } from '@domain/result';
import { findPeople } from '@data/people';
import { type Actor, type Ctx } from '../../context';
import { type BasisView, basisView } from './basis';
import { type FactGroup } from './facts';
import { frameOf, type SystemFrame, type SystemPart } from './frame';
import { openSystem, type OpenedSystem, type Seen } from './open';
import { linesOf, type LinesView, matrixOf, type MatrixView, outcomesOf, type OutcomeView } from './parts';
import { pointsOf, type PointsView } from './points';
import { differenceOf, type DifferenceView, revisionLines, type RevisionLine } from './revisions';
import { groupViews, type GroupView } from './scenario-lines';
import { hiddenKeys, sheetGroups, type SheetGroup, sheetView, type SheetView } from './sheets';

export { systemDocument, systemEvaluation } from './programs';
export type {
  BasisView,
  DifferenceView,
  FactGroup,
  GroupView,
  LinesView,
  MatrixView,
  OutcomeView,
  PointsView,
  RevisionLine,
  SheetGroup,
  SheetView,
  SystemFrame,
  SystemPart,
};

/** A part of a system's page: its frame, and what the part shows; `view` is absent while no revision can be read. */
export type SystemPage<V> = { frame: SystemFrame; view?: V };

/** Which revision an address asks for: `?revision=4`. */
export function revisionAsked(search: URLSearchParams): number | undefined {
  const number = Number.parseInt(search.get('revision') ?? '', 10);
  return Number.isSafeInteger(number) && number >= 0 ? number : undefined;
}

type Make<V> = (of: OpenedSystem, seen: Seen) => V | Promise<V>;

function partOf<V>(make: Make<V>) {
  return async (
    ctx: Ctx,
    actor: Actor,
    tag: string,
    search: URLSearchParams,
  ): Promise<Result<SystemPage<V>>> => {
    const opened = await openSystem(ctx, actor, tag, revisionAsked(search));
    if (!opened.ok) return opened;
    const of = opened.value;
    const frame = frameOf(of);
    return ok(of.shown ? { frame, view: await make(of, of.shown) } : { frame });
  };
}

/** The names of those whom the basis names by id: writers of justifications, keepers of keys. */
async function namedOf(of: OpenedSystem, { body }: Seen): Promise<Map<string, string>> {
  const locked = [...body.isolations, ...body.fieldConditions].flatMap((one) => one.lock?.keeper ?? []);
  const ids = new Set([...body.justifications.map((one) => one.by), ...locked]);
  const people = await findPeople(of.ctx.db, [...ids]);
  return new Map(people.map((person) => [person.id, person.name]));
}

export type OverviewView = {
  groups: GroupView[];
  points: PointsView;
  conditions: BasisView['conditions'];
  outcomes: { stops: number; justifies: number; notes: number };
  hidden: boolean;
};

/** Overview: what governs, the orifice bars, the pressure ladders, what the basis rests on. */
export const systemOverview = partOf<OverviewView>(async (of, seen) => {
  const count = (severity: string) => seen.outcomes.filter((one) => one.severity === severity).length;
  return {
    groups: groupViews(of, seen),
    points: pointsOf(of, seen),
    conditions: basisView(of, seen, await namedOf(of, seen)).conditions,
    outcomes: { stops: count('stop'), justifies: count('justify'), notes: count('note') },
    hidden: of.hidden,
  };
});

/** The relief basis as a document. */
export const systemBasis = partOf<BasisView>(async (of, seen) =>
  basisView(of, seen, await namedOf(of, seen)),
);

/** Relief points with their ladders and every figure. */
export const systemPoints = partOf<PointsView>(pointsOf);

/** Credible scenarios by group, and all scenarios by status. */
export const systemScenarios = partOf<{ groups: GroupView[]; matrix: MatrixView }>((of, seen) => ({
  groups: groupViews(of, seen),
  matrix: matrixOf(of, seen),
}));

/** The list of calculation sheets. */
export const systemSheets = partOf<{ groups: SheetGroup[] }>((of, seen) => ({
  groups: sheetGroups(of, seen, seen.evaluation ? [] : hiddenKeys(seen.body)),
}));

/** Inlet and outlet lines. */
export const systemLines = partOf<LinesView>(linesOf);

/** Outcomes of the rulebook. */
export const systemOutcomes = partOf<{ outcomes: OutcomeView[]; hidden: boolean }>(async (of, seen) => ({
  hidden: of.hidden,
  outcomes: outcomesOf(of, seen, await namedOf(of, seen)),
}));

/** Revisions, newest first; shown even while none is in force. */
export async function systemRevisions(
  ctx: Ctx,
  actor: Actor,
  tag: string,
): Promise<Result<SystemPage<{ revisions: RevisionLine[] }>>> {
  const opened = await openSystem(ctx, actor, tag);
  if (!opened.ok) return opened;
  return ok({ frame: frameOf(opened.value), view: { revisions: await revisionLines(opened.value) } });
}

/** One calculation sheet. */
export async function systemSheet(
  ctx: Ctx,
  actor: Actor,
  tag: string,
  key: string,
  search: URLSearchParams,
): Promise<Result<SystemPage<SheetView>>> {
  const opened = await openSystem(ctx, actor, tag, revisionAsked(search));
  if (!opened.ok) return opened;
  const frame = frameOf(opened.value);
  if (!opened.value.shown) return ok({ frame });
  const sheet = sheetView(opened.value, opened.value.shown, key);
  return sheet.ok ? ok({ frame, view: sheet.value }) : sheet;
}

/** What differs between two revisions, `?from=3&to=4`; `approved` names the one that waits. */
export async function systemDifference(
  ctx: Ctx,
  actor: Actor,
  tag: string,
  search: URLSearchParams,
): Promise<Result<SystemPage<DifferenceView>>> {
  const opened = await openSystem(ctx, actor, tag);
  if (!opened.ok) return opened;
  const found = await differenceOf(opened.value, search.get('from') ?? '', search.get('to') ?? '');
  return found.ok ? ok({ frame: frameOf(opened.value), view: found.value }) : found;
}
