/* The public face of site rules. */
export * from './parameter-row';
export * from './range-row';
export * from './ranges';
export * from './site-rules';
