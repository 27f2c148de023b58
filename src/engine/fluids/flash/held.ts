/* Flash of a mixture at a pressure with enthalpy, entropy or the vapour's mass held. */
import { molar } from '../cubic/state';
import { dot } from '../cubic/vector';
import { equilibrium, type Hold } from './newton';
import { phaseHolding, type Held, type Span } from './one-phase';
import { flashPT, type Outcome, vapourAmount } from './pt';
import { substituteK } from './split';
import { splits } from './stability';
import { type Work } from './work';

/** Where a flash ended: the temperature and what stands there. */
export type Found = { T: number; outcome: Outcome };

const MAX_ITERATIONS = 60;

/** What is held, of the outcome of a flash at P and T, per kmol of feed. */
function amount(work: Work, outcome: Outcome, kind: Hold['kind']): number {
  const { m, t } = work;
  if (outcome.phases === 1) {
    if (kind !== 'mass') return kind === 'T' ? t.T : molar(m, t, work.single)[kind];
    return work.single.Z > 0.3 ? dot(m.z, m.M, m.n) : 0;
  }
  if (kind === 'T') return t.T;
  if (kind === 'mass') return dot(work.v, m.M, m.n);
  const { beta } = outcome;
  return beta * molar(m, t, work.vapour)[kind] + (1 - beta) * molar(m, t, work.liquid)[kind];
}

/** Two phases from where the last flash left them. */
export function fromLast(work: Work, P: number, T: number, hold: Hold): Found | undefined {
  const kept = { l: work.l.slice(), v: work.v.slice() };
  const found = equilibrium(work, P, T, hold);
  if (found !== undefined) return { T: found, outcome: { phases: 2, beta: vapourAmount(work) } };
  work.l.set(kept.l);
  work.v.set(kept.v);
  return undefined;
}

/** One phase with what is held if it is stable; if it would split, two phases from where it would. */
export function asOnePhase(work: Work, P: number, held: Held, span: Span): Found | undefined {
  const T = phaseHolding(work.m, work.t, P, held, 'stable', span, work.single);
  if (T === undefined) return undefined;
  const two = splits(work, P, T);
  if (two === undefined) return undefined;
  if (!two) return { T, outcome: { phases: 1 } };
  const beta = substituteK(work, P, T, 10, 1e-6);
  return beta !== undefined && beta > 1e-9 && beta < 1 - 1e-9 ? fromLast(work, P, T, held) : undefined;
}

/**
 * The sure way: a bracket on temperature, halved or cut by the secant, with a flash at each; where two phases stand,
 * Newton tries to finish from them. What is held must rise with T.
 */
export function byBracket(work: Work, P: number, hold: Hold, span: Span): Found | undefined {
  let { low, high } = span;
  let lowGap = Number.NaN;
  let highGap = Number.NaN;
  let T = Math.min(Math.max(span.start, low), high);
  for (let i = 0; i < MAX_ITERATIONS; i += 1) {
    const outcome = flashPT(work, P, T);
    if (outcome === undefined) return undefined;
    const gap = amount(work, outcome, hold.kind) - hold.value;
    if (outcome.phases === 2) {
      const finished = fromLast(work, P, T, hold);
      if (finished !== undefined && finished.T >= span.low && finished.T <= span.high) return finished;
    } else if (hold.kind !== 'mass' && i > 6) {
      const one = asOnePhase(
        work,
        P,
        { kind: hold.kind as Held['kind'], value: hold.value },
        { low, high, start: T },
      );
      if (one !== undefined) return one;
    }
    if (gap < 0) [low, lowGap] = [T, gap];
    else [high, highGap] = [T, gap];
    if (high - low < 1e-9 * T) {
      const end = flashPT(work, P, T);
      return end !== undefined && low > span.low && high < span.high ? { T, outcome: end } : undefined;
    }
    const secant = high - (highGap * (high - low)) / (highGap - lowGap);
    const middle = (low + high) / 2;
    T = i % 3 === 2 || !(secant > low && secant < high) ? middle : secant;
  }
  return undefined;
}
