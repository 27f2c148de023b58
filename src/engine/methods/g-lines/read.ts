/* Reading a line on a sheet: its segments and their resistance in velocity heads. */
import { type MethodInput } from '../../catalog/types';
import { velocityHeads } from '../../lines';
import { type SheetBuilder } from '../../sheet';
import { input, optional } from '../common/describe';
import { readFriction } from './friction-steps';
import { nameAt, ofSegment, readEach, segmentCount, symbolAt } from './series';

/** Inputs that describe the segments, one number each, from the device to the end. */
export const SEGMENT_INPUTS: readonly MethodInput[] = [
  input('D', 'inside diameter', 'length', { rangeKey: 'bore', each: 'segment' }),
  optional('L', 'length', 'length', { rangeKey: 'outletLength', each: 'segment' }),
  optional('sum_K', 'sum of the loss coefficients of the fittings', 'dimensionless', { each: 'segment' }),
  optional('f_darcy', 'Darcy friction factor, where it is not worked', 'dimensionless', { each: 'segment' }),
  optional('roughness', 'absolute roughness, from which the friction factor is worked', 'length', {
    rangeKey: 'roughness',
    each: 'segment',
  }),
  optional('mu', 'viscosity, with the roughness', 'viscosity', { each: 'segment' }),
];

/** The flow of each segment: given once for all, or one each where lines join. */
export const FLOW_INPUTS: readonly MethodInput[] = [
  input('W', 'mass flow, given once for the whole line or for each segment', 'mass-flow', {
    each: 'segment',
  }),
  optional(
    'flow_basis',
    'what the flow is: the rated capacity of the device, or the required relief load',
    undefined,
    { words: ['rated', 'required'] },
  ),
];

/** The segments of a line as they stand on the sheet, in SI. */
export type ReadSegments = {
  count: number;
  D: number[];
  L: number[];
  W: number[];
  f: number[];
  N: number[];
  Re: number[];
};

/** Reads bores, flows, lengths and fittings, works friction where it was not given, and shows the velocity heads as steps. */
export function readSegments(sheet: SheetBuilder): ReadSegments {
  const count = segmentCount(sheet);
  const D = readEach(sheet, 'D', count, { unit: 'm', bounds: { above: 0 }, tex: 'D' });
  const W = readEach(sheet, 'W', count, { unit: 'kg/s', bounds: { above: 0 }, tex: 'W' });
  const L = readEach(sheet, 'L', count, { unit: 'm', bounds: { min: 0, fallback: 0 }, tex: 'L' });
  const K = readEach(sheet, 'sum_K', count, { unit: '-', bounds: { min: 0, fallback: 0 }, tex: '\\Sigma K' });
  const { f, Re } = readFriction(sheet, count, W, D);
  const N = D.map((bore, i) =>
    sheet.step(
      {
        key: `N ${i}`,
        tex: symbolAt('N', i, count),
        meaning: `resistance in velocity heads${ofSegment(i, count)}`,
        value: velocityHeads(f[i] ?? 0, L[i] ?? 0, bore, K[i] ?? 0),
        unit: '-',
      },
      (v) =>
        `\\frac{${v(nameAt('f_darcy', i))} \\cdot ${v(nameAt('L', i))}}{${v(nameAt('D', i))}} + ${v(nameAt('sum_K', i))}`,
    ),
  );
  return { count, D, L, W, f, N, Re };
}

/** The mass flux of a segment as a step. */
export function fluxStep(sheet: SheetBuilder, i: number, count: number, G: number): void {
  sheet.step(
    {
      key: `G ${i}`,
      tex: symbolAt('G', i, count),
      meaning: `mass flux${ofSegment(i, count)}`,
      value: G,
      unit: 'kg/(m2.s)',
    },
    (v) => `\\frac{4 \\, ${v(nameAt('W', i))}}{\\pi \\, ${v(nameAt('D', i))}^2}`,
  );
}
