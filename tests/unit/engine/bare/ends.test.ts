/*
 * What feeds a line and what leaves it, in bare numbers: Perry's air vent, Crane's factors of complete turbulence, the public
 * worked figures of Hooper and Darby, the API 521 noise example and the cases of tests/reference/g-lines.json (named beside each).
 * Colebrook factors come from the closed form with Lambert's W (Keady 1998), exact and without rounds.
 */
import { describe, expect, it } from 'vitest';
import {
  homogeneousVolume,
  noiseAt,
  noiseAt30,
  noiseChart,
  sonicMomentum,
  soundPower,
  soundPowerAfter,
  soundSum,
  thrust,
} from '../../../../src/engine/lines/discharge';
import { exitState, inletLine, pipeDischarge } from '../../../../src/engine/lines/entrance';
import { fittingK, fittingNamed, threeK, turbulentFactor, twoK } from '../../../../src/engine/lines/fittings';
import { colebrook, frictionFactor, reynolds } from '../../../../src/engine/lines/friction';
import { boreArea, type LineGas } from '../../../../src/engine/lines/segment';
import {
  accelerationDrop,
  longestLine,
  quarterWave,
  returnTime,
} from '../../../../src/engine/lines/stability';
import { near } from './near';

const hour = (kg: number) => kg / 3600;

describe('lines fed from a vessel', () => {
  const air: LineGas = { T: 293.15, Z: 1, M: 28.97, k: 1.4 };

  it("gives Perry's air vent, choked at its end (g-perry-vent)", () => {
    const vent = pipeDischarge(1101325, air, 5.6, 101325);
    near(vent?.flux, 1254.0372, 1e-5);
    near(vent?.exit, 280636.12, 1e-5);
    expect(vent?.choked).toBe(true);
    expect(vent?.machOut).toBe(1);
    near(vent?.exitTemperature, 293.15 / 1.2, 1e-9);
    near(vent?.exitStagnation, 280636.12 / 0.52828, 2e-5);
  });

  it('lets out less than sonic flow where the pressure is small (quadrature of the Fanno equation)', () => {
    const vent = pipeDischarge(150e3, { ...air, T: 300 }, 5, 101325);
    near(vent?.machIn, 0.2519282872, 1e-7);
    near(vent?.machOut, 0.35466802991, 1e-7);
    near(vent?.flux, 146.721776965, 1e-7);
    near(vent?.exit, 101325, 1e-9);
    near(vent?.exitTemperature, 292.6378513819, 1e-8);
    expect(vent?.choked).toBe(false);
    expect(pipeDischarge(101325, air, 5, 101325)).toBeUndefined();
    expect(pipeDischarge(90e3, air, 5, 101325)).toBeUndefined();
  });

  it('gives the loss of an inlet line at Mach 0.3 to 0.4 (g-inlet-fanno)', () => {
    const gas = { T: 350, Z: 0.95, M: 30, k: 1.25 };
    const flux = hour(40000) / boreArea(0.1023);
    const line = inletLine(1201325, gas, flux, 1.8);
    near(line?.machIn, 0.32398814, 1e-6);
    near(line?.machOut, 0.38006068, 1e-6);
    near(line?.exit, 957138.75, 1e-6);
    near(line?.exitStagnation, 1046725.3, 1e-6);
    expect(line?.choked).toBe(false);
    // Mach 0.324 chokes after 4.9 heads at k = 1.25; and no line passes more than its sonic flux, here 2 600 kg/(m²·s).
    expect(inletLine(1201325, gas, flux, 6)).toBeUndefined();
    expect(inletLine(1201325, gas, 3000, 0)).toBeUndefined();
    expect(inletLine(1201325, gas, Number.NaN, 1)).toBeUndefined();
  });

  it('leaves an opening sonic above the ambient pressure, or below Mach 1 at it (g-reaction-full; ODE)', () => {
    const gas = { T: 400, Z: 1, M: 28, k: 1.3 };
    const sonic = exitState(hour(50000), boreArea(0.2027), gas, 101325);
    near(sonic.pressure, 121315.87, 1e-6);
    near(sonic.temperature, 347.82609, 1e-7);
    near(sonic.velocity, 366.42984, 1e-7);
    expect([sonic.mach, sonic.choked]).toEqual([1, true]);
    const slow = exitState(2, 0.0323, gas, 101325);
    near(slow.temperature, 397.97346543, 1e-9);
    near(slow.velocity, 72.21728072, 1e-9);
    near(slow.mach, 0.18424865237, 1e-9);
    expect([slow.pressure, slow.choked]).toEqual([101325, false]);
  });
});

describe('friction', () => {
  it('solves Colebrook and White to the last figures (closed form; 0.018513866 stands in a public library too)', () => {
    for (const [Re, relative, f] of [
      [1e5, 1e-4, 0.018513866077471648],
      [1e5, 0, 0.017989773084273842],
      [4000, 0, 0.039907014055634904],
      [4000, 2e-3, 0.041890912816928666],
      [1e8, 0.05, 0.07155090409108328],
      [1e7, 1e-3, 0.019667052432096772],
      [3, 0, 2.7831081402203983],
      [50, 0.3, 0.3967730198462628],
    ] as const)
      near(colebrook(Re, relative), f, 1e-12);
    // Far below any turbulence six rounds leave the ninth figure open.
    near(colebrook(0.5, 0), 36.828836885561806, 1e-8);
  });

  it('is 64/Re up to 2 300, Colebrook from 4 000, and straight between', () => {
    near(frictionFactor(1000, 0.01), 0.064, 1e-12);
    near(frictionFactor(2300, 0.01), 0.027826087, 1e-8);
    near(frictionFactor(4000, 2e-3), 0.0418909128169, 1e-10);
    near(frictionFactor(1e5, 1e-4), 0.0185138660775, 1e-10);
    near(frictionFactor(3150, 0), (64 / 2300 + 0.0399070140556) / 2, 1e-10);
    near(frictionFactor(2725, 0), 0.75 * (64 / 2300) + 0.25 * 0.0399070140556, 1e-10);
  });

  it('has the Reynolds number of g-inlet-gas and g-inlet-liquid', () => {
    near(reynolds(hour(30000), 0.1541, 1.1e-5), 6259412.2, 1e-8);
    near(reynolds(hour(60000), 0.0779, 6e-4), 454014.96, 1e-8);
  });
});

