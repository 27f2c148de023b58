/*
 * Where reading, ranges, curves and sheets change their answer: the borders themselves, and what stands on either side. Curves are
 * worked by hand; inputs of the sheets are those of the reference cases named beside each.
 */
import { describe, expect, it } from 'vitest';
import { asAsked, inUnit } from '../../../src/engine/calc/units';
import { workMethod } from '../../../src/engine/catalog';
import { meetCurve } from '../../../src/engine/methods/f-loads/curve';
import { convert, sameValue } from '../../../src/engine/quantity';
import { readTyped } from '../../../src/engine/quantity/read';
import { checkRange, unitsOfKey } from '../../../src/engine/ranges';
import { type Inputs } from '../../../src/engine/sheet';

const BAROMETER = { value: 1, unit: 'bar_abs' };
const q = (value: number, unit: string) => ({ value, unit });
const step = { dimension: 'temperature-difference', unit: 'dK' } as const;

describe('typed text', () => {
  it('reads degrees as a step where a step is asked for', () => {
    expect(readTyped('10 °F', step)).toMatchObject({ ok: true, q: { value: 10, unit: 'dF' } });
    expect(readTyped('10 °R', step)).toMatchObject({ ok: true, q: { value: 10, unit: 'dF' } });
    expect(readTyped('10 K', step)).toMatchObject({ ok: true, q: { value: 10, unit: 'dK' } });
  });

  it('refuses groups of figures that are no thousands', () => {
    const load = { dimension: 'mass-flow', unit: 'kg/h' } as const;
    expect(readTyped('1,25,000.5 kg/h', load)).toMatchObject({ ok: false, code: 'NOT_A_NUMBER' });
    expect(readTyped('1,250,000.5 kg/h', load)).toMatchObject({ ok: true, q: { value: 1250000.5 } });
    expect(readTyped('1.250.000,5 kg/h', load)).toMatchObject({ ok: true, q: { value: 1250000.5 } });
  });

  it('says what would be right where no unit is usual', () => {
    const factor = { dimension: 'dimensionless', unit: '-' } as const;
    const said = (text: string) => {
      const read = readTyped(text, factor);
      return read.ok ? '' : read.sentence;
    };
    expect(said('')).toContain('such as 0.85');
    expect(said('0.9 furlong')).toContain('plain numbers');
    expect(said('0.9 kg/h')).toContain('plain numbers');
    const bare = readTyped('0.9', { dimension: 'mass-flow', unit: '-' });
    expect(bare).toMatchObject({ ok: false, code: 'WRONG_DIMENSION' });
  });
});

describe('units and ranges', () => {
  it('needs an absolute pressure as barometer', () => {
    expect(() => convert(q(1, 'bar_g'), 'bar_abs', { barometer: q(1, 'bar_g') })).toThrow('absolute');
    expect(() => convert(q(1, 'bar_g'), 'bar_abs')).toThrow('barometric');
  });

  it('takes figures in units that nobody knows for the same only when they are written alike', () => {
    expect(sameValue(q(3, 'furlong'), q(3, 'furlong'))).toBe(true);
    expect(sameValue(q(3, 'furlong'), q(3, 'cubit'))).toBe(false);
    expect(sameValue(q(3, 'furlong'), q(3.001, 'furlong'))).toBe(false);
    expect(sameValue(q(3, 'm'), q(3, 'furlong'))).toBe(false);
  });

  it('brings results into the unit asked for, lists too, and words as they are', () => {
    expect(inUnit(12, 'Kv', 'm3/h', BAROMETER)).toBe(12);
    expect(inUnit(12, 'Kv', 'kg/h', BAROMETER)).toBeUndefined();
    expect(inUnit(1, 'furlong', 'm', BAROMETER)).toBeUndefined();
    expect(inUnit(1, 'm', 'furlong', BAROMETER)).toBeUndefined();
    expect(inUnit(1, 'bar_g', 'bar_abs', BAROMETER)).toBeCloseTo(2, 12);
    expect(asAsked({ value: [1, 2], unit: 'm' }, 'mm', BAROMETER)).toEqual({
      value: [1000, 2000],
      unit: 'mm',
    });
    expect(asAsked({ value: [1, 'none'], unit: 'm' } as never, 'mm', BAROMETER)?.value).toEqual([
      1000,
      'none',
    ]);
    expect(asAsked({ value: 'critical' }, 'mm', BAROMETER)).toEqual({ value: 'critical' });
    expect(asAsked({ value: 0.5 }, '-', BAROMETER)).toEqual({ value: 0.5, unit: '-' });
    expect(asAsked({ value: 1, unit: 'm' }, 'kg/h', BAROMETER)).toBeUndefined();
  });

  it('knows the units of a key, and no range of a key that is none', () => {
    expect(unitsOfKey('reliefLoad')).toContain('kg/h');
    expect(unitsOfKey('constructor')).toEqual([]);
    expect(checkRange('constructor', q(1, 'm'))).toEqual({ verdict: 'possible' });
    const wrong = checkRange('kb', q(1, 'kg/h'));
    expect(wrong).toMatchObject({ verdict: 'impossible', wrongUnit: true });
    expect(wrong.verdict === 'possible' ? '' : wrong.sentence).toContain('a plain number');
  });
});

