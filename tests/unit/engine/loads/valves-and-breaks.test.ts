/* Flow through valves, open connections and broken tubes: published figures, bounds and monotony. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { workMethod } from '../../../../src/engine/catalog';
import { nozzleFlux } from '../../../../src/engine/methods/a-gas/flow';
import { omegaOf } from '../../../../src/engine/methods/f-loads/flashing-flux';
import { type Q } from '../../../../src/engine/quantity';
import { type Inputs } from '../../../../src/engine/sheet';
import { EXAMPLES, q } from './examples';

const work = (id: string, change: Inputs = {}) => workMethod(id, { ...EXAMPLES[id], ...change });
const out = (id: string, name: string, change: Inputs = {}) => (work(id, change).outputs[name] as Q).value;
const load = (inputs: Inputs) =>
  (workMethod('f.inadvertent-opening', inputs).outputs['relief_load'] as Q).value;

describe('an open connection', () => {
  it('passes the air of the vent example of Perry’s handbook, section 6 (2.7 kg/s by its charts; from memory)', () => {
    const air = {
      phase: 'gas',
      bore: q(0.0525, 'm'),
      sum_K: q(5.6),
      P_high: q(1101.325, 'kPa_abs'),
      P_low: q(101.325, 'kPa_abs'),
      T: q(293.15, 'K'),
      Z: q(1),
      M: q(28.97, 'kg/kmol'),
      k: q(1.4),
    };
    expect(load(air) / 3600).toBeCloseTo(2.7147, 3);
    expect(workMethod('f.inadvertent-opening', air).outputs).toMatchObject({ choked: true });
  });

  it('passes liquid by its velocity heads, the exit among them (Crane TP-410: h_L = K v²/2g)', () => {
    const water = {
      phase: 'liquid',
      bore: q(0.05, 'm'),
      sum_K: q(3),
      P_high: q(600, 'kPa_abs'),
      P_low: q(200, 'kPa_abs'),
      rho: q(1000, 'kg/m3'),
    };
    const v = Math.sqrt((2 * 400_000) / 1000 / 4);
    expect(load(water)).toBeCloseTo(3600 * 1000 * v * (Math.PI / 4) * 0.05 ** 2, 6);
  });

  it('never passes more gas than a perfect nozzle, more with more pressure, less with more losses', () => {
    const number = (min: number, max: number) => fc.double({ min, max, noNaN: true });
    fc.assert(
      fc.property(
        number(150, 20000),
        number(0.02, 0.98),
        number(0.01, 50),
        number(1.02, 1.67),
        (P, r, N, k) => {
          const gas = (pressure: number, K: number): Inputs => ({
            phase: 'gas',
            bore: q(50, 'mm'),
            sum_K: q(K),
            P_high: q(pressure, 'kPa_abs'),
            P_low: q(P * r, 'kPa_abs'),
            T: q(320, 'K'),
            Z: q(1),
            M: q(20, 'kg/kmol'),
            k: q(k),
          });
          const { flux } = nozzleFlux({ P1: P * 1000, P2: P * r * 1000, T: 320, Z: 1, M: 20, k });
          const W = load(gas(P, N));
          expect(W).toBeLessThanOrEqual(3600 * (Math.PI / 4) * 0.05 ** 2 * flux * (1 + 1e-6));
          expect(load(gas(P, N * 1.5))).toBeLessThan(W);
          expect(load(gas(P * 1.1, N))).toBeGreaterThan(W);
        },
      ),
      { numRuns: 300 },
    );
  });
});

describe('a control valve with its bypass', () => {
  it('adds both paths of IEC 60534: twice the coefficient is twice the flow, a shut bypass is the valve alone', () => {
    const alone = workMethod('f.control-valve-gas', EXAMPLES['f.control-valve-bypass']!).outputs['W'] as Q;
    const shut = { bypass_coefficient: q(0, 'Kv'), outflow_kept: q(0, 'kg/h') };
    expect(out('f.control-valve-bypass', 'relief_load', shut)).toBeCloseTo(alone.value, 8);
    const same = { bypass_coefficient: q(25, 'Kv'), outflow_kept: q(0, 'kg/h') };
    expect(out('f.control-valve-bypass', 'relief_load', same)).toBeCloseTo(2 * alone.value, 8);
    expect(out('f.control-valve-bypass', 'relief_load', { outflow_kept: q(1e6, 'kg/h') })).toBe(0);
  });

  it('passes liquid as f.control-valve-liquid does', () => {
    const liquid: Inputs = {
      phase: 'liquid',
      coefficient: q(40, 'Kv'),
      bypass_coefficient: q(0, 'Kv'),
      P1: q(680, 'kPa_abs'),
      P2: q(220, 'kPa_abs'),
      rho: q(965.4, 'kg/m3'),
      Pv: q(70.1, 'kPa_abs'),
      Pc: q(22120, 'kPa_abs'),
      FL: q(0.6),
    };
    const { phase: _, bypass_coefficient: __, ...one } = liquid;
    const alone = workMethod('f.control-valve-liquid', one).outputs['W'] as Q;
    expect((workMethod('f.control-valve-bypass', liquid).outputs['relief_load'] as Q).value).toBeCloseTo(
      alone.value,
      8,
    );
  });
});

describe('gas that displaces liquid', () => {
  it('pushes out its own volume at relieving pressure (gas law by hand), gas as in f.gas-blowby', () => {
    const gas = out('f.blowby-displacement', 'gas_load');
    expect(gas).toBeCloseTo(
      (workMethod('f.gas-blowby', EXAMPLES['f.blowby-displacement']!).outputs['W'] as Q).value,
      8,
    );
    const volume = (gas * 0.95 * 8314.462618 * 320) / (20 * 1_100_000);
    expect(out('f.blowby-displacement', 'displacing_flow')).toBeCloseTo(volume, 7);
    expect(out('f.blowby-displacement', 'relief_load')).toBeCloseTo(volume * 750, 4);
  });

  it('says when the low side cannot fill, and when nobody has shown it', () => {
    const dry = work('f.blowby-displacement', { inventory: q(2, 'm3') });
    expect(dry.outputs).toMatchObject({ fills: false });
    expect(dry.warnings.map((w) => w.code)).toContain('GAS_GOVERNS');
    const { inventory: _, ...unknown } = EXAMPLES['f.blowby-displacement']!;
    expect(workMethod('f.blowby-displacement', unknown).warnings.map((w) => w.code)).toContain(
      'FILLING_NOT_SHOWN',
    );
  });
});

describe('a broken tube', () => {
  const base: Inputs = {
    tube_id: q(0.732, 'in'),
    Cd: q(1),
    n_ends: q(1),
    P_high: q(200, 'psia'),
    P_low: q(50, 'psia'),
  };
  it('turns a given flux into the flow of an end: 34 405 lb/h of the public worksheet 125092239 (81 795.5 lb/(h·in²), 0.732 in)', () => {
    const flux = { mass_flux: q((81795.5 / 3600) * 144, 'lb/(ft2.s)') };
    const worked = workMethod('f.tube-rupture', { ...base, phase: 'flashing', ...flux, M: q(1, 'lb/lbmol') });
    expect(Math.abs((worked.outputs['relief_load'] as Q).value / 34405 - 1)).toBeLessThan(0.002);
    expect((worked.outputs['relief_load'] as Q).unit).toBe('lb/h');
  });

  it('flashes by omega: at ω = 1 as an isothermal gas, G = P0/√e · √(1/(P0 v0)) when choked (limit of the method)', () => {
    const v0 = 0.05;
    const v9 = v0 * (1 + 1 / 9);
    expect(omegaOf(v0, v9)).toBeCloseTo(1, 12);
    const inputs = {
      ...base,
      phase: 'flashing',
      P_high: q(1000, 'kPa_abs'),
      P_low: q(100, 'kPa_abs'),
      v0: q(v0, 'm3/kg'),
      v9: q(v9, 'm3/kg'),
      tube_id: q(20, 'mm'),
    };
    const W = (workMethod('f.tube-rupture', inputs).outputs['relief_load'] as Q).value;
    expect(W).toBeCloseTo(3600 * (Math.PI / 4) * 0.02 ** 2 * Math.exp(-0.5) * Math.sqrt(1e6 / v0), 4);
  });

  it('gives less gas by one end and a leg than by two ends, and more than by one end', () => {
    const { tube_length: _, f_darcy: __, ...ends } = EXAMPLES['f.tube-rupture']!;
    const two = (workMethod('f.tube-rupture', ends).outputs['relief_load'] as Q).value;
    const both = out('f.tube-rupture', 'relief_load');
    expect(both).toBeLessThan(two);
    expect(both).toBeGreaterThan(two / 2);
    expect(work('f.tube-rupture', { phase: 'flashing' }).refused).toMatchObject({ code: 'NOT_WORKED' });
  });
});
