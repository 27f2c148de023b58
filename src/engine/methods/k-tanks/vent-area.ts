/* Method k.vent-area: the flow area that vents of a tank need for a flow of air, out of the tank or into it. */
import { type Method } from '../../catalog/types';
import { fromSI, toSI } from '../../quantity';
import { type SheetBuilder, workSheet } from '../../sheet';
import { input, optional, output } from '../common/describe';
import { shownPressure } from '../common/pressures';
import { SYSTEM_UNITS, type System, systemOf } from '../common/system';
import { airMass } from './air';
import { bothPressures, DIRECTIONS, airTemperature, fluxStep, VENT_INPUTS } from './vent-steps';
import { ventArea } from './vent';

const CLAUSE = 'ISO 28300 / API 2000, flow of air through vents';

/** The mass flow of air in kg/s, from its volume or as given. */
function readLoad(sheet: SheetBuilder): number {
  if (!sheet.has('air_equivalent')) return sheet.number('W', 'kg/s', { above: 0 }, 'W');
  const volume = sheet.number('air_equivalent', 'Nm3/h', { above: 0 }, '\\dot V');
  return sheet.step(
    {
      key: 'W',
      meaning: 'mass flow of the air',
      value: airMass(volume / 3600),
      unit: 'kg/s',
      clause: 'Nm³ at 0 °C and 101.325 kPa',
    },
    (v) => `\\frac{${v('air_equivalent')}}{3600} \\cdot \\frac{28.96}{22.414}`,
  );
}

/** Says which way the air goes; refuses equal pressures and a direction that the pressures contradict. */
function directionStep(sheet: SheetBuilder, inside: number, outside: number, system: System): void {
  const unit = SYSTEM_UNITS[system].P;
  const shown = (name: string, pa: number) => shownPressure(sheet, name, fromSI(pa, unit).value, unit);
  if (inside === outside)
    sheet.refuse('NO_FLOW', 'P1', 'The pressure in the tank equals that outside: nothing can flow.');
  const flows = inside > outside ? 'out' : 'in';
  const meant = sheet.word('direction', DIRECTIONS, flows);
  if (meant !== flows)
    sheet.refuse(
      'NO_FLOW',
      'P1',
      `The tank is to breathe ${meant}, but its pressure ${shown('P1', inside)} is ${inside > outside ? 'above' : 'below'} the ${shown('P2', outside)} outside.`,
    );
  sheet.output('direction', flows);
  sheet.say({
    symbol: '\\text{direction}',
    meaning: flows === 'out' ? 'the tank breathes out' : 'the tank breathes in',
    value: flows,
    tex: `P_1 ${flows === 'out' ? '>' : '<'} P_2`,
  });
}

/** k.vent-area: required flow area of tank vents. */
export const VENT_AREA: Method = {
  id: 'k.vent-area',
  version: 1,
  topic: 'k.vent-area',
  title: 'Storage tank vents: required flow area',
  editions: ['ISO 28300:2008; API 2000, 6th and 7th edition'],
  source:
    'Isentropic nozzle of air; the subcritical equation of API Standard 520 Part I in its exact form, as ISO 28300 rates vents (from memory)',
  validity:
    'Vents that are fully open at the pressure given; actual flow area with the coefficient of the vent as tested, flame arrester included. The area is worked for air; a vapour enters as its equivalent air.',
  inputs: [
    optional('air_equivalent', 'required venting in air', 'normal-volume-flow', { rangeKey: 'reliefLoad' }),
    optional('W', 'required venting as a mass flow of air, in place of the volume', 'mass-flow', {
      rangeKey: 'reliefLoad',
    }),
    input('P1', 'pressure in the tank at certified full flow', 'pressure-absolute'),
    optional('P2', 'pressure outside the vent (the barometric pressure when not given)', 'pressure-absolute'),
    optional(
      'direction',
      'whether the tank breathes out or in, to be checked against the pressures',
      undefined,
      { words: [...DIRECTIONS] },
    ),
    ...VENT_INPUTS,
  ],
  outputs: [
    output('direction', 'out of the tank or into it'),
    output('mass_flux', 'theoretical mass flux of air', 'mass-flux'),
    output('choked', 'whether the vent is choked'),
    output('A_required', 'required flow area', 'area'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const system = systemOf(inputs, ['P1', 'W']);
      const mass = readLoad(sheet);
      const { inside, outside } = bothPressures(sheet, system);
      directionStep(sheet, inside, outside, system);
      const flux = fluxStep(sheet, inside, outside, airTemperature(sheet));
      const Kd = sheet.number('Kd', '-', { above: 0, max: 1 }, 'K_d');
      const { A: unit } = SYSTEM_UNITS[system];
      const factor = 1 / toSI({ value: 1, unit });
      const area = sheet.step(
        {
          key: 'A',
          meaning: 'required flow area',
          value: ventArea(mass, Kd, flux) * factor,
          unit,
          clause: CLAUSE,
          memory: true,
        },
        (v) => `\\frac{${v('W')}}{${v('Kd')} \\cdot ${v('G')}} \\cdot ${system === 'SI' ? '10^6' : '1550.0'}`,
      );
      sheet.output('A_required', area, unit);
    });
  },
};
