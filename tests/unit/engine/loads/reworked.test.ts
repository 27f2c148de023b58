/* Every line of a load sheet, worked from its print alone, gives the value that stands beside it. */
import { describe, expect, it } from 'vitest';
import { calculate } from '../../../../src/engine/calc';
import { workMethod } from '../../../../src/engine/catalog';
import { type Step } from '../../../../src/engine/sheet';
import eFire from '../../../reference/e-fire.json';
import fLoads from '../../../reference/f-loads.json';
import { EXAMPLES } from './examples';
import { NOT_BY_HAND, texValue } from './tex-value';

/** Six printed digits and the differences of nearly equal numbers leave this much. */
const TOLERANCE = 2e-4;

const CASES = [...eFire.cases, ...fLoads.cases] as unknown as {
  id: string;
  topic: string;
  inputs: Record<string, { value: unknown }>;
}[];

function wrongIn(steps: readonly Step[]): string[] {
  return steps.flatMap((step) => {
    if (typeof step.value !== 'number' || NOT_BY_HAND.test(step.worked)) return [];
    const by = texValue(step.worked);
    const off = Math.abs(by - step.value) / Math.max(Math.abs(step.value), 1e-9);
    return off <= TOLERANCE ? [] : [`${step.worked} gives ${by}, not ${step.value}`];
  });
}

describe('a line worked by hand', () => {
  it('is read with fractions, roots, powers and lists', () => {
    expect(texValue('W = 3600 \\cdot \\frac{\\pi}{4} {0.5}^2 \\cdot \\sqrt{{4}}')).toBeCloseTo(
      450 * Math.PI,
      9,
    );
    expect(texValue('x = \\max(0,\\ {1\\,200.5} - {200}) (2 + {1})')).toBeCloseTo(3001.5, 9);
    expect(texValue('y = {2} \\left[1 + \\frac{{3}}{0.5}\\right]^{-1/2}')).toBeCloseTo(2 / Math.sqrt(7), 12);
  });

  it.each(Object.entries(EXAMPLES))('%s', (id, inputs) => {
    const { steps } = workMethod(id, inputs);
    expect(wrongIn(steps)).toEqual([]);
    expect(steps.some((step) => !NOT_BY_HAND.test(step.worked))).toBe(true);
  });

  it.each(
    CASES.filter((one) => Object.values(one.inputs).every((i) => !Array.isArray(i.value))).map(
      (one) => [one.id, one] as const,
    ),
  )('%s', (_id, one) => expect(wrongIn(calculate(one as never).steps ?? [])).toEqual([]));
});
