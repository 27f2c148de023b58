/* The table of units: dimension, factor to coherent SI, label. Exact factors follow NIST SP 811 (2008), Appendix B. */
import { type Dimension } from './types';

/** One unit: SI value = number × factor + offset. */
export type Unit = { dimension: Dimension; factor: number; offset?: number; label: string };

const FOOT = 0.3048;
const INCH = 0.0254;
const POUND = 0.45359237;
const POUND_FORCE = 4.4482216152605;
const PSI = POUND_FORCE / INCH ** 2;
const US_GALLON = 0.003785411784;
const BTU = 1055.05585262;
const BTU_PER_POUND = 2326;
const RANKINE = 5 / 9;
const INCH_WATER = 249.08891;
const HOUR = 3600;
const YEAR = 365.25 * 86400;
/** Normal cubic metres (0 °C, 101.325 kPa) in a cubic foot at 60 °F and the same pressure, as 29 CFR 1910.106 takes free air. */
const STANDARD_FOOT = (FOOT ** 3 * 273.15) / (519.67 * RANKINE);

/** Square metres in which the US form of the gas constant C, per square inch and psi, is turned into SI base units. */
const C_SI = Math.sqrt(1) / (1e-6 * HOUR * 1000);
const C_US = (POUND * Math.sqrt(RANKINE)) / (HOUR * POUND_FORCE);

const u = (dimension: Dimension, factor: number, label: string, offset?: number): Unit =>
  offset === undefined ? { dimension, factor, label } : { dimension, factor, label, offset };

const PRESSURES: [string, number, string][] = [
  ['Pa', 1, 'Pa'],
  ['kPa', 1e3, 'kPa'],
  ['MPa', 1e6, 'MPa'],
  ['mbar', 100, 'mbar'],
  ['bar', 1e5, 'bar'],
  ['inH2O', INCH_WATER, 'inH₂O'],
];

/** Every pressure unit in its three meanings: `bar` (difference), `bar_g`, `bar_abs`; psi has its own customary names. */
function pressureUnits(): Record<string, Unit> {
  const table: Record<string, Unit> = {
    psi: u('pressure-difference', PSI, 'psi'),
    psig: u('pressure-gauge', PSI, 'psig'),
    psia: u('pressure-absolute', PSI, 'psia'),
    atm: u('pressure-absolute', 101325, 'atm'),
  };
  for (const [key, factor, label] of PRESSURES) {
    table[key] = u('pressure-difference', factor, label);
    table[`${key}_g`] = u('pressure-gauge', factor, `${label}g`);
    table[`${key}_abs`] = u('pressure-absolute', factor, `${label}a`);
  }
  return table;
}

