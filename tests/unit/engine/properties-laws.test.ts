/* Laws that nozzle and line arithmetic keeps for any input: continuity, monotony, scaling, the sonic limit. */
import fc from 'fast-check';
import { describe, it } from 'vitest';
import { adiabaticLine, isothermalLine } from '@engine/lines';
import {
  criticalArea,
  criticalRatio,
  GAS_CONSTANT,
  gasArea,
  type GasFlow,
  nozzleFlux,
  nozzleFunction,
  subcriticalArea,
} from '@engine/methods/a-gas/flow';
import { kv10, kv7, liquidArea } from '@engine/methods/c-liquid/flow';
import { omegaFlux, subcooledFlux } from '@engine/methods/d-two-phase/omega';
import { fireHeat } from '@engine/methods/e-fire/heat';
import { gasThrough, liquidThrough } from '@engine/methods/f-loads/control-valve';

const RUNS = { numRuns: 500, seed: 20261201 };
const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });
const near = (a: number, b: number, off: number) =>
  Math.abs(a - b) <= off * Math.max(Math.abs(a), Math.abs(b));

const GAS: fc.Arbitrary<GasFlow> = fc.record({
  W: between(1, 1e6),
  T: between(100, 1000),
  Z: between(0.5, 1.2),
  M: between(2, 200),
  k: between(1.02, 1.66),
  P1: between(120, 40_000),
  P2: between(1, 100),
  Kd: between(0.6, 1),
  Kb: fc.constant(1),
  Kc: between(0.8, 1),
});

/** Holds a law for arbitrary inputs. */
function law<T>(name: string, of: fc.Arbitrary<T>, holds: (given: T) => boolean): void {
  it(name, () => fc.assert(fc.property(of, holds), RUNS));
}

describe('a gas through a nozzle', () => {
  law('is continuous where it turns critical, to the rounding of the printed constants', GAS, (gas) => {
    const border = { ...gas, P2: criticalRatio(gas.k) * gas.P1 };
    // 0.03948 and 17.9 are printed to four and three digits: 0.1 % apart at the border.
    return near(criticalArea(border, 'SI'), subcriticalArea(border, 'SI'), 0.0015);
  });
  law('asks for area in proportion to the load', fc.tuple(GAS, between(0.01, 100)), ([gas, by]) =>
    near(gasArea({ ...gas, W: gas.W * by }, 'SI').area, by * gasArea(gas, 'SI').area, 1e-12),
  );
  law(
    'asks for less area at higher pressure',
    fc.tuple(GAS, between(1.01, 3)),
    ([gas, by]) => gasArea({ ...gas, P1: gas.P1 * by }, 'SI').area < gasArea(gas, 'SI').area * 1.0015,
  );
  law(
    'asks for no less area against a higher back pressure',
    fc.tuple(GAS, between(0.01, 0.98), between(0.01, 0.98)),
    ([gas, a, b]) => {
      const at = (r: number) => gasArea({ ...gas, P2: r * gas.P1 }, 'SI').area;
      return at(Math.max(a, b)) >= at(Math.min(a, b)) * (1 - 0.0015);
    },
  );
  law(
    'never passes more than the sonic flux, and passes it when choked',
    fc.tuple(GAS, between(0, 0.999)),
    ([gas, r]) => {
      const state = { ...gas, P1: gas.P1 * 1e3, P2: r * gas.P1 * 1e3 };
      const sonic = state.P1 * Math.sqrt(gas.M / (gas.Z * GAS_CONSTANT * gas.T)) * nozzleFunction(gas.k);
      const { flux, choked } = nozzleFlux(state);
      return flux <= sonic * (1 + 1e-12) && (!choked || near(flux, sonic, 1e-12));
    },
  );
});

describe('two-phase flow by omega', () => {
  const inlet = fc.tuple(between(0.01, 80), between(1e5, 1e7), between(1e-3, 1), between(0.01, 0.999));
  law('falls as the back pressure rises and is nought at the inlet pressure', inlet, ([omega, P0, v0, r]) => {
    const flux = (ratio: number) => omegaFlux(omega, P0, v0, ratio * P0).flux;
    return flux(r) <= flux(r * 0.9) * (1 + 1e-9) && flux(1) === 0 && flux(0) >= flux(r);
  });
  law('scales with the root of P0/v0', fc.tuple(inlet, between(0.1, 10)), ([[omega, P0, v0, r], by]) =>
    near(
      omegaFlux(omega, P0 * by, v0, r * P0 * by).flux,
      Math.sqrt(by) * omegaFlux(omega, P0, v0, r * P0).flux,
      1e-9,
    ),
  );
  law('never passes more than Bernoulli would of an unflashed liquid', inlet, ([omegaS, P0, v0, etaS]) => {
    const { flux } = subcooledFlux({ P0, rho0: 1 / v0, Ps: etaS * P0, omegaS }, 0);
    return flux <= Math.sqrt((2 * P0) / v0) * (1 + 1e-9);
  });
});

