/* Reading an isentrope: rows given one by one, or a table as pasted from a simulation or a spreadsheet. */
import { dimensionOf, unitLabel } from '../../quantity';
import { toSI } from '../../quantity/convert';
import { unitFromWords } from '../../quantity/words';
import { type IsentropeTable } from '../../nozzle/table';
import { type SheetBuilder } from '../../sheet';

/** More rows than anybody pastes; beyond them the sheet refuses. */
const MAX_ROWS = 2000;

type Row = { P: number; v: number };

/** The names P, P_2, P_3 … that were given, in order. */
function numbered(sheet: SheetBuilder, name: string): string[] {
  const names: string[] = [];
  for (let n = 1; n <= MAX_ROWS + 1; n += 1) {
    const one = n === 1 ? name : `${name}_${n}`;
    if (!sheet.has(one)) break;
    names.push(one);
  }
  return names;
}

function givenRows(sheet: SheetBuilder): Row[] {
  const pressures = numbered(sheet, 'P');
  const byDensity = sheet.has('rho');
  const others = numbered(sheet, byDensity ? 'rho' : 'v');
  if (pressures.length !== others.length)
    sheet.refuse(
      'ROWS_DIFFER',
      byDensity ? 'rho' : 'v',
      `There are ${pressures.length} pressures and ${others.length} ${byDensity ? 'densities' : 'specific volumes'}; each row needs both.`,
    );
  return pressures.map((name, i) => {
    const P = sheet.number(name, 'Pa_abs', { above: 0 });
    const other = others[i] ?? '';
    const v = byDensity
      ? 1 / sheet.number(other, 'kg/m3', { above: 0 })
      : sheet.number(other, 'm3/kg', { above: 0 });
    return { P, v };
  });
}

type Columns = { pressure: string; other: string };

/** The unit in a heading: "kPa_abs", "P (kPa_abs)", "P [bara]", "v / m3/kg", "rho in kg/m3". */
function unitOfHeading(heading: string): string {
  const pieces = [
    heading,
    /[([](.*)[)\]]\s*$/.exec(heading)?.[1],
    /(?:\s\/\s|\sin\s|,\s)(.*)$/.exec(heading)?.[1],
    /(\S+)\s*$/.exec(heading)?.[1],
  ];
  for (const piece of pieces) {
    const unit = piece === undefined ? undefined : unitFromWords(piece.trim());
    if (unit !== undefined) return unit;
  }
  return heading;
}

/** The units named in the line above the rows. */
function columnUnits(sheet: SheetBuilder, head: string): Columns {
  const cells = head
    .split(/[\t;|]+|\s{2,}/)
    .map((cell) => cell.trim())
    .filter(Boolean);
  const words = cells.length >= 2 ? cells : head.trim().split(/[\s,]+/);
  const [pressure, other] = words.slice(0, 2).map(unitOfHeading);
  const dimension = other === undefined ? undefined : dimensionOf(other);
  if (pressure === undefined || dimensionOf(pressure) !== 'pressure-absolute')
    sheet.refuse(
      'UNIT_UNKNOWN',
      'table',
      'The first line of the table must name the units: an absolute pressure such as kPa_abs or bara, then m3/kg or kg/m3.',
    );
  if (other === undefined || (dimension !== 'specific-volume' && dimension !== 'density'))
    sheet.refuse(
      'UNIT_UNKNOWN',
      'table',
      'The second column of the table must be a specific volume such as m3/kg or a density such as kg/m3, named in its first line.',
    );
  return { pressure, other };
}

function pastedRows(sheet: SheetBuilder, text: string): Row[] {
  const lines = text
    .split(/\r?\n/)
    .map((line) => line.trim())
    .filter(Boolean);
  const { pressure, other } = columnUnits(sheet, lines[0] ?? '');
  return lines.slice(1).map((line, i) => {
    const [P, second] = line.split(/[\s;|]+/).map((cell) => Number(cell.replace(/,/g, '')));
    if (P === undefined || second === undefined || !(P > 0) || !(second > 0))
      sheet.refuse(
        'ROW_NOT_READ',
        'table',
        `Row ${i + 1} of the table, "${line.slice(0, 40)}", is not two numbers above nought: a pressure in ${unitLabel(pressure)} and a value in ${unitLabel(other)}.`,
      );
    const value = toSI({ value: second, unit: other });
    return {
      P: toSI({ value: P, unit: pressure }),
      v: dimensionOf(other) === 'density' ? 1 / value : value,
    };
  });
}

/** The isentrope from the inlet down; refuses rows that are not an expansion. */
export function readTable(sheet: SheetBuilder): IsentropeTable {
  const text = sheet.inputs['table'];
  const rows = typeof text === 'string' ? pastedRows(sheet, text) : givenRows(sheet);
  const field = typeof text === 'string' ? 'table' : 'P';
  if (rows.length < 3)
    sheet.refuse(
      'ROWS_MISSING',
      field,
      'An isentrope needs at least three rows, from the inlet down: paste a table, or give P with v or rho row by row.',
    );
  if (rows.length > MAX_ROWS)
    sheet.refuse(
      'ROWS_TOO_MANY',
      field,
      `An isentrope of more than ${MAX_ROWS} rows is not read; thin it out.`,
    );
  const down = rows.toSorted((a, b) => b.P - a.P);
  down.forEach((row, i) => {
    const above = down[i - 1];
    if (above && (row.P >= above.P || row.v < above.v))
      sheet.refuse(
        'NOT_AN_EXPANSION',
        field,
        `Near ${(row.P / 1000).toPrecision(4)} kPa the table is no expansion: along an isentrope the specific volume grows as the pressure falls, and each pressure stands once.`,
      );
  });
  return { P: down.map((row) => row.P), v: down.map((row) => row.v) };
}
