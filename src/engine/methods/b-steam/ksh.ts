/* Method b.steam-KSH: the superheat correction by the tables of either edition. */
import { type Method } from '../../catalog/types';
import { type SheetBuilder, workSheet } from '../../sheet';
import { optional, output } from '../common/describe';
import { ksh10, ksh7 } from './factors';

/** Gives one edition's factor when its two inputs are there. */
function lookUp(
  sheet: SheetBuilder,
  tag: '7E' | '10E',
  units: { pressure: string; temperature: string },
  table: (pressure: number, temperature: number) => number | undefined,
): void {
  if (!sheet.has(`pressure_${tag}`) && !sheet.has(`temperature_${tag}`)) return;
  const pressure = sheet.number(`pressure_${tag}`, units.pressure, { min: 0 }, 'P');
  const temperature = sheet.number(`temperature_${tag}`, units.temperature, {}, 'T');
  const value = table(pressure, temperature);
  if (value === undefined)
    sheet.refuse(
      'OUTSIDE_TABLE',
      `pressure_${tag}`,
      'The superheat table does not reach this pressure and temperature; size the steam as a real gas.',
    );
  sheet.step(
    {
      key: `KSH_${tag}`,
      tex: 'K_{SH}',
      meaning: `superheat correction, ${tag} table`,
      value,
      unit: '-',
      clause: 'API 520-1, superheat correction table',
    },
    (v) => `\\text{table at } ${v(`pressure_${tag}`)},\\ ${v(`temperature_${tag}`)}`,
  );
  sheet.output(`KSH_${tag}`, value);
}

/** b.steam-KSH: superheat correction of both tables. */
export const STEAM_KSH: Method = {
  id: 'b.steam-KSH',
  version: 1,
  topic: 'b.steam-KSH',
  title: 'Superheat correction KSH',
  editions: ['API 520-1, 7th to 9th edition', 'API 520-1, 10th edition'],
  source: 'API Standard 520 Part I, superheat tables, as transcribed in the open library CalebBell/fluids',
  validity:
    '7th to 9th edition: up to 3 000 psig and 1 200 °F; 10th edition: up to 22 000 kPa absolute and 625 °C; bilinear between nodes.',
  inputs: [
    optional('pressure_7E', 'relieving pressure for the 7th to 9th edition table', 'pressure-gauge'),
    optional('temperature_7E', 'temperature for the 7th to 9th edition table', 'temperature'),
    optional('pressure_10E', 'relieving pressure for the 10th edition table', 'pressure-absolute'),
    optional('temperature_10E', 'temperature for the 10th edition table', 'temperature'),
  ],
  outputs: [
    output('KSH_7E', 'factor of the 7th to 9th editions', 'dimensionless'),
    output('KSH_10E', 'factor of the 10th edition', 'dimensionless'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      lookUp(sheet, '7E', { pressure: 'psig', temperature: 'degF' }, ksh7);
      lookUp(sheet, '10E', { pressure: 'kPa_abs', temperature: 'degC' }, ksh10);
      if (Object.keys(sheet.outputs).length === 0)
        sheet.refuse(
          'INPUT_MISSING',
          'pressure_10E',
          'A pressure and a temperature for one of the two tables are missing.',
        );
    });
  },
};
