/* Conversion of quantities: within a dimension always, between gauge and absolute only with a barometer. */
import { type Dimension, type Q, type QuantityContext, QuantityError } from './types';
import { UNITS, type Unit } from './units';

/** The unit's row of the table; throws QuantityError when the key does not exist. */
function unitOf(key: string): Unit {
  const unit = Object.hasOwn(UNITS, key) ? UNITS[key] : undefined;
  if (unit === undefined) throw new QuantityError(`There is no unit "${key}".`);
  return unit;
}

/** The dimension a unit key measures, or undefined when the key is unknown. */
export function dimensionOf(unit: string): Dimension | undefined {
  return Object.hasOwn(UNITS, unit) ? UNITS[unit]?.dimension : undefined;
}

/** The label a reader sees for a unit key (`bar_g` → `barg`); an unknown key is shown as it is. */
export function unitLabel(unit: string): string {
  return Object.hasOwn(UNITS, unit) ? (UNITS[unit]?.label ?? unit) : unit;
}

/** The value in coherent SI base units; gauge stays pascal gauge. `context` is not needed for this. */
export function toSI(q: Q): number {
  const unit = unitOf(q.unit);
  return q.value * unit.factor + (unit.offset ?? 0);
}

/** An SI value expressed in a unit; the inverse of `toSI`. */
export function fromSI(value: number, unit: string): Q {
  const row = unitOf(unit);
  return { value: (value - (row.offset ?? 0)) / row.factor, unit };
}

function barometerPa(context: QuantityContext | undefined, from: string, to: string): number {
  if (!context) throw new QuantityError(`From ${from} to ${to} needs the barometric pressure.`);
  if (dimensionOf(context.barometer.unit) !== 'pressure-absolute')
    throw new QuantityError('The barometric pressure must be an absolute pressure.');
  return toSI(context.barometer);
}

/**
 * The number of `q` in the unit `to`. Gauge ↔ absolute needs `context.barometer`.
 * Throws QuantityError when the dimensions differ: a pressure difference never becomes a reading by conversion.
 */
export function convert(q: Q, to: string, context?: QuantityContext): number {
  if (q.unit === to) return q.value;
  const source = unitOf(q.unit);
  const target = unitOf(to);
  const si = q.value * source.factor + (source.offset ?? 0);
  const back = (value: number) => (value - (target.offset ?? 0)) / target.factor;
  if (source.dimension === target.dimension) return back(si);
  if (source.dimension === 'pressure-gauge' && target.dimension === 'pressure-absolute')
    return back(si + barometerPa(context, q.unit, to));
  if (source.dimension === 'pressure-absolute' && target.dimension === 'pressure-gauge')
    return back(si - barometerPa(context, q.unit, to));
  throw new QuantityError(`${q.unit} (${source.dimension}) is not ${to} (${target.dimension}).`);
}

/** Half of the last digit that was printed, or 0 when the text is not known. */
function halfDigit(q: Q): number {
  const digits = q.text?.match(/\d[.,](\d+)/)?.[1];
  return digits === undefined ? 0 : 0.5 * 10 ** -digits.length;
}

/**
 * Whether two quantities say the same: within 0.1 %, or within half of the last printed digit of either
 * (12 barg and 174.05 psig are the same). Temperatures: within 0.05 K.
 */
export function sameValue(a: Q, b: Q, context?: QuantityContext): boolean {
  const pressures = ['pressure-gauge', 'pressure-absolute'];
  const [da, db] = [dimensionOf(a.unit), dimensionOf(b.unit)];
  if (da === undefined || db === undefined) return a.unit === b.unit && a.value === b.value;
  const bridge = context !== undefined && pressures.includes(da) && pressures.includes(db);
  if (da !== db && !bridge) return false;
  const other = convert(b, a.unit, context);
  if (da === 'temperature') return Math.abs(toSI(a) - toSI(fromSI(toSI(b), a.unit))) <= 0.05;
  const digitB = halfDigit(b) * Math.abs(unitOf(b.unit).factor / unitOf(a.unit).factor);
  const band = Math.max(0.001 * Math.max(Math.abs(a.value), Math.abs(other)), halfDigit(a), digitB);
  return Math.abs(a.value - other) <= band * (1 + 1e-9);
}

const DISPLAY: Partial<Record<Dimension, [string, string]>> = {
  'pressure-gauge': ['bar_g', 'psig'],
  'pressure-absolute': ['bar_abs', 'psia'],
  'pressure-difference': ['bar', 'psi'],
  temperature: ['degC', 'degF'],
  'temperature-difference': ['dK', 'dF'],
  'mass-flow': ['kg/h', 'lb/h'],
  'volume-flow': ['m3/h', 'US gpm'],
  'normal-volume-flow': ['Nm3/h', 'Nm3/h'],
  area: ['mm2', 'in2'],
  length: ['m', 'ft'],
  volume: ['m3', 'ft3'],
  mass: ['kg', 'lb'],
  time: ['s', 's'],
  velocity: ['m/s', 'ft/s'],
  force: ['N', 'lbf'],
  amount: ['kmol', 'lbmol'],
  'molar-flow': ['kmol/h', 'lbmol/h'],
  'specific-power': ['W/kg', 'Btu/(h.lb)'],
  'molar-mass': ['kg/kmol', 'lb/lbmol'],
  density: ['kg/m3', 'lb/ft3'],
  'specific-volume': ['m3/kg', 'ft3/lb'],
  viscosity: ['mPa.s', 'cP'],
  'saybolt-viscosity': ['SUS', 'SUS'],
  'specific-energy': ['kJ/kg', 'Btu/lb'],
  'molar-energy': ['kJ/kmol', 'Btu/lbmol'],
  power: ['kW', 'Btu/h'],
  'heat-flux': ['kW/m2', 'Btu/(h.ft2)'],
  'heat-conductance': ['kW/K', 'Btu/(h.degF)'],
  'heat-conductivity': ['W/(m.K)', 'Btu/(h.ft.degF)'],
  'heat-transfer-coefficient': ['W/(m2.K)', 'Btu/(h.ft2.degF)'],
  'fouling-resistance': ['m2.K/W', 'h.ft2.degF/Btu'],
  'temperature-rate': ['K/min', 'degF/min'],
  'pressure-rate': ['bar/min', 'psi/min'],
  'pressure-per-temperature': ['bar/K', 'psi/degF'],
  'heat-capacity': ['kJ/(kg.K)', 'Btu/(lb.degF)'],
  'cubic-expansion': ['1/K', '1/degF'],
  compressibility: ['1/GPa', '1/GPa'],
  'mass-flux': ['kg/(m2.s)', 'lb/(ft2.s)'],
  'flow-coefficient': ['Kv', 'Cv'],
  'gas-constant-c': ['sqrt(kg*kmol*K)/(mm2*h*kPa)', 'sqrt(lb*lbmol*degR)/(lbf*h)'],
  'pump-curve': ['kPa/(m3/h)^2', 'kPa/(m3/h)^2'],
  'sound-level': ['dB', 'dB'],
  angle: ['deg', 'deg'],
  rotation: ['rpm', 'rpm'],
};

/** The unit in which a dimension is shown in a unit system. */
export function displayUnit(dimension: Dimension, system: 'SI' | 'US'): string {
  return DISPLAY[dimension]?.[system === 'SI' ? 0 : 1] ?? '-';
}
