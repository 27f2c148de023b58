/* The brief of a case: what changes and why, papers, people, affected systems; with the words of its forms. */
import { type Brief, can, conflictsOfSeat, type Paper, type Role, type SeatRole } from '@domain/case';
import { plainText, type Rich } from '@domain/text';
import { keptWith } from '@data/memo';
import { peopleOfSite, type Person } from '@data/people';
import { domainSeats, onFile } from '../../case-file';
import { whoOf } from '../../context';
import { approversNeeded } from '../../gate-facts';
import { maskRich, maskProse } from '@domain/hidden';
import { affectedView, type AffectedLine } from './affected';
import { type OpenedCase } from './open';
import { type Prose, proseOf } from './prose';

/** One text of the brief: the stored text for the editor, and as it reads with its live figures. */
export type TextView = {
  name: keyof Brief;
  label: string;
  hint: string;
  rich: Rich;
  plain: string;
  prose: Prose;
};
export type PersonChoice = { value: string; label: string; note?: string; chosen: boolean };
export type BriefView = {
  title: string;
  timeNeeded: string;
  texts: TextView[];
  papers: Paper[];
  noPapers: boolean;
  seats: {
    role: Exclude<SeatRole, 'originator'>;
    legend: string;
    several: boolean;
    people: PersonChoice[];
  }[];
  affected: AffectedLine[];
  editable: boolean;
  whyNot?: string;
};

const TEXTS: readonly { name: 'whatChanges' | 'technicalBasis' | 'effect'; label: string; hint: string }[] = [
  { name: 'whatChanges', label: 'What changes, and why', hint: 'The change itself and the reason for it.' },
  {
    name: 'technicalBasis',
    label: 'Technical basis',
    hint: 'What makes it sound: data, calculation, experience.',
  },
  {
    name: 'effect',
    label: 'Effect on safety and health',
    hint: 'What can go wrong that could not before, and what keeps it away.',
  },
];

const ASKED: readonly { role: Exclude<SeatRole, 'originator'>; legend: string; several: boolean }[] = [
  { role: 'checker', legend: 'Checker', several: false },
  { role: 'approver', legend: 'Approvers', several: true },
  { role: 'operations', legend: 'Operations', several: true },
];

type Someone = Person & { roles: Role[] };

/** Why someone cannot take a seat, in a few words beside the name; who has looked is judged when they are nominated. */
function conflictOf(of: OpenedCase, people: readonly Someone[], person: string, role: SeatRole) {
  const roles = Object.fromEntries(people.map((one) => [one.id, one.roles]));
  const names = Object.fromEntries(people.map((one) => [one.id, one.name]));
  const others = domainSeats(of.file.seats).filter((seat) => seat.person !== person || seat.role !== role);
  return conflictsOfSeat(person, role, {
    seats: [...others, { id: '', role, person }],
    roles,
    names,
    lookedFirst: [],
  })[0]?.sentence;
}

function choices(of: OpenedCase, people: readonly Someone[], role: SeatRole): PersonChoice[] {
  const open = of.file.seats.filter((seat) => !seat.untilAt && seat.role === role);
  return people
    .filter((one) => !one.retiredAt && one.roles.includes(role))
    .map((one) => {
      const conflict = conflictOf(of, people, one.id, role);
      return {
        value: one.id,
        label: one.name,
        chosen: open.some((seat) => seat.personId === one.id),
        ...(conflict ? { note: conflict } : {}),
      };
    });
}

function textsOf(of: OpenedCase): TextView[] {
  const { brief } = of.file.row;
  return TEXTS.map((text) => {
    const stored = brief[text.name] as Rich;
    const rich = of.hidden ? maskRich(stored) : stored;
    return { ...text, rich, plain: plainText(rich), prose: proseOf(of, stored, of.file.documents[0]) };
  });
}

/** The brief for its reader: prose without figures while results are hidden from them. */
export function briefView(of: OpenedCase): Promise<BriefView> {
  return keptWith(of, 'brief', () => readBrief(of));
}

async function readBrief(of: OpenedCase): Promise<BriefView> {
  const { file, actor } = of;
  const { brief } = file.row;
  const may = can(whoOf(actor), 'edit-brief', onFile(file));
  const people = may.ok ? await peopleOfSite(of.ctx.db, file.site.id) : [];
  const needed = approversNeeded(file);
  return {
    title: of.hidden ? maskProse(brief.title) : brief.title,
    timeNeeded: brief.timeNeeded,
    texts: textsOf(of),
    papers: brief.papers.filter((one) => one.kind !== 'none'),
    noPapers: brief.papers.some((one) => one.kind === 'none'),
    seats: ASKED.map((one) => ({
      ...one,
      legend: one.role === 'approver' && needed > 1 ? `Approvers, ${String(needed)} are needed` : one.legend,
      people: choices(of, people, one.role),
    })),
    affected: affectedView(of),
    editable: may.ok,
    ...(may.ok ? {} : { whyNot: may.sentence }),
  };
}
