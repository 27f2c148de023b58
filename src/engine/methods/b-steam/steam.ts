/* Method b.steam: required effective area for steam, with the high-pressure and superheat corrections. */
import { type Method } from '../../catalog/types';
import { convert } from '../../quantity';
import { type SheetBuilder, workSheet } from '../../sheet';
import { saturationTemperature } from '../../water/saturation';
import { input, optional, output, RELIEVING_INPUTS } from '../common/describe';
import { letterStep } from '../common/letter-step';
import { absolutePressure, relievingAbsolute } from '../common/pressures';
import { SYSTEM_UNITS, type System, systemOf } from '../common/system';
import { ksh10, KSH_TABLES, ksh7, steamArea, STEAM_FORMS, steamKN, type KshTable } from './factors';

const CLAUSE = 'API 520-1, sizing for steam relief';

/** The table's factor at this state; the 7th to 9th edition table is entered with the gauge pressure at 14.7 psi. */
function tableValue(table: KshTable, P1: number, unit: string, kelvin: number): number | undefined {
  const P = { value: P1, unit };
  const T = { value: kelvin, unit: 'K' };
  if (table === 'API 520-1 10th edition') return ksh10(convert(P, 'kPa_abs'), convert(T, 'degC'));
  const barometer = { value: 14.7, unit: 'psia' };
  return ksh7(convert(P, 'psig', { barometer }), convert(T, 'degF'));
}

/** How far below saturation a temperature may be, K, before it is more than the rounding of a steam table. */
const ROUNDING = 1;

/** Warns when the temperature given is that of water, not of steam, at the relieving pressure. */
function warnBelowSaturation(sheet: SheetBuilder, P1: number, unit: string, T: number): void {
  const boiling = saturationTemperature(convert({ value: P1, unit }, 'Pa_abs'));
  if (boiling === undefined || T >= boiling - ROUNDING) return;
  sheet.warn(
    'BELOW_SATURATION',
    `At this pressure steam is saturated at ${boiling.toFixed(1)} K (${(boiling - 273.15).toFixed(1)} °C, IAPWS-IF97); at the temperature given it is water. Size it as a liquid or as two-phase flow, or correct the temperature.`,
    'at or above saturation',
  );
}

/** KSH as given, from a table when a temperature is given, or 1 with the saturated steam said. */
function superheat(sheet: SheetBuilder, P1: number, system: System, edition: string | undefined): number {
  if (sheet.has('KSH')) return sheet.number('KSH', '-', { above: 0, max: 1 }, 'K_{SH}');
  if (!sheet.has('T'))
    sheet.refuse(
      'INPUT_MISSING',
      'KSH',
      'Say KSH = 1 for saturated steam, or give the temperature T so that the superheat table can be read.',
    );
  const seventh = edition !== undefined && /\b[789]th/.test(edition) && !edition.includes('10th');
  const table = sheet.word('KSH_table', KSH_TABLES, KSH_TABLES[seventh ? 1 : 0]);
  const T = sheet.number('T', 'K', { above: 0 });
  warnBelowSaturation(sheet, P1, SYSTEM_UNITS[system].P, T);
  const value = tableValue(table, P1, SYSTEM_UNITS[system].P, T);
  if (value === undefined)
    sheet.refuse(
      'OUTSIDE_TABLE',
      'T',
      `The superheat table of ${table} does not reach this pressure and temperature; size the steam as a real gas.`,
    );
  return sheet.step(
    {
      key: 'KSH',
      tex: 'K_{SH}',
      meaning: `superheat correction, ${table}`,
      value,
      unit: '-',
      clause: `${table}, superheat correction table`,
    },
    (v) => `\\text{table at } ${v('P1')},\\ ${v('T')}\\,\\text{K}`,
  );
}

function highPressure(sheet: SheetBuilder, P1: number, system: System): number {
  const { from, kn } = STEAM_FORMS[system];
  const KN = steamKN(P1, system);
  if (KN === undefined)
    sheet.refuse(
      'OUTSIDE_RANGE',
      'P1',
      'The steam equation ends at 22 057 kPa (3 200 psi) absolute; size the steam as a real gas.',
    );
  const [a, b, c, d] = kn;
  sheet.step(
    {
      key: 'KN',
      tex: 'K_N',
      meaning: 'correction for high pressure',
      value: KN,
      unit: '-',
      clause: `${CLAUSE}, KN`,
      memory: true,
    },
    (v) =>
      P1 <= from
        ? `1 \\quad (${v('P1')} \\le ${from})`
        : `\\frac{${a} \\cdot ${v('P1')} - ${b}}{${c} \\cdot ${v('P1')} - ${d}}`,
  );
  return KN;
}

