/* Reading a basis: shape, sentences for what is wrong, labels and range keys of fields, references. */
import { describe, expect, it } from 'vitest';
import {
  basisSchema,
  checkReferences,
  describePath,
  expectedAt,
  FIELDS,
  getAt,
  labelAt,
  metaOf,
  parseBasis,
  rangeKeyAt,
  type Basis,
} from '@domain/basis';
import { headerSchema } from '@domain/header';
import { RANGES } from '@domain/rules';
import { z } from 'zod';
import { largeSample, sample, sampleInput } from './sample';

function errorsOf(change: (input: Record<string, unknown>) => void) {
  const input = sampleInput();
  change(input);
  const result = parseBasis(input);
  return result.ok ? [] : (result.problem.errors ?? []);
}

describe('parseBasis', () => {
  it('takes the sample as it stands', () => {
    expect(parseBasis(sampleInput())).toEqual({ ok: true, value: sampleInput() });
  });

  it('says that a text is no JSON', () => {
    expect(parseBasis('{')).toMatchObject({ ok: false, problem: { code: 'MALFORMED' } });
  });

  it('names the field and what would be right, by ids', () => {
    const [error] = errorsOf((input) => {
      (input['reliefPoints'] as { set: unknown }[])[1]!.set = { value: '3.5', unit: 'bar_g' };
    });
    expect(error).toEqual({
      path: 'reliefPoints/rp_b/set/value',
      code: 'invalid_type',
      sentence: 'PSV-101B, set pressure, value should be a number.',
    });
  });

  it('refuses a field that the document does not have', () => {
    const [error] = errorsOf((input) => {
      (input['equipment'] as Record<string, unknown>[])[0]!['maop'] = 3;
    });
    expect(error?.sentence).toBe('C-101 does not have "maop".');
  });

  it('says which words a choice takes', () => {
    const [error] = errorsOf((input) => {
      (input['scenarios'] as Record<string, unknown>[])[0]!['disposition'] = 'maybe';
    });
    expect(error?.sentence).toBe(
      'Loss of cooling water, disposition should be one of: credible, below-limit, not-credible, not-applicable.',
    );
  });

  it('says what is missing', () => {
    const [error] = errorsOf((input) => {
      delete (input['reliefPoints'] as Record<string, unknown>[])[0]!['purpose'];
    });
    expect(error).toMatchObject({
      path: 'reliefPoints/rp_a/purpose',
      sentence: 'PSV-101A, purpose is missing.',
    });
  });

  it('refuses a text with a node that is not ours', () => {
    const [error] = errorsOf((input) => {
      (input['scenarios'] as Record<string, unknown>[])[0]!['reason'] = {
        type: 'doc',
        content: [{ type: 'image' }],
      };
    });
    expect(error?.sentence).toContain('may not hold a "image"');
  });

  it('parses the largest document of the site in less than 5 ms', () => {
    const large = largeSample();
    expect(JSON.stringify(large).length).toBeGreaterThan(38_000);
    basisSchema.parse(large);
    expect(quickest(() => basisSchema.parse(large))).toBeLessThan(5);
  });
});

/** The quickest of several runs in milliseconds: the machine that tests run on is shared. */
function quickest(run: () => unknown): number {
  const times = Array.from({ length: 15 }, () => {
    const from = performance.now();
    run();
    return performance.now() - from;
  });
  return Math.min(...times);
}

/** Every schema that stands in a document, with its path of field names. */
function* fieldsOf(
  schema: z.core.$ZodType,
  path: string,
): Generator<{ path: string; schema: z.core.$ZodType }> {
  yield { path, schema };
  if (schema instanceof z.ZodOptional) yield* fieldsOf(schema.unwrap(), path);
  else if (schema instanceof z.ZodArray) yield* fieldsOf(schema.element, path);
  else if (schema instanceof z.ZodUnion && !FIELDS.get(schema))
    for (const one of schema.options) yield* fieldsOf(one, path);
  else if (schema instanceof z.ZodObject) {
    for (const [name, field] of Object.entries(schema.shape))
      yield* fieldsOf(field as z.core.$ZodType, `${path}/${name}`);
  }
}

