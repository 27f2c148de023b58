/* judge: what is inherited, what clears an outcome, and the rulebook as a table. */
import { describe, expect, it } from 'vitest';
import { richFromText } from '@domain/basis';
import { blocking, clearedBy, fill, RULEBOOK, ruleOf } from '@domain/rulebook';
import { PARAMETERS } from '@domain/rules';
import { basisWith, first, outcomesOf, smallBasis } from '../../../fixtures/basis';
import { lineSheet, point, q, set } from './kit';

const NOTES = ['method-from-memory'];

function of(code: string, basis = smallBasis(), prior = smallBasis()) {
  return outcomesOf(basis, { prior }).find((outcome) => outcome.code === code);
}

describe('judge', () => {
  it('has nothing but notes to say of the small basis', () => {
    expect(outcomesOf(smallBasis()).filter((outcome) => !NOTES.includes(outcome.code))).toEqual([]);
  });

  // Inherited: same rule, same subject, not worse by more than 0.5 % (3.6 barg → at most 3.618 barg).
  it('marks as inherited what the basis in force already fails, as long as it is not worse', () => {
    const old = basisWith(set(3.6));
    expect(of('set-above-mawp', basisWith(set(3.6)), old)?.inherited).toBe(true);
    expect(of('set-above-mawp', basisWith(set(3.615)), old)?.inherited).toBe(true);
    expect(of('set-above-mawp', basisWith(set(3.65)), old)?.inherited).toBe(false);
    expect(of('set-above-mawp', basisWith(set(3.6)), smallBasis())?.inherited).toBe(false);
  });

  it('never lets an impossible value be inherited', () => {
    const bad = basisWith((b) => void (first(b.fluids).latentHeat = q(5000, 'kJ/kg')));
    expect(of('value-impossible', bad, bad)?.inherited).toBe(false);
  });

  it('is deterministic', () => {
    const basis = basisWith(set(3.6));
    expect(outcomesOf(basis)).toEqual(outcomesOf(basis));
  });

  it('says nothing, rather than ends, where a unit does not fit', () => {
    const basis = basisWith((b) => void (point(b).set = q(3.5, 'kg/h')));
    expect(() => outcomesOf(basis)).not.toThrow();
  });
});

describe('clearing', () => {
  const high = (bar: number) => basisWith((b) => lineSheet(b, 'inlet', { loss: q(bar, 'bar') }));

  it('takes a justification that is tied to the very outcome, and drops it when a value moves', () => {
    const basis = high(0.11);
    const outcome = of('inlet-loss-high', basis);
    if (!outcome) throw new Error('the rule is silent');
    const justified = (doc = basis) => ({
      ...doc,
      justifications: [
        {
          id: 'ju_1',
          code: outcome.code,
          subject: outcome.subject,
          values: outcome.values,
          hash: outcome.hash,
          text: richFromText('Stable by analysis.'),
          by: 'pe_1',
          on: '2026-03-01',
        },
      ],
    });
    expect(clearedBy(outcome, justified())?.id).toBe('ju_1');
    expect(blocking([outcome], justified())).toEqual([]);
    expect(blocking([outcome], basis)).toEqual([outcome]);
    const moved = of('inlet-loss-high', high(0.12));
    expect(moved && clearedBy(moved, justified(high(0.12)))).toBeUndefined();
  });

  it('never clears a stop by a justification', () => {
    const outcome = of('set-above-mawp', basisWith(set(3.6)));
    if (!outcome) throw new Error('the rule is silent');
    const doc = {
      ...smallBasis(),
      justifications: [
        {
          id: 'ju_1',
          code: outcome.code,
          subject: outcome.subject,
          values: {},
          hash: outcome.hash,
          text: richFromText('No.'),
          by: 'pe_1',
          on: '2026-03-01',
        },
      ],
    };
    expect(blocking([outcome], doc)).toEqual([outcome]);
  });

  it('lets inherited outcomes and notes pass', () => {
    const basis = basisWith(set(3.6));
    expect(blocking(outcomesOf(basis, { prior: basis }), basis)).toEqual([]);
  });
});

describe('the rulebook', () => {
  it('names every rule once, with a statement, a condition and a source with its tag', () => {
    const codes = RULEBOOK.map((rule) => rule.code);
    expect(new Set(codes).size).toBe(codes.length);
    for (const rule of RULEBOOK) {
      expect(rule.statement, rule.code).toMatch(/\.$/);
      expect(rule.condition.length, rule.code).toBeGreaterThan(10);
      expect(rule.source, rule.code).toMatch(/\[[MPS]\]/);
    }
  });

  it('names only parameters that a site has', () => {
    const keys = new Set(PARAMETERS.map((parameter) => parameter.key));
    expect(
      RULEBOOK.flatMap(({ parameter }) =>
        parameter === undefined || keys.has(parameter) ? [] : [parameter],
      ),
    ).toEqual([]);
  });

  it('finds a rule by its code', () => {
    expect(ruleOf('set-above-mawp')?.severity).toBe('stop');
    expect(ruleOf('nothing')).toBeUndefined();
  });
});

describe('fill', () => {
  it('shows units, and a bare number where the statement says the unit', () => {
    expect(fill('{a} is {x} % of {b}.', { a: 'loss', x: q(3.17, '%'), b: q(3.5, 'bar_g') })).toBe(
      'Loss is 3.17 % of 3.5 barg.',
    );
  });
});
