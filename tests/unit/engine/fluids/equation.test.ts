/* The equation of state against an independent implementation, and against its own slopes taken by differences. */
import { describe, expect, it } from 'vitest';
import { readComposition } from '../../../../src/engine/fluids';
import { fugacityDerivatives, newDerivatives } from '../../../../src/engine/fluids/cubic/derivatives';
import { mixtureOf, type Mixture } from '../../../../src/engine/fluids/cubic/mixture';
import {
  evaluatePhase,
  newPhase,
  type Phase,
  pressureSlopes,
} from '../../../../src/engine/fluids/cubic/phase';
import { heatCapacities, molar, phaseState } from '../../../../src/engine/fluids/cubic/state';
import { newThermal, setTemperature, type Thermal } from '../../../../src/engine/fluids/cubic/thermal';
import { dot } from '../../../../src/engine/fluids/cubic/vector';
import reference from '../../../reference/fluids.json';

const R = 8.314462618;

function mixture(words: string): Mixture {
  const read = readComposition(words);
  if (!read.ok) throw new Error(read.text);
  return mixtureOf(read.composition.substances, read.composition.z);
}

type Side = 'liquid' | 'vapour';

function phaseAt(m: Mixture, T: number, P: number, side: Side, x: ArrayLike<number> = m.z): [Thermal, Phase] {
  const t = newThermal(m);
  setTemperature(m, t, T);
  const phase = newPhase(m.n);
  phase.x.set(Array.from(x));
  expect(evaluatePhase(m, t, P, side, phase)).toBe(true);
  return [t, phase];
}

describe(`against an independent implementation [${reference.equation.source}]`, () => {
  it.each(
    reference.equation.rows.map((row) => [`${row.composition}, ${row.T} K, ${row.P} Pa`, row] as const),
  )('%s: volume, fugacities, residuals and slopes agree to 1e-6', (_name, row) => {
    const m = mixture(row.composition);
    const [t, phase] = phaseAt(m, row.T, row.P, row.phase as Side);
    const c = dot(m.z, m.c, m.n);
    const near = (ours: number, theirs: number) =>
      expect(Math.abs(ours - theirs)).toBeLessThan(1e-6 * Math.max(1e-3, Math.abs(theirs)));
    near((phase.V - c) / 1000 / row.V, 1);
    near((phase.hRes - c * row.P) / 1000, row.H_dep);
    near(phase.sRes / 1000, row.S_dep);
    const { cp, cv } = heatCapacities(m, t, phase);
    const ideal = R * (dot(m.z, t.cp, m.n) - 1);
    near(cv / 1000 - ideal, row.Cv_dep);
    near(cp / 1000 - ideal - R, row.Cp_dep);
    near(pressureSlopes(phase).PV * 1000, row.dP_dV);
    row.lnphis.forEach((theirs, i) => {
      near((phase.lnphi[i] ?? 0) - ((m.c[i] ?? 0) / 1000) * (row.P / (R * row.T)), theirs);
    });
  });
});

const CASES = [
  ['propane 0.6; n-butane 0.4', 300, 2e6, 'liquid'],
  ['methane 0.3; carbon dioxide 0.2; n-hexane 0.3; hydrogen sulfide 0.2', 320, 2e7, 'liquid'],
  ['methane 0.3; carbon dioxide 0.2; n-hexane 0.3; hydrogen sulfide 0.2', 450, 3e6, 'vapour'],
  ['nitrogen 0.5; hydrogen 0.2; ammonia 0.3', 350, 1e7, 'vapour'],
] as const;

describe.each(CASES)('slopes by differences: %s at %d K, %d Pa', (words, T, P, side) => {
  const m = mixture(words);
  const [t, phase] = phaseAt(m, T, P, side);
  const slopes = newDerivatives(m.n);
  fugacityDerivatives(m, t, phase, slopes);

  it('ln φ in T, and the residual enthalpy that belongs to it', () => {
    const d = T * 1e-5;
    const [, up] = phaseAt(m, T + d, P, side);
    const [, down] = phaseAt(m, T - d, P, side);
    let hRes = 0;
    for (let i = 0; i < m.n; i += 1) {
      const slope = ((up.lnphi[i] ?? 0) - (down.lnphi[i] ?? 0)) / (2 * d);
      expect(Math.abs((slopes.byT[i] ?? 0) / slope - 1)).toBeLessThan(1e-5);
      hRes -= (m.z[i] ?? 0) * 1000 * R * T * T * (slopes.byT[i] ?? 0);
    }
    expect(Math.abs(hRes / phase.hRes - 1)).toBeLessThan(1e-9);
  });

  it('ln φ in the amounts, and Gibbs and Duhem', () => {
    const d = 1e-6;
    for (let j = 0; j < m.n; j += 1) {
      const moved = (by: number) => {
        const amounts = Array.from(m.z, (z, i) => (i === j ? z + by : z));
        return phaseAt(
          m,
          T,
          P,
          side,
          amounts.map((a) => a / (1 + by)),
        )[1];
      };
      const [up, down] = [moved(d), moved(-d)];
      let duhem = 0;
      for (let i = 0; i < m.n; i += 1) {
        const slope = ((up.lnphi[i] ?? 0) - (down.lnphi[i] ?? 0)) / (2 * d);
        const ours = slopes.byMoles[i * m.n + j] ?? 0;
        expect(Math.abs(ours - slope)).toBeLessThan(1e-5 * (1 + Math.abs(slope)));
        duhem += (m.z[i] ?? 0) * ours;
      }
      expect(Math.abs(duhem)).toBeLessThan(1e-9);
    }
  });

  it('cp is the slope of h, and dh = T ds + v dP; the speed of sound is the slope of P along the isentrope', () => {
    const d = T * 1e-5;
    const at = (TT: number, PP: number) => {
      const [tt, one] = phaseAt(m, TT, PP, side);
      return molar(m, tt, one);
    };
    const h = (at(T + d, P).h - at(T - d, P).h) / (2 * d);
    expect(Math.abs(heatCapacities(m, t, phase).cp / h - 1)).toBeLessThan(1e-6);
    const e = P * 1e-4;
    const dh = at(T, P + e).h - at(T, P - e).h;
    const ds = at(T, P + e).s - at(T, P - e).s;
    expect(Math.abs((dh - T * ds) / (2 * e * molar(m, t, phase).v) - 1)).toBeLessThan(1e-6);
    const state = phaseState(m, t, phase);
    const now = molar(m, t, phase);
    const isentropic = (PP: number) => {
      let TT = T;
      for (let i = 0; i < 40; i += 1) {
        const [tt, one] = phaseAt(m, TT, PP, side);
        TT += ((now.s - molar(m, tt, one).s) * TT) / heatCapacities(m, tt, one).cp;
      }
      const found = at(TT, PP);
      return found.M / found.v;
    };
    const w = Math.sqrt((2 * e) / (isentropic(P + e) - isentropic(P - e)));
    expect(Math.abs((state?.w ?? 0) / w - 1)).toBeLessThan(1e-5);
  });
});
