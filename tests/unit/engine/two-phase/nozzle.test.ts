/* The integrated nozzle against exact laws: ideal gas, omega fluid, tables of the same isentrope; sonic limit; refusals. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { nozzleFlux } from '../../../../src/engine/methods/a-gas/flow';
import { subcooledFlux } from '../../../../src/engine/methods/d-two-phase/omega';
import { hemThroat } from '../../../../src/engine/nozzle/hem';
import { bubbleAt, inletAtQuality, inletAtTemperature } from '../../../../src/engine/nozzle/inlet';
import { smoothThroat, trapezoidThroat } from '../../../../src/engine/nozzle/table';
import { type PropertySource } from '../../../../src/engine/properties/types';
import { WATER } from '../../../../src/engine/water';
import { idealGas, omegaFluid } from './sources';

const within = (a: number, b: number, tolerance: number) =>
  expect(Math.abs(a / b - 1)).toBeLessThanOrEqual(tolerance);

describe('direct integration against closed formulas', () => {
  it('of an ideal gas is the isentropic nozzle, choked and not', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1.02, max: 1.9, noNaN: true }),
        fc.double({ min: 0.02, max: 0.99, noNaN: true }),
        fc.double({ min: 2, max: 120, noNaN: true }),
        (k, r, M) => {
          const gas = idealGas(M, k);
          const throat = hemThroat(gas, gas.atPT(2e6, 320)!, r * 2e6);
          const exact = nozzleFlux({ P1: 2e6, P2: r * 2e6, T: 320, Z: 1, M, k });
          within(throat?.flux ?? 0, exact.flux, 1e-6);
          expect(throat?.velocity).toBeLessThanOrEqual(
            gas.atPS(throat?.P ?? 1, gas.atPT(2e6, 320)!.s)!.T ** 0.5 *
              Math.sqrt((k * 8314.462618) / M) *
              (1 + 1e-3),
          );
        },
      ),
      { numRuns: 300 },
    );
  });

  it('of an omega fluid is the omega method, saturated and subcooled, in every region and regime', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.1, max: 120, noNaN: true }),
        fc.double({ min: 0.05, max: 1, noNaN: true }),
        fc.double({ min: 0.02, max: 0.98, noNaN: true }),
        (omega, etaS, back) => {
          const fluid = omegaFluid(omega, etaS * 1e6, 0.002);
          const throat = hemThroat(fluid, fluid.inlet(1e6), back * 1e6);
          const exact = subcooledFlux({ P0: 1e6, rho0: 500, Ps: etaS * 1e6, omegaS: omega }, back * 1e6);
          within(throat?.flux ?? 0, exact.flux, 2e-6);
        },
      ),
      { numRuns: 500 },
    );
  });
});

describe('a table of the same isentrope', () => {
  const rows = (source: PropertySource, inlet: { P: number; s: number }, end: number, count: number) => {
    const P = Array.from({ length: count }, (_, i) => inlet.P * (1 - (i / (count - 1)) * (1 - end)));
    return { P, v: P.map((p) => 1 / (source.atPS(p, inlet.s)?.rho ?? Number.NaN)) };
  };

  it('gives the flux of the direct integration on water: 40 rows within 0.05 %, on a smooth curve within 0.005 %', () => {
    for (const x0 of [0.02, 0.1, 0.5, 1]) {
      const inlet = inletAtQuality(WATER, 1e6, x0);
      const state = inlet?.state ?? { P: 1, s: 1, T: 1, rho: 1, h: 1 };
      const exact = hemThroat(WATER, state, 1e5)?.flux ?? 0;
      const table = rows(WATER, state, 0.4, 40);
      table.v[0] = 1 / state.rho;
      within(trapezoidThroat(table, 1e5).flux, exact, 5e-4);
      within(smoothThroat(table, 1e5)?.flux ?? 0, exact, 5e-5);
    }
  });

  it('of an omega fluid converges to the closed flux with the square of the step', () => {
    const fluid = omegaFluid(5, 1e6, 0.002);
    const exact = subcooledFlux({ P0: 1e6, rho0: 500, Ps: 1e6, omegaS: 5 }, 0).flux;
    const off = (count: number) =>
      Math.abs(trapezoidThroat(rows(fluid, fluid.inlet(1e6), 0.5, count), 0).flux / exact - 1);
    expect(off(161)).toBeLessThan(off(21) / 8);
    within(smoothThroat(rows(fluid, fluid.inlet(1e6), 0.5, 21), 0)?.flux ?? 0, exact, 1e-5);
  });

  it('stops at the back pressure, and says that it is not choked', () => {
    const fluid = omegaFluid(5, 1e6, 0.002);
    const table = rows(fluid, fluid.inlet(1e6), 0.5, 51);
    const throat = trapezoidThroat(table, 9.5e5);
    expect(throat.choked).toBe(false);
    expect(throat.P).toBeGreaterThanOrEqual(9.5e5);
    expect(smoothThroat(table, 9.5e5)?.choked).toBe(false);
    expect(smoothThroat(table, 2e6)).toBeUndefined();
  });
});

describe('water through a nozzle', () => {
  it('never passes more than at any other throat pressure would, falls with back pressure, and is finite at every inlet', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 5e3, max: 4e7, noNaN: true }),
        fc.double({ min: 280, max: 1050, noNaN: true }),
        fc.double({ min: 0.01, max: 0.99, noNaN: true }),
        (P0, T0, r) => {
          const inlet = inletAtTemperature(WATER, P0, T0);
          if (!inlet) return;
          const throat = hemThroat(WATER, inlet.state, r * P0);
          if (!throat) return;
          expect(Number.isFinite(throat.flux)).toBe(true);
          expect(throat.P).toBeGreaterThanOrEqual(r * P0 * (1 - 1e-9));
          // The first maximum is the throat: nothing above it in pressure passes more.
          for (const share of [0.1, 0.5, 0.9, 0.99]) {
            const P = P0 - share * (P0 - throat.P);
            const state = WATER.atPS(P, inlet.state.s);
            const flux = state ? state.rho * Math.sqrt(2 * Math.max(0, inlet.state.h - state.h)) : 0;
            expect(flux).toBeLessThanOrEqual(throat.flux * (1 + 1e-4));
          }
        },
      ),
      { numRuns: 150 },
    );
  }, 60_000);

  it('keeps below the speed of sound of the vapour, and is continuous across the boiling point of the inlet', () => {
    const flux = (T: number) => {
      const inlet = inletAtTemperature(WATER, 1e6, T);
      return inlet ? (hemThroat(WATER, inlet.state, 1e5)?.flux ?? 0) : 0;
    };
    const boiling = WATER.saturation(1e6)?.liquid.T ?? 0;
    const saturated = inletAtQuality(WATER, 1e6, 0);
    const at = saturated ? (hemThroat(WATER, saturated.state, 1e5)?.flux ?? 0) : 0;
    within(flux(boiling - 0.001), at, 2e-3);
    const dry = inletAtQuality(WATER, 1e6, 1);
    const vapour = dry ? (hemThroat(WATER, dry.state, 1e5)?.flux ?? 0) : 0;
    within(flux(boiling + 0.001), vapour, 1e-3);
    const steam = inletAtTemperature(WATER, 1e6, 600);
    const throat = steam && hemThroat(WATER, steam.state, 1e5);
    const sound = throat && WATER.atPT(throat.P, throat.T)?.w;
    within(throat?.velocity ?? 0, sound ?? 1, 2e-3);
  });

  it('finds the bubble pressure at a temperature (IAPWS-IF97, table 35: 0.353658941·10⁻² MPa at 300 K), and none above the critical', () => {
    within(bubbleAt(WATER, 300, 1e6)?.P ?? 0, 3536.58941, 1e-7);
    expect(bubbleAt(WATER, 700, 1e6)).toBeUndefined();
  });
});

describe('where properties end', () => {
  it('a throat is undefined, never a wrong number, and no pressure difference passes nothing', () => {
    const gas = idealGas(28, 1.4);
    const short: PropertySource = { ...gas, atPS: (P, s) => (P < 1.9e6 ? undefined : gas.atPS(P, s)) };
    const inlet = gas.atPT(2e6, 300)!;
    expect(hemThroat(short, inlet, 1e5)).toBeUndefined();
    expect(hemThroat(gas, inlet, 2e6)).toMatchObject({ flux: 0, choked: false });
    expect(inletAtQuality(gas, 1e6, 0.5)).toBeUndefined();
    expect(inletAtQuality(WATER, 3e7, 0.5)).toBeUndefined();
    expect(inletAtTemperature(WATER, 1e6, 5000)).toBeUndefined();
  });
});
