/* The public face of headers. */
export * from './header';
