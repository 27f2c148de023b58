/* What stands at a pressure and temperature: one phase, or two in equilibrium. */
import { equilibrium } from './newton';
import { splits } from './stability';
import { substituteK, wilson } from './split';
import { type Work } from './work';

/** The outcome of a flash at P and T; `beta` is the kmol of vapour per kmol of feed. */
export type Outcome = { phases: 1 } | { phases: 2; beta: number };

/** Substitutions from Wilson's K-values, and from those of a feed that is known to split. */
const FEW = 12;
const MANY = 400;

const inside = (beta: number | undefined): beta is number =>
  beta !== undefined && beta > 1e-9 && beta < 1 - 1e-9;

/** Amount of vapour per kmol of feed after `equilibrium`. */
export function vapourAmount({ v }: Work): number {
  return v.reduce((sum, amount) => sum + amount, 0);
}

/** Closes a split from the K-values in `work`: some substitutions, then Newton; substitution alone where Newton fails. */
function close(work: Work, P: number, T: number, substitutions: number): Outcome | undefined {
  if (!inside(substituteK(work, P, T, substitutions, 1e-7))) return undefined;
  const kept = work.lnK.slice();
  if (equilibrium(work, P, T, { kind: 'T', value: T }) !== undefined)
    return { phases: 2, beta: vapourAmount(work) };
  work.lnK.set(kept);
  const beta = substituteK(work, P, T, 400, 1e-11);
  return inside(beta) ? { phases: 2, beta } : undefined;
}

/**
 * Flash at P (Pa) and T (K). With two phases `work.liquid` and `work.vapour` hold them; with one, `work.single`.
 * Undefined when the feed has no phase there or neither answer can be confirmed.
 */
export function flashPT(work: Work, P: number, T: number): Outcome | undefined {
  wilson(work, P, T);
  const first = close(work, P, T, FEW);
  if (first !== undefined) return first;
  const two = splits(work, P, T);
  if (two === undefined) return undefined;
  if (!two) return { phases: 1 };
  // A feed at the very edge of boiling splits by less than the flash can resolve: one phase then.
  return close(work, P, T, MANY) ?? (splits(work, P, T) === undefined ? undefined : { phases: 1 });
}
