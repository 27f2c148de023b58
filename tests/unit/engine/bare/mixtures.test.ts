/*
 * The bare arithmetic of lines of liquids and mixtures against numbers worked apart from it: Bernoulli by hand, the isothermal
 * cases of tests/reference/g-lines.json (an ideal gas is the mixture of ω = 1), and figures marked "ODE": the differential
 * equation of homogeneous flow with friction and weight integrated step by step (Dormand–Prince, relative 1e-11), integrals by
 * adaptive quadrature.
 */
import { describe, expect, it } from 'vitest';
import { liquidDrop, liquidLine } from '../../../../src/engine/lines/liquid';
import { headsPaid, marchedLine, upstreamPressure } from '../../../../src/engine/lines/march';
import {
  densityIntegral,
  homogeneousMach,
  limitPressure,
  liquidCurve,
  omegaCurve,
  volumeAt,
  volumeCurve,
} from '../../../../src/engine/lines/volume';
import { near } from './near';

/** ω = 5 at 10 bar and 0.002 m³/kg: v = 0.01·(10 bar/P) − 0.008, so that G √|dv/dP| = 100 G/P. */
const flashing = omegaCurve(1e6, 0.002, 5);
/** Straight in 1/P by pieces: b = 120 000 J/kg below 2 bar, 40 000 J/kg above. */
const bent = volumeCurve([
  { P: 4e5, v: 0.3 },
  { P: 1e5, v: 1 },
  { P: 2e5, v: 0.4 },
]);

describe('volumes against pressure', () => {
  it('follows the omega form below the inlet pressure and a gas above it', () => {
    near(volumeAt(flashing, 1e6), 0.002, 1e-12);
    near(volumeAt(flashing, 5e5), 0.012, 1e-12);
    near(volumeAt(flashing, 2e6), 0.001, 1e-12);
    // ω below 1 keeps a volume at any pressure: the form itself goes on.
    near(volumeAt(omegaCurve(1e6, 0.002, 0.5), 2e6), 0.0015, 1e-12);
    near(volumeAt(omegaCurve(1e6, 0.002, 1), 4e6), 0.0005, 1e-12);
    near(volumeAt(liquidCurve(800), 3e5), 1 / 800, 1e-12);
  });

  it('goes through its points in any order, and on beyond both ends', () => {
    expect(bent).toBeDefined();
    for (const [P, v] of [
      [1e5, 1],
      [2e5, 0.4],
      [4e5, 0.3],
      [0.5e5, 2.2],
      [8e5, 0.25],
      [1.6e5, 0.55],
    ] as const)
      near(volumeAt(bent ?? [], P), v, 1e-12);
    const gas = volumeCurve([
      { P: 1e5, v: 1 },
      { P: 2e5, v: 0.4 },
    ]);
    near(volumeAt(gas ?? [], 4e5), 0.2, 1e-12);
    const liquid = volumeCurve([
      { P: 1e5, v: 0.001 },
      { P: 2e5, v: 0.001 },
    ]);
    near(volumeAt(liquid ?? [], 9e5), 0.001, 1e-12);
  });

  it('refuses points that are no fluid', () => {
    const good = { P: 2e5, v: 0.4 };
    expect(volumeCurve([])).toBeUndefined();
    expect(volumeCurve([good])).toBeUndefined();
    expect(volumeCurve([{ P: 0, v: 1 }, good])).toBeUndefined();
    expect(volumeCurve([{ P: -1e5, v: 1 }, good])).toBeUndefined();
    expect(
      volumeCurve([
        { P: 1e5, v: 0 },
        { P: 2e5, v: 0 },
      ]),
    ).toBeUndefined();
    expect(
      volumeCurve([
        { P: 1e5, v: 1 },
        { P: 2e5, v: 0 },
      ]),
    ).toBeUndefined();
    expect(
      volumeCurve([
        { P: 1e5, v: 1 },
        { P: 2e5, v: -1 },
      ]),
    ).toBeUndefined();
    expect(volumeCurve([{ P: 2e5, v: 0.5 }, good])).toBeUndefined();
    expect(volumeCurve([{ P: 1e5, v: 0.3 }, good])).toBeUndefined();
    expect(volumeCurve([{ P: 1e5, v: Number.NaN }, good])).toBeUndefined();
    expect(volumeAt([], 1e5)).toBeNaN();
    expect(homogeneousMach([], 10, 1e5)).toBeNaN();
  });

  it('has the Mach number G √|dv/dP| of the mixture', () => {
    near(homogeneousMach(flashing, 1500, 3e5), 0.5, 1e-12);
    near(homogeneousMach(bent ?? [], 500, 4e5), 0.25, 1e-12);
    expect(homogeneousMach(liquidCurve(800), 5000, 1e5)).toBe(0);
  });

  it('finds the lowest pressure that lets a flux through, at a bend too', () => {
    expect(limitPressure(flashing, 1500, 3e5)).toBe(3e5);
    near(limitPressure(flashing, 1500, 1e5), 1.5e5, 1e-12);
    near(limitPressure(bent ?? [], 500, 1e5), 500 * Math.sqrt(1.2e5), 1e-12);
    expect(limitPressure(bent ?? [], 500, 3e5)).toBe(3e5);
    // At 700 kg/(m²·s) the lower piece is too steep at 2 bar and the upper one is not: the bend is the limit.
    expect(limitPressure(bent ?? [], 700, 1e5)).toBe(2e5);
    near(limitPressure(bent ?? [], 3000, 1e5), 6e5, 1e-12);
    expect(limitPressure(liquidCurve(800), 5000, 1e5)).toBe(1e5);
  });

  it('integrates the density (quadrature)', () => {
    near(densityIntegral(flashing, 3e5, 9e5), 81020129.70486, 1e-10);
    near(densityIntegral(flashing, 9e5, 1.5e6), 352573786.97206, 1e-10);
    near(densityIntegral(omegaCurve(1e6, 0.002, 1), 3e5, 9e5), (81e10 - 9e10) / 4000, 1e-12);
    near(densityIntegral(omegaCurve(1e6, 0.002, 1 + 1e-9), 3e5, 9e5), (81e10 - 9e10) / 4000, 1e-8);
    near(densityIntegral(liquidCurve(800), 3e5, 9e5), 4.8e8, 1e-12);
    expect(densityIntegral(flashing, 3e5, 3e5)).toBe(0);
  });
});

