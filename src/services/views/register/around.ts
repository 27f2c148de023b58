/* What stands around the rows of a register: counts of the tabs, choices of the filters, open cases, the approved truth. */
import { openCasesOf } from '@data/cases';
import { countBy, type Listed, type RegisterName } from '@data/registers';
import { listUnits, type UnitRow } from '@data/site';
import { type Actor, type Ctx } from '../../context';
import { type Hidden } from '../../hidden-view';
import { type Ask, VERDICTS } from './ask';

export type Choice = { value: string; label: string };
export type CaseLink = { number: string; href: string };
export type Tab = { label: string; href: string; count: number; current: boolean };

export type Around = {
  total: number;
  tabs: Tab[];
  units: UnitRow[];
  unitChoices: Choice[];
  kindChoices: Choice[];
  verdictChoices: Choice[];
};

const VERDICT_LABELS: Record<(typeof VERDICTS)[number], string> = {
  adequate: 'Adequate',
  marginal: 'Marginal',
  inadequate: 'Inadequate',
  'not-sized': 'Not sized',
};

const sum = (counts: readonly { count: number }[]) => counts.reduce((total, one) => total + one.count, 0);

/** Counts and choices of a register; they count rows, never results of hidden documents. */
export async function aroundOf(
  ctx: Ctx,
  actor: Actor,
  hidden: Hidden,
  of: { name: RegisterName; kindColumn: string; anyKind: string },
): Promise<Around> {
  const all = { siteId: actor.site.id, hidden: hidden.documents };
  const base = `/s/${actor.site.slug}/register`;
  const [systems, points, kinds, units] = await Promise.all([
    countBy(ctx.db, 'systems', all, 'grade').then(sum),
    countBy(ctx.db, 'points', all, 'service').then(sum),
    countBy(ctx.db, of.name, all, of.kindColumn),
    listUnits(ctx.db, actor.site.id),
  ]);
  const tab = (label: string, path: string, count: number, name: RegisterName): Tab => ({
    label,
    href: `${base}/${path}`,
    count,
    current: name === of.name,
  });
  return {
    total: of.name === 'systems' ? systems : points,
    tabs: [
      tab('Systems', 'systems', systems, 'systems'),
      tab('Relief points', 'relief-points', points, 'points'),
    ],
    units,
    unitChoices: [
      { value: '', label: 'Any unit' },
      ...units.map((unit) => ({ value: unit.id, label: `${unit.tag}, ${unit.name}` })),
    ],
    kindChoices: [
      { value: '', label: of.anyKind },
      ...kinds
        .map(({ value, count }) => ({ value, label: `${value} (${String(count)})` }))
        .sort((a, b) => a.value.localeCompare(b.value)),
    ],
    verdictChoices: [
      { value: '', label: 'Any verdict' },
      ...VERDICTS.map((value) => ({ value, label: VERDICT_LABELS[value] })),
    ],
  };
}

/** Open cases by document, as links. */
export async function openCaseLinks(
  ctx: Ctx,
  actor: Actor,
  documents: readonly string[],
): Promise<Map<string, CaseLink[]>> {
  const open = await openCasesOf(ctx.db, documents);
  const links = new Map<string, CaseLink[]>();
  for (const one of open) {
    const link = { number: one.number, href: `/s/${actor.site.slug}/cases/${one.number}` };
    links.set(one.documentId, [...(links.get(one.documentId) ?? []), link]);
  }
  return links;
}

/** The documents of a page whose results the reader may see. */
export function seenDocuments(
  rows: readonly Listed<{ documentId: string } & Record<string, unknown>>[],
): string[] {
  return [...new Set(rows.filter((row) => !row.hidden).map((row) => String(row.documentId)))];
}

/** The address of the page's present filters, without the place in the list. */
export function addressOf(ask: Ask, path: string, more: Record<string, string> = {}): string {
  const query = new URLSearchParams();
  const sort = ask.sort === 'tag' && !ask.descending ? '' : `${ask.descending ? '-' : ''}${ask.sort}`;
  const figures = ask.figures === 'entered' ? '' : ask.figures;
  const { text: q, unit, kind, verdict } = ask;
  for (const [name, value] of Object.entries({ q, unit, kind, verdict, sort, figures, ...more }))
    if (value !== '') query.set(name, value);
  const text = query.toString();
  return text === '' ? path : `${path}?${text}`;
}
