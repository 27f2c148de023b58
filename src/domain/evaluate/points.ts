/* Sheets and results of each relief point: rated capacity, inlet loss, back pressures, cold setting, force. */
import { type ExternalSheet, quantityOf, type ReliefPoint } from '@domain/basis';
import { convert, dimensionOf, fromSI, type Q, toSI } from '@engine/quantity';
import { externalAsSheet, externalFigure, externalsFor } from './external';
import { pointBackPressure } from './back-pressure';
import { worstOf } from './groups';
import { makeLines } from './lines';
import { outputOf, workedSheet, type Made } from './sheets';
import { type Evaluation, type PointResult, type Sheet } from './types';
import { makeVents } from './vents';
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
  makeVents(work);
  const governed = work.basis.reliefPoints.map((point) => ({ point, ca: governingOf(work, groups, point) }));
  for (const { point } of governed) {
    for (const about of ABOUTS) makeExternal(work, about, point);
    makeCold(work, point);
  }
  makeLines(work, governed);
  return Object.fromEntries(
    work.basis.reliefPoints.map((point) => [point.id, resultOf(work, groups, point)]),
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

/** A pressure difference of a sheet in the unit that goes with set: stated, or as a fraction of set. */
function lossOf(
  sheet: Sheet | undefined,
  set: Q | undefined,
  names: string[],
  fractions: string[],
): Q | undefined {
  const stated = outputOf(sheet, ...names);
  const fraction = outputOf(sheet, ...fractions);
  if (stated) return set ? fromSI(toSI(stated), differenceUnit(set.unit)) : stated;
  if (!set || !fraction) return undefined;
  return { value: toSI(fraction) * set.value, unit: differenceUnit(set.unit) };
}

/** The highest back pressure among the worked outlet sheets of a point, Pa absolute. */
function workedTotal(work: Work, point: ReliefPoint): number | undefined {
  const own = `outlet:${point.id}/`;
  const found = Object.values(work.sheets)
    .filter((sheet) => sheet.key.startsWith(own))
    .flatMap((sheet) => outputOf(sheet, 'total_back_pressure') ?? [])
    .filter((q) => dimensionOf(q.unit) === 'pressure-absolute');
  return found.length === 0 ? undefined : Math.max(...found.map((q) => toSI(q)));
}

/** Total back pressure, gauge in the unit of set; nothing where only the atmosphere is known. */
function totalOf(work: Work, point: ReliefPoint, set: Q | undefined): Q | undefined {
  const sheet = externalsFor(work, 'outlet', point)[0];
  const stated = sheet && externalFigure(sheet, 'total_back_pressure', 'P2', 'back_pressure_used');
  const unit = set?.unit ?? (work.basis.units === 'US' ? 'psig' : 'bar_g');
  if (stated) return { value: convert(stated.q, unit, work.context), unit };
  const worked = workedTotal(work, point);
  const found = pointBackPressure(work, point);
  if (worked === undefined && found.path === 'site/barometer') return undefined;
  const pa = worked ?? found.pa;
  return { value: convert(fromSI(pa, 'Pa_abs'), unit, work.context), unit };
}
