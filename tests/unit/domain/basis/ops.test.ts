/* Ops: applied, refused, undone. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { methodById } from '@engine/catalog';
import { applyOps, canonical, getAt, invertOps, type Basis, type Op } from '@domain/basis';
import { sample } from './sample';

const SET = 'reliefPoints/rp_a/set';
const bar = (value: number) => ({ value, unit: 'bar_g' });

function applied(ops: Op[], basis: Basis = sample()): Basis {
  const result = applyOps(basis, ops);
  if (!result.ok) throw new Error(result.problem.detail);
  return result.value;
}

function refused(ops: Op[]) {
  const result = applyOps(sample(), ops);
  if (result.ok) throw new Error('was not refused');
  return result.problem;
}

describe('applyOps', () => {
  it('sets, adds, moves and removes', () => {
    const basis = sample();
    const now = applied([
      { op: 'set', path: SET, value: bar(3.2), was: getAt(basis, SET) },
      { op: 'add', path: 'assumptions', value: { id: 'as_1', text: { type: 'doc', content: [] } } },
      { op: 'move', path: 'reliefPoints/rp_b', value: null, was: 'rp_a' },
      { op: 'remove', path: 'equipment/eq_c101/levels' },
    ]);
    expect(getAt(now, SET)).toEqual(bar(3.2));
    expect(now.assumptions.map((one) => one.id)).toEqual(['as_1']);
    expect(now.reliefPoints.map((one) => one.id)).toEqual(['rp_b', 'rp_a']);
    expect(now.equipment[0]?.levels).toBeUndefined();
  });

  it('leaves the document that it was given as it is', () => {
    const basis = sample();
    applied([{ op: 'set', path: SET, value: bar(3) }], basis);
    expect(basis).toEqual(sample());
  });

  it('makes the part that an optional field stands in', () => {
    const now = applied([{ op: 'set', path: 'reliefPoints/rp_a/superimposed/max', value: bar(0.2) }]);
    expect(now.reliefPoints[0]?.superimposed).toEqual({ max: bar(0.2) });
  });

  it('answers STALE with what stands there now when it was something else', () => {
    const problem = refused([{ op: 'set', path: SET, value: bar(3), was: bar(9) }]);
    expect(problem.code).toBe('STALE');
    expect(problem.detail).toBe('PSV-101A, set pressure has changed since you read it.');
    expect(problem.present).toMatchObject({ value: 3.5, unit: 'bar_g' });
  });

  it('compares what it was by content, not by the order of keys', () => {
    const was = {
      unit: 'bar_g',
      origin: { ref: 'Vessel drawing 101-D-010 rev 4', kind: 'drawing' },
      value: 3.5,
    };
    expect(getAt(applied([{ op: 'set', path: SET, value: bar(3), was }]), SET)).toEqual(bar(3));
  });

  it('answers STALE for an element that is gone, and for one that was to be absent', () => {
    expect(refused([{ op: 'set', path: 'reliefPoints/rp_z/set', value: bar(3) }]).code).toBe('STALE');
    expect(refused([{ op: 'remove', path: 'reliefPoints/rp_z' }]).code).toBe('STALE');
    expect(refused([{ op: 'set', path: SET, value: bar(3), was: null }]).code).toBe('STALE');
    expect(refused([{ op: 'move', path: 'reliefPoints/rp_a', value: 'rp_z' }]).code).toBe('STALE');
  });

  it('answers SCHEMA with the path and a sentence', () => {
    const problem = refused([{ op: 'set', path: 'reliefPoints/rp_a/duty', value: 'plasma' }]);
    expect(problem.code).toBe('SCHEMA');
    expect(problem.errors?.[0]).toMatchObject({
      path: 'reliefPoints/rp_a/duty',
      sentence: 'PSV-101A, duty should be one of: gas, steam, liquid, mixed.',
    });
    expect(refused([{ op: 'set', path: 'reliefPoints/rp_a', value: { id: 'rp_q' } }]).code).toBe('SCHEMA');
    expect(refused([{ op: 'add', path: 'reliefPoints', value: {} }]).code).toBe('SCHEMA');
    expect(refused([{ op: 'set', path: '__proto__/polluted', value: 1 }]).code).toBe('SCHEMA');
    expect(refused([{ op: 'set', path: 'tag/x', value: 1 }]).code).toBe('STALE');
  });

  it('refuses a figure that physics does not allow, naming the possible range in its own unit', () => {
    const problem = refused([{ op: 'set', path: 'fluids/fl_1/M', value: { value: 0.4, unit: 'lb/lbmol' } }]);
    expect(problem.code).toBe('VALUE_IMPOSSIBLE');
    expect(problem.errors?.[0]?.path).toBe('fluids/fl_1/M');
    expect(problem.detail).toMatch(
      /^Acetone vapour, molar mass 0.40* lb\/lbmol is impossible: it lies between 1 and 2.?000 lb\/lbmol\.$/,
    );
    const inside = { ...sample().equipment[0]!, id: 'eq_2', volume: { value: -1, unit: 'm3' } };
    expect(refused([{ op: 'add', path: 'equipment', value: inside }]).code).toBe('VALUE_IMPOSSIBLE');
  });

  it('knows the ranges of the inputs of a method', () => {
    const inputs = 'scenarios/cooling-water-loss/answers/ans_1/size/inputs';
    const name = methodById('a.gas')?.inputs.find((input) => input.rangeKey === 'molarMass')?.name ?? '';
    const problem = refused([
      { op: 'set', path: `${inputs}/${name}`, value: { value: 0.2, unit: 'kg/kmol' } },
    ]);
    expect(problem).toMatchObject({ code: 'VALUE_IMPOSSIBLE', errors: [{ path: `${inputs}/${name}` }] });
  });

  it('does not ask again for what stood there before', () => {
    const odd = { ...sample(), fluids: [{ ...sample().fluids[0]!, M: { value: 0.4, unit: 'kg/kmol' } }] };
    expect(applyOps(odd, [{ op: 'set', path: SET, value: bar(3) }]).ok).toBe(true);
  });
});

const anOp: fc.Arbitrary<Op> = fc.oneof(
  fc
    .double({ min: 0.2, max: 90, noNaN: true })
    .map((value): Op => ({ op: 'set', path: SET, value: bar(value) })),
  fc.constantFrom<Op>(
    { op: 'remove', path: 'reliefPoints/rp_a/blowdown' },
    { op: 'set', path: 'reliefPoints/rp_a/maker', value: 'Works shop' },
    { op: 'remove', path: 'equipment/eq_c101/levels' },
    { op: 'remove', path: 'segments/sg_1' },
    { op: 'remove', path: 'scenarios/cooling-water-loss' },
    { op: 'move', path: 'reliefPoints/rp_b', value: null },
    { op: 'move', path: 'scenarios/tube-rupture~2', value: null },
    {
      op: 'add',
      path: 'fluids',
      value: { id: 'fl_9', name: 'Water', phase: 'liquid', from: { kind: 'water' } },
    },
    { op: 'set', path: 'lines/ln_1/path', value: ['sg_2', 'sg_1'] },
    { op: 'set', path: 'scenarios/cooling-water-loss/answers/ans_1/load', value: { by: 'none' } },
  ),
);

describe('invertOps', () => {
  it('leads back, whatever was done', () => {
    const property = fc.property(fc.array(anOp, { minLength: 1, maxLength: 7 }), (ops) => {
      const basis = sample();
      const done: Op[] = [];
      let forward = basis;
      for (const op of ops) {
        const next = applyOps(forward, [op]);
        if (!next.ok) continue;
        forward = next.value;
        done.push(op);
      }
      const back = invertOps(basis, done);
      if (!back.ok) throw new Error(back.problem.detail);
      expect(canonical(applied(back.value, forward))).toBe(canonical(basis));
    });
    fc.assert(property, { numRuns: 60 });
  });

  it('puts an element back where it stood', () => {
    const basis = sample();
    const ops: Op[] = [{ op: 'remove', path: 'reliefPoints/rp_a' }];
    const back = invertOps(basis, ops);
    expect(back).toMatchObject({
      ok: true,
      value: [
        { op: 'add', path: 'reliefPoints' },
        { op: 'move', value: null },
      ],
    });
    expect(applied(back.ok ? back.value : [], applied(ops)).reliefPoints).toEqual(basis.reliefPoints);
  });

  it('fails as the ops would', () => {
    expect(invertOps(sample(), [{ op: 'remove', path: 'fluids/none' }])).toMatchObject({
      ok: false,
      problem: { code: 'STALE' },
    });
  });
});
