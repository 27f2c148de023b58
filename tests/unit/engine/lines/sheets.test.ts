/* Sheets of lines: equations that render, lists by segment, refusals in sentences, and the methods beyond the reference topics. */
import katex from 'katex';
import { describe, expect, it } from 'vitest';
import { calculate, type CalcValue } from '../../../../src/engine/calc';
import { dimensionOf } from '../../../../src/engine/quantity';
import gLines from '../../../reference/g-lines.json';

type Case = { id: string; topic: string; inputs: Record<string, CalcValue> };
const CASES = gLines.cases as unknown as Case[];
const q = (value: number | number[], unit = '-'): CalcValue => ({ value, unit });
const of = (topic: string, inputs: Record<string, CalcValue>) => {
  const answer = calculate({ topic, inputs });
  return { ...answer, number: (name: string) => Number(answer.outputs[name]?.value) };
};

const OUTLET = {
  W: q(40000, 'kg/h'),
  D: q([0.1541, 0.3048], 'm'),
  L: q([4, 60], 'm'),
  sum_K: q([0.9, 3]),
  f_darcy: q([0.017, 0.0145]),
  P_exit_ambient: q(120, 'kPa_abs'),
};
const FITTINGS = {
  method: { value: '3-K' },
  D: q(154.1, 'mm'),
  nominal: q(6, 'in'),
  W: q(10, 'kg/s'),
  mu: q(0.01, 'cP'),
  fitting: { value: ['entrance-sharp', 'elbow-90-long'] },
  count: q([1, 3]),
};
const STABILITY = {
  L: q(1.5, 'm'),
  D: q(102.3, 'mm'),
  W: q(9000, 'kg/h'),
  c: q(220, 'm/s'),
  opening_time: q(20, 'ms'),
  set_pressure: q(3.5, 'bar_g'),
  blowdown: q(0.07),
  loss: q(1.6, 'kPa'),
};
const MORE: Case[] = [
  {
    id: 'homogeneous, points',
    topic: 'g.outlet-homogeneous',
    inputs: { ...OUTLET, P_point: q([100, 200, 400], 'kPa_abs'), v_point: q([0.3, 0.12, 0.04], 'm3/kg') },
  },
  {
    id: 'homogeneous, omega',
    topic: 'g.outlet-homogeneous',
    inputs: { ...OUTLET, P0: q(600, 'kPa_abs'), v0: q(0.02, 'm3/kg'), omega: q(6) },
  },
  {
    id: 'liquid',
    topic: 'g.outlet-liquid',
    inputs: { ...OUTLET, rho: q(780, 'kg/m3'), rise: q([0, 12], 'm'), set_pressure: q(10, 'bar_g') },
  },
  { id: 'fittings', topic: 'g.fitting-losses', inputs: FITTINGS },
  {
    id: 'fittings by length',
    topic: 'g.fitting-losses',
    inputs: { ...FITTINGS, method: { value: 'length' } },
  },
  { id: 'fittings by 2-K', topic: 'g.fitting-losses', inputs: { ...FITTINGS, method: { value: '2-K' } } },
  { id: 'stability', topic: 'g.inlet-stability', inputs: STABILITY },
  {
    id: 'fatigue',
    topic: 'g.acoustic-fatigue',
    inputs: {
      W: q(50, 'kg/s'),
      P1: q(50, 'bar_abs'),
      P2: q(5, 'bar_abs'),
      T: q(330, 'K'),
      M: q(18, 'kg/kmol'),
      L: q(5, 'm'),
      D: q(0.3, 'm'),
      other_sources: q(150, 'dB'),
    },
  },
  {
    id: 'closed',
    topic: 'g.reaction-force-closed',
    inputs: {
      W: q(10, 'kg/s'),
      D: q(0.2, 'm'),
      velocity: q(200, 'm/s'),
      P: q(180, 'kPa_abs'),
      P_before: q(101, 'kPa_abs'),
    },
  },
];

describe.each(
  [...CASES, ...MORE].filter(({ topic }) => topic !== 'g.fanno-function').map((c) => [c.id, c] as const),
)('the sheet of %s', (_id, one) => {
  it('has steps with a meaning, TeX that renders, finite values and units that are known', () => {
    const answer = calculate(one);
    expect(answer.refused).toBeUndefined();
    expect(answer.steps?.length).toBeGreaterThan(0);
    for (const step of answer.steps ?? []) {
      expect(step.meaning).not.toBe('');
      for (const tex of [step.symbol, step.tex, step.worked])
        expect(() => katex.renderToString(tex, { throwOnError: true, strict: false }), tex).not.toThrow();
      expect(dimensionOf(step.unit), step.unit).toBeDefined();
    }
  });
});

