/* Many cases at once: shapes, units wanted, and what is wrong said case by case. */
import { describe, expect, it } from 'vitest';
import { casesOf, workCase } from '@engine/calc';

const LETTER = { id: 'l', topic: 'i.api526-letters', inputs: { A_required: { value: 100, unit: 'mm2' } } };
/** API 520-1 Example 1 as quoted in the docstring of fluids/safety_valve.py (CalebBell/fluids): 3 699 mm². */
const GAS = {
  id: 'gas',
  topic: 'a.gas',
  inputs: {
    W: { value: 24270, unit: 'kg/h' },
    T: { value: 348, unit: 'K' },
    Z: { value: 0.9, unit: '-' },
    M: { value: 51, unit: 'kg/kmol' },
    k: { value: 1.11, unit: '-' },
    P1: { value: 670, unit: 'kPa_abs' },
  },
};

describe('a case', () => {
  it('is answered in the units wanted, wanted outputs first', () => {
    const result = workCase({ ...GAS, want: { A_required: 'in2', P1: 'psig' } });
    expect(result.error).toBeUndefined();
    expect(Object.keys(result.outputs).slice(0, 2)).toEqual(['A_required', 'P1']);
    expect(Number(result.outputs['A_required']?.value) * 645.16).toBeCloseTo(3699.05, 0);
    // 670 kPa_abs = 97.175 psia; less 14.7 psia, the convention of psi.
    expect(result.outputs['P1']).toMatchObject({ unit: 'psig' });
    expect(Number(result.outputs['P1']?.value)).toBeCloseTo(82.475, 2);
    expect(result.outputs['regime']).toEqual({ value: 'critical', unit: '-' });
  });

  it('takes the units of `expected` and never its values', () => {
    const one = workCase({ ...GAS, expected: { A_required: { value: 1, unit: 'cm2', rel_tol: 0 } } });
    const other = workCase({ ...GAS, expected: { A_required: { value: 'x', unit: 'cm2' } } });
    expect(one).toEqual(other);
    expect(Number(one.outputs['A_required']?.value)).toBeCloseTo(36.99, 1);
  });

  it('takes a unit in the spelling of a print, and says which it was not able to take', () => {
    const P1 = { value: 670, unit: 'kPa abs' };
    const result = workCase({ ...GAS, inputs: { ...GAS.inputs, P1 }, want: { A_required: 'mm2' } });
    expect(Number(result.outputs['A_required']?.value)).toBeCloseTo(3699.05, 0);
    const stone = workCase({ ...GAS, inputs: { ...GAS.inputs, W: { value: 1, unit: 'stone' } } });
    expect(stone).toMatchObject({ outputs: {}, error: { code: 'WRONG_UNIT', field: 'W' } });
  });

  it('says what is missing, and keeps the results that stand', () => {
    const result = workCase({ ...GAS, want: { A_required: 'kg/h', F2: '-' } });
    expect(result.error).toMatchObject({ code: 'WRONG_UNIT', field: 'A_required' });
    expect(result.outputs['A_required']).toMatchObject({ unit: 'mm2' });
    expect(workCase({ ...GAS, want: { F2: '-' } }).error).toMatchObject({
      code: 'OUTPUT_MISSING',
      field: 'F2',
    });
  });

  it('adds the steps only when they are asked for', () => {
    expect(workCase(GAS).steps).toBeUndefined();
    expect(workCase(GAS, { sheet: true }).steps?.length).toBeGreaterThan(2);
  });

  it.each([
    [null, 'CASE_MALFORMED', 'cases'],
    [[], 'CASE_MALFORMED', 'cases'],
    ['a.gas', 'CASE_MALFORMED', 'cases'],
    [{}, 'REQUEST_MALFORMED', 'topic'],
    [{ id: 1, topic: 'constructor', inputs: {} }, 'METHOD_UNKNOWN', 'topic'],
    [{ id: 1, topic: 'a.gas' }, 'REQUEST_MALFORMED', 'inputs'],
    [{ id: 1, topic: 'a.gas', inputs: { W: 3 } }, 'REQUEST_MALFORMED', 'W'],
    [{ id: 1, topic: 'a.gas', inputs: { W: { value: null, unit: 'kg/h' } } }, 'NOT_A_NUMBER', 'W'],
    [{ id: 1, topic: 'a.gas', inputs: { W: { value: 1, unit: '__proto__' } } }, 'WRONG_UNIT', 'W'],
    [{ ...LETTER, want: ['mm2'] }, 'CASE_MALFORMED', 'want'],
    [{ ...LETTER, want: { letter: 3 } }, 'CASE_MALFORMED', 'letter'],
    [{ ...LETTER, want: { constructor: '-' } }, 'OUTPUT_MISSING', 'constructor'],
  ])('%j is answered with %s about %s', (given, code, field) => {
    const { error } = workCase(given);
    expect(error).toMatchObject({ code, field });
    expect(error?.message).toMatch(/\w/);
  });
});

describe('a document', () => {
  it('must hold a list of cases', () => {
    expect(casesOf({ cases: [1] })).toEqual({ cases: [1] });
    for (const wrong of [null, 3, [], {}, { cases: {} }]) expect(casesOf(wrong)).toHaveProperty('wrong');
  });
});
