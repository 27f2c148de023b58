/* What a load sheet refuses, and what it takes as given, in a practitioner’s words. */
import { describe, expect, it } from 'vitest';
import { workMethod } from '../../../../src/engine/catalog';
import { type Q } from '../../../../src/engine/quantity';
import { type Inputs } from '../../../../src/engine/sheet';
import { EXAMPLES, q } from './examples';

const work = (id: string, change: Inputs = {}) => workMethod(id, { ...EXAMPLES[id], ...change });
const without = (id: string, ...names: string[]): Inputs =>
  Object.fromEntries(Object.entries(EXAMPLES[id]!).filter(([name]) => !names.includes(name)));

const { tube_length: _, f_darcy: __, ...ENDS } = EXAMPLES['f.tube-rupture']!;
const RATIOS = {
  ...without('f.compressor-curve', 'curve_head', 'curve_head_2', 'curve_head_3'),
  curve_ratio: q(3),
  curve_ratio_2: q(2.5),
  curve_ratio_3: q(1.5),
};
const LIQUID: Inputs = {
  coefficient: q(40, 'Kv'),
  P1: q(680, 'kPa_abs'),
  P2: q(220, 'kPa_abs'),
  rho: q(965.4, 'kg/m3'),
  Pv: q(700, 'kPa_abs'),
  Pc: q(22120, 'kPa_abs'),
  FL: q(0.6),
};
const WETTED: Inputs = {
  orientation: 'horizontal',
  heads: 'flat',
  D: q(2, 'm'),
  L: q(6, 'm'),
  liquid_level: q(1, 'm'),
  elevation_of_bottom: q(1, 'm'),
  adequate_drainage: true,
};

/** Method, inputs, the code and the field of the refusal. */
const REFUSED: [string, Inputs, string, string][] = [
  ['f.compressor-curve', { ...RATIOS, speed_ratio: q(1.05) }, 'SPEED_RATIO', 'speed_ratio'],
  [
    'f.reaction-tempered',
    { ...EXAMPLES['f.reaction-tempered'], v_vapour: q(0.001, 'm3/kg') },
    'VALUE_IMPOSSIBLE',
    'v_vapour',
  ],
  [
    'f.reaction-tempered',
    { ...EXAMPLES['f.reaction-tempered'], mass: q(20000, 'kg') },
    'VALUE_IMPOSSIBLE',
    'mass',
  ],
  [
    'f.tube-rupture',
    { ...ENDS, phase: 'flashing', v0: q(0.02, 'm3/kg'), v9: q(0.01, 'm3/kg') },
    'VALUE_IMPOSSIBLE',
    'v9',
  ],
  ['f.control-valve-bypass', { ...LIQUID, phase: 'liquid', bypass_coefficient: q(2, 'Kv') }, 'PHASE', 'Pv'],
  ['f.control-valve-liquid', LIQUID, 'PHASE', 'Pv'],
  ['f.clean-exchanger', without('f.clean-exchanger', 'U_service'), 'INPUT_MISSING', 'U_clean'],
  [
    'f.positive-displacement',
    without('f.positive-displacement', 'rated_flow'),
    'INPUT_MISSING',
    'rated_flow',
  ],
  ['f.displacement', without('f.displacement', 'W_in'), 'INPUT_MISSING', 'inflow'],
  ['f.vaporisation', without('f.vaporisation', 'Q'), 'INPUT_MISSING', 'Q'],
  ['f.settle-out', without('f.settle-out', 'volume_2'), 'INPUT_MISSING', 'volume_2'],
  ['e.fire-unwetted', without('e.fire-unwetted', 'D'), 'INPUT_MISSING', 'A_exposed'],
  ['e.fire-supercritical', without('e.fire-supercritical', 'T_2'), 'INPUT_MISSING', 'T_2'],
  [
    'e.fire-wetted',
    { ...WETTED, k_ins: q(0.06, 'W/(m.K)'), thickness: q(50, 'mm'), T_process: q(950, 'degC') },
    'VALUE_IMPOSSIBLE',
    'T_process',
  ],
  [
    'f.inadvertent-opening',
    { ...EXAMPLES['f.inadvertent-opening'], P_low: q(3100, 'kPa_abs') },
    'NO_FLOW',
    'P_high',
  ],
];

describe('a load sheet refuses', () => {
  it.each(REFUSED)('%s %o', (id, inputs, code, field) => {
    const { refused } = workMethod(id, inputs);
    expect(refused).toMatchObject({ code, field });
    expect(refused!.text).toMatch(/^[A-Z].{20,}\.$/s);
  });
});

describe('a load sheet takes as given', () => {
  it('temperature and compressibility of a settled loop', () => {
    const given = work('f.settle-out', { T_settled: q(310, 'K'), Z_settled: q(1) });
    expect(given.outputs['settle_out_temperature']).toEqual({ value: 310, unit: 'K' });
    const mean = work('f.settle-out').outputs['settle_out_pressure'] as Q;
    expect((given.outputs['settle_out_pressure'] as Q).value).not.toBeCloseTo(mean.value, 3);
  });

  it('the environment factor, as a figure or by insulation: k (904 − T)/(66 570 δ) (API 521, from memory)', () => {
    const F = (change: Inputs) =>
      (workMethod('e.fire-wetted', { ...WETTED, ...change }).outputs['F'] as Q).value;
    expect(F({ F: q(0.3) })).toBe(0.3);
    expect(F({ k_ins: q(0.06, 'W/(m.K)'), thickness: q(50, 'mm'), T_process: q(104, 'degC') })).toBeCloseTo(
      (0.06 * 800) / (66570 * 0.05),
      12,
    );
    expect(
      workMethod(
        'e.fire-wetted',
        Object.fromEntries(Object.entries(WETTED).filter(([n]) => n !== 'adequate_drainage')),
      ).warnings.map((w) => w.code),
    ).toContain('DRAINAGE_ASSUMED');
  });

  it('the mass flux of a vent, in place of the rate model', () => {
    const given = work('f.reaction-tempered', { mass_flux: q(2000, 'kg/(m2.s)') });
    expect(given.warnings.map((w) => w.code)).not.toContain('FLUX_BY_RATE_MODEL');
    const W = given.outputs['relief_load'] as Q;
    expect((given.outputs['A_required'] as Q).value).toBeCloseTo((W.value / 3600 / 2000) * 1e6, 6);
    const bare = workMethod('f.reaction-tempered', without('f.reaction-tempered', 'T'));
    expect(bare.outputs['A_required']).toBeUndefined();
    expect(bare.refused).toBeUndefined();
  });

  it('a filling rate, and heat that is all removed: no load, with a warning', () => {
    const filled = work('f.overfilling', { fill_rate: q(42, 'm3/h') });
    expect(filled.outputs['relief_load']).toEqual({ value: 42 * 800, unit: 'kg/h' });
    for (const id of ['f.loss-of-cooling', 'f.clean-exchanger', 'f.reaction-heat']) {
      const none = work(id, { Q_removed: q(100, 'MW') });
      expect(
        none.warnings.map((w) => w.code),
        id,
      ).toContain('NO_LOAD');
      expect((none.outputs['relief_load'] as Q).value, id).toBe(0);
    }
  });
});
