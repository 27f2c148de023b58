/* The public face of the fluids: the library, compositions in words, and the cubic equation as a source of properties. */
export { type Composition, type CompositionRead, readComposition } from './composition';
export { cubicFluid, EQUATION, fluidOf } from './fluid';
export { findSubstance, similarNames, SUBSTANCES } from './library';
export { FLUID_SOURCES, type SourceKey } from './substances/sources';
export { type Substance } from './substances/types';
