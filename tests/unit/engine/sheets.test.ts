/* Sheets: every method is sourced, every sheet can be re-worked, bad input gets a sentence, nothing is ever NaN. */
import fc from 'fast-check';
import katex from 'katex';
import { describe, expect, it } from 'vitest';
import { METHODS, methodById, workMethod } from '../../../src/engine/catalog';
import { calculate } from '../../../src/engine/calc';
import { dimensionOf, type Q, UNITS } from '../../../src/engine/quantity';
import { type Inputs } from '../../../src/engine/sheet';
import aGas from '../../reference/a-gas.json';
import bSteam from '../../reference/b-steam.json';
import bWater from '../../reference/b-water.json';
import cLiquid from '../../reference/c-liquid.json';
import dTwoPhase from '../../reference/d-two-phase.json';
import eFire from '../../reference/e-fire.json';
import fLoads from '../../reference/f-loads.json';
import hLimits from '../../reference/h-limits.json';
import iAreas from '../../reference/i-areas.json';
import jDevices from '../../reference/j-devices.json';
import kTanks from '../../reference/k-tanks.json';
import pProperties from '../../reference/p-properties.json';

const CASES = [
  aGas,
  bSteam,
  bWater,
  cLiquid,
  dTwoPhase,
  eFire,
  fLoads,
  hLimits,
  iAreas,
  jDevices,
  kTanks,
  pProperties,
].flatMap(
  (f) =>
    f.cases as unknown as {
      id: string;
      topic: string;
      inputs: Record<string, { value: unknown; unit: string }>;
    }[],
);
const SINGLE = CASES.filter((c) => Object.values(c.inputs).every((i) => !Array.isArray(i.value)));

const bar = (value: number) => ({ value, unit: 'bar_abs' });
const GAS: Inputs = {
  W: { value: 13267.1, unit: 'kg/h' },
  T: { value: 105, unit: 'degC' },
  Z: { value: 0.88, unit: '-' },
  M: { value: 58.08, unit: 'kg/kmol' },
  k: { value: 1.1, unit: '-' },
  P1: bar(5),
  P2: bar(1.2),
};

describe('the catalogue', () => {
  it.each(METHODS.map((m) => [m.id, m] as const))(
    '%s says its title, source, validity and editions, and describes inputs and outputs',
    (_id, m) => {
      expect(m.source.length).toBeGreaterThan(20);
      expect(m.validity.length).toBeGreaterThan(20);
      expect(m.title).not.toBe('');
      expect(m.editions.length).toBeGreaterThan(0);
      expect(m.version).toBeGreaterThanOrEqual(1);
      for (const one of [...m.inputs, ...m.outputs]) expect(one.meaning, one.name).not.toBe('');
      expect(new Set(m.inputs.map((i) => i.name)).size).toBe(m.inputs.length);
      expect(new Set(m.outputs.map((o) => o.name)).size).toBe(m.outputs.length);
    },
  );

  it('has each id once, finds it with and without its version, and refuses an unknown one', () => {
    expect(new Set(METHODS.map((m) => m.id)).size).toBe(METHODS.length);
    expect(methodById('a.gas@1')).toBe(methodById('a.gas'));
    expect(methodById('a.gas@99')).toBeUndefined();
    expect(workMethod('z.none', {}).refused).toMatchObject({ code: 'METHOD_UNKNOWN' });
  });
});

describe('sheets of the reference cases', () => {
  it.each(SINGLE.map((c) => [c.id, c] as const))(
    '%s: steps have a meaning, TeX that renders, and a finite value',
    (_id, c) => {
      const { steps = [] } = calculate(c as never);
      expect(steps.length).toBeGreaterThan(0);
      for (const step of steps) {
        expect(step.meaning).not.toBe('');
        for (const tex of [step.symbol, step.tex, step.worked])
          expect(() => katex.renderToString(tex, { throwOnError: true, strict: 'error' }), tex).not.toThrow();
        if (typeof step.value === 'number') expect(Number.isFinite(step.value)).toBe(true);
        expect(dimensionOf(step.unit), step.unit).toBeDefined();
      }
    },
  );

  it('substitutes every symbol of the area equation', () => {
    const worked = workMethod('a.gas', GAS).steps.find((s) => s.symbol === 'A')?.worked ?? '';
    expect(worked).toContain('13\\,267.1');
    expect(worked).not.toMatch(/K_d|P_1|Z/);
  });
});