describe('curves of machines', () => {
  const flows = [0, 10, 20, 30];

  it('meets a curve at a point, between points, never, or past its last point', () => {
    expect(meetCurve(flows, [50, 48, 40, 24], 24)).toEqual({ at: 'flow', flow: 30 });
    expect(meetCurve(flows, [50, 48, 40, 24], 40)).toEqual({ at: 'flow', flow: 20 });
    expect(meetCurve(flows, [50, 48, 40, 24], 32)).toEqual({ at: 'flow', flow: 25 });
    expect(meetCurve(flows, [50, 48, 40, 24], 51)).toEqual({ at: 'never' });
    expect(meetCurve(flows, [50, 48, 40, 24], 23)).toEqual({ at: 'beyond' });
  });

  it('takes the greater of two flows where the curve droops towards shut-off', () => {
    expect(meetCurve(flows, [44, 48, 40, 24], 46)).toEqual({ at: 'flow', flow: 12.5 });
  });
});

describe('sheets at their borders', () => {
  const steam: Inputs = { W: q(69615, 'kg/h'), P1: q(12236, 'kPa_abs'), T: q(707.0389, 'K') };

  it('reads the superheat table of the edition that is worked (b-api520-ex4-10e)', () => {
    const table = (edition: string) =>
      workMethod('b.steam', steam, edition).steps.find(({ symbol }) => symbol === 'K_{SH}')?.meaning;
    expect(table('API 520-1, 10th edition')).toContain('10th edition');
    expect(table('API 520-1, 7th to 9th edition')).not.toContain('10th edition');
  });

  it('refuses steam that the superheat table does not reach, and a table without temperature', () => {
    const refused = (inputs: Inputs) => workMethod('b.steam', inputs).refused?.code;
    expect(refused({ ...steam, T: q(1400, 'K') })).toBe('OUTSIDE_TABLE');
    expect(refused({ W: q(69615, 'kg/h'), P1: q(12236, 'kPa_abs') })).toBe('INPUT_MISSING');
    expect(refused(steam)).toBeUndefined();
  });

  const inlet: Inputs = {
    W: q(60000, 'kg/h'),
    rho: q(780, 'kg/m3'),
    mu: q(0.6, 'cP'),
    D: q(0.0779, 'm'),
    L: q(5, 'm'),
    roughness: q(4.57e-5, 'm'),
    sum_K: q(1.4, '-'),
    set_pressure: q(700, 'kPa_g'),
  };

  it('warns of flow that is not turbulent, and says where friction lies on a straight line (g-inlet-liquid)', () => {
    const at = (mu: number) => JSON.stringify(workMethod('g.inlet-loss', { ...inlet, mu: q(mu, 'cP') }));
    // Reynolds 454 015 at 0.6 cP; so 3 027 at 90 cP and 1 362 at 200 cP.
    expect(at(90)).toContain('on a straight line');
    expect(at(0.6)).not.toContain('on a straight line');
    expect(at(200)).not.toContain('on a straight line');
    expect(at(200)).toContain('aminar');
  });

  it('refuses a wall rougher than the bore is wide', () => {
    const narrow = workMethod('g.inlet-loss', {
      ...inlet,
      W: q(50, 'kg/h'),
      D: q(4, 'mm'),
      roughness: q(4.5, 'mm'),
    });
    expect(narrow.refused?.field).toBe('roughness');
  });
});
