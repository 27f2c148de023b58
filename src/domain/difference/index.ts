/* The public face of differences. */
export { difference, type Change } from './difference';
export * from './merge';
export * from './moved-results';
export { sameLeaf, type CompareContext } from './same';
export * from './words';
