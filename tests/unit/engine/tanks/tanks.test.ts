/* Storage tanks: laws that venting must keep in every tank, both unit systems, and sentences where something does not fit. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { workMethod } from '../../../../src/engine/catalog';
import {
  heatBand,
  regulationAir,
  REGULATION_TABLE,
  tankFireHeat,
} from '../../../../src/engine/methods/k-tanks/emergency';
import { thermalByCapacity } from '../../../../src/engine/methods/k-tanks/breathing';
import { ventFlux } from '../../../../src/engine/methods/k-tanks/vent';
import { convert, type Q } from '../../../../src/engine/quantity';
import { type Inputs } from '../../../../src/engine/sheet';

const q = (value: number, unit: string): Q => ({ value, unit });
const figure = (id: string, inputs: Inputs, name: string, unit: string, edition?: string): number => {
  const worked = workMethod(id, inputs, edition);
  expect(worked.refused).toBeUndefined();
  const out = worked.outputs[name];
  return typeof out === 'object' ? convert(out, unit) : Number.NaN;
};
const refusal = (id: string, inputs: Inputs) => workMethod(id, inputs).refused;
const codes = (id: string, inputs: Inputs) => workMethod(id, inputs).warnings.map((w) => w.code);

const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });
const ATM = q(101.325, 'kPa_abs');

describe('normal breathing', () => {
  const out = (rate: number, volume: number, Ri = 1) =>
    figure(
      'k.out-breathing',
      {
        filling_rate: q(rate, 'm3/h'),
        volatility_factor: q(1, '-'),
        Y: q(0.25, '-'),
        tank_volume: q(volume, 'm3'),
        Ri: q(Ri, '-'),
      },
      'air_equivalent',
      'Nm3/h',
    );
  const into = (rate: number, volume: number, Ri = 1) =>
    figure(
      'k.in-breathing',
      { emptying_rate: q(rate, 'm3/h'), C: q(3, '-'), tank_volume: q(volume, 'm3'), Ri: q(Ri, '-') },
      'air_equivalent',
      'Nm3/h',
    );

  it('rises with rate and volume, and falls with insulation', () => {
    fc.assert(
      fc.property(
        between(0, 5000),
        between(1, 1e5),
        between(1.001, 3),
        between(0.01, 0.99),
        (rate, volume, more, Ri) => {
          for (const breathe of [out, into]) {
            const base = breathe(rate, volume);
            expect(breathe(rate, volume * more)).toBeGreaterThan(base);
            expect(breathe((rate + 1) * more, volume)).toBeGreaterThan(base);
            expect(breathe(rate, volume, Ri)).toBeLessThan(base);
          }
        },
      ),
      { numRuns: 200 },
    );
  });

  it('the thermal terms of both unit systems are the same air within the rounding of 1.51 and 3.08', () => {
    fc.assert(
      fc.property(between(5, 1e5), (volume) => {
        for (const [id, rate, factor] of [
          ['k.out-breathing', 'filling_rate', 'Y'],
          ['k.in-breathing', 'emptying_rate', 'C'],
        ] as const) {
          const shared = { [factor]: q(0.3, '-'), volatility_factor: q(1, '-') };
          const SI = figure(
            id,
            { ...shared, [rate]: q(0, 'm3/h'), tank_volume: q(volume, 'm3') },
            'thermal_term',
            'Nm3/h',
          );
          const US = figure(
            id,
            { ...shared, [rate]: q(0, 'US gpm'), tank_volume: q(volume / 0.3048 ** 3, 'ft3') },
            'thermal_term',
            'Nm3/h',
          );
          expect(Math.abs(US / SI - 1)).toBeLessThan(0.0005);
        }
      }),
      { numRuns: 100 },
    );
  });

  it('the liquid terms differ by the ratio of 60 °F to 0 °C, as the standards print them', () => {
    const shared = { volatility_factor: q(1, '-'), Y: q(0.25, '-'), tank_volume: q(1000, 'ft3') };
    const US = figure(
      'k.out-breathing',
      { ...shared, filling_rate: q(100, 'US gpm') },
      'liquid_term',
      'Nm3/h',
    );
    const SI = figure(
      'k.out-breathing',
      { ...shared, filling_rate: q(convert(q(100, 'US gpm'), 'm3/h'), 'm3/h') },
      'liquid_term',
      'Nm3/h',
    );
    expect(SI / US).toBeCloseTo(288.706 / 273.15, 3);
  });

  it('latitude, insulation and a second wall follow their tables (from memory of ISO 28300)', () => {
    const tank = { filling_rate: q(0, 'm3/h'), volatility_factor: q(1, '-'), tank_volume: q(1, 'm3') };
    const Y = (latitude: number) =>
      figure('k.out-breathing', { ...tank, latitude: q(latitude, 'deg') }, 'Y', '-');
    expect([10, -41.9, 42, 58, 58.1, -70].map(Y)).toEqual([0.32, 0.32, 0.25, 0.25, 0.2, 0.2]);
    const C = (latitude: number, vapour: string, t: number) =>
      figure(
        'k.in-breathing',
        {
          emptying_rate: q(0, 'm3/h'),
          tank_volume: q(1, 'm3'),
          latitude: q(latitude, 'deg'),
          vapour_class: vapour,
          storage_temperature: q(t, 'degC'),
        },
        'C',
        '-',
      );
    expect([
      C(30, 'like hexane', 20),
      C(30, 'like hexane', 25),
      C(50, 'like hexane', 20),
      C(50, 'higher or unknown', 20),
      C(65, 'like hexane', 10),
      C(65, 'higher or unknown', 10),
    ]).toEqual([4, 6.5, 3, 5, 2.5, 4]);
    const R = (extra: Inputs) => figure('k.out-breathing', { ...tank, Y: q(0.2, '-'), ...extra }, 'Ri', '-');
    const wool = { thickness: q(100, 'mm'), k_ins: q(0.05, 'W/(m.K)') };
    expect(R(wool)).toBeCloseTo(1 / 9, 9);
    expect(R({ ...wool, insulated_share: q(0.5, '-') })).toBeCloseTo(0.5 / 9 + 0.5, 9);
    expect(R({ double_wall_share: q(1, '-') })).toBe(0.25);
  });

  it('an unknown volatility counts twice and says so; 5 kPa is the border', () => {
    const tank = { filling_rate: q(10, 'm3/h'), Y: q(0.25, '-'), tank_volume: q(100, 'm3') };
    expect(codes('k.out-breathing', tank)).toContain('VOLATILITY_ASSUMED');
    const factor = (extra: Inputs) =>
      figure('k.out-breathing', { ...tank, ...extra }, 'volatility_factor', '-');
    expect([
      factor({}),
      factor({ vapour_pressure: q(5, 'kPa_abs') }),
      factor({ vapour_pressure: q(5.1, 'kPa_abs') }),
    ]).toEqual([2, 1, 2]);
  });

  it('the older table ends at 180 000 barrels, rises throughout, and breathes out 60 % for high flash points', () => {
    const tank = { filling_rate: q(0, 'US gpm'), tank_volume: q(26000, 'US gal'), low_flash_point: false };
    expect(figure('k.out-breathing', tank, 'thermal_term', 'SCFH', 'API 2000, 5th edition')).toBeCloseTo(
      0.6 * 619.048,
      1,
    );
    const big = { ...tank, tank_volume: q(30000, 'm3'), venting_edition: 'API 2000, 5th edition' };
    expect(refusal('k.out-breathing', big)).toMatchObject({ code: 'OUTSIDE_TABLE', field: 'tank_volume' });
    fc.assert(
      fc.property(between(0, 179000), between(1, 1000), (barrels, more) => {
        expect(thermalByCapacity(barrels + more)!).toBeGreaterThan(thermalByCapacity(barrels)!);
      }),
    );
  });
});

describe('emergency venting', () => {
  it('heat and air rise with the area; the printed bands join within 0.5 %', () => {
    fc.assert(
      fc.property(between(0.1, 5000), between(1, 4), fc.boolean(), (area, more, high) => {
        expect(tankFireHeat(area * more, 1, high, 'SI')).toBeGreaterThan(
          tankFireHeat(area, 1, high, 'SI') * 0.995,
        );
        expect(regulationAir(area * more, high)).toBeGreaterThanOrEqual(regulationAir(area, high) * 0.9999);
      }),
    );
    for (const border of [18.6, 93, 260])
      expect(
        tankFireHeat(border * (1 - 1e-12), 1, true, 'SI') / tankFireHeat(border, 1, true, 'SI'),
      ).toBeCloseTo(1, 2);
    expect(heatBand(300, false, 'SI')).toEqual({ factor: 4129700, exponent: 0 });
  });

  it('every row of the regulation’s table follows 70.5 Q/(L √M) of hexane within 0.6 %', () => {
    REGULATION_TABLE.x.slice(1).forEach((area, i) => {
      const air = (70.5 * tankFireHeat(area, 1, true, 'US')) / 1337;
      expect(Math.abs(air / REGULATION_TABLE.y[i + 1]! - 1), String(area)).toBeLessThan(0.006);
    });
  });

  it('needs the same vent area in both unit systems within 0.6 %', () => {
    fc.assert(
      fc.property(
        between(5, 800),
        between(200, 2000),
        between(300, 500),
        between(20, 150),
        (area, L, T, M) => {
          const air = (inputs: Inputs): Q => {
            const out = workMethod('k.emergency-venting', {
              design_pressure: q(10, 'kPa_g'),
              F: q(1, '-'),
              ...inputs,
            }).outputs['air_equivalent'];
            return typeof out === 'object' ? out : q(Number.NaN, 'Nm3/h');
          };
          const SI = air({
            A_wetted: q(area, 'm2'),
            latent_heat: q(L, 'kJ/kg'),
            T: q(T, 'K'),
            M: q(M, 'kg/kmol'),
          });
          const US = air({
            A_wetted: q(area / 0.3048 ** 2, 'ft2'),
            latent_heat: q(L / 2.326, 'Btu/lb'),
            T: q(T * 1.8, 'degR'),
            M: q(M, 'lb/lbmol'),
          });
          expect(US.unit).toBe('SCFH');
          const vent = (air_equivalent: Q) =>
            figure(
              'k.vent-area',
              { air_equivalent, P1: q(2, 'kPa_g'), atmospheric_pressure: ATM, Kd: q(0.5, '-') },
              'A_required',
              'mm2',
            );
          expect(Math.abs(vent(US) / vent(SI) - 1)).toBeLessThan(0.006);
        },
      ),
      { numRuns: 100 },
    );
  });

  it('credits one protection, drainage only from 200 ft², and stops at the height of the fire', () => {
    const tank = { D: q(5, 'm'), H: q(20, 'm'), design_pressure: q(1, 'kPa_g') };
    expect(figure('k.emergency-venting', tank, 'wetted_area', 'm2')).toBeCloseTo(Math.PI * 5 * 9.144, 6);
    expect(
      figure(
        'k.emergency-venting',
        { ...tank, elevation_of_bottom: q(2, 'm'), bottom_exposed: true },
        'wetted_area',
        'm2',
      ),
    ).toBeCloseTo(Math.PI * 5 * 7.144 + (Math.PI / 4) * 25, 6);
    expect(figure('k.emergency-venting', { ...tank, protection: 'drainage' }, 'F', '-')).toBe(0.5);
    expect(figure('k.emergency-venting', { ...tank, H: q(1, 'm'), protection: 'drainage' }, 'F', '-')).toBe(
      1,
    );
    expect(
      figure(
        'k.emergency-venting',
        { ...tank, protection: 'insulation, water spray and drainage' },
        'F',
        '-',
      ),
    ).toBe(0.15);
    expect(refusal('k.emergency-venting', { ...tank, elevation_of_bottom: q(12, 'm') })).toMatchObject({
      code: 'NO_WETTED_AREA',
    });
    expect(
      figure(
        'k.emergency-venting',
        { D: q(3, 'm'), L: q(10, 'm'), shape: 'horizontal' },
        'wetted_area',
        'm2',
      ),
    ).toBeCloseTo(0.75 * (Math.PI * 30 + Math.PI * 4.5), 6);
    expect(
      figure('k.emergency-venting', { D: q(10, 'm'), shape: 'sphere' }, 'wetted_area', 'm2'),
    ).toBeCloseTo(0.55 * Math.PI * 100, 6);
    expect(codes('k.emergency-venting', { A_wetted: q(300, 'm2') })).toContain('DESIGN_PRESSURE_ASSUMED');
  });

  it('without the properties of the liquid the table gives the load, and the formula says what it lacks', () => {
    const bare = { A_wetted: q(50, 'm2') };
    expect(figure('k.emergency-venting', bare, 'air_equivalent', 'Nm3/h')).toBeCloseTo(
      figure('k.emergency-venting', bare, 'table_air_equivalent', 'Nm3/h'),
      6,
    );
    expect(refusal('k.emergency-venting', { ...bare, basis: 'formula' })).toMatchObject({
      code: 'INPUT_MISSING',
      field: 'latent_heat',
    });
  });
});

describe('vents', () => {
  it('area and capacity are inverse, in and out', () => {
    fc.assert(
      fc.property(between(1, 1e5), between(0.1, 8), between(0.2, 0.9), fc.boolean(), (air, p, Kd, vacuum) => {
        const gauge = vacuum ? -p : p;
        const shared = { atmospheric_pressure: ATM, Kd: q(Kd, '-'), direction: vacuum ? 'in' : 'out' };
        const area = figure(
          'k.vent-area',
          { ...shared, air_equivalent: q(air, 'Nm3/h'), P1: q(gauge, 'kPa_g') },
          'A_required',
          'mm2',
        );
        const back = figure(
          'k.weighted-vent',
          {
            ...shared,
            set_pressure: q(gauge / 2, 'kPa_g'),
            seat_area: q(area, 'mm2'),
            full_flow_pressure: q(gauge, 'kPa_g'),
          },
          'capacity_air',
          'Nm3/h',
        );
        expect(back / air).toBeCloseTo(1, 8);
      }),
      { numRuns: 200 },
    );
  });

  it('the same vent in US units has the same area to 1e-9', () => {
    fc.assert(
      fc.property(between(1, 1e5), between(0.1, 60), (air, p) => {
        const at = (P1: Q, load: Q) =>
          figure(
            'k.vent-area',
            { air_equivalent: load, T_air: q(280, 'K'), P1, P2: ATM, Kd: q(0.5, '-') },
            'A_required',
            'mm2',
          );
        const SI = at(q(101.325 + p, 'kPa_abs'), q(air, 'Nm3/h'));
        const US = at(
          q(convert(q(101.325 + p, 'kPa_abs'), 'psia'), 'psia'),
          q(convert(q(air, 'Nm3/h'), 'SCFH'), 'SCFH'),
        );
        expect(Math.abs(US / SI - 1)).toBeLessThan(1e-9);
      }),
      { numRuns: 100 },
    );
  });

  it('never passes more than the sonic flux, and is continuous where it chokes', () => {
    fc.assert(
      fc.property(between(1, 1e7), between(1, 1e7), (a, b) => {
        const { flux } = ventFlux(a, b, 288.15);
        expect(flux).toBeLessThanOrEqual(
          Math.max(a, b) * 0.6848 * Math.sqrt(28.96 / (8314.46 * 288.15)) * 1.0001,
        );
      }),
    );
    const P = 2e5;
    const ratio = (2 / 2.4) ** 3.5;
    expect(
      ventFlux(P, P * ratio * (1 + 1e-9), 288).flux / ventFlux(P, P * ratio * (1 - 1e-9), 288).flux,
    ).toBeCloseTo(1, 8);
  });

  it('refuses equal pressures and a direction that the pressures contradict, in words', () => {
    const vent = { air_equivalent: q(100, 'Nm3/h'), atmospheric_pressure: ATM, Kd: q(0.5, '-') };
    expect(refusal('k.vent-area', { ...vent, P1: q(0, 'kPa_g') })).toMatchObject({
      code: 'NO_FLOW',
      field: 'P1',
    });
    expect(refusal('k.vent-area', { ...vent, P1: q(1, 'kPa_g'), direction: 'in' })?.text).toMatch(
      /is to breathe in, but its pressure .* is above/,
    );
  });

  it('claims nothing below full flow, and a pallet lets go at weight over area', () => {
    const vent = {
      pallet_mass: q(1.2, 'kg'),
      seat_area: q(7854, 'mm2'),
      full_flow_pressure: q(24, 'mbar_g'),
      Kd: q(0.45, '-'),
      atmospheric_pressure: ATM,
    };
    const set = figure('k.weighted-vent', vent, 'set_pressure', 'mbar_g');
    expect(set).toBeCloseTo((1.2 * 9.80665) / 7854e-6 / 100, 6);
    const at = (p: number) => workMethod('k.weighted-vent', { ...vent, pressure: q(p, 'mbar_g') });
    expect([at(set - 0.1), at(set + 0.1), at(24)].map((w) => w.outputs['state'])).toEqual([
      'shut',
      'opening',
      'full',
    ]);
    expect(at(set + 0.1).outputs['W_rated']).toMatchObject({ value: 0 });
    expect(at(set + 0.1).warnings.map((w) => w.code)).toContain('PARTLY_OPEN');
    expect(
      figure('k.weighted-vent', { ...vent, spring_force: q(2, 'N') }, 'set_pressure', 'mbar_g'),
    ).toBeCloseTo(set + 2 / 7854e-6 / 100, 6);
    expect(refusal('k.weighted-vent', { ...vent, full_flow_pressure: q(3, 'mbar_g') })).toMatchObject({
      code: 'ORDER_OF_PRESSURES',
    });
    expect(codes('k.weighted-vent', { ...vent, full_flow_pressure: q(24, 'mbar_g') })).not.toContain(
      'FULL_FLOW_NOT_GIVEN',
    );
  });
});

describe('blanket gas', () => {
  const regulator = {
    coefficient: q(3, 'Kv'),
    P1: q(8, 'bar_abs'),
    P2: q(1, 'bar_abs'),
    xT: q(0.6, '-'),
    T: q(285, 'K'),
    Z: q(1, '-'),
    M: q(28.01, 'kg/kmol'),
    k: q(1.4, '-'),
  };
  it('is the control-valve flow, turned into air by the root of the molar masses', () => {
    const gas = figure('k.blanket-regulator', regulator, 'gas_flow', 'kg/h');
    expect(gas).toBeCloseTo(figure('f.control-valve-gas', regulator, 'W', 'kg/h'), 9);
    const air = figure('k.blanket-regulator', regulator, 'air_equivalent', 'Nm3/h');
    expect(air).toBeCloseTo(((gas * 22.413969545) / 28.01) * Math.sqrt(28.01 / 28.96), 9);
    expect(
      figure(
        'k.blanket-regulator',
        { ...regulator, filling_as_air: q(50, 'Nm3/h') },
        'air_equivalent',
        'Nm3/h',
      ),
    ).toBeCloseTo(air + 50, 9);
  });

  it('air as blanket gas is its own equivalent; it rises with the supply pressure', () => {
    const air = { ...regulator, M: q(28.96, 'kg/kmol') };
    expect(figure('k.blanket-regulator', air, 'relief_load', 'kg/h')).toBeCloseTo(
      figure('k.blanket-regulator', air, 'gas_flow', 'kg/h'),
      9,
    );
    fc.assert(
      fc.property(between(1.1, 50), between(1.01, 2), (p, more) => {
        const at = (P1: number) =>
          figure('k.blanket-regulator', { ...regulator, P1: q(P1, 'bar_abs') }, 'air_equivalent', 'Nm3/h');
        expect(at(p * more)).toBeGreaterThan(at(p));
      }),
      { numRuns: 100 },
    );
  });
});
