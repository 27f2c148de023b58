/* Two-phase sheets: forms of omega, pasted tables, warnings where a method is doubtful, refusals in a practitioner's words. */
import fc from 'fast-check';
import katex from 'katex';
import { describe, expect, it } from 'vitest';
import { calculate } from '../../../../src/engine/calc';
import { workMethod } from '../../../../src/engine/catalog';
import { TWO_PHASE_METHODS } from '../../../../src/engine/methods/d-two-phase';
import { convert, dimensionOf } from '../../../../src/engine/quantity';
import { type Inputs, type Worked } from '../../../../src/engine/sheet';
import { WATER } from '../../../../src/engine/water';

const q = (value: number, unit: string) => ({ value, unit });
const value = (worked: Worked, name: string): number => {
  const found = worked.outputs[name];
  return typeof found === 'object' ? found.value : Number.NaN;
};
const codes = (worked: Worked) => worked.warnings.map((one) => one.code);

/** Saturated water at 10 bar: figures of the IAPWS-IF97 steam tables. */
const WATER_10_BAR: Inputs = {
  W: q(20000, 'kg/h'),
  P0: q(10, 'bar_abs'),
  back_pressure: q(1.01325, 'bar_abs'),
  x0: q(0.1, '-'),
  v_vapour: q(0.194349, 'm3/kg'),
  v_liquid: q(0.00112723, 'm3/kg'),
  cp: q(4.405, 'kJ/(kg.K)'),
  T0: q(179.886, 'degC'),
  latent_heat: q(2014.6, 'kJ/kg'),
  k: q(1.3, '-'),
};

const HEM: Inputs = {
  W: q(20000, 'kg/h'),
  fluid: 'water',
  P0: q(1000, 'kPa_abs'),
  x0: q(0.1, '-'),
  back_pressure: q(101.325, 'kPa_abs'),
};

const SUBCOOLED: Inputs = {
  Q: q(500, 'L/min'),
  P0: q(1200, 'kPa_abs'),
  rho0: q(850, 'kg/m3'),
  omega_s: q(12, '-'),
  Ps: q(1180, 'kPa_abs'),
  back_pressure: q(200, 'kPa_abs'),
};

const TABLE = 'P / kPa_abs\tv / m3/kg';

describe('forms of omega on a sheet', () => {
  const flux = (form: string) =>
    value(workMethod('d.omega-saturated', { ...WATER_10_BAR, omega_form: form }), 'mass_flux');

  it('from properties come within 1 % of the direct integration of water at x = 0.1, 3 617.9 kg/(m²·s) by IAPWS-95', () => {
    expect(Math.abs(flux('inlet properties') / 3617.9064 - 1)).toBeLessThan(0.01);
  });

  it('without equilibrium pass more than with it, and most without any flashing', () => {
    expect(flux('delayed boiling')).toBeGreaterThan(flux('inlet properties'));
    expect(flux('no flashing')).toBeGreaterThan(flux('delayed boiling'));
  });

  it('are found from what is given when none is said', () => {
    const omega = (inputs: Inputs) => value(workMethod('d.omega-saturated', inputs), 'omega');
    const { latent_heat: _, ...frozen } = WATER_10_BAR;
    expect(omega(WATER_10_BAR)).toBeCloseTo(1.6, 0);
    expect(workMethod('d.omega-saturated', frozen).refused).toMatchObject({
      code: 'INPUT_MISSING',
      field: 'v9',
    });
    expect(omega({ ...frozen, omega_form: 'no flashing' })).toBeLessThan(1 / 1.3);
    expect(omega({ ...WATER_10_BAR, omega: q(3, '-') })).toBe(3);
  });

  it('give the same in US customary units', () => {
    const us: Inputs = {
      ...WATER_10_BAR,
      W: q(20000 / 0.45359237, 'lb/h'),
      P0: q(convert(q(10, 'bar_abs'), 'psia'), 'psia'),
    };
    const si = workMethod('d.omega-saturated', WATER_10_BAR);
    const other = workMethod('d.omega-saturated', us);
    const area = (worked: Worked) =>
      convert(worked.outputs['A_required'] as { value: number; unit: string }, 'm2');
    expect(Math.abs(area(si) / area(other) - 1)).toBeLessThan(1e-9);
  });

  it('of a subcooled liquid from the density at 90 % of saturation and from properties', () => {
    const { omega_s: _, ...rest } = SUBCOOLED;
    const byDensity = workMethod('d.omega-subcooled', { ...rest, rho9: q(850 / (1 + 12 / 9), 'kg/m3') });
    expect(value(byDensity, 'omega_s')).toBeCloseTo(12, 9);
    const water = workMethod('d.omega-subcooled', {
      ...rest,
      v_vapour: q(0.194349, 'm3/kg'),
      v_liquid: q(0.00112723, 'm3/kg'),
      cp: q(4405, 'J/(kg.K)'),
      T0: q(453.03, 'K'),
      latent_heat: q(2014.6, 'kJ/kg'),
    });
    expect(value(water, 'omega_s')).toBeGreaterThan(15);
    expect(workMethod('d.omega-subcooled', rest).refused).toMatchObject({
      code: 'INPUT_MISSING',
      field: 'omega_s',
    });
  });
});

