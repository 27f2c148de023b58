/* Where one input takes the margin to nought: searched outwards from where it stands, then solved inside the bracket. */
import { findRoot } from '../numeric';
import { fromSI, type Q } from '../quantity';
import { type Question, type Variable, withValue } from './subject';

/**
 * What was found on one side of where the input stands. `at`: the value at which the margin is nought (`jump`: it passes
 * nought there without touching it). Without `at`, `why` says in a sentence why there is none.
 */
export type Crossing = { at?: Q; change?: number; jump?: boolean; why?: string };

/** Steps outwards on one side at most; each is wider than the one before, so that the last is a thousandfold away. */
const STEPS = 18;
const GROWTH = 1.05;
const TOUCH = 1e-6;

/** The n-th place outwards: by ratio for a positive input, by share of the way to the fence for others. */
function place({ base, least, most }: Variable, up: boolean, n: number): number {
  const weight = (n * (n + 1)) / 2;
  const edge = up ? most : least;
  const far =
    base > 0
      ? base * GROWTH ** (up ? weight : -weight)
      : base + ((edge - base) * weight) / ((STEPS * (STEPS + 1)) / 2);
  return up ? Math.min(far, edge) : Math.max(far, edge);
}

function solved(question: Question, variable: Variable, from: number, to: number): Crossing {
  const { inputs } = question.subject;
  const margin = (si: number) => question.margin(withValue(inputs, variable, si));
  const found = findRoot(margin, from, to, { tolerance: 1e-13, maxIterations: 100 });
  if (!found.ok)
    return { why: 'The sheet refuses on the way to the value that would take the margin to nought.' };
  const at = fromSI(found.x, variable.unit);
  const change = variable.base === 0 ? undefined : found.x / variable.base - 1;
  const jump = !(Math.abs(margin(found.x)) < TOUCH);
  return { at, ...(change === undefined ? {} : { change }), ...(jump ? { jump } : {}) };
}

/** Searches one side. At most STEPS sheets outwards and 100 inside the bracket. */
export function crossing(question: Question, variable: Variable, side: 'above' | 'below'): Crossing {
  const { inputs } = question.subject;
  const here = question.margin(inputs);
  let last = variable.base;
  for (let n = 1; n <= STEPS; n += 1) {
    const next = place(variable, side === 'above', n);
    if (next === last) break;
    const there = question.at(withValue(inputs, variable, next));
    if (there.value === undefined) {
      const shown = fromSI(next, variable.unit);
      return {
        why: `The margin keeps its sign until the sheet refuses at ${shown.value.toPrecision(4)} ${shown.unit}: ${there.why}`,
      };
    }
    const margin = question.margin(withValue(inputs, variable, next));
    if (Math.sign(margin) !== Math.sign(here)) return solved(question, variable, last, next);
    last = next;
  }
  return { why: 'The margin keeps its sign over all that this input can be.' };
}
