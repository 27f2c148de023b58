/* The unseen check: order of its layers, what it never gives away, tolerances by quantity, when it must be done again. */
import { describe, expect, it } from 'vitest';
import {
  compareUnseen,
  identicalShare,
  isIdentical,
  originatorsValue,
  toleranceOf,
  unseenDifferences,
  unseenLeft,
  unseenState,
  type UnseenEntry,
} from '@domain/case';
import { aCase, documentFacts, evaluation, q } from './fixture';

const of = documentFacts({ baseEvaluation: evaluation(1900, 'before') });
const reveal = { document: 'doc1', person: 'ben', at: '2026-03-12T09:00:00.000Z' };
const at = (
  unseen: UnseenEntry[],
  reveals: (typeof reveal)[] = [],
  stage: 'scenarios' | 'check' | 'approval' = 'check',
) => ({ case: aCase({ stage }), unseen, reveals, documents: [of] });
function enter(
  unseen: UnseenEntry[],
  bend: Record<string, Partial<UnseenEntry>> = {},
  from = of,
): UnseenEntry[] {
  const more = unseenState(from, at(unseen)).mayEnter.map((item): UnseenEntry => {
    const value = originatorsValue(from, item);
    return {
      id: item.scope,
      case: 'case1',
      document: 'doc1',
      scope: item.scope,
      layer: item.layer,
      quantity: item.quantity,
      round: 1,
      by: 'ben',
      at: '2026-03-12T08:00:00.000Z',
      ...(typeof value === 'string' ? { word: value } : value ? { value } : {}),
      ...(value === undefined ? {} : { against: value }),
      ...bend[item.scope],
    };
  });
  return [...unseen, ...more];
}

describe('the order of the unseen check', () => {
  it('asks readings and choices first, and names neither the governing scenario nor a sheet', () => {
    const { items, step } = unseenState(of, at([]));
    expect(step).toBe('reading');
    expect(items.map((item) => item.quantity)).toEqual([
      'mawp',
      'design-temperature',
      'set',
      'letter',
      'back-pressure-source',
      'governing-scenario',
      'phase',
    ]);
    expect(items.find((item) => item.quantity === 'governing-scenario')?.label).toBe(
      'Which scenario governs group G1',
    );
    expect(JSON.stringify(items.map((item) => item.label))).not.toMatch(/valve-open|size:/);
  });
  it('then the readings behind the chosen scenario, then its figures, then the reveal', () => {
    const chosen = enter([]);
    const second = unseenState(of, at(chosen));
    expect(second.step).toBe('reading');
    expect(second.mayEnter.map((item) => item.scope)).toEqual([
      'sources/src1/valve/coefficient',
      'fluids/f1/M',
    ]);
    const read = enter(chosen);
    const third = unseenState(of, at(read));
    expect(third.step).toBe('figure');
    expect(third.mayEnter.map((item) => item.quantity)).toEqual([
      'limit-pressure',
      'p1',
      'load',
      'required-area',
    ]);
    const all = enter(read);
    expect(unseenState(of, at(all))).toMatchObject({ step: 'reveal', missing: [], revealed: false });
    expect(unseenState(of, at(all, [reveal]))).toMatchObject({ step: 'done', revealed: true });
  });
  it('adds the originator’s governing sheet when the checker chose another', () => {
    const bend = { 'groups/g1#governing': { word: 'fire-wetted' } };
    const own = enter(enter(enter([], bend)));
    const added = unseenState(of, at(own)).missing.map((item) => item.scope);
    expect(added).toContain('sheets/size:inlet-control-valve-open/a1#A_required');
    const all = enter(enter(own));
    expect(unseenState(of, at(all)).step).toBe('reveal');
    const apart = unseenDifferences(of, at(all, [reveal])).filter((each) => !each.compared.within);
    expect(apart.map((each) => each.item.quantity)).toEqual(['governing-scenario']);
  });
  it('must be worked again when the originator’s value moved after the reveal', () => {
    const all = enter(enter(enter([])));
    const moved = documentFacts({
      evaluation: evaluation(2300, 'later'),
      baseEvaluation: evaluation(1900, 'before'),
    });
    expect(unseenState(moved, at(all, [reveal])).missing.map((item) => item.quantity)).toEqual([
      'required-area',
    ]);
    expect(unseenState(moved, at(all)).missing).toEqual([]);
  });
  it('asks nothing of a group that did not change, and all of a revalidation', () => {
    const still = documentFacts();
    expect(unseenState(still, at([])).items).toEqual([]);
    expect(
      unseenState(still, { ...at([]), case: aCase({ class: 'revalidation' }) }).items.length,
    ).toBeGreaterThan(0);
  });
  it('keeps the view hidden from nomination until all is entered and revealed', () => {
    const all = enter(enter(enter([])));
    expect(unseenLeft(at([], [], 'scenarios'))).toBe(true);
    expect(unseenLeft(at(all.slice(1)))).toBe(true);
    expect(unseenLeft(at(all))).toBe(true);
    expect(unseenLeft(at(all, [reveal]))).toBe(false);
    expect(unseenLeft(at([], [], 'approval'))).toBe(false);
    expect(unseenLeft({ ...at([], [], 'scenarios'), documents: [documentFacts()] })).toBe(true);
  });
});

