/* The method file: every method, every check value worked anew, what disagrees with its reason, counts that add up, and quick. */
import { describe, expect, it } from 'vitest';
import { CHECK_CASES } from '@/checks';
import { METHODS } from '@engine/catalog';
import { checkRows, deviationWords, methodChecks } from '@services/views/method-checks';
import { methodFile, methodView } from '@services/views/methods';

describe('the method file', () => {
  it('lists every method once, with counts that add up', () => {
    const file = methodFile();
    const lines = file.groups.flatMap((group) => group.methods);
    expect(lines.map((one) => one.id).sort()).toEqual(METHODS.map((one) => one.id).sort());
    expect(file.shown).toBe(METHODS.length);
    expect(file.groups.reduce((sum, group) => sum + group.values, 0)).toBe(file.values);
    expect(file.groups.map((group) => group.name)).not.toContain('Other');
    expect(file.catalogue).toMatch(/^[0-9a-f]{12}$/);
    expect(file.values).toBeGreaterThan(300);
  });

  it('works each check value of each topic that the engine has, and what does not agree says why', () => {
    const known = new Set(METHODS.map((one) => one.topic));
    const mine = CHECK_CASES.filter((one) => known.has(one.topic));
    const cases = METHODS.flatMap((one) => methodChecks(one.topic).cases);
    expect(cases.map((one) => one.id).sort()).toEqual(mine.map((one) => one.id).sort());
    const silent = cases.filter((one) => !one.agrees && one.reason === undefined);
    expect(silent.map((one) => `${one.id}: ${one.refused ?? JSON.stringify(checkRows(one))}`)).toEqual([]);
    const liars = cases.filter((one) => one.agrees && one.reason !== undefined);
    expect(liars.map((one) => one.id)).toEqual([]);
    expect(cases.some((one) => one.reason !== undefined)).toBe(true);
  });

  it('filters by topic and by words of the name', () => {
    const steam = methodFile({ topic: 'b' });
    expect(steam.groups.map((group) => group.name)).toEqual(['Steam']);
    expect(steam.values).toBe(methodFile().values);
    const found = methodFile({ words: ' API526 ' }).groups.flatMap((group) =>
      group.methods.map((one) => one.id),
    );
    expect(found).toEqual(['i.api526-letters']);
    expect(methodFile({ topic: 'q' }).groups).toEqual([]);
  });

  it('shows of one method expected, ours and deviation, and its equations with units', () => {
    const found = methodView('a.gas');
    if (!found.ok) throw new Error(found.problem.detail);
    const { checks } = found.value;
    const area = checks.equations.find((step) => step.symbol === 'A');
    expect(area).toMatchObject({ unit: 'mm2' });
    expect(area?.tex).toContain('\\frac');
    const first = checks.cases.find((one) => one.id === 'a-api520-ex1-si');
    // Expected 3 699.046 mm² of API 520-1 Example 1, tolerance 0.1 %.
    expect(first && checkRows(first)).toContainEqual([
      'A_required',
      'mm²',
      '3\u2009699.05',
      expect.stringMatching(/^3\u2009699/) as string,
      expect.stringMatching(/%|none/) as string,
      'within 0.1 %',
    ]);
    expect(methodView('f.settle-out')).toMatchObject({
      value: { serves: ['Compressor trip, settle-out, surge or stage imbalance'] },
    });
    expect(methodView('z.none')).toMatchObject({ ok: false, problem: { code: 'UNKNOWN' } });
  });

  it('is at hand in less than 50 ms once it was worked', () => {
    methodFile();
    const start = performance.now();
    methodFile();
    expect(performance.now() - start).toBeLessThan(50);
  });
});

describe('a deviation in words', () => {
  it.each([
    [0, 'none'],
    [1e-9, 'below 0.001 %'],
    [0.00012, '0.012 %'],
    [0.026, '2.6 %'],
    [Number.POSITIVE_INFINITY, 'another value'],
  ])('%d is %s', (off, words) => {
    expect(deviationWords(off)).toBe(words);
  });
});
