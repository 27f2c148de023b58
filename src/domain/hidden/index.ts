/* The public face of the hidden view: for whom it holds, and what is left of each kind of thing. */
export * from './hidden';
export * from './prose';
export * from './document';
export * from './views';
