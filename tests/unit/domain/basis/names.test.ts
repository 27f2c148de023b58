/* Derived names: what a device is called follows from its axes. */
import { describe, expect, it } from 'vitest';
import { namesOf } from '@domain/basis';
import { DEVICES } from './devices';

const bellows = DEVICES[0]!;

describe('namesOf', () => {
  it('covers all 37 devices of the invented site', () => {
    expect(new Set(DEVICES.map((device) => device.tag)).size).toBe(37);
  });

  it.each(DEVICES.map((device) => [device.tag, device] as const))(
    'calls %s what the site calls it',
    (_tag, device) => {
      expect(namesOf(device.axes, device.purpose, device.code)).toContain(device.kind);
    },
  );

  it('gives a disk no other name, whatever else its axes say', () => {
    expect(namesOf({ ...bellows.axes, recloses: 'disk' }, 'process')).toEqual(['rupture disk']);
    expect(namesOf({ ...bellows.axes, recloses: 'pin' }, 'process')).toEqual(['pin device']);
  });

  it('names lift only on an EN basis', () => {
    expect(namesOf(bellows.axes, 'process', { basis: 'en', units: 'SI' })).toContain('full-lift');
    expect(namesOf(bellows.axes, 'process', bellows.code)).not.toContain('full-lift');
  });
});
