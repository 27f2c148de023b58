/* What the two-phase methods share: inlet and back pressure, factors, and the area from load and mass flux. */
import { type MethodInput, type MethodOutput } from '../../catalog/types';
import { type SheetBuilder, texNumber } from '../../sheet';
import { optional, output, RELIEVING_INPUTS } from '../common/describe';
import { letterStep } from '../common/letter-step';
import { absolutePressure, barometer, relievingAbsolute, shownPressure } from '../common/pressures';
import { SYSTEM_UNITS, type System } from '../common/system';

/** The clause that the sheets of the omega method name. */
export const OMEGA_CLAUSE = 'API 520-1 Annex C (Annex D of the 7th edition), two-phase relief';

/** Units of a system beyond those of the single-phase equations, and factors to coherent ones. */
export const FLUX_UNITS = {
  SI: { G: 'kg/(m2.s)', v: 'm3/kg', rho: 'kg/m3', P: 1000, area: 1e6 / 3600, volume: 60 / 1000 },
  // 144 in² a square foot times the standard acceleration of gravity in lb·ft/(lbf·s²): √ of it is the printed 68.09.
  US: {
    G: 'lb/(ft2.s)',
    v: 'ft3/lb',
    rho: 'lb/ft3',
    P: 144 * 32.17404855643044,
    area: 144 / 3600,
    volume: 60 / 7.480519480519481,
  },
} as const;

/** Inputs that fix inlet and back pressure. */
export const PRESSURE_INPUTS: readonly MethodInput[] = [
  optional('P0', 'relieving pressure at the inlet', 'pressure-absolute'),
  ...RELIEVING_INPUTS,
  optional(
    'back_pressure',
    'total back pressure (the barometric pressure when not given)',
    'pressure-absolute',
  ),
];

/** The factors of the area. */
export const FACTOR_INPUTS: readonly MethodInput[] = [
  optional(
    'Kd',
    'effective coefficient of discharge (0.85 when not given; 0.65 for a subcooled liquid)',
    'dimensionless',
  ),
  optional('Kb', 'back-pressure factor of a balanced valve (1 when not given)', 'dimensionless', {
    rangeKey: 'kb',
  }),
  optional('Kc', 'combination factor with a rupture disk (1 when not given)', 'dimensionless', {
    rangeKey: 'kc',
  }),
  optional('Kv', 'viscosity factor (1 when not given)', 'dimensionless'),
];

/** What every two-phase sizing gives. */
export const AREA_OUTPUTS: readonly MethodOutput[] = [
  output('A_required', 'required effective area', 'area'),
  output('orifice_letter', 'smallest sufficient letter'),
  output('orifice_effective_area', 'its effective area', 'area'),
];

/** Inlet and back pressure in the system's absolute unit. */
export type Pressures = { P0: number; Pb: number };

/** Reads both pressures; refuses when nothing can flow. */
export function readPressures(sheet: SheetBuilder, system: System, back = 'back_pressure'): Pressures {
  const P0 = sheet.has('P0')
    ? absolutePressure(sheet, 'P0', 'P_0', system)
    : sheet.keep('P0', relievingAbsolute(sheet, system), 'P_1');
  const Pb = sheet.has(back)
    ? absolutePressure(sheet, back, 'P_a', system)
    : sheet.keep(back, barometer(sheet, system), 'p_{atm}');
  if (Pb >= P0) {
    const unit = SYSTEM_UNITS[system].P;
    const relation = Pb === P0 ? 'equals' : 'is below';
    sheet.refuse(
      'NO_FLOW',
      back,
      `Relieving pressure ${shownPressure(sheet, 'P0', P0, unit)} ${relation} the back pressure ${shownPressure(sheet, back, Pb, unit)}: nothing can flow.`,
    );
  }
  return { P0, Pb };
}

/** A back pressure in Pa against an inlet that is known in Pa; refuses when nothing can flow. */
export function readBack(sheet: SheetBuilder, P0: number): number {
  const kPa = absolutePressure(sheet, 'back_pressure', 'P_a', 'SI');
  if (kPa * 1000 < P0) return kPa * 1000;
  return sheet.refuse(
    'NO_FLOW',
    'back_pressure',
    `The inlet of the table, ${texNumber(P0 / 1000)} kPa, is not above the back pressure ${texNumber(kPa)} kPa: nothing can flow.`,
  );
}

/** Says the regime, and how it follows from critical and back pressure. */
export function sayRegime(sheet: SheetBuilder, critical: boolean, back = 'P_a'): void {
  sheet.output('regime', critical ? 'critical' : 'subcritical');
  sheet.say({
    symbol: '\\text{regime}',
    meaning: 'flow regime at the nozzle',
    value: critical ? 'critical' : 'subcritical',
    tex: `${back} ${critical ? '\\le' : '>'} P_c`,
    clause: OMEGA_CLAUSE,
  });
}

/** The required area of a load W from the symbol `G`, with the factors read here, and the letter. */
export function areaSteps(
  sheet: SheetBuilder,
  system: System,
  load: { W: number; G: number; Kd: number },
): void {
  const { W, G } = load;
  const factor = (name: string, tex: string, fallback: number) =>
    sheet.number(name, '-', { above: 0, max: 1, fallback }, tex);
  const Kd = factor('Kd', 'K_d', load.Kd);
  const Kb = factor('Kb', 'K_b', 1);
  const Kc = factor('Kc', 'K_c', 1);
  const Kv = factor('Kv', 'K_v', 1);
  const constant = FLUX_UNITS[system].area;
  const area = sheet.step(
    {
      key: 'A',
      meaning: 'required effective area',
      value: (constant * W) / (Kd * Kb * Kc * Kv * G),
      unit: SYSTEM_UNITS[system].A,
      clause: OMEGA_CLAUSE,
    },
    (v) =>
      `\\frac{${texNumber(constant)} \\cdot ${v('W')}}{${v('Kd')} \\cdot ${v('Kb')} \\cdot ${v('Kc')} \\cdot ${v('Kv')} \\cdot ${v('G')}}`,
  );
  sheet.output('A_required', area, SYSTEM_UNITS[system].A);
  letterStep(sheet, area, system);
}
