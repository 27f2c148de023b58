/* Figures of register rows: one unit a column where all rows share it, else a small unit in each row. */
import { type Verdict } from '@domain/evaluate';
import { dimensionOf, displayUnit, formatNumber, fromSI, unitLabel } from '@engine/quantity';
import { type Figures } from './ask';

/** A figure of a cell; `unit` is empty while the column's head says it. */
export type Cell = { text: string; unit: string };

/** What a row says of adequacy; all absent where results are hidden. */
export type Sized = {
  governing?: string;
  letter?: string;
  required?: Cell;
  installed?: Cell;
  /** Required on installed area, %. */
  used?: number;
  /** Installed over required, minus one, %. */
  margin?: number;
  verdict?: Verdict;
};

const DECIMALS: Readonly<Record<string, number>> = {
  mm2: 0,
  cm2: 2,
  m2: 4,
  in2: 3,
  bar_g: 2,
  bar_abs: 2,
  bar: 2,
  mbar_g: 1,
  mbar_abs: 1,
  mbar: 1,
  psig: 1,
  psia: 1,
  psi: 1,
  kPa_g: 1,
  kPa_abs: 1,
  kPa: 1,
  inH2O: 2,
};

/** A register's SI figure in the unit of its basis, or in that of the system asked for; null stays nothing. */
export function cellOf(si: number | null, entered: string | null, figures: Figures): Cell | undefined {
  if (si === null || entered === null) return undefined;
  const dimension = dimensionOf(entered);
  const unit = figures === 'entered' || !dimension ? entered : displayUnit(dimension, figures);
  return { text: formatNumber(fromSI(si, unit).value, DECIMALS[unit]), unit: unitLabel(unit) };
}

/** The unit of a set: one without a datum is a vacuum below the atmosphere, and says so. */
export function setUnitWords(unit: string): string {
  return dimensionOf(unit) === 'pressure-difference' ? `${unitLabel(unit)} vacuum` : unitLabel(unit);
}

/** A set pressure or set vacuum. */
export function setCellOf(si: number | null, entered: string | null, figures: Figures): Cell | undefined {
  const cell = cellOf(si, entered, figures);
  const vacuum = entered !== null && setUnitWords(entered).endsWith(' vacuum');
  return cell && vacuum ? { ...cell, unit: `${cell.unit} vacuum` } : cell;
}

type SizedColumns = {
  governingName: string | null;
  letter: string | null;
  requiredSi: number | null;
  requiredUnit: string | null;
  use: number | null;
  margin: number | null;
  verdict: Verdict | null;
};

/** What a row says of adequacy. */
export function sizedOf(
  row: SizedColumns,
  installed: { si: number | null; unit: string | null },
  figures: Figures,
): Sized {
  const required = cellOf(row.requiredSi, row.requiredUnit, figures);
  const has = cellOf(installed.si, installed.unit, figures);
  return {
    ...(row.governingName === null ? {} : { governing: row.governingName }),
    ...(row.letter === null ? {} : { letter: row.letter }),
    ...(required ? { required } : {}),
    ...(has ? { installed: has } : {}),
    ...(row.use === null ? {} : { used: row.use * 100 }),
    ...(row.margin === null ? {} : { margin: row.margin * 100 }),
    ...(row.verdict === null ? {} : { verdict: row.verdict }),
  };
}

/** The one unit of a column, which then stands in its head; nothing when rows differ. */
export function headUnit(cells: readonly (Cell | undefined)[]): string | undefined {
  const units = new Set(cells.flatMap((cell) => cell?.unit ?? []));
  return units.size === 1 ? [...units][0] : undefined;
}
