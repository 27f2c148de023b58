/* Boiling of one substance: the temperature at which liquid and vapour have equal fugacity at a pressure. */
import { CRITICAL_VOLUME, R } from '../cubic/constants';
import { type Mixture } from '../cubic/mixture';
import { evaluatePhase, newPhase, type Phase } from '../cubic/phase';
import { setTemperature, type Thermal } from '../cubic/thermal';
import { at } from '../cubic/vector';

/** Liquid and vapour of one substance in equilibrium. */
export type Boiling = { T: number; liquid: Phase; vapour: Phase };

const MAX_ITERATIONS = 120;

/** Wilson's estimate of the boiling temperature, K. */
function estimate(m: Mixture, P: number): number {
  const Tc = at(m.Tc, 0);
  return Tc / (1 - Math.log(P / at(m.Pc, 0)) / (5.373 * (1 + at(m.omega, 0))));
}

/** A store for the two phases of a pure substance, to be used again and again. */
export function newBoiling(): Boiling {
  const pure = () => ({ ...newPhase(1), x: Float64Array.of(1) });
  return { T: Number.NaN, liquid: pure(), vapour: pure() };
}

/**
 * Boiling at P (Pa), below the critical pressure. Newton on the difference of ln φ inside a bracket that each step
 * narrows: where only one root exists, it says on which side of the boiling point T lies. Fills `out`; false at or above
 * the critical pressure, and where the bracket closes without two phases.
 */
export function boilingAt(m: Mixture, t: Thermal, P: number, out: Boiling): boolean {
  const Tc = at(m.Tc, 0);
  if (!(P > 0 && P < at(m.Pc, 0))) return false;
  const { liquid, vapour } = out;
  let low = 0.1 * Tc;
  let high = Tc;
  let T = Math.min(Math.max(estimate(m, P), low), high);
  for (let i = 0; i < MAX_ITERATIONS; i += 1) {
    out.T = T;
    setTemperature(m, t, T);
    if (!evaluatePhase(m, t, P, 'liquid', liquid) || !evaluatePhase(m, t, P, 'vapour', vapour)) return false;
    let next = Number.NaN;
    if (liquid.Z === vapour.Z) {
      if (liquid.V < CRITICAL_VOLUME * liquid.b) low = T;
      else high = T;
    } else {
      const gap = at(liquid.lnphi, 0) - at(vapour.lnphi, 0);
      if (gap < 0) low = T;
      else high = T;
      next = T - (gap * R * T * T) / (vapour.hRes - liquid.hRes);
      if (Math.abs(next - T) < 1e-11 * T) return true;
    }
    if (high - low < 1e-13 * T) return liquid.Z !== vapour.Z;
    T = next > low && next < high ? next : (low + high) / 2;
  }
  return false;
}
