/* The wetted area of a storage tank on the sheet of emergency venting: as given, or from its shape. */
import { type MethodInput } from '../../catalog/types';
import { fromSI } from '../../quantity';
import { type SheetBuilder } from '../../sheet';
import { optional } from '../common/describe';
import { SYSTEM_UNITS, type System } from '../common/system';
import { horizontalArea, sphereArea, TANK_FIRE_HEIGHT, verticalArea } from './emergency';

const CLAUSE = '29 CFR 1910.106(b)(2)(v), wetted area';

/** Shapes of storage tanks as words of the sheet. */
export const TANK_SHAPES = ['vertical', 'horizontal', 'sphere'] as const;

/** Inputs of the wetted area. */
export const AREA_INPUTS: readonly MethodInput[] = [
  optional('A_wetted', 'wetted area, in place of the shape', 'area', { rangeKey: 'wettedArea' }),
  optional('shape', 'shape of the tank (vertical when not given)', undefined, { words: [...TANK_SHAPES] }),
  optional('D', 'diameter', 'length', { rangeKey: 'vesselDiameter' }),
  optional('H', 'height of the wetted shell of a vertical tank', 'length', { rangeKey: 'vesselLength' }),
  optional('L', 'length of a horizontal tank', 'length', { rangeKey: 'vesselLength' }),
  optional('elevation_of_bottom', 'bottom of the shell above grade (0 when not given)', 'length', {
    rangeKey: 'elevation',
  }),
  optional(
    'bottom_exposed',
    'whether the fire reaches the bottom of a raised vertical tank (no when not given)',
  ),
];

function vertical(sheet: SheetBuilder, D: number, system: System): number {
  const { L: unit, area } = SYSTEM_UNITS[system];
  const H = sheet.number('H', unit, { above: 0 }, 'H');
  const bottom = sheet.number('elevation_of_bottom', unit, { fallback: 0 }, 'z');
  const limit = fromSI(TANK_FIRE_HEIGHT, unit).value;
  sheet.keep('zf', limit, 'z_f');
  const height = sheet.step(
    {
      key: 'h',
      meaning: 'wetted shell below the height that the fire reaches',
      value: Math.min(H, Math.max(0, limit - bottom)),
      unit,
      clause: CLAUSE,
    },
    (v) => `\\min\\left(${v('H')},\\ ${v('zf')} - ${v('elevation_of_bottom')}\\right)`,
  );
  const exposed = sheet.flag('bottom_exposed', false);
  return sheet.step(
    { key: 'A', meaning: 'wetted area', value: verticalArea(D, height, exposed), unit: area, clause: CLAUSE },
    (v) => `\\pi \\cdot ${v('D')} \\cdot ${v('h')}${exposed ? ` + \\frac{\\pi}{4} ${v('D')}^2` : ''}`,
  );
}

function horizontal(sheet: SheetBuilder, D: number, system: System): number {
  const L = sheet.number('L', SYSTEM_UNITS[system].L, { above: 0 }, 'L');
  return sheet.step(
    {
      key: 'A',
      meaning: 'wetted area, 75 % of the surface',
      value: horizontalArea(D, L),
      unit: SYSTEM_UNITS[system].area,
      clause: CLAUSE,
    },
    (v) => `0.75 \\left(\\pi \\cdot ${v('D')} \\cdot ${v('L')} + \\frac{\\pi}{2} ${v('D')}^2\\right)`,
  );
}

/** The wetted area in m² or ft², with its steps and the output `wetted_area`; refuses a tank that the fire does not wet. */
export function wettedArea(sheet: SheetBuilder, system: System): number {
  const { area } = SYSTEM_UNITS[system];
  const A = sheet.has('A_wetted')
    ? sheet.keep('A', sheet.number('A_wetted', area, { above: 0 }, 'A'), 'A')
    : fromShape(sheet, system);
  if (A <= 0)
    sheet.refuse(
      'NO_WETTED_AREA',
      'elevation_of_bottom',
      'The fire wets nothing: the shell lies above the height that a fire reaches.',
    );
  sheet.output('wetted_area', A, area);
  return A;
}

function fromShape(sheet: SheetBuilder, system: System): number {
  const D = sheet.number('D', SYSTEM_UNITS[system].L, { above: 0 }, 'D');
  const shape = sheet.word('shape', TANK_SHAPES, 'vertical');
  if (shape === 'vertical') return vertical(sheet, D, system);
  sheet.warn(
    'SHARE_OF_SURFACE',
    'The regulation counts a fixed share of the surface; API 2000 asks for the whole surface up to 9.14 m (30 ft) above grade where that is more (from memory).',
  );
  if (shape === 'horizontal') return horizontal(sheet, D, system);
  return sheet.step(
    {
      key: 'A',
      meaning: 'wetted area, 55 % of the surface',
      value: sphereArea(D),
      unit: SYSTEM_UNITS[system].area,
      clause: CLAUSE,
    },
    (v) => `0.55 \\cdot \\pi \\cdot ${v('D')}^2`,
  );
}
