/* The public face of ranges of inputs. */
export { checkRange, RANGES, unitsOfKey, type RangeCheck, type RangeContext } from './check';
export { standing } from './standing';
export { row, type Range, type RangeRow } from './row';
