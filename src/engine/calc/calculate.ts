/* One calculation by JSON: { topic, inputs } in, results out. */
import { type Method, methodById } from '../catalog';
import { type Q } from '../quantity';
import { type Inputs, type Refusal, type SheetWarning, type Step, type Worked } from '../sheet';
import { readUnit } from './units';
import { type CalcValue } from './value';

/** A calculation that is asked for. */
export type CalcRequest = { topic: string; inputs: Record<string, CalcValue>; edition?: string };

/**
 * What comes back. A list under a numbered input (one a segment, one a point) is one calculation; any other list is worked
 * element by element: outputs are lists, and the steps of the elements follow one another.
 */
export type CalcAnswer = {
  topic: string;
  method?: string;
  outputs: Record<string, CalcValue>;
  steps?: Step[];
  warnings: SheetWarning[];
  refused?: Refusal;
};

function refusal(topic: string, code: string, field: string, text: string): CalcAnswer {
  return { topic, outputs: {}, warnings: [], refused: { code, field, text } };
}

function isRecord(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

/** The input at place `index` of its list, in the engine's form. */
function scalar(given: CalcValue, index: number): Q | string | boolean {
  const value = Array.isArray(given.value) ? (given.value as readonly unknown[])[index] : given.value;
  if (typeof value === 'string' || typeof value === 'boolean') return value;
  return { value: typeof value === 'number' ? value : Number.NaN, unit: readUnit(given.unit ?? '-') };
}

function row(inputs: Record<string, CalcValue>, index: number): Inputs {
  return Object.fromEntries(Object.entries(inputs).map(([name, given]) => [name, scalar(given, index)]));
}

/** Lists under numbered inputs written out: the first element under the bare name, further ones as name_2, name_3 …. */
function spread(method: Method, inputs: Record<string, CalcValue>): Record<string, CalcValue> {
  const numbered = new Set(method.inputs.filter((i) => i.each !== undefined).map((i) => i.name));
  const entries = Object.entries(inputs).flatMap(([name, given]): [string, CalcValue][] => {
    if (!numbered.has(name) || !Array.isArray(given.value)) return [[name, given]];
    const all = given.value as readonly (number | string | boolean)[];
    return all.map((value, place) => [place === 0 ? name : `${name}_${place + 1}`, { ...given, value }]);
  });
  return Object.fromEntries(entries);
}

/** The inputs of a request in the engine's form: numbered inputs written out, of other lists the element at `place`. */
export function engineInputs(method: Method, inputs: Record<string, CalcValue>, place = 0): Inputs {
  return row(spread(method, inputs), place);
}

/** Results of all places as lists. */
function columns(all: readonly Worked[]): Record<string, CalcValue> {
  const names = [...new Set(all.flatMap((w) => Object.keys(w.outputs)))];
  const cell = (w: Worked, name: string) => w.outputs[name];
  return Object.fromEntries(
    names.map((name) => {
      const cells = all.map((w) => cell(w, name));
      const unit = cells.find((c): c is Q => typeof c === 'object')?.unit ?? '-';
      const value = cells.map((c) => (typeof c === 'object' ? c.value : (c ?? '')));
      return [name, { value, unit }];
    }),
  );
}

function single(worked: Worked): Record<string, CalcValue> {
  return Object.fromEntries(
    Object.entries(worked.outputs).map(([name, out]) => [
      name,
      typeof out === 'object' ? out : { value: out, unit: '-' },
    ]),
  );
}

/** What is wrong with the form of a request, or undefined. */
function malformed(request: unknown): CalcAnswer | undefined {
  const topic = isRecord(request) && typeof request['topic'] === 'string' ? request['topic'] : '';
  if (topic === '')
    return refusal('', 'REQUEST_MALFORMED', 'topic', 'A calculation needs a topic, such as "a.gas".');
  const inputs = isRecord(request) ? request['inputs'] : undefined;
  if (!isRecord(inputs))
    return refusal(
      topic,
      'REQUEST_MALFORMED',
      'inputs',
      'A calculation needs inputs: name to { value, unit }.',
    );
  for (const [name, given] of Object.entries(inputs))
    if (
      !isRecord(given) ||
      !('value' in given) ||
      !(given['unit'] === undefined || typeof given['unit'] === 'string')
    )
      return refusal(
        topic,
        'REQUEST_MALFORMED',
        name,
        `The input ${name} must be written as { "value": …, "unit": "…" }.`,
      );
  return undefined;
}

/** Works a request. Never throws on bad input: what is wrong comes back as `refused`. */
export function calculate(request: CalcRequest): CalcAnswer {
  const wrong = malformed(request);
  if (wrong) return wrong;
  const { topic, edition } = request;
  const method = methodById(topic);
  if (!method)
    return refusal(
      topic,
      'METHOD_UNKNOWN',
      'topic',
      `There is no topic "${topic}" in this version of the engine.`,
    );
  const inputs = spread(method, request.inputs);
  const lists = Object.values(inputs).flatMap((i) => (Array.isArray(i.value) ? [i.value.length] : []));
  const id = `${method.id}@${method.version}`;
  if (lists.length === 0) {
    const worked = method.work(row(inputs, 0), edition);
    const { steps, warnings, refused } = worked;
    return { topic, method: id, outputs: single(worked), steps, warnings, ...(refused ? { refused } : {}) };
  }
  if (new Set(lists).size > 1 || lists[0] === 0)
    return refusal(
      topic,
      'REQUEST_MALFORMED',
      'inputs',
      'Lists among the inputs must have the same length, at least one.',
    );
  const all = Array.from({ length: lists[0] ?? 0 }, (_, index) => method.work(row(inputs, index), edition));
  const refused = all.find((w) => w.refused)?.refused;
  return {
    topic,
    method: id,
    outputs: columns(all),
    steps: all.flatMap((w) => w.steps),
    warnings: all.flatMap((w) => w.warnings),
    ...(refused ? { refused } : {}),
  };
}
