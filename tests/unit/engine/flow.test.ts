/* Properties of the flow equations: monotonic in the load, continuous where the regime changes, the limit at k = 1. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { balancedKb } from '../../../src/engine/methods/a-gas/backpressure';
import {
  criticalArea,
  criticalRatio,
  gasArea,
  gasC,
  gasF2,
  nozzleFlux,
  subcriticalArea,
} from '../../../src/engine/methods/a-gas/flow';
import { steamKN } from '../../../src/engine/methods/b-steam/factors';
import {
  balancedKw,
  kv10,
  kv7,
  liquidArea,
  viscousArea,
  liquidReynolds,
} from '../../../src/engine/methods/c-liquid/flow';
import { isoKb } from '../../../src/engine/methods/i-iso4126/flow';
import { chooseLetter, ORIFICE_LETTERS } from '../../../src/engine/methods/i-letters';

const k = fc.double({ min: 1.02, max: 1.667, noNaN: true });
const base = { W: 10000, T: 400, Z: 0.9, M: 44, P1: 1200, P2: 101, Kd: 0.975, Kb: 1, Kc: 1 };

describe('gas', () => {
  it('needs area in proportion to the load, in both regimes', () => {
    fc.assert(
      fc.property(
        k,
        fc.double({ min: 0.1, max: 0.99, noNaN: true }),
        fc.double({ min: 1.01, max: 10, noNaN: true }),
        (kk, r, more) => {
          const gas = { ...base, k: kk, P2: base.P1 * r };
          const ratio = gasArea({ ...gas, W: gas.W * more }, 'SI').area / gasArea(gas, 'SI').area;
          expect(ratio).toBeCloseTo(more, 9);
        },
      ),
    );
  });

  it('is continuous at the critical pressure within the rounding of the printed constants (17.9 against 0.03948)', () => {
    fc.assert(
      fc.property(k, (kk) => {
        const gas = { ...base, k: kk, P2: base.P1 * criticalRatio(kk) };
        expect(Math.abs(subcriticalArea(gas, 'SI') / criticalArea(gas, 'SI') - 1)).toBeLessThan(0.002);
        expect(Math.abs(subcriticalArea(gas, 'US') / criticalArea(gas, 'US') - 1)).toBeLessThan(0.002);
      }),
    );
  });

  it('needs no less area when the back pressure rises', () => {
    fc.assert(
      fc.property(k, fc.double({ min: 0.02, max: 0.97, noNaN: true }), (kk, r) => {
        const at = (share: number) => gasArea({ ...base, k: kk, P2: base.P1 * share }, 'SI').area;
        expect(at(r + 0.01)).toBeGreaterThanOrEqual(at(r) * 0.999);
      }),
    );
  });

  it('gives the same valve in SI and US forms within the rounding of their constants', () => {
    const us = {
      W: 10000 / 0.45359237,
      T: 720,
      Z: 0.9,
      M: 44,
      k: 1.2,
      P1: 1200 / 6.894757,
      P2: 101 / 6.894757,
      Kd: 0.975,
      Kb: 1,
      Kc: 1,
    };
    const si = criticalArea({ ...base, k: 1.2 }, 'SI');
    expect(Math.abs((criticalArea(us, 'US') * 645.16) / si - 1)).toBeLessThan(0.002);
  });

  it('goes over into its limit at k = 1', () => {
    expect(gasC(1, 'US')).toBeCloseTo(gasC(1.00001, 'US'), 1);
    expect(criticalRatio(1)).toBeCloseTo(criticalRatio(1.00001), 4);
    expect(gasF2(1, 0.8)).toBeCloseTo(gasF2(1.0001, 0.8), 3);
    expect(isoKb(1, 0.8)).toBeCloseTo(isoKb(1.0001, 0.8), 3);
  });

  it('passes nothing against an equal pressure, and a choked nozzle does not feel the back pressure', () => {
    const state = { P1: 1e6, P2: 1e6, T: 300, Z: 1, M: 29, k: 1.4 };
    expect(nozzleFlux(state).flux).toBe(0);
    expect(nozzleFlux({ ...state, P2: 1e5 })).toEqual(nozzleFlux({ ...state, P2: 3e5 }));
  });
});

describe('factors read from curves', () => {
  it('Kb is 1 where the curve starts, falls from there, and has no value beyond 50 % or between the curves', () => {
    expect(balancedKb(20, 0.1)).toBe(1);
    expect(balancedKb(45, 0.21)).toBe(1);
    expect(balancedKb(45, 0.1) ?? 1).toBeLessThan(balancedKb(40, 0.1) ?? 0);
    expect(balancedKb(50, 0.1)).toBeGreaterThan(0.6);
    expect(balancedKb(51, 0.1)).toBeUndefined();
    expect(balancedKb(40, 0.12)).toBeUndefined();
  });

  it('Kw is 1 below its curve and has no value beyond 50 %', () => {
    expect(balancedKw(10)).toBe(1);
    expect(balancedKw(30) ?? 1).toBeLessThan(0.95);
    expect(balancedKw(50.1)).toBeUndefined();
  });
});

describe('steam and liquid', () => {
  it('KN starts at 1 and ends at 22 057 kPa', () => {
    expect(steamKN(10339, 'SI')).toBe(1);
    expect(steamKN(10340, 'SI')).toBeCloseTo(0.9953, 3);
    expect(steamKN(22058, 'SI')).toBeUndefined();
    expect(steamKN(3201, 'US')).toBeUndefined();
  });

  it('Kv never passes 1 and rises with Re in both formulas', () => {
    fc.assert(
      fc.property(fc.double({ min: 1, max: 1e8, noNaN: true }), (Re) => {
        expect(Math.max(kv7(Re), kv10(Re))).toBeLessThanOrEqual(1);
        expect(kv7(Re * 2)).toBeGreaterThanOrEqual(kv7(Re));
        expect(kv10(Re * 2)).toBeGreaterThanOrEqual(kv10(Re));
      }),
    );
  });

  it('the viscosity procedure ends with a letter that holds its own area, or settles above T', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1, max: 5e4, noNaN: true }),
        fc.double({ min: 1, max: 1e4, noNaN: true }),
        (Q, mu) => {
          const bare = liquidArea({ Q, G: 0.9, dp: 900, Kd: 0.65, Kw: 1, Kc: 1 }, 'SI');
          const { passes, converged } = viscousArea(
            bare,
            (A) => liquidReynolds(Q, 0.9, { mu }, A, 'SI'),
            '10E',
            'SI',
          );
          const last = passes.at(-1);
          expect(converged).toBe(true);
          if (last?.letter !== undefined) expect(last.area).toBeLessThanOrEqual(last.selected);
          expect(last?.area ?? 0).toBeGreaterThanOrEqual(bare);
        },
      ),
    );
  });
});

describe('letters', () => {
  it('an area equal to a letter takes it, a hair more takes the next, above T there is none', () => {
    for (const [i, { letter, in2, mm2 }] of ORIFICE_LETTERS.entries()) {
      expect(chooseLetter(in2, 'US')?.letter).toBe(letter);
      expect(chooseLetter(mm2)?.letter).toBe(letter);
      expect(chooseLetter(mm2 + 0.1)?.letter).toBe(ORIFICE_LETTERS[i + 1]?.letter);
    }
  });
});
