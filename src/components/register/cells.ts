/* Cells of register rows as markup: many rows a page, so they are joined as text. */
import { escapeText } from '../pictures/draw';
import { ratioBar } from '../pictures/orifice';
import { VERDICT_WORDS, verdictMark, type VerdictWord } from '../pictures/marks';
import { formatNumber } from '@engine/quantity';
import { type CaseLink, type Cell, type Sized } from '@services/views/register';

export const HIDDEN = 'Hidden until your own figures are in';

/** A link whose text and address are escaped. */
export function link(href: string, text: string): string {
  return `<a href="${escapeText(href)}">${escapeText(text)}</a>`;
}

/** Text, escaped. */
export const words = (text: string | undefined): string => escapeText(text ?? '');

/** A figure, with its small unit where the head does not say it. */
export function figure(cell: Cell | undefined): string {
  if (!cell) return '–';
  return cell.unit === '' ? cell.text : `${cell.text}\u00a0<small class="u">${escapeText(cell.unit)}</small>`;
}

/** A percentage without its sign, which the head has. */
export const percent = (value: number | undefined): string =>
  value === undefined ? '–' : formatNumber(value, 1);

/** Mark and word. */
export function verdict(of: VerdictWord | undefined): string {
  return of === undefined ? '' : `<span class="verdict ${of}">${verdictMark(of)}${VERDICT_WORDS[of]}</span>`;
}

/** Open cases as links. */
export function cases(links: readonly CaseLink[]): string {
  return links.map((one) => link(one.href, one.number)).join(', ');
}

/** The cells from the governing scenario to the verdict, the same in both registers. */
export function sizedCells(row: Sized): string {
  return [
    `<td class="why-governs">${words(row.governing ?? 'Not decided')}</td>`,
    `<td class="n">${figure(row.required)}</td>`,
    `<td class="n">${figure(row.installed)}</td>`,
    `<td class="bar">${ratioBar({ used: row.used })}</td>`,
    `<td class="n">${percent(row.used)}</td>`,
    `<td class="n">${percent(row.margin)}</td>`,
    `<td>${verdict(row.verdict)}</td>`,
  ].join('');
}

/** How many columns `sizedCells` fills. */
export const SIZED_COLUMNS = 7;

/** Hatched film over the results of a hidden row. */
export const coveredCells = (columns: number): string =>
  `<td class="covered" colspan="${String(columns)}"><span>${HIDDEN}</span></td>`;

/** The phone's list form of one row; `note` and `fig` are markup. */
export function listItem(of: {
  href: string;
  tag: string;
  note: string;
  fig: string;
  row: Sized & { hidden: boolean };
  waiting?: string;
}): string {
  const { row } = of;
  const head = `<a class="tag" href="${escapeText(of.href)}">${escapeText(of.tag)}</a>`;
  if (row.hidden)
    return `<li>${head}<span></span><span class="note">${of.note}</span><span class="fig"></span><span class="covered"><span>${HIDDEN}</span></span></li>`;
  return [
    `<li>${head}${verdict(row.verdict)}`,
    `<span class="note">${of.note}</span><span class="fig">${of.fig}</span>`,
    `${ratioBar({ used: row.used, width: 168, height: 20 })}<span class="fig">${percent(row.used)}${row.used === undefined ? '' : '\u00a0%'}</span>`,
    of.waiting === undefined ? '' : `<span class="note also">${of.waiting}</span>`,
    '</li>',
  ].join('');
}

/** Rows of a view that is at hand are joined once. */
function joinedOnce() {
  const known = new WeakMap<object, string>();
  return <L>(view: { rows: L[] }, markup: (line: L) => string): string => {
    const before = known.get(view);
    if (before !== undefined) return before;
    const made = view.rows.map(markup).join('');
    known.set(view, made);
    return made;
  };
}

/** The table rows of a register page. */
export const rowsOf = joinedOnce();
/** The list items of a register page on a phone. */
export const itemsOf = joinedOnce();
