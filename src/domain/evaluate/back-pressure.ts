/* Back pressure of an answer: from an outlet sheet, or worked along the outlet line from its end, header or superimposed pressure. */
import { type Line, type Path, quantityOf, type ReliefPoint } from '@domain/basis';
import { convert, type Q } from '@engine/quantity';
import { externalFigure, externalsFor } from './external';
import { actualArea, effectiveArea } from './installed';
import { lineFluid } from './line-fluid';
import { flowIn, type MemberFlows, membersOf } from './line-flows';
import { outletCases, pressureAt } from './outlet-cases';
import { lineOf } from './piping';
import { type CredibleAnswer, type Work } from './work';

/** Absolute back pressure at the outlet of the device, Pa, and where it came from. */
export type BackPressure = { pa: number; path: Path };

/** The back pressure as a function of the flow through the group, kg/s. */
export type BackPressureOf = (flow: number) => BackPressure;

function absolute(work: Work, q: Q): number {
  return convert(q, 'Pa_abs', work.context);
}

/** The outlet line of a relief point. */
export function outletOf(work: Pick<Work, 'basis'>, point: ReliefPoint): Line | undefined {
  return lineOf(work.basis, point, 'outlet');
}

function fromSheets(work: Work, point: ReliefPoint): BackPressure | undefined {
  const found = externalsFor(work, 'outlet', point).flatMap((sheet) => {
    const total = externalFigure(sheet, 'P2', 'total_back_pressure', 'back_pressure_used');
    return total ? [{ pa: absolute(work, total.q), path: total.path }] : [];
  });
  return found.toSorted((a, b) => b.pa - a.pa)[0];
}

function fromPoint(work: Work, point: ReliefPoint): BackPressure | undefined {
  const stated = quantityOf(point.superimposed?.max) ?? quantityOf(point.superimposed?.min);
  if (stated) return { pa: absolute(work, stated), path: `reliefPoints/${point.id}/superimposed` };
  const line = outletOf(work, point);
  const end = quantityOf(line?.end?.pressureMax) ?? quantityOf(line?.end?.pressure);
  return line && end && { pa: absolute(work, end), path: `lines/${line.id}/end` };
}

function fromHeader(work: Work, point: ReliefPoint): BackPressure | undefined {
  const header = outletOf(work, point)?.end?.header;
  const imported = header === undefined ? undefined : work.imports.headers[header];
  if (header === undefined || !imported) return undefined;
  const pressures = [imported.normal, ...Object.values(imported.causes).map((cause) => cause.at)];
  return { pa: Math.max(...pressures.map((q) => absolute(work, q))), path: `imports/${header}` };
}

/** The back pressure on one relief point with nothing flowing through the group itself, or what an outlet sheet says. */
export function pointBackPressure(work: Work, point: ReliefPoint): BackPressure {
  return (
    fromSheets(work, point) ??
    fromPoint(work, point) ??
    fromHeader(work, point) ?? { pa: absolute(work, work.context.barometer), path: 'site/barometer' }
  );
}

/** What one member stands against at a flow of its own, Pa absolute; `flows` are those of all members. */
type MemberPressure = (own: number, flows: MemberFlows) => BackPressure;

/** A member whose outlet is worked: the highest of its cases, never below what stands there without flow. */
function workedMember(work: Work, ca: CredibleAnswer, point: ReliefPoint): MemberPressure | undefined {
  if (fromSheets(work, point)) return undefined;
  const fluid = lineFluid(work, ca);
  const cases = fluid ? outletCases(work, point) : [];
  const line = cases[0]?.line;
  if (!fluid || !line) return undefined;
  const points = membersOf(work, ca);
  const stated = fromPoint(work, point);
  return (own, flows) => {
    const flow = flowIn(work, point, own, { points, flows }, 'outlet');
    const worked = cases.map((one) => pressureAt(one, fluid, flow) ?? Number.NaN);
    const pa = Math.max(...worked, point.superimposed ? (stated?.pa ?? 0) : 0);
    return { pa, path: `lines/${line.id}` };
  };
}

/** The share of each member in a flow through the group, by its area. */
function sharesOf(work: Work, members: readonly ReliefPoint[]): number[] {
  const areas = members.map((point) => effectiveArea(point, work.basis.units) ?? actualArea(point) ?? 0);
  const total = areas.reduce((sum, area) => sum + area, 0);
  return areas.map((area) => (total > 0 ? area / total : 1 / members.length));
}

/**
 * The back pressure of an answer as a function of the flow through its group: the highest among its credited members, each worked
 * along its outlet line where line and fluid are known, else the same at every flow.
 */
export function backPressureOf(work: Work, ca: CredibleAnswer): BackPressureOf {
  const members = membersOf(work, ca);
  const barometer = { pa: absolute(work, work.context.barometer), path: 'site/barometer' };
  const quiet = members.map((point) => pointBackPressure(work, point));
  const worked = members.map((point) => workedMember(work, ca, point));
  const shares = sharesOf(work, members);
  return (flow) => {
    const flows = new Map(members.map((point, i) => [point.id, flow * (shares[i] ?? 0)]));
    const pressures = members.flatMap((point, i) => {
      const own = flows.get(point.id) ?? 0;
      return (own > 0 ? worked[i]?.(own, flows) : undefined) ?? quiet[i] ?? [];
    });
    return pressures.toSorted((a, b) => b.pa - a.pa)[0] ?? barometer;
  };
}
