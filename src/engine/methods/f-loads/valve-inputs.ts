/* What the control-valve sheets read alike: the coefficient with its kind, the fittings, the two pressures. */
import { type MethodInput } from '../../catalog/types';
import { type SheetBuilder } from '../../sheet';
import { input, optional } from '../common/describe';
import { absolutePressure, shownPressure } from '../common/pressures';
import { type CoefficientType, type Fittings } from './control-valve';

/** The kinds as words of the reference topics. */
export const COEFFICIENT_WORDS = ['Kv', 'Cv'] as const;

/** Inputs that every control-valve sheet describes. */
export const VALVE_INPUTS: readonly MethodInput[] = [
  optional('coefficient', 'flow coefficient of the open valve', 'flow-coefficient', {
    rangeKey: 'controlValveKv',
  }),
  optional('coefficient_type', 'kind of coefficient, when its unit does not say', undefined, {
    words: [...COEFFICIENT_WORDS],
  }),
  input('P1', 'pressure before the valve', 'pressure-absolute'),
  input('P2', 'pressure after the valve', 'pressure-absolute'),
  optional('atmospheric_pressure', 'barometric pressure', 'pressure-absolute', { rangeKey: 'barometer' }),
  optional('d', 'valve size', 'length'),
  optional('D1', 'bore of the pipe before the valve', 'length', { rangeKey: 'bore' }),
  optional('D2', 'bore of the pipe after the valve', 'length', { rangeKey: 'bore' }),
];

/** The kind of coefficient: by its unit, else by the word. */
export function readType(sheet: SheetBuilder): CoefficientType {
  const given = sheet.inputs['coefficient'];
  const unit = typeof given === 'object' ? given.unit : '-';
  if (unit === 'Kv' || unit === 'Cv') return unit;
  return sheet.word<CoefficientType>(
    'coefficient_type',
    COEFFICIENT_WORDS,
    sheet.has('coefficient') ? undefined : 'Kv',
  );
}

/** The coefficient in its own kind. */
export function readCoefficient(sheet: SheetBuilder, type: CoefficientType): number {
  const given = sheet.quantity('coefficient');
  return sheet.number(
    'coefficient',
    given.unit === '-' ? '-' : type,
    { above: 0 },
    type === 'Kv' ? 'K_v' : 'C_v',
  );
}

/** The fittings when d, D1 and D2 are all given, in mm. */
export function readFittings(sheet: SheetBuilder): Fittings | undefined {
  if (!sheet.has('d') || !sheet.has('D1') || !sheet.has('D2')) return undefined;
  const size = (name: string) => sheet.number(name, 'mm', { above: 0 }, name.replace(/(\d)/, '_$1'));
  return { d: size('d'), D1: size('D1'), D2: size('D2') };
}

/** Both pressures in kPa absolute; refuses when nothing can flow. */
export function readPressures(sheet: SheetBuilder): { P1: number; P2: number } {
  const P1 = absolutePressure(sheet, 'P1', 'P_1', 'SI');
  const P2 = absolutePressure(sheet, 'P2', 'P_2', 'SI');
  if (P2 >= P1)
    sheet.refuse(
      'NO_FLOW',
      'P2',
      `The pressure before the valve, ${shownPressure(sheet, 'P1', P1, 'kPa_abs')}, is not above the pressure after it, ${shownPressure(sheet, 'P2', P2, 'kPa_abs')}: nothing can flow.`,
    );
  return { P1, P2 };
}