describe('fields', () => {
  it('has a range for every key that a figure of a document names', () => {
    const keys = [basisSchema, headerSchema].flatMap((root) =>
      [...fieldsOf(root, '')].flatMap(({ schema }) => metaOf(schema).keys ?? []),
    );
    expect(new Set(keys).size).toBeGreaterThan(95);
    expect([...new Set(keys)].filter((key) => !Object.hasOwn(RANGES, key))).toEqual([]);
  });

  it('tells range keys by place', () => {
    expect(rangeKeyAt('reliefPoints/rp_a/set')).toBe('setPressure');
    expect(rangeKeyAt('equipment/eq_c101/sides/sd_c101/external')).toBe('externalRating');
    expect(rangeKeyAt('scenarios/x/answers/y/load/figure')).toBe('reliefLoad');
    expect(rangeKeyAt('scenarios/x/answers/y/size/inputs/T')).toBeUndefined();
    expect(rangeKeyAt('nowhere/at/all')).toBeUndefined();
  });

  it('picks the key that the place of a figure calls for', () => {
    const basis = sample();
    const tank: Basis = { ...basis, equipment: [{ ...basis.equipment[0]!, kind: 'storage-tank' }] };
    const mawp = 'equipment/eq_c101/sides/sd_c101/ratings/rt_1/mawp';
    expect(rangeKeyAt(mawp, basis)).toBe('mawp');
    expect(rangeKeyAt(mawp, tank)).toBe('tankDesignPressure');
    expect(rangeKeyAt('segments/sg_1/length', basis)).toBe('inletLength');
    expect(rangeKeyAt('segments/sg_2/length', basis)).toBe('outletLength');
  });

  it('says what a field expects to be typed', () => {
    expect(expectedAt('reliefPoints/rp_a/set')).toEqual({ dimension: ['pressure-gauge'], unit: 'kPa_g' });
    expect(expectedAt('reliefPoints/rp_a/blowdown')?.dimension).toEqual([
      'dimensionless',
      'pressure-difference',
    ]);
    expect(labelAt(basisSchema, 'equipment/x/sides/y/mdmt')).toBe('minimum design metal temperature');
    expect(labelAt(basisSchema, 'equipment/x/insulation/fireCredit')).toBe('credit in fire');
  });
});

describe('describePath', () => {
  it.each([
    ['reliefPoints/rp_a/set', 'PSV-101A, set pressure', 'changes#rp_a'],
    ['equipment/eq_c101/sides/sd_c101/ratings/rt_1/mawp', 'C-101, shell, at 185 °C, MAWP', 'changes#eq_c101'],
    ['reliefPoints/rp_a/orifice/letter', 'PSV-101A, orifice letter', 'changes#rp_a'],
    [
      'scenarios/tube-rupture~2/reason',
      'Exchanger tube rupture, plate or coil break (E-102), reason',
      'scenarios#tube-rupture~2',
    ],
    ['groups/gr_1/members/mb_2/credited', 'group of PSV-101A, PSV-101B, PSV-101B, credited', 'changes#gr_1'],
    ['segments/sg_2/bore', 'segment of outlet line of PSV-101A, DN 150, bore', 'lines#sg_2'],
    ['equipment', 'equipment', 'changes#equipment'],
  ])('%s', (path, label, where) => {
    expect(describePath(sample(), path)).toEqual({ label, where });
  });
});

describe('checkReferences', () => {
  it('finds nothing in a sound basis', () => {
    expect(checkReferences(sample())).toEqual([]);
  });

  it('finds ids that point nowhere', () => {
    const basis = sample();
    const broken: Basis = {
      ...basis,
      reliefPoints: basis.reliefPoints.slice(0, 1),
      fluids: [],
      segments: basis.segments.slice(1),
    };
    expect(checkReferences(broken).map(({ path }) => path)).toEqual([
      'groups/gr_1/members/mb_2/point',
      'lines/ln_1/path',
      'scenarios/cooling-water-loss/answers/ans_1/fluid',
    ]);
    expect(checkReferences(broken)[1]?.sentence).toBe(
      'Inlet line of PSV-101A, path of segments points at a segment that is not in this basis.',
    );
  });

  it('finds sides and inputs that are gone', () => {
    const basis = sample();
    const equipment = [{ ...basis.equipment[0]!, sides: [] }];
    const paths = checkReferences({ ...basis, equipment }).map(({ path }) => path);
    expect(paths).toContain('reliefPoints/rp_a/on/side');
    expect(paths).toContain('scenarios/tube-rupture~2/bound/limit/side');
    const bare = basis.reliefPoints.map(({ k: _k, ...point }) => point);
    expect(checkReferences({ ...basis, reliefPoints: bare })[0]?.sentence).toContain(
      '(reliefPoints/rp_a/k/gas)',
    );
  });
});

describe('getAt', () => {
  it('reads by ids', () => {
    expect(getAt(sample(), 'reliefPoints/rp_b/tag')).toBe('PSV-101B');
    expect(getAt(sample(), 'reliefPoints/0/tag')).toBeUndefined();
    expect(getAt(sample(), 'reliefPoints/rp_b/constructor')).toBeUndefined();
  });
});
