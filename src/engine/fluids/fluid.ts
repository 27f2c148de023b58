/* A fluid of the library by its composition, as a source of properties. */
import { type Composition, readComposition } from './composition';
import { type CubicFluid } from './cubic-fluid';
import { mixtureOf } from './cubic/mixture';
import { mixedFluid } from './mixed-fluid';
import { pureFluid } from './pure-fluid';

/** How the equation is named on a sheet. */
export const EQUATION =
  'Peng–Robinson equation (1976) with the Twu alpha function and a constant translation of volume (Pina-Martinez et al. 2018)';

/** The properties of a composition that was read. */
export function fluidOf({ substances, z }: Composition): CubicFluid {
  const mixture = mixtureOf(substances, z);
  const name = substances
    .map((s, i) => (substances.length === 1 ? s.name : `${s.name} ${Number((z[i] ?? 0).toPrecision(6))}`))
    .join('; ');
  return substances.length === 1 ? pureFluid(mixture, name, EQUATION) : mixedFluid(mixture, name, EQUATION);
}

/**
 * The properties of a composition in words ("propane", "propane 0.6; n-butane 0.4"), or undefined when it cannot be
 * read: `readComposition` says why.
 */
export function cubicFluid(words: string): CubicFluid | undefined {
  const read = readComposition(words);
  return read.ok ? fluidOf(read.composition) : undefined;
}
