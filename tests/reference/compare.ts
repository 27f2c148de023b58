/* How a result is held against a reference value: in the reference's unit, within its stated tolerance. */
import { type CalcValue } from '../../src/engine/calc';
import { convert, dimensionOf } from '../../src/engine/quantity';

/** An expected value of a reference case. */
export type Expected = { value: unknown; unit: string; rel_tol: number };

/** A reference case as it is kept beside this file. */
export type ReferenceCase = {
  id: string;
  topic: string;
  checks: string;
  source: string;
  inputs: Record<string, CalcValue>;
  expected: Record<string, Expected>;
  notes: string;
  tol_reason: string;
};

/** A flow coefficient is printed as m³/h in the reference and is the unit Kv here: the number is the same. */
function inUnit(value: number, from: string, to: string): number {
  if (from === to) return value;
  if (from === 'Kv' && to === 'm3/h') return value;
  if (dimensionOf(from) === undefined || dimensionOf(to) === undefined)
    throw new Error(`No unit ${from} or ${to}`);
  return convert({ value, unit: from }, to);
}

function wrong(actual: unknown, expected: unknown, unit: string, wanted: Expected): string | undefined {
  if (typeof expected !== 'number')
    return actual === expected ? undefined : `${String(actual)} instead of ${String(expected)}`;
  if (typeof actual !== 'number') return `${String(actual)} is no number; expected ${expected}`;
  const figure = inUnit(actual, unit, wanted.unit);
  const off = expected === 0 ? Math.abs(figure) : Math.abs(figure / expected - 1);
  return off <= wanted.rel_tol * (1 + 1e-9) + 1e-12
    ? undefined
    : `${figure} ${wanted.unit} instead of ${expected} (off by ${off})`;
}

/** What disagrees between a result and its reference value; empty when nothing does. */
export function disagreements(name: string, actual: CalcValue | undefined, wanted: Expected): string[] {
  if (!actual) return [`${name} is missing`];
  const expected: unknown[] = Array.isArray(wanted.value) ? wanted.value : [wanted.value];
  const got: unknown[] = Array.isArray(actual.value)
    ? [...(actual.value as readonly unknown[])]
    : [actual.value];
  if (got.length !== expected.length)
    return [`${name} has ${got.length} values instead of ${expected.length}`];
  return expected.flatMap((one, i) => {
    const text = wrong(got[i], one, actual.unit ?? '-', wanted);
    return text === undefined ? [] : [`${name}: ${text}`];
  });
}
