/* The public face of site rules. */
export * from './parameter-row';
export * from '@engine/ranges';
export * from './site-rules';
