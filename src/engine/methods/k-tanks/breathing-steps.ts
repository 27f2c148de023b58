/* What the sheets of normal venting share: units, latitude, insulation, the older edition, and the ending in air. */
import { type MethodInput, type MethodOutput } from '../../catalog/types';
import { convert, fromSI, toSI } from '../../quantity';
import { type SheetBuilder } from '../../sheet';
import { input, optional, output } from '../common/describe';
import { SYSTEM_UNITS, type System } from '../common/system';
import { airMass, AIR_MOLAR_MASS, NORMAL_VOLUME } from './air';
import {
  doubleWallReduction,
  insulationReduction,
  LARGEST_CAPACITY,
  LATITUDE_BANDS,
  type LatitudeBand,
  latitudeBand,
  partialReduction,
  thermalByCapacity,
} from './breathing';

/** The editions whose venting equations differ; the first is used when none is named. */
export const VENTING_EDITIONS = [
  'ISO 28300:2008; API 2000, 6th and 7th edition',
  'API 2000, 5th edition',
] as const;

/** The clause of the current equations. */
export const CURRENT_CLAUSE = 'ISO 28300 / API 2000 7th edition, 4.3.2 normal venting';
/** The clause of the older table. */
export const OLDER_CLAUSE = 'API 2000 5th edition, Tables 1 and 2 normal venting';

/** Where the venting equations come from. */
export const VENTING_SOURCE =
  'ISO 28300 and API Standard 2000, normal venting of non-refrigerated tanks; equations as public worksheets quote them, constants and tables from memory';

/** Units of flow, volume and vent air by system. */
export const VENT_UNITS: Record<System, { flow: string; volume: string; air: string }> = {
  SI: { flow: 'm3/h', volume: 'm3', air: 'Nm3/h' },
  US: { flow: 'US gpm', volume: 'ft3', air: 'SCFH' },
};

/** Cubic metres in a barrel of 42 US gallons. */
const BARREL = 42 * 0.003785411784;

/** True when the older table method is asked for, by the input or by the edition of the calculation. */
export function isOlder(sheet: SheetBuilder, edition: string | undefined): boolean {
  const [current, older] = VENTING_EDITIONS;
  const asked = edition?.includes('5th') === true ? older : current;
  return sheet.word('venting_edition', VENTING_EDITIONS, asked) === older;
}

/** Inputs of the tank that both directions of breathing take. */
export const TANK_INPUTS: readonly MethodInput[] = [
  input('tank_volume', 'volume of the tank', 'volume', { rangeKey: 'volume' }),
  optional('latitude', 'latitude of the site, north or south', 'angle'),
  optional('latitude_band', 'band of latitude in degrees, in place of the latitude', undefined, {
    words: [...LATITUDE_BANDS],
  }),
  optional(
    'Ri',
    'reduction factor for insulation (1 for a bare tank, or from the insulation below)',
    'dimensionless',
    {
      rangeKey: 'fraction',
    },
  ),
  optional('thickness', 'thickness of the insulation', 'length', { rangeKey: 'insulationThickness' }),
  optional('k_ins', 'conductivity of the insulation', 'heat-conductivity', {
    rangeKey: 'insulationConductivity',
  }),
  optional(
    'h_inside',
    'heat transfer coefficient inside (4 W/(m²·K) when not given)',
    'heat-transfer-coefficient',
  ),
  optional('insulated_share', 'insulated share of the whole surface (1 when not given)', 'dimensionless', {
    rangeKey: 'fraction',
  }),
  optional('double_wall_share', 'share of the surface behind a second wall', 'dimensionless', {
    rangeKey: 'fraction',
  }),
  optional(
    'venting_edition',
    'edition of the venting equations (the current ones when not given)',
    undefined,
    {
      words: [...VENTING_EDITIONS],
    },
  ),
];

/** Outputs of both directions. */
export const BREATHING_OUTPUTS: readonly MethodOutput[] = [
  output('liquid_term', 'air for the liquid moved', 'normal-volume-flow'),
  output('Ri', 'reduction factor for insulation', 'dimensionless'),
  output('thermal_term', 'air for the weather', 'normal-volume-flow'),
  output('air_equivalent', 'required venting in air', 'normal-volume-flow'),
  output('relief_load', 'the same air as a mass flow', 'mass-flow'),
];

/** The band of latitude: as a word, or from the latitude. */
export function readBand(sheet: SheetBuilder): LatitudeBand {
  if (sheet.has('latitude_band')) return sheet.word('latitude_band', LATITUDE_BANDS);
  return latitudeBand(sheet.number('latitude', 'deg', { min: -90, max: 90 }, '\\varphi'));
}

/** The reduction by insulation: as given, from insulation or a second wall, else 1; gives the output Ri. */
export function reductionStep(sheet: SheetBuilder): number {
  const R = reduction(sheet);
  sheet.output('Ri', R);
  return R;
}

