/* What all outlet methods share: their inputs, outputs and the last steps from the inlet of the first segment to the back pressure. */
import { type MethodInput, type MethodOutput } from '../../catalog/types';
import { type SheetBuilder } from '../../sheet';
import { input, optional, output } from '../common/describe';
import { absoluteIn } from '../common/pressures';
import { fractionOfSet, pressureOutput } from './pressures';
import { FLOW_INPUTS, SEGMENT_INPUTS } from './read';

/** Inputs of an outlet line, whatever flows in it. */
export const OUTLET_INPUTS: readonly MethodInput[] = [
  ...FLOW_INPUTS,
  ...SEGMENT_INPUTS,
  input('P_exit_ambient', 'pressure beyond the end of the line', 'pressure-absolute'),
  optional(
    'P_superimposed',
    'pressure at the outlet of the device before it opens (that beyond the end when not given)',
    'pressure-absolute',
  ),
  optional('set_pressure', 'set pressure of the device', 'pressure-gauge', { rangeKey: 'setPressure' }),
  optional('atmospheric_pressure', 'barometric pressure', 'pressure-absolute', { rangeKey: 'barometer' }),
];

/** Outputs of one segment; a line of more segments gives them for each, counted from the device. */
export function segmentOutputs(extra: (segment: string) => MethodOutput[]): MethodOutput[] {
  return ['segment1', 'segment2'].flatMap((s) => {
    const which = s === 'segment1' ? 'the first segment' : 'the second segment (further ones likewise)';
    return [
      output(`${s}_outlet_pressure`, `pressure at the end of ${which}`, 'pressure-absolute'),
      output(`${s}_inlet_pressure`, `pressure at the beginning of ${which}`, 'pressure-absolute'),
      output(`${s}_choked_at_outlet`, `whether flow is at its limit at the end of ${which}`),
      ...extra(s),
    ];
  });
}

/** Outputs of the line as a whole. */
export const OUTLET_OUTPUTS: readonly MethodOutput[] = [
  output('total_back_pressure', 'back pressure at the outlet of the device', 'pressure-absolute'),
  output('built_up_back_pressure', 'back pressure built up by the flow', 'pressure-difference'),
  output('built_up_fraction_of_set', 'the same as a fraction of the set pressure', 'dimensionless'),
  output('highest_mach', 'highest Mach number at the end of a segment', 'dimensionless'),
  output('chokes', 'whether flow chokes anywhere in the line'),
];

/** The pressures and the limit of one worked segment as outputs; kPa. */
export function segmentPressures(
  sheet: SheetBuilder,
  i: number,
  found: { inlet: number; outlet: number; choked: boolean },
): void {
  const name = `segment${i + 1}`;
  pressureOutput(sheet, `${name}_outlet_pressure`, found.outlet, 'absolute');
  pressureOutput(sheet, `${name}_inlet_pressure`, found.inlet, 'absolute');
  sheet.output(`${name}_choked_at_outlet`, found.choked);
}

/** What a worked line comes to; pressures kPa, Mach by the adiabatic speed of sound. */
export type LineEnd = { inlet: number; end: number; mach: number; chokes: boolean };

/** The back pressure at the device, what of it the flow built up, and the highest Mach number. */
export function backPressureSteps(sheet: SheetBuilder, { inlet, end, mach, chokes }: LineEnd): void {
  sheet.keep('p device', inlet, 'p_{in,1}');
  const given = sheet.has('P_superimposed');
  const before = given ? absoluteIn(sheet, 'P_superimposed', 'p_{si}', 'kPa_abs') : end;
  const built = sheet.step(
    {
      key: 'built-up',
      tex: '\\Delta p_{bu}',
      meaning: 'built-up back pressure',
      value: inlet - before,
      unit: 'kPa',
    },
    (v) => `${v('p device')} - ${v(given ? 'P_superimposed' : 'P_exit_ambient')}`,
  );
  pressureOutput(sheet, 'total_back_pressure', inlet, 'absolute');
  pressureOutput(sheet, 'built_up_back_pressure', built, 'difference');
  fractionOfSet(sheet, 'built-up', {
    output: 'built_up_fraction_of_set',
    tex: '\\Delta p_{bu}/p_{set}',
    meaning: 'built-up back pressure as a fraction of set',
    value: built,
  });
  sheet.output('highest_mach', mach);
  sheet.output('chokes', chokes);
  if (mach > 0.7 && !chokes)
    sheet.warn(
      'MACH_HIGH',
      `The highest Mach number is ${mach.toFixed(2)}; above 0.7 small errors of flow or bore move the back pressure much.`,
    );
}
