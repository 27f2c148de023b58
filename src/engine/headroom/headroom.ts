/* Headroom of a sheet: how far each input may move until nothing is left, what moves the margin most, and the curve against one input. */
import { fromSI, type Q, toSI } from '../quantity';
import { crossing, type Crossing } from './crossing';
import { question, type Question, type Subject, type Variable, variables, withValue } from './subject';

/** One input with the values at which the margin becomes nought, above and below where it stands. */
export type InputHeadroom = { name: string; meaning: string; base: Q; above: Crossing; below: Crossing };

/** The margin as it stands, and the headroom of every input that is a number; or why nothing can be said. */
export type Headroom = { margin: number; inputs: InputHeadroom[] } | { why: string };

/** A bar of the tornado: margins with the input at its low and its high value; NaN never, undefined where the sheet refuses. */
export type Bar = {
  name: string;
  meaning: string;
  low: Q;
  high: Q;
  atLow?: number;
  atHigh?: number;
  swing: number;
};

/** The margin as it stands, and the bars with the widest first; or why nothing can be said. */
export type Tornado = { margin: number; bars: Bar[] } | { why: string };

/** A point of the curve: the input, and the judged output in the unit of its limit, or why there is none. */
export type CurvePoint = { x: Q; y?: number; why?: string };

/** The span of the tornado when none is given: a tenth either way of the value in SI (temperatures in kelvin). */
const SHARE = 0.1;
/** The most points of a curve. */
const POINTS_AT_MOST = 401;

function opened(subject: Subject): { asked: Question; margin: number } | { why: string } {
  const asked = question(subject);
  if ('why' in asked) return asked;
  const stands = asked.at(subject.inputs);
  if (stands.value === undefined) return { why: stands.why };
  return { asked, margin: asked.margin(subject.inputs) };
}

const here = ({ base, unit }: Variable): Q => fromSI(base, unit);

/**
 * For each input that is a number: the nearest value above and below at which the margin becomes nought, all other inputs held
 * as the sheet has them (so a back pressure that follows from the flow stays where it is). Searched inside what the quantity can
 * be; bounded, never throws.
 */
export function headroom(subject: Subject, names?: readonly string[]): Headroom {
  const found = opened(subject);
  if ('why' in found) return found;
  const { asked, margin } = found;
  const inputs = variables(asked)
    .filter(({ name }) => names === undefined || names.includes(name))
    .map((one): InputHeadroom => ({
      name: one.name,
      meaning: one.meaning,
      base: here(one),
      above: crossing(asked, one, 'above'),
      below: crossing(asked, one, 'below'),
    }));
  return { margin, inputs };
}

function marginAt(asked: Question, variable: Variable, q: Q): number | undefined {
  const margin = asked.margin(withValue(asked.subject.inputs, variable, toSI(q)));
  return Number.isFinite(margin) ? margin : undefined;
}

function barOf(asked: Question, margin: number, one: Variable, span: readonly [Q, Q] | undefined): Bar {
  const reach = Math.abs(one.base) * SHARE;
  const [low, high] = span ?? [fromSI(one.base - reach, one.unit), fromSI(one.base + reach, one.unit)];
  const atLow = marginAt(asked, one, low);
  const atHigh = marginAt(asked, one, high);
  const ends = [atLow ?? margin, atHigh ?? margin, margin];
  return {
    ...{ name: one.name, meaning: one.meaning, low, high, swing: Math.max(...ends) - Math.min(...ends) },
    ...(atLow === undefined ? {} : { atLow }),
    ...(atHigh === undefined ? {} : { atHigh }),
  };
}

/**
 * The margin with each input moved by a tenth either way, or over its own span in `spans` (low and high value by name),
 * widest first. Inputs whose move changes nothing come last.
 */
export function tornado(subject: Subject, spans: Readonly<Record<string, readonly [Q, Q]>> = {}): Tornado {
  const found = opened(subject);
  if ('why' in found) return found;
  const { asked, margin } = found;
  const bars = variables(asked).map((one) => barOf(asked, margin, one, spans[one.name]));
  return { margin, bars: bars.toSorted((a, b) => b.swing - a.swing) };
}

/**
 * The judged output (the required area, unless the subject names another) against one input, evenly from `from` to `to`.
 * @param points 2 to 401
 */
export function curve(
  subject: Subject,
  name: string,
  { from, to, points = 41 }: { from: Q; to: Q; points?: number },
): { points: CurvePoint[] } | { why: string } {
  const asked = question(subject);
  if ('why' in asked) return asked;
  const variable = variables(asked).find((one) => one.name === name);
  if (!variable) return { why: `The sheet has no input ${name} that is a number.` };
  const count = Math.min(POINTS_AT_MOST, Math.max(2, Math.round(points) || 2));
  const [start, end] = [toSI(from), toSI(to)];
  return {
    points: Array.from({ length: count }, (_, i): CurvePoint => {
      const si = start + ((end - start) * i) / (count - 1);
      const { value, why } = asked.at(withValue(subject.inputs, variable, si));
      const x = fromSI(si, variable.unit);
      return value === undefined ? { x, why } : { x, y: value };
    }),
  };
}