describe('refusals say what is wrong in a practitioner’s words', () => {
  const refusal = (change: Inputs) => workMethod('a.gas', { ...GAS, ...change }).refused;
  it('nothing flows against a higher back pressure', () => {
    expect(refusal({ P1: bar(8), P2: bar(9.1) })).toEqual({
      code: 'NO_FLOW',
      field: 'P2',
      text: 'Relieving pressure 8 bara is below the back pressure 9.1 bara: nothing can flow.',
    });
  });

  it('a missing, a non-numeric, a wrongly dimensioned and an impossible input', () => {
    const { W, ...rest } = GAS;
    expect(W).toBeDefined();
    expect(workMethod('a.gas', rest).refused).toMatchObject({ code: 'INPUT_MISSING', field: 'W' });
    expect(refusal({ M: 'heavy' })).toMatchObject({ code: 'NOT_A_NUMBER', field: 'M' });
    expect(refusal({ M: { value: Number.NaN, unit: 'kg/kmol' } })).toMatchObject({
      code: 'NOT_A_NUMBER',
      field: 'M',
    });
    expect(refusal({ W: { value: 3, unit: 'm3/h' } })).toMatchObject({ code: 'WRONG_UNIT', field: 'W' });
    expect(refusal({ P1: { value: 8, unit: 'bar' } })).toMatchObject({ code: 'WRONG_UNIT', field: 'P1' });
    expect(refusal({ k: { value: 0.9, unit: '-' } })?.text).toBe(
      'Ideal-gas ratio of specific heats (k) 0.9 is impossible: it lies above 1 and up to 1.67.',
    );
    expect(refusal({ M: { value: -3, unit: 'kg/kmol' } })).toMatchObject({
      code: 'VALUE_IMPOSSIBLE',
      field: 'M',
    });
  });

  it('Kb together with subcritical flow of a conventional valve', () => {
    expect(refusal({ P2: bar(4), Kb: { value: 0.8, unit: '-' } })).toMatchObject({ code: 'KB_TWICE' });
    expect(refusal({ P2: bar(4), Kb: { value: 0.8, unit: '-' }, balanced: true })).toBeUndefined();
  });

  it('a source that is not hotter than the sink', () => {
    const heat = {
      UA: { value: 110, unit: 'kW/K' },
      T_source: { value: 150, unit: 'degC' },
      T_sink: { value: 165, unit: 'degC' },
      latent_heat: { value: 430, unit: 'kJ/kg' },
    };
    expect(workMethod('f.vaporisation', heat).refused?.text).toContain('not hotter than the sink');
  });

  it('a liquid level above the vessel, named by its tag', () => {
    const metre = (value: number) => ({ value, unit: 'm' });
    const vessel: Inputs = {
      tag: 'V-9',
      orientation: 'horizontal',
      heads: 'flat',
      D: metre(2),
      L: metre(4),
      liquid_level: metre(3),
      elevation_of_bottom: metre(1),
    };
    expect(workMethod('e.fire-wetted', vessel).refused?.text).toContain('V-9');
    expect(workMethod('e.fire-wetted', { ...vessel, liquid_level: metre(0) }).refused).toMatchObject({
      code: 'NO_WETTED_AREA',
    });
  });
});

describe('warnings name the range that was left', () => {
  it('Z, latent heat, the assumed barometer', () => {
    expect(workMethod('a.gas', { ...GAS, Z: { value: 0.5, unit: '-' } }).warnings).toContainEqual(
      expect.objectContaining({ code: 'Z_OUTSIDE_RANGE', range: '0.8 to 1.1' }),
    );
    const heat = { Q: { value: 100, unit: 'kW' }, latent_heat: { value: 90, unit: 'kJ/kg' } };
    expect(workMethod('f.vaporisation', heat).warnings.map((w) => w.code)).toEqual(['LATENT_HEAT_LOW']);
    const gauge = { ...GAS, P1: { value: 4, unit: 'bar_g' } };
    expect(workMethod('a.gas', gauge).warnings.map((w) => w.code)).toEqual(['BAROMETER_ASSUMED']);
  });
});

