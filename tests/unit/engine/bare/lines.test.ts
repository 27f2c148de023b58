/*
 * The bare arithmetic of gas lines against numbers worked apart from it: the published Fanno and isentropic tables for k = 1.4
 * and the cases of tests/reference/g-lines.json (named beside each). Figures marked "ODE" come from integrating
 * the differential equations of flow with friction step by step (Dormand–Prince, relative 1e-12) and solving the change of bore
 * apart, so that no closed form of the line functions judges itself.
 */
import { describe, expect, it } from 'vitest';
import { adiabaticLine } from '../../../../src/engine/lines/adiabatic';
import {
  fannoFunction,
  fannoOfS,
  fannoPressureRatio,
  fannoUpstream,
  machSquared,
  stagnationRatio,
  temperatureRatio,
} from '../../../../src/engine/lines/fanno';
import { isothermalLine, isothermalRatio } from '../../../../src/engine/lines/isothermal';
import { boreArea, fluxOf, velocityHeads } from '../../../../src/engine/lines/segment';
import { near } from './near';

const hour = (kg: number) => kg / 3600;
const heads = (f: number, L: number, D: number, K: number) => velocityHeads(f, L, D, K);

describe('Fanno relations', () => {
  it('gives the published table for k = 1.4 (g-fanno-table)', () => {
    for (const [mach, function_, pressure] of [
      [0.2, 14.5333, 5.4554],
      [0.4, 2.30849, 2.6958],
      [0.5, 1.06906, 2.1381],
      [0.6, 0.490822, 1.7634],
      [0.8, 0.07229, 1.2893],
    ] as const) {
      near(fannoFunction(mach, 1.4), function_, 1e-4);
      near(fannoPressureRatio(mach, 1.4), pressure, 5e-5);
      near(fannoUpstream(1, function_, 1.4), 1 / mach ** 2, 1e-4);
    }
    expect(fannoOfS(1, 1.3)).toBe(0);
  });

  it('goes upstream from any Mach number, and stays where no head is paid', () => {
    // 14.5333 − 2.30849 velocity heads lie between Mach 0.2 and Mach 0.4.
    near(fannoUpstream(1 / 0.16, 12.22481, 1.4), 25, 1e-5);
    expect(fannoUpstream(3, 0, 1.4)).toBe(3);
    expect(fannoUpstream(3, Number.NaN, 1.4)).toBe(3);
  });

  it('gives the isentropic table for k = 1.4: T0/T 1.05, p0/p 1/0.84302 at Mach 0.5; 1.2 and 1/0.52828 at Mach 1', () => {
    near(temperatureRatio(0.25, 1.4), 1.05, 1e-12);
    near(stagnationRatio(0.25, 1.4), 1 / 0.84302, 1e-5);
    near(temperatureRatio(1, 1.4), 1.2, 1e-12);
    near(stagnationRatio(1, 1.4), 1 / 0.52828, 1e-5);
    near(stagnationRatio(0.25, 1), Math.exp(0.125), 1e-12);
    near(stagnationRatio(0.25, 1 + 1e-6), Math.exp(0.125), 1e-6);
    near(machSquared(0.25 * 1.05, 1.4), 0.25, 1e-12);
    near(machSquared(0.25, 1), 0.25, 1e-12);
  });
});

describe('bores', () => {
  it('has the area, the flux and the heads of a bore', () => {
    near(boreArea(0.2), 0.01 * Math.PI, 1e-12);
    near(fluxOf({ D: 0.2, N: 0, W: Math.PI }), 100, 1e-12);
    near(velocityHeads(0.016, 20, 0.2, 2), 3.6, 1e-12);
  });
});