describe('velocity heads of a mixture', () => {
  it('pays N ρ v²/2 in a liquid', () => {
    // 1 273.24 kg/(m²·s) of water lose 4 · G²/(2 ρ) = 3 242.3 Pa.
    near(upstreamPressure(liquidCurve(1000), 1273.24, 4, 1e5), 1e5 + (4 * 1273.24 ** 2) / 2000, 1e-11);
    near(headsPaid(liquidCurve(1000), 1273.24, 103242.28, 1e5), 4, 1e-5);
    expect(upstreamPressure(flashing, 1500, 0, 3e5)).toBe(3e5);
    expect(upstreamPressure(flashing, 1500, -1, 3e5)).toBe(3e5);
  });

  it('expands a flashing mixture on its way down (ODE)', () => {
    near(upstreamPressure(flashing, 1500, 4, 3e5), 410030.06219, 1e-9);
    near(upstreamPressure(flashing, 1500, 20, 9e5), 962916.38549, 1e-9);
    near(headsPaid(flashing, 1500, 410030.06219, 3e5), 4, 1e-8);
  });

  it('finds no pressure where none can be told', () => {
    expect(upstreamPressure(flashing, Number.NaN, 4, 3e5)).toBeUndefined();
    expect(upstreamPressure([], 1500, 4, 3e5)).toBeUndefined();
  });
});