function reduction(sheet: SheetBuilder): number {
  if (sheet.has('Ri')) return sheet.number('Ri', '-', { above: 0, max: 1 }, 'R_i');
  if (sheet.has('thickness')) return insulated(sheet);
  if (!sheet.has('double_wall_share')) return sheet.keep('Ri', 1, 'R_i');
  const share = sheet.number('double_wall_share', '-', { min: 0, max: 1 }, 'x_w');
  return sheet.step(
    {
      key: 'Ri',
      tex: 'R_i',
      meaning: 'reduction factor of a second wall',
      value: doubleWallReduction(share),
      unit: '-',
      clause: CURRENT_CLAUSE,
      memory: true,
    },
    (v) => `0.25 + 0.75 \\cdot (1 - ${v('double_wall_share')})`,
  );
}

function insulated(sheet: SheetBuilder): number {
  const l = sheet.number('thickness', 'm', { min: 0 }, 'l');
  const k = sheet.number('k_ins', 'W/(m.K)', { above: 0 }, '\\lambda');
  const h = sheet.number('h_inside', 'W/(m2.K)', { above: 0, fallback: 4 }, 'h');
  const share = sheet.number('insulated_share', '-', { min: 0, max: 1, fallback: 1 }, 'x_i');
  const all = sheet.step(
    {
      key: 'Rin',
      tex: 'R_{in}',
      meaning: 'reduction factor of insulation all over',
      value: insulationReduction(h, l, k),
      unit: '-',
      clause: CURRENT_CLAUSE,
      memory: true,
    },
    (v) => `\\frac{1}{1 + ${v('h_inside')} \\cdot ${v('thickness')} / ${v('k_ins')}}`,
  );
  return sheet.step(
    {
      key: 'Ri',
      tex: 'R_i',
      meaning: 'reduction factor with the insulated share of the surface',
      value: partialReduction(all, share),
      unit: '-',
      clause: CURRENT_CLAUSE,
      memory: true,
    },
    (v) => `${v('insulated_share')} \\cdot ${v('Rin')} + (1 - ${v('insulated_share')})`,
  );
}

/** The thermal in-breathing of the older table in SCFH, shown with the capacity in barrels; refuses above the table. */
export function olderThermalStep(sheet: SheetBuilder, system: System): number {
  const volume = sheet.number('tank_volume', VENT_UNITS[system].volume, { above: 0 }, 'V_{tk}');
  const barrels = toSI({ value: volume, unit: VENT_UNITS[system].volume }) / BARREL;
  sheet.step(
    { key: 'N', tex: 'N_{bbl}', meaning: 'capacity in barrels of 42 US gallons', value: barrels, unit: '-' },
    (v) => `${v('tank_volume')} / ${system === 'SI' ? '0.158\\,987' : '5.614\\,58'}`,
  );
  const air = thermalByCapacity(barrels);
  if (air === undefined)
    sheet.refuse(
      'OUTSIDE_TABLE',
      'tank_volume',
      `The table of API 2000 5th edition ends at ${LARGEST_CAPACITY} barrels; use the equations of the current edition.`,
    );
  return sheet.step(
    {
      key: 'Vt',
      tex: '\\dot V_{th}',
      meaning: 'thermal in-breathing by the table',
      value: air,
      unit: 'SCFH',
      clause: OLDER_CLAUSE,
      memory: true,
    },
    (v) => `\\text{table}(${v('N')})`,
  );
}

/** A flow of liquid in barrels an hour, as a step. */
export function barrelsStep(sheet: SheetBuilder, name: string, tex: string, system: System): number {
  const { flow } = VENT_UNITS[system];
  const given = sheet.number(name, flow, { min: 0 }, tex);
  return sheet.step(
    {
      key: 'q',
      tex: 'q_{bbl/h}',
      meaning: 'liquid moved, barrels an hour',
      value: (toSI({ value: given, unit: flow }) * 3600) / BARREL,
      unit: '-',
    },
    (v) => `${v(name)} ${system === 'SI' ? '/ 0.158\\,987' : '\\cdot 60 / 42'}`,
  );
}

/** The outputs in air: by volume in the system's unit, and as a mass flow. */
export function airOutputs(sheet: SheetBuilder, air: number, unit: string, system: System): void {
  const volume = toSI({ value: air, unit });
  const { W } = SYSTEM_UNITS[system];
  sheet.keep('Mair', AIR_MOLAR_MASS, 'M_{air}');
  sheet.keep('Vn', NORMAL_VOLUME, 'V_n');
  sheet.keep('air', convert({ value: air, unit }, 'Nm3/h'), '\\dot V');
  const mass = fromSI(airMass(volume), W).value;
  sheet.output(
    'air_equivalent',
    convert({ value: air, unit }, VENT_UNITS[system].air),
    VENT_UNITS[system].air,
  );
  sheet.step(
    {
      key: 'W',
      meaning: 'the same air as a mass flow',
      value: mass,
      unit: W,
      clause: 'Nm³ at 0 °C and 101.325 kPa',
    },
    (v) =>
      `${v('air')} \\cdot \\frac{${v('Mair')}}{${v('Vn')}}${system === 'SI' ? '' : ' \\cdot 2.204\\,62'}`,
  );
  sheet.output('relief_load', mass, W);
}
