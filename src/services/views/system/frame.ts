/* What every part of a system's page shows around it: title block, parts, and both truths while a change waits. */
import { can, STAGE_WORDS, type Stage } from '@domain/case';
import { maskProse } from '@domain/hidden';
import { leadingGroup, scenarioLabel, scenarioOfKey } from '@domain/projections';
import { whoOf } from '../../context';
import { dayAt } from '../days';
import { percent } from '../shown';
import { type OpenedSystem, type Seen } from './open';

export type SystemPart =
  'overview' | 'basis' | 'relief-points' | 'scenarios' | 'sheets' | 'lines' | 'outcomes' | 'revisions';

export type SystemFrame = {
  tag: string;
  name: string;
  kind: string;
  base: string;
  cells: { label: string; fact: string; href?: string; num?: boolean }[];
  parts: { label: string; href: string; count?: number; late?: boolean; part: SystemPart }[];
  /** Cases that would change this basis; the signed one says what will hold. */
  pending: { number: string; href: string; text: string }[];
  /** Said when the page does not show the revision in force. */
  older?: { text: string; href: string };
  raise: { href: string } | { whyNot: string };
  hidden: boolean;
  printFoot: string;
};

const GRADES: Record<string, string> = {
  'tag-only': 'tag only: nothing is worked yet',
  'copied-in': 'copied in, not worked here',
  worked: 'worked',
};

/** What a revision comes to in one phrase: "letter M, closed outlet, 76.2 % used, adequate". */
export function gist({ body, evaluation }: Seen): string {
  if (!evaluation) return 'its results are hidden until your own figures are in';
  const group = leadingGroup(body, evaluation);
  const result = group && evaluation.groups[group.id];
  if (!group || result?.use === undefined) return 'not sized';
  const scenario = scenarioOfKey(body, result.governing);
  const name = scenario ? `${scenarioLabel(body, scenario)} governs, ` : '';
  return `${name}${percent(result.use)}\u00a0% used, ${result.verdict}`;
}

function pendingOf(of: OpenedSystem): SystemFrame['pending'] {
  return of.cases.map((one) => {
    const signed = of.approved?.revision.caseId === one.id ? of.approved : undefined;
    const stage = STAGE_WORDS[one.stage as Stage];
    const title = of.hidden ? maskProse(one.title) : one.title;
    const text = signed
      ? `${title}: approved, not installed. When it is: ${gist(signed)}.`
      : `${title}, in ${stage}.`;
    return { number: one.number, href: `/s/${of.actor.site.slug}/cases/${one.number}`, text };
  });
}

function revisionWords(of: OpenedSystem): string {
  const revision = of.shownRevision;
  if (!revision) return 'none in force';
  const state = revision.state === 'in-force' ? 'in force' : revision.state;
  return `${String(revision.number)}, ${state}`;
}

function cellsOf(of: OpenedSystem): SystemFrame['cells'] {
  const { shownRevision: revision, actor } = of;
  const since = revision?.inPlantFrom;
  const number = revision?.caseId ? of.caseNumbers.get(revision.caseId) : undefined;
  return [
    { label: 'Revision', fact: revisionWords(of), href: `${baseOf(of)}/revisions` },
    {
      label: 'In the plant since',
      fact: since ? `${dayAt(since, actor.site.timeZone)}${number ? `, ${number}` : ''}` : '–',
      ...(number ? { href: `/s/${actor.site.slug}/cases/${number}` } : {}),
    },
    { label: 'Unit', fact: `${of.unit.tag}, ${of.unit.name}` },
    { label: 'Grade', fact: GRADES[of.shown?.body.grade ?? of.document.grade ?? 'worked'] ?? 'worked' },
  ];
}

/** The address of the system's page. */
export function baseOf(of: OpenedSystem): string {
  return `/s/${of.actor.site.slug}/systems/${encodeURIComponent(of.document.tag)}`;
}

/** The query that keeps a page on an older revision. */
export function revisionQuery(of: OpenedSystem): string {
  const { shownRevision: revision } = of;
  return revision && revision.state !== 'in-force' ? `?revision=${String(revision.number)}` : '';
}

function partsOf(of: OpenedSystem): SystemFrame['parts'] {
  const base = baseOf(of);
  const query = revisionQuery(of);
  const stops = (of.shown?.outcomes ?? []).filter((one) => one.severity === 'stop').length;
  const part = (name: SystemPart, label: string, count?: number, late = false) => ({
    part: name,
    label,
    href: `${name === 'overview' ? base : `${base}/${name}`}${name === 'revisions' ? '' : query}`,
    ...(count === undefined || count === 0 ? {} : { count }),
    ...(late ? { late } : {}),
  });
  return [
    part('overview', 'Overview'),
    part('basis', 'Relief basis'),
    part('relief-points', 'Relief points', of.shown?.body.reliefPoints.length),
    part('scenarios', 'Scenarios', of.shown?.body.scenarios.length),
    part('sheets', 'Calculation sheets'),
    part('lines', 'Lines'),
    part('outcomes', 'Outcomes', of.shown?.outcomes.length, stops > 0),
    part('revisions', 'Revisions', of.revisions.filter((one) => one.number !== null).length),
  ];
}

function raiseOf(of: OpenedSystem): SystemFrame['raise'] {
  const answer = can(whoOf(of.actor), 'raise', { seats: [] });
  const href = `/s/${of.actor.site.slug}/cases/new?system=${encodeURIComponent(of.document.tag)}`;
  return answer.ok ? { href } : { whyNot: answer.sentence };
}

function olderOf(of: OpenedSystem): SystemFrame['older'] {
  const { shownRevision: revision } = of;
  if (!revision || revision.state === 'in-force') return undefined;
  return {
    text: `This is revision ${String(revision.number)}, ${revision.state}: it is not what stands in the plant now.`,
    href: baseOf(of),
  };
}

/** The frame of an opened system. */
export function frameOf(of: OpenedSystem): SystemFrame {
  const older = olderOf(of);
  return {
    tag: of.document.tag,
    name: of.shown?.body.name ?? of.document.name,
    kind: 'relief basis of a protected system',
    base: baseOf(of),
    cells: cellsOf(of),
    parts: partsOf(of),
    pending: pendingOf(of),
    ...(older ? { older } : {}),
    raise: raiseOf(of),
    hidden: of.hidden,
    printFoot: `${of.document.tag} rev ${revisionWords(of)} · ${of.actor.site.name}`,
  };
}
