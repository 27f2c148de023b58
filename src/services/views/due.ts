/* Due items of a site: who owes what by when. */
import { daysBetween, isOverdue } from '@domain/dates';
import { ok, type Result } from '@domain/result';
import { findCases } from '@data/cases';
import { findDocuments } from '@data/documents';
import { type DueRow, listDue } from '@data/due';
import { findPeople } from '@data/people';
import { type Actor, type Ctx, today } from '../context';
import { type Hidden, hiddenOf } from '../hidden-view';
import { dayWords } from './days';
import { DUE_KINDS, dueText, lateWords } from './my-work/due-words';

export type DueLine = {
  id: string;
  due: string;
  late: boolean;
  lateWords: string;
  kind: string;
  text: string;
  owner: string;
  mine: boolean;
  of: { text: string; href: string }[];
  state: string;
};
export type DueView = {
  lines: DueLine[];
  total: number;
  overdue: number;
  asked: { who: string; state: string; kind: string };
  choices: Record<'who' | 'state' | 'kind', { value: string; label: string }[]>;
};

const STATES: Record<DueRow['state'], string> = {
  open: 'open',
  done: 'done, to be accepted',
  accepted: 'accepted',
  waived: 'waived',
};

type Names = {
  people: ReadonlyMap<string, string>;
  cases: ReadonlyMap<string, string>;
  documents: ReadonlyMap<string, { tag: string; kind: string }>;
};

function lineOf(row: DueRow, day: string, actor: Actor, hidden: Hidden, names: Names): DueLine {
  const base = `/s/${actor.site.slug}`;
  const number = row.caseId === null ? undefined : names.cases.get(row.caseId);
  const document = row.documentId === null ? undefined : names.documents.get(row.documentId);
  const late = row.state === 'open' && isOverdue(row.due, day);
  return {
    id: row.id,
    due: dayWords(row.due),
    late,
    lateWords: late ? lateWords(daysBetween(row.due, day)) : '',
    kind: DUE_KINDS[row.kind],
    text: dueText(row, hidden),
    owner: names.people.get(row.ownerId) ?? '',
    mine: row.ownerId === actor.person.id,
    of: [
      ...(number === undefined ? [] : [{ text: number, href: `${base}/cases/${number}` }]),
      ...(document?.kind === 'system'
        ? [{ text: document.tag, href: `${base}/systems/${document.tag}` }]
        : []),
    ],
    state: STATES[row.state],
  };
}

function matches(row: DueRow, asked: DueView['asked'], actor: Actor): boolean {
  if (asked.who === 'me' && row.ownerId !== actor.person.id) return false;
  if (asked.who !== '' && asked.who !== 'me' && row.ownerId !== asked.who) return false;
  if (asked.kind !== '' && row.kind !== asked.kind) return false;
  return asked.state === 'all' || (asked.state === 'closed' ? CLOSED.has(row.state) : !CLOSED.has(row.state));
}

const CLOSED: ReadonlySet<DueRow['state']> = new Set(['accepted', 'waived']);

async function namesOf(ctx: Ctx, rows: readonly DueRow[]): Promise<Names> {
  const [people, cases, documents] = await Promise.all([
    findPeople(ctx.db, [...new Set(rows.map((row) => row.ownerId))]),
    findCases(ctx.db, [...new Set(rows.flatMap((row) => row.caseId ?? []))]),
    findDocuments(ctx.db, [...new Set(rows.flatMap((row) => row.documentId ?? []))]),
  ]);
  return {
    people: new Map(people.map((one) => [one.id, one.name])),
    cases: new Map(cases.map((one) => [one.id, one.number])),
    documents: new Map(documents.map((one) => [one.id, { tag: one.tag, kind: one.kind }])),
  };
}

/** Due items of the site, soonest first: `?who=me`, `?state=closed`, `?kind=deficiency`. */
export async function dueView(ctx: Ctx, actor: Actor, search: URLSearchParams): Promise<Result<DueView>> {
  const get = (name: string) => (search.get(name) ?? '').slice(0, 80);
  const asked = { who: get('who'), state: get('state'), kind: get('kind') };
  const rows = await listDue(ctx.db, { siteId: actor.site.id });
  const names = await namesOf(ctx, rows);
  const hidden = await hiddenOf(ctx, actor);
  const day = today(ctx, actor.site);
  const lines = rows
    .filter((row) => matches(row, asked, actor))
    .map((row) => lineOf(row, day, actor, hidden, names));
  const kinds = [...new Set(rows.map((row) => row.kind))];
  const owners = [...names.people].sort((a, b) => a[1].localeCompare(b[1]));
  return ok({
    lines,
    total: rows.length,
    overdue: lines.filter((line) => line.late).length,
    asked,
    choices: {
      who: [
        { value: '', label: 'Anyone' },
        { value: 'me', label: 'Me' },
        ...owners.map(([value, label]) => ({ value, label })),
      ],
      state: [
        { value: '', label: 'Open' },
        { value: 'closed', label: 'Accepted or waived' },
        { value: 'all', label: 'Any state' },
      ],
      kind: [{ value: '', label: 'Any kind' }, ...kinds.map((value) => ({ value, label: DUE_KINDS[value] }))],
    },
  });
}
