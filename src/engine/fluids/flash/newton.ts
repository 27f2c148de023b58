/* Two phases in equilibrium at a pressure with temperature, enthalpy, entropy or vapour share held: full Newton. */
import { fugacityDerivatives } from '../cubic/derivatives';
import { R } from '../cubic/constants';
import { heatCapacities, molar } from '../cubic/state';
import { setTemperature } from '../cubic/thermal';
import { at, dot, solveLinear } from '../cubic/vector';
import { evaluateBoth, spread, TRIVIAL } from './split';
import { type Work } from './work';

/** What is held beside the pressure: T in K, h J/kmol, s J/(kmol·K), or kg of vapour per kmol of feed. */
export type Hold = { kind: 'T' | 'h' | 's' | 'mass'; value: number };

const MAX_ITERATIONS = 40;
/** A move below this, relative to the smaller of both amounts: Newton has then converged to rounding. */
const ENOUGH = 1e-8;

/** Sets the compositions from l and v; the share of vapour. */
function compositions({ m, l, v, liquid, vapour }: Work): number {
  let beta = 0;
  let rest = 0;
  for (let i = 0; i < m.n; i += 1) {
    beta += at(v, i);
    rest += at(l, i);
  }
  for (let i = 0; i < m.n; i += 1) {
    liquid.x[i] = at(l, i) / rest;
    vapour.x[i] = at(v, i) / beta;
  }
  return beta / (beta + rest);
}

/** Fills the rows of equal fugacity; columns: kmol of vapour of each component, then ln T. */
function fugacityRows(work: Work, beta: number, T: number): void {
  const { m, liquid, vapour, liquidSlopes, vapourSlopes, matrix, step } = work;
  const { n } = m;
  const width = n + 1;
  for (let i = 0; i < n; i += 1) {
    const x = at(liquid.x, i);
    const y = at(vapour.x, i);
    work.lnK[i] = Math.log(y / x);
    step[i] = -(at(work.lnK, i) + at(vapour.lnphi, i) - at(liquid.lnphi, i));
    for (let j = 0; j < n; j += 1) {
      const k = i * n + j;
      const own = i === j ? 1 / (y * beta) + 1 / (x * (1 - beta)) : 0;
      matrix[i * width + j] =
        own + (at(vapourSlopes.byMoles, k) - 1) / beta + (at(liquidSlopes.byMoles, k) - 1) / (1 - beta);
    }
    matrix[i * width + n] = T * (at(vapourSlopes.byT, i) - at(liquidSlopes.byT, i));
  }
}

/** Fills the last row: what is held, scaled to the order of one. */
function heldRow(work: Work, T: number, beta: number, hold: Hold): void {
  const { m, t, liquid, vapour, liquidSlopes, vapourSlopes, matrix, step } = work;
  const { n } = m;
  const row = n * (n + 1);
  if (hold.kind === 'T') {
    for (let j = 0; j < n; j += 1) matrix[row + j] = 0;
    matrix[row + n] = 1;
    step[n] = Math.log(hold.value / T);
    return;
  }
  if (hold.kind === 'mass') {
    const total = dot(m.z, m.M, n);
    for (let j = 0; j < n; j += 1) matrix[row + j] = at(m.M, j) / total;
    matrix[row + n] = 0;
    step[n] = (hold.value - dot(work.v, m.M, n)) / total;
    return;
  }
  const { kind } = hold;
  const scale = kind === 'h' ? R * T : R;
  for (let j = 0; j < n; j += 1) {
    const heat = -R * T * T * (at(vapourSlopes.byT, j) - at(liquidSlopes.byT, j));
    matrix[row + j] = kind === 'h' ? heat / scale : heat / (T * scale) + at(step, j);
  }
  const cp = beta * heatCapacities(m, t, vapour).cp + (1 - beta) * heatCapacities(m, t, liquid).cp;
  matrix[row + n] = (kind === 'h' ? cp * T : cp) / scale;
  const now = beta * molar(m, t, vapour)[kind] + (1 - beta) * molar(m, t, liquid)[kind];
  step[n] = (hold.value - now) / scale;
}

/** The share of the step that keeps every amount above nought and the temperature within a tenth. */
function damped({ m, l, v, step }: Work): number {
  let share = Math.min(1, 0.1 / Math.abs(at(step, m.n)));
  for (let i = 0; i < m.n; i += 1) {
    const move = at(step, i);
    const room = move < 0 ? at(v, i) / -move : at(l, i) / move;
    if (share > 0.9 * room) share = 0.9 * room;
  }
  return share;
}

/** Moves l, v by the step; the largest move against the amount of either phase. */
function moveBy({ m, l, v, step }: Work, share: number): number {
  let most = Math.abs(at(step, m.n));
  for (let i = 0; i < m.n; i += 1) {
    const move = share * at(step, i);
    const small = Math.min(at(l, i), at(v, i));
    most = Math.max(most, Math.abs(move) / Math.max(small, 1e-6));
    l[i] = at(l, i) - move;
    v[i] = at(v, i) + move;
  }
  return most;
}

/**
 * Newton from the l, v that stand in `work` and the temperature T. Gives the temperature at which both phases are in
 * equilibrium and what is held is met (`work` then holds the phases, evaluated there); undefined when one of the phases
 * vanishes, both fall together, or it does not converge.
 */
export function equilibrium(work: Work, P: number, start: number, hold: Hold): number | undefined {
  const { m, t, liquid, vapour } = work;
  let T = start;
  for (let i = 0; i < MAX_ITERATIONS; i += 1) {
    const beta = compositions(work);
    if (!(beta > 1e-9 && beta < 1 - 1e-9 && T > 1 && T < 1e4)) return undefined;
    setTemperature(m, t, T);
    if (!evaluateBoth(work, P)) return undefined;
    fugacityDerivatives(m, t, liquid, work.liquidSlopes);
    fugacityDerivatives(m, t, vapour, work.vapourSlopes);
    fugacityRows(work, beta, T);
    heldRow(work, T, beta, hold);
    if (!solveLinear(work.matrix, work.step, m.n + 1)) return undefined;
    const share = damped(work);
    if (!(share > 1e-4)) return undefined;
    const moved = moveBy(work, share);
    const last = T;
    T *= Math.exp(share * at(work.step, m.n));
    if (moved < ENOUGH && share === 1) {
      if (spread(work) < TRIVIAL) return undefined;
      compositions(work);
      setTemperature(m, t, T);
      return evaluateBoth(work, P) ? T : last;
    }
  }
  return undefined;
}