describe('a pasted isentrope', () => {
  const rows = (count: number) => {
    const inlet = WATER.atPx(1e6, 0.1);
    return Array.from({ length: count }, (_, i) => {
      const P = 1e6 - i * 2e4;
      const state = i === 0 ? inlet : WATER.atPS(P, inlet?.s ?? 0);
      return { P, rho: state?.rho ?? Number.NaN };
    });
  };
  const lines = rows(26).map(({ P, rho }) => `${P / 1000}\t${1 / rho}`);

  it('gives the flux of the direct integration, by specific volume and by density, and an area with a load', () => {
    const byVolume = workMethod('d.isentrope-table-integration', {
      table: [TABLE, ...lines].join('\n'),
      W: q(20000, 'kg/h'),
    });
    expect(byVolume.refused).toBeUndefined();
    const direct = workMethod('d.hem-size', HEM);
    expect(Math.abs(value(byVolume, 'mass_flux_exact') / value(direct, 'mass_flux') - 1)).toBeLessThan(1e-4);
    expect(Math.abs(value(byVolume, 'A_required') / value(direct, 'A_required') - 1)).toBeLessThan(1e-3);
    const density = rows(26).map(({ P, rho }) => `${P / 1e5} ${rho}`);
    const byDensity = workMethod('d.isentrope-table-integration', {
      table: ['bar_abs kg/m3', ...density].join('\n'),
    });
    expect(value(byDensity, 'mass_flux_trapezoid')).toBeCloseTo(value(byVolume, 'mass_flux_trapezoid'), 6);
  });

  it('warns of few rows and of a table that ends before the throat', () => {
    const short = workMethod('d.isentrope-table-integration', {
      table: [TABLE, ...lines.slice(0, 5)].join('\n'),
    });
    expect(codes(short)).toEqual(expect.arrayContaining(['TABLE_TOO_SHORT', 'TABLE_COARSE']));
  });

  it.each([
    ['no rows', {}, 'ROWS_MISSING', 'P'],
    ['no units', { table: lines.join('\n') }, 'UNIT_UNKNOWN', 'table'],
    ['gauge pressures', { table: ['kPa_g m3/kg', ...lines].join('\n') }, 'UNIT_UNKNOWN', 'table'],
    [
      'a second column of nothing known',
      { table: ['kPa_abs furlong', ...lines].join('\n') },
      'UNIT_UNKNOWN',
      'table',
    ],
    ['a line of words', { table: [TABLE, ...lines, 'end of table'].join('\n') }, 'ROW_NOT_READ', 'table'],
    [
      'a volume that shrinks',
      { table: [TABLE, ...lines, '100\t0.001'].join('\n') },
      'NOT_AN_EXPANSION',
      'table',
    ],
    [
      'a back pressure above the inlet',
      { table: [TABLE, ...lines].join('\n'), back_pressure: q(2000, 'kPa_abs') },
      'NO_FLOW',
      'back_pressure',
    ],
    ['pressures without volumes', { P: q(1, 'bar_abs'), P_2: q(0.9, 'bar_abs') }, 'ROWS_DIFFER', 'v'],
  ])('refuses %s', (_name, inputs: Inputs, code, field) => {
    expect(workMethod('d.isentrope-table-integration', inputs).refused).toMatchObject({ code, field });
  });

  it('takes rows one by one, as lists', () => {
    const all = rows(26);
    const answer = calculate({
      topic: 'd.isentrope-table-integration',
      inputs: {
        P: { value: all.map((r) => r.P), unit: 'Pa_abs' },
        rho: { value: all.map((r) => r.rho), unit: 'kg/m3' },
      },
    });
    expect(answer.refused).toBeUndefined();
    expect(answer.steps?.length).toBeGreaterThan(5);
  });
});

