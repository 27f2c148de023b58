/* Limit sheets: the maximum allowable accumulated pressure (MAAP) and the relieving pressure of each answer, by its side's code. */
import { type Code, type Path, quantityOf, type Side } from '@domain/basis';
import { convert, dimensionOf, fromSI, type Q, toSI } from '@engine/quantity';
import { type Inputs, type Step } from '@engine/sheet';
import { type AccumulationClass, accumulated } from './accumulation';
import { sheetHash } from './keys';
import { type Made, refusedSheet } from './sheets';
import { type Sheet, type SheetKey } from './types';
import { codeOf, creditedMembers, type CredibleAnswer, limitingSide, type Work } from './work';

const METHOD = 'h.accumulation@1';
const ABSOLUTE: Record<string, string> = {
  psig: 'psia',
  bar_g: 'bar_abs',
  kPa_g: 'kPa_abs',
  mbar_g: 'mbar_abs',
  MPa_g: 'MPa_abs',
};

type Ground = { side: Side; mawp: Q; mawpAt: Path; code: Code; made: Made };

/** The unit of a gauge reading; an absolute one is told in kPa gauge. */
function gaugeUnit(q: Q): string {
  return dimensionOf(q.unit) === 'pressure-gauge' ? q.unit : 'kPa_g';
}

/** The absolute unit that goes with a gauge unit. */
export function absoluteUnit(gauge: string): string {
  return ABSOLUTE[gauge] ?? 'kPa_abs';
}

/**
 * The rating of a side for a temperature: the highest MAWP among the pairs whose temperature reaches it; when none does, or
 * the temperature is not known, the lowest of all.
 */
export function ratingFor(side: Side, T: Q | undefined): { id: string; mawp: Q; at?: Q } | undefined {
  const pairs = side.ratings.flatMap((rating) => {
    const mawp = quantityOf(rating.mawp);
    const at = quantityOf(rating.at);
    return mawp ? [{ id: rating.id, mawp, ...(at ? { at } : {}) }] : [];
  });
  const rising = pairs.toSorted((a, b) => toSI(a.mawp) - toSI(b.mawp));
  const reaching = T ? rising.filter((pair) => pair.at && toSI(pair.at) >= toSI(T) - 1) : [];
  return reaching.at(-1) ?? rising[0];
}

/** The relieving temperature of an answer: its own, else that of its fluid. */
export function relievingTemperature(work: Work, ca: CredibleAnswer): Q | undefined {
  const fluid = ca.answer.fluid === undefined ? undefined : work.lookup.fluids.get(ca.answer.fluid);
  return quantityOf(ca.answer.T) ?? quantityOf(fluid?.T);
}

/** Makes the limit sheet of an answer. Refuses, with a sentence, when group, MAWP or set pressure are missing. */
export function limitSheet(work: Work, ca: CredibleAnswer): Sheet {
  const key: SheetKey = `limit:${ca.id}`;
  const ground = groundOf(work, ca, key);
  if ('key' in ground) return ground;
  const { accumulation } = ca.answer;
  if (accumulation === 'tank' || accumulation === 'tank-vacuum') return tankLimit(work, ca, key, ground);
  if (accumulation === 'corrected-test') return testLimit(work, key, ground);
  return classLimit(work, ca, key, ground, accumulation);
}

function groundOf(work: Work, ca: CredibleAnswer, key: SheetKey): Ground | Sheet {
  const none: Made = { inputs: {}, from: {} };
  const at = `scenarios/${ca.scenario.id}/answers/${ca.answer.id}`;
  const found = limitingSide(work.lookup, ca.answer.limiting ?? ca.group?.limiting);
  if (!ca.group || !found) {
    return refusedSheet(
      key,
      METHOD,
      none,
      'GROUP_MISSING',
      'No group of relief points answers this scenario.',
      `${at}/group`,
    );
  }
  const { equipment, side } = found;
  const sideAt = `equipment/${equipment.id}/sides/${side.id}`;
  const rating = ratingFor(side, relievingTemperature(work, ca));
  if (!rating) {
    const text = `${equipment.tag} has no MAWP or design pressure, so no limit can be worked.`;
    return refusedSheet(key, METHOD, none, 'MAWP_MISSING', text, sideAt);
  }
  const code = codeOf(side, work.basis);
  const inputs: Inputs = {
    MAWP: rating.mawp,
    atmospheric_pressure: work.context.barometer,
    accumulation: ca.answer.accumulation,
    code: code.basis,
    code_units: code.units,
  };
  const mawpAt = `${sideAt}/ratings/${rating.id}/mawp`;
  const made = {
    inputs,
    from: { MAWP: mawpAt, atmospheric_pressure: 'site/barometer', accumulation: `${at}/accumulation` },
  };
  return { side, mawp: rating.mawp, mawpAt, code, made };
}

/** The highest set pressure of the members that count for an answer, with its path. */
export function highestSet(work: Work, ca: CredibleAnswer): { set: Q; path: Path } | undefined {
  if (!ca.group) return undefined;
  const sets = creditedMembers(work.lookup, ca.group, ca.answer).flatMap(({ point }) => {
    const set = quantityOf(point.set);
    return set ? [{ set, path: `reliefPoints/${point.id}/set` }] : [];
  });
  return sets.toSorted((a, b) => toSI(b.set) - toSI(a.set))[0];
}

