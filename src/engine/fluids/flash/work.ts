/* The stores of one fluid in which its flashes work, used again and again. */
import { type Derivatives, newDerivatives } from '../cubic/derivatives';
import { type Mixture } from '../cubic/mixture';
import { newPhase, type Phase } from '../cubic/phase';
import { newThermal, type Thermal } from '../cubic/thermal';

/**
 * `single` is one phase of the feed; `liquid` and `vapour` stand together with kmol `l` and `v` of each component per kmol
 * of feed. `lnK` is ln(y/x). `matrix` and `step` hold the Newton system of n + 1 unknowns.
 */
export type Work = {
  m: Mixture;
  t: Thermal;
  single: Phase;
  liquid: Phase;
  vapour: Phase;
  trial: Phase;
  l: Float64Array;
  v: Float64Array;
  lnK: Float64Array;
  liquidSlopes: Derivatives;
  vapourSlopes: Derivatives;
  matrix: Float64Array;
  step: Float64Array;
};

/** The stores for a mixture. */
export function newWork(m: Mixture): Work {
  const { n } = m;
  const vector = () => new Float64Array(n);
  const single = newPhase(n);
  single.x.set(m.z);
  return {
    m,
    t: newThermal(m),
    single,
    liquid: newPhase(n),
    vapour: newPhase(n),
    trial: newPhase(n),
    l: vector(),
    v: vector(),
    lnK: vector(),
    liquidSlopes: newDerivatives(n),
    vapourSlopes: newDerivatives(n),
    matrix: new Float64Array((n + 1) * (n + 1)),
    step: new Float64Array(n + 1),
  };
}
