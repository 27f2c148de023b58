/* Pumps, compressors, loops, filling: against identities of thermodynamics, hydrostatics and mass balances. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { workMethod } from '../../../../src/engine/catalog';
import { polytropicHead } from '../../../../src/engine/methods/f-loads/compressor-curve';
import { meetCurve } from '../../../../src/engine/methods/f-loads/curve';
import { pumpFlow } from '../../../../src/engine/methods/f-loads/pump-curve';
import { pool } from '../../../../src/engine/methods/f-loads/pooled';
import { type LoopPart, meanBy, settleOut } from '../../../../src/engine/methods/f-loads/settle-out';
import { type Q } from '../../../../src/engine/quantity';
import { type Inputs } from '../../../../src/engine/sheet';
import { EXAMPLES, q } from './examples';

const work = (id: string, change: Inputs = {}) => workMethod(id, { ...EXAMPLES[id], ...change });
const out = (id: string, name: string, change: Inputs = {}) => (work(id, change).outputs[name] as Q).value;

describe('a pump on its curve', () => {
  it('delivers by many points what the parabola gives', () => {
    const points = Object.fromEntries(
      Array.from({ length: 25 }, (_, i) => {
        const flow = i * 5;
        const n = i === 0 ? '' : `_${i + 1}`;
        return [
          [`curve_flow${n}`, q(flow, 'm3/h')],
          [`curve_dp${n}`, q(1400 - 0.09 * flow ** 2, 'kPa')],
        ];
      }).flat() as [string, Q][],
    );
    const common = { P1: q(1100, 'kPa_g'), suction_pressure: q(100, 'kPa_g') };
    const parabola = { ...common, shutoff_dp: q(1400, 'kPa'), curve_coefficient: q(0.09, 'kPa/(m3/h)^2') };
    const flow = (inputs: Inputs) =>
      (workMethod('f.blocked-outlet', inputs).outputs['relief_flow'] as Q).value;
    expect(flow(parabola)).toBeCloseTo(Math.sqrt(400 / 0.09), 9);
    expect(flow({ ...common, ...points }) / flow(parabola)).toBeCloseTo(1, 2);
  });

  it('takes the greater of two flows of a drooping curve, none above its top, and refuses past its end', () => {
    expect(meetCurve([0, 40, 80], [100, 110, 50], 105)).toEqual({ at: 'flow', flow: 40 + (5 / 60) * 40 });
    expect(meetCurve([0, 40, 80], [100, 110, 50], 120)).toEqual({ at: 'never' });
    expect(work('f.blocked-outlet', { P1: q(1600, 'kPa_g') }).outputs).toMatchObject({
      relief_needed: false,
    });
    expect(work('f.blocked-outlet', { P1: q(500, 'kPa_g') }).refused).toMatchObject({ code: 'CURVE_ENDS' });
    expect(work('f.blocked-outlet', { curve_flow_3: q(30, 'm3/h') }).refused).toMatchObject({
      code: 'ORDER',
    });
    expect(work('f.blocked-outlet', { curve_dp_2: q(1, 'm') }).refused).toMatchObject({
      field: 'curve_dp_2',
    });
  });

  it('fills against the static head: 20 m of a liquid of 800 kg/m³ cost 156.9 kPa (ρ g h)', () => {
    const flow = pumpFlow(900, 0.05, 500 + 156.9064 - 50);
    expect(out('f.overfilling', 'relief_flow')).toBeCloseTo(flow, 5);
    expect(out('f.overfilling', 'bottom_pressure')).toBeCloseTo(500 + (800 * 9.80665 * 18) / 1000, 6);
    expect(work('f.overfilling', { bottom_limit: q(600, 'kPa_g') }).warnings.map((w) => w.code)).toContain(
      'BOTTOM_EXCEEDED',
    );
  });
});

describe('a compressor', () => {
  it('has the head of a perfect isentropic machine, cp (T2 − T1), at efficiency 1; isothermal at k = 1', () => {
    const [T, M, k, r] = [300, 28.97, 1.4, 3];
    const R = 8314.462618 / M;
    const cp = (k / (k - 1)) * R;
    expect(polytropicHead(T, 1, M, (k - 1) / k, r)).toBeCloseTo(cp * T * (r ** ((k - 1) / k) - 1), 6);
    expect(polytropicHead(T, 1, M, 0, r)).toBeCloseTo(R * T * Math.log(r), 6);
  });

  it('delivers less against more pressure, surges above its curve, and gives its end flow below it', () => {
    expect(out('f.compressor-curve', 'relief_load', { P1: q(2200, 'kPa_abs') })).toBeLessThan(
      out('f.compressor-curve', 'relief_load'),
    );
    const high = work('f.compressor-curve', { P1: q(4000, 'kPa_abs') });
    expect(high.outputs).toMatchObject({ relief_needed: false });
    expect(high.warnings.map((w) => w.code)).toContain('SURGE');
    const low = work('f.compressor-curve', { P1: q(900, 'kPa_abs') });
    expect(low.warnings.map((w) => w.code)).toContain('CURVE_ENDS');
    expect((low.outputs['suction_flow'] as Q).value).toBe(4000);
    expect(work('f.compressor-curve', { P1: q(700, 'kPa_abs') }).refused).toMatchObject({ code: 'NO_RISE' });
  });

  it('by pressure ratios meets the same point as by heads where the ratios are those of the heads', () => {
    const heads = [160, 130, 60];
    const e = (1.28 - 1) / (1.28 * 0.75);
    const scale = (0.95 * 8314.462618 * 310) / 20 / 1000;
    const ratios = heads.map((h) => ((h * e) / scale + 1) ** (1 / e));
    const need = (2000 / 800) ** e;
    const { curve_head: _a, curve_head_2: _b, curve_head_3: _c, ...rest } = EXAMPLES['f.compressor-curve']!;
    const by = workMethod('f.compressor-curve', {
      ...rest,
      curve_ratio: q(ratios[0]!),
      curve_ratio_2: q(ratios[1]!),
      curve_ratio_3: q(ratios[2]!),
    });
    expect(need).toBeGreaterThan(1);
    expect((by.outputs['suction_flow'] as Q).value / out('f.compressor-curve', 'suction_flow')).toBeCloseTo(
      1,
      1,
    );
  });

  it('of fixed intake carries with its suction density', () => {
    expect(out('f.compressor-rate', 'relief_load')).toBeCloseTo(6100 * 1.05 * (450 / 400) * (310 / 300), 8);
    expect(out('f.positive-displacement', 'relief_load')).toBeCloseTo(6.5 * 1.03 * 900, 9);
  });
});

describe('a loop that settles', () => {
  it('keeps its gas and its energy, and lies between the pressures it began with', () => {
    const part = fc.record({
      P: fc.double({ min: 10, max: 2e4, noNaN: true }),
      V: fc.double({ min: 0.01, max: 1e3, noNaN: true }),
      T: fc.constant(310),
      Z: fc.constant(1),
    });
    fc.assert(
      fc.property(fc.array(part, { minLength: 2, maxLength: 8 }), (parts: LoopPart[]) => {
        const P = settleOut(parts, 310, 1);
        const all = parts.map((one) => one.P);
        const mean = parts.reduce((s, one) => s + one.P * one.V, 0) / parts.reduce((s, one) => s + one.V, 0);
        expect(P / mean).toBeCloseTo(1, 10);
        expect(P).toBeGreaterThanOrEqual(Math.min(...all) * (1 - 1e-12));
        expect(P).toBeLessThanOrEqual(Math.max(...all) * (1 + 1e-12));
      }),
    );
  });

  it('re-worked by hand for two unequal parts', () => {
    const a = { P: 500, V: 20, T: 300, Z: 0.98 };
    const b = { P: 4000, V: 8, T: 380, Z: 0.93 };
    const [na, nb] = [(500 * 20) / (0.98 * 300), (4000 * 8) / (0.93 * 380)];
    const T = (na * 300 + nb * 380) / (na + nb);
    const Z = (na * 0.98 + nb * 0.93) / (na + nb);
    expect(meanBy([a, b], (part) => part.T)).toBeCloseTo(T, 9);
    expect(out('f.settle-out', 'settle_out_pressure')).toBeCloseTo((Z * T * (na + nb)) / 28, 8);
    expect(out('f.settle-out', 'mass')).toBeCloseTo(((na + nb) * 1000 * 18) / 8314.462618, 6);
    const set = { set_pressure: q(1.05 * out('f.settle-out', 'settle_out_pressure'), 'kPa_abs') };
    expect(work('f.settle-out', set).warnings.map((w) => w.code)).toContain('CLOSE_TO_SET');
    expect(work('f.settle-out', { set_pressure: q(200, 'kPa_g') }).outputs).toMatchObject({
      relief_needed: true,
    });
  });
});

describe('balances', () => {
  it('pool loads: mass adds, a load pooled with itself is itself, the mixture lies between', () => {
    const load = fc.record({
      W: fc.double({ min: 1, max: 1e6, noNaN: true }),
      T: fc.double({ min: 200, max: 800, noNaN: true }),
      M: fc.double({ min: 2, max: 200, noNaN: true }),
      Z: fc.double({ min: 0.3, max: 1.2, noNaN: true }),
      k: fc.double({ min: 1.02, max: 1.6, noNaN: true }),
    });
    fc.assert(
      fc.property(load, load, (a, b) => {
        const twin = pool([a, a]);
        for (const name of ['T', 'M', 'Z', 'k'] as const) expect(twin[name] / a[name]).toBeCloseTo(1, 9);
        const mixed = pool([a, b]);
        expect(mixed.W).toBeCloseTo(a.W + b.W, 6);
        for (const name of ['T', 'M', 'Z', 'k'] as const) {
          expect(mixed[name]).toBeGreaterThanOrEqual(Math.min(a[name], b[name]) * (1 - 1e-9));
          expect(mixed[name]).toBeLessThanOrEqual(Math.max(a[name], b[name]) * (1 + 1e-9));
        }
      }),
    );
  });

  it('inflow less outflow, never negative', () => {
    expect(out('f.inflow-balance', 'relief_load')).toBe(7200);
    const none = work('f.inflow-balance', { W_out: q(20000, 'kg/h') });
    expect(none.outputs['relief_load']).toEqual({ value: 0, unit: 'kg/h' });
    expect(none.warnings.map((w) => w.code)).toContain('NO_LOAD');
    expect(out('f.displacement', 'relief_load')).toBeCloseTo((2000 / 8) * 820, 9);
  });

  it('a cooling gas volume draws in what the gas law says: 40 m³ that cool by 2 K/min at 350 K take 13.7 m³/h', () => {
    const gas = out('f.vacuum-inflow', 'inflow', { liquid_out: q(0, 'm3/h'), condensing_rate: q(0, 'kg/h') });
    expect(gas).toBeCloseTo((40 * 120) / 350, 9);
    expect(out('f.vacuum-inflow', 'inflow')).toBeCloseTo(60 + 900 / 0.6 + gas, 9);
  });
});
