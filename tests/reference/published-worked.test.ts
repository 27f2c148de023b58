/* Published examples under our names: those that reproduce do, those that are said not to do not, and every one says why. */
import { describe, expect, it } from 'vitest';
import { casesIn, compared } from '@/checks';
import { calculate } from '../../src/engine/calc';
import file from './published-worked.json';
import published from './published.json';

const CASES = casesIn(file);

describe('published worked examples', () => {
  it.each(CASES.map((one) => [`${one.id}: ${one.checks} [${one.source}]`, one] as const))(
    '%s',
    (_name, one) => {
      const answer = calculate(one);
      expect(answer.refused).toBeUndefined();
      const all = Object.entries(one.expected).flatMap(([name, wanted]) =>
        compared(answer.outputs[name], wanted),
      );
      expect(all.every((each) => each.within)).toBe(one.disagrees === undefined);
      if (one.disagrees !== undefined) expect(one.disagrees).toMatch(/\w{3}.*\./);
    },
  );

  it('hold the figures of the examples as they were found', () => {
    const known = new Set(
      (published as unknown as { inputs: Record<string, { value: unknown }> }[]).flatMap(({ inputs }) =>
        Object.values(inputs).map(({ value }) => value),
      ),
    );
    const W = CASES.flatMap(({ inputs }) => inputs['W']?.value ?? []);
    expect(W.length).toBeGreaterThan(3);
    expect(W.filter((value) => !known.has(value))).toEqual([]);
  });
});