describe('lines of mixtures', () => {
  const W = 1500 * 0.01 * Math.PI;

  it('works an ideal gas as the isothermal line does (g-outlet-iso-1, g-outlet-iso-choked, g-outlet-iso-2seg)', () => {
    const gas = (T: number, Z: number, M: number) => omegaCurve(1e6, (Z * 8314.462618 * T) / M / 1e6, 1);
    const D = 0.2027;
    const one = marchedLine([{ D, N: 0.32 / D + 2, W: 20000 / 3600 }], gas(350, 1, 30), 101325)?.[0];
    near(one?.inlet, 151183.71, 1e-6);
    near(one?.volumeOut, (8314.462618 * 350) / 30 / 101325, 1e-12);
    near(one?.volumeIn, (8314.462618 * 350) / 30 / 151183.71, 1e-6);
    expect(one?.choked).toBe(false);
    const choked = marchedLine([{ D, N: 0.24 / D + 2.5, W: 60000 / 3600 }], gas(380, 1, 28), 101325)?.[0];
    near(choked?.outlet, 173492.72, 1e-6);
    near(choked?.inlet, 444558.16, 1e-6);
    near(choked?.machOut, 1, 1e-9);
    near(choked?.machIn, 173492.72 / 444558.16, 1e-6);
    expect(choked?.choked).toBe(true);
    const [D1, D2] = [0.1541, 0.3048];
    const both = marchedLine(
      [
        { D: D1, N: 0.068 / D1 + 0.9, W: 40000 / 3600 },
        { D: D2, N: 0.87 / D2 + 3, W: 40000 / 3600 },
      ],
      gas(360, 0.98, 40),
      120000,
    );
    near(both?.[0]?.outlet, 161329.47, 1e-6);
    near(both?.[0]?.inlet, 307403.41, 1e-6);
    near(both?.[1]?.inlet, 159105.86, 1e-6);
    expect(both?.map(({ choked: c }) => c)).toEqual([true, false]);
  });

  it('speeds a gas up into a reduction as the isothermal line does (ODE)', () => {
    const curve = omegaCurve(1e6, (0.95 * 8314.462618 * 350) / 30 / 1e6, 1);
    const line = marchedLine(
      [
        { D: 0.3048, N: 4, W: 10 },
        { D: 0.2027, N: 3, W: 10 },
      ],
      curve,
      120e3,
    );
    near(line?.[0]?.outlet, 245476.97642, 1e-6);
    near(line?.[0]?.inlet, 259568.21096, 1e-6);
  });

  it('marches a flashing mixture through a reduction (ODE)', () => {
    const line = marchedLine(
      [
        { D: 0.3, N: 6, W },
        { D: 0.2, N: 4, W },
      ],
      flashing,
      3e5,
    );
    near(line?.[1]?.inlet, 410030.06219, 1e-9);
    near(line?.[0]?.outlet, 425643.40668, 1e-5);
    near(line?.[0]?.inlet, 446043.07053, 1e-5);
    near(line?.[0]?.machOut, 0.15662562986, 1e-5);
    near(line?.[1]?.machOut, 0.5, 1e-9);
  });

  it('brings a liquid into a reduction by Bernoulli', () => {
    const line = marchedLine(
      [
        { D: 0.2, N: 0, W: 10 * Math.PI },
        { D: 0.1, N: 0, W: 10 * Math.PI },
      ],
      liquidCurve(1000),
      2e5,
    );
    // 4 m/s ahead of it and 1 m/s before: ρ (4² − 1²)/2 = 7 500 Pa.
    near(line?.[0]?.inlet, 207500, 1e-9);
    const wider = marchedLine(
      [
        { D: 0.1, N: 0, W: 10 * Math.PI },
        { D: 0.2, N: 0, W: 10 * Math.PI },
      ],
      liquidCurve(1000),
      2e5,
    );
    expect(wider?.[0]?.inlet).toBe(2e5);
  });

  it('lifts and lowers a liquid by its weight', () => {
    const water = liquidCurve(1000);
    const at = (rise: number) => marchedLine([{ D: 0.1, N: 4, W: 10, rise }], water, 1e5)?.[0]?.inlet;
    const friction = (4 * (10 / (Math.PI / 400)) ** 2) / 2000;
    near(at(3), 1e5 + friction + 29419.95, 1e-10);
    near(at(-3), 1e5 + friction - 29419.95, 1e-10);
    // 20 m of falling water would leave less than no pressure at its top.
    expect(at(-20)).toBeUndefined();
  });

  it('lifts and lowers a flashing mixture with its weight (ODE)', () => {
    const at = (rise: number) => marchedLine([{ D: 0.2, N: 4, W, rise }], flashing, 3e5)?.[0]?.inlet;
    near(at(0), 410030.06219, 1e-9);
    near(at(20), 419957.31482, 2e-5);
    near(at(-20), 400497.12051, 2e-5);
    // Without friction too the flow slows down on the way up, and the weight tells by 1/(1 − Ma²) more than at rest.
    near(marchedLine([{ D: 0.2, N: 0, W, rise: 20 }], flashing, 3e5)?.[0]?.inlet, 310442.9094, 2e-5);
    near(marchedLine([{ D: 0.2, N: 0, W, rise: -20 }], flashing, 3e5)?.[0]?.inlet, 289787.59284, 2e-5);
    // A fall cannot bring the mixture below the pressure at which it chokes, 1.5 bar.
    near(marchedLine([{ D: 0.2, N: 0, W, rise: -2000 }], flashing, 3e5)?.[0]?.inlet, 1.5e5, 1e-9);
  });

  it('answers nothing where no pressure can be found', () => {
    expect(marchedLine([{ D: 0.2, N: 4, W: Number.NaN }], flashing, 3e5)).toBeUndefined();
    expect(marchedLine([{ D: 0.2, N: 4, W }], [], 3e5)).toBeUndefined();
    expect(
      marchedLine(
        [
          { D: 0.3, N: 4, W: Number.NaN },
          { D: 0.2, N: 0, W },
        ],
        flashing,
        3e5,
      ),
    ).toBeUndefined();
    expect(
      marchedLine(
        [
          { D: 0.3, N: 4, W },
          { D: 0.2, N: 0, W: Number.NaN },
        ],
        flashing,
        3e5,
      ),
    ).toBeUndefined();
    expect(marchedLine([{ D: 0.2, N: 4, W: Number.NaN, rise: 2 }], flashing, 3e5)).toBeUndefined();
    expect(marchedLine([], flashing, 3e5)).toEqual([]);
  });
});

describe('lines full of liquid', () => {
  const first = { D: 0.1, N: 4, W: 2.5 * Math.PI, rise: 3 };
  const second = { D: 0.1, N: 2, W: 2.5 * Math.PI };

  it('adds friction and weight by hand: 1 m/s of 1 000 kg/m³, 4 heads and 3 m', () => {
    near(liquidDrop(first, 1000), 2000 + 29419.95, 1e-9);
    near(liquidDrop(second, 1000), 1000, 1e-9);
    near(liquidDrop({ ...second, W: 5 * Math.PI }, 1000), 4000, 1e-9);
    const [upper, lower] = liquidLine([first, second], 1000, 1e5);
    near(lower, 101000, 1e-9);
    near(upper, 132419.95, 1e-9);
  });
});
