/* Method k.out-breathing: what a storage tank breathes out when it is filled and warmed. */
import { type Method } from '../../catalog/types';
import { type SheetBuilder, workSheet } from '../../sheet';
import { input, optional, output } from '../common/describe';
import { absolutePressure } from '../common/pressures';
import { type System, systemOf } from '../common/system';
import { BARREL_FORMS, OUT_SHARE_HIGH_FLASH, thermalOut, VENTING_FORMS, Y_FACTORS } from './breathing';
import {
  airOutputs,
  barrelsStep,
  BREATHING_OUTPUTS,
  CURRENT_CLAUSE,
  isOlder,
  OLDER_CLAUSE,
  olderThermalStep,
  readBand,
  reductionStep,
  TANK_INPUTS,
  VENT_UNITS,
  VENTING_EDITIONS,
  VENTING_SOURCE,
} from './breathing-steps';

/** Above this vapour pressure a liquid counts as volatile, kPa absolute (API 2000 7th edition, as a public worksheet quotes it). */
const VOLATILE_ABOVE = 5;

/** The factor on the filling rate: as given, 2 for a volatile liquid, 1 for another. */
function volatility(sheet: SheetBuilder): number {
  if (sheet.has('volatility_factor')) return sheet.number('volatility_factor', '-', { min: 1 }, 'f_v');
  if (!sheet.has('vapour_pressure')) {
    sheet.warn(
      'VOLATILITY_ASSUMED',
      'Neither vapour pressure nor volatility factor is given: the liquid is taken as volatile, and its filling counts twice.',
    );
    return sheet.keep('volatility_factor', 2, 'f_v');
  }
  const pressure = absolutePressure(sheet, 'vapour_pressure', 'p_v', 'SI');
  return sheet.keep('volatility_factor', pressure > VOLATILE_ABOVE ? 2 : 1, 'f_v');
}

function yFactor(sheet: SheetBuilder): number {
  if (sheet.has('Y')) return sheet.number('Y', '-', { above: 0, max: 1 }, 'Y');
  return sheet.keep('Y', Y_FACTORS[readBand(sheet)], 'Y');
}

function liquidStep(sheet: SheetBuilder, system: System): number {
  const { flow, air } = VENT_UNITS[system];
  const rate = sheet.number('filling_rate', flow, { min: 0 }, '\\dot V_{pf}');
  const f = volatility(sheet);
  sheet.output('volatility_factor', f);
  const factor = VENTING_FORMS[system].liquid;
  return sheet.step(
    {
      key: 'Vl',
      tex: '\\dot V_{op}',
      meaning: 'air for the liquid filled',
      value: factor * f * rate,
      unit: air,
      clause: CURRENT_CLAUSE,
      memory: true,
    },
    (v) => `${factor === 1 ? '' : `${factor} \\cdot `}${v('volatility_factor')} \\cdot ${v('filling_rate')}`,
  );
}

function thermalStep(sheet: SheetBuilder, system: System): number {
  const V = sheet.number('tank_volume', VENT_UNITS[system].volume, { above: 0 }, 'V_{tk}');
  const Y = yFactor(sheet);
  sheet.output('Y', Y);
  const R = reductionStep(sheet);
  const factor = VENTING_FORMS[system].out;
  return sheet.step(
    {
      key: 'Vt',
      tex: '\\dot V_{OT}',
      meaning: 'air for the warming of the tank',
      value: thermalOut(Y, V, R, system),
      unit: VENT_UNITS[system].air,
      clause: CURRENT_CLAUSE,
      memory: true,
    },
    (v) =>
      `${factor === 1 ? '' : `${factor} \\cdot `}${v('Y')} \\cdot ${v('tank_volume')}^{0.9} \\cdot ${v('Ri')}`,
  );
}

