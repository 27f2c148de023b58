/* Ranges of inputs: the rows, and figures checked against them. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { dimensionOf } from '@engine/quantity';
import { checkRange, RANGES } from '@domain/rules';

const verdict = (key: string, value: number, unit: string) => checkRange(key, { value, unit }).verdict;

describe('RANGES', () => {
  it('has the 79 rows of the rulebook and those of the documents', () => {
    expect(Object.keys(RANGES)).toHaveLength(79 + 37);
  });

  it.each(Object.values(RANGES).map((row) => [row.key, row] as const))(
    '%s rises and has known units',
    (_key, row) => {
      const fences = [{ unit: row.unit, range: row.range }, ...(row.also ?? [])];
      for (const { unit, range } of fences) {
        expect([...range].sort((one, other) => one - other)).toEqual([...range]);
        if (unit !== 'Hz') expect(dimensionOf(unit)).toBeDefined();
      }
      const dimensions = fences.map(({ unit }) => dimensionOf(unit));
      expect(new Set(dimensions).size).toBe(dimensions.length);
    },
  );
});

describe('checkRange', () => {
  it('tells possible, implausible and impossible, units converted', () => {
    expect(verdict('molarMass', 58.08, 'kg/kmol')).toBe('possible');
    expect(verdict('molarMass', 400, 'lb/lbmol')).toBe('implausible');
    expect(verdict('molarMass', 0.5, 'kg/kmol')).toBe('impossible');
    // 35 000 kPa = 5 076 psi (1 psi = 6.894757 kPa, NIST SP 811).
    expect(verdict('mawp', 5000, 'psig')).toBe('possible');
    expect(verdict('mawp', 5200, 'psig')).toBe('implausible');
    // Absolute zero is −273.15 °C = −459.67 °F.
    expect(verdict('designTemperature', -460, 'degF')).toBe('impossible');
  });

  it('does not take the bound itself where the rulebook says ">0"', () => {
    expect(verdict('setPressure', 0, 'bar_g')).toBe('impossible');
    expect(verdict('inletLength', 0, 'm')).toBe('possible');
  });

  it('says the possible range in the unit in which the figure was entered', () => {
    expect(checkRange('molarMass', { value: 0.5, unit: 'kg/kmol' }).sentence).toMatch(
      /^Molar mass 0\.50* kg\/kmol is impossible: it lies between 1 and 2.?000 kg\/kmol\.$/,
    );
    expect(
      checkRange('setPressure', { value: -1, unit: 'bar_g' }, {}, 'PSV-101A, set pressure').sentence,
    ).toMatch(
      /^PSV-101A, set pressure \u22121(\.0+)? barg is impossible: it lies above 0 and up to 6.?900 barg\.$/,
    );
  });

  it('refuses another kind of quantity with the units that are taken', () => {
    expect(checkRange('mdmt', { value: 3, unit: 'bar_g' })).toEqual({
      verdict: 'impossible',
      wrongUnit: true,
      sentence: "Minimum design metal temperature can't be in barg; it is given in °C.",
    });
    expect(verdict('mdmt', 3, 'no such unit')).toBe('impossible');
  });

  it('takes the kinds of unit in which the trade enters a figure', () => {
    expect(verdict('blowdown', 7, '%')).toBe('possible');
    expect(verdict('blowdown', 0.3, 'bar')).toBe('possible');
    expect(verdict('liquidLevel', 1.6, 'm')).toBe('possible');
    expect(verdict('liquidLevel', 1.6, '-')).toBe('impossible');
    expect(verdict('reliefLoad', 900, 'Nm3/h')).toBe('possible');
  });

  it('compares gauge with absolute by the barometer of the site', () => {
    expect(verdict('sourcePressure', -1.2, 'bar_g')).toBe('impossible');
    expect(verdict('sourcePressure', 3, 'bar_g')).toBe('possible');
    const high = { barometer: { value: 0.5, unit: 'bar_abs' } };
    expect(checkRange('sourcePressure', { value: -0.6, unit: 'bar_g' }, high).verdict).toBe('impossible');
  });

  it('takes the ranges of the site', () => {
    const ranges = { molarMass: [1, 10, 100, 2000] as const };
    expect(checkRange('molarMass', { value: 4, unit: 'kg/kmol' }, { ranges }).verdict).toBe('implausible');
  });

  it('answers for any number and any key without failing', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...Object.values(RANGES)),
        fc.double({ noNaN: true, noDefaultInfinity: true }),
        (row, value) => {
          const check = checkRange(row.key, { value, unit: row.unit });
          expect(check.verdict === 'possible').toBe(check.sentence === undefined);
        },
      ),
    );
    expect(checkRange('noSuchKey', { value: 1, unit: 'm' })).toEqual({ verdict: 'possible' });
  });
});
