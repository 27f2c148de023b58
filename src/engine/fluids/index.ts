/* The public face of the fluids: the library, compositions in words, and the cubic equation as a source of properties. */
export { type Composition, type CompositionRead, MAX_COMPONENTS, readComposition } from './composition';
export { type Boundary, type CubicFluid, type Equilibrium, type TwoPhases } from './cubic-fluid';
export { CRITICAL_VOLUME } from './cubic/constants';
export { binaryParameter } from './cubic/mixture';
export { type Figures, figuresOf } from './explain';
export { cubicFluid, EQUATION, fluidOf } from './fluid';
export { findSubstance, similarNames, SUBSTANCES } from './library';
export { rackettDensity } from './rackett';
export { BINARY_SOURCE, FLUID_SOURCES, type SourceKey } from './substances/sources';
export { type Substance } from './substances/types';
