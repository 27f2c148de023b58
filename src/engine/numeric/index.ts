/* The public face of the numerical tools. */
export { findRoot, type Root, type RootOptions } from './root';
export { interpolate, interpolateTable, type Curve, type Table } from './interpolate';
export { integrate } from './integrate';