describe('warnings where a method is doubtful', () => {
  it('near the critical point, over a wide boiling range, in a short nozzle', () => {
    const doubtful = workMethod('d.omega-saturated', {
      ...WATER_10_BAR,
      Tc: q(480, 'K'),
      Pc: q(1.5, 'MPa_abs'),
      boiling_range: q(90, 'dK'),
      nozzle_length: q(30, 'mm'),
    });
    expect(codes(doubtful)).toEqual(
      expect.arrayContaining(['OMEGA_NEAR_CRITICAL', 'BOILING_RANGE_WIDE', 'SHORT_NOZZLE']),
    );
    const sound = workMethod('d.omega-saturated', {
      ...WATER_10_BAR,
      Tc: q(647, 'K'),
      Pc: q(22, 'MPa_abs'),
      boiling_range: q(0, 'dK'),
      nozzle_length: q(150, 'mm'),
    });
    expect(codes(sound)).toEqual([]);
  });

  it('of a low subcooling and of the critical region in direct integration', () => {
    const { x0: _, ...rest } = HEM;
    expect(codes(workMethod('d.hem-size', { ...rest, T0: q(452.5, 'K') }))).toContain('LOW_SUBCOOLING');
    expect(codes(workMethod('d.hem-size', { ...rest, P0: q(23, 'MPa_abs'), T0: q(650, 'K') }))).toContain(
      'CRITICAL_REGION',
    );
    expect(codes(workMethod('d.hem-size', { ...HEM, nozzle_length: q(50, 'mm') }))).toContain('SHORT_NOZZLE');
  });

  it('of steam that condenses in the nozzle', () => {
    const { x0: _, W: __, ...rest } = HEM;
    expect(codes(workMethod('d.real-gas-size', { ...rest, W: q(1000, 'kg/h'), T0: q(455, 'K') }))).toContain(
      'CONDENSES',
    );
  });
});

