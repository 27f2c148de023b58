/* Groups, back pressure and the evaluation as a whole, on the small basis. */
import { describe, expect, it } from 'vitest';
import { type Basis } from '@domain/basis';
import { evaluate, type ImportSet, NO_IMPORTS } from '@domain/evaluate';
import { basisWith, evaluated, first, RULES, smallBasis } from '../../../fixtures/basis';

const HEAT = 'abnormal-heat-input/an_1';
const FIRE = 'fire-wetted/an_1';

function scenario(basis: Basis, key: string) {
  const found = basis.scenarios.find((one) => one.key === key);
  if (!found) throw new Error(`no scenario ${key}`);
  return found;
}

function answer(basis: Basis, key: string) {
  return first(scenario(basis, key).answers);
}

function heat(basis: Basis, kW: number): void {
  answer(basis, 'abnormal-heat-input').load = {
    by: 'method',
    method: 'f.vaporisation',
    inputs: { Q: { value: kW, unit: 'kW' } },
  };
}

describe('groups', () => {
  it('credits members in service only', () => {
    const basis = basisWith((one) => {
      one.reliefPoints.push({
        ...structuredClone(first(one.reliefPoints)),
        id: 'rp_2',
        tag: 'PSV-2',
        service: 'spare',
      });
      first(one.groups).members.push({ id: 'mb_2', point: 'rp_2', credited: true, place: 'spare' });
    });
    expect(evaluated(basis).figures['groups/gr_1#installed']).toEqual({
      value: expect.closeTo(1841, 6) as number,
      unit: 'mm2',
    });
  });

  it('gives a tie to the earlier scenario of the standard list', () => {
    const basis = basisWith((one) => {
      const later = scenario(one, 'vacuum');
      later.disposition = 'credible';
      later.answers = structuredClone(scenario(one, 'abnormal-heat-input').answers);
      one.scenarios = [later, ...one.scenarios.filter((item) => item !== later)];
    });
    expect(evaluated(basis).groups['gr_1']?.governing).toBe(`size:${HEAT}`);
  });

  it('is not sized while one credible answer is not', () => {
    const basis = basisWith((one) => void (answer(one, 'fire-wetted').size = { by: 'none' }));
    expect(evaluated(basis).groups['gr_1']?.verdict).toBe('not-sized');
  });
});

describe('back pressure', () => {
  const header: ImportSet = {
    headers: {
      doc_h: {
        revision: 1,
        network: [],
        normal: { value: 1.02, unit: 'bar_abs' },
        causes: { cw: { at: { value: 1.5, unit: 'bar_abs' }, flow: { value: 1, unit: 'kg/h' } } },
      },
    },
    loads: {},
  };

  it('takes the worst common cause of the header that the outlet ends in', () => {
    const basis = basisWith(
      (one) =>
        void one.lines.push({
          id: 'ln_1',
          point: 'rp_1',
          side: 'outlet',
          path: [],
          end: { to: 'header', header: 'doc_h' },
        }),
    );
    const p2 = evaluated(basis, { imports: header }).sheets[`size:${HEAT}`]?.inputs['P2'];
    expect(p2).toEqual({ value: expect.closeTo(150, 9) as number, unit: 'kPa_abs' });
  });

  it('takes what an outlet sheet of the relief point says first', () => {
    const basis = basisWith((one) => {
      one.externalSheets.push({
        id: 'xs_o',
        about: 'outlet',
        title: 'Outlet',
        author: 'A. Person',
        method: 'g.outlet-isothermal',
        inputs: { point: { list: ['rp_1'] } },
        figures: { P2: { value: 1.3, unit: 'bar_abs' }, built_up_back_pressure: { value: 0.2, unit: 'bar' } },
      });
    });
    const evaluation = evaluated(basis);
    expect(evaluation.sheets[`size:${HEAT}`]?.inputs['P2']).toEqual({
      value: expect.closeTo(130, 9) as number,
      unit: 'kPa_abs',
    });
    expect(evaluation.points['rp_1']?.builtUp).toEqual({ value: 0.2, unit: 'bar' });
  });
});

describe('the evaluation as a whole', () => {
  it('is deterministic, whatever the order of keys in the document', () => {
    const basis = smallBasis();
    const reversed = Object.fromEntries(Object.entries(smallBasis()).reverse()) as Basis;
    expect(evaluate(reversed, RULES, NO_IMPORTS)).toEqual(evaluate(basis, RULES, NO_IMPORTS));
  });

  it('keeps the hash of every sheet that a change does not reach', () => {
    const before = evaluated(smallBasis()).sheets;
    const after = evaluated(basisWith((basis) => heat(basis, 950))).sheets;
    expect(after[`load:${HEAT}`]?.hash).not.toBe(before[`load:${HEAT}`]?.hash);
    expect(after[`size:${HEAT}`]?.hash).not.toBe(before[`size:${HEAT}`]?.hash);
    expect(after[`size:${FIRE}`]?.hash).toBe(before[`size:${FIRE}`]?.hash);
    expect(after[`limit:${HEAT}`]?.hash).toBe(before[`limit:${HEAT}`]?.hash);
  });

  it('does not move a hash beyond nine digits', () => {
    const before = evaluated(basisWith((basis) => heat(basis, 900))).sheets[`load:${HEAT}`]?.hash;
    expect(evaluated(basisWith((basis) => heat(basis, 900 * (1 + 1e-12)))).sheets[`load:${HEAT}`]?.hash).toBe(
      before,
    );
  });

  it('leaves the document as it was', () => {
    const basis = smallBasis();
    const copy = structuredClone(basis);
    evaluated(basis);
    expect(basis).toEqual(copy);
  });
});
