/* Rated capacity and lines of every relief point: the flow that each passes, with the back pressure which that flow makes. */
import { type Id, type ReliefPoint } from '@domain/basis';
import { toSI } from '@engine/quantity';
import { type BackPressure, pointBackPressure } from './back-pressure';
import { solveFixedPoint } from './fixed-point';
import { lackingInLine, type LineFluid, lineFluid } from './line-fluid';
import { flowIn, type MemberFlows, membersOf } from './line-flows';
import { dischargeSheets, inletSheet, type LineFlow, outletSheet } from './line-sheets';
import { type OutletCase, outletCases, pressureAt } from './outlet-cases';
import { areMeasured, lineOf, pipesOf } from './piping';
import { ratedFlow, type Rating, ratedSheet, ratingOf } from './rated';
import { outputOf, refusedSheet } from './sheets';
import { type CredibleAnswer, type Work } from './work';

/** A relief point with the answer that governs its group. */
export type Governed = { point: ReliefPoint; ca: CredibleAnswer | undefined };

type Passing = {
  point: ReliefPoint;
  ca: CredibleAnswer;
  fluid: LineFluid | undefined;
  rating: Rating | undefined;
  cases: OutletCase[];
  /** Flow against what stands at the outlet while nothing flows, kg/s. */
  first: number;
};

/** What a point passes when it has no rating: the relief load, shared among the credited members. */
function requiredFlow(work: Work, ca: CredibleAnswer): number {
  const load = outputOf(work.sheets[`load:${ca.id}`], 'relief_load');
  const members = membersOf(work, ca).length;
  return load && members > 0 ? toSI(load) / members : 0;
}

/** The flow that a sheet made elsewhere states as rated capacity, kg/s. */
function statedFlow(work: Work, point: ReliefPoint): number | undefined {
  const sheet = work.sheets[`rated:${point.id}`];
  const q = outputOf(sheet, 'W_rated', 'rated_capacity', 'capacity', 'relief_load');
  return q && /^(kg|t|lb)\//.test(q.unit) ? toSI(q) : undefined;
}

function passing(work: Work, { point, ca }: Governed): Passing | undefined {
  if (!ca) return undefined;
  const fluid = lineFluid(work, ca);
  const rating = ratingOf(work, point, ca);
  const stated = statedFlow(work, point);
  const rated = () => (rating ? ratedFlow(work, rating, pointBackPressure(work, point)) : undefined);
  const first = stated ?? rated() ?? requiredFlow(work, ca);
  const elsewhere = work.sheets[`outlet:${point.id}/own`] !== undefined;
  return { point, ca, fluid, rating, cases: fluid && !elsewhere ? outletCases(work, point) : [], first };
}

/** The flows of a point's group, all but its own as they are against their quiet back pressure. */
function flowsFor(work: Work, one: Passing, all: ReadonlyMap<Id, Passing>): MemberFlows {
  return new Map(membersOf(work, one.ca).map((member) => [member.id, all.get(member.id)?.first ?? 0]));
}

/** Flow and back pressure under own relief that belong to each other; the flow alone where the outlet is not worked. */
function settle(work: Work, one: Passing, flows: MemberFlows): { flow: number; back: BackPressure } {
  const { point, rating, fluid } = one;
  const quiet = pointBackPressure(work, point);
  const own = one.cases.find(({ id }) => id === 'own');
  if (!own || !fluid) return { flow: one.first, back: quiet };
  const points = membersOf(work, one.ca);
  const at = `lines/${own.line.id}`;
  const stated = statedFlow(work, point);
  const flowAt = (pa: number) => stated ?? (rating ? ratedFlow(work, rating, { pa, path: at }) : one.first);
  const next = (pa: number) =>
    pressureAt(own, fluid, flowIn(work, point, flowAt(pa), { points, flows }, 'outlet')) ?? Number.NaN;
  const start = pressureAt(own, fluid, flowIn(work, point, one.first, { points, flows }, 'outlet'));
  const solved = solveFixedPoint(next, start ?? quiet.pa, { lo: 0, hi: 1e9 });
  if (!solved.converged) return { flow: one.first, back: quiet };
  return { flow: flowAt(solved.value), back: { pa: solved.value, path: at } };
}

/** Says on a sheet of its own which figure of the fluid keeps a line from being worked. */
function makeLacking(work: Work, one: Passing): void {
  const lacking = lackingInLine(work, one.ca);
  if (!lacking || one.fluid) return;
  for (const side of ['inlet', 'outlet'] as const) {
    const key = side === 'inlet' ? `inlet:${one.point.id}` : `outlet:${one.point.id}/own`;
    const pipes = pipesOf(work.basis, lineOf(work.basis, one.point, side));
    if (work.sheets[key] || !pipes || !areMeasured(pipes)) continue;
    const method = side === 'inlet' ? 'g.inlet-loss' : outletMethodOf(work, one.point);
    const empty = { inputs: {}, from: {} };
    work.sheets[key] = refusedSheet(key, method, empty, 'INPUT_MISSING', lacking.text, lacking.field);
  }
}

function outletMethodOf(work: Work, point: ReliefPoint): string {
  return lineOf(work.basis, point, 'outlet')?.end?.to === 'header' ? 'g.outlet-isothermal' : 'g.outlet-fanno';
}

function makePoint(work: Work, one: Passing, all: ReadonlyMap<Id, Passing>): void {
  const { point, fluid, rating } = one;
  const flows = flowsFor(work, one, all);
  const { flow, back } = settle(work, one, flows);
  const key = `rated:${point.id}`;
  if (rating && !work.sheets[key]) work.sheets[key] = ratedSheet(work, point, rating, back);
  if (!fluid) return makeLacking(work, one);
  if (!(flow > 0)) return;
  const points = membersOf(work, one.ca);
  const rated = rating !== undefined || statedFlow(work, point) !== undefined;
  const path = rated ? `sheets/${key}#W_rated` : `sheets/load:${one.ca.id}#relief_load`;
  const on = (side: 'inlet' | 'outlet'): LineFlow => ({
    basis: rated ? 'rated' : 'required',
    path,
    in: flowIn(work, point, flow, { points, flows }, side),
  });
  const inlet = work.sheets[`inlet:${point.id}`] ? undefined : inletSheet(work, point, fluid, on('inlet'));
  if (inlet) work.sheets[inlet.key] = inlet;
  for (const outlet of one.cases) {
    const sheet = outletSheet(work, point, outlet, fluid, on('outlet'));
    work.sheets[sheet.key] = sheet;
  }
  const own = one.cases.find(({ id }) => id === 'own');
  for (const sheet of own ? dischargeSheets(work, point, own, fluid, on('outlet')) : [])
    work.sheets[sheet.key] ??= sheet;
}

/**
 * Makes the sheets `rated:`, `inlet:`, `outlet:`, `force:` and `noise:` of the relief points; a sheet made elsewhere stands in
 * place of a worked one. Lines carry the rated capacity, or the relief load of a device that has none (a rupture disk).
 */
export function makeLines(work: Work, governed: readonly Governed[]): void {
  const all = new Map<Id, Passing>();
  for (const each of governed) {
    const one = passing(work, each);
    if (one) all.set(one.point.id, one);
  }
  for (const one of all.values()) makePoint(work, one, all);
}
