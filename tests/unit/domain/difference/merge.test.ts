/* Three-way merge: its laws, its conflicts, its orders. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { applyOps, getAt, type Basis, type Op } from '@domain/basis';
import { difference, merge3 } from '@domain/difference';
import { sample } from '../basis/sample';

const SET = 'reliefPoints/rp_a/set';
const bar = (value: number) => ({ value, unit: 'bar_g' });
const water = (id: string) => ({ id, name: `Water ${id}`, phase: 'liquid', from: { kind: 'water' } });

function changed(ops: readonly Op[]): Basis {
  return ops.reduce((basis, op) => {
    const next = applyOps(basis, [op]);
    return next.ok ? next.value : basis;
  }, sample());
}

const anOp: fc.Arbitrary<Op> = fc.constantFrom<Op>(
  { op: 'set', path: SET, value: bar(3.1) },
  { op: 'set', path: SET, value: bar(3.2) },
  { op: 'remove', path: 'reliefPoints/rp_a/blowdown' },
  { op: 'set', path: 'reliefPoints/rp_a/blowdown', value: { value: 0.1, unit: 'fraction' } },
  { op: 'remove', path: 'reliefPoints/rp_b' },
  { op: 'set', path: 'reliefPoints/rp_b/maker', value: 'Works shop' },
  { op: 'move', path: 'reliefPoints/rp_b', value: null },
  { op: 'add', path: 'fluids', value: water('fl_8') },
  { op: 'add', path: 'fluids', value: water('fl_9') },
  { op: 'remove', path: 'scenarios/cooling-water-loss' },
  { op: 'set', path: 'scenarios/cooling-water-loss/answers/ans_1/load', value: { by: 'none' } },
  { op: 'set', path: 'lines/ln_1/path', value: ['sg_2', 'sg_1'] },
);
const someOps = fc.array(anOp, { maxLength: 6 });
const QUICK = { numRuns: 40 };

describe('merge3, its laws', () => {
  it('one side alone is taken whole', () => {
    fc.assert(
      fc.property(someOps, (ops) => {
        const ours = changed(ops);
        expect(merge3(sample(), ours, sample())).toEqual({ merged: ours, conflicts: [] });
        expect(merge3(sample(), sample(), ours)).toEqual({ merged: ours, conflicts: [] });
      }),
      QUICK,
    );
  });

  it('the same change on both sides is one', () => {
    fc.assert(
      fc.property(someOps, (ops) => {
        const both = changed(ops);
        expect(merge3(sample(), both, structuredClone(both))).toEqual({ merged: both, conflicts: [] });
      }),
      QUICK,
    );
  });

  it('finds the same conflicts from either side, and without one the same document', () => {
    fc.assert(
      fc.property(someOps, someOps, (one, other) => {
        const [ours, theirs] = [changed(one), changed(other)];
        const here = merge3(sample(), ours, theirs);
        const there = merge3(sample(), theirs, ours);
        const paths = (conflicts: { path: string }[]) => conflicts.map(({ path }) => path).sort();
        expect(paths(here.conflicts)).toEqual(paths(there.conflicts));
        if (here.conflicts.length > 0) return;
        const left = difference(here.merged, there.merged).filter(({ kind }) => kind !== 'order');
        expect(left).toEqual([]);
      }),
      QUICK,
    );
  });

  it('loses no change: each is in the merged document or in a conflict', () => {
    fc.assert(
      fc.property(someOps, someOps, (one, other) => {
        const theirs = changed(other);
        const { merged, conflicts } = merge3(sample(), changed(one), theirs);
        for (const { path, now } of difference(sample(), theirs).filter(({ kind }) => kind !== 'order')) {
          const told = conflicts.some(
            (conflict) => path.startsWith(conflict.path) || conflict.path.startsWith(path),
          );
          if (!told) expect(getAt(merged, path)).toEqual(now);
        }
      }),
      QUICK,
    );
  });
});

describe('merge3, conflicts', () => {
  it('takes changes in different places together', () => {
    const ours = changed([{ op: 'set', path: SET, value: bar(3.1) }]);
    const theirs = changed([{ op: 'set', path: 'reliefPoints/rp_a/maker', value: 'Works shop' }]);
    const { merged, conflicts } = merge3(sample(), ours, theirs);
    expect(conflicts).toEqual([]);
    expect(merged.reliefPoints[0]).toMatchObject({ set: bar(3.1), maker: 'Works shop' });
  });

  it('shows change against change with both sides and keeps ours meanwhile', () => {
    const ours = changed([{ op: 'set', path: SET, value: bar(3.1) }]);
    const theirs = changed([{ op: 'set', path: SET, value: bar(3.2) }]);
    const { merged, conflicts } = merge3(sample(), ours, theirs);
    expect(conflicts).toMatchObject([
      {
        path: SET,
        kind: 'change',
        label: 'PSV-101A, set pressure',
        base: { value: 3.5 },
        ours: bar(3.1),
        theirs: bar(3.2),
      },
    ]);
    expect(getAt(merged, SET)).toEqual(bar(3.1));
  });

  it('shows change against removal', () => {
    const removed = changed([{ op: 'remove', path: 'reliefPoints/rp_b' }]);
    const moved = changed([{ op: 'set', path: 'reliefPoints/rp_b/maker', value: 'Works shop' }]);
    expect(merge3(sample(), removed, moved).conflicts).toMatchObject([
      { path: 'reliefPoints/rp_b', kind: 'removal', label: 'PSV-101B' },
    ]);
    expect(merge3(sample(), moved, removed).merged.reliefPoints).toHaveLength(2);
  });

  it('shows order against order, and takes one order with what the other side added', () => {
    const path = 'reliefPoints/rp_c';
    const third: Op = {
      op: 'add',
      path: 'reliefPoints',
      value: { ...sample().reliefPoints[0], id: 'rp_c', tag: 'PSV-101C' },
    };
    const base = changed([third]);
    const move = (ops: Op[]) => {
      const next = applyOps(base, ops);
      if (!next.ok) throw new Error(next.problem.detail);
      return next.value;
    };
    const first = move([{ op: 'move', path, value: null }]);
    const middle = move([{ op: 'move', path, value: 'rp_a' }]);
    expect(merge3(base, first, middle).conflicts).toMatchObject([
      {
        path: 'reliefPoints',
        kind: 'order',
        ours: ['rp_c', 'rp_a', 'rp_b'],
        theirs: ['rp_a', 'rp_c', 'rp_b'],
      },
    ]);
    const swapped = changed([{ op: 'move', path: 'reliefPoints/rp_b', value: null }]);
    const { merged, conflicts } = merge3(sample(), base, swapped);
    expect(conflicts).toEqual([]);
    expect(merged.reliefPoints.map(({ id }) => id)).toEqual(['rp_b', 'rp_c', 'rp_a']);
  });

  it('shows two ways of having a load as one conflict', () => {
    const path = 'scenarios/cooling-water-loss/answers/ans_1/load';
    const ours = changed([{ op: 'set', path, value: { by: 'none' } }]);
    const theirs = changed([{ op: 'set', path: `${path}/figure`, value: { value: 9900, unit: 'kg/h' } }]);
    expect(merge3(sample(), ours, theirs).conflicts).toMatchObject([{ path, kind: 'change' }]);
  });
});
