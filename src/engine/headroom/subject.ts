/* What headroom is asked of: a method with its inputs, the output that is judged, and what it is held against. */
import { type Method, methodById } from '../catalog';
import { convert, dimensionOf, fromSI, type Q, toSI } from '../quantity';
import { RANGES } from '../ranges';
import { type Inputs } from '../sheet';

/**
 * A sheet under question: method, edition and resolved inputs (those of any sheet of an evaluation serve as they are), the
 * output that is judged (`A_required` unless said) and its limit. `side` says whether the output must stay below its limit
 * (the usual case) or above it.
 */
export type Subject = {
  method: string;
  edition?: string;
  inputs: Inputs;
  output?: string;
  limit: Q;
  side?: 'below' | 'above';
};

/** A subject that can be worked: its method and the judged output in the unit of the limit at other inputs. */
export type Question = {
  method: Method;
  subject: Subject;
  /** The judged output, or why there is none. */
  at(inputs: Inputs): { value: number; why?: never } | { value?: never; why: string };
  /** Limit/output − 1, or output/limit − 1 where the output must stay above; NaN where the sheet refuses. */
  margin(inputs: Inputs): number;
};

/** Opens a subject, or says in a sentence why it cannot be asked. */
export function question(subject: Subject): Question | { why: string } {
  const method = methodById(subject.method);
  if (!method) return { why: `There is no method "${subject.method}" in this version of the engine.` };
  const { output = 'A_required', limit, side = 'below' } = subject;
  if (!(Number.isFinite(limit.value) && limit.value > 0))
    return { why: `The limit of ${output} must be above nought.` };
  const at: Question['at'] = (inputs) => {
    const worked = method.work(inputs, subject.edition);
    if (worked.refused) return { why: worked.refused.text };
    const found = worked.outputs[output];
    if (typeof found !== 'object') return { why: `${method.id} gives no figure ${output}.` };
    if (dimensionOf(found.unit) !== dimensionOf(limit.unit))
      return { why: `${output} is in ${found.unit}, its limit in ${limit.unit}.` };
    return { value: convert(found, limit.unit) };
  };
  const margin = (inputs: Inputs) => {
    const { value } = at(inputs);
    if (value === undefined) return Number.NaN;
    return side === 'below' ? limit.value / value - 1 : value / limit.value - 1;
  };
  return { method, subject, at, margin };
}

/** An input that can be varied: its value in SI, and the fence of its quantity in SI. */
export type Variable = {
  name: string;
  meaning: string;
  unit: string;
  base: number;
  least: number;
  most: number;
};

/** Wide fences for an input without a range: a thousandth to a thousandfold of what it is. */
const WIDE = 1000;

function fence(rangeKey: string | undefined, unit: string, base: number): { least: number; most: number } {
  const row = rangeKey === undefined ? undefined : RANGES[rangeKey];
  const found =
    row &&
    [{ unit: row.unit, range: row.range }, ...(row.also ?? [])].find(
      (one) => dimensionOf(one.unit) === dimensionOf(unit),
    );
  if (found) {
    const [least, , , most] = found.range;
    return { least: toSI({ value: least, unit: found.unit }), most: toSI({ value: most, unit: found.unit }) };
  }
  const size = Math.abs(base) || 1;
  return base > 0 ? { least: base / WIDE, most: base * WIDE } : { least: -size * WIDE, most: size * WIDE };
}

/** The inputs with a number, in the order of the method. Words and flags cannot be varied; units that do not exist neither. */
export function variables({ method, subject }: Question): Variable[] {
  const order = method.inputs.map((one) => one.name);
  return Object.entries(subject.inputs)
    .flatMap(([name, given]): Variable[] => {
      if (typeof given !== 'object' || dimensionOf(given.unit) === undefined || !Number.isFinite(given.value))
        return [];
      const described =
        method.inputs.find((one) => one.name === name) ??
        method.inputs.find((one) => one.name === name.replace(/_\d+$/, ''));
      const base = toSI(given);
      const { least, most } = fence(described?.rangeKey, given.unit, base);
      return [{ name, meaning: described?.meaning ?? name, unit: given.unit, base, least, most }];
    })
    .sort((a, b) => order.indexOf(a.name) - order.indexOf(b.name));
}

/** The inputs with one of them at another value in SI. */
export function withValue(inputs: Inputs, { name, unit }: Variable, si: number): Inputs {
  return { ...inputs, [name]: fromSI(si, unit) };
}
