/* A fluid of the library by its composition, as a source of properties. */
import { type PropertySource } from '../properties/types';
import { type Composition, readComposition } from './composition';
import { mixtureOf } from './cubic/mixture';
import { pureFluid } from './pure-fluid';

/** How the equation is named on a sheet. */
export const EQUATION =
  'Peng–Robinson equation (1976) with the Twu alpha function and a constant translation of volume (Pina-Martinez et al. 2018)';

/** The properties of a composition that was read; a substance with other than one component is a mixture. */
export function fluidOf({ substances, z }: Composition): PropertySource | undefined {
  const [only] = substances;
  if (only === undefined || substances.length !== 1) return undefined;
  return pureFluid(mixtureOf(substances, z), only.name, EQUATION);
}

/**
 * The properties of a composition in words ("propane", "propane 0.6; n-butane 0.4"), or undefined when it cannot be
 * read: `readComposition` says why.
 */
export function cubicFluid(words: string): PropertySource | undefined {
  const read = readComposition(words);
  return read.ok ? fluidOf(read.composition) : undefined;
}
