/* Flow through a hole (broken tube, leaking check valve): bare arithmetic and the steps both sheets share. */
import { fromSI } from '../../quantity';
import { type SheetBuilder } from '../../sheet';
import { criticalRatio, GAS_CONSTANT, nozzleFlux } from '../a-gas/flow';
import { type MethodInput } from '../../catalog/types';
import { input, optional } from '../common/describe';
import { absolutePressure, shownPressure } from '../common/pressures';

/** Mass flux of a liquid that does not flash through a sharp opening, kg/(m²·s): √(2 ρ Δp), Pa and kg/m³. */
export function liquidFlux(rho: number, drop: number): number {
  return Math.sqrt(2 * rho * Math.max(0, drop));
}

/** The phases of the fluid that leaks. */
export const PHASES = ['liquid', 'gas'] as const;

/** The phases of a break: a liquid may also flash on its way out. */
export const BREAK_PHASES = ['liquid', 'gas', 'flashing'] as const;

/** Inputs that describe the fluid on the high-pressure side. */
export const HIGH_SIDE_INPUTS: readonly MethodInput[] = [
  optional('phase', 'phase of the fluid on the high-pressure side (liquid when not given)', undefined, {
    words: [...PHASES],
  }),
  input('P_high', 'pressure on the high side', 'pressure-absolute'),
  input('P_low', 'relieving pressure on the low side', 'pressure-absolute'),
  optional('atmospheric_pressure', 'barometric pressure', 'pressure-absolute', { rangeKey: 'barometer' }),
  optional('rho', 'liquid density', 'density', { rangeKey: 'liquidDensity' }),
  optional('T', 'gas temperature', 'temperature', { rangeKey: 'relievingTemperature' }),
  optional('Z', 'compressibility factor', 'dimensionless', { rangeKey: 'z' }),
  optional('M', 'molar mass', 'molar-mass', { rangeKey: 'molarMass' }),
  optional('k', 'ideal-gas ratio of specific heats', 'dimensionless', { rangeKey: 'kIdeal' }),
];

/** Both sides in kPa absolute; refuses when nothing can flow. */
export function readSides(sheet: SheetBuilder): { high: number; low: number } {
  const high = absolutePressure(sheet, 'P_high', 'P_{high}', 'SI');
  const low = absolutePressure(sheet, 'P_low', 'P_{low}', 'SI');
  if (low >= high)
    sheet.refuse(
      'NO_FLOW',
      'P_high',
      `The high side at ${shownPressure(sheet, 'P_high', high, 'kPa_abs')} is not above the relieving pressure ${shownPressure(sheet, 'P_low', low, 'kPa_abs')} of the low side: nothing flows over.`,
    );
  return { high, low };
}

function liquidSteps(sheet: SheetBuilder, high: number, low: number): number {
  const rho = sheet.number('rho', 'kg/m3', { above: 0 }, '\\rho');
  return sheet.step(
    {
      key: 'G',
      meaning: 'mass flux, liquid',
      value: liquidFlux(rho, (high - low) * 1000),
      unit: 'kg/(m2.s)',
    },
    (v) => `\\sqrt{2 \\cdot ${v('rho')} \\cdot 1000 \\cdot (${v('P_high')} - ${v('P_low')})}`,
  );
}

function gasSteps(sheet: SheetBuilder, high: number, low: number): number {
  const T = sheet.number('T', 'K', { above: 0 });
  const Z = sheet.number('Z', '-', { above: 0 });
  const M = sheet.number('M', 'kg/kmol', { above: 0 });
  const k = sheet.number('k', '-', { min: 1 });
  sheet.keep('R', GAS_CONSTANT);
  sheet.step(
    { key: 'rc', tex: 'r_c', meaning: 'critical pressure ratio', value: criticalRatio(k), unit: '-' },
    (v) => `\\left(\\frac{2}{${v('k')}+1}\\right)^{${v('k')}/(${v('k')}-1)}`,
  );
  const { flux, choked } = nozzleFlux({ P1: high * 1000, P2: low * 1000, T, Z, M, k });
  sheet.output('choked', choked);
  const front = (v: (key: string) => string) =>
    `1000 \\cdot ${v('P_high')} \\sqrt{\\frac{${v('M')}}{${v('Z')} \\cdot ${v('R')} \\cdot ${v('T')}}`;
  const r = (v: (key: string) => string) => `\\left(\\frac{${v('P_low')}}{${v('P_high')}}\\right)`;
  return sheet.step(
    {
      key: 'G',
      meaning: `mass flux, gas, ${choked ? 'choked' : 'not choked'}`,
      value: flux,
      unit: 'kg/(m2.s)',
    },
    (v) =>
      choked
        ? `${front(v)} \\, ${v('k')} \\left(\\frac{2}{${v('k')}+1}\\right)^{(${v('k')}+1)/(${v('k')}-1)}}`
        : `${front(v)} \\frac{2 \\cdot ${v('k')}}{${v('k')}-1} \\left[${r(v)}^{2/${v('k')}} - ${r(v)}^{(${v('k')}+1)/${v('k')}}\\right]}`,
  );
}

/** The mass flux of the fluid on the high side, kg/(m²·s), with its steps. */
export function fluxSteps(sheet: SheetBuilder, phase: (typeof PHASES)[number]): number {
  const { high, low } = readSides(sheet);
  return phase === 'liquid' ? liquidSteps(sheet, high, low) : gasSteps(sheet, high, low);
}

/** The unit of mass flow that fits the inputs: lb/h when density or molar mass is customary. */
export function loadUnit(sheet: SheetBuilder): string {
  const given = sheet.inputs['rho'] ?? sheet.inputs['M'];
  return typeof given === 'object' && given.unit.startsWith('lb') ? 'lb/h' : 'kg/h';
}

/** A mass flow in kg/h as an output in the unit that fits. */
export function loadOutput(sheet: SheetBuilder, name: string, kgPerHour: number): void {
  const unit = loadUnit(sheet);
  sheet.output(name, fromSI(kgPerHour / 3600, unit).value, unit);
}
