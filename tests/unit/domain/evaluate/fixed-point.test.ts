/* The fixed point of flow and back pressure, on equations whose solution is known in closed form. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { solveFixedPoint } from '@domain/evaluate';

const RANGE = { lo: 0, hi: 1e9 };

describe('solveFixedPoint', () => {
  it('is met at once where nothing depends on it', () => {
    expect(solveFixedPoint(() => 130_000, 130_000, RANGE)).toEqual({
      converged: true,
      value: 130_000,
      rounds: 1,
    });
  });

  // x = a + b x has the solution a / (1 − b), for falling lines (b < 0) as for a line that plain repetition would lose (b < −1).
  it('finds the solution of any falling line', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1e5, max: 1e6, noNaN: true }),
        fc.double({ min: -5, max: -0.01, noNaN: true }),
        (a, b) => {
          const found = solveFixedPoint((x) => a + b * x, 1e5, RANGE);
          expect(found.converged).toBe(true);
          expect(found.value / (a / (1 - b))).toBeCloseTo(1, 4);
        },
      ),
    );
  });

  // p² = p₀² + c (p₁ − p) falls in p: an isothermal line fed by a subcritical nozzle, roughly.
  it('finds the solution of a curve', () => {
    const next = (p: number) => Math.sqrt(1e10 + 4e5 * Math.max(0, 5e5 - p));
    const found = solveFixedPoint(next, 1e5, RANGE);
    expect(found.converged).toBe(true);
    expect(next(found.value) / found.value).toBeCloseTo(1, 5);
  });

  it('says why it failed', () => {
    const lost = solveFixedPoint(() => Number.NaN, 1e5, RANGE);
    expect(lost.converged).toBe(false);
    expect(lost).toHaveProperty('why', expect.stringContaining('could not be worked'));
  });
});
