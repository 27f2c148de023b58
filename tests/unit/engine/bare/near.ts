import { expect } from 'vitest';

/** Equal to a relative tolerance; a missing figure is never near. */
export function near(actual: number | undefined, expected: number, tolerance = 1e-6): void {
  expect(Math.abs((actual ?? Number.NaN) / expected - 1)).toBeLessThanOrEqual(tolerance);
}
