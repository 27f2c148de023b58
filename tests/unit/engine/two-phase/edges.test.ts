/* Two-phase methods at their edges: mixtures between bubble and dew, isentropes from above the critical point, odd inputs. */
import { describe, expect, it } from 'vitest';
import { workMethod } from '../../../../src/engine/catalog';
import { cubicFluid } from '../../../../src/engine/fluids';
import { compareFluxes } from '../../../../src/engine/methods/d-two-phase/compare-rows';
import { omegaByProperties, omegaByVolumes } from '../../../../src/engine/methods/d-two-phase/fluid-omega';
import { hemThroat, pathState } from '../../../../src/engine/nozzle/hem';
import { bubbleAt, inletAtQuality, inletAtTemperature } from '../../../../src/engine/nozzle/inlet';
import { firstMaximum } from '../../../../src/engine/nozzle/maximum';
import { smoothThroat } from '../../../../src/engine/nozzle/table';
import { type PropertySource } from '../../../../src/engine/properties/types';
import { type Inputs } from '../../../../src/engine/sheet';
import { WATER } from '../../../../src/engine/water';
import { idealGas } from './sources';

const q = (value: number, unit: string) => ({ value, unit });
const OPTIONS = { first: 0, step: 0.03, tolerance: 1e-5 };

function source(words: string): PropertySource {
  const found = cubicFluid(words);
  if (!found) throw new Error(`no fluid ${words}`);
  return found;
}

describe('the first maximum of a way', () => {
  it('is found inside, at the end, just ahead of the end, and at the start when the function falls from it', () => {
    const hill = (top: number) => (y: number) => 1 - (y - top) ** 2;
    expect(firstMaximum(hill(0.4), 3, { ...OPTIONS, first: 1 - 0.16 })?.y).toBeCloseTo(0.4, 4);
    expect(firstMaximum(hill(5), 1, { ...OPTIONS, first: -24 })).toEqual({
      y: 1,
      f: hill(5)(1),
      inside: false,
    });
    expect(firstMaximum(hill(0.99), 1, { ...OPTIONS, first: 1 - 0.99 ** 2 })).toMatchObject({ inside: true });
    expect(firstMaximum((y) => 1 - y, 1, { ...OPTIONS, first: 1 })).toEqual({ y: 0, f: 1, inside: true });
    expect(firstMaximum(hill(0.004), 1, { ...OPTIONS, first: 1 - 0.004 ** 2 })?.y).toBeCloseTo(0.004, 4);
  });

  it('takes the first of two, ends on a plateau, and is undefined where the function has no value', () => {
    const two = (y: number) => Math.sin(y * 6) + y;
    expect(firstMaximum(two, 3, OPTIONS)?.y).toBeLessThan(0.4);
    expect(firstMaximum(() => 1, 1, { ...OPTIONS, first: 1 })).toMatchObject({ inside: false });
    expect(firstMaximum((y) => (y > 0.2 ? undefined : y), 1, OPTIONS)).toBeUndefined();
    expect(
      firstMaximum((y) => (y > 0.5 && y < 0.999995 ? undefined : y), 1, { ...OPTIONS, step: 1 }),
    ).toBeUndefined();
    const gap = (y: number) => (y > 0.05 && y < 0.055 ? undefined : 1 - (y - 0.052) ** 2);
    expect(firstMaximum(gap, 1, OPTIONS)).toBeUndefined();
    expect(firstMaximum((y) => (y < 0.01 ? undefined : 1 - y), 1, { ...OPTIONS, first: 1 })).toBeUndefined();
  });

  it('bends where the function has a corner', () => {
    const corner = (y: number) => (y < 0.3 ? y : 0.6 - y);
    expect(firstMaximum(corner, 1, OPTIONS)?.y).toBeCloseTo(0.3, 4);
  });
});

