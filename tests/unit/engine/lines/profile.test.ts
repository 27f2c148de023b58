/* The profile of an outlet sheet starts and ends with the pressures that the sheet itself gives. */
import { describe, expect, it } from 'vitest';
import { workMethod } from '../../../../src/engine/catalog';
import { outletProfile } from '../../../../src/engine/methods/g-lines/profile';
import { type Q, toSI } from '../../../../src/engine/quantity';
import { type Inputs } from '../../../../src/engine/sheet';

const q = (value: number, unit = '-'): Q => ({ value, unit });
const LINE: Inputs = {
  W: q(40000, 'kg/h'),
  D: q(154.1, 'mm'),
  D_2: q(304.8, 'mm'),
  L: q(4, 'm'),
  L_2: q(60, 'm'),
  sum_K: q(0.9),
  sum_K_2: q(3),
  f_darcy: q(0.016),
  P_exit_ambient: q(120, 'kPa_abs'),
};
const GAS: Inputs = { Z: q(0.98), M: q(40, 'kg/kmol'), k: q(1.15) };
const SHEETS: [string, Inputs][] = [
  ['g.outlet-isothermal', { ...LINE, ...GAS, T: q(360, 'K') }],
  ['g.outlet-fanno', { ...LINE, ...GAS, T0: q(360, 'K') }],
  ['g.outlet-homogeneous', { ...LINE, P0: q(600, 'kPa_abs'), v0: q(0.02, 'm3/kg'), omega: q(6) }],
  ['g.outlet-liquid', { ...LINE, rho: q(780, 'kg/m3') }],
];

describe.each(SHEETS)('%s', (method, inputs) => {
  it('runs from the back pressure at the device to the end of the line, 64 m away', () => {
    const worked = workMethod(method, inputs);
    const points = outletProfile(`${method}@1`, inputs, 10);
    expect(points).toHaveLength(22);
    expect((points[0]?.P ?? 0) / toSI(worked.outputs['total_back_pressure'] as Q)).toBeCloseTo(1, 6);
    expect(points.at(-1)).toMatchObject({ segment: 2, x: 64 });
    expect(points.at(-1)?.P).toBeCloseTo(120e3, 0);
  });
});

it('is empty for other methods and for sheets that are refused', () => {
  expect(outletProfile('g.noise', LINE)).toEqual([]);
  expect(outletProfile('g.outlet-fanno', { W: q(1, 'kg/s') })).toEqual([]);
});
