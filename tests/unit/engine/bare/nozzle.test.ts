/*
 * Nozzles of two phases and of tabulated isentropes in bare numbers. Figures marked "quadrature" maximise √(2 ∫ v dP)/v of the
 * omega equation of state itself, by adaptive quadrature and the condition G² = −1/(dv/dP), and not its printed solution; the API
 * 520-1 Annex C examples (from memory) and the tables of tests/reference/d-two-phase.json are named beside each.
 */
import { describe, expect, it } from 'vitest';
import { cases } from '../../../reference/d-two-phase.json';
import {
  lowSubcoolingRatio,
  omegaFlux,
  omegaFluxAt,
  omegaRatio,
  omegaRatioFit,
  omegaShape,
  subcooledFlux,
  subcooledShape,
  transitionRatio,
} from '../../../../src/engine/methods/d-two-phase/omega';
import { firstMaximum } from '../../../../src/engine/nozzle/maximum';
import {
  smoothThroat,
  trapezoidFluxes,
  trapezoidThroat,
  trapezoidWork,
} from '../../../../src/engine/nozzle/table';
import { near } from './near';

describe('omega, saturated inlet', () => {
  const throats = [
    [0.1, 0.3142836080665, 0.99385203274592],
    [0.3, 0.44792159099418, 0.81778919793705],
    [1, 0.60653065971265, 0.60653065971263],
    [1.482, 0.65632664850531, 0.53913302569172],
    [5, 0.7900602911097, 0.35332570344891],
    [20, 0.89377434728608, 0.1998540197077],
    [150, 0.96624643874477, 0.0788936913569],
    [1000, 0.98957267768, 0.0312930357174],
  ] as const;

  it('finds the throat of the equation of state (quadrature)', () => {
    for (const [omega, eta, flux] of throats) {
      near(omegaRatio(omega), eta, 1e-9);
      near(omegaShape(omega, eta), flux, 1e-9);
      const found = omegaFlux(omega, 1e6, 0.004, 0);
      near(found.flux, flux * Math.sqrt(1e6 / 0.004), 1e-9);
      expect(found.critical).toBe(true);
    }
    expect(omegaRatio(0)).toBe(0);
    expect(omegaRatio(Number.NaN)).toBe(0);
  });

  it('keeps to the explicit fit of API 520-1 as far as that reaches', () => {
    for (const [omega, eta] of throats.filter(([w]) => w >= 1 && w <= 100))
      near(omegaRatioFit(omega), eta, 3e-4);
  });

  it('has the flux at any throat pressure, near the inlet too (quadrature)', () => {
    near(omegaShape(5, 0.9), 0.3237378764796, 1e-11);
    near(omegaShape(5, 0.995), 0.0981588348124, 1e-11);
    near(omegaShape(2, 0.97), 0.2341844845133, 1e-11);
    near(omegaShape(0.3, 0.9), 0.4362534161902, 1e-11);
    near(omegaShape(0, 0.5), 1, 1e-12);
  });

  it('is subcritical above the critical pressure, and at rest against the inlet pressure (d-omega-sat-1, d-omega-sat-sub)', () => {
    near(omegaFlux(2.88, 1e6, 0.005, 150e3).flux, 6115.7473, 1e-7);
    const slow = omegaFlux(1.125, 300e3, 0.02, 230e3);
    near(slow.flux, 2119.1502, 1e-7);
    near(slow.ratio, 0.62166857, 1e-7);
    expect(slow.critical).toBe(false);
    expect(omegaFlux(2, 1e5, 0.01, 1e5).flux).toBe(0);
    expect(omegaFlux(2, 1e5, 0.01, 2e5).flux).toBe(0);
    near(omegaFlux(2.88, 1e6, 0.005, -150e3).flux, 6115.7473, 1e-7);
    expect(omegaFluxAt(2, 1e5, 0.01, 0.7e5, 0.7).critical).toBe(true);
    near(omegaFluxAt(5, 1e6, 0.004, 0, 0.9).flux, 0.3237378764796 * Math.sqrt(2.5e8), 1e-10);
  });

  it('gives the Annex C example of two phases, 594.1 lb/(ft²·s) (d-api520-annexC-ex1)', () => {
    const [psi, ft3lb, lbft2] = [6894.757, 0.0624279606, 4.88242764];
    const found = omegaFlux(1.482, 80.7 * psi, 0.3116 * ft3lb, 29.7 * psi);
    near(found.ratio, 0.66, 0.008);
    near(found.flux / lbft2, 594.1, 0.008);
  });
});

