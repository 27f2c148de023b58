/* What every part of a case page shows around it: title block, gate rail, parts, the panel of the gate that waits, and what the reader may do. */
import {
  actsFor,
  type ActAnswer,
  gateOf,
  openPoints,
  seatsOf,
  SEAT_WORDS,
  STAGE_WORDS,
  type Act,
  type Gate,
  type SeatRole,
  type Stage,
} from '@domain/case';
import { maskProse } from '@domain/hidden';
import { fail, ok, type OpenPoint, type Result } from '@domain/result';
import { type CaseContext } from '@workflows/case';
import { untilNextWrite } from '@data/memo';
import { domainSeats, nameIn, onFile, type CaseFile } from '../../case-file';
import { today, whoOf, type Actor, type Ctx } from '../../context';
import { contextOf } from '../../stage/stage-act';
import { addressOf } from './addresses';
import { idleActs } from './idle';
import { type OpenedCase, openCase } from './open';
import { cellsOf } from './title-cells';

export type RailStageView = { name: string; note?: string };
export type RailGateView = {
  state: 'passed' | 'waiting' | 'shut' | 'held';
  word: string;
  fact?: string;
  href?: string;
};
export type PartView = { label: string; part: string; href: string; count?: number; late?: boolean };
export type GateView = {
  gate: Gate;
  from: string;
  to: string;
  points: { sentence: string; href: string; code: string }[];
};
export type SeatView = { role: SeatRole; words: string; person: string; name: string };
export type FrameDocument = {
  id: string;
  tag: string;
  name: string;
  state: string;
  base: number | null;
  workingVersion: number | null;
  why: 'own' | 'affected';
};

/** The frame of a case page. */
export type CaseFrame = {
  number: string;
  title: string;
  class: string;
  stage: Stage;
  stageWords: string;
  version: number;
  base: string;
  cells: { label: string; fact: string; href?: string; num?: boolean }[];
  rail: { stages: RailStageView[]; gates: RailGateView[]; at: number };
  parts: PartView[];
  gate: GateView | null;
  acts: ActAnswer[];
  /** Acts that are permitted, with nothing in the case to do them on. */
  idle: Act[];
  seats: SeatView[];
  documents: FrameDocument[];
  yourSeats: SeatRole[];
  hidden: boolean;
  /** For the machine in the browser: the same as on the server. */
  machine: {
    stage: Stage;
    context: CaseContext;
    actor: { id: string; roles: readonly string[]; seats: SeatRole[] };
    open: OpenPoint[];
  };
};

const ORDER: readonly Stage[] = ['draft', 'scenarios', 'check', 'approval', 'field', 'in-force'];
const CLASS_WORDS: Record<string, string> = { 'first-issue': 'first issue' };

function standing(file: CaseFile): Stage {
  const { stage, heldFrom } = file.row;
  if (stage === 'on-hold') return heldFrom ?? 'draft';
  return stage;
}

function dayOf(at: string, zone: string): string {
  return new Intl.DateTimeFormat('en-GB', { timeZone: zone, day: 'numeric', month: 'short' }).format(
    new Date(at),
  );
}

function gateStates(of: OpenedCase, at: number, points: readonly OpenPoint[]): RailGateView[] {
  const { file } = of;
  const ended = ['withdrawn', 'refused'].includes(file.row.stage);
  return ORDER.slice(0, -1).map((stage, index): RailGateView => {
    const signed = file.signatures.filter((one) => one.gate === stage && one.voids.length === 0).at(-1);
    const href = `/s/${file.site.slug}/cases/${file.row.number}/signatures#${stage}`;
    if (index < at)
      return {
        state: 'passed',
        word: 'Passed',
        ...(signed ? { fact: `${dayOf(signed.at, file.site.timeZone)}, ${signed.name}`, href } : {}),
      };
    if (index > at || ended) return { state: 'shut', word: 'Shut' };
    if (file.row.stage === 'on-hold') return { state: 'held', word: 'On hold' };
    const count = points.length;
    return {
      state: 'waiting',
      word: 'Waiting',
      fact: count === 0 ? 'no open point' : `${String(count)} open point${count === 1 ? '' : 's'}`,
      href: '#gate',
    };
  });
}

function railOf(of: OpenedCase, points: readonly OpenPoint[]): CaseFrame['rail'] {
  const stage = standing(of.file);
  const found = ORDER.indexOf(stage);
  const at = found < 0 ? lastPassed(of.file) : found;
  const names = ORDER.map((one) => ({ name: capital(STAGE_WORDS[one]) }));
  if (!of.file.row.endsOn) return { stages: names, gates: gateStates(of, at, points), at };
  const due = stage === 'due-for-removal' || stage === 'removed';
  return {
    stages: [...names, { name: 'Due for removal', note: `ends ${of.file.row.endsOn}` }],
    gates: [
      ...gateStates(of, due ? 5 : at, points),
      { state: due ? 'passed' : 'shut', word: due ? 'Fell due' : 'Shut' },
    ],
    at: due ? 6 : at,
  };
}

