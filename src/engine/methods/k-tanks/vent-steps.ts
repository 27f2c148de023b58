/* What the sheets of vents share: the pressures on both sides, the flux of air, and its temperature of reference. */
import { type MethodInput } from '../../catalog/types';
import { convert } from '../../quantity';
import { type SheetBuilder } from '../../sheet';
import { input, optional } from '../common/describe';
import { absolutePressure, barometer } from '../common/pressures';
import { SYSTEM_UNITS, type System } from '../common/system';
import { AIR_MOLAR_MASS } from './air';
import { ventFlux } from './vent';

const CLAUSE = 'isentropic nozzle of air; API 520-1 form of subcritical flow';

/** Directions of flow as words of the sheet. */
export const DIRECTIONS = ['out', 'in'] as const;

/** Inputs that every vent takes. */
export const VENT_INPUTS: readonly MethodInput[] = [
  input('Kd', 'coefficient of the vent', 'dimensionless'),
  optional('T_air', 'temperature of the air (0 °C, or 60 °F where the flow is in SCFH)', 'temperature', {
    rangeKey: 'relievingTemperature',
  }),
  optional('atmospheric_pressure', 'barometric pressure', 'pressure-absolute', { rangeKey: 'barometer' }),
];

/** Temperature of the air in K: as given, 60 °F for flows in standard cubic feet, else 0 °C. */
export function airTemperature(sheet: SheetBuilder): number {
  const flow = sheet.inputs['air_equivalent'];
  const customary = typeof flow === 'object' && flow.unit.startsWith('SCF');
  return sheet.number('T_air', 'K', { above: 0, fallback: customary ? 519.67 / 1.8 : 273.15 }, 'T_{air}');
}

/** Both pressures in Pa absolute, kept in the units of the system under P1 (inside) and P2 (outside). */
export function bothPressures(sheet: SheetBuilder, system: System): { inside: number; outside: number } {
  const unit = SYSTEM_UNITS[system].P;
  const inside = absolutePressure(sheet, 'P1', 'P_1', system);
  const outside = sheet.has('P2')
    ? absolutePressure(sheet, 'P2', 'P_2', system)
    : sheet.keep('P2', barometer(sheet, system), 'P_2');
  return {
    inside: convert({ value: inside, unit }, 'Pa_abs'),
    outside: convert({ value: outside, unit }, 'Pa_abs'),
  };
}

/** The step of the theoretical flux of air between two pressures in Pa absolute; gives `mass_flux` and `choked`. */
export function fluxStep(sheet: SheetBuilder, inside: number, outside: number, T: number): number {
  const { flux, choked } = ventFlux(inside, outside, T);
  sheet.keep('Ph', Math.max(inside, outside), 'P_h');
  sheet.keep('Pl', Math.min(inside, outside), 'P_l');
  sheet.keep('Mair', AIR_MOLAR_MASS, 'M_{air}');
  sheet.step(
    {
      key: 'G',
      meaning: `theoretical mass flux of air, ${choked ? 'choked' : 'not choked'}, from the higher to the lower pressure in Pa`,
      value: flux,
      unit: 'kg/(m2.s)',
      clause: CLAUSE,
    },
    (v) => {
      const root = `\\frac{${v('Mair')}}{8314.46 \\cdot ${v('T_air')}}`;
      const r = `\\left(\\frac{${v('Pl')}}{${v('Ph')}}\\right)`;
      return choked
        ? `${v('Ph')} \\sqrt{${root} \\cdot 1.4 \\left(\\frac{2}{2.4}\\right)^{6}}`
        : `${v('Ph')} \\sqrt{${root} \\cdot 7 \\left[${r}^{2/1.4} - ${r}^{2.4/1.4}\\right]}`;
    },
  );
  sheet.output('mass_flux', flux, 'kg/(m2.s)');
  sheet.output('choked', choked);
  return flux;
}