describe('isothermal lines', () => {
  const single = { T: 350, Z: 1, M: 30, k: 1.25 };

  it('gives one bore below its limit (g-outlet-iso-1)', () => {
    const D = 0.2027;
    const [only] = isothermalLine([{ D, N: heads(0.016, 20, D, 2), W: hour(20000) }], single, 101325);
    near(only?.inlet, 151183.71, 1e-6);
    near(only?.outlet, 101325, 1e-12);
    near(only?.machOut, 0.4733136, 1e-6);
    near(only?.machIn, (0.4733136 * 101325) / 151183.71, 1e-6);
    expect(only?.choked).toBe(false);
  });

  it('stands at its limit at the end (g-outlet-iso-choked)', () => {
    const D = 0.2027;
    const gas = { T: 380, Z: 1, M: 28, k: 1.3 };
    const [only] = isothermalLine([{ D, N: heads(0.016, 15, D, 2.5), W: hour(60000) }], gas, 101325);
    near(only?.outlet, 173492.72, 1e-6);
    near(only?.inlet, 444558.16, 1e-6);
    near(only?.machOut, 0.87705802, 1e-7);
    expect(only?.choked).toBe(true);
  });

  it('takes the smaller pipe to its limit ahead of an enlargement (g-outlet-iso-2seg), by the Z of each segment', () => {
    const [D1, D2] = [0.1541, 0.3048];
    const W = hour(40000);
    const line = [
      { D: D1, N: heads(0.017, 4, D1, 0.9), W },
      { D: D2, N: heads(0.0145, 60, D2, 3), W },
    ];
    const gas = { T: 360, Z: 0.98, M: 40, k: 1.15 };
    const [first, second] = isothermalLine(line, gas, 120000);
    near(first?.outlet, 161329.47, 1e-6);
    near(first?.inlet, 307403.41, 1e-6);
    near(first?.machOut, 0.93250481, 1e-6);
    near(second?.inlet, 159105.86, 1e-6);
    near(second?.machOut, 0.32044899, 1e-6);
    expect([first?.choked, second?.choked]).toEqual([true, false]);
    const own = isothermalLine(
      line.map((one) => ({ ...one, Z: 0.98 })),
      { ...gas, Z: 0.5 },
      120000,
    );
    near(own[0]?.inlet, 307403.41, 1e-6);
  });

  it('speeds up without loss into a reduction (ODE)', () => {
    const gas = { T: 350, Z: 0.95, M: 30, k: 1.25 };
    const [first, second] = isothermalLine(
      [
        { D: 0.3048, N: 4, W: 10 },
        { D: 0.2027, N: 3, W: 10 },
      ],
      gas,
      120e3,
    );
    near(second?.inlet, 228853.76131, 1e-8);
    near(first?.outlet, 245476.97642, 1e-8);
    near(first?.inlet, 259568.21096, 1e-8);
    near(first?.machOut, 0.15158865912, 1e-8);
    near(second?.machOut, 0.70116246423, 1e-8);
    expect([first?.choked, second?.choked]).toEqual([false, false]);
  });

  it('joins bores that are equal, and lines whose flow changes at a joint, at one pressure', () => {
    const gas = { T: 350, Z: 1, M: 30, k: 1.25 };
    const halves = isothermalLine(
      [
        { D: 0.2027, N: 1.789344, W: hour(20000) },
        { D: 0.2027, N: 1.789344, W: hour(20000) },
      ],
      gas,
      101325,
    );
    near(halves[0]?.inlet, 151183.71, 1e-6);
    expect(halves[0]?.outlet).toBe(halves[1]?.inlet);
  });

  it('meets p1² − p2² = G² Z R T/M (N + 2 ln(p1/p2)) for short and for very long lines, and is 1 where no head is paid', () => {
    for (const [a, N] of [
      [0.2, 3],
      [0.99, 0.01],
      [1e-4, 1e6],
      [1, 5],
    ] as const) {
      const ratio = isothermalRatio(a, N);
      near(ratio ** 2 - 1, a * (N + 2 * Math.log(ratio)), 1e-10);
    }
    near(isothermalRatio(0.5, 0), 1, 1e-9);
    expect(isothermalRatio(1, 0)).toBe(1);
  });
});