describe('liquids and heat', () => {
  law(
    'area goes with load and with the root of density over drop',
    fc.tuple(between(1, 1e5), between(0.4, 2), between(10, 1e4), between(0.1, 10)),
    ([Q, G, dp, by]) => {
      const area = (flow: { Q: number; G: number; dp: number }) =>
        liquidArea({ ...flow, Kd: 0.65, Kw: 1, Kc: 1 }, 'SI');
      return (
        near(area({ Q: Q * by, G, dp }), by * area({ Q, G, dp }), 1e-12) &&
        near(area({ Q, G: G * by, dp: dp * by }), area({ Q, G, dp }), 1e-12)
      );
    },
  );
  law(
    'the viscosity factors rise with the Reynolds number and stay below one',
    fc.tuple(between(20, 1e7), between(1.01, 10)),
    ([Re, by]) => kv7(Re) <= kv7(Re * by) && kv10(Re) < kv10(Re * by) && kv7(Re) <= 1 && kv10(Re) < 1,
  );
  law(
    'the heat of a fire goes with the area to the power 0.82',
    fc.tuple(between(1, 1e4), between(0.1, 10)),
    ([area, by]) =>
      near(fireHeat(area * by, 1, true, 'SI'), by ** 0.82 * fireHeat(area, 1, true, 'SI'), 1e-12),
  );
});

describe('control valves', () => {
  const gas = fc.record({
    P1: between(200, 2e4),
    T: between(200, 800),
    Z: between(0.6, 1.1),
    M: between(2, 100),
    k: between(1.05, 1.66),
    xT: between(0.2, 0.85),
  });
  law(
    'pass no less gas at a lower outlet pressure, and no more once choked',
    fc.tuple(gas, between(0.01, 0.99)),
    ([s, r]) => {
      const at = (ratio: number) => gasThrough({ ...s, P2: ratio * s.P1 }, 50, 'Kv');
      const [here, lower] = [at(r), at(r * 0.8)];
      return lower.W >= here.W * (1 - 1e-12) && (!here.choked || near(lower.W, here.W, 1e-12));
    },
  );
  law(
    'pass liquid in proportion to the coefficient',
    fc.tuple(between(200, 5000), between(0.1, 0.99), between(1, 500)),
    ([P1, r, C]) => {
      const s = { P1, P2: r * P1, rho: 900, Pv: 5, Pc: 5000, FL: 0.9 };
      return near(liquidThrough(s, C * 2, 'Kv').Q, 2 * liquidThrough(s, C, 'Kv').Q, 1e-12);
    },
  );
});

describe('lines', () => {
  const line = fc.record({
    gas: fc.record({
      T: between(200, 800),
      Z: between(0.7, 1.1),
      M: between(2, 100),
      k: between(1.05, 1.66),
    }),
    D: between(0.02, 1),
    N: between(0.1, 100),
    share: between(0.01, 3),
    end: between(2e4, 3e5),
  });
  type Line = {
    gas: { T: number; Z: number; M: number; k: number };
    D: number;
    N: number;
    share: number;
    end: number;
  };
  /** A flow as a share of what would choke isothermally at the end. */
  const flow = ({ gas, D, share, end }: Line) =>
    share * end * Math.sqrt(gas.M / (gas.Z * GAS_CONSTANT * gas.T)) * (Math.PI / 4) * D ** 2;
  law('isothermal: p1² − p2² = G²ZRT/M (N + 2 ln(p1/p2)), and never beyond the limit', line, (one) => {
    const W = flow(one);
    const [worked] = isothermalLine([{ D: one.D, N: one.N, W }], one.gas, one.end);
    if (!worked) return false;
    const G = W / ((Math.PI / 4) * one.D ** 2);
    const c2 = (one.gas.Z * GAS_CONSTANT * one.gas.T) / one.gas.M;
    const right = G ** 2 * c2 * (one.N + 2 * Math.log(worked.inlet / worked.outlet));
    return (
      near(worked.inlet ** 2 - worked.outlet ** 2, right, 1e-9) &&
      G * Math.sqrt(c2) <= worked.outlet * (1 + 1e-9) &&
      worked.choked === one.share > 1
    );
  });
  law(
    'adiabatic: upstream pressure rises with flow and Mach never passes 1',
    fc.tuple(line, between(1.01, 2)),
    ([one, by]) => {
      const at = (W: number) => adiabaticLine([{ D: one.D, N: one.N, W }], one.gas, one.end)[0];
      const [low, high] = [at(flow(one)), at(flow(one) * by)];
      return Boolean(
        low && high && high.inlet > low.inlet && low.machOut <= 1 + 1e-12 && low.machIn <= low.machOut,
      );
    },
  );
});
