/* The public face of the relief basis. */
export * from './axes';
export * from './basis';
export * from './equipment';
export * from './canonical';
export * from './external-sheets';
export * from './field-conditions';
export * from './fields';
export * from './figures';
export * from './fluids';
export * from './groups';
export * from './lines';
export * from './papers';
export * from './registers';
export * from './relief-points';
export * from './scenarios';
export * from './sources';
export { richSchema, type Rich } from '@domain/text/schema';
