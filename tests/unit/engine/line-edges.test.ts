/*
 * Sheets of lines and areas at their rarer turns: reductions, limits of flow, single-phase ends, older editions. Inputs are those of
 * the reference cases named beside each; "ODE" figures come from the equations of flow with friction integrated step by step.
 */
import { describe, expect, it } from 'vitest';
import { workMethod } from '../../../src/engine/catalog';
import { findRoot } from '../../../src/engine/numeric';
import { type Inputs } from '../../../src/engine/sheet';

const q = (value: number, unit: string) => ({ value, unit });
const number = (worked: ReturnType<typeof workMethod>, name: string) => {
  const found = worked.outputs[name];
  return typeof found === 'object' ? found.value : Number.NaN;
};

const gas: Inputs = { M: q(30, 'kg/kmol'), Z: q(0.95, '-'), k: q(1.25, '-') };
const reduction: Inputs = {
  W: q(10, 'kg/s'),
  D: q(0.3048, 'm'),
  D_2: q(0.2027, 'm'),
  L: q(10, 'm'),
  f_darcy: q(0.016, '-'),
  sum_K: q(4 - 0.16 / 0.3048, '-'),
  sum_K_2: q(3 - 0.16 / 0.2027, '-'),
  P_exit_ambient: q(120, 'kPa_abs'),
  set_pressure: q(1000, 'kPa_g'),
};

describe('outlet lines that narrow', () => {
  it('an isothermal one speeds up without loss, and says by what (ODE)', () => {
    const worked = workMethod('g.outlet-isothermal', { ...gas, ...reduction, T: q(350, 'K') });
    expect(worked.refused).toBeUndefined();
    expect(number(worked, 'segment1_outlet_pressure')).toBeCloseTo(245.476976, 4);
    expect(number(worked, 'segment1_inlet_pressure')).toBeCloseTo(259.568211, 4);
    expect(JSON.stringify(worked.steps)).toContain('Ma_{2}^2 - Ma_{1}^2');
  });

  it('an adiabatic one keeps its stagnation pressure (ODE)', () => {
    const worked = workMethod('g.outlet-fanno', { ...gas, ...reduction, T0: q(350, 'K') });
    expect(worked.refused).toBeUndefined();
    expect(number(worked, 'segment1_outlet_pressure')).toBeCloseTo(240.625335, 4);
    expect(number(worked, 'segment1_inlet_pressure')).toBeCloseTo(254.957303, 4);
  });

  it('takes no more segments than a line has', () => {
    const many = Object.fromEntries(
      Array.from({ length: 62 }, (_, i) => [i === 0 ? 'D' : `D_${i + 1}`, q(0.2, 'm')]),
    );
    const worked = workMethod('g.outlet-fanno', { ...gas, ...reduction, ...many, T0: q(350, 'K') });
    expect(worked.refused?.code).toBe('TOO_MANY');
  });
});

describe('outlet lines of mixtures', () => {
  const mixture: Inputs = {
    W: q(15 * Math.PI, 'kg/s'),
    D: q(0.2, 'm'),
    L: q(10, 'm'),
    f_darcy: q(0.016, '-'),
    sum_K: q(3.2, '-'),
    P0: q(1000, 'kPa_abs'),
    v0: q(0.002, 'm3/kg'),
    omega: q(5, '-'),
    P_exit_ambient: q(300, 'kPa_abs'),
    set_pressure: q(1000, 'kPa_g'),
  };
  const worked = (more: Inputs) => workMethod('g.outlet-homogeneous', { ...mixture, ...more });

  it('follow friction and weight (ODE)', () => {
    expect(number(worked({}), 'segment1_inlet_pressure')).toBeCloseTo(410.030062, 4);
    expect(number(worked({ rise: q(20, 'm') }), 'segment1_inlet_pressure')).toBeCloseTo(419.957, 2);
    expect(JSON.stringify(worked({ rise: q(20, 'm') }).steps)).toContain('rho^2');
    expect(JSON.stringify(worked({}).steps)).not.toContain('rho^2');
  });

  it('choke where G √(−dv/dP) is 1: 100 · 1 500 Pa', () => {
    const choked = worked({ P_exit_ambient: q(101.325, 'kPa_abs') });
    expect(number(choked, 'segment1_outlet_pressure')).toBeCloseTo(150, 6);
    expect(number(choked, 'segment1_outlet_Mach')).toBeCloseTo(1, 9);
    expect(JSON.stringify(choked.steps)).toContain('-dv/dP');
  });
});

describe('vents and reactions', () => {
  const vent: Inputs = {
    P0: q(150, 'kPa_abs'),
    T0: q(300, 'K'),
    Z: q(1, '-'),
    M: q(28.97, 'kg/kmol'),
    k: q(1.4, '-'),
    D: q(0.0525, 'm'),
    N: q(5, '-'),
    P_ambient: q(101.325, 'kPa_abs'),
  };

  it('a vent lets out less than sonic flow below the critical pressure, and nothing against a higher one', () => {
    const slow = workMethod('g.pipe-discharge', vent);
    expect(number(slow, 'mass_flux')).toBeCloseTo(146.721777, 4);
    expect(slow.outputs['choked']).toBe(false);
    expect(workMethod('g.pipe-discharge', { ...vent, P0: q(100, 'kPa_abs') }).refused).toBeDefined();
  });

  it('vapour alone needs no density of a liquid: W²/(ρ A) + A (Pe − Pa)', () => {
    const dry = workMethod('g.reaction-force', {
      W: q(80000, 'kg/h'),
      x: q(1, '-'),
      rho_g: q(4, 'kg/m3'),
      A: q(32270, 'mm2'),
      P_exit: q(180, 'kPa_abs'),
      P_ambient: q(101.325, 'kPa_abs'),
    });
    expect(number(dry, 'reaction_force')).toBeCloseTo((80000 / 3600) ** 2 / 4 / 0.03227 + 0.03227 * 78675, 3);
  });
});

describe('editions', () => {
  it('the viscosity procedure takes the formula of the edition', () => {
    const thick: Inputs = {
      Q: q(400, 'L/min'),
      G: q(0.9, '-'),
      mu: q(500, 'cP'),
      P1: q(1800, 'kPa_g'),
      P2: q(0, 'kPa_g'),
    };
    const old = workMethod('c.liquid', thick, 'API 520-1, 7th to 9th edition');
    const now = workMethod('c.liquid', thick, 'API 520-1, 10th edition');
    expect(number(old, 'A_required')).toBeCloseTo(number(old, 'A_required_7th_to_9th_ed'), 9);
    expect(number(now, 'A_required')).toBeCloseTo(number(now, 'A_required_10th_ed'), 9);
    expect(number(old, 'A_required')).not.toBeCloseTo(number(now, 'A_required'), 2);
  });

  it('steam against more than 55 % of its relieving pressure is warned of', () => {
    const steam: Inputs = { W: q(10000, 'kg/h'), P1: q(1200, 'kPa_abs'), KSH: q(1, '-') };
    const codes = (P2: number) =>
      workMethod('b.steam', { ...steam, P2: q(P2, 'kPa_abs') }).warnings.map(({ code }) => code);
    expect(codes(700).length).toBe(codes(600).length + 1);
  });
});

describe('a search for a root', () => {
  it('says where the function has no value', () => {
    const found = findRoot((x) => (x > 0.4 && x < 0.6 ? Number.NaN : x - 0.5), 0, 1);
    expect(found).toMatchObject({ ok: false });
    expect(findRoot((x) => x, Number.NaN, 1)).toMatchObject({ ok: false });
  });
});
