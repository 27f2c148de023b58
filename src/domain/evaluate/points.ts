/* Sheets and results of each relief point: rated capacity, inlet loss, back pressures, cold setting, force. */
import { type ExternalSheet, quantityOf, type ReliefPoint } from '@domain/basis';
import { methodById } from '@engine/catalog';
import { convert, fromSI, type Q, toSI } from '@engine/quantity';
import { externalAsSheet, externalFigure, externalsFor } from './external';
import { pointBackPressure } from './back-pressure';
import { worstOf } from './groups';
import { fluidValues } from './implicit';
import { actualArea } from './installed';
import { outputOf, workedSheet, type Made } from './sheets';
import { type Evaluation, type PointResult, type Sheet } from './types';
import { codeOf, type CredibleAnswer, limitingSide, type Work } from './work';

const ABOUTS = ['rated', 'inlet', 'outlet', 'force'] as const;
const DIFFERENCE: Record<string, string> = {
  psig: 'psi',
  bar_g: 'bar',
  kPa_g: 'kPa',
  mbar_g: 'mbar',
  MPa_g: 'MPa',
};

/** The unit of a pressure difference that goes with a gauge unit. */
export function differenceUnit(gauge: string): string {
  return DIFFERENCE[gauge] ?? 'kPa';
}

/** Makes the sheets of every relief point and its results. */
export function pointResults(work: Work, groups: Evaluation['groups']): Evaluation['points'] {
  return Object.fromEntries(
    work.basis.reliefPoints.map((point) => {
      const governing = governingOf(work, groups, point);
      for (const about of ABOUTS) makeExternal(work, about, point);
      if (!work.sheets[`rated:${point.id}`]) makeRated(work, point, governing);
      makeCold(work, point);
      return [point.id, resultOf(work, groups, point)];
    }),
  );
}

function groupIds(work: Work, point: ReliefPoint): string[] {
  return work.basis.groups
    .filter((group) => group.members.some((member) => member.point === point.id))
    .map((group) => group.id);
}

function governingOf(
  work: Work,
  groups: Evaluation['groups'],
  point: ReliefPoint,
): CredibleAnswer | undefined {
  const results = groupIds(work, point).flatMap((id) => groups[id] ?? []);
  const key = results.toSorted((a, b) => (b.use ?? 0) - (a.use ?? 0))[0]?.governing;
  return work.answers.find((ca) => `size:${ca.id}` === key);
}

function makeExternal(work: Work, about: ExternalSheet['about'], point: ReliefPoint): void {
  const sheet = externalsFor(work, about, point)[0];
  if (!sheet) return;
  const key = about === 'outlet' ? `outlet:${point.id}/own` : `${about}:${point.id}`;
  work.sheets[key] = externalAsSheet(work, key, sheet);
}

/** Rated capacity from the actual area and the certified coefficient at 10 % overpressure (or its floor), in the governing fluid. */
function makeRated(work: Work, point: ReliefPoint, ca: CredibleAnswer | undefined): void {
  const method = methodById('a.rated-capacity');
  const set = quantityOf(point.set);
  const coefficient = quantityOf(point.k?.gas);
  const area = actualArea(point);
  const fluid = ca?.answer.fluid === undefined ? undefined : work.lookup.fluids.get(ca.answer.fluid);
  if (!method || !set || !coefficient || area === undefined || !fluid) return;
  if (fluid.phase !== 'gas' && fluid.phase !== 'vapour') return;
  const at = `reliefPoints/${point.id}`;
  const floor = work.basis.units === 'US' ? 3 * 6894.757293168 : 20e3;
  const p1 = toSI(set) + Math.max(0.1 * toSI(set), floor) + toSI(work.context.barometer);
  const back = pointBackPressure(work, point);
  const made: Made = {
    inputs: {
      A_actual: fromSI(area, 'mm2'),
      K_certified: coefficient,
      P1: fromSI(p1, 'kPa_abs'),
      P2: fromSI(back.pa, 'kPa_abs'),
    },
    from: { A_actual: `${at}/orifice/actual`, K_certified: `${at}/k/gas`, P1: `${at}/set`, P2: back.path },
  };
  const values = fluidValues(work, fluid);
  for (const name of ['T', 'Z', 'M', 'k']) {
    const found = values[name]?.();
    if (!found) return;
    made.inputs[name] = found.value;
    made.from[name] = found.path;
  }
  work.sheets[`rated:${point.id}`] = workedSheet(`rated:${point.id}`, method.id, undefined, made, at);
}

