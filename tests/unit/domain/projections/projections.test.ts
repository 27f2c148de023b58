/* Register rows and ladder of the small basis. */
import { describe, expect, it } from 'vitest';
import { pointFacts, projectSystem } from '@domain/projections';
import { basisWith, evaluated, first, smallBasis } from '../../../fixtures/basis';

const FACTS = { siteId: 'site_1', revision: 4, ownerId: 'pe_1', stops: 1 };

function projected(basis = smallBasis()) {
  return projectSystem(basis, evaluated(basis), 'in-force', FACTS);
}

describe('projectSystem', () => {
  // Numbers as in the tests of evaluate: W = 7 534.88 kg/h = 2.09302 kg/s; A = 1 534.58 of 1 841 mm², margin 1/0.83356 − 1.
  it('makes the row of the system from its governing scenario', () => {
    expect(projected().system).toMatchObject({
      siteId: 'site_1',
      unitId: 'un_1',
      tag: 'SYS-1',
      devices: 'PSV-1',
      points: 1,
      governing: 'abnormal-heat-input',
      governingGroup: 'G1',
      loadSi: expect.closeTo(2.09302, 4) as number,
      loadUnit: 'kg/h',
      requiredSi: expect.closeTo(0.00153458, 7) as number,
      requiredUnit: 'mm2',
      installedSi: expect.closeTo(0.001841, 9) as number,
      letter: 'L',
      use: expect.closeTo(0.83356, 4) as number,
      margin: expect.closeTo(0.19967, 4) as number,
      verdict: 'adequate',
      revision: 4,
      stops: 1,
      justifies: 0,
    });
  });

  it('makes a row of each relief point, named by its axes', () => {
    expect(first(projected().points)).toMatchObject({
      elementId: 'rp_1',
      systemTag: 'SYS-1',
      equipment: 'C-1',
      kind: 'conventional',
      setSi: 350_000,
      setUnit: 'bar_g',
      letter: 'L',
      areaUnit: 'mm2',
      ratedUnit: 'kg/h',
      backSi: null,
      dischargesTo: '',
    });
  });

  it('makes a row of every scenario in the standard order, and marks the one that governs', () => {
    const { scenarios } = projected();
    expect(scenarios).toHaveLength(35);
    expect(scenarios.filter((row) => row.governs).map((row) => row.key)).toEqual(['abnormal-heat-input']);
    expect(scenarios.map((row) => row.ord)).toEqual(scenarios.map((_row, index) => index));
    expect(scenarios.find((row) => row.key === 'fire-wetted')).toMatchObject({
      disposition: 'credible',
      relievingSi: expect.closeTo(423_500, 3) as number,
      verdict: 'adequate',
    });
    expect(scenarios.find((row) => row.key === 'vacuum')).toMatchObject({
      disposition: 'not-applicable',
      use: null,
      verdict: 'not-sized',
    });
  });

  it('takes the inlet loss as a share of set and the total back pressure from external sheets', () => {
    const basis = basisWith((one) => {
      const point = { point: { list: ['rp_1'] } };
      const made = { title: 'Line', author: 'A. Person', method: 'g.inlet-loss', inputs: point };
      one.externalSheets.push({
        ...made,
        id: 'xs_i',
        about: 'inlet',
        figures: { loss: { value: 0.07, unit: 'bar' } },
      });
      one.externalSheets.push({
        ...made,
        id: 'xs_o',
        about: 'outlet',
        figures: { total_back_pressure: { value: 0.3, unit: 'bar_g' } },
      });
    });
    const row = first(projected(basis).points);
    expect(row.inletLoss).toBeCloseTo(0.02, 9);
    expect(row).toMatchObject({ backSi: expect.closeTo(30_000, 6) as number, backUnit: 'bar_g' });
  });

  it('says which scenarios a field condition supports', () => {
    const basis = basisWith((one) => {
      one.fieldConditions.push({
        id: 'fc_1',
        tag: 'HV-1',
        kind: 'lock-open',
        requires: { words: 'locked open' },
        photo: true,
      });
      const scenario = first(one.scenarios);
      scenario.dependsOn = [{ id: 'dp_1', kind: 'lock-open', tag: 'HV-1', condition: 'fc_1' }];
    });
    expect(projected(basis).conditions).toEqual([
      expect.objectContaining({
        tag: 'HV-1',
        requires: 'locked open',
        supports: [first(basis.scenarios).id],
      }),
    ]);
  });

  it('is not sized where nothing is', () => {
    const basis = basisWith((one) => void (one.groups = []));
    expect(projected(basis).system).toMatchObject({
      verdict: 'not-sized',
      use: null,
      governing: null,
      letter: null,
    });
  });
});

describe('pointFacts', () => {
  // Reseating 3.5 · (1 − 0.07) = 3.255 barg; MAAP 3.85 barg; operating maximum 0.6/3.5 = 17.1 % of set.
  it('gives the rungs of the ladder', () => {
    const facts = pointFacts(smallBasis(), evaluated(smallBasis()), 'rp_1');
    const rungs = Object.fromEntries(facts?.rungs.map((rung) => [rung.kind, rung.pa]) ?? []);
    expect(rungs).toMatchObject({
      operating: 35_000,
      'operating-max': 60_000,
      set: 350_000,
      mawp: 350_000,
      maap: expect.closeTo(385_000, 3) as number,
      relieving: expect.closeTo(385_000, 3) as number,
      reseating: expect.closeTo(325_500, 3) as number,
    });
    expect(facts).toMatchObject({
      protects: 'C-1',
      operatingShare: expect.closeTo(0.1714, 3) as number,
      testInterval: { value: 24, unit: 'months' },
    });
  });
});
