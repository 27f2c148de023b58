/* Units: exact factors, gauge is not absolute, a reading is not a difference, sameness, printing. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  convert,
  dimensionOf,
  displayUnit,
  formatNumber,
  formatQuantity,
  fromSI,
  QuantityError,
  sameValue,
  toSI,
  unitLabel,
  UNITS,
} from '../../../src/engine/quantity';

const BAROMETER = { value: 0.918, unit: 'bar_abs' };

describe('factors of NIST SP 811 (2008), Appendix B', () => {
  it.each([
    [1, 'psi', 'kPa', 6.894757293168361],
    [1, 'ft', 'm', 0.3048],
    [1, 'in2', 'mm2', 645.16],
    [1, 'lb/h', 'kg/h', 0.45359237],
    [1, 'US gpm', 'L/min', 3.785411784],
    [1, 'Btu/lb', 'kJ/kg', 2.326],
    [1, 'Btu/h', 'W', 0.29307107017222],
    [1, 'lbf', 'N', 4.4482216152605],
    [212, 'degF', 'degC', 100],
    [0, 'degC', 'K', 273.15],
    [491.67, 'degR', 'degC', 0],
    [9, 'dF', 'dK', 5],
    [1, 'cP', 'mPa.s', 1],
    [1, 'Cv', 'Kv', 0.865],
  ])('%d %s is %s %d', (value, from, to, expected) => {
    expect(convert({ value, unit: from }, to)).toBeCloseTo(expected, 9);
  });

  it('12 barg is 174.05 psig, and 12 bara is 174.05 psia', () => {
    expect(convert({ value: 12, unit: 'bar_g' }, 'psig')).toBeCloseTo(174.05, 2);
    expect(convert({ value: 12, unit: 'bar_abs' }, 'psia')).toBeCloseTo(174.05, 2);
  });
});

describe('conversion', () => {
  const units = Object.keys(UNITS);
  it('comes back from every unit of its dimension', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...units),
        fc.constantFrom(...units),
        fc.double({ min: -1e6, max: 1e6, noNaN: true }),
        (a, b, value) => {
          fc.pre(dimensionOf(a) === dimensionOf(b));
          const there = { value: convert({ value, unit: a }, b), unit: b };
          const scale = Math.max(1, Math.abs(value), 500);
          expect(Math.abs(convert(there, a) - value) / scale).toBeLessThan(1e-9);
          expect(fromSI(toSI({ value, unit: a }), a).value).toBeCloseTo(value, 3);
        },
      ),
    );
  });

  it('takes the barometer between gauge and absolute, and refuses without it', () => {
    expect(convert({ value: 3.5, unit: 'bar_g' }, 'bar_abs', { barometer: BAROMETER })).toBeCloseTo(4.418, 9);
    expect(convert({ value: 4.418, unit: 'bar_abs' }, 'bar_g', { barometer: BAROMETER })).toBeCloseTo(3.5, 9);
    expect(() => convert({ value: 3.5, unit: 'bar_g' }, 'bar_abs')).toThrow(QuantityError);
  });

  it('never turns a difference into a reading, nor one dimension into another, nor an unknown unit', () => {
    expect(() => convert({ value: 1, unit: 'bar' }, 'bar_g', { barometer: BAROMETER })).toThrow(
      QuantityError,
    );
    expect(() => convert({ value: 1, unit: 'dK' }, 'K')).toThrow(QuantityError);
    expect(() => convert({ value: 1, unit: 'kg/h' }, 'm3/h')).toThrow(QuantityError);
    expect(() => convert({ value: 1, unit: 'furlong' }, 'm')).toThrow(QuantityError);
    expect(() => convert({ value: 1, unit: 'toString' }, 'm')).toThrow(QuantityError);
  });
});

describe('sameValue', () => {
  it.each([
    [{ value: 12, unit: 'bar_g' }, { value: 174.05, unit: 'psig' }, true],
    [{ value: 12, unit: 'bar_g' }, { value: 12.1, unit: 'bar_g' }, false],
    [{ value: 12, unit: 'bar_g' }, { value: 12, unit: 'bar_abs' }, false],
    [{ value: 20, unit: 'degC' }, { value: 68, unit: 'degF' }, true],
    [{ value: 20, unit: 'degC' }, { value: 20.2, unit: 'degC' }, false],
    [{ value: 0.3, unit: 'bar_g', text: '0.3' }, { value: 0.34, unit: 'bar_g' }, true],
    [{ value: 0.3, unit: 'bar_g', text: '0.30' }, { value: 0.34, unit: 'bar_g' }, false],
  ])('%o and %o: %s', (a, b, expected) => {
    expect(sameValue(a, b)).toBe(expected);
    expect(sameValue(b, a)).toBe(expected);
  });

  it('bridges gauge and absolute only with a barometer', () => {
    const [gauge, absolute] = [
      { value: 3.5, unit: 'bar_g' },
      { value: 4.418, unit: 'bar_abs' },
    ];
    expect(sameValue(gauge, absolute)).toBe(false);
    expect(sameValue(gauge, absolute, { barometer: BAROMETER })).toBe(true);
  });
});

describe('printing', () => {
  it('groups thousands by a thin space, uses a true minus, and keeps four digits', () => {
    expect(formatNumber(13267.1)).toBe('13\u2009267');
    expect(formatNumber(-0.5)).toBe('\u22120.5');
    expect(formatNumber(2634.7, 1)).toBe('2\u2009634.7');
    expect(formatNumber(0.025)).toBe('0.025');
    expect(formatNumber(-0.001, 1)).toBe('0.0');
    expect(formatNumber(Number.NaN)).toBe('–');
  });

  it('writes a quantity with its label', () => {
    expect(formatQuantity({ value: 12.5, unit: 'bar_g' }, { decimals: 2 })).toBe('12.50 barg');
    expect(formatQuantity({ value: 0.975, unit: '-' })).toBe('0.975');
    expect(formatQuantity({ value: 75, unit: 'degC' })).toBe('75 °C');
    expect(unitLabel('mm2')).toBe('mm²');
  });

  it('shows each dimension in a unit of that dimension, in both systems', () => {
    for (const unit of Object.values(UNITS))
      for (const system of ['SI', 'US'] as const)
        expect(dimensionOf(displayUnit(unit.dimension, system))).toBe(unit.dimension);
  });
});
