/* Method e.fire-unwetted: fire on a vessel that holds gas only, or has boiled dry. */
import { type Method } from '../../catalog/types';
import { toSI } from '../../quantity';
import { type SheetBuilder, texNumber, workSheet } from '../../sheet';
import { gasC } from '../a-gas/flow';
import { input, optional, output, RELIEVING_INPUTS } from '../common/describe';
import { letterStep } from '../common/letter-step';
import { absolutePressure, relievingAbsolute } from '../common/pressures';
import { SYSTEM_UNITS, type System, systemOf } from '../common/system';
import { exposedArea, EXPOSED_INPUTS } from './exposed';
import {
  fPrime,
  type GasInFire,
  heatedTo,
  UNWETTED_FORMS,
  unwettedArea,
  unwettedLoad,
} from './unwetted-flow';

const CLAUSE = 'API 521, unwetted vessels in a fire';

/** The wall temperature at which carbon steel is commonly taken to fail, K (593 °C, 1 100 °F; API 521, from memory). */
const WALL_LIMIT = 866;

/** Absolute relieving temperature: as given, or that of the closed gas at the relieving pressure. */
function relievingTemperature(sheet: SheetBuilder, P1: number, system: System): number {
  const u = SYSTEM_UNITS[system];
  if (sheet.has('T1')) return sheet.number('T1', u.T, { above: 0 }, 'T_1');
  if (!sheet.has('normal_temperature') || !sheet.has('normal_pressure'))
    sheet.refuse(
      'INPUT_MISSING',
      'T1',
      'The relieving temperature (T1) is missing: give it, or normal_pressure and normal_temperature of the closed gas.',
    );
  const T = sheet.number('normal_temperature', u.T, { above: 0 }, 'T_n');
  const P = absolutePressure(sheet, 'normal_pressure', 'P_n', system);
  return sheet.step(
    {
      key: 'T1',
      tex: 'T_1',
      meaning: 'temperature of the closed gas when its pressure reaches the relieving pressure',
      value: heatedTo(T, P, P1),
      unit: u.T,
      clause: 'ideal gas at constant volume',
    },
    (v) => `${v('normal_temperature')} \\cdot \\frac{${v('P1')}}{${v('normal_pressure')}}`,
  );
}

/** The wall temperature; refuses a gas that is hotter. */
function wallTemperature(sheet: SheetBuilder, T1: number, system: System): number {
  const unit = SYSTEM_UNITS[system].T;
  const fallback = system === 'SI' ? 866 : 1560;
  const wall = sheet.number('T_wall', unit, { above: 0, fallback }, 'T_w');
  if (T1 >= wall)
    sheet.refuse(
      'GAS_HOTTER_THAN_WALL',
      'T_wall',
      `At the relieving pressure the gas is at ${texNumber(T1)} ${unit}, not below the wall at ${texNumber(wall)} ${unit}: the equation is void, the wall fails first. Depressure or insulate the vessel.`,
    );
  if (toSI({ value: wall, unit }) > WALL_LIMIT * 1.001)
    sheet.warn(
      'WALL_ABOVE_LIMIT',
      'The wall temperature is above 866 K (593 °C), at which carbon steel is commonly taken to fail.',
      'up to 866 K',
    );
  sheet.warn(
    'WALL_NOT_PROTECTED',
    'A relief device does not keep a gas-cooled wall from failing in a fire: judge depressuring, insulation or water spray.',
  );
  return wall;
}

/** F′ with its lower limit, the area and the letter. */
function areaSteps(sheet: SheetBuilder, gas: GasInFire, system: System): void {
  const u = SYSTEM_UNITS[system];
  const { factor, least } = UNWETTED_FORMS[system];
  const k = sheet.number('k', '-', { min: 1 });
  const Kd = sheet.number('Kd', '-', { above: 0, max: 1, fallback: 0.975 }, 'K_d');
  sheet.step(
    {
      key: 'C',
      meaning: 'coefficient of the ratio of specific heats',
      value: gasC(k, system),
      unit: u.C,
      clause: 'API 520-1, coefficient C',
      memory: true,
    },
    (v) =>
      `${system === 'SI' ? '0.03948' : '520'} \\sqrt{${v('k')} \\left(\\frac{2}{${v('k')}+1}\\right)^{(${v('k')}+1)/(${v('k')}-1)}}`,
  );
  const free = sheet.step(
    {
      key: 'Fu',
      tex: "F'_0",
      meaning: 'factor F′ before its lower limit',
      value: fPrime({ k, Kd, T1: gas.T1, Twall: gas.Twall }, system),
      unit: '-',
      clause: CLAUSE,
      memory: true,
    },
    (v) =>
      `\\frac{${factor}}{${v('C')} \\cdot ${v('Kd')}} \\cdot \\frac{(${v('T_wall')} - ${v('T1')})^{1.25}}{${v('T1')}^{0.6506}}`,
  );
  const used = sheet.step(
    {
      key: 'F',
      tex: "F'",
      meaning: 'factor F′, not below its lower limit',
      value: Math.max(least, free),
      unit: '-',
      clause: CLAUSE,
      memory: true,
    },
    (v) => `\\max(${least},\\ ${v('Fu')})`,
  );
  const area = sheet.step(
    {
      key: 'A',
      meaning: 'required effective area',
      value: unwettedArea(used, gas.area, gas.P1),
      unit: u.A,
      clause: CLAUSE,
      memory: true,
    },
    (v) => `\\frac{${v('F')} \\cdot ${v('A_exposed')}}{\\sqrt{${v('P1')}}}`,
  );
  sheet.output('F_prime_unlimited', free);
  sheet.output('F_prime_used', used);
  sheet.output('A_required', area, u.A);
  letterStep(sheet, area, system);
}

