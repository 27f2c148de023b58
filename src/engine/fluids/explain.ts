/* The figures between composition and density that a sheet shows so that a hand can rework them. */
import { type CubicFluid } from './cubic-fluid';
import { R } from './cubic/constants';
import { evaluatePhase, newPhase, pressureSlopes } from './cubic/phase';
import { newThermal, setTemperature } from './cubic/thermal';
import { dot } from './cubic/vector';

/**
 * A, B and the root Z of the equation itself; `shift` = cP/RT of the translation; cp of the ideal gas in J/(kg·K);
 * cubic expansion 1/K and isothermal compressibility 1/Pa of the translated volume.
 */
export type Figures = {
  A: number;
  B: number;
  root: number;
  shift: number;
  cpIdeal: number;
  expansion: number;
  compressibility: number;
};

/** The figures of the feed as one phase at P (Pa) and T (K); undefined where it has none. */
export function figuresOf(fluid: CubicFluid, P: number, T: number): Figures | undefined {
  const { mixture: m, M } = fluid;
  const t = newThermal(m);
  setTemperature(m, t, T);
  const phase = newPhase(m.n);
  phase.x.set(m.z);
  if (!(P > 0 && T > 0 && evaluatePhase(m, t, P, 'stable', phase))) return undefined;
  const c = dot(m.z, m.c, m.n);
  const v = phase.V - c;
  const { PT, PV } = pressureSlopes(phase);
  return {
    A: (phase.a * P) / (R * T) ** 2,
    B: phase.B,
    root: phase.Z,
    shift: (c * P) / (R * T),
    cpIdeal: (R * dot(m.z, t.cp, m.n)) / M,
    expansion: -PT / (PV * v),
    compressibility: -1 / (PV * v),
  };
}
