/* Bare factors of steam sizing: the high-pressure correction KN and the superheat correction KSH of both tables. */
import { interpolateTable, type Table } from '../../numeric';
import { type System } from '../common/system';
import { KSH_10E_ROWS, KSH_10E_TEMPERATURES } from './ksh-10e';
import { KSH_7E_ROWS, KSH_7E_TEMPERATURES } from './ksh-7e';

/** The two superheat tables, by the words of the reference topics. */
export const KSH_TABLES = ['API 520-1 10th edition', 'API 520-1 7th to 9th edition'] as const;

/** Which superheat table. */
export type KshTable = (typeof KSH_TABLES)[number];

/** Printed constants of the steam equation A = c·W/(P1·Kd·Kb·Kc·KN·KSH) and of KN; US and SI from memory of API 520-1. */
export const STEAM_FORMS = {
  SI: { c: 190.5, from: 10339, to: 22057, kn: [0.02764, 1000, 0.03324, 1061] },
  US: { c: 1 / 51.5, from: 1500, to: 3200, kn: [0.1906, 1000, 0.2292, 1061] },
} as const;

/** High-pressure correction KN at P1 in kPa or psi absolute: 1 up to 10 339 kPa (1 500 psia); undefined above 22 057 kPa. */
export function steamKN(P1: number, system: System): number | undefined {
  const { from, to, kn } = STEAM_FORMS[system];
  if (P1 <= from) return 1;
  if (P1 > to) return undefined;
  const [a, b, c, d] = kn;
  return (a * P1 - b) / (c * P1 - d);
}

function tableOf(columns: readonly number[], rows: readonly string[]): Table {
  const split = rows.map((row) => row.split(': '));
  return {
    columns,
    rows: split.map(([heading]) => Number(heading)),
    values: split.map(([, cells = '']) => cells.split(' ').map(Number)),
  };
}

const TABLE_7E = tableOf(KSH_7E_TEMPERATURES, KSH_7E_ROWS);
const TABLE_10E = tableOf(KSH_10E_TEMPERATURES, KSH_10E_ROWS);

/**
 * KSH of the 7th to 9th editions at a relieving pressure in psig and a temperature in °F, bilinear. 1 below 300 °F;
 * below the first row that row is taken. Undefined above 3 000 psig or 1 200 °F.
 */
export function ksh7(psig: number, degF: number): number | undefined {
  if (degF < 300) return 1;
  return interpolateTable(TABLE_7E, Math.max(psig, TABLE_7E.rows[0] ?? 0), degF);
}

/**
 * KSH of the 10th edition at a relieving pressure in kPa absolute and a temperature in °C, bilinear. 1 below 205 °C;
 * below the first row that row is taken. Undefined above 22 000 kPa or 625 °C.
 */
export function ksh10(kPa: number, degC: number): number | undefined {
  if (degC < 205) return 1;
  return interpolateTable(TABLE_10E, Math.max(kPa, TABLE_10E.rows[0] ?? 0), degC);
}

/** Required effective area for steam (Napier form of API 520-1), in mm² or in². */
export function steamArea(
  s: { W: number; P1: number; Kd: number; Kb: number; Kc: number; KN: number; KSH: number },
  system: System,
): number {
  return (STEAM_FORMS[system].c * s.W) / (s.P1 * s.Kd * s.Kb * s.Kc * s.KN * s.KSH);
}