/* Tolerances: the defaults of the product by quantity; common practice, no published source. */
const within = (
  quantity: string,
  mine: ReturnType<typeof q> | string,
  theirs: ReturnType<typeof q> | string,
  more = {},
) => compareUnseen({ quantity, label: quantity, mine, theirs, ...more }).within;
const barometer = { context: { barometer: q(1.01325, 'bar_abs') } };

describe('tolerances', () => {
  it.each([
    ['load', q(9450, 'kg/h'), q(9000, 'kg/h'), true],
    ['load', q(9460, 'kg/h'), q(9000, 'kg/h'), false],
    ['load-judgement', q(9880, 'kg/h'), q(9000, 'kg/h'), true],
    ['load-judgement', q(9910, 'kg/h'), q(9000, 'kg/h'), false],
    ['required-area', q(2236, 'mm2'), q(2130, 'mm2'), true],
    ['required-area', q(2240, 'mm2'), q(2130, 'mm2'), false],
    ['molar-mass', q(44.9, 'kg/kmol'), q(44.1, 'kg/kmol'), true],
    ['molar-mass', q(45.1, 'kg/kmol'), q(44.1, 'kg/kmol'), false],
    ['z', q(0.9, '-'), q(0.915, '-'), true],
    ['z', q(0.89, '-'), q(0.915, '-'), false],
    ['relieving-temperature', q(137.9, 'degC'), q(135, 'degC'), true],
    ['relieving-temperature', q(411.3, 'K'), q(135, 'degC'), false],
    ['latent-heat', q(315, 'kJ/kg'), q(300, 'kJ/kg'), true],
    ['latent-heat', q(316, 'kJ/kg'), q(300, 'kJ/kg'), false],
    ['kb', q(0.9, '-'), q(0.925, '-'), true],
    ['kb', q(0.9, '-'), q(0.935, '-'), false],
    ['cdtp', q(5.12, 'bar_g'), q(5.1, 'bar_g'), true],
    ['cdtp', q(5.0, 'bar_g'), q(5.1, 'bar_g'), false],
  ] as const)('%s: %o against %o is %s', (quantity, mine, theirs, expected) =>
    expect(within(quantity, mine, theirs)).toBe(expected),
  );
  it('takes words as they are, and readings to half a printed digit in any unit', () => {
    expect(within('letter', 'm', 'M')).toBe(true);
    expect(within('letter', 'N', 'M')).toBe(false);
    expect(within('set', { ...q(10, 'bar_g'), text: '10.0' }, { ...q(10, 'bar_g'), text: '10.0' })).toBe(
      true,
    );
    expect(within('set', { ...q(10.1, 'bar_g'), text: '10.1' }, { ...q(10, 'bar_g'), text: '10.00' })).toBe(
      false,
    );
    expect(within('mawp', q(145, 'psig'), { ...q(10, 'bar_g'), text: '10.0' })).toBe(true);
  });
  it('gives the inlet line 0.3 points of set or 15 % of it, the larger', () => {
    const set = { set: q(10, 'bar_g') };
    expect(within('inlet-loss', q(0.129, 'bar'), q(0.1, 'bar'), set)).toBe(true);
    expect(within('inlet-loss', q(0.132, 'bar'), q(0.1, 'bar'), set)).toBe(false);
    expect(within('inlet-loss', q(0.228, 'bar'), q(0.2, 'bar'), set)).toBe(true);
    expect(within('inlet-loss', q(1.78, '%'), q(1.5, '%'), set)).toBe(true);
  });
  it('never agrees across a limit, whatever the difference', () => {
    const limit = { limit: q(2323, 'mm2') };
    expect(within('required-area', q(2300, 'mm2'), q(2310, 'mm2'), limit)).toBe(true);
    expect(
      compareUnseen({
        quantity: 'required-area',
        label: 'area',
        mine: q(2340, 'mm2'),
        theirs: q(2310, 'mm2'),
        ...limit,
      }),
    ).toMatchObject({ within: false, acrossLimit: true });
  });
  it('ties gauge to absolute by the barometer only', () => {
    expect(within('p1', q(11, 'bar_g'), q(12.013, 'bar_abs'), barometer)).toBe(true);
    expect(within('p1', q(11, 'bar_g'), q(12.013, 'bar_abs'))).toBe(false);
    expect(within('p1', q(11, 'bar_g'), q(9000, 'kg/h'))).toBe(false);
  });
  it('may be tightened at will, and widened to twice and no further', () => {
    expect(toleranceOf('load', 5)).toEqual({ kind: 'rel', share: 0.1 });
    expect(toleranceOf('load', 0.5)).toEqual({ kind: 'rel', share: 0.025 });
    expect(toleranceOf('no-such-quantity')).toEqual({ kind: 'equal' });
  });
  it('sees figures that are the originator’s to all digits', () => {
    expect(isIdentical(q(13909.6, 'kg/h'), q(13909.6, 'kg/h'))).toBe(true);
    expect(isIdentical(q(13910, 'kg/h'), q(13909.6, 'kg/h'))).toBe(true);
    expect(isIdentical(q(13890, 'kg/h'), q(13909.6, 'kg/h'))).toBe(false);
    expect(isIdentical({ ...q(11, 'bar_g'), text: '11.0' }, q(11, 'bar_g'))).toBe(false);
    expect(
      identicalShare([
        { mine: q(1, 'm'), identical: true },
        { mine: q(1, 'm'), identical: false },
        { mine: 'M', identical: false },
      ]),
    ).toBe(0.5);
  });
});
