/* Water and steam: states found by any pair agree, nothing is ever NaN, and the edges of the formulation are kept. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type FluidState } from '../../../../src/engine/properties/types';
import { atHS, regionOf, WATER } from '../../../../src/engine/water';
import { boundaryTemperature, saturationPressure } from '../../../../src/engine/water/saturation';
import { viscosity } from '../../../../src/engine/water/viscosity';

const RUNS = { numRuns: 3000 };
const relative = (a: number, b: number, scale = 0) => Math.abs(a - b) / (Math.abs(b) + scale);

/** Pressures evenly in their logarithm, 10 Pa to 100 MPa, and temperatures of the whole range. */
const pressure = fc.double({ min: 1, max: 8, noNaN: true }).map((exponent) => 10 ** exponent);
const temperature = fc.oneof(
  fc.double({ min: 273.15, max: 1073.15, noNaN: true }),
  fc.double({ min: 620, max: 870, noNaN: true }),
  fc.double({ min: 273.15, max: 2273.15, noNaN: true }),
);
const subcritical = fc.double({ min: 612, max: 22.06e6, noNaN: true });

/**
 * Where basic equations meet they differ by up to some 100 J/kg (IAPWS R7-97(2012), section 10, allows more), so a state right
 * beside a boundary may come back on its other side, by as much as that is worth in temperature. Away from it: rounding.
 */
function besideBoundary({ P, T }: FluidState): boolean {
  const edges = [623.15, 1073.15, P > 16.5e6 ? boundaryTemperature(P) : 0];
  return edges.some((edge) => Math.abs(T - edge) < 0.2);
}

function expectSame(found: FluidState | undefined, state: FluidState): void {
  expect(found).toBeDefined();
  if (found === undefined) return;
  const beside = besideBoundary(state);
  expect(relative(found.T, state.T)).toBeLessThan(beside ? 1e-4 : 1e-9);
  expect(relative(found.h, state.h, 1e3)).toBeLessThan(beside ? 1e-4 : 1e-9);
  expect(relative(found.s, state.s, 10)).toBeLessThan(beside ? 1e-4 : 1e-9);
}

describe('round trips', () => {
  it('by P and h and by P and s come back to the state by P and T', () => {
    fc.assert(
      fc.property(pressure, temperature, (P, T) => {
        const state = WATER.atPT(P, T);
        if (state === undefined) return;
        expectSame(WATER.atPH(P, state.h), state);
        expectSame(WATER.atPS(P, state.s), state);
      }),
      RUNS,
    );
  });

  it('by h and s come back to pressure and temperature, in one phase and in two', () => {
    fc.assert(
      fc.property(pressure, temperature, (P, T) => {
        const state = WATER.atPT(P, T);
        if (state === undefined || besideBoundary(state)) return;
        const found = atHS(state.h, state.s)!;
        expectSame(found, state);
        // Liquid is so stiff that pressure follows h and s only to 1e-10 of 100 MPa.
        expect(Math.abs(found.P - P)).toBeLessThan(1e-7 * P + 1e-2 * state.rho ** 0.5);
      }),
      { numRuns: 800 },
    );
    fc.assert(
      fc.property(subcritical, fc.double({ min: 0.001, max: 0.999, noNaN: true }), (P, x) => {
        const state = WATER.atPx(P, x)!;
        const found = atHS(state.h, state.s)!;
        expect(relative(found.P, P)).toBeLessThan(1e-6);
        expect(relative(found.T, state.T)).toBeLessThan(1e-7);
        expect(found.x).toBeCloseTo(x, 5);
      }),
      { numRuns: 500 },
    );
  });

  it('of two-phase states by P and h and by P and s come back to the vapour fraction', () => {
    fc.assert(
      fc.property(subcritical, fc.double({ min: 0, max: 1, noNaN: true }), (P, x) => {
        const state = WATER.atPx(P, x)!;
        for (const found of [WATER.atPH(P, state.h), WATER.atPS(P, state.s)]) {
          expect(relative(found!.rho, state.rho)).toBeLessThan(1e-8);
          expect(Math.abs((found!.x ?? Math.round(x)) - x)).toBeLessThan(1e-8);
        }
      }),
      RUNS,
    );
  });
});