/** The units the engine knows, by key. */
export const UNITS: Readonly<Record<string, Unit>> = {
  ...pressureUnits(),
  K: u('temperature', 1, 'K'),
  degC: u('temperature', 1, '°C', 273.15),
  degF: u('temperature', RANKINE, '°F', 459.67 * RANKINE),
  degR: u('temperature', RANKINE, '°R'),
  dK: u('temperature-difference', 1, 'K'),
  dF: u('temperature-difference', RANKINE, '°F'),
  'kg/s': u('mass-flow', 1, 'kg/s'),
  'kg/h': u('mass-flow', 1 / HOUR, 'kg/h'),
  't/h': u('mass-flow', 1000 / HOUR, 't/h'),
  'lb/h': u('mass-flow', POUND / HOUR, 'lb/h'),
  'm3/s': u('volume-flow', 1, 'm³/s'),
  'm3/h': u('volume-flow', 1 / HOUR, 'm³/h'),
  'L/min': u('volume-flow', 1e-3 / 60, 'L/min'),
  'US gpm': u('volume-flow', US_GALLON / 60, 'US gpm'),
  'ft3/min': u('volume-flow', FOOT ** 3 / 60, 'ft³/min'),
  'Nm3/h': u('normal-volume-flow', 1 / HOUR, 'Nm³/h'),
  SCFH: u('normal-volume-flow', STANDARD_FOOT / HOUR, 'SCFH'),
  SCFM: u('normal-volume-flow', STANDARD_FOOT / 60, 'SCFM'),
  mm2: u('area', 1e-6, 'mm²'),
  cm2: u('area', 1e-4, 'cm²'),
  m2: u('area', 1, 'm²'),
  in2: u('area', INCH ** 2, 'in²'),
  ft2: u('area', FOOT ** 2, 'ft²'),
  mm: u('length', 1e-3, 'mm'),
  cm: u('length', 1e-2, 'cm'),
  m: u('length', 1, 'm'),
  km: u('length', 1e3, 'km'),
  in: u('length', INCH, 'in'),
  ft: u('length', FOOT, 'ft'),
  L: u('volume', 1e-3, 'L'),
  m3: u('volume', 1, 'm³'),
  ft3: u('volume', FOOT ** 3, 'ft³'),
  'US gal': u('volume', US_GALLON, 'US gal'),
  kg: u('mass', 1, 'kg'),
  t: u('mass', 1e3, 't'),
  lb: u('mass', POUND, 'lb'),
  ms: u('time', 1e-3, 'ms'),
  s: u('time', 1, 's'),
  min: u('time', 60, 'min'),
  h: u('time', HOUR, 'h'),
  d: u('time', 86400, 'd'),
  weeks: u('time', 7 * 86400, 'weeks'),
  months: u('time', YEAR / 12, 'months'),
  years: u('time', YEAR, 'years'),
  'm/s': u('velocity', 1, 'm/s'),
  'ft/s': u('velocity', FOOT, 'ft/s'),
  N: u('force', 1, 'N'),
  kN: u('force', 1e3, 'kN'),
  lbf: u('force', POUND_FORCE, 'lbf'),
  'kg/kmol': u('molar-mass', 1, 'kg/kmol'),
  'g/mol': u('molar-mass', 1, 'g/mol'),
  'lb/lbmol': u('molar-mass', 1, 'lb/lbmol'),
  kmol: u('amount', 1e3, 'kmol'),
  lbmol: u('amount', 1e3 * POUND, 'lbmol'),
  'kmol/h': u('molar-flow', 1e3 / HOUR, 'kmol/h'),
  'lbmol/h': u('molar-flow', (1e3 * POUND) / HOUR, 'lbmol/h'),
  'W/kg': u('specific-power', 1, 'W/kg'),
  'Btu/(h.lb)': u('specific-power', BTU_PER_POUND / HOUR, 'Btu/(h·lb)'),
  'kg/m3': u('density', 1, 'kg/m³'),
  'lb/ft3': u('density', POUND / FOOT ** 3, 'lb/ft³'),
  'm3/kg': u('specific-volume', 1, 'm³/kg'),
  'ft3/lb': u('specific-volume', FOOT ** 3 / POUND, 'ft³/lb'),
  'Pa.s': u('viscosity', 1, 'Pa·s'),
  'mPa.s': u('viscosity', 1e-3, 'mPa·s'),
  cP: u('viscosity', 1e-3, 'cP'),
  SUS: u('saybolt-viscosity', 1, 'SUS'),
  'J/kg': u('specific-energy', 1, 'J/kg'),
  'kJ/kg': u('specific-energy', 1e3, 'kJ/kg'),
  'Btu/lb': u('specific-energy', BTU_PER_POUND, 'Btu/lb'),
  'kJ/kmol': u('molar-energy', 1e3, 'kJ/kmol'),
  'Btu/lbmol': u('molar-energy', BTU_PER_POUND, 'Btu/lbmol'),
  W: u('power', 1, 'W'),
  kW: u('power', 1e3, 'kW'),
  MW: u('power', 1e6, 'MW'),
  'Btu/h': u('power', BTU / HOUR, 'Btu/h'),
  'MMBtu/h': u('power', (1e6 * BTU) / HOUR, 'MMBtu/h'),
  'W/m2': u('heat-flux', 1, 'W/m²'),
  'kW/m2': u('heat-flux', 1e3, 'kW/m²'),
  'Btu/(h.ft2)': u('heat-flux', BTU / HOUR / FOOT ** 2, 'Btu/(h·ft²)'),
  'W/K': u('heat-conductance', 1, 'W/K'),
  'kW/K': u('heat-conductance', 1e3, 'kW/K'),
  'Btu/(h.degF)': u('heat-conductance', BTU / HOUR / RANKINE, 'Btu/(h·°F)'),
  'W/(m.K)': u('heat-conductivity', 1, 'W/(m·K)'),
  'Btu/(h.ft.degF)': u('heat-conductivity', BTU / HOUR / FOOT / RANKINE, 'Btu/(h·ft·°F)'),
  'W/(m2.K)': u('heat-transfer-coefficient', 1, 'W/(m²·K)'),
  'Btu/(h.ft2.degF)': u('heat-transfer-coefficient', BTU / HOUR / FOOT ** 2 / RANKINE, 'Btu/(h·ft²·°F)'),
  'm2.K/W': u('fouling-resistance', 1, 'm²·K/W'),
  'h.ft2.degF/Btu': u('fouling-resistance', (HOUR * FOOT ** 2 * RANKINE) / BTU, 'h·ft²·°F/Btu'),
  'K/s': u('temperature-rate', 1, 'K/s'),
  'K/min': u('temperature-rate', 1 / 60, 'K/min'),
  'degF/min': u('temperature-rate', RANKINE / 60, '°F/min'),
  'kPa/s': u('pressure-rate', 1e3, 'kPa/s'),
  'bar/min': u('pressure-rate', 1e5 / 60, 'bar/min'),
  'psi/min': u('pressure-rate', PSI / 60, 'psi/min'),
  'kPa/K': u('pressure-per-temperature', 1e3, 'kPa/K'),
  'bar/K': u('pressure-per-temperature', 1e5, 'bar/K'),
  'psi/degF': u('pressure-per-temperature', PSI / RANKINE, 'psi/°F'),
  'J/(kg.K)': u('heat-capacity', 1, 'J/(kg·K)'),
  'kJ/(kg.K)': u('heat-capacity', 1e3, 'kJ/(kg·K)'),
  'Btu/(lb.degF)': u('heat-capacity', BTU_PER_POUND / RANKINE, 'Btu/(lb·°F)'),
  '1/K': u('cubic-expansion', 1, '1/K'),
  '1/degC': u('cubic-expansion', 1, '1/°C'),
  '1/degF': u('cubic-expansion', 1 / RANKINE, '1/°F'),
  '1/Pa': u('compressibility', 1, '1/Pa'),
  '1/GPa': u('compressibility', 1e-9, '1/GPa'),
  'kg/(m2.s)': u('mass-flux', 1, 'kg/(m²·s)'),
  'lb/(ft2.s)': u('mass-flux', POUND / FOOT ** 2, 'lb/(ft²·s)'),
  Kv: u('flow-coefficient', 1, 'Kv'),
  Cv: u('flow-coefficient', 0.865, 'Cv'),
  'sqrt(kg*kmol*K)/(mm2*h*kPa)': u('gas-constant-c', C_SI, '√(kg·kmol·K)/(mm²·h·kPa)'),
  'sqrt(lb*lbmol*degR)/(lbf*h)': u('gas-constant-c', C_US, '√(lb·lbmol·°R)/(lbf·h)'),
  'kPa/(m3/h)^2': u('pump-curve', 1e3 * HOUR ** 2, 'kPa/(m³/h)²'),
  dB: u('sound-level', 1, 'dB'),
  deg: u('angle', Math.PI / 180, '°'),
  rpm: u('rotation', 1 / 60, 'rpm'),
  Hz: u('rotation', 1, 'Hz'),
  '-': u('dimensionless', 1, ''),
  fraction: u('dimensionless', 1, ''),
  'fraction of gauge set pressure': u('dimensionless', 1, 'of set'),
  '%': u('dimensionless', 0.01, '%'),
  '% of set': u('dimensionless', 0.01, '% of set'),
};
