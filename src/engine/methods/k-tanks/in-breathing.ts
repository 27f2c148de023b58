/* Method k.in-breathing: what a storage tank must breathe in when it is emptied and cooled. */
import { type Method } from '../../catalog/types';
import { type SheetBuilder, workSheet } from '../../sheet';
import { input, optional, output } from '../common/describe';
import { type System, systemOf } from '../common/system';
import { BARREL_FORMS, cFactor, thermalIn, VAPOUR_CLASSES, VENTING_FORMS } from './breathing';
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

/** Factor C: as given, or from latitude, vapour pressure and storage temperature (the safe side where they are not known). */
function readC(sheet: SheetBuilder): number {
  if (sheet.has('C')) return sheet.number('C', '-', { above: 0, max: 10 }, 'C');
  const band = readBand(sheet);
  const vapour = sheet.word('vapour_class', VAPOUR_CLASSES, 'higher or unknown');
  const storage = sheet.number('storage_temperature', 'degC', { fallback: 25 }, 't');
  return sheet.keep('C', cFactor(band, vapour, storage), 'C');
}

function liquidStep(sheet: SheetBuilder, system: System): number {
  const { flow, air } = VENT_UNITS[system];
  const rate = sheet.number('emptying_rate', flow, { min: 0 }, '\\dot V_{pe}');
  const factor = VENTING_FORMS[system].liquid;
  return sheet.step(
    {
      key: 'Vl',
      tex: '\\dot V_{ip}',
      meaning: 'air for the liquid taken out',
      value: factor * rate,
      unit: air,
      clause: CURRENT_CLAUSE,
      memory: true,
    },
    (v) => `${factor === 1 ? '' : `${factor} \\cdot `}${v('emptying_rate')}`,
  );
}

function thermalStep(sheet: SheetBuilder, system: System): number {
  const V = sheet.number('tank_volume', VENT_UNITS[system].volume, { above: 0 }, 'V_{tk}');
  const C = readC(sheet);
  sheet.output('C', C);
  const R = reductionStep(sheet);
  const factor = VENTING_FORMS[system].into;
  return sheet.step(
    {
      key: 'Vt',
      tex: '\\dot V_{IT}',
      meaning: 'air for the cooling of the tank',
      value: thermalIn(C, V, R, system),
      unit: VENT_UNITS[system].air,
      clause: CURRENT_CLAUSE,
      memory: true,
    },
    (v) =>
      `${factor === 1 ? '' : `${factor} \\cdot `}${v('C')} \\cdot ${v('tank_volume')}^{0.7} \\cdot ${v('Ri')}`,
  );
}

function olderSteps(sheet: SheetBuilder, system: System): { liquid: number; thermal: number } {
  const q = barrelsStep(sheet, 'emptying_rate', '\\dot V_{pe}', system);
  const liquid = sheet.step(
    {
      key: 'Vl',
      tex: '\\dot V_{ip}',
      meaning: 'air for the liquid taken out',
      value: BARREL_FORMS.into * q,
      unit: 'SCFH',
      clause: OLDER_CLAUSE,
      memory: true,
    },
    (v) => `${BARREL_FORMS.into} \\cdot ${v('q')}`,
  );
  return { liquid, thermal: olderThermalStep(sheet, system) };
}

/** k.in-breathing: normal in-breathing of a storage tank. */
export const IN_BREATHING: Method = {
  id: 'k.in-breathing',
  version: 1,
  topic: 'k.in-breathing',
  title: 'Storage tank breathing in: emptying and cooling',
  editions: [...VENTING_EDITIONS],
  source: VENTING_SOURCE,
  validity:
    'Fixed-roof tanks at ambient storage, not refrigerated; rain on a warm roof is within the thermal term; hot vapour that condenses is not. Blanket gas is not credited. The equations set cubic metres of liquid equal to normal cubic metres of air, and cubic feet to standard cubic feet, which are 5 % less air. The 5th edition is kept for tanks built by it.',
  inputs: [
    input('emptying_rate', 'highest emptying rate', 'volume-flow', { rangeKey: 'pumpFlow' }),
    optional('C', 'factor of latitude, vapour pressure and storage temperature', 'dimensionless'),
    optional('vapour_class', 'vapour pressure against that of hexane, to find C', undefined, {
      words: [...VAPOUR_CLASSES],
    }),
    optional(
      'storage_temperature',
      'average storage temperature, to find C (25 °C when not given)',
      'temperature',
      {
        rangeKey: 'operatingTemperature',
      },
    ),
    ...TANK_INPUTS,
  ],
  outputs: [...BREATHING_OUTPUTS, output('C', 'factor C used', 'dimensionless')],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const system = systemOf(inputs, ['emptying_rate', 'tank_volume']);
      const older = isOlder(sheet, edition);
      const air = older ? 'SCFH' : VENT_UNITS[system].air;
      const { liquid, thermal } = older
        ? olderSteps(sheet, system)
        : { liquid: liquidStep(sheet, system), thermal: thermalStep(sheet, system) };
      sheet.output('liquid_term', liquid, air);
      sheet.output('thermal_term', thermal, air);
      const total = sheet.step(
        {
          key: 'V',
          tex: '\\dot V',
          meaning: 'required in-breathing',
          value: liquid + thermal,
          unit: air,
          clause: older ? OLDER_CLAUSE : CURRENT_CLAUSE,
        },
        (v) => `${v('Vl')} + ${v('Vt')}`,
      );
      airOutputs(sheet, total, air, system);
    });
  },
};
