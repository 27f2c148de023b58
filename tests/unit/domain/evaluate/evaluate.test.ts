/* evaluate on the small basis, against numbers worked by hand from the published equations. */
import { describe, expect, it } from 'vitest';
import { type Basis } from '@domain/basis';
import { type Sheet } from '@domain/evaluate';
import { type Q } from '@engine/quantity';
import { basisWith, evaluated, first, smallBasis } from '../../../fixtures/basis';

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

function out(sheet: Sheet | undefined, name: string): Q {
  const value = sheet?.outputs[name];
  if (typeof value !== 'object')
    throw new Error(
      `no ${name} on ${sheet?.key ?? 'a sheet that is not there'}: ${sheet?.refused?.text ?? ''}`,
    );
  return value;
}

describe('limits', () => {
  // ASME VIII-1 UG-125(c) (from memory): one device max(110 %, + 20 kPa); MAWP 3.5 barg → 3.85 barg; + 1.01325 bar = 4.86325 bara.
  it('takes 110 % of MAWP for one device, and its absolute pressure', () => {
    const sheet = evaluated(smallBasis()).sheets[`limit:${HEAT}`];
    expect(out(sheet, 'MAAP')).toEqual({ value: expect.closeTo(3.85, 9) as number, unit: 'bar_g' });
    expect(out(sheet, 'P1')).toEqual({ value: expect.closeTo(4.86325, 9) as number, unit: 'bar_abs' });
    expect(out(sheet, 'overpressure').value).toBeCloseTo(0.1, 9);
  });

  // Same clause: fire 121 % → 4.235 barg.
  it('takes 121 % in fire', () => {
    expect(out(evaluated(smallBasis()).sheets[`limit:${FIRE}`], 'MAAP').value).toBeCloseTo(4.235, 9);
  });

  // Same clause, floor in SI: MAWP 1.0 barg → max(1.10, 1.0 + 0.20) = 1.20 barg; in US units 14.5 psig → 14.5 + 3 = 17.5 psig.
  it('takes the floor at low pressure, in the units of the code', () => {
    const si = basisWith((basis) => {
      first(first(first(basis.equipment).sides).ratings).mawp = { value: 1, unit: 'bar_g' };
      first(basis.reliefPoints).set = { value: 1, unit: 'bar_g' };
    });
    expect(out(evaluated(si).sheets[`limit:${HEAT}`], 'MAAP').value).toBeCloseTo(1.2, 9);
    const us = basisWith((basis) => {
      const side = first(first(basis.equipment).sides);
      side.code = { basis: 'asme-viii-1', units: 'US' };
      first(side.ratings).mawp = { value: 14.5, unit: 'psig' };
      first(basis.reliefPoints).set = { value: 14.5, unit: 'psig' };
    });
    expect(out(evaluated(us).sheets[`limit:${HEAT}`], 'MAAP')).toEqual({
      value: expect.closeTo(17.5, 9) as number,
      unit: 'psig',
    });
  });

  // Relieving pressure: the lower of MAAP and the class factor on the highest set: set 3.0 barg → 3.3 barg, below 3.85 barg.
  it('relieves at the class factor on the set pressure where that is lower', () => {
    const basis = basisWith((one) => void (first(one.reliefPoints).set = { value: 3, unit: 'bar_g' }));
    expect(out(evaluated(basis).sheets[`limit:${HEAT}`], 'relieving_pressure').value).toBeCloseTo(3.3, 9);
  });

  // PED 2014/68/EU Annex I 7.3 (from memory): 110 % of PS and no floor: PS 1.0 barg → 1.10 barg.
  it('takes 110 % of PS without a floor under EN', () => {
    const basis = basisWith((one) => {
      const side = first(first(one.equipment).sides);
      side.code = { basis: 'en', units: 'SI' };
      first(side.ratings).mawp = { value: 1, unit: 'bar_g' };
      first(one.reliefPoints).set = { value: 1, unit: 'bar_g' };
    });
    expect(out(evaluated(basis).sheets[`limit:${HEAT}`], 'MAAP').value).toBeCloseTo(1.1, 9);
  });

  it('says in a sentence that a MAWP is missing, and sizes nothing on it', () => {
    const basis = basisWith((one) => void (first(first(one.equipment).sides).ratings = []));
    const evaluation = evaluated(basis);
    expect(evaluation.sheets[`size:${HEAT}`]?.refused?.text).toContain('C-1 has no MAWP');
    expect(evaluation.groups['gr_1']).toEqual({ verdict: 'not-sized' });
  });
});

