/* Limits of pressure: both floor columns, the fire trap, EN, the lower of two limits, tolerances. */
import { describe, expect, it } from 'vitest';
import {
  burstTolerance,
  coldDifferentialTestPressure,
  enBlowdown,
  enOverpressure,
  maap,
  maxSetPressure,
  relievingPressure,
  reseatPressure,
  setTolerance,
} from '../../../src/engine/methods/h-limits';

const SI = { basis: 'asme-viii-1', units: 'SI' } as const;
const US = { basis: 'asme-viii-1', units: 'US' } as const;
const EN = { basis: 'en', units: 'SI' } as const;

describe('maximum accumulated pressure', () => {
  it('takes percentages well above the floors (ASME VIII-1 UG-125(c))', () => {
    expect(maap(1000, 'single', SI)).toBeCloseTo(1100, 9);
    expect(maap(1000, 'multiple', SI)).toBeCloseTo(1160, 9);
    expect(maap(1000, 'fire', SI)).toBeCloseTo(1210, 9);
  });

  it('takes the floors of the code’s own unit system, which are not conversions of each other (UG-125(c); SI f4 from memory)', () => {
    expect(maap(150, 'single', SI)).toBe(170);
    expect(maap(150, 'multiple', SI)).toBe(180);
    expect(maap(20, 'single', US)).toBe(23);
    expect(maap(20, 'multiple', US)).toBe(24);
    expect(30 / 6.894757293168361 / 4).toBeGreaterThan(1.08);
  });

  it('leaves the fire limit below the limit for several devices under about 19 psi, as the code has it', () => {
    expect(maap(15, 'fire', US)).toBeCloseTo(18.15, 9);
    expect(maap(15, 'multiple', US)).toBe(19);
  });

  it('is 110 % of PS under EN for every class, with a site figure for fire (PED Annex I 7.3)', () => {
    expect(maap(1000, 'single', EN)).toBeCloseTo(1100, 9);
    expect(maap(1000, 'multiple', EN)).toBeCloseTo(1100, 9);
    expect(maap(1000, 'fire', EN)).toBeCloseTo(1100, 9);
    expect(maap(1000, 'fire', { ...EN, enFireLimit: 1.21 })).toBeCloseTo(1210, 9);
    expect(maap(50, 'single', EN)).toBeCloseTo(55, 9);
  });

  it('is 106 % for a boiler (ASME I, from memory)', () => {
    expect(maap(1000, 'single', { basis: 'asme-i', units: 'SI' })).toBeCloseTo(1060, 9);
  });
});

describe('relieving pressure and set pressures', () => {
  it('is the lower of the limit on the MAWP and the class factor on the highest set', () => {
    expect(relievingPressure(1000, 1000, 'single', SI)).toBeCloseTo(1100, 9);
    expect(relievingPressure(1000, 900, 'single', SI)).toBeCloseTo(990, 9);
    expect(relievingPressure(1000, 1050, 'multiple', SI)).toBeCloseTo(1160, 9);
    expect(relievingPressure(1000, 150, 'single', SI)).toBe(170);
  });

  it('lets the first device be set at MAWP, others at 105 %, a supplemental fire device at 110 % (UG-134)', () => {
    expect(maxSetPressure(1000, 'first')).toBe(1000);
    expect(maxSetPressure(1000, 'additional')).toBeCloseTo(1050, 9);
    expect(maxSetPressure(1000, 'supplemental-fire')).toBeCloseTo(1100, 9);
    expect(maxSetPressure(1000, 'supplemental-fire', 'en')).toBeCloseTo(1050, 9);
  });
});

describe('tolerances', () => {
  it('changes from a fixed to a proportional tolerance where the code says (UG-134(d), (e), (f))', () => {
    expect(setTolerance(70, US)).toBe(2);
    expect(setTolerance(71, US)).toBeCloseTo(2.13, 9);
    expect(setTolerance(500, SI)).toBe(15);
    expect(setTolerance(600, SI)).toBeCloseTo(18, 9);
    expect(burstTolerance(40, 'US')).toBe(2);
    expect(burstTolerance(400, 'SI')).toBeCloseTo(20, 9);
  });

  it('is the greater of 3 % and 10 kPa under EN, with its own overpressure and blowdown (ISO 4126-1:2013/Amd 1:2016)', () => {
    expect(setTolerance(200, EN)).toBe(10);
    expect(setTolerance(1000, EN)).toBeCloseTo(30, 9);
    expect(enOverpressure(50)).toBe(10);
    expect(enBlowdown(100, 'gas')).toEqual({ min: 2, max: 30 });
    expect(enBlowdown(1000, 'liquid')).toEqual({ min: 25, max: 200 });
  });

  it('subtracts a constant back pressure from a conventional spring only', () => {
    const options = { constantSuperimposed: 30, multiplier: 1.02 };
    expect(coldDifferentialTestPressure(250, { ...options, type: 'conventional' })).toBeCloseTo(224.4, 9);
    expect(coldDifferentialTestPressure(250, { ...options, type: 'balanced' })).toBeCloseTo(255, 9);
    expect(coldDifferentialTestPressure(250, { ...options, type: 'pilot' })).toBeCloseTo(255, 9);
    expect(reseatPressure(1000, 0.07)).toBeCloseTo(930, 9);
  });
});
