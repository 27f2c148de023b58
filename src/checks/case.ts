/* A check value as it is kept with the tests: a case of inputs and expected outputs, with its source. */
import { type CalcValue } from '@engine/calc';

/** An expected value: within `rel_tol` of it (0 means exactly: words, flags), a list element by element. */
export type Expected = { value: unknown; unit: string; rel_tol: number };

/**
 * A case of check values. `disagrees` says why the source's figure does not come out here: then it is shown with that reason
 * and tested to be so.
 */
export type CheckCase = {
  id: string;
  topic: string;
  checks: string;
  source: string;
  inputs: Record<string, CalcValue>;
  expected: Record<string, Expected>;
  notes?: string;
  tol_reason?: string;
  edition?: string;
  disagrees?: string;
};

function isCase(value: unknown): value is CheckCase {
  const { id, topic, inputs, expected } = Object(value) as Partial<CheckCase>;
  return typeof id === 'string' && typeof topic === 'string' && Boolean(inputs) && Boolean(expected);
}

/** The cases that a file of check values holds; none where the file holds values of another kind. */
export function casesIn(file: unknown): CheckCase[] {
  const { cases } = Object(file) as { cases?: unknown };
  return Array.isArray(cases) ? cases.filter(isCase) : [];
}
