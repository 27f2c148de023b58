/* Fires on gas and on supercritical contents, and the credits: against other equations of the same standard and the gas law. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { workMethod } from '../../../../src/engine/catalog';
import { governingStep, ventSteps } from '../../../../src/engine/methods/e-fire/supercritical-flow';
import { type Q } from '../../../../src/engine/quantity';
import { type Inputs } from '../../../../src/engine/sheet';
import { EXAMPLES, q } from './examples';

const work = (id: string, change: Inputs = {}) => workMethod(id, { ...EXAMPLES[id], ...change });
const out = (id: string, name: string, change: Inputs = {}) => (work(id, change).outputs[name] as Q).value;

describe('a gas-filled vessel', () => {
  it('needs by F′ the area that its load needs by the gas equation of API 520-1', () => {
    const number = (min: number, max: number) => fc.double({ min, max, noNaN: true });
    fc.assert(
      fc.property(number(2, 120), number(300, 9000), number(250, 700), number(1.05, 1.6), (M, P, T, k) => {
        const fire = work('e.fire-unwetted', {
          M: q(M, 'kg/kmol'),
          P1: q(P, 'kPa_abs'),
          T1: q(T, 'K'),
          k: q(k),
        });
        const free = fire.outputs['F_prime_unlimited'] as Q;
        const W = fire.outputs['relief_load'] as Q;
        const gas = workMethod('a.gas', {
          W,
          T: q(T, 'K'),
          Z: q(1),
          M: q(M, 'kg/kmol'),
          k: q(k),
          P1: q(P, 'kPa_abs'),
          P2: q(101.325, 'kPa_abs'),
        });
        const area = (fire.outputs['A_required'] as Q).value;
        const byGas = (gas.outputs['A_required'] as Q).value;
        if (gas.outputs['regime'] !== 'critical') return;
        expect(area / byGas).toBeCloseTo(free.value > 182 ? 1 : 182 / free.value, 9);
      }),
    );
  });

  it('heats at constant volume: T1 = T_n P1/P_n, void when the gas is as hot as the wall', () => {
    const { T1: _, ...cold } = EXAMPLES['e.fire-unwetted']!;
    const closed = { ...cold, normal_pressure: q(700, 'kPa_abs'), normal_temperature: q(285, 'K') };
    expect((workMethod('e.fire-unwetted', closed).outputs['T1'] as Q).value).toBeCloseTo(
      (285 * 1311.325) / 700,
      9,
    );
    const hot = workMethod('e.fire-unwetted', { ...closed, normal_pressure: q(400, 'kPa_abs') });
    expect(hot.refused).toMatchObject({ code: 'GAS_HOTTER_THAN_WALL' });
    expect(workMethod('e.fire-unwetted', cold).refused).toMatchObject({ field: 'T1' });
  });

  it('counts only the surface below the fire height, and says that the wall is not protected', () => {
    const low = out('e.fire-unwetted', 'exposed_area', { fire_height: q(3, 'm') });
    expect(low).toBeLessThan(out('e.fire-unwetted', 'exposed_area'));
    expect(work('e.fire-unwetted', { elevation_of_bottom: q(9, 'm') }).refused).toMatchObject({
      code: 'ABOVE_FIRE',
    });
    expect(work('e.fire-unwetted').warnings.map((w) => w.code)).toContain('WALL_NOT_PROTECTED');
  });
});

describe('contents above their critical point', () => {
  const ideal = (T: number) => ({ T, v: (300 * T) / 5e6, h: 1200 * T });

  it('that are an ideal gas vent W = Q/(cp T)', () => {
    const steps = ventSteps(600_000, [300, 310, 320, 330].map(ideal));
    for (const step of steps) expect(step.W).toBeCloseTo(600_000 / (1200 * step.T), 6);
  });

  it('lose as much as the density says: the mass vented along the isobar is V (1/v1 − 1/v2)', () => {
    const points = Array.from({ length: 400 }, (_, i) => ideal(300 + i * 0.5));
    const steps = ventSteps(500_000, points);
    const V = 12;
    const vented = steps.reduce((sum, step) => {
      const dh = 1200 * 0.5;
      return sum + (step.W * ((V / step.v) * dh)) / 500_000;
    }, 0);
    expect(vented / (V / points[0]!.v - V / points.at(-1)!.v)).toBeCloseTo(1, 4);
  });

  it('are governed by the greatest W√v, with a warning at the edge of the points entered', () => {
    const steps = [
      { W: 10, T: 300, v: 0.001 },
      { W: 8, T: 350, v: 0.004 },
      { W: 5, T: 400, v: 0.005 },
    ];
    expect(governingStep(steps)).toBe(1);
    expect(work('e.fire-supercritical').warnings.map((w) => w.code)).toContain('GOVERNING_AT_EDGE');
    expect(work('e.fire-supercritical', { v_2: q(0.001, 'm3/kg') }).refused).toMatchObject({
      code: 'ORDER',
      field: 'v_2',
    });
    expect(work('e.fire-supercritical', { h_3: { value: 2, unit: 'm' } }).refused).toMatchObject({
      field: 'h_3',
    });
  });

  it('take their heat from the pool-fire equation when the surface is given: 43 200 · 20^0.82 W', () => {
    const { heat_input: _, ...others } = EXAMPLES['e.fire-supercritical']!;
    const fire = workMethod('e.fire-supercritical', {
      ...others,
      A_exposed: q(20, 'm2'),
      adequate_drainage: true,
    });
    const ratio = (fire.outputs['relief_load'] as Q).value / out('e.fire-supercritical', 'relief_load');
    expect(ratio).toBeCloseTo((43200 * 20 ** 0.82) / 800_000, 9);
  });
});

describe('credits', () => {
  const vessel: Inputs = {
    orientation: 'horizontal',
    heads: 'flat',
    D: q(2, 'm'),
    L: q(6, 'm'),
    liquid_level: q(1, 'm'),
    elevation_of_bottom: q(1, 'm'),
    adequate_drainage: true,
  };
  const heat = (change: Inputs) =>
    (workMethod('e.fire-wetted', { ...vessel, ...change }).outputs['heat_input'] as Q).value;
  it('earth cover takes 97 %, burial all, water spray nothing (API 521, environment factors, from memory)', () => {
    expect(heat({ protection: 'earth-covered' }) / heat({})).toBeCloseTo(0.03, 12);
    expect(heat({ protection: 'underground' })).toBe(0);
    expect(heat({ protection: 'water-spray' })).toBe(heat({}));
  });

  it('want of drainage adds 64 % (70 900 over 43 200)', () => {
    expect(heat({ adequate_drainage: false }) / heat({})).toBeCloseTo(70900 / 43200, 12);
  });
});
