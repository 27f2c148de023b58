/* Short ways to describe the inputs and outputs of a method, so that methods describe the same thing the same way. */
import { type MethodInput, type MethodOutput } from '../../catalog/types';
import { type Dimension } from '../../quantity';

type Extra = { rangeKey?: string; required?: boolean; words?: string[]; each?: string };

/** Describes one input; required unless said otherwise. */
export function input(name: string, meaning: string, dimension?: Dimension, extra: Extra = {}): MethodInput {
  const { required = true, ...rest } = extra;
  return { name, meaning, required, ...rest, ...(dimension === undefined ? {} : { dimension }) };
}

/** Describes one input that may be left out. */
export function optional(
  name: string,
  meaning: string,
  dimension?: Dimension,
  extra: Extra = {},
): MethodInput {
  return input(name, meaning, dimension, { ...extra, required: false });
}

/** Describes one output. */
export function output(name: string, meaning: string, dimension?: Dimension): MethodOutput {
  return dimension === undefined ? { name, meaning } : { name, meaning, dimension };
}

/** Inputs that fix the relieving pressure: P1 itself, or set pressure, overpressure and barometer. */
export const RELIEVING_INPUTS: readonly MethodInput[] = [
  optional('P1', 'relieving pressure', 'pressure-absolute'),
  optional('set_pressure', 'set pressure', 'pressure-gauge', { rangeKey: 'setPressure' }),
  optional('overpressure', 'overpressure as a fraction of the gauge set pressure', 'dimensionless', {
    rangeKey: 'overpressure',
  }),
  optional('atmospheric_pressure', 'barometric pressure', 'pressure-absolute', { rangeKey: 'barometer' }),
];

/** The state of a gas at relief. */
export const GAS_INPUTS: readonly MethodInput[] = [
  input('T', 'relieving temperature', 'temperature', { rangeKey: 'relievingTemperature' }),
  input('Z', 'compressibility factor', 'dimensionless', { rangeKey: 'z' }),
  input('M', 'molar mass', 'molar-mass', { rangeKey: 'molarMass' }),
  input('k', 'ideal-gas ratio of specific heats', 'dimensionless', { rangeKey: 'kIdeal' }),
];
