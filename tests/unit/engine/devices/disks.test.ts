/* Rupture disks: coefficient against resistance, the bounds of both, spans of burst pressures, and the pair with a valve. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { workMethod } from '../../../../src/engine/catalog';
import { convert, type Q } from '../../../../src/engine/quantity';
import { type Inputs } from '../../../../src/engine/sheet';

const q = (value: number, unit: string): Q => ({ value, unit });
const figure = (id: string, inputs: Inputs, name: string, unit: string): number => {
  const worked = workMethod(id, inputs);
  expect(worked.refused).toBeUndefined();
  const out = worked.outputs[name];
  return typeof out === 'object' ? convert(out, unit) : Number.NaN;
};
const codes = (id: string, inputs: Inputs) => workMethod(id, inputs).warnings.map((w) => w.code);
const refusal = (id: string, inputs: Inputs) => workMethod(id, inputs).refused;
const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });
const GAS = { T: q(320, 'K'), Z: q(0.95, '-'), M: q(44, 'kg/kmol'), k: q(1.15, '-') };
const ATM = q(101.325, 'kPa_abs');

describe('by the coefficient', () => {
  const gas = { W: q(5000, 'kg/h'), ...GAS, atmospheric_pressure: ATM };
  it('agrees with the equations of API 520-1 at Kd = 0.62 within the rounding of their constants', () => {
    fc.assert(
      fc.property(between(1.2, 100), between(1.02, 1.6), (P1, k) => {
        const given = { ...gas, k: q(k, '-'), P1: q(P1, 'bar_abs') };
        const mine = figure('j.disk-coefficient', given, 'A_required', 'mm2');
        const theirs = figure('a.gas', { ...given, P2: ATM, Kd: q(0.62, '-') }, 'A_required', 'mm2');
        expect(Math.abs(theirs / mine - 1)).toBeLessThan(0.002);
      }),
      { numRuns: 200 },
    );
    const water = { Q: q(50, 'm3/h'), rho: q(999, 'kg/m3'), P1: q(11, 'bar_abs'), P2: q(1, 'bar_abs') };
    const liquid = {
      Q: q(convert(q(50, 'm3/h'), 'L/min'), 'L/min'),
      G: q(1, '-'),
      set_pressure: q(1000, 'kPa_g'),
      overpressure: q(0, '-'),
      back_pressure: q(0, 'kPa_g'),
      Kd: q(0.62, '-'),
      atmospheric_pressure: q(1, 'bar_abs'),
    };
    expect(
      Math.abs(
        figure('c.liquid', liquid, 'A_required', 'mm2') /
          figure('j.disk-coefficient', water, 'A_required', 'mm2') -
          1,
      ),
    ).toBeLessThan(0.002);
  });

  it('scales with the load and falls with the pressure; both unit systems agree to 1e-9', () => {
    fc.assert(
      fc.property(between(1, 1e6), between(2, 200), between(1.01, 3), (W, P1, more) => {
        const at = (load: Q, P: Q) =>
          figure('j.disk-coefficient', { ...gas, W: load, P1: P }, 'A_required', 'mm2');
        const base = at(q(W, 'kg/h'), q(P1, 'bar_abs'));
        expect(at(q(W * more, 'kg/h'), q(P1, 'bar_abs')) / base).toBeCloseTo(more, 8);
        expect(at(q(W, 'kg/h'), q(P1 * more, 'bar_abs'))).toBeLessThan(base);
        const US = at(q(convert(q(W, 'kg/h'), 'lb/h'), 'lb/h'), q(convert(q(P1, 'bar_abs'), 'psia'), 'psia'));
        expect(US / base).toBeCloseTo(1, 9);
      }),
      { numRuns: 100 },
    );
  });

  it('is allowed only close to the vessel, with a short discharge to the air; the pipe bounds the area', () => {
    const near = {
      ...gas,
      P1: q(6, 'bar_abs'),
      to_atmosphere: true,
      pipe_bore: q(50, 'mm'),
      inlet_length: q(0.4, 'm'),
      discharge_length: q(0.25, 'm'),
      net_area: q(3000, 'mm2'),
    };
    const allowed = (change: Inputs) =>
      workMethod('j.disk-coefficient', { ...near, ...change }).outputs['method_allowed'];
    expect([
      allowed({}),
      allowed({ inlet_length: q(0.41, 'm') }),
      allowed({ discharge_length: q(0.26, 'm') }),
      allowed({ to_atmosphere: false }),
    ]).toEqual([true, false, false, false]);
    expect(figure('j.disk-coefficient', near, 'area_used', 'mm2')).toBeCloseTo((Math.PI / 4) * 2500, 6);
    expect(codes('j.disk-coefficient', { ...gas, P1: q(6, 'bar_abs') })).toEqual([
      'NOT_TO_ATMOSPHERE',
      'LENGTHS_NOT_GIVEN',
      'LENGTHS_NOT_GIVEN',
    ]);
    expect(refusal('j.disk-coefficient', { ...gas, P1: q(1, 'bar_abs') })).toMatchObject({ code: 'NO_FLOW' });
  });
});

describe('by the resistance', () => {
  const line = {
    D: q(80, 'mm'),
    L: q(4, 'm'),
    f_darcy: q(0.018, '-'),
    K_R: q(1.2, '-'),
    P1: q(8, 'bar_abs'),
    P2: q(1, 'bar_abs'),
    ...GAS,
  };
  const flow = (change: Inputs) =>
    figure('j.disk-resistance', { ...line, ...change }, 'W_calculated', 'kg/h');

  it('passes less than a nozzle of the same bore, more at a higher pressure, less with more resistance', () => {
    fc.assert(
      fc.property(between(1.01, 60), between(0.05, 15), between(1.01, 2), (P1, KR, more) => {
        const at = (P: number, K: number) => flow({ P1: q(P, 'bar_abs'), K_R: q(K, '-') });
        const base = at(P1, KR);
        expect(at(P1 * more, KR)).toBeGreaterThan(base);
        expect(at(P1, KR + more)).toBeLessThan(base);
        const nozzle = figure(
          'a.rated-capacity',
          {
            A_actual: q(Math.PI * 1600, 'mm2'),
            K_certified: q(1, '-'),
            ...GAS,
            P1: q(P1, 'bar_abs'),
            P2: q(1, 'bar_abs'),
          },
          'W_rated',
          'kg/h',
        );
        expect(base).toBeLessThan(nozzle);
      }),
      { numRuns: 150 },
    );
  });

  it('comes near the nozzle when hardly anything resists', () => {
    const little = flow({ L: q(0, 'm'), K_entrance: q(0, '-'), K_R: q(0.05, '-') });
    const nozzle = figure(
      'a.rated-capacity',
      {
        A_actual: q(Math.PI * 1600, 'mm2'),
        K_certified: q(1, '-'),
        ...GAS,
        P1: q(8, 'bar_abs'),
        P2: q(1, 'bar_abs'),
      },
      'W_rated',
      'kg/h',
    );
    expect(little / nozzle).toBeGreaterThan(0.96);
    expect(little / nozzle).toBeLessThan(1);
  });

  it('counts 0.9 of the flow, takes 2.4 for an unknown disk, and both unit systems agree', () => {
    expect(figure('j.disk-resistance', line, 'W_rated', 'kg/h') / flow({})).toBeCloseTo(0.9, 12);
    const { K_R, ...unknown } = line;
    expect(K_R.value).toBe(1.2);
    expect(codes('j.disk-resistance', unknown)).toContain('KR_ASSUMED');
    expect(figure('j.disk-resistance', unknown, 'W_calculated', 'kg/h')).toBeCloseTo(
      flow({ K_R: q(2.4, '-') }),
      9,
    );
    const US = flow({
      D: q(80 / 25.4, 'in'),
      L: q(4 / 0.3048, 'ft'),
      P1: q(convert(q(8, 'bar_abs'), 'psia'), 'psia'),
      P2: q(convert(q(1, 'bar_abs'), 'psia'), 'psia'),
    });
    expect(US / flow({})).toBeCloseTo(1, 9);
    expect(refusal('j.disk-resistance', { ...line, P2: q(9, 'bar_abs') })).toMatchObject({
      code: 'NO_FLOW',
      field: 'P2',
    });
  });

  it('a liquid pays N + 1 velocity heads', () => {
    const { T, Z, M, k, ...rest } = line;
    expect([T, Z, M, k]).toHaveLength(4);
    const N = 0.5 + (0.018 * 4) / 0.08 + 1.2;
    expect(
      figure('j.disk-resistance', { ...rest, rho: q(900, 'kg/m3') }, 'W_calculated', 'kg/s'),
    ).toBeCloseTo(Math.PI * 1600e-6 * Math.sqrt((2 * 900 * 7e5) / (N + 1)), 8);
  });
});

describe('burst pressures', () => {
  it('lie in order, and widen with range and tolerance', () => {
    fc.assert(
      fc.property(
        between(20, 1e5),
        between(0, 0.2),
        between(0, 0.2),
        between(0, 0.2),
        (burst, up, down, t) => {
          const given = {
            specified_burst: q(burst, 'kPa_g'),
            range_up: q(up, '-'),
            range_down: q(down, '-'),
            tolerance: q(t, '-'),
          };
          const [a, b, c, d] = ['burst_min', 'marked_burst_min', 'marked_burst_max', 'burst_max'].map(
            (name) => figure('j.disk-tolerance', given, name, 'kPa_g'),
          );
          expect(a).toBeLessThanOrEqual(b!);
          expect(b).toBeLessThanOrEqual(c!);
          expect(c).toBeLessThanOrEqual(d!);
          expect(figure('j.disk-tolerance', given, 'operating_max', 'kPa_g')).toBeCloseTo(0.7 * b!, 6);
        },
      ),
      { numRuns: 200 },
    );
  });

  it('take 2 psi up to 40 psig and 5 % above (ASME VIII-1 UG-127, from memory)', () => {
    const top = (burst: number) =>
      figure('j.disk-tolerance', { specified_burst: q(burst, 'psig') }, 'burst_max', 'psig') - burst;
    expect([top(20), top(40), top(200)]).toEqual([2, 2, 10].map((v) => expect.closeTo(v, 9)));
  });

  it('warn above the MAWP and above the operating ratio; refuse a disk that may burst at nought', () => {
    const given = {
      MAWP: q(100, 'psig'),
      specified_burst: q(98, 'psig'),
      range_up: q(0.1, '-'),
      operating_pressure: q(80, 'psig'),
      operating_ratio: q(0.8, '-'),
    };
    expect(codes('j.disk-tolerance', given)).toEqual(['SPECIFIED_ABOVE_MAWP', 'OPERATING_TOO_HIGH']);
    expect(refusal('j.disk-tolerance', { specified_burst: q(1.5, 'psig') })).toMatchObject({
      code: 'VALUE_IMPOSSIBLE',
    });
    expect(refusal('j.disk-tolerance', { operating_pressure: q(1, 'psig') })).toMatchObject({
      code: 'INPUT_MISSING',
      field: 'specified_burst',
    });
  });
});

describe('with a valve', () => {
  const pair = {
    valve_capacity: q(1000, 'kg/h'),
    marked_burst: q(9.5, 'bar_g'),
    set_pressure: q(10, 'bar_g'),
    non_fragmenting: true,
    space_watched: true,
    disk_passes_valve: true,
  };
  it('takes 0.9 or what was certified for the pair', () => {
    expect(figure('j.disk-with-valve', pair, 'combined_capacity', 'kg/h')).toBeCloseTo(900, 9);
    expect(codes('j.disk-with-valve', pair)).toEqual(['KC_DEFAULT']);
    expect(
      figure('j.disk-with-valve', { ...pair, Kc_certified: q(0.97, '-') }, 'combined_capacity', 'kg/h'),
    ).toBeCloseTo(970, 9);
  });

  it('says what stands against the pair', () => {
    expect(
      codes('j.disk-with-valve', { ...pair, marked_burst: q(8.9, 'bar_g'), space_watched: false }),
    ).toEqual(['KC_DEFAULT', 'BURST_FAR_BELOW_SET', 'SPACE_WATCHED']);
    expect(codes('j.disk-with-valve', { ...pair, marked_burst: q(10.1, 'bar_g') })).toContain(
      'BURST_ABOVE_SET',
    );
    expect(
      workMethod('j.disk-with-valve', { ...pair, non_fragmenting: false }).outputs['conditions_met'],
    ).toBe(false);
  });
});
