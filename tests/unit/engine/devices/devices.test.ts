/* Devices: what certified capacity, lift, vacuum, outside power and groups must keep, and what they refuse. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { workMethod } from '../../../../src/engine/catalog';
import { fullOpening, passedByAll, pressureFor } from '../../../../src/engine/methods/j-devices/staggered';
import { convert, type Q } from '../../../../src/engine/quantity';
import { type Inputs } from '../../../../src/engine/sheet';

const q = (value: number, unit: string): Q => ({ value, unit });
const figure = (id: string, inputs: Inputs, name: string, unit: string): number => {
  const worked = workMethod(id, inputs);
  expect(worked.refused).toBeUndefined();
  const out = worked.outputs[name];
  return typeof out === 'object' ? convert(out, unit) : Number.NaN;
};
const outputs = (id: string, inputs: Inputs) => workMethod(id, inputs).outputs;
const refusal = (id: string, inputs: Inputs) => workMethod(id, inputs).refused;
const codes = (id: string, inputs: Inputs) => workMethod(id, inputs).warnings.map((w) => w.code);
const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });

const PLATE_AIR = { T: q(519.67 / 1.8, 'K'), Z: q(1, '-'), M: q(28.97, 'kg/kmol'), k: q(1.4, '-') };
const ATM = q(101.325, 'kPa_abs');

describe('nameplates', () => {
  it('air at the rating of the nameplate gives the capacity of the nameplate back', () => {
    fc.assert(
      fc.property(between(10, 1e5), between(3, 400), (capacity, set) => {
        const given = {
          nameplate_air: q(capacity, 'Nm3/h'),
          set_pressure: q(set, 'bar_g'),
          ...PLATE_AIR,
          overpressure: q(0.1, '-'),
          atmospheric_pressure: ATM,
        };
        const back = figure('j.nameplate-capacity', given, 'W_rated', 'kg/h');
        expect(back / ((capacity * 28.97) / 22.413969545)).toBeCloseTo(1, 8);
      }),
      { numRuns: 200 },
    );
  });

  it('coefficient × area agrees with a.rated-capacity on any gas', () => {
    fc.assert(
      fc.property(between(5, 60), between(250, 600), between(2, 200), between(1.01, 1.6), (P1, T, M, k) => {
        const gas = {
          T: q(T, 'K'),
          Z: q(0.9, '-'),
          M: q(M, 'kg/kmol'),
          k: q(k, '-'),
          P1: q(P1, 'bar_abs'),
          P2: q(2, 'bar_abs'),
        };
        const plate = { nameplate_steam: q(4000, 'kg/h'), set_pressure: q(12, 'bar_g') };
        const KA = figure('j.nameplate-capacity', plate, 'K_times_A', 'mm2');
        const mine = figure('j.nameplate-capacity', { ...plate, ...gas }, 'W_rated', 'kg/h');
        expect(
          figure(
            'a.rated-capacity',
            { A_actual: q(KA / 0.8, 'mm2'), K_certified: q(0.8, '-'), ...gas },
            'W_rated',
            'kg/h',
          ) / mine,
        ).toBeCloseTo(1, 8);
      }),
      { numRuns: 100 },
    );
  });

  it('takes one capacity, of the kind of the fluid, and derates a measured one', () => {
    const set = { set_pressure: q(100, 'psig') };
    expect(refusal('j.nameplate-capacity', set)).toMatchObject({ code: 'NAMEPLATE' });
    expect(
      refusal('j.nameplate-capacity', { ...set, nameplate_air: q(1, 'SCFM'), nameplate_steam: q(1, 'lb/h') }),
    ).toMatchObject({ code: 'NAMEPLATE' });
    expect(
      refusal('j.nameplate-capacity', {
        ...set,
        nameplate_air: q(100, 'SCFM'),
        rho: q(998, 'kg/m3'),
        overpressure: q(0.1, '-'),
      })?.text,
    ).toMatch(/says nothing of a liquid/);
    expect(
      refusal('j.nameplate-capacity', { ...set, nameplate_water: q(50, 'US gpm'), ...PLATE_AIR })?.code,
    ).toBe('COEFFICIENT_OF_OTHER_PHASE');
    expect(
      refusal('j.nameplate-capacity', { set_pressure: q(300, 'bar_g'), nameplate_steam: q(1, 't/h') })?.text,
    ).toMatch(/Napier/);
    const KA = (extra: Inputs) =>
      figure('j.nameplate-capacity', { ...set, nameplate_air: q(100, 'SCFM'), ...extra }, 'K_times_A', 'mm2');
    expect(KA({ nameplate_is: 'measured' }) / KA({})).toBeCloseTo(0.9, 12);
    expect(
      codes('j.nameplate-capacity', { ...set, nameplate_air: q(1000, 'SCFM'), A_actual: q(0.3, 'in2') }),
    ).toContain('COEFFICIENT_HIGH');
  });

  it('high-pressure steam takes KN, low pressures the floor of 3 psi', () => {
    const KA = (set: number, over = 0.1) =>
      figure(
        'j.nameplate-capacity',
        {
          nameplate_steam: q(1000, 'kg/h'),
          set_pressure: q(set, 'psig'),
          nameplate_overpressure: q(over, '-'),
        },
        'K_times_A',
        'mm2',
      );
    expect(KA(20)).toBeCloseTo(KA(20, 0.15), 6);
    expect(KA(20, 0.2)).toBeLessThan(KA(20));
    const napier =
      1000 /
      3600 /
      ((51.5 * 0.45359237) / 3600 / 645.16e-6 / 6894.757293168) /
      ((2000 * 1.1 + 14.6959) * 6894.757293168) /
      1e-6;
    expect(KA(2000) / napier).toBeCloseTo((0.2292 * 2214.7 - 1061) / (0.1906 * 2214.7 - 1000), 3);
  });
});

describe('certified coefficients', () => {
  it('is 0.9 of the mean, and says when tests lie apart or are few', () => {
    fc.assert(
      fc.property(fc.array(between(0.3, 1), { minLength: 1, maxLength: 20 }), (tests) => {
        const given = Object.fromEntries(
          tests.map((K, i) => [i === 0 ? 'K_measured' : `K_measured_${i + 1}`, q(K, '-')]),
        );
        const mean = tests.reduce((a, b) => a + b, 0) / tests.length;
        expect(figure('j.certified-coefficient', given, 'K_certified', '-')).toBeCloseTo(0.9 * mean, 12);
        expect(figure('j.certified-coefficient', given, 'K_certified', '-')).toBeLessThanOrEqual(
          0.9 * Math.max(...tests) + 1e-12,
        );
      }),
      { numRuns: 100 },
    );
    expect(codes('j.certified-coefficient', { K_measured: q(0.9, '-'), K_measured_2: q(0.7, '-') })).toEqual(
      expect.arrayContaining(['TESTS_APART', 'FEW_TESTS']),
    );
    expect(codes('j.certified-coefficient', { K_measured: q(0.96, '-'), K_claimed: q(0.96, '-') })).toContain(
      'CLAIM_ABOVE_TESTS',
    );
  });
});

describe('lift', () => {
  const area = (lift: number, seat = 'flat') =>
    figure('j.low-lift', { bore_diameter: q(20, 'mm'), lift: q(lift, 'mm'), seat }, 'flow_area', 'mm2');
  it('the flow area rises with the lift up to that of the bore, without a jump at a quarter of the diameter', () => {
    fc.assert(
      fc.property(between(0.1, 20), between(1, 2), (lift, more) => {
        expect(area(lift * more)).toBeGreaterThanOrEqual(area(lift) * (1 - 1e-12));
        expect(area(lift)).toBeLessThanOrEqual(Math.PI * 100 * (1 + 1e-12));
        expect(area(lift, '45 degrees')).toBeLessThanOrEqual(area(lift) * (1 + 1e-12));
      }),
    );
    expect(area(5 - 1e-9) / area(5 + 1e-9)).toBeCloseTo(1, 8);
    expect(outputs('j.low-lift', { bore_diameter: q(20, 'mm'), lift: q(5.1, 'mm') })['kind']).toBe(
      'full-lift',
    );
  });

  it('a restricted lift keeps 30 % and 2 mm', () => {
    const at = (lift: number, full: number) =>
      outputs('j.low-lift', { bore_diameter: q(20, 'mm'), lift: q(lift, 'mm'), full_lift: q(full, 'mm') })[
        'restriction_allowed'
      ];
    expect([at(3, 10), at(2.9, 10), at(2, 5), at(1.9, 5)]).toEqual([true, false, true, false]);
    expect(
      refusal('j.low-lift', { bore_diameter: q(20, 'mm'), lift: q(6, 'mm'), full_lift: q(5, 'mm') }),
    ).toMatchObject({ code: 'LIFT_ABOVE_FULL' });
    expect(
      refusal('j.low-lift', { bore_diameter: q(20, 'mm'), seat_diameter: q(19, 'mm'), lift: q(1, 'mm') }),
    ).toMatchObject({ code: 'SEAT_BELOW_BORE' });
  });
});

describe('vacuum relief', () => {
  const given = {
    air_demand: q(300, 'Nm3/h'),
    set_vacuum: q(20, 'mbar'),
    overpressure: q(0.5, '-'),
    atmospheric_pressure: ATM,
  };
  it('needs more area for more air and less for a deeper vacuum; SI and US agree to 1e-9', () => {
    fc.assert(
      fc.property(between(1, 1e4), between(1, 300), between(1.001, 2), (air, set, more) => {
        const at = (load: Q, vacuum: Q) =>
          figure('j.vacuum-relief', { ...given, air_demand: load, set_vacuum: vacuum }, 'A_required', 'mm2');
        const base = at(q(air, 'Nm3/h'), q(set, 'mbar'));
        expect(at(q(air * more, 'Nm3/h'), q(set, 'mbar'))).toBeGreaterThan(base);
        expect(at(q(air, 'Nm3/h'), q(set * more, 'mbar'))).toBeLessThanOrEqual(base * (1 + 1e-12));
        const US = at(q(convert(q(air, 'Nm3/h'), 'SCFH'), 'SCFH'), q(convert(q(set, 'mbar'), 'psi'), 'psi'));
        expect(US / base).toBeCloseTo(1, 9);
      }),
      { numRuns: 100 },
    );
  });

  it('judges the external rating, and refuses to go below absolute vacuum', () => {
    expect(codes('j.vacuum-relief', given)).toContain('RATING_NOT_GIVEN');
    expect(codes('j.vacuum-relief', { ...given, external_rating: q(25, 'mbar') })).toContain(
      'VACUUM_ABOVE_RATING',
    );
    expect(refusal('j.vacuum-relief', { ...given, set_vacuum: q(900, 'mbar') })).toMatchObject({
      code: 'VALUE_IMPOSSIBLE',
      field: 'set_vacuum',
    });
  });
});

describe('devices that need outside energy', () => {
  const valve = {
    capacity: q(40, 't/h'),
    required_capacity: q(100, 't/h'),
    independent: true,
    loop_tested: true,
    fails_to: 'open',
  };
  const credited = (change: Inputs) =>
    figure('j.power-actuated', { ...valve, ...change }, 'credited_capacity', 't/h');
  it('are relied on only where nothing stands against it; on a boiler for 30 % at most', () => {
    expect([
      credited({}),
      credited({ fails_to: 'shut' }),
      credited({ fails_to: 'stays' }),
      credited({ independent: false }),
      credited({ loop_tested: false }),
    ]).toEqual([40, 0, 0, 0, 0].map((v) => expect.closeTo(v, 9)));
    expect([
      credited({ service: 'boiler', fails_to: 'shut' }),
      credited({ service: 'boiler', capacity: q(10, 't/h') }),
      credited({ service: 'boiler', independent: false }),
    ]).toEqual([30, 10, 0].map((v) => expect.closeTo(v, 9)));
    expect(figure('j.power-actuated', valve, 'remaining_capacity', 't/h')).toBeCloseTo(60, 9);
    expect(codes('j.power-actuated', { capacity: q(1, 't/h'), required_capacity: q(1, 't/h') })).toEqual([
      'NOT_INDEPENDENT',
      'NOT_PROVEN',
      'FAILS_SHUT',
    ]);
  });

  it('a temperature element must feel the water, open in time and be large enough', () => {
    const element = {
      heat_input: q(90, 'kW'),
      temperature_rating: q(100, 'kW'),
      opens_at: q(96, 'degC'),
      element_in_water: true,
    };
    const relied = (change: Inputs) =>
      outputs('j.temperature-actuated', { ...element, ...change })['relied_on'];
    expect([
      relied({}),
      relied({ heat_input: q(110, 'kW') }),
      relied({ element_in_water: false }),
      relied({ element_depth: q(200, 'mm') }),
      relied({ element_depth: q(150, 'mm') }),
      relied({ opens_at: q(105, 'degC') }),
    ]).toEqual([true, false, false, false, true, false]);
    expect(codes('j.temperature-actuated', { ...element, boiling_temperature: q(95, 'degC') })).toContain(
      'OPENS_TOO_HOT',
    );
  });
});

describe('staggered groups', () => {
  const gas = {
    T: q(380, 'K'),
    Z: q(0.9, '-'),
    M: q(58, 'kg/kmol'),
    k: q(1.1, '-'),
    atmospheric_pressure: ATM,
  };
  const device = (n: number, set: number) => {
    const s = n === 1 ? '' : `_${n}`;
    return {
      [`set_pressure${s}`]: q(set, 'bar_g'),
      [`A_actual${s}`]: q(1000, 'mm2'),
      [`K_certified${s}`]: q(0.85, '-'),
    };
  };

  it('two equal devices pass twice what one does, each what a.rated-capacity gives', () => {
    const one = figure(
      'j.staggered',
      { ...device(1, 10), ...gas, pressure: q(11, 'bar_g') },
      'total_passed',
      'kg/h',
    );
    const two = figure(
      'j.staggered',
      { ...device(1, 10), ...device(2, 10), ...gas, pressure: q(11, 'bar_g') },
      'total_passed',
      'kg/h',
    );
    expect(two / one).toBeCloseTo(2, 12);
    const rated = figure(
      'a.rated-capacity',
      {
        A_actual: q(1000, 'mm2'),
        K_certified: q(0.85, '-'),
        ...gas,
        set_pressure: q(10, 'bar_g'),
        overpressure: q(0.1, '-'),
      },
      'W_rated',
      'kg/h',
    );
    expect(one / rated).toBeCloseTo(1, 9);
  });

  it('what all pass never falls with the pressure; the pressure for a load rises with it, and passes it', () => {
    const flux = (gauge: number) => 1e-3 * (gauge + 1e5);
    fc.assert(
      fc.property(
        fc.array(fc.record({ set: between(1e5, 2e6), KA: between(1e-5, 1e-2) }), {
          minLength: 1,
          maxLength: 6,
        }),
        between(0.01, 1),
        between(0, 3e6),
        between(1, 2),
        (raw, load, p, more) => {
          const devices = raw.map((one) => ({ ...one, full: fullOpening(one.set, 0.1) }));
          expect(passedByAll(devices, p * more, flux)).toBeGreaterThanOrEqual(passedByAll(devices, p, flux));
          const most = 3 * Math.max(...devices.map((one) => one.full));
          const at = pressureFor(devices, load, flux, most);
          const higher = pressureFor(devices, load * more, flux, most);
          if (at === undefined) {
            expect(passedByAll(devices, most, flux)).toBeLessThan(load * (1 + 1e-9));
            expect(higher).toBeUndefined();
            return;
          }
          expect(passedByAll(devices, at, flux)).toBeGreaterThanOrEqual(load * (1 - 1e-9));
          expect(passedByAll(devices, at * (1 - 1e-6), flux)).toBeLessThan(load * (1 + 1e-9));
          if (higher !== undefined) expect(higher).toBeGreaterThanOrEqual(at * (1 - 1e-9));
        },
      ),
      { numRuns: 500 },
    );
  });

  it('says who opens in which order, what is not claimed, and which limits are broken', () => {
    const group = { ...device(1, 10.8), tag: 'A', ...device(2, 10), tag_2: 'B', ...gas };
    const at = outputs('j.staggered', { ...group, pressure: q(11.2, 'bar_g') });
    expect([at['order'], at['state'], at['state_2']]).toEqual(['B, A', 'opening', 'full']);
    expect(codes('j.staggered', { ...group, pressure: q(11.2, 'bar_g') })).toContain('PARTLY_OPEN');
    expect(codes('j.staggered', { ...group, pressure: q(11, 'bar_g'), MAWP: q(10, 'bar_g') })).toContain(
      'SET_ABOVE_LIMIT',
    );
    expect(codes('j.staggered', { ...group, pressure: q(11, 'bar_g'), W: q(1e6, 'kg/h') })).toContain(
      'LOAD_NOT_PASSED',
    );
    expect(
      outputs('j.staggered', { ...group, pressure: q(11, 'bar_g'), W: q(1e6, 'kg/h'), MAWP: q(11, 'bar_g') })[
        'within_accumulation'
      ],
    ).toBe(false);
  });

  it('liquids pass by the root of the pressure drop', () => {
    const liquid = {
      ...device(1, 10),
      rho: q(998, 'kg/m3'),
      atmospheric_pressure: ATM,
      pressure: q(12, 'bar_g'),
    };
    expect(figure('j.staggered', liquid, 'passed', 'kg/s')).toBeCloseTo(
      0.85e-3 * Math.sqrt(2 * 998 * 12e5),
      9,
    );
    expect(figure('j.staggered', { ...liquid, P2: q(20, 'bar_abs') }, 'passed', 'kg/s')).toBe(0);
  });
});
