/* A register as comma-separated text, for a spreadsheet: all rows that match, results of hidden documents left out. */
import { formatNumber, fromSI, unitLabel } from '@engine/quantity';
import {
  type Listed,
  listRegister,
  type PointRow,
  type RegisterName,
  type RegisterPage,
  type RegisterRows,
  type SystemRow,
} from '@data/registers';
import { type Actor, type Ctx } from '../../context';
import { hiddenOf } from '../../hidden-view';
import { queryOf, readAsk } from './ask';
import { setUnitWords } from './figures';

const CAUTION =
  'An aid to qualified engineers. Not a substitute for the governing code, the manufacturer’s certified data or a licensed engineer’s judgement. Check the edition in force locally.';

/** A cell: quoted where it must be, and text that a spreadsheet would take for a formula is led by an apostrophe. */
export function csvCell(value: string | number | null | undefined): string {
  if (value === null || value === undefined) return '';
  if (typeof value === 'number') return String(value);
  const safe = /^[=+\-@\t\r]/.test(value) ? `'${value}` : value;
  return /[",\r\n]/.test(safe) ? `"${safe.replaceAll('"', '""')}"` : safe;
}

const plain = (si: number | null, unit: string | null): number | null =>
  si === null || unit === null ? null : Number(fromSI(si, unit).value.toPrecision(6));
const label = (unit: string | null): string | null => (unit === null ? null : unitLabel(unit));
const share = (value: number | null): number | null =>
  value === null ? null : Number((value * 100).toFixed(1));

type Column<R> = [head: string, value: (row: R) => string | number | null];

const SYSTEM_COLUMNS: readonly Column<Listed<SystemRow>>[] = [
  ['System', (row) => row.tag],
  ['Name', (row) => row.name],
  ['Service', (row) => row.service],
  ['Revision in force', (row) => row.revision],
  ['Relief points', (row) => row.devices],
  ['Governing scenario', (row) => row.governingName],
  ['Load', (row) => plain(row.loadSi, row.loadUnit)],
  ['Load unit', (row) => label(row.loadUnit)],
  ['Required area', (row) => plain(row.requiredSi, row.requiredUnit)],
  ['Required unit', (row) => label(row.requiredUnit)],
  ['Installed area', (row) => plain(row.installedSi, row.installedUnit)],
  ['Installed unit', (row) => label(row.installedUnit)],
  ['Letter', (row) => row.letter],
  ['Used %', (row) => share(row.use)],
  ['Margin %', (row) => share(row.margin)],
  ['Verdict', (row) => (row.hidden ? 'hidden' : row.verdict)],
];

const POINT_COLUMNS: readonly Column<Listed<PointRow>>[] = [
  ['Relief point', (row) => row.tag],
  ['System', (row) => row.systemTag],
  ['Protects', (row) => row.equipment],
  ['Kind', (row) => row.kind],
  ['Size', (row) => row.letter],
  ['Set', (row) => plain(row.setSi, row.setUnit)],
  ['Set unit', (row) => (row.setUnit === null ? null : setUnitWords(row.setUnit))],
  ['Area', (row) => plain(row.areaSi, row.areaUnit)],
  ['Area unit', (row) => label(row.areaUnit)],
  ['Governing scenario', (row) => row.governingName],
  ['Required area of the group', (row) => plain(row.requiredSi, row.requiredUnit)],
  ['Required unit', (row) => label(row.requiredUnit)],
  ['Used %', (row) => share(row.use)],
  ['Margin %', (row) => share(row.margin)],
  ['Verdict', (row) => (row.hidden ? 'hidden' : row.verdict)],
];

async function everyRow<N extends RegisterName>(
  ctx: Ctx,
  actor: Actor,
  name: N,
  search: URLSearchParams,
  kindColumn: string,
): Promise<Listed<RegisterRows[N]>[]> {
  const ask = { ...readAsk(name, search), after: '', before: '' };
  const query = { ...queryOf(ask, actor, await hiddenOf(ctx, actor), kindColumn), limit: 2_000 };
  const rows: Listed<RegisterRows[N]>[] = [];
  let next: string | null = '';
  while (next !== null) {
    const cursor: { cursor?: string } = next === '' ? {} : { cursor: next };
    const page: RegisterPage<RegisterRows[N]> = await listRegister(ctx.db, name, { ...query, ...cursor });
    rows.push(...page.rows);
    next = page.next;
  }
  return rows;
}

function textOf<R>(columns: readonly Column<R>[], rows: readonly R[], actor: Actor, at: string): string {
  const lines = [
    columns.map(([head]) => head),
    ...rows.map((row) => columns.map(([, value]) => value(row))),
    [],
    [`${actor.site.name}, in force at ${at}, ${formatNumber(rows.length, 0)} rows`],
    [CAUTION],
  ];
  // The mark of byte order tells a spreadsheet that the text is UTF-8.
  return `\uFEFF${lines.map((line) => line.map(csvCell).join(',')).join('\r\n')}\r\n`;
}

/** The register of systems as CSV. */
export async function systemsCsv(ctx: Ctx, actor: Actor, search: URLSearchParams): Promise<string> {
  const rows = await everyRow(ctx, actor, 'systems', search, 'governingName');
  return textOf(SYSTEM_COLUMNS, rows, actor, ctx.now().toISOString());
}

/** The register of relief points as CSV. */
export async function pointsCsv(ctx: Ctx, actor: Actor, search: URLSearchParams): Promise<string> {
  const rows = await everyRow(ctx, actor, 'points', search, 'kind');
  return textOf(POINT_COLUMNS, rows, actor, ctx.now().toISOString());
}