/** Both terms by the older table, in SCFH. */
function olderSteps(sheet: SheetBuilder, system: System): void {
  const volatile = sheet.flag('low_flash_point', true);
  const q = barrelsStep(sheet, 'filling_rate', '\\dot V_{pf}', system);
  const factor = volatile ? BARREL_FORMS.outVolatile : BARREL_FORMS.outOther;
  const liquid = sheet.step(
    {
      key: 'Vl',
      tex: '\\dot V_{op}',
      meaning: 'air for the liquid filled',
      value: factor * q,
      unit: 'SCFH',
      clause: OLDER_CLAUSE,
      memory: true,
    },
    (v) => `${factor} \\cdot ${v('q')}`,
  );
  const into = olderThermalStep(sheet, system);
  const share = volatile ? 1 : OUT_SHARE_HIGH_FLASH;
  const thermal = sheet.step(
    {
      key: 'Vo',
      tex: '\\dot V_{OT}',
      meaning: 'thermal out-breathing as a share of the in-breathing',
      value: share * into,
      unit: 'SCFH',
      clause: OLDER_CLAUSE,
      memory: true,
    },
    (v) => `${share} \\cdot ${v('Vt')}`,
  );
  sheet.output('liquid_term', liquid, 'SCFH');
  sheet.output('thermal_term', thermal, 'SCFH');
  const total = sheet.step(
    {
      key: 'V',
      tex: '\\dot V',
      meaning: 'required out-breathing',
      value: liquid + thermal,
      unit: 'SCFH',
      clause: OLDER_CLAUSE,
    },
    (v) => `${v('Vl')} + ${v('Vo')}`,
  );
  airOutputs(sheet, total, 'SCFH', system);
}

function currentSteps(sheet: SheetBuilder, system: System): void {
  const { air } = VENT_UNITS[system];
  const liquid = liquidStep(sheet, system);
  const thermal = thermalStep(sheet, system);
  const flashed = sheet.number('flashed_vapour', air, { min: 0, fallback: 0 }, '\\dot V_{fl}');
  sheet.output('liquid_term', liquid, air);
  sheet.output('thermal_term', thermal, air);
  const total = sheet.step(
    {
      key: 'V',
      tex: '\\dot V',
      meaning: 'required out-breathing',
      value: liquid + thermal + flashed,
      unit: air,
      clause: CURRENT_CLAUSE,
    },
    (v) => `${v('Vl')} + ${v('Vt')}${flashed > 0 ? ` + ${v('flashed_vapour')}` : ''}`,
  );
  airOutputs(sheet, total, air, system);
}

/** k.out-breathing: normal out-breathing of a storage tank. */
export const OUT_BREATHING: Method = {
  id: 'k.out-breathing',
  version: 1,
  topic: 'k.out-breathing',
  title: 'Storage tank breathing out: filling and warming',
  editions: [...VENTING_EDITIONS],
  source: VENTING_SOURCE,
  validity:
    'Fixed-roof tanks at ambient storage, not refrigerated; no hot feed, no blanket gas and no flash beyond what is stated. The equations set cubic metres of liquid equal to normal cubic metres of air, and cubic feet to standard cubic feet, which are 5 % less air. The 5th edition is kept for tanks built by it.',
  inputs: [
    input('filling_rate', 'highest filling rate', 'volume-flow', { rangeKey: 'pumpFlow' }),
    optional('volatility_factor', 'factor on the filling rate (2 for a volatile liquid)', 'dimensionless'),
    optional(
      'vapour_pressure',
      'vapour pressure at storage temperature; above 5 kPa the liquid is volatile',
      'pressure-absolute',
      {
        rangeKey: 'vapourPressure',
      },
    ),
    optional('flashed_vapour', 'vapour flashed from the feed, as air', 'normal-volume-flow'),
    optional('Y', 'factor of latitude (0.32 below 42°, 0.25 to 58°, 0.20 above)', 'dimensionless'),
    ...TANK_INPUTS,
    optional(
      'low_flash_point',
      'whether the flash point is below 38 °C (100 °F); for the 5th edition only, yes when not given',
    ),
    optional('atmospheric_pressure', 'barometric pressure', 'pressure-absolute', { rangeKey: 'barometer' }),
  ],
  outputs: [
    ...BREATHING_OUTPUTS,
    output('volatility_factor', 'factor on the filling rate used', 'dimensionless'),
    output('Y', 'factor of latitude used', 'dimensionless'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const system = systemOf(inputs, ['filling_rate', 'tank_volume']);
      if (isOlder(sheet, edition)) return olderSteps(sheet, system);
      currentSteps(sheet, system);
    });
  },
};
