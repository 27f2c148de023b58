/* Differences of documents: leaves, elements, orders, words. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { applyOps, richFromText, type Basis, type Op } from '@domain/basis';
import { difference, movedResults, wordDiff } from '@domain/difference';
import type { Evaluation } from '@domain/evaluate/types';
import { largeSample, sample } from '../basis/sample';

const SET = 'reliefPoints/rp_a/set';
const origin = { kind: 'drawing', ref: 'Vessel drawing 101-D-010 rev 4' };

function changed(...ops: Op[]): Basis {
  const result = applyOps(sample(), ops);
  if (!result.ok) throw new Error(result.problem.detail);
  return result.value;
}

function kinds(ours: Basis) {
  return difference(sample(), ours).map(({ path, kind }) => `${kind} ${path}`);
}

describe('difference', () => {
  it('is empty for a document and itself', () => {
    expect(difference(sample(), sample())).toEqual([]);
    expect(difference(largeSample(), structuredClone(largeSample()))).toEqual([]);
  });

  it('takes a figure as one leaf, with its label, place, old and new', () => {
    const now = { value: 3.2, unit: 'bar_g', origin };
    expect(difference(sample(), changed({ op: 'set', path: SET, value: now }))).toEqual([
      {
        path: SET,
        label: 'PSV-101A, set pressure',
        where: 'changes#rp_a',
        kind: 'moved',
        old: { value: 3.5, unit: 'bar_g', origin },
        now,
      },
    ]);
  });

  // 1 bar = 14.503774 psi (NIST SP 811, 2008, Appendix B.8): 3.5 barg = 50.763 psig.
  it('sees the same value in another unit as no difference, another origin as one', () => {
    const psig = { value: 50.763, unit: 'psig', origin };
    expect(kinds(changed({ op: 'set', path: SET, value: psig }))).toEqual([]);
    const plate = { value: 3.5, unit: 'bar_g', origin: { kind: 'plate', ref: 'PSV-101A' } };
    expect(kinds(changed({ op: 'set', path: SET, value: plate }))).toEqual([`moved ${SET}`]);
    expect(kinds(changed({ op: 'set', path: SET, value: { ...psig, value: 51.3 } }))).toEqual([
      `moved ${SET}`,
    ]);
  });

  it('tells a small change in the same unit', () => {
    expect(kinds(changed({ op: 'set', path: SET, value: { value: 3.501, unit: 'bar_g', origin } }))).toEqual([
      `moved ${SET}`,
    ]);
  });

  it('tells added and removed elements and fields once, and orders', () => {
    const fluid = { id: 'fl_9', name: 'Water', phase: 'liquid', from: { kind: 'water' } };
    const ours = changed(
      { op: 'move', path: 'reliefPoints/rp_b', value: null },
      { op: 'add', path: 'fluids', value: fluid },
      { op: 'remove', path: 'equipment/eq_c101/levels' },
      { op: 'remove', path: 'scenarios/tube-rupture~2' },
    );
    expect(kinds(ours)).toEqual([
      'removed equipment/eq_c101/levels',
      'added fluids/fl_9',
      'order reliefPoints',
      'removed scenarios/tube-rupture~2',
    ]);
    const removed = difference(sample(), ours).at(-1);
    expect(removed?.label).toBe('Exchanger tube rupture, plate or coil break (E-102)');
  });

  it('takes a load that is had in another way as one change', () => {
    const path = 'scenarios/cooling-water-loss/answers/ans_1/size';
    expect(kinds(changed({ op: 'set', path, value: { by: 'none' } }))).toEqual([`moved ${path}`]);
  });

  it('compares texts by words', () => {
    const path = 'scenarios/cooling-water-loss/reason';
    const text = 'All vapour of both reboilers must leave when the condenser is lost.';
    const [change] = difference(sample(), changed({ op: 'set', path, value: richFromText(text) }));
    expect(
      change?.words
        ?.filter(({ kind }) => kind !== 'equal')
        .map(({ kind, text: word }) => [kind, word.trim()]),
    ).toEqual([
      ['removed', 'the reboiler'],
      ['added', 'both reboilers'],
    ]);
  });

  it('compares documents of 40 kB with 20 changes in less than 10 ms', () => {
    const base = largeSample();
    const text = richFromText('All vapour of both reboilers must leave when the condenser is lost.');
    const scenarios = base.scenarios.map((one, index) => (index < 20 ? { ...one, reason: text } : one));
    const ours = structuredClone({ ...base, scenarios });
    expect(difference(base, ours)).toHaveLength(20);
    const times = Array.from({ length: 15 }, () => {
      const from = performance.now();
      difference(base, ours);
      return performance.now() - from;
    });
    expect(Math.min(...times)).toBeLessThan(10);
  });
});

describe('wordDiff', () => {
  it('gives back both texts', () => {
    fc.assert(
      fc.property(fc.lorem(), fc.lorem(), (one, other) => {
        const parts = wordDiff(one, other);
        const join = (without: string) =>
          parts
            .filter(({ kind }) => kind !== without)
            .map(({ text }) => text)
            .join('');
        expect(join('added').replace(/\s+/g, ' ').trim()).toBe(one.replace(/\s+/g, ' ').trim());
        expect(join('removed').replace(/\s+/g, ' ').trim()).toBe(other.replace(/\s+/g, ' ').trim());
      }),
    );
  });
});

describe('movedResults', () => {
  const evaluation = (load: number, unit: string, verdict: 'adequate' | 'marginal'): Evaluation => ({
    key: '',
    engine: '',
    methods: [],
    sheets: {},
    groups: { gr_1: { verdict } },
    points: {},
    figures: { 'sheets/load:x/a#relief_load': { value: load, unit }, phase: 'gas' },
  });

  it('lists verdicts, and figures that moved by more than 0.5 %', () => {
    const before = evaluation(1000, 'kg/h', 'adequate');
    expect(movedResults(before, evaluation(1004, 'kg/h', 'adequate'))).toEqual([]);
    const moved = movedResults(before, evaluation(1010, 'kg/h', 'marginal'));
    expect(moved[0]).toEqual({ path: 'groups/gr_1', old: 'adequate', now: 'marginal', verdict: true });
    expect(moved[1]?.shift).toBeCloseTo(0.01, 12);
  });

  // 1 lb = 0.45359237 kg exactly (NIST SP 811).
  it('compares in one unit', () => {
    expect(
      movedResults(evaluation(1000, 'kg/h', 'adequate'), evaluation(1000 / 0.45359237, 'lb/h', 'adequate')),
    ).toEqual([]);
  });
});
