/* The public face of calculation sheets. */
export { type Inputs, type Refusal, type SheetWarning, type Step, type Worked } from './types';
export { SheetBuilder, type Bounds, type Show, type StepInfo, workSheet } from './builder';
export { texNumber } from './tex';