function areaStep(sheet: SheetBuilder, area: number, system: System): number {
  const factors = (v: (key: string) => string) =>
    ['P1', 'Kd', 'Kb', 'Kc', 'KN', 'KSH'].map(v).join(' \\cdot ');
  return sheet.step(
    {
      key: 'A',
      meaning: 'required effective area',
      value: area,
      unit: SYSTEM_UNITS[system].A,
      clause: CLAUSE,
    },
    (v) =>
      system === 'SI'
        ? `\\frac{190.5 \\cdot ${v('W')}}{${factors(v)}}`
        : `\\frac{${v('W')}}{51.5 \\cdot ${factors(v)}}`,
  );
}

/** b.steam: required effective area for steam. */
export const STEAM: Method = {
  id: 'b.steam',
  version: 1,
  topic: 'b.steam',
  title: 'Steam: required effective area',
  editions: ['API 520-1, 10th edition', 'API 520-1, 7th to 9th edition'],
  source:
    'API Standard 520 Part I, steam (Napier) equation; 190.5 form and KN read in the open library CalebBell/fluids, 51.5 form from memory',
  validity: 'Saturated or superheated steam up to 22 057 kPa (3 200 psi) absolute; critical flow.',
  inputs: [
    input('W', 'required relief load', 'mass-flow', { rangeKey: 'reliefLoad' }),
    ...RELIEVING_INPUTS,
    optional('P2', 'total back pressure', 'pressure-absolute'),
    optional('KSH', 'superheat correction (1 for saturated steam)', 'dimensionless', { rangeKey: 'ksh' }),
    optional('T', 'relieving temperature, to read KSH from the table', 'temperature', {
      rangeKey: 'relievingTemperature',
    }),
    optional('KSH_table', 'which superheat table', undefined, { words: [...KSH_TABLES] }),
    optional('Kd', 'effective coefficient of discharge (0.975 when not given)', 'dimensionless', {
      rangeKey: 'kdGas',
    }),
    optional('Kb', 'back-pressure factor (1 when not given)', 'dimensionless', { rangeKey: 'kb' }),
    optional('Kc', 'combination factor with a rupture disk (1 when not given)', 'dimensionless', {
      rangeKey: 'kc',
    }),
  ],
  outputs: [
    output('P1', 'relieving pressure', 'pressure-absolute'),
    output('KN', 'correction for high pressure', 'dimensionless'),
    output('KSH', 'superheat correction', 'dimensionless'),
    output('A_required', 'required effective area', 'area'),
    output('orifice_letter', 'smallest sufficient letter'),
    output('orifice_effective_area', 'its effective area', 'area'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const system = systemOf(inputs, ['W', 'P1', 'set_pressure']);
      const W = sheet.number('W', SYSTEM_UNITS[system].W, { above: 0 });
      const P1 = relievingAbsolute(sheet, system);
      if (sheet.has('P2')) checkBack(sheet, P1, absolutePressure(sheet, 'P2', 'P_2', system));
      const factor = (name: string, tex: string, fallback: number) =>
        sheet.number(name, '-', { above: 0, max: 1, fallback }, tex);
      const [Kd, Kb, Kc] = [factor('Kd', 'K_d', 0.975), factor('Kb', 'K_b', 1), factor('Kc', 'K_c', 1)];
      const KN = highPressure(sheet, P1, system);
      const KSH = superheat(sheet, P1, system, edition);
      const area = areaStep(sheet, steamArea({ W, P1, Kd, Kb, Kc, KN, KSH }, system), system);
      sheet.output('KN', KN);
      sheet.output('KSH', KSH);
      sheet.output('A_required', area, SYSTEM_UNITS[system].A);
      letterStep(sheet, area, system);
    });
  },
};

/** Steam with its equation only for critical flow: the back pressure must leave it critical (ratio 0.55 to 0.58). */
function checkBack(sheet: SheetBuilder, P1: number, P2: number): void {
  if (P2 >= P1)
    sheet.refuse('NO_FLOW', 'P2', 'The relieving pressure is not above the back pressure: nothing can flow.');
  if (P2 > 0.55 * P1)
    sheet.warn(
      'MAYBE_SUBCRITICAL',
      'The back pressure is above 55 % of the relieving pressure: the steam equation, which is for critical flow, may not hold.',
      'P2 up to 0.55 P1',
    );
}