describe('heat balance', () => {
  it('gives the same load by duty and by UA, less what is removed (W = Q/λ, re-worked by hand)', () => {
    const latent_heat = { value: 430, unit: 'kJ/kg' };
    const removed = { Q_removed: { value: 55, unit: 'kW' } };
    const byUA = workMethod('f.vaporisation', {
      UA: { value: 110, unit: 'kW/K' },
      T_source: { value: 179.5, unit: 'degC' },
      T_sink: { value: 165, unit: 'degC' },
      latent_heat,
      ...removed,
    });
    const byDuty = workMethod('f.vaporisation', { Q: { value: 1595, unit: 'kW' }, latent_heat, ...removed });
    expect((byUA.outputs['relief_load'] as Q).value).toBeCloseTo((1540 * 3600) / 430, 6);
    expect((byDuty.outputs['relief_load'] as Q).value).toBeCloseTo((1540 * 3600) / 430, 6);
    expect(byUA.outputs['heat']).toEqual({ value: 1540, unit: 'kW' });
  });
});

describe('several vessels in one fire', () => {
  const metre = (value: number) => ({ value, unit: 'm' });
  const one: Inputs = {
    orientation: 'horizontal',
    heads: 'ellipsoidal',
    D: metre(2),
    L: metre(6),
    liquid_level: metre(1),
    elevation_of_bottom: metre(1),
    adequate_drainage: true,
  };
  it('adds their wetted areas, with the allowance for piping', () => {
    const twin = Object.fromEntries(
      Object.entries(one)
        .filter(([n]) => n !== 'adequate_drainage')
        .map(([n, q]) => [`${n}_2`, q]),
    );
    const area = (inputs: Inputs) => (workMethod('e.fire-wetted', inputs).outputs['wetted_area'] as Q).value;
    expect(area({ ...one, ...twin, piping_allowance: { value: 10, unit: '%' } })).toBeCloseTo(
      2.2 * area(one),
      9,
    );
  });
});

describe('whatever is typed', () => {
  const unit = fc.constantFrom(...Object.keys(UNITS));
  const any = fc.oneof(
    fc.record({ value: fc.double(), unit }),
    fc.boolean(),
    fc.constantFrom('gas', 'horizontal', 'flat', ''),
  );
  it.each(METHODS.map((m) => [m.id, m] as const))(
    '%s neither throws nor gives a figure that is not finite',
    (_id, m) => {
      const dimensioned = m.inputs.map((i) => {
        const units = Object.keys(UNITS).filter((key) => dimensionOf(key) === i.dimension);
        const number =
          units.length === 0
            ? any
            : fc.record({
                value: fc.double({ min: 0, max: 1e4, noNaN: true }),
                unit: fc.constantFrom(...units),
              });
        const word = i.words ? fc.constantFrom(...i.words) : number;
        return [
          i.name,
          fc.option(fc.oneof({ arbitrary: word, weight: 9 }, { arbitrary: any, weight: 1 }), {
            nil: undefined,
            freq: 12,
          }),
        ] as const;
      });
      fc.assert(
        fc.property(fc.record(Object.fromEntries(dimensioned)), (typed) => {
          const given = Object.fromEntries(
            Object.entries(typed).filter(([, v]) => v !== undefined),
          ) as Inputs;
          const worked = m.work(given);
          for (const out of Object.values(worked.outputs))
            if (typeof out === 'object') expect(out.value).toSatisfy(Number.isFinite);
          const declared = m.outputs.map((o) => o.name.replace(/_\d+$/, ''));
          for (const name of Object.keys(worked.outputs))
            expect(declared).toContain(name.replace(/_\d+$/, ''));
          if (!worked.refused) expect(Object.keys(worked.outputs).length).toBeGreaterThan(0);
        }),
        { numRuns: 150 },
      );
    },
  );
});