describe('refusals of the property-based sheets', () => {
  it.each([
    ['no fluid', { fluid: undefined }, 'INPUT_MISSING', 'fluid'],
    ['an unknown fluid', { fluid: 'unobtainium' }, 'FLUID_UNKNOWN', 'fluid'],
    ['quality and temperature of one substance', { T0: q(453, 'K') }, 'INLET_TWICE', 'x0'],
    ['a quality above the critical pressure', { P0: q(30, 'MPa_abs') }, 'NO_SATURATION', 'x0'],
    [
      'a temperature beyond the formulation',
      { x0: undefined, P0: q(60, 'MPa_abs'), T0: q(1100, 'K') },
      'OUTSIDE_FORMULATION',
      'T0',
    ],
    ['a back pressure above the inlet', { back_pressure: q(2, 'MPa_abs') }, 'NO_FLOW', 'back_pressure'],
    ['a quality above 1', { x0: q(1.2, '-') }, 'VALUE_IMPOSSIBLE', 'x0'],
  ])('%s', (_name, change, code, field) => {
    const inputs = Object.fromEntries(
      Object.entries({ ...HEM, ...change }).filter(([, v]) => v !== undefined),
    ) as Inputs;
    expect(workMethod('d.hem-size', inputs).refused).toMatchObject({ code, field });
    expect(workMethod('d.hem-size', inputs).refused?.text).toMatch(/[.]$/);
  });

  it('a liquid is no gas, and a liquid that boils is not subcooled', () => {
    const { x0: _, ...rest } = HEM;
    expect(workMethod('d.real-gas-size', { ...rest, T0: q(300, 'K') }).refused?.code).toBe('NOT_A_GAS');
    expect(workMethod('d.omega-subcooled', { ...SUBCOOLED, Ps: q(1300, 'kPa_abs') }).refused?.code).toBe(
      'NOT_SUBCOOLED',
    );
    expect(
      workMethod('d.omega-saturated', { ...WATER_10_BAR, omega_form: 'two volumes' }).refused?.field,
    ).toBe('v9');
  });
});

describe('the comparison of methods', () => {
  it('holds the omega method to the integration within 1.1 % on saturated water, and both between their bounds', () => {
    const sheet = workMethod('d.comparison', { ...HEM, x0: q(0, '-') });
    expect(sheet.refused).toBeUndefined();
    expect(Math.abs(value(sheet, 'difference_omega_volumes'))).toBeLessThan(1.1);
    expect(Math.abs(value(sheet, 'difference_omega_properties'))).toBeLessThan(1.1);
    expect(value(sheet, 'flux_integration')).toBeGreaterThan(value(sheet, 'flux_all_vapour'));
    expect(value(sheet, 'flux_integration')).toBeLessThan(value(sheet, 'flux_delayed_boiling'));
    expect(value(sheet, 'flux_delayed_boiling')).toBeLessThan(value(sheet, 'flux_all_liquid'));
    expect(value(sheet, 'area_integration')).toBeCloseTo(
      value(workMethod('d.hem-size', { ...HEM, x0: q(0, '-') }), 'A_required'),
      6,
    );
  });

  it('of cold water leaves the omega forms and the liquid, and of gas the ideal formula', () => {
    const { x0: _, ...rest } = HEM;
    const cold = workMethod('d.comparison', { ...rest, P0: q(2, 'MPa_abs'), T0: q(453.15, 'K') });
    expect(Math.abs(value(cold, 'difference_omega_volumes'))).toBeLessThan(0.2);
    expect(cold.outputs['flux_no_flashing']).toBeUndefined();
    const steam = workMethod('d.comparison', { ...rest, T0: q(600, 'K') });
    expect(Math.abs(value(steam, 'difference_ideal_gas'))).toBeLessThan(2);
    expect(steam.outputs['flux_all_liquid']).toBeUndefined();
  });
});

describe('a sheet of direct integration', () => {
  it('can be worked again from its printed figures: flux from density and drop of enthalpy, and no more at ± 2 %', () => {
    const { x0: _, ...rest } = HEM;
    for (const inputs of [HEM, { ...rest, P0: q(2, 'MPa_abs'), T0: q(453.15, 'K') }]) {
      const { steps } = workMethod('d.hem-size', inputs);
      const figure = (symbol: string) =>
        Number(Number(steps.find((s) => s.symbol === symbol)?.value).toPrecision(6));
      const again = figure('\\rho_t') * Math.sqrt(2 * figure('\\Delta h_t'));
      expect(Math.abs(again / figure('G') - 1)).toBeLessThan(1e-5);
      expect(figure('G_{a}')).toBeLessThanOrEqual(figure('G'));
      expect(figure('G_{b}')).toBeLessThanOrEqual(figure('G'));
    }
  });
});

