/* The public face of the case: its records, who may do what, its gates, the unseen check and what a signature binds. */
export * from './types';
export * from './brief';
export * from './words';
export * from './permissions';