/** Where a case that ended early had got to. */
function lastPassed(file: CaseFile): number {
  const gates = file.signatures.map((one) => ORDER.indexOf(one.gate as Stage));
  return Math.max(-1, ...gates) + 1;
}

function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}

function gateView(of: OpenedCase, points: readonly OpenPoint[]): GateView | null {
  const gate = gateOf(of.file.row.stage);
  if (!gate) return null;
  const to = ORDER[ORDER.indexOf(gate) + 1] ?? 'in-force';
  return {
    gate,
    from: capital(STAGE_WORDS[gate]),
    to: capital(STAGE_WORDS[to]),
    points: points.map((one) => ({
      sentence: one.sentence,
      code: one.code,
      href: addressOf(of.file, one.where),
    })),
  };
}

function partsOf(of: OpenedCase, base: string): PartView[] {
  const { file } = of;
  const openFindings = file.findings.filter((one) => one.state !== 'closed').length;
  const outcomes = file.documents
    .flatMap((one) => one.after?.outcomes ?? [])
    .filter((one) => one.severity !== 'note' && !one.inherited).length;
  const part = (label: string, name: string, count?: number, late?: boolean): PartView => ({
    label,
    part: name,
    href: name === '' ? base : `${base}/${name}`,
    ...(count !== undefined && count > 0 ? { count } : {}),
    ...(late ? { late } : {}),
  });
  return [
    part('Brief', ''),
    part('What changes', 'changes'),
    part('Scenarios', 'scenarios'),
    part('Sheets', 'sheets'),
    part('Outcomes', 'outcomes', outcomes, outcomes > 0),
    part('Unseen check', 'unseen'),
    part('Findings', 'findings', openFindings),
    part('Differences', 'differences'),
    part('Summary to sign', 'summary'),
    part('Field sheet', 'field', file.discrepancies.filter((one) => one.state === 'open').length, true),
    part('Sign-offs', 'signatures'),
    part('Notices', 'notices'),
    part('Trail', 'trail'),
  ];
}

const GATE_ACT: Partial<Record<Stage, Act>> = {
  draft: 'PASS-draft',
  scenarios: 'PASS-scenarios',
  check: 'PASS-check',
  approval: 'SIGN',
  field: 'ISSUE',
};

/** The frame of an opened case. */
export function frameOf(of: OpenedCase): CaseFrame {
  const { file, facts, actor } = of;
  const base = `/s/${file.site.slug}/cases/${file.row.number}`;
  const gate = gateOf(file.row.stage);
  const points = gate ? openPoints(gate, facts) : [];
  const act = GATE_ACT[file.row.stage];
  const seats = seatsOf(whoOf(actor), domainSeats(file.seats));
  return {
    number: file.row.number,
    title: of.hidden ? maskProse(file.row.title) : file.row.title,
    class: CLASS_WORDS[file.row.class] ?? file.row.class,
    stage: file.row.stage,
    stageWords: STAGE_WORDS[file.row.stage],
    version: file.row.version,
    base,
    cells: cellsOf(of, base),
    rail: railOf(of, points),
    parts: partsOf(of, base),
    gate: gateView(of, points),
    acts: actsFor(whoOf(actor), onFile(file), act ? { [act]: points } : {}),
    idle: idleActs(of),
    seats: file.seats
      .filter((one) => !one.untilAt)
      .map((one) => ({
        role: one.role,
        words: SEAT_WORDS[one.role],
        person: one.personId,
        name: nameIn(file, one.personId),
      })),
    documents: file.documents.map((one) => ({
      id: one.document.id,
      tag: one.document.tag,
      name: one.document.name,
      state: one.row.state,
      base: one.base?.number ?? null,
      workingVersion: one.working?.version ?? null,
      why: one.row.why,
    })),
    yourSeats: seats,
    hidden: of.hidden,
    machine: {
      stage: file.row.stage,
      context: contextOf(file),
      actor: { id: actor.person.id, roles: actor.roles, seats },
      open: [...points],
    },
  };
}

async function readPage(
  ctx: Ctx,
  actor: Actor,
  number: string,
): Promise<Result<{ of: OpenedCase; frame: CaseFrame }>> {
  const opened = await openCase(ctx, actor, number);
  if (!opened.ok) return fail(opened.problem.code, opened.problem.detail);
  return ok({ of: opened.value, frame: frameOf(opened.value) });
}

/** Opens a case and its frame: the start of every case page. Read once and kept until something is written. */
export function casePage(
  ctx: Ctx,
  actor: Actor,
  number: string,
): Promise<Result<{ of: OpenedCase; frame: CaseFrame }>> {
  const key = [
    'case',
    actor.site.id,
    actor.person.id,
    ...actor.standsFor,
    actor.roles.join(),
    number,
    today(ctx, actor.site),
  ];
  return untilNextWrite(ctx.db, key, () => readPage(ctx, actor, number));
}
