/* Headroom against what follows by hand from the equation: area is proportional to load, and to 1/P1 in critical flow. */
import { describe, expect, it } from 'vitest';
import { METHODS, workMethod } from '@engine/catalog';
import { curve, headroom, type Subject, tornado } from '@engine/headroom';
import { type Q } from '@engine/quantity';

const q = (value: number, unit: string): Q => ({ value, unit });
/** API 520-1 Example 1 as quoted in the docstring of fluids/safety_valve.py (CalebBell/fluids): 3 699 mm², orifice P, 4 116 mm². */
const SUBJECT: Subject = {
  method: 'a.gas',
  inputs: {
    ...{ W: q(24270, 'kg/h'), T: q(75, 'degC'), Z: q(0.9, '-'), M: q(51, 'kg/kmol'), k: q(1.11, '-') },
    ...{ P1: q(670, 'kPa_abs'), P2: q(101.325, 'kPa_abs'), Kd: q(0.975, '-') },
  },
  limit: q(4116, 'mm2'),
};
const AREA = Number((workMethod('a.gas', SUBJECT.inputs).outputs['A_required'] as Q).value);
const RATIO = 4116 / AREA;

function of(name: string, subject = SUBJECT) {
  const found = headroom(subject);
  if ('why' in found) throw new Error(found.why);
  const one = found.inputs.find((input) => input.name === name);
  if (!one) throw new Error(`no ${name}`);
  return { ...one, margin: found.margin };
}

describe('headroom', () => {
  it('is the limit over the figure, less one', () => {
    expect(of('W').margin).toBeCloseTo(RATIO - 1, 12);
  });

  it('lets the load rise by the margin, and the pressure fall by it', () => {
    const W = of('W');
    expect(W.above.at?.value).toBeCloseTo(24270 * RATIO, 4);
    expect(W.above.change).toBeCloseTo(RATIO - 1, 10);
    expect(W.below).toMatchObject({ why: expect.stringMatching(/sign/) as string });
    expect(of('P1').below.at?.value).toBeCloseTo(670 / RATIO, 6);
  });

  it('lets the temperature rise by its square, counted from absolute zero and told as it was given', () => {
    const { above } = of('T');
    expect(above.at).toMatchObject({ unit: 'degC' });
    expect(above.at?.value).toBeCloseTo(348.15 * RATIO ** 2 - 273.15, 5);
  });

  it('takes a coefficient down to the ratio and never beyond what it can be', () => {
    const Kd = of('Kd');
    expect(Kd.below.at?.value).toBeCloseTo(0.975 / RATIO, 8);
    expect(Kd.above.at).toBeUndefined();
    expect(Kd.above.why).toMatch(/sign/);
  });

  it('works from the other side too: what is inadequate says what would make it adequate', () => {
    const W = of('W', { ...SUBJECT, limit: q(2323, 'mm2') });
    expect(W.margin).toBeLessThan(0);
    expect(W.below.at?.value).toBeCloseTo((24270 * 2323) / AREA, 4);
  });

  it('says why when nothing can be asked', () => {
    expect(headroom({ ...SUBJECT, method: 'z.none' })).toHaveProperty('why');
    expect(headroom({ ...SUBJECT, output: 'regime' })).toHaveProperty('why');
    expect(headroom({ ...SUBJECT, limit: q(1, 'kg') })).toHaveProperty('why');
    expect(headroom({ ...SUBJECT, limit: q(0, 'mm2') })).toHaveProperty('why');
    expect(headroom({ ...SUBJECT, inputs: {} })).toHaveProperty('why');
  });
});

describe('the tornado', () => {
  it('moves each input by a tenth either way, widest first', () => {
    const found = tornado(SUBJECT);
    if ('why' in found) throw new Error(found.why);
    const W = found.bars.find((bar) => bar.name === 'W');
    expect(W?.atHigh).toBeCloseTo(RATIO / 1.1 - 1, 10);
    expect(W?.atLow).toBeCloseTo(RATIO / 0.9 - 1, 10);
    const swings = found.bars.map((bar) => bar.swing);
    expect(swings).toEqual(swings.toSorted((a, b) => b - a));
    expect(found.bars.at(-1)).toMatchObject({ name: 'P2', swing: 0 });
    expect(found.bars.find((bar) => bar.name === 'Kd')).not.toHaveProperty('atHigh');
  });

  it('takes spans of one’s own', () => {
    const found = tornado(SUBJECT, { W: [q(20, 't/h'), q(30, 't/h')] });
    const W = 'why' in found ? undefined : found.bars.find((bar) => bar.name === 'W');
    expect(W?.atHigh).toBeCloseTo((RATIO * 24.27) / 30 - 1, 10);
  });
});

describe('the curve', () => {
  it('draws the required area against one input and says where there is none', () => {
    const found = curve(SUBJECT, 'P2', { from: q(101.325, 'kPa_abs'), to: q(800, 'kPa_abs'), points: 15 });
    if ('why' in found) throw new Error(found.why);
    expect(found.points).toHaveLength(15);
    expect(found.points[0]?.y).toBeCloseTo(AREA, 9);
    expect(found.points.at(-1)?.why).toMatch(/nothing can flow/);
    const areas = found.points.flatMap(({ y }) => y ?? []);
    expect(areas).toEqual(areas.toSorted((a, b) => a - b));
  });

  it('refuses an input that is not a number', () => {
    expect(curve(SUBJECT, 'none', { from: q(1, '-'), to: q(2, '-') })).toHaveProperty('why');
  });
});

describe('every method', () => {
  it('can be asked with nothing given and answers why, without throwing', () => {
    for (const { id } of METHODS)
      expect(headroom({ method: id, inputs: {}, limit: q(1, 'mm2') })).toHaveProperty('why');
  });
});
