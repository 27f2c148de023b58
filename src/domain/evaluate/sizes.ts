/* Size sheets: the required area of each answer, with the back pressure that its flow makes. */
import { type Calc, type Path, quantityOf } from '@domain/basis';
import { convert, fromSI, toSI } from '@engine/quantity';
import { backPressureOf, type BackPressure } from './back-pressure';
import { factorValues } from './device-factors';
import { externalAsSheet, externalById } from './external';
import { solveFixedPoint } from './fixed-point';
import { fillImplicit, fluidOf, fluidValues, limitValues, twoPhaseValues, type Values } from './implicit';
import { areaKindOf, installedFor } from './installed';
import { type Found, type Resolved, resolveInputs } from './inputs';
import { missingSheet, outputOf, refusedSheet, statedSheet, workedSheet } from './sheets';
import { isTankMethod, ventValues } from './tanks';
import { type Sheet, type SheetKey } from './types';
import { creditedMembers, type CredibleAnswer, type Work } from './work';

const EMPTY = { inputs: {}, from: {} };
const HIGHEST_BACK_PRESSURE = 1e9;

/** Makes the size sheet of an answer; limit and load sheets must stand. */
export function sizeSheet(work: Work, ca: CredibleAnswer): Sheet {
  const key: SheetKey = `size:${ca.id}`;
  const at = `scenarios/${ca.scenario.id}/answers/${ca.answer.id}/size`;
  const calc = ca.answer.size;
  switch (calc.by) {
    case 'method':
      return methodSize(work, ca, key, at, calc);
    case 'given': {
      const q = quantityOf(calc.figure);
      if (q) return statedSheet(key, 'given', 'A_required', q, `${at}/figure`, 'required area as stated');
      return refusedSheet(
        key,
        'given',
        EMPTY,
        'INPUT_MISSING',
        'The stated required area is not known.',
        `${at}/figure`,
      );
    }
    case 'external': {
      const external = externalById(work, calc.sheet);
      if (external) return externalAsSheet(work, key, external);
      const text = 'The external sheet of this sizing is gone: attach it again.';
      return refusedSheet(key, 'external', EMPTY, 'EXTERNAL_MISSING', text, at);
    }
    default:
      return refusedSheet(
        key,
        calc.by,
        EMPTY,
        'NO_SIZING',
        'No sizing is given: choose a method or attach an external sheet.',
        at,
      );
  }
}

function methodSize(
  work: Work,
  ca: CredibleAnswer,
  key: SheetKey,
  at: Path,
  calc: Calc & { by: 'method' },
): Sheet {
  const resolved = resolveInputs(work, at, calc.inputs, () => undefined);
  const missing = resolved.missing[0];
  if (missing) return missingSheet(key, calc.method, resolved, missing);
  const limit = work.sheets[`limit:${ca.id}`];
  if (limit?.refused && !('P1' in resolved.inputs)) {
    return refusedSheet(key, calc.method, resolved, 'LIMIT_MISSING', limit.refused.text, limit.refused.field);
  }
  const load = work.sheets[`load:${ca.id}`];
  if (load?.refused && !('W' in resolved.inputs || 'Q' in resolved.inputs)) {
    return refusedSheet(key, calc.method, resolved, 'LOAD_MISSING', load.refused.text, load.refused.field);
  }
  return settled(work, ca, (back) => workedAt(work, ca, { key, at, calc, resolved }, back));
}

type Task = { key: SheetKey; at: Path; calc: Calc & { by: 'method' }; resolved: Resolved };

/** Solves for the back pressure that the flow through the installed area makes; gives the sheet worked there. */
function settled(work: Work, ca: CredibleAnswer, at: (back: BackPressure) => Sheet): Sheet {
  const backAt = backPressureOf(work, ca);
  const quiet = backAt(0);
  let latest: { pa: number; sheet: Sheet } | undefined;
  let path = quiet.path;
  const sheetAt = (pa: number): Sheet => {
    if (latest?.pa !== pa) latest = { pa, sheet: at({ pa, path }) };
    return latest.sheet;
  };
  const next = (pa: number): number => {
    const back = backAt(flowThrough(work, ca, sheetAt(pa)));
    path = back.path;
    return back.pa;
  };
  const relieving = outputOf(work.sheets[`limit:${ca.id}`], 'P1');
  const range = { lo: 0, hi: Math.max(relieving ? toSI(relieving) : HIGHEST_BACK_PRESSURE, quiet.pa) };
  const solved = solveFixedPoint(next, quiet.pa, range);
  const sheet = sheetAt(solved.value);
  if (solved.converged || sheet.refused) return sheet;
  const text = `Flow and back pressure do not settle: ${solved.why}.`;
  return { ...sheet, refused: { code: 'NOT_CONVERGED', text, field: sheet.from['P2'] ?? sheet.key } };
}