/** The cold setting by h.set-tolerance, for spring valves with a set pressure. */
function makeCold(work: Work, point: ReliefPoint): void {
  const set = quantityOf(point.set);
  if (!set || point.axes.recloses !== 'yes' || point.axes.direction === 'under') return;
  const at = `reliefPoints/${point.id}`;
  const made: Made = {
    inputs: { set_pressure: set, valve_type: valveType(point) },
    from: { set_pressure: `${at}/set`, valve_type: `${at}/axes` },
  };
  const optional: [string, Q | undefined, string][] = [
    ['blowdown', quantityOf(point.blowdown), 'blowdown'],
    ['temperature_multiplier', quantityOf(point.temperatureFactor), 'temperatureFactor'],
    ['constant_superimposed', constantSuperimposed(work, point, set.unit), 'superimposed/min'],
  ];
  const code = codeOfPoint(work, point);
  if (code !== undefined) made.inputs['code_basis'] = code;
  for (const [name, q, field] of optional) {
    if (!q) continue;
    made.inputs[name] = q;
    made.from[name] = `${at}/${field}`;
  }
  work.sheets[`cold:${point.id}`] = workedSheet(`cold:${point.id}`, 'h.set-tolerance', undefined, made, at);
}

function codeOfPoint(work: Work, point: ReliefPoint): string | undefined {
  const group = work.basis.groups.find((one) => one.members.some((member) => member.point === point.id));
  const found = group && limitingSide(work.lookup, group.limiting);
  return found && codeOf(found.side, work.basis).basis;
}

function valveType(point: ReliefPoint): string {
  if (point.axes.actuation.includes('pilot')) return 'pilot';
  return point.axes.balance === 'none' ? 'conventional' : 'balanced';
}

function constantSuperimposed(work: Work, point: ReliefPoint, unit: string): Q | undefined {
  const q = quantityOf(point.superimposed?.min);
  return q && { value: convert(q, unit, work.context), unit };
}

function resultOf(work: Work, groups: Evaluation['groups'], point: ReliefPoint): PointResult {
  const verdict = worstOf(groupIds(work, point).flatMap((id) => groups[id]?.verdict ?? []));
  const set = quantityOf(point.set);
  const rated = outputOf(
    work.sheets[`rated:${point.id}`],
    'W_rated',
    'rated_capacity',
    'capacity',
    'relief_load',
  );
  const inletLoss = lossOf(
    work.sheets[`inlet:${point.id}`],
    set,
    ['loss', 'inlet_loss'],
    ['loss_fraction_of_set'],
  );
  const outlet = work.sheets[`outlet:${point.id}/own`];
  const builtUp = lossOf(outlet, set, ['built_up_back_pressure', 'built_up'], ['built_up_fraction_of_set']);
  const total = totalOf(work, point, set);
  return {
    ...(rated ? { rated } : {}),
    ...(inletLoss ? { inletLoss } : {}),
    ...(builtUp ? { builtUp } : {}),
    ...(total ? { total } : {}),
    verdict,
  };
}

/** A pressure difference of a sheet: stated, or as a fraction of set. */
function lossOf(
  sheet: Sheet | undefined,
  set: Q | undefined,
  names: string[],
  fractions: string[],
): Q | undefined {
  const stated = outputOf(sheet, ...names);
  const fraction = outputOf(sheet, ...fractions);
  if (stated || !set || !fraction) return stated;
  return { value: toSI(fraction) * set.value, unit: differenceUnit(set.unit) };
}

/** Total back pressure, gauge in the unit of set; nothing where only the atmosphere is known. */
function totalOf(work: Work, point: ReliefPoint, set: Q | undefined): Q | undefined {
  const sheet = externalsFor(work, 'outlet', point)[0];
  const stated = sheet && externalFigure(sheet, 'total_back_pressure', 'P2', 'back_pressure_used');
  const unit = set?.unit ?? (work.basis.units === 'US' ? 'psig' : 'bar_g');
  if (stated) return { value: convert(stated.q, unit, work.context), unit };
  const found = pointBackPressure(work, point);
  if (found.path === 'site/barometer') return undefined;
  return { value: convert(fromSI(found.pa, 'Pa_abs'), unit, work.context), unit };
}
