/* Wetted areas against closed forms: spheres, spheroids, half-full vessels. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  effectiveHeight,
  HEADS,
  ORIENTATIONS,
  vesselHeight,
  wettedArea,
} from '../../../src/engine/methods/e-fire/geometry';

const vessel = fc.record({
  orientation: fc.constantFrom(...ORIENTATIONS),
  heads: fc.constantFrom(...HEADS),
  D: fc.double({ min: 0.5, max: 10, noNaN: true }),
  L: fc.double({ min: 0.5, max: 30, noNaN: true }),
});

describe('wetted area', () => {
  it('two hemispheres without a shell are a sphere, standing or lying (closed form π D h)', () => {
    for (const orientation of ['horizontal', 'vertical'] as const)
      for (const h of [0.3, 1, 1.7, 2])
        expect(wettedArea({ orientation, D: 2, L: 0, heads: 'hemispherical' }, h)).toBeCloseTo(
          Math.PI * 2 * h,
          8,
        );
  });

  it('a full 2:1 head has the area of half an oblate spheroid (closed form)', () => {
    const e = Math.sqrt(3) / 2;
    const half = Math.PI * (1 + ((1 - e * e) / e) * Math.atanh(e));
    const full = wettedArea({ orientation: 'horizontal', D: 2, L: 3, heads: 'ellipsoidal' }, 2);
    expect(full).toBeCloseTo(2 * half + Math.PI * 2 * 3, 8);
  });

  it('a half-full lying vessel is wetted over half of its surface', () => {
    fc.assert(
      fc.property(vessel, (v) => {
        fc.pre(v.orientation !== 'vertical');
        expect(wettedArea(v, v.D / 2) / wettedArea(v, v.D)).toBeCloseTo(0.5, 8);
      }),
    );
  });

  it('grows with the level, from nought to the whole surface, and stays finite', () => {
    fc.assert(
      fc.property(
        vessel,
        fc.double({ min: 0, max: 1, noNaN: true }),
        fc.double({ min: 0, max: 1, noNaN: true }),
        (v, a, b) => {
          const top = vesselHeight(v);
          const [low, high] = [Math.min(a, b) * top, Math.max(a, b) * top];
          expect(wettedArea(v, low)).toBeLessThanOrEqual(wettedArea(v, high) * (1 + 1e-9) + 1e-9);
          expect(wettedArea(v, 0)).toBeCloseTo(0, 6);
          expect(wettedArea(v, top * 2)).toBeCloseTo(wettedArea(v, top), 9);
        },
      ),
    );
  });
});

describe('height that counts', () => {
  const lying = { orientation: 'horizontal', D: 3, L: 6, heads: 'flat' } as const;
  const sphere = { orientation: 'sphere', D: 18, L: 0, heads: 'hemispherical' } as const;
  it('is the level, capped by the fire, never negative; a sphere counts to its equator', () => {
    expect(effectiveHeight(lying, { level: 2, elevation: 1, fireHeight: 7.6 })).toBe(2);
    expect(effectiveHeight(lying, { level: 2, elevation: 6, fireHeight: 7.6 })).toBeCloseTo(1.6, 9);
    expect(effectiveHeight(lying, { level: 2, elevation: 9, fireHeight: 7.6 })).toBe(0);
    expect(effectiveHeight(sphere, { level: 14, elevation: 9, fireHeight: 7.6 })).toBe(9);
  });
});