/** Mass flow, kg/s, that the installed area passes when the sheet's load needs the required one. */
function flowThrough(work: Work, ca: CredibleAnswer, sheet: Sheet): number {
  const required = outputOf(sheet, 'A_required');
  const load = outputOf(work.sheets[`load:${ca.id}`], 'relief_load');
  if (!required || !load || toSI(required) <= 0) return 0;
  return (toSI(load) * installedFor(work, ca, areaKindOf(sheet)).m2) / toSI(required);
}

function workedAt(work: Work, ca: CredibleAnswer, task: Task, back: BackPressure): Sheet {
  const { calc } = task;
  const made = fillImplicit(
    calc.method,
    task.resolved,
    sizeValues(work, ca, calc.method, task.resolved, back),
  );
  return workedSheet(task.key, calc.method, calc.edition, made, task.at);
}

function sizeValues(
  work: Work,
  ca: CredibleAnswer,
  method: string,
  resolved: Resolved,
  back: BackPressure,
): Values {
  const path = ca.answer.T ? `scenarios/${ca.scenario.id}/answers/${ca.answer.id}/T` : undefined;
  const own = quantityOf(ca.answer.T);
  const values: Values = {
    ...fluidValues(work, fluidOf(work, ca)),
    ...limitOrPressure(work, ca, method),
    ...factorValues(work, ca, method, back),
    ...loadFlow(work, ca),
    balanced: () => balancedFlag(work, ca),
    P2: () => backAbsolute(work, back),
    // Two-phase methods take every pressure as absolute and so need no barometer.
    back_pressure: () => (method.startsWith('d.') ? backAbsolute(work, back) : backGauge(work, back)),
    ...isoValues(work, ca, back),
    ...exposedValues(work, ca),
    ...(method.startsWith('d.') ? twoPhaseValues(work, fluidOf(work, ca)) : {}),
    ...(isTankMethod(method) ? ventValues(work, ca) : {}),
  };
  if ('KSH' in resolved.inputs) delete values['T'];
  // Of a saturated inlet pressure and quality are enough: a temperature beside them could only contradict.
  if (values['x0']?.() || 'x0' in resolved.inputs) delete values['T0'];
  return own && path !== undefined && !('KSH' in resolved.inputs)
    ? { ...values, T: () => ({ value: own, path }) }
    : values;
}

/** Both pressures under the names of ISO 4126-1. */
function isoValues(work: Work, ca: CredibleAnswer, back: BackPressure): Values {
  const key = `limit:${ca.id}`;
  const p0 = outputOf(work.sheets[key], 'P1');
  return {
    p0: () => p0 && { value: p0, path: `sheets/${key}#P1` },
    pb: () => ({ value: fromSI(back.pa, 'bar_abs'), path: back.path }),
  };
}

/** What the load sheet of a gas-filled vessel found of its surface and temperatures, for its area. */
function exposedValues(work: Work, ca: CredibleAnswer): Values {
  const key = `load:${ca.id}`;
  const load = work.sheets[key];
  const output = (name: string) => (): Found | undefined => {
    const q = outputOf(load, name);
    return q && { value: q, path: `sheets/${key}#${name}` };
  };
  const wall = load?.inputs['T_wall'];
  return {
    A_exposed: output('exposed_area'),
    T1: output('T1'),
    T_wall: () => (wall === undefined ? undefined : { value: wall, path: load?.from['T_wall'] ?? key }),
  };
}

/** Whether the group's devices are balanced, so that their Kb and the critical equation hold in every regime. */
function balancedFlag(work: Work, ca: CredibleAnswer): Found | undefined {
  const member = ca.group && creditedMembers(work.lookup, ca.group, ca.answer)[0];
  if (!member || member.point.axes.balance === 'none') return undefined;
  return { value: true, path: `reliefPoints/${member.point.id}/axes/balance` };
}

function backAbsolute(work: Work, back: BackPressure): Found {
  return { value: fromSI(back.pa, work.basis.units === 'US' ? 'psia' : 'kPa_abs'), path: back.path };
}

function backGauge(work: Work, back: BackPressure): Found {
  const unit = work.basis.units === 'US' ? 'psig' : 'kPa_g';
  return { value: fromSI(back.pa - convert(work.context.barometer, 'Pa_abs'), unit), path: back.path };
}

/** Absolute relieving pressure where the method takes it, else set pressure and overpressure; never both. */
function limitOrPressure(work: Work, ca: CredibleAnswer, method: string): Values {
  const values = limitValues(work, ca);
  const key = `limit:${ca.id}`;
  const p1 = outputOf(work.sheets[key], 'P1');
  if (!p1 || method.startsWith('c.')) return values;
  const only: Values = {
    P1: () => ({ value: p1, path: `sheets/${key}#P1` }),
    P0: () => ({ value: p1, path: `sheets/${key}#P1` }),
  };
  return only;
}

function loadFlow(work: Work, ca: CredibleAnswer): Values {
  const key = `load:${ca.id}`;
  const mass = outputOf(work.sheets[key], 'relief_load');
  return {
    W: () => mass && { value: mass, path: `sheets/${key}#relief_load` },
    Qm: () => mass && { value: mass, path: `sheets/${key}#relief_load` },
  };
}
