/* The sheet of water properties: every pair gives the same state, the region is named, and refusals say what would be right. */
import { describe, expect, it } from 'vitest';
import { WATER_PROPERTIES } from '../../../../src/engine/methods/b-steam/water-properties';
import { type Q } from '../../../../src/engine/quantity';
import { type Inputs } from '../../../../src/engine/sheet';

const q = (value: number, unit: string): Q => ({ value, unit });
const work = (inputs: Inputs) => WATER_PROPERTIES.work(inputs);
const figure = (inputs: Inputs, name: string) => (work(inputs).outputs[name] as Q).value;
const PAIRS = ['P T', 'P h', 'P s', 'h s', 'P x', 'T x'];

/** What a sheet found, as inputs for another pair. */
function given(inputs: Inputs, pair: string): Inputs {
  const { outputs } = work(inputs);
  return Object.fromEntries(pair.split(' ').map((name) => [name, outputs[name]!]));
}

describe('pairs', () => {
  it.each([
    ['1', { P: q(20, 'bar_abs'), T: q(100, 'degC') }],
    ['2', { P: q(20, 'bar_abs'), T: q(400, 'degC') }],
    ['3', { P: q(300, 'bar_abs'), T: q(400, 'degC') }],
    ['5', { P: q(20, 'bar_abs'), T: q(1000, 'degC') }],
  ] as const)('of region %s: P and h, P and s, h and s find the state of P and T again', (region, inputs) => {
    expect(work(inputs).outputs['region']).toBe(region);
    for (const pair of PAIRS.slice(1, 4))
      for (const name of ['P', 'T', 'rho', 'h', 's', 'cp', 'w'])
        expect(figure(given(inputs, pair), name) / figure(inputs, name), `${pair}: ${name}`).toBeCloseTo(
          1,
          6,
        );
  });

  it.each([
    ['far from the critical point', { P: q(8, 'bar_g'), x: q(0.3, '-') }],
    ['in region 3', { P: q(200, 'bar_abs'), x: q(0.3, '-') }],
  ] as const)('of boiling water %s: all but P and T find the same state', (_where, inputs) => {
    expect(work(inputs).outputs).toMatchObject({ region: '4', phase: 'two-phase' });
    for (const pair of PAIRS.slice(1))
      for (const name of ['P', 'T', 'x', 'rho', 'latent_heat'])
        expect(figure(given(inputs, pair), name) / figure(inputs, name), `${pair}: ${name}`).toBeCloseTo(
          1,
          6,
        );
  });

  it('names the phase', () => {
    const phase = (inputs: Inputs) => work(inputs).outputs['phase'];
    expect(phase({ P: q(20, 'bar_abs'), T: q(100, 'degC') })).toBe('compressed liquid');
    expect(phase({ P: q(300, 'bar_abs'), T: q(360, 'degC') })).toBe('compressed liquid');
    expect(phase({ P: q(20, 'bar_abs'), T: q(400, 'degC') })).toBe('superheated steam');
    expect(phase({ P: q(0.3, 'kPa_abs'), T: q(20, 'degC') })).toBe('superheated steam');
    expect(phase({ P: q(300, 'bar_abs'), T: q(400, 'degC') })).toBe('supercritical');
    expect(phase({ T: q(180, 'degC'), x: q(0, '-') })).toBe('saturated liquid');
    expect(phase({ T: q(180, 'degC'), x: q(1, '-') })).toBe('saturated steam');
  });
});

describe('what the sheet says', () => {
  it('can be re-worked: v, h, s, cp and cv follow from the dimensionless figures above them', () => {
    const { steps } = work({ P: q(20, 'bar_abs'), T: q(400, 'degC') });
    const value = (symbol: string) => steps.find((step) => step.symbol === symbol)!.value as number;
    const [pi, tau, T, P] = [value('\\pi'), value('\\tau'), 673.15, 2000];
    const [gp, gpp, gpt] = ['\\pi', '\\pi\\pi', '\\pi\\tau'].map((index) => value(`\\gamma_{${index}}`)) as [
      number,
      number,
      number,
    ];
    const [gt, gtt] = [value('\\gamma_{\\tau}'), value('\\gamma_{\\tau\\tau}')];
    const R = 0.461526;
    expect(value('v')).toBeCloseTo((pi * gp * R * T) / P, 12);
    expect(value('h')).toBeCloseTo(R * T * tau * gt, 8);
    expect(value('s')).toBeCloseTo(R * (tau * gt - value('\\gamma')), 10);
    expect(value('c_p')).toBeCloseTo(-R * tau ** 2 * gtt, 10);
    expect(value('c_v')).toBeCloseTo(R * (-(tau ** 2) * gtt + (gp - tau * gpt) ** 2 / gpp), 10);
  });

  it('warns at saturation, near the critical point and above the range of viscosity', () => {
    const codes = (inputs: Inputs) => work(inputs).warnings.map((warning) => warning.code);
    expect(codes({ P: q(1, 'bar_abs'), T: q(372.756, 'K') })).toEqual(['AT_SATURATION']);
    expect(codes({ P: q(22.3, 'MPa_abs'), T: q(648.1, 'K') })).toEqual(['VISCOSITY_NEAR_CRITICAL']);
    expect(codes({ P: q(1, 'bar_abs'), T: q(1200, 'K') })).toEqual(['NO_VISCOSITY']);
    expect(codes({ P: q(1, 'bar_abs'), T: q(500, 'K') })).toEqual([]);
  });
});

describe('refusals', () => {
  const refused = (inputs: Inputs) => work(inputs).refused;
  it('too few, too many, or a pair that fixes no state here', () => {
    expect(refused({})).toMatchObject({ code: 'INPUT_MISSING', field: 'P' });
    expect(refused({ P: q(1, 'bar_abs') })).toMatchObject({ code: 'INPUT_MISSING', field: 'T' });
    const three = { P: q(1, 'bar_abs'), T: q(300, 'K'), x: q(1, '-') };
    expect(refused(three)?.text).toContain('exactly two figures');
    expect(refused({ T: q(300, 'K'), h: q(100, 'kJ/kg') })).toMatchObject({ code: 'PAIR_NOT_WORKED' });
  });

  it('outside of the formulation, and vapour fraction above the critical point', () => {
    expect(refused({ P: q(600, 'bar_abs'), T: q(1200, 'K') })?.text).toContain('273.15 to 1073.15 K');
    expect(refused({ P: q(300, 'bar_abs'), x: q(0.5, '-') })).toMatchObject({
      code: 'NO_SATURATION',
      field: 'P',
    });
    expect(refused({ T: q(400, 'degC'), x: q(0.5, '-') })).toMatchObject({
      code: 'NO_SATURATION',
      field: 'T',
    });
    expect(refused({ h: q(100, 'kJ/kg'), s: q(9, 'kJ/(kg.K)') })).toMatchObject({
      code: 'OUTSIDE_FORMULATION',
    });
  });
});