/** e.fire-unwetted: load and required area of a gas-filled vessel in a fire. */
export const FIRE_UNWETTED: Method = {
  id: 'e.fire-unwetted',
  version: 1,
  topic: 'e.fire-unwetted',
  title: 'Fire on a gas-filled vessel: load, F′ and area',
  editions: ['API 521, 5th to 7th edition'],
  source:
    'API Standard 521, unwetted vessels: W = 0.1406 √(M P1) A′ (Tw − T1)^1.25/T1^1.1506 and F′ (constants from memory; the SI constant 0.2772 by conversion)',
  validity:
    'Ideal gas (Z = 1) in a bare vessel whose wall is at T_wall; free convection inside; F′ not below 0.01 (US) or 182 (SI). The device does not protect the wall.',
  inputs: [
    input('M', 'molar mass', 'molar-mass', { rangeKey: 'molarMass' }),
    ...RELIEVING_INPUTS,
    ...EXPOSED_INPUTS,
    optional('T1', 'relieving temperature', 'temperature', { rangeKey: 'relievingTemperature' }),
    optional('normal_pressure', 'normal pressure of the gas, in place of T1', 'pressure-absolute'),
    optional('normal_temperature', 'normal temperature of the gas, in place of T1', 'temperature'),
    optional('T_wall', 'greatest wall temperature (866 K or 1 560 °R when not given)', 'temperature', {
      rangeKey: 'wallTemperature',
    }),
    optional('k', 'ideal-gas ratio of specific heats, for the area', 'dimensionless', { rangeKey: 'kIdeal' }),
    optional('Kd', 'coefficient of discharge (0.975 when not given)', 'dimensionless', { rangeKey: 'kdGas' }),
  ],
  outputs: [
    output('P1', 'relieving pressure', 'pressure-absolute'),
    output('exposed_area', 'surface that the fire reaches', 'area'),
    output('T1', 'relieving temperature', 'temperature'),
    output('relief_load', 'relief load', 'mass-flow'),
    output('F_prime_unlimited', 'factor F′ before its lower limit', 'dimensionless'),
    output('F_prime_used', 'factor F′ used', 'dimensionless'),
    output('A_required', 'required effective area', 'area'),
    output('orifice_letter', 'smallest sufficient letter'),
    output('orifice_effective_area', 'its effective area', 'area'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const system = systemOf(inputs, ['A_exposed', 'D', 'P1', 'set_pressure']);
      const u = SYSTEM_UNITS[system];
      const M = sheet.number('M', u.M, { above: 0 });
      const P1 = relievingAbsolute(sheet, system);
      const area = exposedArea(sheet, system);
      const T1 = relievingTemperature(sheet, P1, system);
      const gas: GasInFire = { M, P1, area, T1, Twall: wallTemperature(sheet, T1, system) };
      const load = sheet.step(
        {
          key: 'W',
          meaning: 'relief load',
          value: unwettedLoad(gas, system),
          unit: u.W,
          clause: CLAUSE,
          memory: true,
        },
        (v) =>
          `${UNWETTED_FORMS[system].factor} \\sqrt{${v('M')} \\cdot ${v('P1')}} \\cdot ${v('A_exposed')} \\cdot \\frac{(${v('T_wall')} - ${v('T1')})^{1.25}}{${v('T1')}^{1.1506}}`,
      );
      sheet.output('T1', T1, u.T);
      sheet.output('relief_load', load, u.W);
      if (sheet.has('k')) areaSteps(sheet, gas, system);
    });
  },
};
