/* Differences of a case: field by field from the base to the working revision, results that moved, and what a carry-over would meet. */
import { capital, describePath, type Basis } from '@domain/basis';
import { can } from '@domain/case';
import { movedResults, type MovedResult } from '@domain/difference';
import { groupLabel } from '@domain/projections';
import { ok, type Result } from '@domain/result';
import { formatNumber, type Q } from '@engine/quantity';
import { type CaseDocumentFile, onFile } from '../../case-file';
import { whoOf } from '../../context';
import { mergeOnto } from '../../stage/carry-over';
import { OUTPUT_WORDS, resultLabel } from '../result-label';
import { inline, shownQ } from '../shown';
import { toldApart } from '../told-apart';
import { newKey } from '../../form-key';
import { changeHref } from './addresses';
import { differenceRows, type DifferenceRowView } from './difference-rows';
import { noteLook, type OpenedCase } from './open';
import { shownAny } from './shown-values';
import { systemOf, type SystemTab, systemTabs } from './systems';

export type MovedRow = { what: string; old: string; now: string; shift: string; strong: boolean };
export type ConflictRow = { where: string; href: string; base: string; ours: string; theirs: string };
export type CarryOver = {
  inForce: string;
  conflicts: ConflictRow[];
  /** The form's fields, for whoever may carry it over. */
  act?: { action: string; version: number; key: string; document: string };
  whyNot?: string;
};
export type DifferencesView = {
  tabs: SystemTab[];
  system: string;
  hidden: boolean;
  oldHead: string;
  sections: { name: string; rows: DifferenceRowView[] }[];
  count: number;
  moved: MovedRow[];
  carryOver: CarryOver | null;
  why?: string;
};

const SHEET = /^sheets\/([^#]+)#(\w+)$/;
/** Results that decide; the others are steps on the way and stand on their sheets. */
const SHOWN =
  /^(?:sheets\/.*#(?:relief_load|A_required|P1|use|verdict)|groups\/.*#(?:use|required|installed)|points\/.*#(?!verdict)\w+)$/;

function resultName(doc: Basis, path: string): string {
  const sheet = SHEET.exec(path);
  if (sheet) return resultLabel(doc, sheet[1] ?? '', sheet[2] ?? '');
  const [place = '', output] = path.split('#');
  const [list, id = ''] = place.split('/');
  const group = list === 'groups' ? doc.groups.find((one) => one.id === id) : undefined;
  const point = list === 'points' ? doc.reliefPoints.find((one) => one.id === id) : undefined;
  const name = group ? groupLabel(doc, group) : (point?.tag ?? capital(describePath(doc, place).label));
  return `${name}, ${output === undefined ? 'verdict' : (OUTPUT_WORDS[output] ?? output.replaceAll('_', ' '))}`;
}

function valueWords(value: Q | string | undefined): string {
  if (value === undefined) return '–';
  return typeof value === 'string' ? value.replaceAll('-', ' ') : inline(shownQ(value));
}

function resultWords({ path, old, now }: MovedResult): [string, string] {
  const both = (value: Q | string | undefined): value is Q => typeof value === 'object';
  if (!both(old) || !both(now)) return [valueWords(old), valueWords(now)];
  if (!path.endsWith('#use')) return toldApart(old, now);
  const percent = (value: Q): Q => ({ value: value.value * 100, unit: '%' });
  const words = (value: Q) => `${formatNumber(value.value * 100, 1)}\u00a0%`;
  return words(old) === words(now) ? toldApart(percent(old), percent(now)) : [words(old), words(now)];
}

function shiftWords(shift: number | undefined): string {
  if (shift === undefined) return '';
  return `${shift > 0 ? '+' : ''}${formatNumber(shift * 100, 1)}\u00a0%`;
}

function movedRow(doc: Basis, one: MovedResult): MovedRow {
  const [old, now] = resultWords(one);
  return {
    what: resultName(doc, one.path),
    old,
    now,
    shift: one.verdict ? '' : shiftWords(one.shift),
    strong: one.verdict,
  };
}

function movedRows(one: CaseDocumentFile): MovedRow[] {
  const { before, after } = one;
  if (!before || !after) return [];
  return movedResults(before.evaluation, after.evaluation)
    .filter((moved) => moved.verdict || SHOWN.test(moved.path))
    .map((moved) => movedRow(after.body, moved));
}

async function carryOverOf(of: OpenedCase, one: CaseDocumentFile, part: string): Promise<CarryOver | null> {
  const merge = await mergeOnto(of.ctx.db, one);
  if (!merge) return null;
  const may = can(whoOf(of.actor), 'CARRY_OVER', onFile(of.file));
  const words = (value: unknown) => (of.hidden ? '[hidden]' : inline(shownAny(merge.merged, value)));
  const { row } = of.file;
  return {
    inForce: `Rev ${String(one.inForce?.number ?? '')}`,
    conflicts: merge.conflicts.map((conflict) => ({
      where: capital(conflict.label),
      href: `${part}#${encodeURIComponent(conflict.path)}`,
      base: words(conflict.base),
      ours: words(conflict.ours),
      theirs: words(conflict.theirs),
    })),
    ...(may.ok
      ? {
          act: {
            action: `/api/v1/sites/${of.file.site.slug}/cases/${row.number}/acts/CARRY_OVER`,
            version: row.version,
            key: newKey(),
            document: one.document.id,
          },
        }
      : { whyNot: may.sentence }),
  };
}

function bySection(rows: readonly DifferenceRowView[]): { name: string; rows: DifferenceRowView[] }[] {
  const names = [...new Set(rows.map((row) => row.section))];
  return names.map((name) => ({ name, rows: rows.filter((row) => row.section === name) }));
}

/** The differences of one system of a case; values and moved results are left out where they are hidden. */
export async function differencesView(of: OpenedCase, tag: string | null): Promise<Result<DifferencesView>> {
  const found = systemOf(of, tag);
  if (!found.ok) return found;
  const one = found.value;
  await noteLook(of, `differences ${one.document.tag}`);
  const base = `/s/${of.file.site.slug}/cases/${of.file.row.number}`;
  const query = `?system=${encodeURIComponent(one.document.tag)}`;
  const hrefOf = (change: { path: string }) => {
    const [list, id = ''] = change.path.split('/');
    return list === 'scenarios'
      ? `${base}/scenarios${query}#${encodeURIComponent(id)}`
      : changeHref(base, one.document.tag, change.path);
  };
  const rows =
    one.before && one.after ? differenceRows(one.before.body, one.after.body, hrefOf, of.hidden) : [];
  const number = one.base?.number;
  return ok({
    tabs: systemTabs(of, 'differences', one.document.tag),
    system: one.document.tag,
    hidden: of.hidden,
    oldHead: number == null ? 'Base' : `Rev ${String(number)}`,
    sections: bySection(rows),
    count: rows.length,
    moved: of.hidden ? [] : movedRows(one),
    carryOver: await carryOverOf(of, one, `${base}/changes${query}`),
    ...(one.working
      ? {}
      : { why: `${one.document.tag} has no working revision yet: it is made when the draft is passed.` }),
  });
}
