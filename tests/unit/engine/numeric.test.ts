/* Roots, interpolation, integration: right where an answer is known, and honest where there is none. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { findRoot, integrate, interpolate, interpolateTable } from '../../../src/engine/numeric';

describe('findRoot', () => {
  it('finds a root anywhere in the bracket, also of a nasty cubic', () => {
    fc.assert(
      fc.property(fc.double({ min: -50, max: 50, noNaN: true }), (root) => {
        const found = findRoot((x) => (x - root) ** 3 + 1e-3 * (x - root), -60, 61);
        expect(found.ok && Math.abs(found.x - root) < 1e-9).toBe(true);
      }),
    );
  });

  it('says that a bracket holds no root, that a value is missing, and that it gave up', () => {
    expect(findRoot((x) => x * x + 1, -1, 1)).toMatchObject({
      ok: false,
      reason: expect.stringContaining('keeps its sign'),
    });
    expect(findRoot(() => Number.NaN, 0, 1)).toMatchObject({
      ok: false,
      reason: expect.stringContaining('no value'),
    });
    expect(findRoot((x) => x ** 3 - 2, 0, 9, { maxIterations: 3 })).toMatchObject({
      ok: false,
      reason: expect.stringContaining('given up'),
    });
  });

  it('takes an end of the bracket that is the root', () => {
    expect(findRoot((x) => x, 0, 5)).toEqual({ ok: true, x: 0, iterations: 0 });
    expect(findRoot((x) => x - 5, 0, 5)).toEqual({ ok: true, x: 5, iterations: 0 });
  });
});

describe('interpolation', () => {
  const table = {
    rows: [0, 10],
    columns: [0, 1, 3],
    values: [
      [0, 1, 3],
      [10, 11, 13],
    ],
  };
  it('is exact at nodes, straight between them, and has no value outside', () => {
    expect(interpolate({ x: [0, 1, 3], y: [5, 7, 3] }, 1)).toBe(7);
    expect(interpolate({ x: [0, 1, 3], y: [5, 7, 3] }, 2)).toBe(5);
    expect(interpolate({ x: [0, 1], y: [5, 7] }, 1.001)).toBeUndefined();
    expect(interpolateTable(table, 5, 2)).toBe(7);
    expect(interpolateTable(table, 10, 3)).toBe(13);
    expect(interpolateTable(table, 11, 1)).toBeUndefined();
    expect(interpolateTable(table, 5, 4)).toBeUndefined();
  });
});

describe('integrate', () => {
  it('integrates smooth functions and sharp ends (closed forms)', () => {
    expect(integrate(Math.sin, 0, Math.PI)).toBeCloseTo(2, 9);
    expect(integrate((x) => Math.sqrt(x), 0, 1)).toBeCloseTo(2 / 3, 9);
    expect(integrate((x) => 1 / Math.sqrt(x), 0, 1)).toBeCloseTo(2, 5);
    expect(integrate(Math.exp, 2, 2)).toBe(0);
  });
});
