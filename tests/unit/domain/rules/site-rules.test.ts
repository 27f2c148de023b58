/* Site rules: defaults, bounds, the hash that a signature binds. */
import { describe, expect, it } from 'vitest';
import { DEFAULT_RULES, judgementHash, numberOf, parameter, PARAMETERS, parseSiteRules } from '@domain/rules';

type Changes = { parameters?: object; ranges?: object; conduct?: object; scenarios?: object[] };

function faults({ parameters = {}, ranges = {}, conduct = {}, scenarios }: Changes): string[] {
  const { judgement } = DEFAULT_RULES;
  const result = parseSiteRules({
    ...DEFAULT_RULES,
    judgement: {
      ...judgement,
      parameters: { ...judgement.parameters, ...parameters },
      ranges,
      scenarios: scenarios ?? judgement.scenarios,
    },
    conduct: { ...DEFAULT_RULES.conduct, ...conduct },
  });
  return result.ok ? [] : (result.problem.errors ?? []).map(({ sentence }) => sentence);
}

describe('site rules', () => {
  it('have defaults within their own bounds', () => {
    expect(parseSiteRules(DEFAULT_RULES)).toEqual({ ok: true, value: DEFAULT_RULES });
  });

  it('name every parameter once', () => {
    expect(new Set(PARAMETERS.map(({ key }) => key)).size).toBe(PARAMETERS.length);
  });

  it('refuse a value outside the bounds of the rulebook', () => {
    expect(faults({ parameters: { fireHeight: 5 } })).toEqual([
      'fireHeight is 5; the rulebook allows 7.6 to 15.',
    ]);
    expect(faults({ parameters: { highSideBasis: 'guess' } })[0]).toContain('design, max-operating');
    expect(faults({ parameters: { inletLoss: '3 %' } })).toEqual(['inletLoss should be a number.']);
    expect(faults({ parameters: { marginalFrom: 0.85 } })).toEqual([]);
  });

  it('keep the two halves apart', () => {
    expect(faults({ conduct: { inletLoss: 0.03 } })).toHaveLength(1);
    expect(faults({ parameters: { approvers: 2 } })).toHaveLength(1);
  });

  it('may narrow a range and never widen the possible one', () => {
    expect(faults({ ranges: { molarMass: [1, 1, 500, 2000] } })).toEqual([]);
    expect(faults({ ranges: { molarMass: [0, 2, 300, 2000] } })).toHaveLength(1);
    expect(faults({ ranges: { molarMass: [1, 300, 2, 2000] } })).toHaveLength(1);
    expect(faults({ ranges: { nothing: [1, 2, 3, 4] } })).toHaveLength(1);
  });

  it('may add scenarios and never remove one', () => {
    expect(
      faults({ scenarios: [...DEFAULT_RULES.judgement.scenarios, { key: 'site-own', added: '2026-01-01' }] }),
    ).toEqual([]);
    expect(faults({ scenarios: DEFAULT_RULES.judgement.scenarios.slice(1) })[0]).toContain('Closed outlet');
  });

  it('hash the judgement half alone', () => {
    const { judgement } = DEFAULT_RULES;
    const other = { ...judgement, parameters: { ...judgement.parameters, marginalFrom: 0.95 } };
    expect(judgementHash(judgement)).toMatch(/^[0-9a-f]{64}$/);
    expect(judgementHash(other)).not.toBe(judgementHash(judgement));
  });

  it('give a parameter or its default', () => {
    expect(numberOf(DEFAULT_RULES, 'fireHeight')).toBe(7.6);
    expect(parameter({ judgement: { ...DEFAULT_RULES.judgement, parameters: {} } }, 'thermalExempt')).toBe(
      true,
    );
    expect(() => parameter(DEFAULT_RULES, 'none')).toThrow(RangeError);
    expect(() => numberOf(DEFAULT_RULES, 'thermalExempt')).toThrow(RangeError);
  });
});