describe('every sheet', () => {
  const SHEETS: [string, Inputs][] = [
    ['d.omega-saturated', WATER_10_BAR],
    [
      'd.omega-saturated',
      { ...WATER_10_BAR, omega_form: 'delayed boiling', critical_ratio_form: 'explicit fit' },
    ],
    ['d.omega-saturated', { ...WATER_10_BAR, omega_form: 'no flashing', back_pressure: q(9, 'bar_abs') }],
    ['d.omega-subcooled', SUBCOOLED],
    ['d.omega-subcooled', { ...SUBCOOLED, back_pressure: q(1100, 'kPa_abs') }],
    ['d.hem-size', HEM],
    ['d.hem-size', { ...HEM, W: q(44000, 'lb/h'), P0: q(145, 'psia') }],
    ['d.comparison', { ...HEM, W: q(44000, 'lb/h'), P0: q(145, 'psia') }],
    ['d.real-gas-size', { fluid: 'steam', W: q(1000, 'kg/h'), P0: q(10, 'bar_abs'), T0: q(600, 'K') }],
  ];
  it.each(SHEETS)(
    '%s has steps with TeX that renders, finite values and known units, and declares its outputs',
    (id, inputs) => {
      const worked = workMethod(id, inputs);
      expect(worked.refused).toBeUndefined();
      const declared = TWO_PHASE_METHODS.find((m) => m.id === id)?.outputs.map((o) => o.name);
      expect(declared).toEqual(expect.arrayContaining(Object.keys(worked.outputs)));
      for (const step of worked.steps) {
        for (const tex of [step.symbol, step.tex, step.worked])
          expect(() => katex.renderToString(tex, { throwOnError: true, strict: 'error' }), tex).not.toThrow();
        if (typeof step.value === 'number') expect(Number.isFinite(step.value)).toBe(true);
        expect(dimensionOf(step.unit), step.unit).toBeDefined();
      }
    },
  );

  it('refuses or answers under absurd input, never throws and never gives NaN', () => {
    const odd = fc.oneof(
      fc.double(),
      fc.constantFrom(0, -1, 1e308, -1e308, 5e-324, Number.POSITIVE_INFINITY, Number.NaN),
      fc.double({ min: 0, max: 2, noNaN: true }),
    );
    const pressures = fc.tuple(odd, fc.constantFrom('kPa_abs', 'psia', 'bar_g'));
    fc.assert(
      fc.property(
        pressures,
        odd,
        odd,
        odd,
        pressures,
        fc.constantFrom('water', 'propane', 'methane', ''),
        (p, a, b, c, back, fluid) => {
          const P0 = q(p[0], p[1]);
          const Pb = q(back[0], back[1]);
          const all: [string, Inputs][] = [
            [
              'd.omega-saturated',
              { W: q(a, 'kg/h'), P0, back_pressure: Pb, v0: q(b, 'm3/kg'), v9: q(c, 'm3/kg') },
            ],
            [
              'd.omega-subcooled',
              {
                W: q(a, 'kg/h'),
                P0,
                back_pressure: Pb,
                rho0: q(b, 'kg/m3'),
                Ps: q(c, 'kPa_abs'),
                omega_s: q(a, '-'),
              },
            ],
            ['d.hem-size', { W: q(a, 'kg/h'), fluid, P0, back_pressure: Pb, T0: q(b * 500, 'K') }],
            ['d.hem-size', { W: q(a, 'kg/h'), fluid, P0, back_pressure: Pb, x0: q(c, '-') }],
            ['d.comparison', { fluid, P0, back_pressure: Pb, x0: q(c, '-') }],
            ['d.real-gas-size', { W: q(a, 'kg/h'), fluid, P0, back_pressure: Pb, T0: q(b * 500, 'K') }],
          ];
          for (const [id, inputs] of all) {
            const worked = workMethod(id, inputs);
            for (const out of Object.values(worked.outputs))
              if (typeof out === 'object') expect(Number.isFinite(out.value)).toBe(true);
            if (worked.refused) expect(worked.refused.text.length).toBeGreaterThan(20);
          }
        },
      ),
      { numRuns: 300 },
    );
  }, 120_000);
});
