/* Heat balances, the clean exchanger, blocked-in liquid and reactions: textbook examples and limits. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { workMethod } from '../../../../src/engine/catalog';
import { blockedInRise, shellCompliance } from '../../../../src/engine/methods/f-loads/blocked-in';
import { logMean } from '../../../../src/engine/methods/f-loads/clean-exchanger';
import { gasFlow, gasRate, temperedFlow } from '../../../../src/engine/methods/f-loads/reaction-flow';
import { type Q } from '../../../../src/engine/quantity';
import { type Inputs } from '../../../../src/engine/sheet';
import { EXAMPLES, q } from './examples';

const work = (id: string, change: Inputs = {}) => workMethod(id, { ...EXAMPLES[id], ...change });
const out = (id: string, name: string, change: Inputs = {}) => (work(id, change).outputs[name] as Q).value;

describe('loss of cooling, of air coolers, of reflux', () => {
  it('balance by hand: (2000 − 100 − 55 − 0.3·1500) kW over 350 kJ/kg, less 800 kg/h that leave', () => {
    const heat = 2000 - 100 - 55 - 0.3 * 1500;
    expect(out('f.loss-of-cooling', 'heat')).toBeCloseTo(heat, 9);
    expect(out('f.loss-of-cooling', 'vapour_made')).toBeCloseTo((heat * 3600) / 350, 7);
    expect(out('f.loss-of-cooling', 'relief_load')).toBeCloseTo((heat * 3600) / 350 - 800, 7);
  });

  it('natural draught: a fifth of the duty; louvres shut, none; above 30 % a warning', () => {
    expect(out('f.air-cooler-failure', 'heat')).toBeCloseTo(1700, 9);
    expect(out('f.air-cooler-failure', 'heat', { louvres_shut: true })).toBeCloseTo(2000, 9);
    expect(work('f.air-cooler-failure', { natural_draught: q(0.35) }).warnings.map((w) => w.code)).toContain(
      'DRAUGHT_HIGH',
    );
  });

  it('reflux: the condenser counts only when it does not flood; 3 m³ at 18 m³/h last 10 minutes', () => {
    expect(out('f.loss-of-reflux', 'time_to_flood')).toBeCloseTo(10, 9);
    expect(out('f.loss-of-reflux', 'heat', { Q_condenser: q(1500, 'kW') })).toBeCloseTo(2000, 9);
    expect(
      out('f.loss-of-reflux', 'heat', { Q_condenser: q(1500, 'kW'), condenser_floods: false }),
    ).toBeCloseTo(500, 9);
  });

  it('full loss of cooling is W = Q/λ of f.vaporisation', () => {
    const {
      share_lost: _,
      Q_condenser: __,
      vapour_kept: ___,
      Q_feed: ____,
      ...plain
    } = EXAMPLES['f.loss-of-cooling']!;
    const a = workMethod('f.loss-of-cooling', plain).outputs['relief_load'] as Q;
    const b = workMethod('f.vaporisation', plain).outputs['relief_load'] as Q;
    expect(a.value).toBeCloseTo(b.value, 9);
  });
});

describe('a clean exchanger', () => {
  it('takes the logarithmic mean: 40 and 20 K give 28.85 K, equal differences their value (any heat transfer handbook)', () => {
    expect(logMean(40, 20)).toBeCloseTo(28.8539, 4);
    expect(logMean(30, 30)).toBe(30);
    fc.assert(
      fc.property(
        fc.double({ min: 0.1, max: 500, noNaN: true }),
        fc.double({ min: 0.1, max: 500, noNaN: true }),
        (a, b) => {
          const mean = logMean(a, b);
          expect(mean).toBeGreaterThanOrEqual(Math.sqrt(a * b) * (1 - 1e-6));
          expect(mean).toBeLessThanOrEqual(((a + b) / 2) * (1 + 1e-6));
        },
      ),
    );
  });

  it('by hand: U 1/(1/600 − 0.0004), 45 m², 50 and 30 K', () => {
    const U = 1 / (1 / 600 - 0.0004);
    expect(out('f.clean-exchanger', 'heat')).toBeCloseTo((U * 45 * logMean(50, 30)) / 1000, 6);
    expect(out('f.clean-exchanger', 'heat', { Q_max: q(500, 'kW') })).toBeCloseTo(500, 9);
    expect(work('f.clean-exchanger', { fouling: q(0.01, 'm2.K/W') }).refused).toMatchObject({
      field: 'fouling',
    });
    expect(work('f.clean-exchanger', { T_sink: q(170, 'degC') }).refused).toMatchObject({ code: 'NO_HEAT' });
  });
});

describe('a blocked-in liquid', () => {
  it('in a rigid wall rises by (α − 3 α_m)/χ: 0.435 MPa/K for water in steel (eng-tips FAQ 378-1339: 210e-6, 36e-6, 4e-4 1/MPa)', () => {
    expect(blockedInRise(210e-6, 12e-6, 4e-10, 0) / 1e6).toBeCloseTo(0.435, 3);
  });

  it('in a thin wall: 3 % above that source at D/t = 100, which leaves out the strain along the axis (D/(t E) there, 1.25 − μ here)', () => {
    const theirs = 174e-6 / (4e-10 + 100 / 2e11);
    const ours = blockedInRise(210e-6, 12e-6, 4e-10, shellCompliance(100, 1, 2e11, 0.3));
    expect(ours / theirs).toBeGreaterThan(1.02);
    expect(ours / theirs).toBeLessThan(1.04);
  });

  it('the compliance is that of a closed thin cylinder: hoop strain twice and axial strain once (textbook, Lamé thin wall)', () => {
    const [D, t, E, nu] = [0.1, 0.005, 2e11, 0.3];
    const hoop = (D / (2 * t * E)) * (1 - nu / 2);
    const axial = (D / (4 * t * E)) * (1 - 2 * nu);
    expect(shellCompliance(D, t, E, nu)).toBeCloseTo(2 * hoop + axial, 20);
  });

  it('tells the warming that reaches the limit', () => {
    const rise = out('f.blocked-in-rise', 'rise_per_kelvin');
    expect(out('f.blocked-in-rise', 'end_pressure')).toBeCloseTo(20 * rise, 6);
    expect(out('f.blocked-in-rise', 'warming_to_limit')).toBeCloseTo(1900 / rise, 6);
  });
});

describe('reactions', () => {
  it('the styrene reactor of Leung 1986 and of Crowl & Louvar (from memory): G 3043 kg/(m²·s), A 0.084 m²', () => {
    expect(out('f.reaction-tempered', 'mass_flux') / 3043).toBeCloseTo(1, 2);
    expect(Math.abs(out('f.reaction-tempered', 'A_required') / 1e6 / 0.084 - 1)).toBeLessThan(0.01);
    expect(out('f.reaction-tempered', 'heat_release') / (9500 * 1.426)).toBeCloseTo(1, 2);
  });

  it('ask for less with more overpressure, and without any for the balance of boiling m₀ q m₀ v_fg/(V h_fg)', () => {
    const s = { mass: 9500, volume: 13.16, q: 1426, latent: 310600, vfg: 0.0841, cp: 2470, dT: 10 };
    expect(temperedFlow({ ...s, dT: 0 })).toBeCloseTo((9500 * 1426 * 9500 * 0.0841) / (13.16 * 310600), 6);
    let before = Infinity;
    for (const dT of [0, 1, 5, 10, 20]) {
      const W = temperedFlow({ ...s, dT });
      expect(W).toBeLessThan(before);
      before = W;
    }
  });

  it('a test at high thermal inertia is warned of and raises the load', () => {
    const high = work('f.reaction-tempered', { phi: q(1.3) });
    expect(high.warnings.map((w) => w.code)).toContain('PHI_HIGH');
    expect((high.outputs['relief_load'] as Q).value / out('f.reaction-tempered', 'relief_load')).toBeCloseTo(
      1.3,
      9,
    );
  });

  it('gas of a test by the gas law: 3 kPa/s in 4 L at 320 K from 80 g is 5.64e-5 kmol/(s·kg)', () => {
    const rate = gasRate(0.004, 3000, 320, 0.08);
    expect(rate).toBeCloseTo(12 / (8314.462618 * 320 * 0.08), 12);
    const Q_ = gasFlow(rate, 3000, 480, 5e5);
    expect(out('f.reaction-gassy', 'gas_flow')).toBeCloseTo(Q_ * 3600, 6);
    expect(out('f.reaction-gassy', 'relief_load')).toBeCloseTo(((Q_ * 3000) / 5) * 3600, 3);
    const gas = work('f.reaction-gassy', { venting: 'gas', M: q(44, 'kg/kmol') });
    expect((gas.outputs['relief_load'] as Q).value).toBeCloseTo(rate * 3000 * 44 * 3600, 6);
    expect(gas.warnings.map((w) => w.code)).toContain('GAS_ALONE');
  });

  it('the heat of a feed: 390 lb/h of hydrogen at 29 700 Btu/lbmol are 5.746 MMBtu/h', () => {
    const inputs = {
      reactant_rate: q(390, 'lb/h'),
      reactant_molar_mass: q(2.016, 'lb/lbmol'),
      heat_of_reaction: q(29700, 'Btu/lbmol'),
      latent_heat: q(114, 'Btu/lb'),
    };
    const worked = workMethod('f.reaction-heat', inputs).outputs;
    expect((worked['heat'] as Q).value).toBeCloseTo((390 / 2.016) * 29700, 4);
    expect((worked['relief_load'] as Q).value).toBeCloseTo(((390 / 2.016) * 29700) / 114, 6);
  });
});
