/* Load sheets: the relief load of each answer, by method, as stated, by external sheet or as a sum of other answers. */
import { type Calc, type Id, type Path, quantityOf } from '@domain/basis';
import { convert, type Q } from '@engine/quantity';
import { type Step } from '@engine/sheet';
import { externalAsSheet, externalById } from './external';
import { fillImplicit, loadValues } from './implicit';
import { resolveInputs } from './inputs';
import { missingSheet, outputOf, refusedSheet, statedSheet, workedSheet } from './sheets';
import { isTankMethod, tankValues } from './tanks';
import { type Sheet, type SheetKey } from './types';
import { fillVessels } from './vessels';
import { type CredibleAnswer, type Work } from './work';

const EMPTY = { inputs: {}, from: {} };
const MASS_NAMES = ['relief_load', 'W', 'reverse_flow', 'W_rated'] as const;
const VOLUME_NAMES = ['relief_flow', 'volumetric_load', 'Q'] as const;

/** The unit of mass flow in which the loads of a basis are told. */
export function massUnit(work: Work): string {
  return work.basis.units === 'US' ? 'lb/h' : 'kg/h';
}

/** Makes the load sheet of an answer once; later calls return it. A load that needs itself is refused. */
export function loadSheet(work: Work, ca: CredibleAnswer): Sheet {
  const key: SheetKey = `load:${ca.id}`;
  const made = work.sheets[key];
  if (made) return made;
  const at = `scenarios/${ca.scenario.id}/answers/${ca.answer.id}/load`;
  if (work.busy.has(key)) {
    return refusedSheet(
      key,
      ca.answer.load.by,
      EMPTY,
      'CIRCLE',
      'This load rests on itself: break the circle.',
      at,
    );
  }
  work.busy.add(key);
  const sheet = makeLoad(work, ca, key, at, ca.answer.load);
  work.busy.delete(key);
  work.sheets[key] = sheet;
  return sheet;
}

function makeLoad(work: Work, ca: CredibleAnswer, key: SheetKey, at: Path, calc: Calc): Sheet {
  switch (calc.by) {
    case 'method':
      return methodLoad(work, ca, key, at, calc);
    case 'given':
      return givenLoad(key, at, calc);
    case 'external':
      return externalLoad(work, ca, key, at, calc.sheet);
    case 'sum':
      return sumLoad(work, key, at, calc.of);
    case 'none':
      return refusedSheet(
        key,
        'none',
        EMPTY,
        'NO_LOAD',
        'No relief load is given: choose a method or state it.',
        at,
      );
  }
}

function methodLoad(
  work: Work,
  ca: CredibleAnswer,
  key: SheetKey,
  at: Path,
  calc: Calc & { by: 'method' },
): Sheet {
  const resolved = resolveInputs(work, at, calc.inputs, (needed) => ensureLoad(work, needed));
  const tank = isTankMethod(calc.method) ? tankValues(work, ca) : {};
  const implicit = fillImplicit(calc.method, resolved, { ...loadValues(work, ca, resolved), ...tank });
  const made = fillVessels(work, ca, calc.method, resolved, implicit);
  const missing = resolved.missing[0];
  if (missing) return missingSheet(key, calc.method, made, missing);
  return withMass(work, ca, workedSheet(key, calc.method, calc.edition, made, at), at);
}

function givenLoad(key: SheetKey, at: Path, calc: Calc & { by: 'given' }): Sheet {
  const q = quantityOf(calc.figure);
  if (q) return statedSheet(key, 'given', 'relief_load', q, `${at}/figure`, 'relief load as stated');
  return refusedSheet(
    key,
    'given',
    EMPTY,
    'INPUT_MISSING',
    'The stated relief load is not known.',
    `${at}/figure`,
  );
}

function externalLoad(work: Work, ca: CredibleAnswer, key: SheetKey, at: Path, id: Id): Sheet {
  const external = externalById(work, id);
  if (external) return withMass(work, ca, externalAsSheet(work, key, external), at);
  return refusedSheet(
    key,
    'external',
    EMPTY,
    'EXTERNAL_MISSING',
    'The external sheet of this load is gone: attach it again.',
    at,
  );
}

function ensureLoad(work: Work, key: SheetKey): void {
  if (!key.startsWith('load:')) return;
  const ca = work.answers.find((candidate) => `load:${candidate.id}` === key);
  if (ca) loadSheet(work, ca);
}

/** Finds an answer by its own id or by `<scenario>/<answer>`. */
function answerNamed(work: Work, id: Id): CredibleAnswer | undefined {
  return work.answers.find((candidate) => candidate.id === id || candidate.answer.id === id);
}

function sumLoad(work: Work, key: SheetKey, at: Path, of: readonly Id[]): Sheet {
  const unit = massUnit(work);
  const made = { inputs: {} as Record<string, Q>, from: {} as Record<string, Path> };
  let total = 0;
  for (const id of of) {
    const part = answerNamed(work, id);
    const q = part && outputOf(loadSheet(work, part), 'relief_load');
    if (!part || !q) {
      const text = `The sum lacks the load of ${part ? part.id : id}: that sheet has no result.`;
      return refusedSheet(key, 'sum', made, 'PART_MISSING', text, at);
    }
    made.inputs[part.id] = q;
    made.from[part.id] = `sheets/load:${part.id}#relief_load`;
    total += convert(q, unit);
  }
  const sheet = statedSheet(key, 'sum', 'relief_load', { value: total, unit }, at, 'sum of the loads named');
  return { ...sheet, inputs: made.inputs, from: made.from };
}

/** Adds `relief_load` as a mass flow to a load sheet that ends in another name or in a volume flow. */
function withMass(work: Work, ca: CredibleAnswer, sheet: Sheet, at: Path): Sheet {
  if (sheet.refused || outputOf(sheet, 'relief_load')) return sheet;
  const mass = outputOf(sheet, ...MASS_NAMES);
  if (mass) return { ...sheet, outputs: { ...sheet.outputs, relief_load: mass } };
  const volume = outputOf(sheet, ...VOLUME_NAMES);
  const fluid = ca.answer.fluid === undefined ? undefined : work.lookup.fluids.get(ca.answer.fluid);
  const density = quantityOf(fluid?.rhoLiquid);
  if (!volume) {
    const text =
      'This method finds no flow: state the load, or choose a method that ends in one and use this result in it.';
    return { ...sheet, refused: { code: 'NO_FLOW_FOUND', text, field: at } };
  }
  if (!density || !fluid) {
    const text = 'The load comes as a volume: give the liquid density of the fluid to turn it into a mass.';
    return {
      ...sheet,
      refused: { code: 'INPUT_MISSING', text, field: fluid ? `fluids/${fluid.id}/rhoLiquid` : at },
    };
  }
  const unit = massUnit(work);
  const value = convert({ value: convert(volume, 'm3/h') * convert(density, 'kg/m3'), unit: 'kg/h' }, unit);
  return {
    ...sheet,
    steps: [...sheet.steps, massStep(value, unit)],
    outputs: { ...sheet.outputs, relief_load: { value, unit } },
  };
}

function massStep(value: number, unit: string): Step {
  return { symbol: 'W', meaning: 'mass flow', tex: 'W = Q\\,\\rho', worked: '', value, unit };
}
