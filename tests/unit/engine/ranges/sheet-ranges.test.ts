/* Every sheet judges its inputs by the ranges of the rulebook: unusual is a warning, impossible a refusal that names field and range. */
import { describe, expect, it } from 'vitest';
import { METHODS, workMethod } from '@engine/catalog';
import { type Q, UNITS } from '@engine/quantity';
import { checkRange, RANGES, standing } from '@engine/ranges';
import { type Inputs } from '@engine/sheet';

const q = (value: number, unit: string): Q => ({ value, unit });
/** API 520-1 Example 1 as quoted in the docstring of fluids/safety_valve.py (CalebBell/fluids). */
const GAS: Inputs = {
  ...{ W: q(24270, 'kg/h'), T: q(348, 'K'), Z: q(0.9, '-'), M: q(51, 'kg/kmol'), k: q(1.11, '-') },
  ...{ P1: q(670, 'kPa_abs'), P2: q(101.325, 'kPa_abs') },
};

describe('a sheet and the ranges of its inputs', () => {
  it('says nothing of plausible inputs', () => {
    expect(workMethod('a.gas', GAS)).toMatchObject({ warnings: [] });
  });

  it('warns of an unusual input and works all the same', () => {
    const sheet = workMethod('a.gas', { ...GAS, M: q(500, 'kg/kmol') });
    expect(sheet.refused).toBeUndefined();
    expect(sheet.warnings).toEqual([
      {
        code: 'VALUE_UNUSUAL',
        text: 'Molar mass (M) 500 kg/kmol is unusual: it mostly lies between 2 and 300 kg/kmol.',
      },
    ]);
  });

  it('refuses an impossible input by name and range, in the unit in which it was given', () => {
    expect(workMethod('a.gas', { ...GAS, T: q(3000, 'degF') }).refused).toEqual({
      code: 'VALUE_IMPOSSIBLE',
      field: 'T',
      text: `Relieving temperature (T) 3\u2009000 °F is impossible: it lies between \u2212454 and 2\u2009192 °F.`,
    });
    expect(workMethod('a.gas', { ...GAS, Kd: q(1.2, '-') }).refused).toMatchObject({ field: 'Kd' });
  });

  it('reads a gauge pressure against an absolute range by the barometer of the sheet', () => {
    const set = { set_pressure: q(10, 'bar_g'), overpressure: q(0.1, '-') };
    const { P1: _, ...rest } = GAS;
    const high = workMethod('a.gas', { ...rest, ...set, atmospheric_pressure: q(40, 'kPa_abs') });
    expect(high.refused).toMatchObject({ code: 'VALUE_IMPOSSIBLE', field: 'atmospheric_pressure' });
  });
});

describe('the quick standing of a figure', () => {
  it('agrees with the full check for every range, at, inside and beyond each of its bounds, in every unit of its kind', () => {
    for (const [key, { unit, range, also = [] }] of Object.entries(RANGES)) {
      const fences = [{ unit, range }, ...also];
      for (const fence of fences) {
        const bounds = fence.range.flatMap((bound) => [
          bound * 0.97,
          bound,
          bound * 1.03,
          bound - 0.13,
          bound + 0.13,
        ]);
        for (const to of Object.keys(UNITS).filter(
          (one) => UNITS[one]?.dimension === UNITS[fence.unit]?.dimension,
        )) {
          for (const value of bounds) {
            const factor = UNITS[fence.unit]!.factor / UNITS[to]!.factor;
            const offset = ((UNITS[fence.unit]!.offset ?? 0) - (UNITS[to]!.offset ?? 0)) / UNITS[to]!.factor;
            const given = q(value * factor + offset, to);
            expect({ key, given, at: standing(key, given) }).toEqual({
              key,
              given,
              at: checkRange(key, given).verdict,
            });
          }
        }
      }
    }
  });

  it('leaves what needs a barometer or is of another kind to the full check', () => {
    expect(standing('setPressure', q(3, 'bar_abs'))).toBe('unknown');
    expect(standing('setPressure', q(3, 'kg/h'))).toBe('unknown');
    expect(standing('none', q(3, 'kg/h'))).toBe('unknown');
  });
});

describe('the inputs of the methods', () => {
  it('name only ranges that there are', () => {
    const keys = METHODS.flatMap((method) => method.inputs.flatMap(({ rangeKey }) => rangeKey ?? []));
    expect(keys.filter((key) => !Object.hasOwn(RANGES, key))).toEqual([]);
  });
});
