/* Steam sizing notices a temperature at which there is no steam; saturation by IAPWS R7-97(2012), Table 36: 453.035632 K at 1 MPa. */
import { describe, expect, it } from 'vitest';
import { STEAM } from '../../../../src/engine/methods/b-steam/steam';

const work = (T: number, unit: 'K' | 'degF' = 'K', P1 = { value: 1, unit: 'MPa_abs' }) =>
  STEAM.work({ W: { value: 10_000, unit: unit === 'K' ? 'kg/h' : 'lb/h' }, P1, T: { value: T, unit } });

describe('a temperature below saturation', () => {
  it('is warned of with the temperature of saturation, and sizing goes on', () => {
    const { warnings, outputs, refused } = work(440);
    expect(refused).toBeUndefined();
    expect(outputs['A_required']).toBeDefined();
    expect(warnings.map((one) => one.code)).toContain('BELOW_SATURATION');
    expect(warnings[0]?.text).toContain('453.0 K (179.9 °C');
  });

  it('is not said at saturation, within the rounding of a table, or above it, in either system', () => {
    for (const T of [452.5, 453.04, 600]) expect(work(T).warnings).toEqual([]);
    const psia = { value: 145.0377, unit: 'psia' };
    expect(work(357, 'degF', psia).warnings).toEqual([]);
    expect(work(330, 'degF', psia).warnings.map((one) => one.code)).toEqual(['BELOW_SATURATION']);
  });
});