describe('inlets of mixtures and above the critical point', () => {
  const mixture = source('propane 0.6; n-butane 0.4');

  it('a mixture between bubble and dew temperature has the quality of that temperature', () => {
    const middle = inletAtQuality(mixture, 1e6, 0.4);
    const same = inletAtTemperature(mixture, 1e6, middle?.state.T ?? 0);
    expect(same?.phase).toBe('two-phase');
    expect(same?.state.x).toBeCloseTo(0.4, 6);
    expect(hemThroat(mixture, same?.state ?? { P: 1, T: 1, rho: 1, h: 1, s: 1 }, 1e5)?.flux).toBeGreaterThan(
      1000,
    );
  });

  it('says of each phase which it is', () => {
    expect(inletAtTemperature(mixture, 1e6, 250)?.phase).toBe('subcooled liquid');
    expect(inletAtTemperature(mixture, 1e6, 400)?.phase).toBe('vapour');
    expect(inletAtTemperature(WATER, 3e7, 700)?.phase).toBe('supercritical');
    expect(inletAtTemperature(WATER, 3e7, 500)?.phase).toBe('subcooled liquid');
    expect(inletAtTemperature(idealGas(28, 1.4), 1e5, 300)?.phase).toBe('supercritical');
    expect(inletAtQuality(WATER, 1e6, 1)?.phase).toBe('saturated vapour');
  });

  it('an isentrope from above the critical pressure enters the two-phase region on either side', () => {
    for (const T of [600, 640, 660, 690, 750]) {
      const inlet = inletAtTemperature(WATER, 2.5e7, T);
      const throat = inlet && hemThroat(WATER, inlet.state, 1e5);
      expect(throat?.choked).toBe(true);
      expect(throat?.flux).toBeGreaterThan(20_000);
    }
    const cold = inletAtTemperature(WATER, 2.5e7, 600);
    const throat = cold && hemThroat(WATER, cold.state, 1e5);
    // The liquid flashes where its isentrope meets the bubble line: entropy of the saturated liquid there is that of the inlet.
    expect(throat?.atOnset).toBe(true);
    expect(WATER.saturation(throat?.P ?? 1)?.liquid.s).toBeCloseTo(cold?.state.s ?? 0, 3);
  });

  it('a bubble pressure is undefined where saturation ends', () => {
    const bare: PropertySource = { ...WATER, saturation: () => undefined };
    expect(bubbleAt(bare, 300, 1e6)).toBeUndefined();
    expect(bubbleAt(WATER, 274, 3e2)).toBeUndefined();
    const inlet = inletAtTemperature(WATER, 2e6, 400);
    if (!inlet) throw new Error('no inlet');
    expect(omegaByVolumes(bare, inlet, 1e5)).toBeUndefined();
    expect(omegaByProperties(bare, inlet, 1e5)).toBeUndefined();
    const gas = inletAtTemperature(WATER, 1e6, 600);
    if (!gas) throw new Error('no gas');
    expect(omegaByProperties(WATER, gas, 1e5)).toBeUndefined();
    expect(omegaByVolumes({ ...WATER, atPS: () => undefined }, gas, 1e5)).toBeUndefined();
    expect(compareFluxes({ ...WATER, atPS: () => undefined, atPT: () => undefined }, gas, 1e5)).toEqual({});
  });
});

describe('tables', () => {
  it('of two rows, of a constant volume, of an end of slope nought', () => {
    const flat = { P: [1e6, 9e5, 8e5, 1e5], v: [0.001, 0.001, 0.001, 0.001] };
    expect(smoothThroat(flat, 1e5)?.flux).toBeCloseTo(Math.sqrt(2 * 9e5 * 1000), 3);
    expect(smoothThroat({ P: [1e6, 5e5], v: [0.001, 0.002] }, 0)?.flux).toBeGreaterThan(0);
    expect(
      smoothThroat({ P: [1e6, 9e5, 8e5, 7e5], v: [0.001, 0.001, 0.05, 0.0501] }, 0)?.flux,
    ).toBeGreaterThan(0);
  });
});

const OMEGA: Inputs = {
  W: q(10000, 'kg/h'),
  P0: q(1000, 'kPa_abs'),
  back_pressure: q(150, 'kPa_abs'),
  v0: q(0.005, 'm3/kg'),
};
const PHASES: Inputs = { x0: q(0.1, '-'), v_vapour: q(0.194, 'm3/kg'), v_liquid: q(0.00113, 'm3/kg') };
const FLASH: Inputs = { ...PHASES, cp: q(4405, 'J/(kg.K)'), T0: q(453, 'K'), latent_heat: q(2014, 'kJ/kg') };
const { v0: _, ...NO_VOLUME } = OMEGA;