describe('loads and sizes', () => {
  // W = Q/λ = 900 kW · 3600 / 430 kJ/kg = 7 534.88 kg/h.
  // API 520-1 critical gas: C = 0.03948 √(k (2/(k+1))^((k+1)/(k−1))) = 0.0248077 at k = 1.1;
  // A = W/(C Kd P1) √(TZ/M) = 7 534.88/(0.0248077 · 0.975 · 486.325) · √(383.15 · 0.87/58.08) = 1 534.6 mm².
  it('sizes a W = Q/λ load', () => {
    const { sheets, groups } = evaluated(smallBasis());
    expect(out(sheets[`load:${HEAT}`], 'relief_load').value).toBeCloseTo(7534.884, 2);
    expect(out(sheets[`size:${HEAT}`], 'A_required').value).toBeCloseTo(1534.6, 0);
    // Use = 1 534.58 / 1 841 mm² (letter L, API 526) = 0.83356.
    expect(groups['gr_1']).toEqual({
      governing: `size:${HEAT}`,
      use: expect.closeTo(0.83356, 4) as number,
      verdict: 'adequate',
    });
  });

  // API 521: A_w = π · 1.6 · 2.0 + 1.084 · 1.6² (2:1 head) = 12.83 m²; Q = 43 200 · 12.83^0.82 = 350.1 kW; W = 2 931 kg/h;
  // P1 = 524.825 kPa; A = 2 931/(0.0248077 · 0.975 · 524.825) · 2.39569 = 553.1 mm².
  it('sizes a pool fire with the vessel taken from the equipment', () => {
    const { sheets } = evaluated(smallBasis());
    expect(out(sheets[`load:${FIRE}`], 'wetted_area').value).toBeCloseTo(12.83, 2);
    expect(out(sheets[`load:${FIRE}`], 'relief_load').value).toBeCloseTo(2931, 0);
    expect(out(sheets[`size:${FIRE}`], 'A_required').value).toBeCloseTo(553.1, 0);
  });

  it('says where every input came from', () => {
    const { from } = evaluated(smallBasis()).sheets[`size:${HEAT}`] ?? { from: {} };
    expect(from).toMatchObject({
      W: `sheets/load:${HEAT}#relief_load`,
      P1: `sheets/limit:${HEAT}#P1`,
      T: 'fluids/fl_v/T',
      Kd: 'method default',
      Kc: 'reliefPoints/rp_1/k/kc',
      P2: 'site/barometer',
    });
  });

  it('lets an entered input win', () => {
    const basis = basisWith((one) => {
      answer(one, 'abnormal-heat-input').size = {
        by: 'method',
        method: 'a.gas',
        inputs: { Kd: { value: 0.9, unit: '-' } },
      };
    });
    const sheet = evaluated(basis).sheets[`size:${HEAT}`];
    // The area grows as 1/Kd: 1 534.58 · 0.975/0.9 = 1 662.5 mm².
    expect(out(sheet, 'A_required').value).toBeCloseTo(1662.5, 0);
    expect(sheet?.from['Kd']).toBe('scenarios/abnormal-heat-input/answers/an_1/size/inputs/Kd');
  });

  // Verdicts: the area is proportional to the heat. 1 000 kW → 0.9262 marginal; 1 200 kW → 1.1114 inadequate.
  it.each([
    [1000, 'marginal', 0.9262],
    [1200, 'inadequate', 1.1114],
  ])('%d kW is %s', (kW, verdict, use) => {
    const group = evaluated(basisWith((basis) => heat(basis, kW))).groups['gr_1'];
    expect(group?.verdict).toBe(verdict);
    expect(group?.use).toBeCloseTo(use, 3);
  });

  it('takes a stated load, a sum of loads, and refuses a circle', () => {
    const basis = basisWith((one) => {
      answer(one, 'fire-wetted').load = { by: 'given', figure: { value: 1000, unit: 'kg/h' } };
      answer(one, 'abnormal-heat-input').load = { by: 'sum', of: [FIRE, FIRE] };
    });
    expect(out(evaluated(basis).sheets[`load:${HEAT}`], 'relief_load').value).toBeCloseTo(2000, 9);
    answer(basis, 'fire-wetted').load = { by: 'sum', of: [HEAT] };
    expect(evaluated(basis).sheets[`load:${HEAT}`]?.refused).toBeDefined();
  });

  it('takes load and area of external sheets, areas of one kind only', () => {
    const basis = basisWith((one) => {
      one.externalSheets.push({
        id: 'xs_1',
        about: 'size',
        title: 'Sizing',
        author: 'A. Person',
        method: 'i.iso4126-gas',
        inputs: {},
        figures: { A_required: { value: 1679.2, unit: 'mm2' } },
      });
      answer(one, 'abnormal-heat-input').size = { by: 'external', sheet: 'xs_1' };
    });
    const { figures } = evaluated(basis);
    // Topic i ends in an actual area: 1 679.2 of 2 099 mm² = 0.8.
    expect(figures[`sheets/size:${HEAT}#area_kind`]).toBe('actual');
    expect(figures[`sheets/size:${HEAT}#use`]).toEqual({
      value: expect.closeTo(0.8, 9) as number,
      unit: '-',
    });
  });

  it('does not size by a method that it does not have, and says so', () => {
    const basis = basisWith((one) => {
      answer(one, 'abnormal-heat-input').size = { by: 'method', method: 'z.unknown', inputs: {} };
    });
    const evaluation = evaluated(basis);
    expect(evaluation.sheets[`size:${HEAT}`]?.refused?.text).toContain(
      'z.unknown is not worked by this program yet',
    );
    expect(evaluation.groups['gr_1']?.verdict).toBe('not-sized');
  });

  it('uses a figure from elsewhere in the basis, and names it', () => {
    const basis = basisWith((one) => {
      one.sources.push({
        id: 'so_1',
        tag: 'TV-1',
        kind: 'heater',
        heat: { duty: { value: 800, unit: 'kW' } },
      });
      answer(one, 'abnormal-heat-input').load = {
        by: 'method',
        method: 'f.vaporisation',
        inputs: { Q: { use: 'sources/so_1/heat/duty' } },
      };
    });
    const sheet = evaluated(basis).sheets[`load:${HEAT}`];
    expect(out(sheet, 'relief_load').value).toBeCloseTo((800 * 3600) / 430, 6);
    expect(sheet?.from['Q']).toBe('sources/so_1/heat/duty');
  });

  it('never throws on a unit that does not fit, and says what is wrong', () => {
    const basis = basisWith((one) => void (first(one.reliefPoints).set = { value: 3.5, unit: 'kg/h' }));
    const evaluation = evaluated(basis);
    expect(evaluation.groups['gr_1']?.verdict).toBe('not-sized');
  });
});