function classLimit(
  work: Work,
  ca: CredibleAnswer,
  key: SheetKey,
  ground: Ground,
  kind: AccumulationClass,
): Sheet {
  const highest = highestSet(work, ca);
  if (!highest) {
    const text = 'No set pressure is known in this group, so no relieving pressure can be worked.';
    return refusedSheet(key, METHOD, ground.made, 'SET_MISSING', text, `groups/${ca.group?.id ?? ''}`);
  }
  ground.made.inputs['set_pressure'] = highest.set;
  ground.made.from['set_pressure'] = highest.path;
  const unit = gaugeUnit(ground.mawp);
  const maap = accumulated(ground.mawp, ground.code, kind, work.rules);
  const bySet = accumulated(highest.set, ground.code, kind, work.rules);
  const relief = Math.min(maap.pa, bySet.pa);
  const steps: Step[] = [
    limitStep(
      'P_{maap}',
      'maximum allowable accumulated pressure',
      maap.tex,
      maap.worked,
      fromSI(maap.pa, unit),
      maap.clause,
    ),
    limitStep(
      'P_{set}',
      'class factor on the highest set pressure',
      bySet.tex,
      bySet.worked,
      fromSI(bySet.pa, unit),
    ),
  ];
  return finished(work, key, ground, { maap: maap.pa, relief, steps, set: highest.set });
}

function limitStep(
  symbol: string,
  meaning: string,
  tex: string,
  worked: string,
  q: Q,
  clause?: string,
): Step {
  const step: Step = { symbol, meaning, tex, worked, value: q.value, unit: q.unit };
  return clause === undefined ? step : { ...step, clause, memory: true };
}

type Limits = { maap: number; relief: number; steps: Step[]; set?: Q };

function finished(work: Work, key: SheetKey, ground: Ground, limits: Limits): Sheet {
  const unit = gaugeUnit(ground.mawp);
  const relief = fromSI(limits.relief, unit);
  const p1: Q = { value: convert(relief, absoluteUnit(unit), work.context), unit: absoluteUnit(unit) };
  const outputs: Inputs = {
    MAWP: ground.mawp,
    MAAP: fromSI(limits.maap, unit),
    relieving_pressure: relief,
    P1: p1,
  };
  if (limits.set) {
    outputs['set_pressure'] = limits.set;
    outputs['overpressure'] = {
      value: limits.relief / convert(limits.set, 'Pa_g', work.context) - 1,
      unit: '-',
    };
  }
  const steps = [
    ...limits.steps,
    limitStep(
      'P_r',
      'relieving pressure, the lower of the two',
      'P_r = \\min(P_{maap}, P_{set})',
      '',
      relief,
    ),
    limitStep('P_1', 'relieving pressure, absolute', 'P_1 = P_r + P_{atm}', '', p1),
  ];
  const { made } = ground;
  return {
    key,
    method: METHOD,
    ...made,
    steps,
    hash: sheetHash(METHOD, undefined, made.inputs),
    outputs,
    warnings: [],
  };
}

/** Storage tanks have no accumulation of their own here: the limit is the design pressure, relief is at certified full flow. */
function tankLimit(work: Work, ca: CredibleAnswer, key: SheetKey, ground: Ground): Sheet {
  const vacuum = ca.answer.accumulation === 'tank-vacuum';
  const field = vacuum ? 'fullFlowVacuum' : 'fullFlow';
  const members = ca.group ? creditedMembers(work.lookup, ca.group, ca.answer) : [];
  const flows = members.flatMap(({ point }) => {
    const q = quantityOf(point[field]);
    return q ? [{ q, path: `reliefPoints/${point.id}/${field}` }] : [];
  });
  const highest = flows.toSorted((a, b) => Math.abs(toSI(b.q)) - Math.abs(toSI(a.q)))[0];
  if (!highest) {
    const text =
      'No pressure of certified full flow is known in this group, so no relieving pressure can be worked.';
    return refusedSheet(key, METHOD, ground.made, 'FULL_FLOW_MISSING', text, `groups/${ca.group?.id ?? ''}`);
  }
  ground.made.inputs['full_flow'] = highest.q;
  ground.made.from['full_flow'] = highest.path;
  const relief = vacuum ? -Math.abs(toSI(highest.q)) : toSI(highest.q);
  const design = quantityOf(vacuum ? ground.side.designVacuum : undefined);
  const maap = vacuum ? -Math.abs(design ? toSI(design) : 0) : toSI(ground.mawp);
  return finished(work, key, ground, { maap, relief, steps: [] });
}

function testLimit(work: Work, key: SheetKey, ground: Ground): Sheet {
  const test = quantityOf(ground.side.test);
  const ratio = quantityOf(ground.side.stressRatio);
  if (!test || !ratio) {
    const text = 'The corrected test pressure needs the test pressure and the stress ratio of the side.';
    return refusedSheet(
      key,
      METHOD,
      ground.made,
      'TEST_MISSING',
      text,
      ground.mawpAt.replace(/\/ratings\/.*$/, '/test'),
    );
  }
  Object.assign(ground.made.inputs, { test_pressure: test, stress_ratio: ratio });
  const limit = toSI(test) * toSI(ratio);
  return finished(work, key, ground, { maap: limit, relief: limit, steps: [] });
}
