/* The brief of a case: what changes and why, effects, papers, times; what a temporary or emergency case needs beside. */
import { type Brief } from '@domain/case';
import { compact, personId, rich } from '../convert';
import supplement from '../data/supplement/cases.json';
import { moveText, type Shift } from './dates';
import { type DemoCase, type DemoPaper } from './demo-case-types';
import { richWithFigures, type Sides } from './live';

type Extra = { safeguards?: string; substitute?: string };
const EXTRA: Record<string, Extra | undefined> = supplement.briefs;

const STATES: Record<string, Brief['papers'][number]['state']> = {
  'not started': 'not-started',
  drafted: 'drafted',
  'issued for approval': 'issued-for-approval',
  issued: 'issued',
  cancelled: 'cancelled',
};

/** Everything that must stand when the plant starts is due before; as-built papers may follow. */
function paperOf(paper: DemoPaper, n: number, live: boolean): Brief['papers'][number] {
  return {
    id: `pap_${String(n + 1)}`,
    kind: paper.kind,
    reference: paper.reference,
    from: paper.from,
    to: paper.to,
    when: live && paper.state === 'drafted' && paper.kind === 'drawing' ? 'after' : 'before-start-up',
    state: STATES[paper.state] ?? 'not-started',
  };
}

/** The brief of a case of theirs. */
export function briefOf(demo: DemoCase, shift: Shift, sides: ReadonlyMap<string, Sides>): Brief {
  const year = Number(demo.raised_on.slice(0, 4));
  const moved = (text: string): string => moveText(text, shift, year);
  const extra = EXTRA[demo.id];
  const ended = demo.end === null ? undefined : shift.day(demo.end);
  const starts = demo.starts === undefined ? undefined : shift.day(demo.starts);
  const live = demo.class !== 'permanent';
  return compact({
    title: demo.title,
    whatChanges: rich(moved(demo.what_changes)),
    technicalBasis: richWithFigures(moved(demo.technical_basis), demo.live_figures, sides),
    effect: rich(moved(demo.effect_on_safety_and_health)),
    timeNeeded: moved(demo.time_needed),
    starts,
    ends: ended,
    removal: demo.restore ? rich(demo.restore.how) : undefined,
    safeguards: extra?.safeguards === undefined ? undefined : rich(extra.safeguards),
    substitute: extra?.substitute === undefined ? undefined : rich(extra.substitute),
    owner: live ? personId(demo.nominated.originator) : undefined,
    papers: [...demo.procedures, ...demo.drawings].map((paper, n) => paperOf(paper, n, live)),
  });
}
