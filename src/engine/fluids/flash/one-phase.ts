/* The temperature at which one phase of given composition has a wanted enthalpy or entropy at a pressure. */
import { evaluatePhase, type Phase, type RootChoice } from '../cubic/phase';
import { heatCapacities, molar } from '../cubic/state';
import { type Mixture } from '../cubic/mixture';
import { setTemperature, type Thermal } from '../cubic/thermal';

/** What a flash holds: enthalpy in J/kmol or entropy in J/(kmol·K). */
export type Held = { kind: 'h' | 's'; value: number };

/** Temperatures in K between which an answer is sought, and where the search begins. */
export type Span = { low: number; high: number; start: number };

const MAX_ITERATIONS = 100;

/**
 * Fills `phase` (composition in `phase.x`) at P and the temperature at which it has what is held: Newton by cp inside a
 * bracket, for h and s rise with T at constant pressure. Undefined when the answer lies outside the span.
 */
export function phaseHolding(
  m: Mixture,
  t: Thermal,
  P: number,
  held: Held,
  choice: RootChoice,
  span: Span,
  phase: Phase,
): number | undefined {
  let { low, high } = span;
  let T = Math.min(Math.max(span.start, low), high);
  for (let i = 0; i < MAX_ITERATIONS; i += 1) {
    setTemperature(m, t, T);
    if (!evaluatePhase(m, t, P, choice, phase)) return undefined;
    const now = molar(m, t, phase);
    const gap = held.value - now[held.kind];
    const { cp } = heatCapacities(m, t, phase);
    const slope = held.kind === 'h' ? cp : cp / T;
    const next = held.kind === 'h' ? T + gap / cp : T * Math.exp(Math.max(-2, Math.min(2, gap / cp)));
    if (Math.abs(gap) < 1e-10 * Math.abs(slope) * T) return T;
    if (gap > 0) low = T;
    else high = T;
    if (high - low < 1e-12 * T) return low > span.low && high < span.high ? T : undefined;
    T = cp > 0 && next > low && next < high ? next : (low + high) / 2;
  }
  return undefined;
}
