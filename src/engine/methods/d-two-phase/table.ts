/* Method d.isentrope-table-integration: mass flux along an isentrope that was tabulated elsewhere, and the required area. */
import { type Method } from '../../catalog/types';
import { type SheetBuilder, texNumber, workSheet } from '../../sheet';
import { type IsentropeTable, smoothThroat, trapezoidThroat, trapezoidWork } from '../../nozzle/table';
import { optional, output } from '../common/describe';
import { SYSTEM_UNITS, type System, systemOf } from '../common/system';
import { AREA_OUTPUTS, areaSteps, FACTOR_INPUTS, FLUX_UNITS, readBack } from './common';
import { readTable } from './pasted';
import { inSI, warnShortNozzle } from './warnings';

const CLAUSE = 'API 520-1 Annex B, numerical integration of an isentropic nozzle';

/** Warns where the table is too coarse, or ends before the flux has passed its maximum. */
function warnTable(sheet: SheetBuilder, table: IsentropeTable, choked: boolean, Pb: number): void {
  const lowest = table.P[table.P.length - 1] ?? 0;
  if (!choked && lowest > Pb)
    sheet.warn(
      'TABLE_TOO_SHORT',
      'The mass flux still rises at the last row, which lies above the back pressure: the table ends before the throat. Give rows at lower pressures.',
    );
  if (table.P.length < 8)
    sheet.warn(
      'TABLE_COARSE',
      `The table has ${table.P.length} rows; with fewer than 8 the trapezia may be off by more than 1 %.`,
      'at least 8 rows',
    );
}

/** The rows about the throat, each reworkable by hand; gives the flux by trapezia in kg/(m²·s). */
function throatSteps(sheet: SheetBuilder, table: IsentropeTable, Pb: number): number {
  const throat = trapezoidThroat(table, Pb);
  const work = trapezoidWork(table);
  const rows = [throat.row - 1, throat.row, throat.row + 1].filter((i) => i > 0 && i < table.P.length);
  for (const i of rows) {
    const P = table.P[i] ?? 0;
    const key = String(i + 1);
    sheet.keep(`w${key}`, work[i] ?? 0, `w_{${key}}`);
    sheet.keep(`v${key}`, table.v[i] ?? 0, `v_{${key}}`);
    sheet.step(
      {
        key: `w${key}`,
        tex: `w_{${key}}`,
        meaning: `twice the work down to row ${key}, ${(P / 1000).toPrecision(5)} kPa`,
        value: work[i] ?? 0,
        unit: 'J/kg',
        clause: CLAUSE,
        memory: true,
      },
      () => `\\sum_{i=2}^{${key}} (v_i + v_{i-1})(P_{i-1} - P_i)`,
    );
    sheet.step(
      {
        key: `G${key}`,
        tex: `G_{${key}}`,
        meaning: i === throat.row ? 'mass flux at this row, the greatest' : 'mass flux at this row',
        value: Math.sqrt(work[i] ?? 0) / (table.v[i] ?? 1),
        unit: 'kg/(m2.s)',
        clause: CLAUSE,
      },
      (v) => `\\frac{\\sqrt{${v(`w${key}`)}}}{${v(`v${key}`)}}`,
    );
  }
  sheet.output('mass_flux_trapezoid', throat.flux, 'kg/(m2.s)');
  sheet.output('throat_pressure_grid_point', throat.P / 1000, 'kPa_abs');
  sheet.output('choked', throat.choked);
  warnTable(sheet, table, throat.choked, Pb);
  return throat.flux;
}

function smoothStep(sheet: SheetBuilder, table: IsentropeTable, Pb: number): void {
  const smooth = smoothThroat(table, Pb);
  if (!smooth) return;
  const exact = sheet.step(
    {
      key: 'G_s',
      meaning: 'mass flux on a smooth monotone curve through the rows, to which finer rows would lead',
      value: smooth.flux,
      unit: 'kg/(m2.s)',
      clause: CLAUSE,
    },
    () =>
      `\\max_P \\frac{1}{v(P)} \\sqrt{2 \\int_P^{P_1} v\\,dP},\\quad P = ${texNumber(smooth.P / 1000)}\\,\\text{kPa}`,
  );
  sheet.output('mass_flux_exact', exact, 'kg/(m2.s)');
}

function sizeSteps(sheet: SheetBuilder, system: System, flux: number): void {
  if (!sheet.has('W')) return;
  const W = sheet.number('W', SYSTEM_UNITS[system].W, { above: 0 });
  const unit = FLUX_UNITS[system].G;
  const G = inSI(flux, 'kg/(m2.s)', unit);
  if (system === 'SI') sheet.keep('G', G);
  else sheet.step({ key: 'G', meaning: 'mass flux in customary units', value: G, unit }, () => 'G_{\\max}');
  areaSteps(sheet, system, { W, G, Kd: 0.85 });
}

/** d.isentrope-table-integration: the frictionless nozzle on a pasted isentrope. */
export const ISENTROPE_TABLE: Method = {
  id: 'd.isentrope-table-integration',
  version: 1,
  topic: 'd.isentrope-table-integration',
  title: 'Nozzle on a tabulated isentrope: mass flux and required area',
  editions: ['API 520-1, 7th to 10th edition'],
  source:
    'API Standard 520 Part I Annex B, numerical integration of −v dP along an isentrope (from memory); monotone curve after Fritsch and Carlson 1980',
  validity:
    'Frictionless homogeneous equilibrium; the rows lie on one isentrope from the inlet at rest down past the throat; at least 8 rows, close together where flashing begins.',
  inputs: [
    optional('fluid', 'name of the fluid, for the record'),
    optional(
      'table',
      'pasted table: a line of units, then a pressure and a specific volume or density in each line',
    ),
    optional('P', 'absolute pressure', 'pressure-absolute', { each: 'row' }),
    optional('v', 'specific volume', 'specific-volume', { each: 'row' }),
    optional('rho', 'density', 'density', { each: 'row' }),
    optional('back_pressure', 'total back pressure (the last row when not given)', 'pressure-absolute'),
    optional('atmospheric_pressure', 'barometric pressure', 'pressure-absolute', { rangeKey: 'barometer' }),
    optional('W', 'required relief load, for an area', 'mass-flow', { rangeKey: 'reliefLoad' }),
    ...FACTOR_INPUTS,
    optional('nozzle_length', 'flow length of the nozzle', 'length'),
  ],
  outputs: [
    output('mass_flux_trapezoid', 'greatest mass flux by trapezia on the rows', 'mass-flux'),
    output('throat_pressure_grid_point', 'pressure of that row', 'pressure-absolute'),
    output('choked', 'whether the flux passes a maximum above the back pressure'),
    output('mass_flux_exact', 'mass flux on a smooth curve through the rows', 'mass-flux'),
    ...AREA_OUTPUTS,
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const system = systemOf(inputs, ['W', 'P']);
      const table = readTable(sheet);
      const Pb = sheet.has('back_pressure') ? readBack(sheet, table.P[0] ?? 0) : 0;
      const flux = throatSteps(sheet, table, Pb);
      smoothStep(sheet, table, Pb);
      warnShortNozzle(sheet);
      sizeSteps(sheet, system, flux);
    });
  },
};
