/* Every check value of a method, worked anew on this server: expected, ours, deviation; and the sheet of the first case as its equations. */
import { CHECK_CASES, type CheckCase, compared, type Compared } from '@/checks';
import { calculate, type CalcAnswer } from '@engine/calc';
import { METHODS } from '@engine/catalog';
import { formatNumber, unitLabel } from '@engine/quantity';
import { type Step } from '@engine/sheet';

/** Less than this is the rounding of the comparison. */
const ROUNDING = 1e-12;

/** One expected value. Lists are held element by element: `values` has one entry an element. */
export type CheckValue = { name: string; unit: string; tolerance: number; values: Compared[] };

/** One case: agrees, or the reason why not (the one written beside it, or that of the refusal). */
export type CheckedCase = {
  id: string;
  what: string;
  source: string;
  notes?: string;
  values: CheckValue[];
  agrees: boolean;
  /** Written beside the value: the source is known to disagree. */
  reason?: string;
  /** Why there is no result at all. */
  refused?: string;
};

/** The check values of one method; `worst` is the greatest deviation among the figures of cases that should reproduce. */
export type MethodChecks = {
  cases: CheckedCase[];
  values: number;
  agreeing: number;
  worst?: number;
  equations: Step[];
};

/** A deviation in words that never round a difference away: "none", "0.012 %", "below 0.001 %". */
export function deviationWords(off: number): string {
  if (!Number.isFinite(off)) return 'another value';
  if (off < ROUNDING) return 'none';
  const percent = off * 100;
  return percent < 0.001 ? 'below 0.001 %' : `${formatNumber(Number(percent.toPrecision(2)))} %`;
}

/** A value of a check for readers: figures to six digits, words as they are. */
export function checkFigure(value: unknown): string {
  if (typeof value === 'number') return formatFigure(value);
  return value === undefined
    ? 'no value'
    : typeof value === 'boolean'
      ? value
        ? 'yes'
        : 'no'
      : String(value);
}

function formatFigure(value: number): string {
  const six = Number(value.toPrecision(6));
  const size = Math.abs(six);
  if (size !== 0 && (size < 1e-4 || size >= 1e9)) return six.toExponential();
  return formatNumber(six, Math.min(9, Math.max(0, (String(six).split('.')[1] ?? '').length)));
}

/** Rows of a table of check values: name, unit, expected, ours, deviation, whether it is within its tolerance. */
export function checkRows(one: CheckedCase): string[][] {
  return one.values.flatMap(({ name, unit, tolerance, values }) =>
    values.map((value, i) => [
      values.length === 1 ? name : `${name}, ${i + 1}`,
      unitLabel(unit),
      checkFigure(value.expected),
      one.refused === undefined ? checkFigure(value.ours) : 'refused',
      deviationWords(value.off),
      tolerance === 0
        ? value.within
          ? 'the same'
          : 'not the same'
        : `${value.within ? 'within' : 'outside'} ${formatNumber(tolerance * 100)} %`,
    ]),
  );
}

function checked(one: CheckCase, answer: CalcAnswer): CheckedCase {
  const values = Object.entries(one.expected).map(([name, wanted]): CheckValue => ({
    name,
    unit: wanted.unit,
    tolerance: wanted.rel_tol,
    values: compared(answer.refused ? undefined : answer.outputs[name], wanted),
  }));
  return {
    ...{ id: one.id, what: one.checks, source: one.source, values },
    agrees: values.every((value) => value.values.every((each) => each.within)),
    ...(one.notes ? { notes: one.notes } : {}),
    ...(one.disagrees === undefined ? {} : { reason: one.disagrees }),
    ...(answer.refused ? { refused: answer.refused.text } : {}),
  };
}

/** The steps that tell the equations apart: one a symbol and equation, in the order of the hand calculation. */
function equationsOf(answers: readonly CalcAnswer[]): Step[] {
  const seen = new Map<string, Step>();
  for (const step of answers.flatMap((answer) => answer.steps ?? [])) {
    if (typeof step.value === 'number' && !seen.has(step.tex)) seen.set(step.tex, step);
  }
  return [...seen.values()];
}

function worked(topic: string): MethodChecks {
  const asked = CHECK_CASES.filter((one) => one.topic === topic);
  const answers = asked.map((one) => calculate(one));
  const cases = asked.map((one, i) => checked(one, answers[i] as CalcAnswer));
  const all = cases.flatMap((one) => one.values.flatMap(({ values }) => values));
  const offs = cases
    .filter((one) => one.reason === undefined)
    .flatMap((one) => one.values.flatMap(({ values }) => values.map(({ off }) => off)));
  return {
    cases,
    values: all.length,
    agreeing: all.filter((one) => one.within).length,
    ...(offs.length > 0 ? { worst: Math.max(...offs) } : {}),
    equations: equationsOf(answers),
  };
}

const kept = new Map<string, MethodChecks>();

/** The check values of a method, worked once while the server runs: neither methods nor values change meanwhile. */
export function methodChecks(topic: string): MethodChecks {
  const known = kept.get(topic);
  if (known) return known;
  const made = worked(topic);
  kept.set(topic, made);
  return made;
}

/** Sums over methods: check values, how many agree, and the worst deviation of those that should. */
export function checkTotals(topics: readonly string[] = METHODS.map((method) => method.topic)): {
  values: number;
  agreeing: number;
  worst: number;
} {
  const all = [...new Set(topics)].map(methodChecks);
  return {
    values: all.reduce((sum, one) => sum + one.values, 0),
    agreeing: all.reduce((sum, one) => sum + one.agreeing, 0),
    worst: Math.max(0, ...all.map((one) => one.worst ?? 0)),
  };
}

/** Works the check values of all methods, one method at a time with a pause before each, so that no first reader of the method file waits for them. */
export async function workChecksAhead(pause: () => Promise<unknown>): Promise<void> {
  for (const topic of new Set(METHODS.map((method) => method.topic))) {
    await pause();
    methodChecks(topic);
  }
}