describe('omega, subcooled inlet', () => {
  it('parts low from high subcooling at 2ω/(1 + 2ω)', () => {
    near(transitionRatio(8.515), 0.9445, 1e-4);
    near(transitionRatio(12), 0.96, 1e-12);
  });

  it('finds the throat below the saturation pressure (quadrature)', () => {
    for (const [omega, etaS, eta, flux] of [
      [12, 1180 / 1200, 0.8792388421004, 0.25595632265441],
      [12, 0.97, 0.9065139507846, 0.26570394458031],
      [5, 0.95, 0.8227938854821, 0.37752372612418],
      [0.4, 0.8, 0.470807247922, 0.83227749409368],
      [1, 0.9, 0.6100286202049, 0.64302662591244],
      [3, 1, 0.7383227525139, 0.4262708399129],
    ] as const) {
      near(lowSubcoolingRatio(omega, etaS), eta, 1e-8);
      near(subcooledShape(omega, etaS, eta), flux, 1e-9);
      const found = subcooledFlux({ P0: 1e6, rho0: 850, Ps: etaS * 1e6, omegaS: omega }, 1e5);
      near(found.flux, flux * Math.sqrt(8.5e8), 1e-8);
      expect([found.low, found.critical]).toEqual([true, true]);
    }
    near(subcooledShape(5, 0.95, 0.9), 0.3617300037256, 1e-11);
    near(subcooledShape(5, 0.95, 0.945), 0.3233083498798, 1e-11);
    near(subcooledShape(5, 0.95, 0.98), 0.2, 1e-12);
  });

  it('gives the Annex C example of subcooled liquid, 7 560.3 lb/(ft²·s) (d-api520-annexC-ex2)', () => {
    const psi = 6894.757;
    const inlet = { P0: 300.7 * psi, rho0: 31.92 * 16.01846337, Ps: 107.6 * psi, omegaS: 8.515 };
    const found = subcooledFlux(inlet, 24.7 * psi);
    near(found.flux / 4.88242764, 7560.3, 1e-3);
    near(found.ratio, 107.6 / 300.7, 1e-9);
    expect([found.low, found.critical]).toEqual([false, true]);
  });

  it('does not flash where the back pressure is above saturation (d-omega-low-sub, d-omega-high-sub-subcritical)', () => {
    const inlet = { P0: 1200e3, rho0: 850, Ps: 150e3, omegaS: 12 };
    const found = subcooledFlux(inlet, 300e3);
    near(found.flux, 39115.214, 1e-7);
    expect([found.low, found.critical]).toEqual([false, false]);
    near(subcooledFlux({ ...inlet, Ps: 1180e3 }, 200e3).flux, 8174.5894, 1e-7);
    near(subcooledFlux({ ...inlet, Ps: 1180e3 }, -1).flux, 8174.5894, 1e-7);
    expect(subcooledFlux(inlet, 1200e3).flux).toBe(0);
    expect(subcooledFlux(inlet, 1300e3).flux).toBe(0);
  });
});

