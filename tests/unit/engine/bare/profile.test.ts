/*
 * What is drawn along a line, against the cases of tests/reference/g-lines.json and the equations of flow with friction integrated
 * step by step to the middle of a segment ("ODE": Dormand–Prince, relative 1e-12).
 */
import { describe, expect, it } from 'vitest';
import { adiabaticProfile, isothermalProfile, marchedProfile } from '../../../../src/engine/lines/profile';
import { liquidCurve, omegaCurve } from '../../../../src/engine/lines/volume';
import { near } from './near';

const gas = { T: 350, Z: 0.95, M: 30, k: 1.25 };
const r = (0.95 * 8314.462618) / 30;
const reducing = [
  { D: 0.3048, N: 4, W: 10, L: 12 },
  { D: 0.2027, N: 3, W: 10, L: 6 },
];

describe('profiles', () => {
  it('runs an isothermal line from the device to its end (ODE)', () => {
    const all = isothermalProfile(reducing, gas, 120e3, 4);
    expect(all.map(({ x }) => x)).toEqual([0, 3, 6, 9, 12, 12, 13.5, 15, 16.5, 18]);
    expect(all.map(({ segment }) => segment)).toEqual([1, 1, 1, 1, 1, 2, 2, 2, 2, 2]);
    near(all[0]?.P, 259568.21096, 1e-8);
    near(all[4]?.P, 245476.97642, 1e-8);
    near(all[5]?.P, 228853.76131, 1e-8);
    near(all[7]?.P, 188974.24326, 1e-8);
    near(all[9]?.P, 120e3, 1e-10);
    near(all[9]?.mach, 0.70116246423, 1e-8);
    near(all[9]?.rho, 120e3 / (r * 350), 1e-10);
    near(all[9]?.velocity, (10 / (Math.PI / 4) / 0.2027 ** 2 / 120e3) * r * 350, 1e-10);
    expect(all[7]?.T).toBe(350);
    const own = isothermalProfile(
      reducing.map((one) => ({ ...one, Z: 0.95 })),
      { ...gas, Z: 0.3 },
      120e3,
      4,
    );
    near(own[7]?.P, 188974.24326, 1e-8);
    expect(isothermalProfile(reducing, gas, 120e3)).toHaveLength(42);
  });

  it('runs an adiabatic line, cooling as it speeds up (ODE)', () => {
    const all = adiabaticProfile(reducing, gas, 120e3, 'static', 4);
    near(all[0]?.P, 254957.30315, 1e-8);
    near(all[0]?.T, 349.07296857, 1e-8);
    near(all[7]?.P, 184355.20443, 1e-8);
    near(all[7]?.mach, 0.45071228184, 1e-8);
    near(all[9]?.P, 120e3, 1e-9);
    near(all[9]?.T, 330.787754248, 1e-8);
    near(all[9]?.velocity, 0.68164671848 * Math.sqrt(1.25 * r * 330.787754248), 1e-8);
    near(all[9]?.rho, 120e3 / (r * 330.787754248), 1e-8);
    expect(all.map(({ x }) => x)).toEqual([0, 3, 6, 9, 12, 12, 13.5, 15, 16.5, 18]);
    expect(adiabaticProfile(reducing, gas, 120e3)).toHaveLength(42);
    // By the momentum balance an enlargement gives pressure back: the smaller pipe ends below the beginning of the wider one.
    const wider = adiabaticProfile(reducing.toReversed(), gas, 120e3, 'momentum', 4);
    expect(wider[4]?.P).toBeLessThan((wider[5]?.P ?? 0) - 1000);
  });

  it('runs a mixture by friction and a liquid by friction and weight', () => {
    const W = 1500 * 0.01 * Math.PI;
    const mixture = marchedProfile([{ D: 0.2, N: 4, W, L: 10 }], omegaCurve(1e6, 0.002, 5), 3e5, 2);
    near(mixture[0]?.P, 410030.06219, 1e-8);
    near(mixture[2]?.P, 3e5, 1e-9);
    near(mixture[2]?.mach, 0.5, 1e-9);
    near(mixture[2]?.velocity, 1500 * (1e4 / 3e5 - 0.008), 1e-9);
    near(mixture[2]?.rho, 1 / (1e4 / 3e5 - 0.008), 1e-9);
    const lifted = marchedProfile(
      [{ D: 0.1, N: 4, W: 2.5 * Math.PI, L: 10, rise: 3 }],
      liquidCurve(1000),
      1e5,
      2,
    );
    near(lifted[0]?.P, 131419.95, 1e-9);
    near(lifted[1]?.P, 115709.975, 1e-9);
    near(lifted[2]?.P, 1e5, 1e-9);
    expect(marchedProfile([{ D: 0.1, N: 4, W: Number.NaN, L: 1 }], liquidCurve(1000), 1e5)).toEqual([]);
    expect(marchedProfile([{ D: 0.2, N: 4, W, L: 10 }], liquidCurve(1000), 3e5)).toHaveLength(21);
  });
});
