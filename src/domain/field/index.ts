/* The public face of the field sheet. */
export * from './types';
export * from './compare';
export * from './lines';
export * from './discrepancy';
