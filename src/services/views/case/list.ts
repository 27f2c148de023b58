/* The cases of a site as its list shows them: stage, class, systems, and for whom each waits. */
import { gateOf, SEAT_WORDS, STAGE_WORDS, STAGES, type SeatRole, type Stage } from '@domain/case';
import { caseDocuments, type CaseRow, listCases, openSeatsOf } from '@data/cases';
import { findDocuments } from '@data/documents';
import { findPeople } from '@data/people';
import { type Actor, type Ctx } from '../../context';
import { dayAt } from '../days';

export type CaseLine = {
  number: string;
  title: string;
  href: string;
  class: string;
  stage: Stage;
  stageWords: string;
  /** Index of the gate that waits; 5 when all are passed. */
  at: number;
  held: boolean;
  systems: { tag: string; href: string }[];
  waitsFor: string;
  raised: string;
  mine: boolean;
};
export type CasesView = {
  lines: CaseLine[];
  total: number;
  stages: { value: string; label: string }[];
  asked: { stage: string; mine: string; find: string };
};

const ORDER: readonly Stage[] = ['draft', 'scenarios', 'check', 'approval', 'field', 'in-force'];
const WAITS: Partial<Record<Stage, SeatRole>> = {
  draft: 'originator',
  scenarios: 'originator',
  check: 'checker',
  approval: 'approver',
  field: 'operations',
};
const ENDED: readonly Stage[] = ['withdrawn', 'refused', 'in-force', 'removed'];

function atOf(row: CaseRow): number {
  const stage = row.stage === 'on-hold' ? (row.heldFrom ?? 'draft') : row.stage;
  const found = ORDER.indexOf(stage);
  return found < 0 ? 0 : found;
}

type Around = {
  seats: Awaited<ReturnType<typeof openSeatsOf>>;
  names: ReadonlyMap<string, string>;
  tags: ReadonlyMap<string, string[]>;
};

async function around(ctx: Ctx, rows: readonly CaseRow[]): Promise<Around> {
  const ids = rows.map((row) => row.id);
  const seats = await openSeatsOf(ctx.db, ids);
  const held = await Promise.all(ids.map((id) => caseDocuments(ctx.db, id)));
  const documents = await findDocuments(ctx.db, [...new Set(held.flat().map((one) => one.documentId))]);
  const people = await findPeople(ctx.db, [...new Set(seats.map((seat) => seat.personId))]);
  const tagOf = new Map(documents.map((one) => [one.id, one.tag]));
  return {
    seats,
    names: new Map(people.map((one) => [one.id, one.name])),
    tags: new Map(
      ids.map((id, index) => [id, (held[index] ?? []).flatMap((one) => tagOf.get(one.documentId) ?? [])]),
    ),
  };
}

function waitsFor(row: CaseRow, { seats, names }: Around): string {
  if (ENDED.includes(row.stage)) return '';
  if (row.stage === 'on-hold') return 'held';
  const role = gateOf(row.stage) ? WAITS[row.stage] : undefined;
  if (!role) return '';
  const people = seats.filter((seat) => seat.caseId === row.id && seat.role === role);
  const named = people.map((seat) => names.get(seat.personId) ?? '').filter((name) => name !== '');
  return named.length > 0 ? named.join(', ') : SEAT_WORDS[role];
}

function lineOf(row: CaseRow, actor: Actor, about: Around): CaseLine {
  const base = `/s/${actor.site.slug}`;
  const persons = [actor.person.id, ...actor.standsFor];
  return {
    number: row.number,
    title: row.title,
    href: `${base}/cases/${row.number}`,
    class: row.class === 'first-issue' ? 'first issue' : row.class,
    stage: row.stage,
    stageWords: STAGE_WORDS[row.stage],
    at: atOf(row),
    held: row.stage === 'on-hold',
    systems: (about.tags.get(row.id) ?? []).map((tag) => ({ tag, href: `${base}/systems/${tag}` })),
    waitsFor: waitsFor(row, about),
    raised: dayAt(row.raisedAt, actor.site.timeZone),
    mine:
      persons.includes(row.raisedBy) ||
      about.seats.some((seat) => seat.caseId === row.id && persons.includes(seat.personId)),
  };
}

/** The cases of the site, newest number first; by stage, by whether the reader sits in them, by words of number, title or system. */
export async function casesView(
  ctx: Ctx,
  actor: Actor,
  asked: { stage?: string; mine?: string; find?: string },
): Promise<CasesView> {
  const rows = await listCases(ctx.db, actor.site.id);
  const about = await around(ctx, rows);
  const all = rows.map((row) => lineOf(row, actor, about));
  const find = (asked.find ?? '').trim().toLowerCase().slice(0, 100);
  const words = (line: CaseLine) =>
    [line.number, line.title, ...line.systems.map((one) => one.tag)].join(' ').toLowerCase();
  const lines = all
    .filter((line) => !asked.stage || line.stage === asked.stage)
    .filter((line) => asked.mine !== 'yes' || line.mine)
    .filter((line) => find === '' || words(line).includes(find));
  return {
    lines,
    total: all.length,
    stages: STAGES.map((stage) => ({ value: stage, label: STAGE_WORDS[stage] })),
    asked: { stage: asked.stage ?? '', mine: asked.mine ?? '', find: asked.find ?? '' },
  };
}
