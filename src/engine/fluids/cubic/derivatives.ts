/* How the fugacity coefficients of a phase move with its composition and temperature (Michelsen and Mollerup, ch. 3). */
import { DELTA1, DELTA2, R } from './constants';
import { type Mixture } from './mixture';
import { type Phase } from './phase';
import { type Thermal } from './thermal';
import { at } from './vector';

/** ∂ln φ_i/∂n_j by rows for one kmol of phase, and ∂ln φ_i/∂T at constant pressure, 1/K. */
export type Derivatives = { byMoles: Float64Array; byT: Float64Array };

/** Empty derivatives for `n` components. */
export function newDerivatives(n: number): Derivatives {
  return { byMoles: new Float64Array(n * n), byT: new Float64Array(n) };
}

/** Derivatives of F = A(residual)/RT of one kmol by V, B (covolume), D (attraction) and T, named by their variables. */
function reducedEnergy({ T, V, a: D, b: B, log, a1 }: Phase) {
  const width = R * B * (DELTA1 - DELTA2);
  const one = V + DELTA1 * B;
  const two = V + DELTA2 * B;
  const free = V - B;
  const f = log / width;
  const fV = -1 / (R * one * two);
  const fB = -(f + V * fV) / B;
  const fVV = (1 / (two * two) - 1 / (one * one)) / width;
  const fBV = -(2 * fV + V * fVV) / B;
  const fBB = -(2 * fB + V * fBV) / B;
  const pull = D / T;
  const DV = -fV / T;
  return {
    nV: -B / (V * free),
    nB: 1 / free,
    BV: -1 / (free * free) - pull * fBV,
    BB: 1 / (free * free) - pull * fBB,
    VV: 1 / (free * free) - 1 / (V * V) - pull * fVV,
    D: -f / T,
    DV,
    BD: -fB / T,
    DT: f / (T * T),
    BT: (pull * fB) / T,
    VT: (pull * fV) / T + DV * a1,
  };
}

/** Fills `out` for a phase that `evaluatePhase` filled. */
export function fugacityDerivatives(m: Mixture, t: Thermal, phase: Phase, out: Derivatives): void {
  const { n } = m;
  const { T, V, S, S1, a1, P } = phase;
  const { q, q1 } = t;
  const F = reducedEnergy(phase);
  const RT = R * T;
  const PV = -RT * (F.VV + 1 / (V * V));
  const PT = P / T - RT * F.VT;
  for (let i = 0; i < n; i += 1) {
    const bi = at(m.b, i);
    const Di = 2 * at(q, i) * at(S, i);
    const Pi = RT * (1 / V - F.nV - F.BV * bi - F.DV * Di);
    const DiT = 2 * (at(q1, i) * at(S, i) + at(q, i) * at(S1, i));
    out.byT[i] = (F.BT + F.BD * a1) * bi + F.DT * Di + F.D * DiT + 1 / T + (Pi * PT) / (PV * RT);
    for (let j = 0; j <= i; j += 1) {
      const bj = at(m.b, j);
      const Dj = 2 * at(q, j) * at(S, j);
      const Pj = RT * (1 / V - F.nV - F.BV * bj - F.DV * Dj);
      const Dij = 2 * at(q, i) * at(q, j) * at(m.share, i * n + j);
      const value =
        F.nB * (bi + bj) +
        F.BB * bi * bj +
        F.BD * (bi * Dj + bj * Di) +
        F.D * Dij +
        1 +
        (Pi * Pj) / (RT * PV);
      out.byMoles[i * n + j] = value;
      out.byMoles[j * n + i] = value;
    }
  }
}
