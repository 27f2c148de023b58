/* Many cases at once, as the command line and the endpoint take them: each is answered on its own, none stops another. */
import { type Q } from '../quantity';
import { type SheetWarning, type Step } from '../sheet';
import { calculate, type CalcAnswer, type CalcRequest } from './calculate';
import { asAsked } from './units';
import { type CalcValue } from './value';

/** Why a case has no usable answer: a code, a practitioner's sentence, and the input, output or part it is about. */
export type CaseError = { code: string; message: string; field: string };

/** The answer to one case. With `error`, `outputs` holds only what stands all the same. `steps` when they were asked for. */
export type CaseResult = {
  id: string;
  topic: string;
  method?: string;
  outputs: Record<string, CalcValue>;
  warnings: SheetWarning[];
  steps?: Step[];
  error?: CaseError;
};

type Fields = Record<string, unknown>;

function isFields(value: unknown): value is Fields {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

/** The list of cases in a document `{ "cases": [ … ] }`, or a sentence that says what is wrong with it. */
export function casesOf(document: unknown): { cases: readonly unknown[] } | { wrong: string } {
  if (!isFields(document)) return { wrong: 'The document must be an object { "cases": [ … ] }.' };
  const { cases } = document;
  if (!Array.isArray(cases)) return { wrong: 'The document has no list "cases": write { "cases": [ … ] }.' };
  return { cases };
}

/** The units asked for, by output: those of `want`, else those of `expected`, whose values are not looked at. */
function wantedUnits(given: Fields): Record<string, string> | CaseError {
  const named = given['want'] ?? given['expected'] ?? {};
  const field = given['want'] === undefined ? 'expected' : 'want';
  if (!isFields(named)) {
    return { code: 'CASE_MALFORMED', field, message: `"${field}" must name outputs with their units.` };
  }
  const units = Object.entries(named).map(([name, wanted]): [string, unknown] => [
    name,
    isFields(wanted) ? (wanted['unit'] ?? '-') : wanted,
  ]);
  const bad = units.find(([, unit]) => typeof unit !== 'string');
  if (bad) {
    const message = `The unit wanted of ${bad[0]} must be a text, such as "kg/h".`;
    return { code: 'CASE_MALFORMED', field: bad[0], message };
  }
  return Object.fromEntries(units) as Record<string, string>;
}

function isError(found: Record<string, string> | CaseError): found is CaseError {
  return typeof found['message'] === 'string' && typeof found['code'] === 'string' && 'field' in found;
}

/** The barometric pressure by which gauge and absolute meet: the case's own, else the convention of its units. */
function barometerOf(given: Fields, asked: string): Q {
  const inputs = isFields(given['inputs']) ? given['inputs'] : {};
  const own = inputs['atmospheric_pressure'];
  if (isFields(own) && typeof own['value'] === 'number' && typeof own['unit'] === 'string')
    return { value: own['value'], unit: own['unit'] };
  return asked.startsWith('psi') ? { value: 14.7, unit: 'psia' } : { value: 101.325, unit: 'kPa_abs' };
}

/** Outputs with those wanted first and in the units wanted, and the first wanted one that cannot be given. */
function inWantedUnits(
  given: Fields,
  answer: CalcAnswer,
  wanted: Record<string, string>,
): { outputs: Record<string, CalcValue>; error?: CaseError } {
  let error: CaseError | undefined;
  const outputs: Record<string, CalcValue> = {};
  for (const [name, unit] of Object.entries(wanted)) {
    const found = Object.hasOwn(answer.outputs, name) ? answer.outputs[name] : undefined;
    if (!found) {
      const message = `${answer.topic} gives no ${name} with these inputs.`;
      error ??= { code: 'OUTPUT_MISSING', field: name, message };
      continue;
    }
    const asked = asAsked(found, unit, barometerOf(given, unit));
    if (!asked) {
      const message = `${name} is in ${found.unit ?? 'no unit'} and cannot be given in "${unit.slice(0, 40)}".`;
      error ??= { code: 'WRONG_UNIT', field: name, message };
    }
    outputs[name] = asked ?? found;
  }
  return { outputs: { ...outputs, ...without(answer.outputs, outputs) }, ...(error ? { error } : {}) };
}

function without(all: Record<string, CalcValue>, taken: Record<string, CalcValue>): typeof all {
  return Object.fromEntries(Object.entries(all).filter(([name]) => !Object.hasOwn(taken, name)));
}

function failed(head: { id: string; topic: string }, error: CaseError): CaseResult {
  return { ...head, outputs: {}, warnings: [], error };
}

function answered(given: Fields, head: { id: string; topic: string }, sheet: boolean): CaseResult {
  const wanted = wantedUnits(given);
  if (isError(wanted)) return failed(head, wanted);
  const answer = calculate(given as CalcRequest);
  const { method, warnings, refused } = answer;
  const steps = sheet && answer.steps ? { steps: answer.steps } : {};
  const known = { ...head, ...(method === undefined ? {} : { method }) };
  if (refused) {
    const error = { code: refused.code, message: refused.text, field: refused.field };
    return { ...known, outputs: {}, warnings, ...steps, error };
  }
  const { outputs, error } = inWantedUnits(given, answer, wanted);
  return { ...known, outputs, warnings, ...steps, ...(error ? { error } : {}) };
}

/**
 * Works one case `{ id, topic, inputs, want | expected, edition? }`. Whatever it is given it answers: a case that is
 * malformed, refused or asks for what is not there comes back with `error`.
 */
export function workCase(given: unknown, options: { sheet?: boolean } = {}): CaseResult {
  if (!isFields(given)) {
    const message = 'A case must be an object { id, topic, inputs, want }.';
    return failed({ id: '', topic: '' }, { code: 'CASE_MALFORMED', message, field: 'cases' });
  }
  const { id, topic } = given;
  const named = typeof id === 'string' || typeof id === 'number' ? String(id) : '';
  const head = { id: named, topic: typeof topic === 'string' ? topic : '' };
  try {
    return answered(given, head, options.sheet ?? false);
  } catch (error) {
    // A method refuses and never throws; should one do so, its case alone is lost.
    const why = error instanceof Error ? error.message : String(error);
    return failed(head, {
      code: 'NOT_WORKED',
      message: `This case could not be worked: ${why}`,
      field: 'topic',
    });
  }
}
