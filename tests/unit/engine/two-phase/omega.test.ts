/* The omega method: closed limits, continuity between its regimes and regions, monotone, never above the sonic limit. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { nozzleFlux } from '../../../../src/engine/methods/a-gas/flow';
import {
  lowSubcoolingRatio,
  omegaFlux,
  omegaRatio,
  omegaRatioFit,
  omegaShape,
  subcooledFlux,
  subcooledShape,
  transitionRatio,
} from '../../../../src/engine/methods/d-two-phase/omega';
import {
  mixtureVolume,
  omegaDelayed,
  omegaFromProperties,
  omegaFromVolumes,
  omegaNonFlashing,
  omegaSubcooledFromProperties,
} from '../../../../src/engine/methods/d-two-phase/omega-forms';

const omegas = fc.double({ min: 0.05, max: 300, noNaN: true });
const ratios = fc.double({ min: 0.001, max: 0.999, noNaN: true });
const close = (a: number, b: number, tolerance = 1e-9) =>
  expect(Math.abs(a - b)).toBeLessThanOrEqual(tolerance * Math.max(Math.abs(a), Math.abs(b), 1e-12));

describe('the critical ratio of a saturated inlet', () => {
  it('is a root of its equation, rises with omega, and maximises the flux', () => {
    fc.assert(
      fc.property(omegas, (w) => {
        const eta = omegaRatio(w);
        const left = eta ** 2 + (w * w - 2 * w) * (1 - eta) ** 2 + 2 * w * w * (Math.log(eta) + 1 - eta);
        expect(Math.abs(left)).toBeLessThan(1e-8 * Math.max(1, w * w));
        expect(omegaRatio(w * 1.01)).toBeGreaterThan(eta);
        const best = omegaShape(w, eta);
        for (const other of [0.99, 0.9, 1.01, 1.05])
          expect(omegaShape(w, Math.min(1, eta * other))).toBeLessThanOrEqual(best * (1 + 1e-12));
      }),
      { numRuns: 2000 },
    );
  });

  it('agrees with the explicit fit of the standard to 3·10⁻⁴ for omega from 0.5 to 100', () => {
    for (let w = 0.5; w <= 100; w *= 1.05)
      expect(Math.abs(omegaRatioFit(w) - omegaRatio(w))).toBeLessThan(3.5e-4);
  });

  it('has the limits that theory gives: 0 at omega 0, 1/√e at omega 1, 1 for large omega', () => {
    expect(omegaRatio(0)).toBe(0);
    close(omegaRatio(1), Math.exp(-0.5), 1e-12);
    expect(omegaRatio(1e6)).toBeGreaterThan(0.9998);
    expect(omegaRatio(1e-9)).toBeLessThan(1e-4);
  });
});

describe('mass flux of a saturated inlet', () => {
  it('at omega 1 is that of an isothermal gas (k → 1), in both regimes', () => {
    for (const Pb of [1e5, 5e5, 7e5, 9e5]) {
      const gas = nozzleFlux({ P1: 1e6, P2: Pb, T: 300, Z: 1, M: 28, k: 1 });
      const flow = omegaFlux(1, 1e6, ((8314.462618 / 28) * 300) / 1e6, Pb);
      close(flow.flux, gas.flux, 1e-9);
      expect(flow.critical).toBe(gas.choked);
    }
  });

  it('at omega 0 is Bernoulli: a liquid that does not flash', () => {
    close(omegaFlux(0, 1e6, 0.001, 2e5).flux, Math.sqrt(2 * 1000 * 8e5), 1e-12);
  });

  it('is continuous where the regime changes, never rises with back pressure, never exceeds the sonic limit', () => {
    fc.assert(
      fc.property(omegas, ratios, ratios, (w, a, b) => {
        const [low, high] = a < b ? [a, b] : [b, a];
        const at = (r: number) => omegaFlux(w, 1e6, 0.01, r * 1e6).flux;
        expect(at(high)).toBeLessThanOrEqual(at(low) * (1 + 1e-12));
        const eta = omegaRatio(w);
        close(at(eta * (1 + 1e-9)), at(eta * (1 - 1e-9)), 1e-7);
        // The speed of sound of the omega law at the throat times its density: v = v0 (ω(P0/P − 1) + 1).
        const v = 0.01 * (w * (1 / eta - 1) + 1);
        const sonic = Math.sqrt((eta * 1e6) ** 2 / (0.01 * w * 1e6));
        expect(at(low)).toBeLessThanOrEqual(sonic * (1 + 1e-9));
        expect(v).toBeGreaterThan(0.01);
      }),
      { numRuns: 2000 },
    );
  });

  it('scales with the root of pressure over volume', () => {
    fc.assert(
      fc.property(omegas, ratios, fc.double({ min: 0.1, max: 100, noNaN: true }), (w, r, scale) => {
        const base = omegaFlux(w, 1e6, 0.01, r * 1e6).flux;
        close(omegaFlux(w, scale * 1e6, 0.01, scale * r * 1e6).flux, base * Math.sqrt(scale), 1e-9);
        close(omegaFlux(w, 1e6, 0.01 * scale, r * 1e6).flux, base / Math.sqrt(scale), 1e-9);
      }),
    );
  });
});

describe('a subcooled inlet', () => {
  const inlet = (omegaS: number, etaS: number) => ({ P0: 1e6, rho0: 600, Ps: etaS * 1e6, omegaS });

  it('meets the saturated inlet when the saturation pressure reaches the inlet pressure', () => {
    fc.assert(
      fc.property(omegas, ratios, (w, r) => {
        const cold = subcooledFlux(inlet(w, 1), r * 1e6);
        close(cold.flux, omegaFlux(w, 1e6, 1 / 600, r * 1e6).flux, 1e-8);
        close(cold.ratio, omegaRatio(w), 1e-8);
        expect(cold.low).toBe(true);
      }),
      { numRuns: 1000 },
    );
  });

  it('is continuous between low and high subcooling and at the critical back pressure', () => {
    fc.assert(
      fc.property(omegas, ratios, (w, r) => {
        const st = transitionRatio(w);
        close(
          subcooledFlux(inlet(w, st * (1 + 1e-7)), 1e3).flux,
          subcooledFlux(inlet(w, st), 1e3).flux,
          1e-3,
        );
        close(lowSubcoolingRatio(w, st * (1 + 1e-9)), st, 1e-3);
        const etaS = st + (1 - st) * r;
        const { ratio } = subcooledFlux(inlet(w, etaS), 1e3);
        const at = (b: number) => subcooledFlux(inlet(w, etaS), b * 1e6).flux;
        close(at(ratio * (1 - 1e-9)), at(ratio * (1 + 1e-9)), 1e-6);
        expect(at(ratio * 0.5)).toBeGreaterThanOrEqual(at(Math.min(0.999, ratio * 1.1)) * (1 - 1e-12));
      }),
      { numRuns: 1000 },
    );
  });

  it('passes more the colder it is, up to the liquid that does not flash, and no throat ratio gives more', () => {
    fc.assert(
      fc.property(omegas, ratios, ratios, (w, a, b) => {
        const [cold, warm] = a < b ? [a, b] : [b, a];
        const flux = (etaS: number) => subcooledFlux(inlet(w, etaS), 0).flux;
        expect(flux(cold)).toBeGreaterThanOrEqual(flux(warm) * (1 - 1e-9));
        expect(flux(cold)).toBeLessThanOrEqual(Math.sqrt(2 * 600 * 1e6));
        const { ratio } = subcooledFlux(inlet(w, warm), 0);
        const best = subcooledShape(w, warm, ratio);
        for (const eta of [0.2, 0.5, 0.8, 0.95, 0.999])
          expect(subcooledShape(w, warm, eta)).toBeLessThanOrEqual(best * (1 + 1e-9));
      }),
      { numRuns: 1000 },
    );
  });
});

describe('the ways to omega', () => {
  // Saturated water at 10 bar: IAPWS-IF97 steam tables (v', v'', cp', latent heat at 179.886 °C).
  const water = {
    vVapour: 0.194349,
    vLiquid: 0.00112723,
    cp: 4405,
    T0: 453.03,
    P0: 1e6,
    latentHeat: 2014.6e3,
  };

  it('from properties of saturated water at 10 bar is that from two volumes (16.5, the direct integration of water) within 3 %', () => {
    expect(Math.abs(omegaFromProperties({ ...water, x0: 0 }) / 16.545 - 1)).toBeLessThan(0.03);
    close(omegaSubcooledFromProperties(water), omegaFromProperties({ ...water, x0: 0 }), 1e-12);
  });

  it('a mass quality averages specific volumes, never densities', () => {
    close(1 / mixtureVolume(0.1, 1 / 1.33, 1 / 49.54), 10.7118, 1e-4);
  });

  it('without flashing is the void fraction over k, and 1/k of a gas alone', () => {
    close(omegaNonFlashing(1, 0.2, 0.001, 1.4), 1 / 1.4, 1e-12);
    expect(omegaNonFlashing(0, 0.2, 0.001, 1.4)).toBe(0);
  });

  it('with delayed boiling lies between no flashing and equilibrium, and is equilibrium when the exponent is nought', () => {
    fc.assert(
      fc.property(fc.double({ min: 0, max: 1, noNaN: true }), (x0) => {
        const at = (a: number) => omegaDelayed({ ...water, x0 }, a, omegaRatio);
        expect(at(0).N).toBe(1);
        expect(at(0.4).omega).toBeLessThanOrEqual(at(0).omega);
        expect(at(0.6).omega).toBeLessThanOrEqual(at(0.4).omega);
        expect(at(0.6).omega).toBeGreaterThanOrEqual(
          (x0 * water.vVapour) / mixtureVolume(x0, water.vVapour, water.vLiquid),
        );
      }),
    );
    expect(omegaFromVolumes(0.005, 0.0066)).toBeCloseTo(2.88, 12);
  });
});
