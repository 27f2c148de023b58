/* Every line of a sheet of devices and tanks, worked from its print alone, gives the value that stands beside it. */
import { describe, expect, it } from 'vitest';
import { calculate } from '../../../../src/engine/calc';
import { type Step } from '../../../../src/engine/sheet';
import jDevices from '../../../reference/j-devices.json';
import kTanks from '../../../reference/k-tanks.json';
import { NOT_BY_HAND, texValue } from '../loads/tex-value';

/** Six printed digits and the differences of nearly equal pressures leave this much. */
const TOLERANCE = 3e-4;

const CASES = [...jDevices.cases, ...kTanks.cases] as unknown as {
  id: string;
  topic: string;
  inputs: never;
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
  it.each(CASES.map((one) => [one.id, one] as const))('%s', (_id, one) => {
    expect(wrongIn(calculate(one).steps ?? [])).toEqual([]);
  });
});
