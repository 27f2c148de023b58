/* Method j.vacuum-relief: air that a vacuum relief device lets into a vessel, and how far the vacuum goes. */
import { type Method } from '../../catalog/types';
import { convert, fromSI } from '../../quantity';
import { type SheetBuilder, workSheet } from '../../sheet';
import { input, optional, output } from '../common/describe';
import { barometer } from '../common/pressures';
import { SYSTEM_UNITS, type System, systemOf } from '../common/system';
import { airMass } from '../k-tanks/air';
import { ventArea } from '../k-tanks/vent';
import { fluxStep } from '../k-tanks/vent-steps';

const CLAUSE = 'isentropic nozzle of air from the atmosphere';

/** Temperature of the air outside when none is given: 15 °C. */
const OUTSIDE = 288.15;

/** The air asked for, kg/s. */
function readLoad(sheet: SheetBuilder): number {
  if (sheet.has('W')) return sheet.number('W', 'kg/s', { above: 0 });
  const volume = sheet.number('air_demand', 'Nm3/h', { above: 0 }, '\\dot V');
  return sheet.step(
    {
      key: 'W',
      meaning: 'mass flow of the air',
      value: airMass(volume / 3600),
      unit: 'kg/s',
      clause: 'Nm³ at 0 °C and 101.325 kPa',
    },
    (v) => `\\frac{${v('air_demand')}}{3600} \\cdot \\frac{28.96}{22.414}`,
  );
}

/** The vacuum at which the device is taken as open, as a positive difference in Pa. */
function vacuumStep(sheet: SheetBuilder, system: System): number {
  const { dP } = SYSTEM_UNITS[system];
  const set = sheet.number('set_vacuum', dP, { above: 0 }, 'p_v');
  const over = sheet.number('overpressure', '-', { min: 0, max: 2 }, 'x');
  const vacuum = sheet.step(
    {
      key: 'v',
      tex: '\\Delta p',
      meaning: 'vacuum at which the flow is reckoned',
      value: set * (1 + over),
      unit: dP,
    },
    (v) => `${v('set_vacuum')} \\cdot (1 + ${v('overpressure')})`,
  );
  sheet.output('relieving_vacuum', vacuum, dP);
  return vacuum;
}

/** Compares the vacuum with what the vessel bears. */
function ratingStep(sheet: SheetBuilder, vacuum: number, system: System): void {
  if (!sheet.has('external_rating')) {
    sheet.warn(
      'RATING_NOT_GIVEN',
      'The external rating of the vessel is not given: whether it bears this vacuum is not judged.',
    );
    return;
  }
  const { dP } = SYSTEM_UNITS[system];
  const rating = sheet.number('external_rating', dP, { min: 0 }, 'p_{ext}');
  const margin = sheet.step(
    {
      key: 'm',
      tex: '\\Delta',
      meaning: 'external rating less the vacuum',
      value: rating - vacuum,
      unit: dP,
    },
    (v) => `${v('external_rating')} - ${v('v')}`,
  );
  sheet.output('vacuum_margin', margin, dP);
  sheet.output('within_rating', margin >= 0);
  if (margin < 0)
    sheet.warn('VACUUM_ABOVE_RATING', 'At this vacuum the vessel is beyond its external rating.');
}

/** j.vacuum-relief: required area of a vacuum relief device. */
export const VACUUM_RELIEF: Method = {
  id: 'j.vacuum-relief',
  version: 1,
  topic: 'j.vacuum-relief',
  title: 'Vacuum relief of a vessel: required area',
  editions: ['ASME XIII:2021; API 520-1, 7th to 10th edition'],
  source:
    'Isentropic nozzle of air; the subcritical equation of API Standard 520 Part I with the atmosphere upstream',
  validity:
    'Air from the open drawn in through a device that is fully open at the vacuum given; actual area with the certified coefficient. The demand (cooling, condensation, pumping out) comes from its own sheet; sudden condensation of steam can ask for more than any device passes.',
  inputs: [
    optional('air_demand', 'air demanded', 'normal-volume-flow', { rangeKey: 'reliefLoad' }),
    optional('W', 'air demanded as a mass flow, in place of the volume', 'mass-flow', {
      rangeKey: 'reliefLoad',
    }),
    input('set_vacuum', 'set of the device, below atmosphere', 'pressure-difference', {
      rangeKey: 'setPressureVacuum',
    }),
    input('overpressure', 'overpressure as a fraction of the set', 'dimensionless'),
    optional('external_rating', 'vacuum that the vessel bears', 'pressure-difference', {
      rangeKey: 'externalRating',
    }),
    optional('Kd', 'certified coefficient on actual area (0.62 when not given)', 'dimensionless', {
      rangeKey: 'kdGas',
    }),
    optional('T_air', 'temperature of the outside air (15 °C when not given)', 'temperature', {
      rangeKey: 'ambient',
    }),
    optional('atmospheric_pressure', 'barometric pressure', 'pressure-absolute', { rangeKey: 'barometer' }),
  ],
  outputs: [
    output('relieving_vacuum', 'vacuum at which the flow is reckoned', 'pressure-difference'),
    output('vacuum_margin', 'external rating less the vacuum', 'pressure-difference'),
    output('within_rating', 'whether the vessel bears the vacuum'),
    output('mass_flux', 'theoretical mass flux of air', 'mass-flux'),
    output('choked', 'whether the device is choked'),
    output('A_required', 'required flow area', 'area'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const system = systemOf(inputs, ['set_vacuum', 'W']);
      const mass = readLoad(sheet);
      const vacuum = vacuumStep(sheet, system);
      ratingStep(sheet, vacuum, system);
      const outside = barometer(sheet, system);
      if (vacuum >= outside)
        sheet.refuse(
          'VALUE_IMPOSSIBLE',
          'set_vacuum',
          'Set and overpressure go below absolute vacuum at this barometric pressure.',
        );
      const pa = (value: number) => convert({ value, unit: SYSTEM_UNITS[system].P }, 'Pa_abs');
      const T = sheet.number('T_air', 'K', { above: 0, fallback: OUTSIDE }, 'T_{air}');
      const flux = fluxStep(sheet, pa(outside - vacuum), pa(outside), T);
      const Kd = sheet.number('Kd', '-', { above: 0, max: 1, fallback: 0.62 }, 'K_d');
      const A = sheet.step(
        {
          key: 'A',
          meaning: 'required flow area',
          value: ventArea(mass, Kd, flux),
          unit: 'm2',
          clause: CLAUSE,
        },
        (v) => `\\frac{${v('W')}}{${v('Kd')} \\cdot ${v('G')}}`,
      );
      const { A: unit } = SYSTEM_UNITS[system];
      sheet.output('A_required', fromSI(A, unit).value, unit);
    });
  },
};