describe('fittings', () => {
  it('has the factors of complete turbulence of Crane TP-410 as printed: 0.019 at 2 in, 0.015 at 6 in, 0.014 at 8 in', () => {
    for (const [D, printed] of [
      [0.0525, 0.019],
      [0.1541, 0.015],
      [0.2027, 0.014],
      [0.3048, 0.013],
    ] as const)
      expect(Math.abs(turbulentFactor(D) - printed)).toBeLessThanOrEqual(0.0005);
    near(turbulentFactor(0.37), 0.25 / Math.log10(4.57e-5 / (3.7 * 0.37)) ** 2, 1e-12);
  });

  it('gives a public worked figure by two and by three constants', () => {
    // Globe valve of 2 in at Re 10 000: 1500/10 000 + 4 (1 + 1/2) = 6.15; angle valve: 950/10 000 + 0.25 (1 + 4/2^0.3) = 1.1572524.
    near(twoK(1500, 4, { D: 0.0508, Re: 1e4 }), 6.15, 1e-12);
    near(threeK(950, 0.25, 4, { D: 0.0508, Re: 1e4 }), 1.1572523963562353, 1e-12);
    near(threeK(950, 0.25, 4, { D: 0.0525, Re: 1e4, nominal: 2 }), 1.1572523963562353, 1e-12);
  });

  it('finds a fitting and its resistance by each way, or says nothing where a way has no figure', () => {
    const place = { D: 0.0508, Re: 1e4 };
    const globe = fittingNamed('globe');
    expect(globe).toBe(fittingNamed('globe valve'));
    expect(fittingNamed('trombone')).toBeUndefined();
    if (!globe) throw new Error('a globe valve is missing');
    near(fittingK(globe, '2-K', place), 6.15, 1e-12);
    near(fittingK(globe, 'length', place), 340 * turbulentFactor(0.0508), 1e-12);
    near(fittingK(globe, '3-K', place), 0.15 + 1.7 * (1 + 3.6 / 2 ** 0.3), 1e-12);
    expect(fittingK(globe, 'K', place)).toBeUndefined();
    const bare = { key: 'x', name: 'x' };
    for (const method of ['K', 'length', '2-K', '3-K'] as const) {
      expect(fittingK(bare, method, place)).toBeUndefined();
      expect(fittingK({ ...bare, K: 0.5 }, method, place)).toBe(0.5);
    }
  });
});

describe('discharges', () => {
  it('has the momentum of API 520-2 in both systems (g-reaction-si, g-reaction-us)', () => {
    near(sonicMomentum(10, 1.3, 400, 28, 'SI'), 3665.6285, 1e-7);
    near(sonicMomentum(60000, 1.25, 720, 30, 'US'), 598.60389, 1e-7);
  });

  it('has the thrust of g-reaction-full and of g-reaction-2ph', () => {
    near(thrust(hour(50000), 366.42984, boreArea(0.2027), 121315.87, 101325), 5734.4062, 1e-7);
    const W = hour(80000);
    const velocity = (W / 0.03227) * homogeneousVolume(0.25, 4, 600);
    near(thrust(W, velocity, 0.03227, 180e3, 101325), 3514.4072, 1e-7);
  });

  it('has the noise of the API 521 example, 113.68 dB (g-api521-noise), and spreads it by distance', () => {
    near(noiseChart(330 / 101.325), 54.095383, 1e-7);
    near(noiseAt30(330 / 101.325, 14.6, 353), 113.68411, 1e-7);
    near(noiseChart(2), 87.9084 * 0.30102999566 + 12.7647, 1e-10);
    near(noiseChart(2.92), 4.8239 * Math.log10(2.92) + 51.6217, 1e-12);
    near(noiseAt(113.68411, 300), 93.68411, 1e-9);
    near(noiseAt(113.68411, 10, 100), 133.68411, 1e-9);
    near(noiseAt(113.68411, 60), 113.68411 - 6.02059991, 1e-9);
    near(soundSum([90, 90]), 93.01029996, 1e-9);
    near(soundSum([90, 80]), 90.41392685, 1e-9);
  });

  it('has the sound power of a let-down by hand: (8/10)^3.6 · 20² · 20^1.2 gives 38.144 dB over 126.1', () => {
    near(soundPower(20, 10e5, 2e5, 400, 20), 164.24419939, 1e-10);
    near(soundPowerAfter(164, 30, 0.3), 158, 1e-12);
  });
});

describe('stability of a spring valve', () => {
  it('times the wave, the line and the fall of pressure by hand: 340 m/s, 3.4 m, 20 ms', () => {
    near(returnTime(3.4, 340), 0.02, 1e-12);
    near(longestLine(340, 0.02), 3.4, 1e-12);
    near(quarterWave(3.4, 340), 25, 1e-12);
    // Slow opening: 2 L G/t; quick opening: the whole wave of Joukowsky, G c.
    near(accelerationDrop(100, 3.4, 340, 0.04), 17000, 1e-12);
    near(accelerationDrop(100, 3.4, 340, 0.001), 34000, 1e-12);
  });
});
