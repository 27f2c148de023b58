/* The public face of quantities. */
export { type Dimension, type Q, type QuantityContext, QuantityError } from './types';
export { convert, dimensionOf, displayUnit, fromSI, sameValue, toSI, unitLabel } from './convert';
export { formatNumber, formatQuantity } from './format';
export { readTyped, type Expected, type ReadResult } from './read';
export { UNITS, type Unit } from './units';