describe('the omega sheet refuses', () => {
  it.each([
    ['no volume', { ...NO_VOLUME, omega: q(3, '-') }, 'INPUT_MISSING', 'v0'],
    ['a volume that shrinks', { ...OMEGA, v9: q(0.004, 'm3/kg') }, 'VALUE_IMPOSSIBLE', 'v9'],
    [
      'a vapour denser than its liquid',
      { ...NO_VOLUME, ...PHASES, v_liquid: q(1, 'm3/kg'), omega: q(2, '-') },
      'VALUE_IMPOSSIBLE',
      'v_vapour',
    ],
    [
      'the same with properties',
      { ...OMEGA, ...FLASH, v_liquid: q(1, 'm3/kg'), x0: undefined, omega_form: 'inlet properties' },
      'INPUT_MISSING',
      'x0',
    ],
    [
      'a latent heat that is far too small',
      {
        ...NO_VOLUME,
        ...FLASH,
        x0: q(1, '-'),
        cp: q(1, 'J/(kg.K)'),
        T0: q(1e-3, 'K'),
        latent_heat: q(100, 'kJ/kg'),
      },
      'OMEGA_NEGATIVE',
      'omega',
    ],
  ])('%s', (_name, inputs, code, field) => {
    const given = Object.fromEntries(Object.entries(inputs).filter(([, v]) => v !== undefined)) as Inputs;
    const { refused } = workMethod('d.omega-saturated', given);
    expect([code, 'VALUE_IMPOSSIBLE']).toContain(refused?.code);
    if (refused?.code === code) expect(refused.field).toBe(field);
  });
});

describe('the omega sheet warns', () => {
  const codes = (inputs: Inputs) => workMethod('d.omega-saturated', inputs).warnings.map((one) => one.code);
  it('of an omega that is not that of its volumes, of a fit outside its range, of volumes that disagree', () => {
    expect(codes({ ...OMEGA, omega: q(5, '-'), v9: q(0.0066, 'm3/kg') })).toContain('OMEGA_DISAGREES');
    expect(codes({ ...OMEGA, omega: q(2.9, '-'), v9: q(0.0066, 'm3/kg') })).not.toContain('OMEGA_DISAGREES');
    expect(codes({ ...OMEGA, omega: q(0.3, '-'), critical_ratio_form: 'explicit fit' })).toContain(
      'FIT_OUTSIDE_RANGE',
    );
    expect(codes({ ...OMEGA, ...PHASES, omega: q(3, '-') })).toContain('VOLUME_DISAGREES');
    expect(codes({ ...NO_VOLUME, ...FLASH })).toEqual([]);
  });
});

describe('pressures and loads in every form', () => {
  it('from set pressure and overpressure, against the barometer, in gauge', () => {
    const { P0: __, back_pressure: ___, ...rest } = OMEGA;
    const worked = workMethod('d.omega-saturated', {
      ...rest,
      v9: q(0.0066, 'm3/kg'),
      set_pressure: q(8, 'bar_g'),
      overpressure: q(0.1, '-'),
    });
    expect(worked.refused).toBeUndefined();
    expect(worked.outputs['P1']).toMatchObject({ unit: 'kPa_abs' });
    expect(worked.warnings.map((one) => one.code)).toContain('BAROMETER_ASSUMED');
    const same = workMethod('d.omega-saturated', {
      ...OMEGA,
      v9: q(0.0066, 'm3/kg'),
      back_pressure: q(1000, 'kPa_abs'),
    });
    expect(same.refused?.text).toContain('equals the back pressure');
  });

  it('a subcooled load by mass, with its temperature and critical point', () => {
    const inputs: Inputs = {
      W: q(25500, 'kg/h'),
      P0: q(1200, 'kPa_abs'),
      rho0: q(850, 'kg/m3'),
      omega_s: q(12, '-'),
      Ps: q(1180, 'kPa_abs'),
      back_pressure: q(200, 'kPa_abs'),
      T0: q(400, 'K'),
      Tc: q(420, 'K'),
    };
    const worked = workMethod('d.omega-subcooled', inputs);
    expect(worked.refused).toBeUndefined();
    expect(worked.warnings.map((one) => one.code)).toEqual(['OMEGA_NEAR_CRITICAL']);
  });

  it('saturated vapour is a gas, a two-phase inlet is not; customary units; a table in customary units', () => {
    const gas: Inputs = {
      fluid: 'Steam',
      W: q(2000, 'lb/h'),
      P0: q(145, 'psia'),
      x0: q(1, '-'),
      back_pressure: q(20, 'psia'),
    };
    expect(workMethod('d.real-gas-size', gas).refused).toBeUndefined();
    expect(workMethod('d.real-gas-size', { ...gas, x0: q(0.5, '-') }).refused?.text).toContain('two-phase');
    expect(
      workMethod('d.real-gas-nozzle', { fluid: 'methane', P0: q(2, 'MPa_abs'), T0: q(300, 'K') }).refused,
    ).toBeUndefined();
    const rows = [
      'psia ft3/lb',
      '100 0.3',
      '95 0.34',
      '90 0.39',
      '85 0.45',
      '80 0.52',
      '75 0.6',
      '70 0.69',
      '65 0.8',
      '60 0.95',
    ];
    const table = workMethod('d.isentrope-table-integration', {
      table: rows.join('\n'),
      W: q(20000, 'lb/h'),
      back_pressure: q(20, 'psia'),
      nozzle_length: q(4, 'in'),
    });
    expect(table.refused).toBeUndefined();
    expect(table.outputs['A_required']).toMatchObject({ unit: 'in2' });
  });

  it('a mixture that is said in fractions not quite summing is scaled, with a word about it', () => {
    const worked = workMethod('d.hem-nozzle', {
      fluid: 'propane 0.6; n-butane 0.41',
      P0: q(1, 'MPa_abs'),
      x0: q(0.2, '-'),
      Pb: q(100, 'kPa_abs'),
    });
    expect(worked.warnings.map((one) => one.code)).toContain('COMPOSITION_SCALED');
  });

  it('a table of too many rows is refused', () => {
    const rows = Array.from({ length: 2100 }, (_row, i) => `${3000 - i} ${1 + i * 1e-3}`);
    expect(
      workMethod('d.isentrope-table-integration', { table: ['kPa_abs m3/kg', ...rows].join('\n') }).refused
        ?.code,
    ).toBe('ROWS_TOO_MANY');
  });
});