describe('tabulated isentropes', () => {
  it.each(['d-table-propane', 'd-table-water'])('give the flux and the row of %s', (id) => {
    const found = cases.find((one) => one.id === id);
    if (!found?.inputs.P || !found.inputs.v) throw new Error(`${id} is missing`);
    const P = (found.inputs.P.value as number[]).map((p) => p * 1e3);
    const table = { P, v: found.inputs.v.value as number[] };
    const expected = (key: string) =>
      Number(Object.entries(found.expected).find(([k]) => k === key)?.[1].value);
    const rows = trapezoidThroat(table, 101325);
    near(rows.flux, expected('mass_flux_trapezoid'), 2e-4);
    near(rows.P, expected('throat_pressure_grid_point') * 1e3, 1e-9);
    expect(rows.choked).toBe(true);
    near(smoothThroat(table, 101325)?.flux, expected('mass_flux_exact'), 1e-3);
  });

  it('adds trapezia by hand: 1 000, 800, 600 Pa at 0.01, 0.012, 0.02 m³/kg', () => {
    const table = { P: [1000, 800, 600], v: [0.01, 0.012, 0.02] };
    const work = trapezoidWork(table);
    expect(work[0]).toBe(0);
    near(work[1], 4.4, 1e-12);
    near(work[2], 10.8, 1e-12);
    near(trapezoidFluxes(table)[1], Math.sqrt(4.4) / 0.012, 1e-12);
    const throat = trapezoidThroat(table, 0);
    expect([throat.row, throat.P, throat.v, throat.choked]).toEqual([1, 800, 0.012, true]);
    // The second row is the last one not below 700 Pa: nothing says that the flow is choked there.
    expect(trapezoidThroat(table, 700)).toMatchObject({ row: 1, choked: false });
    expect(trapezoidThroat(table, 800)).toMatchObject({ row: 1, choked: false });
    expect(trapezoidThroat(table, 900)).toMatchObject({ row: 0, flux: 0, choked: false });
  });

  it('smooths the isentrope of an ideal gas to its closed form: k = 1.4, throat at 0.52828 of the inlet', () => {
    const P = Array.from({ length: 41 }, (_, i) => 1e6 - i * 20e3);
    const table = { P, v: P.map((p) => 0.08 * (1e6 / p) ** (1 / 1.4)) };
    const sonic = smoothThroat(table, 1e5);
    near(sonic?.P, 528282, 2e-3);
    // √(k) (2/(k+1))^((k+1)/(2(k−1))) = 0.6847315 at k = 1.4.
    near(sonic?.flux, 0.684731456 * Math.sqrt(1e6 / 0.08), 2e-6);
    near(sonic?.v, 0.08 * (1 / 0.52828) ** (1 / 1.4), 2e-3);
    expect(sonic?.choked).toBe(true);
    // At 0.8 of the inlet pressure: √(2 k/(k−1) (r^(2/k) − r^((k+1)/k))).
    const slow = smoothThroat(table, 8.1e5);
    const r = 0.81;
    near(slow?.flux, Math.sqrt((7 * (r ** (2 / 1.4) - r ** (2.4 / 1.4)) * 1e6) / 0.08), 2e-6);
    expect([slow?.P, slow?.choked]).toEqual([8.1e5, false]);
    expect(smoothThroat(table, 1e6)).toBeUndefined();
    expect(smoothThroat(table, 2e6)).toBeUndefined();
  });

  it('takes a straight line through two rows', () => {
    const throat = smoothThroat({ P: [1000, 600], v: [0.01, 0.02] }, 0);
    // ∫ v dP down to 600 Pa = 6 J/kg: √12/0.02. The flux of a straight line, √((1 − (v0/v)²)/s), rises all the way.
    near(throat?.flux, Math.sqrt(12) / 0.02, 1e-9);
    expect(throat).toMatchObject({ P: 600, choked: false });
  });
});

describe('first maximum', () => {
  const options = { first: 0, step: 0.03, tolerance: 1e-5 };

  it('finds a summit inside, the end of a way that rises, and the start of one that falls', () => {
    const hill = firstMaximum((y) => 1 - (y - 0.7) ** 2, 2, { ...options, first: 0.51 });
    near(hill?.y, 0.7, 1e-4);
    near(hill?.f, 1, 1e-8);
    expect(hill?.inside).toBe(true);
    expect(firstMaximum((y) => y, 2, options)).toEqual({ y: 2, f: 2, inside: false });
    expect(firstMaximum((y) => -y, 2, options)).toEqual({ y: 0, f: 0, inside: true });
    const early = firstMaximum((y) => Math.sqrt(y) * Math.exp(-100 * y), 2, options);
    near(early?.y, 0.005, 5e-3);
    near(early?.f, Math.sqrt(0.005) * Math.exp(-0.5), 1e-6);
  });

  it('stops at the first of two summits, at a kink, and just ahead of the end', () => {
    const first = firstMaximum((y) => Math.sin(5 * y) + y, 6, options);
    near(first?.y, Math.acos(-0.2) / 5, 1e-3);
    const kink = firstMaximum((y) => (y < 0.5 ? y : 1 - y), 2, options);
    near(kink?.y, 0.5, 1e-4);
    const late = firstMaximum((y) => 1 - (y - 1.99) ** 2, 2, { ...options, first: -2.9601 });
    near(late?.y, 1.99, 1e-4);
    expect(late?.inside).toBe(true);
  });

  it('answers nothing where the function has no value, and takes a way shorter than its tolerance in one step', () => {
    expect(firstMaximum(() => undefined, 2, options)).toBeUndefined();
    expect(firstMaximum((y) => (y > 0.5 ? undefined : y), 2, options)).toBeUndefined();
    expect(firstMaximum((y) => (y > 0 && y < 0.03 ? undefined : -y), 2, options)).toBeUndefined();
    expect(firstMaximum((y) => (y > 1.9 && y < 2 ? undefined : y), 2, options)).toBeUndefined();
    expect(firstMaximum((y) => 3 * y, 1e-6, options)).toEqual({ y: 1e-6, f: 3e-6, inside: false });
  });
});
