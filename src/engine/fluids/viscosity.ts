/* Viscosity of a liquid or a dilute vapour from the correlations of its substances. */
import { CRITICAL_VOLUME } from './cubic/constants';
import { type Mixture } from './cubic/mixture';
import { type Phase } from './cubic/phase';
import { at } from './cubic/vector';
import { type Correlation, type Substance } from './substances/types';

function holds(fit: Correlation | undefined, T: number): fit is Correlation {
  return fit !== undefined && T >= fit.range[0] && T <= fit.range[1];
}

/** Viscosity of a saturated liquid, Pa·s; undefined outside the range of its correlation. */
export function liquidViscosity({ muL }: Substance, T: number): number | undefined {
  if (!holds(muL, T)) return undefined;
  const [a0, a1, a2, a3, a4] = [0, 1, 2, 3, 4].map((i) => at(muL.a, i)) as [
    number,
    number,
    number,
    number,
    number,
  ];
  return Math.exp(a0 + a1 / T + a2 * Math.log(T) + a3 * T ** a4);
}

/** Viscosity of a vapour at low pressure, Pa·s; undefined outside the range of its correlation. */
export function vapourViscosity({ muV }: Substance, T: number): number | undefined {
  if (!holds(muV, T)) return undefined;
  return (at(muV.a, 0) * T ** at(muV.a, 1)) / (1 + at(muV.a, 2) / T + at(muV.a, 3) / (T * T));
}

/**
 * Viscosity of a phase, Pa·s: liquids mix by ln μ and mole fraction, vapours by Herning and Zipperer (weights x√M). The
 * effect of pressure is left out. Undefined when one of the substances has no value at T.
 */
export function phaseViscosity(m: Mixture, { T, V, b, x }: Phase): number | undefined {
  const liquid = V < CRITICAL_VOLUME * b && T < pseudoCritical(m, x);
  let sum = 0;
  let weights = 0;
  for (let i = 0; i < m.n; i += 1) {
    const xi = at(x, i);
    const substance = m.substances[i];
    if (xi === 0 || substance === undefined) continue;
    const mu = liquid ? liquidViscosity(substance, T) : vapourViscosity(substance, T);
    if (mu === undefined) return undefined;
    const weight = liquid ? xi : xi * Math.sqrt(at(m.M, i));
    sum += weight * (liquid ? Math.log(mu) : mu);
    weights += weight;
  }
  const mean = sum / weights;
  const mu = liquid ? Math.exp(mean) : mean;
  return Number.isFinite(mu) && mu > 0 ? mu : undefined;
}

/** Kay's pseudo-critical temperature, K: above it a dense phase is not called a liquid. */
function pseudoCritical(m: Mixture, x: ArrayLike<number>): number {
  let T = 0;
  for (let i = 0; i < m.n; i += 1) T += at(x, i) * at(m.Tc, i);
  return T;
}