describe('where one omega does not follow the isentrope', () => {
  const dense: Inputs = { fluid: 'water', P0: q(30, 'MPa_abs'), T0: q(655, 'K') };

  it('the sheets of integration and comparison say so, for water above its critical pressure', () => {
    const compared = workMethod('d.comparison', { ...dense, back_pressure: q(100, 'kPa_abs') });
    expect(compared.refused).toBeUndefined();
    expect(compared.warnings.map((one) => one.code)).toEqual(
      expect.arrayContaining(['OMEGA_NEAR_CRITICAL', 'METHODS_DIFFER']),
    );
    const flux = workMethod('d.hem-nozzle', { ...dense, Pb: q(100, 'kPa_abs') });
    expect(flux.warnings.map((one) => one.code)).toContain('OMEGA_DIFFERS');
    expect(
      workMethod('d.hem-nozzle', { ...dense, P0: q(23, 'MPa_abs'), Pb: q(100, 'kPa_abs') }).warnings.map(
        (one) => one.code,
      ),
    ).toContain('CRITICAL_REGION');
  });

  it('the throat there is the greatest flux of the isentrope, found by trying two thousand pressures', () => {
    for (const [P0, T0] of [
      [24e6, 640],
      [24e6, 660],
      [30e6, 655],
    ] as const) {
      const inlet = inletAtTemperature(WATER, P0, T0);
      if (!inlet) throw new Error('no inlet');
      const all = Array.from(
        { length: 2000 },
        (_state, k) => pathState(WATER, inlet.state, P0 * (1 - (0.9 * k) / 2000))?.flux ?? 0,
      );
      const throat = hemThroat(WATER, inlet.state, 1e5)?.flux ?? 0;
      expect(Math.abs(throat / Math.max(...all) - 1)).toBeLessThan(1e-3);
    }
  });

  it('where the properties end before the throat, the integration is refused and the others stand', () => {
    const cold: Inputs = { fluid: 'water', P0: q(700, 'Pa_abs'), T0: q(280, 'K') };
    expect(workMethod('d.hem-nozzle', { ...cold, Pb: q(100, 'Pa_abs') }).refused).toMatchObject({
      code: 'OUTSIDE_FORMULATION',
      field: 'fluid',
    });
    const compared = workMethod('d.comparison', { ...cold, back_pressure: q(100, 'Pa_abs') });
    expect(compared.refused).toBeUndefined();
    expect(compared.warnings.map((one) => one.code)).toContain('NO_INTEGRATION');
  });
});