describe('lists by segment', () => {
  const gas = { T0: q(360, 'K'), Z: q(0.98), M: q(40, 'kg/kmol'), k: q(1.15) };
  it('a flow given once holds for the whole line; one each counts where lines join', () => {
    const once = of('g.outlet-fanno', { ...OUTLET, ...gas }).number('segment1_inlet_pressure');
    const twice = of('g.outlet-fanno', { ...OUTLET, ...gas, W: q([40000, 40000], 'kg/h') });
    expect(twice.number('segment1_inlet_pressure')).toBe(once);
    const joined = of('g.outlet-fanno', { ...OUTLET, ...gas, W: q([40000, 120000], 'kg/h') });
    expect(joined.number('segment1_inlet_pressure')).toBeGreaterThan(once);
  });
  it('refuses a list that is longer or shorter than that of the bores, naming the place', () => {
    expect(of('g.outlet-fanno', { ...OUTLET, ...gas, L: q([4, 60, 3], 'm') }).refused).toMatchObject({
      code: 'LISTS_DIFFER',
      field: 'L_3',
    });
    expect(
      of('g.outlet-fanno', { ...OUTLET, ...gas, D: q([0.15, 0.3, 0.3], 'm'), L: q([4, 60], 'm') }).refused,
    ).toBeDefined();
  });
  it('counts the built-up part from the pressure before the device opens', () => {
    const plain = of('g.outlet-fanno', { ...OUTLET, ...gas });
    const before = of('g.outlet-fanno', { ...OUTLET, ...gas, P_superimposed: q(110, 'kPa_abs') });
    expect(before.number('built_up_back_pressure') - plain.number('built_up_back_pressure')).toBeCloseTo(
      10,
      6,
    );
  });
});

describe('methods beyond the reference, re-worked by hand', () => {
  it('adds the weight of a rise: 780 · 9.80665 · 12 = 91.79 kPa', () => {
    const liquid = MORE[2];
    const level = of('g.outlet-liquid', { ...OUTLET, rho: q(780, 'kg/m3') }).number('built_up_back_pressure');
    const risen = of('g.outlet-liquid', liquid?.inputs ?? {}).number('built_up_back_pressure');
    expect(risen - level).toBeCloseTo((780 * 9.80665 * 12) / 1000, 6);
  });
  it('sums fittings: 0.5 + 3 (800/Re + 0.071 (1 + 4.2/6^0.3))', () => {
    const Re = (4 * 10) / (Math.PI * 0.1541 * 1e-5);
    expect(of('g.fitting-losses', FITTINGS).number('sum_K')).toBeCloseTo(
      0.5 + 3 * (800 / Re + 0.071 * (1 + 4.2 / 6 ** 0.3)),
      9,
    );
  });
  it('gives the figures of a stability analysis and says that they are no verdict', () => {
    const found = of('g.inlet-stability', STABILITY);
    expect(found.number('return_time')).toBeCloseTo(3 / 220, 9);
    expect(found.number('longest_line')).toBeCloseTo(2.2, 9);
    expect(found.outputs['wave_returns_in_time']?.value).toBe(true);
    const G = 2.5 / ((Math.PI / 4) * 0.1023 ** 2);
    expect(found.number('acceleration_drop')).toBeCloseTo((2 * 1.5 * G) / 0.02 / 1000, 6);
    expect(found.number('blowdown_left')).toBeCloseTo(0.07 - 1.6 / 350, 9);
    expect(found.warnings.map((w) => w.code)).toEqual(['NO_VERDICT']);
  });
  // Carucci and Mueller 1982 (from memory): 10 lg((45/50)^3.6 · 50² · (330/18)^1.2) + 126.1 = 173.5 dB.
  it('screens by sound power', () => {
    const found = of('g.acoustic-fatigue', MORE[7]?.inputs ?? {});
    const own = 10 * Math.log10(0.9 ** 3.6 * 2500 * (330 / 18) ** 1.2) + 126.1;
    expect(found.number('PWL')).toBeCloseTo(own, 9);
    expect(found.number('PWL_at_L')).toBeCloseTo(own - 1, 9);
    expect(found.outputs['below_screening_level']?.value).toBe(false);
    expect(found.warnings.map((w) => w.code)).toContain('ACOUSTIC_FATIGUE');
  });
  it('bounds the force on a leg of a closed discharge: W v + A Δp', () => {
    expect(of('g.reaction-force-closed', MORE[8]?.inputs ?? {}).number('transient_force')).toBeCloseTo(
      2000 + (Math.PI / 4) * 0.04 * 79000,
      6,
    );
  });
  it('an inlet line that chokes, an empty table and a discharge without fall are refused in a sentence', () => {
    const fanno = CASES.find((c) => c.id === 'g-inlet-fanno')?.inputs ?? {};
    expect(of('g.inlet-loss', { ...fanno, W: q(400000, 'kg/h') }).refused).toMatchObject({ code: 'CHOKES' });
    expect(
      of('g.outlet-homogeneous', { ...OUTLET, P_point: q([200], 'kPa_abs'), v_point: q([0.1], 'm3/kg') })
        .refused,
    ).toMatchObject({ code: 'TABLE_UNFIT' });
    const noise = CASES.find((c) => c.topic === 'g.noise')?.inputs ?? {};
    expect(of('g.noise', { ...noise, P2: q(400, 'kPa_abs') }).refused).toMatchObject({ code: 'NO_FLOW' });
  });
  it('a dynamic load factor makes the force on the support', () => {
    const reaction = CASES.find((c) => c.id === 'g-reaction-full')?.inputs ?? {};
    const found = of('g.reaction-force', { ...reaction, dynamic_load_factor: q(2) });
    expect(found.number('support_force')).toBeCloseTo(2 * found.number('reaction_force'), 9);
  });
});
