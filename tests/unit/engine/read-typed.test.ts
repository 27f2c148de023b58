/* Typed text: what is read, and what the sentence says when it is not. */
import { describe, expect, it } from 'vitest';
import { readTyped, unitLabel, UNITS } from '../../../src/engine/quantity';

const PRESSURE = { dimension: ['pressure-gauge', 'pressure-absolute'] as const, unit: 'bar_g' };
const pressure = (text: string) =>
  readTyped(text, { dimension: [...PRESSURE.dimension], unit: PRESSURE.unit });

describe('numbers and units that are read', () => {
  it.each([
    ['12.5 bar(g)', 12.5, 'bar_g', '12.5'],
    ['180 psig', 180, 'psig', '180'],
    ['12,5 barg', 12.5, 'bar_g', '12,5'],
    ['1 250,5', 1250.5, 'bar_g', '1 250,5'],
    ['1.250,5 barg', 1250.5, 'bar_g', '1.250,5'],
    ['1,250.5 barg', 1250.5, 'bar_g', '1,250.5'],
    ['\u22120.3 bar g', -0.3, 'bar_g', '\u22120.3'],
    ['7 MPa(a)', 7, 'MPa_abs', '7'],
    ['12 bar abs', 12, 'bar_abs', '12'],
    ['5e2 kPag', 500, 'kPa_g', '5e2'],
    ['.5 barg', 0.5, 'bar_g', '.5'],
  ])('%s', (typed, value, unit, text) => {
    expect(pressure(typed)).toEqual({ ok: true, q: { value, unit, text } });
  });

  it('reads °C as a step where a temperature difference is asked', () => {
    expect(readTyped('75 °C', { dimension: 'temperature', unit: 'degC' })).toMatchObject({
      q: { unit: 'degC' },
    });
    expect(readTyped('10 °C', { dimension: 'temperature-difference', unit: 'dK' })).toMatchObject({
      q: { unit: 'dK' },
    });
  });

  it('reads every unit by its key and by its label, unless the bare pressure is ambiguous', () => {
    for (const [key, unit] of Object.entries(UNITS)) {
      if (unit.label === '' || key.startsWith('d') || unit.dimension === 'dimensionless') continue;
      for (const word of [key, unitLabel(key)]) {
        const read = readTyped(`2 ${word}`, { dimension: unit.dimension, unit: key });
        expect(read, `${key} typed as ${word}`).toMatchObject({ ok: true, q: { value: 2 } });
      }
    }
  });
});

it('does not join a unit that begins with a digit to the number', () => {
  expect(readTyped('0.001 1/K', { dimension: 'cubic-expansion', unit: '1/K' })).toMatchObject({
    q: { value: 0.001, unit: '1/K' },
  });
  expect(readTyped('1 250 1/K', { dimension: 'cubic-expansion', unit: '1/K' })).toMatchObject({
    q: { value: 1250, unit: '1/K' },
  });
});

describe('what is refused, and the sentence', () => {
  it.each([
    ['12 bar', 'UNIT_AMBIGUOUS', '12 bar: gauge or absolute? Write 12 barg or 12 bara.'],
    ['12 psi', 'UNIT_AMBIGUOUS', '12 psi: gauge or absolute? Write 12 psig or 12 psia.'],
    [
      '12 m',
      'WRONG_DIMENSION',
      'm measures a length; this is a gauge pressure or an absolute pressure, usually in barg.',
    ],
    [
      '12 smoots',
      'UNIT_UNKNOWN',
      'The unit "smoots" is not known here. This is a gauge pressure or an absolute pressure, usually in barg.',
    ],
    ['', 'NOT_A_NUMBER', 'Nothing was typed. Write a number with its unit, such as 12.5 barg.'],
    [
      'abc',
      'NOT_A_NUMBER',
      '"abc" does not begin with a number. Write a number with its unit, such as 12.5 barg.',
    ],
    ['12..5', 'NOT_A_NUMBER', '"12..5" is not a number. Write a number with its unit, such as 12.5 barg.'],
    ['1,250', 'NOT_A_NUMBER', '1,250 can be read two ways. Write 1250 or 1.250.'],
  ])('%s', (text, code, sentence) => {
    expect(pressure(text)).toEqual({ ok: false, code, sentence });
  });

  it('takes a bare bar where a difference is asked', () => {
    expect(readTyped('2 bar', { dimension: 'pressure-difference', unit: 'bar' })).toMatchObject({ ok: true });
  });
});