describe('adiabatic lines', () => {
  it('gives one bore below Mach 1 (g-outlet-fanno-1)', () => {
    const D = 0.2027;
    const gas = { T: 350, Z: 1, M: 30, k: 1.25 };
    const [only] = adiabaticLine([{ D, N: heads(0.016, 20, D, 2), W: hour(20000) }], gas, 101325);
    near(only?.outlet, 101325, 1e-10);
    near(only?.inlet, 150027.79, 1e-6);
    near(only?.machOut, 0.46699128, 1e-7);
    near(only?.machIn, 0.31766686, 1e-7);
    near(only?.temperatureOut, 340.71215, 1e-7);
    near(only?.temperatureIn, 350 / (1 + 0.125 * 0.31766686 ** 2), 1e-7);
    expect(only?.choked).toBe(false);
  });

  it('keeps the static pressure at an enlargement (g-outlet-fanno-2seg-static)', () => {
    const [D1, D2] = [0.1541, 0.3048];
    const line = [
      { D: D1, N: heads(0.017, 4, D1, 0.9), W: hour(40000) },
      { D: D2, N: heads(0.0145, 60, D2, 3), W: hour(40000) },
    ];
    const [first, second] = adiabaticLine(line, { T: 360, Z: 0.98, M: 40, k: 1.15 }, 120000);
    near(first?.outlet, 158860.02, 1e-6);
    near(first?.inlet, 297549.08, 1e-6);
    near(first?.machOut, 0.91839737, 1e-6);
    near(first?.machIn, 0.50090786, 1e-6);
    near(second?.machIn, 0.24153357, 1e-6);
    near(second?.temperatureOut, 357.26934, 1e-7);
  });

  it('balances momentum at a sudden enlargement (g-outlet-fanno-2seg-momentum)', () => {
    const [D1, D2] = [0.2027, 0.3048];
    const W = hour(25000);
    const gas = { T: 360, Z: 0.98, M: 40, k: 1.15 };
    const line = [
      { D: D1, N: heads(0.016, 6, D1, 0.9), W },
      { D: D2, N: heads(0.0145, 60, D2, 3), W },
    ];
    const [first, second] = adiabaticLine(line, gas, 120000, 'momentum');
    near(second?.inlet, 135799.72, 1e-6);
    near(first?.outlet, 129205.37, 1e-6);
    near(first?.inlet, 149164.23, 1e-6);
    near(first?.machOut, 0.41786573, 1e-6);
    expect(first?.choked).toBe(false);
    // Momentum of both sides, worked by hand from the printed figures: p1 A2 + p1 A1 k Ma1² = p2 A2 (1 + k Ma2²).
    const [p1, m1, p2, m2] = [129205.37, 0.41786573, 135799.72, 0.17677179];
    near(p1 * (D2 ** 2 + D1 ** 2 * gas.k * m1 ** 2), p2 * D2 ** 2 * (1 + gas.k * m2 ** 2), 1e-6);
    // No more than Mach 1 in the smaller pipe, however little its balance would leave.
    const small = adiabaticLine([{ D: 0.1, N: 1, W }, ...line.slice(1)], gas, 120000, 'momentum')[0];
    expect(small?.choked).toBe(true);
    expect(small?.machOut).toBe(1);
    // With one bore there is nothing to balance.
    const same = adiabaticLine(
      [line[1] ?? { D: D2, N: 0, W }, line[1] ?? { D: D2, N: 0, W }],
      gas,
      120000,
      'momentum',
    );
    near(same[0]?.outlet, 135799.72, 1e-6);
  });

  it('keeps the stagnation pressure into a reduction (ODE)', () => {
    const gas = { T: 350, Z: 0.95, M: 30, k: 1.25 };
    const [first, second] = adiabaticLine(
      [
        { D: 0.3048, N: 4, W: 10 },
        { D: 0.2027, N: 3, W: 10 },
      ],
      gas,
      120e3,
    );
    near(second?.machOut, 0.68164671848, 1e-8);
    near(second?.temperatureOut, 330.787754248, 1e-8);
    near(second?.inlet, 224144.81915, 1e-8);
    near(first?.outlet, 240625.33525, 1e-8);
    near(first?.machOut, 0.15441513986, 1e-8);
    near(first?.inlet, 254957.30315, 1e-8);
    near(first?.temperatureIn, 349.07296857, 1e-8);
    expect(first?.choked).toBe(false);
  });

  it('stands at Mach 1 at its end, with its own pressure (quadrature of the Fanno equation)', () => {
    const gas = { T: 350, Z: 0.95, M: 30, k: 1.25 };
    const [only] = adiabaticLine([{ D: 0.2027, N: 3, W: 60 }], gas, 120e3);
    near(only?.outlet, 475964.86384, 1e-9);
    near(only?.machIn, 0.38366698907, 1e-8);
    near(only?.inlet, 1303879.67748, 1e-8);
    expect(only?.choked).toBe(true);
    expect(only?.machOut).toBe(1);
  });

  it('is sonic in the wider pipe too where the narrow one behind it asks for more than it can bring', () => {
    const gas = { T: 350, Z: 1, M: 30, k: 1.25 };
    // W rises against the flow here: a side stream of 5 kg/s leaves ahead of the reduction.
    const [first] = adiabaticLine(
      [
        { D: 0.11, N: 1, W: 15 },
        { D: 0.1, N: 0, W: 0.5 },
      ],
      gas,
      120e3,
    );
    expect(first?.machOut).toBe(1);
    expect(first?.choked).toBe(true);
  });
});