describe('the surface is physical', () => {
  it('h, s and v rise along an isobar, across every boundary', () => {
    fc.assert(
      fc.property(
        pressure,
        fc.double({ min: -0.01, max: 7, noNaN: true }),
        fc.double({ min: 1e-4, max: 1, noNaN: true }),
        (P, h, rise) => {
          const a = WATER.atPH(P, h * 1e6);
          const b = WATER.atPH(P, (h + rise) * 1e6);
          if (a === undefined || b === undefined) return;
          expect(b.s).toBeGreaterThan(a.s);
          expect(b.T).toBeGreaterThanOrEqual(a.T - 1e-3);
          // Below 4 °C water shrinks when it warms.
          if (a.T > 277.2) expect(1 / b.rho).toBeGreaterThan(1 / a.rho);
        },
      ),
      RUNS,
    );
  });

  it('dh = T ds at constant pressure, and dh = v dp at constant entropy, by differences', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 3, max: 7.9, noNaN: true }),
        fc.double({ min: 300, max: 1000, noNaN: true }),
        (exponent, T) => {
          const P = 10 ** exponent;
          const state = WATER.atPT(P, T);
          if (state === undefined || besideBoundary(state)) return;
          const step = 1e-4;
          const hotter = WATER.atPH(P, state.h + 50)!;
          expect(relative((hotter.s - state.s) * state.T, 50)).toBeLessThan(1e-3);
          const up = WATER.atPS(P * (1 + step), state.s);
          const down = WATER.atPS(P * (1 - step), state.s);
          if (up === undefined || down === undefined || regionOf(up) !== regionOf(down)) return;
          // The mean of both sides leaves the error of the third order only; region 1 next to its edge is the coarsest.
          expect(relative((up.h - down.h) / (2 * step * P), 1 / state.rho)).toBeLessThan(2e-3);
          expect(relative(Math.sqrt((2 * step * P) / (up.rho - down.rho)), state.w)).toBeLessThan(5e-3);
        },
      ),
      { numRuns: 1500 },
    );
  });

  it('saturation: temperature, and the difference of the phases, are monotone; Clapeyron holds', () => {
    fc.assert(
      fc.property(fc.double({ min: 612, max: 22.0e6, noNaN: true }), (P) => {
        const here = WATER.saturation(P)!;
        const above = WATER.saturation(P * 1.0005)!;
        expect(above.liquid.T).toBeGreaterThan(here.liquid.T);
        expect(above.liquid.rho).toBeLessThan(here.liquid.rho * (P > 1200 ? 1 : 1.0001));
        expect(above.vapour.rho).toBeGreaterThan(here.vapour.rho);
        const latent = here.vapour.h - here.liquid.h;
        expect(above.vapour.h - above.liquid.h).toBeLessThan(latent);
        // λ = T (v″ − v′) dp/dT: the saturation line is an equation of its own, so this ties it to the basic equations.
        const step = 1e-3;
        const T = here.liquid.T;
        const slope =
          (saturationPressure(T + step)! - saturationPressure(Math.max(273.15, T - step))!) /
          (T + step - Math.max(273.15, T - step));
        expect(relative(T * (1 / here.vapour.rho - 1 / here.liquid.rho) * slope, latent)).toBeLessThan(
          P < 20e6 ? 2e-3 : 2e-2,
        );
      }),
      RUNS,
    );
  });
});

describe('edges', () => {
  it('answers undefined outside of the formulation and at the critical point, where cp has no value', () => {
    for (const [P, T] of [
      [1e5, 273.14],
      [1e5, 2273.16],
      [50.1e6, 1100],
      [100.1e6, 500],
      [0, 300],
      [0.9, 300],
      [-1e5, 300],
      [22.064e6, 647.096],
    ] as const)
      expect(WATER.atPT(P, T)).toBeUndefined();
    expect(WATER.saturation(600)).toBeUndefined();
    expect(WATER.saturation(22.064e6)).toBeUndefined();
    expect(WATER.atPx(1e6, 1.01)).toBeUndefined();
    expect(WATER.atPx(1e6, -0.01)).toBeUndefined();
    expect(WATER.atPH(1e6, -5e4)).toBeUndefined();
    expect(WATER.atPS(1e6, 2e4)).toBeUndefined();
    expect(atHS(1e5, 9000)).toBeUndefined();
  });

  it('is the vapour exactly at saturation, and steam below the lowest saturation pressure', () => {
    const { vapour } = WATER.saturation(2e6)!;
    expect(WATER.atPT(2e6, vapour.T)!.rho).toBeCloseTo(vapour.rho, 9);
    expect(regionOf(WATER.atPT(500, 273.15)!)).toBe(2);
    expect(WATER.atPH(500, WATER.atPT(500, 280)!.h)!.T).toBeCloseTo(280, 8);
  });

  it('gives the boiling and the dew point as 0 and 1 of the vapour fraction', () => {
    for (const P of [1e5, 18e6]) {
      const { liquid, vapour } = WATER.saturation(P)!;
      expect(WATER.atPH(P, liquid.h)!.x).toBeCloseTo(0, 10);
      expect(WATER.atPH(P, vapour.h)!.x).toBeCloseTo(1, 10);
      expect(WATER.atPx(P, 0)!.rho).toBeCloseTo(liquid.rho, 9);
      expect(WATER.atPx(P, 1)!.rho).toBeCloseTo(vapour.rho, 9);
    }
  });

  it('leaves the viscosity out above 1173.15 K, where its release gives no uncertainty', () => {
    expect(WATER.atPT(1e6, 1173)!.mu).toBeGreaterThan(0);
    expect(WATER.atPT(1e6, 1174)!.mu).toBeUndefined();
    expect(viscosity(-1, 300)).toBeUndefined();
    expect(viscosity(998, Number.NaN)).toBeUndefined();
  });
});

describe('whatever is asked', () => {
  const absurd = fc.oneof(
    fc.double(),
    fc.double({ min: -1e9, max: 1e9 }),
    fc.constantFrom(
      0,
      -0,
      22.064e6,
      647.096,
      623.15,
      1073.15,
      1e8,
      5e7,
      Number.MIN_VALUE,
      Infinity,
      -Infinity,
      Number.NaN,
    ),
    pressure,
    temperature,
  );
  const finite = (state: object | undefined) => {
    for (const [name, value] of Object.entries(state ?? {})) expect(Number.isFinite(value), name).toBe(true);
  };
  it('never gives a figure that is not finite, and never throws', () => {
    fc.assert(
      fc.property(absurd, absurd, (a, b) => {
        for (const state of [WATER.atPT(a, b), WATER.atPx(a, b), WATER.atPH(a, b), WATER.atPS(a, b)])
          finite(state);
        const saturated = WATER.saturation(a);
        finite(saturated?.liquid);
        finite(saturated?.vapour);
      }),
      { numRuns: 40_000 },
    );
    fc.assert(
      fc.property(absurd, absurd, (h, s) => finite(atHS(h, s))),
      { numRuns: 3000 },
    );
  });
});
