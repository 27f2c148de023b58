/* The field sheet of a case for one person: blocks in walking order, discrepancies, start-up items, and the signature at the end. */
import { can, meaningOf, openPoints, STAGE_WORDS, type Act, type Stage } from '@domain/case';
import { type FieldEntry, type FieldLine } from '@domain/field';
import { ok, type OpenPoint, type Result } from '@domain/result';
import { findPeople, peopleOfSite, type Person } from '@data/people';
import { type DueRow } from '@data/due';
import { whoOf, type Actor, type Ctx } from '../../context';
import { type CaseFile, onFile } from '../../case-file';
import { dueItemView, type DueItemView } from '../../due/view';
import { installersOfLine } from '../../field/field-write';
import { lineView, type FieldLineView } from '../../field/line-view';
import { entriesAsDomain, linesAsDomain } from '../../field-records';
import { pageHash } from '../../stage/sign';
import { mayAct } from '../../stage/stage-act';
import { noteLook, openCase, type OpenedCase } from './open';

export type PersonView = { id: string; name: string; phone: string };
export type DiscrepancyView = {
  number: number;
  line: string;
  label: string;
  place: string;
  state: 'open' | 'fixed' | 'seen-again' | 'sent-back' | 'accepted';
  settled: boolean;
  holds: boolean;
  clears: string;
  owner: PersonView;
  posts: { by: string; at: string; text: string }[];
  /** Why the reader may not; absent where they may. */
  whyNot: Partial<Record<'fix' | 'see-again' | 'send-back', string>>;
};
export type FieldBlock = {
  at: string;
  system: string;
  place: string;
  part: string;
  lines: FieldLineView[];
  toSee: number;
  differs: number;
};
export type SignView = {
  system: string;
  document: string;
  state: string;
  points: { sentence: string; href: string; code: string }[];
  pageHash: string;
  meaning: string;
  whyNot: string | null;
};
export type FieldView = {
  number: string;
  title: string;
  version: number;
  base: string;
  site: string;
  stage: Stage;
  stageWords: string;
  you: { name: string; enters: boolean; whyNot: string | null };
  blocks: FieldBlock[];
  discrepancies: DiscrepancyView[];
  startUp: DueItemView[];
  signs: SignView[];
  people: PersonView[];
  originator: PersonView | null;
  left: { lines: number; discrepancies: number; startUp: number };
};

const SETTLED: readonly string[] = ['seen-again', 'accepted'];
const START_UP: readonly string[] = ['start-up', 'pssr', 'training'];

const slug = (text: string): string =>
  text
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, '-')
    .replace(/^-|-$/g, '');

type Reading = {
  of: OpenedCase;
  entries: FieldEntry[];
  enters: boolean;
  people: ReadonlyMap<string, Person>;
};

function named({ people }: Pick<Reading, 'people'>, id: string): PersonView {
  const person = people.get(id);
  return { id, name: person?.name ?? id, phone: person?.phone ?? '' };
}

function timeOf(zone: string): (instant: string) => string {
  const format = new Intl.DateTimeFormat('en-GB', {
    timeZone: zone,
    day: 'numeric',
    month: 'short',
    hour: '2-digit',
    minute: '2-digit',
  });
  return (instant) => format.format(new Date(instant));
}

/** The entry that counts for a line: the verifier's seen last, else the installer's. */
function entryFor(entries: readonly FieldEntry[], line: FieldLine): FieldEntry | undefined {
  const own = entries.filter((entry) => entry.line === line.key);
  const verified = own.filter((entry) => entry.as === 'verifier');
  return (verified.length > 0 ? verified : own).reduce<FieldEntry | undefined>(
    (last, entry) => (!last || entry.saw >= last.saw ? entry : last),
    undefined,
  );
}

/** The discrepancy that still counts on a line. */
function openOn(file: CaseFile, line: FieldLine): number | undefined {
  return file.discrepancies.find(
    (one) =>
      !SETTLED.includes(one.state) &&
      file.entries.some((entry) => entry.id === one.entryId && entry.line === line.key),
  )?.number;
}

function lineFor(reading: Reading, line: FieldLine): FieldLineView {
  const { of, entries, enters } = reading;
  const { file, actor } = of;
  const discrepancy = openOn(file, line);
  const seenByReader = entries.some((entry) => entry.line === line.key && entry.by === actor.person.id);
  return lineView({
    line,
    entry: entryFor(entries, line),
    discrepancy,
    open: !of.hidden && (seenByReader || !enters || discrepancy !== undefined),
    barometer: file.site.barometer,
    nameOf: (id) => named(reading, id).name,
    timeOf: timeOf(file.site.timeZone),
    fileAt: (id) => `/api/v1/sites/${file.site.slug}/files/${id}`,
  });
}

function blocksOf(reading: Reading): FieldBlock[] {
  const { file } = reading.of;
  const several = file.documents.length > 1;
  const blocks = new Map<string, FieldBlock>();
  for (const one of file.documents) {
    const lines = linesAsDomain(file.lines.filter((line) => line.documentId === one.document.id));
    for (const line of lines) {
      const [place = '', part] = line.group.split(' · ');
      const at = slug(`${several ? `${one.document.tag} ` : ''}${line.group}`);
      const block = blocks.get(at) ?? {
        ...{ at, system: one.document.tag, place: part === undefined ? one.document.tag : place },
        ...{ part: part ?? place, lines: [], toSee: 0, differs: 0 },
      };
      const view = lineFor(reading, line);
      block.lines.push(view);
      block.toSee += view.state === 'to-see' || view.again ? 1 : 0;
      block.differs += view.discrepancy === undefined ? 0 : 1;
      blocks.set(at, block);
    }
  }
  return [...blocks.values()];
}

const TURNS: readonly Extract<Act, 'fix' | 'see-again' | 'send-back'>[] = ['fix', 'see-again', 'send-back'];

function discrepanciesOf(reading: Reading): DiscrepancyView[] {
  const { file, actor } = reading.of;
  const lines = linesAsDomain(file.lines);
  return file.discrepancies.flatMap((row): DiscrepancyView[] => {
    const entry = file.entries.find((one) => one.id === row.entryId);
    const line = lines.find((one) => one.key === entry?.line);
    if (!line) return [];
    const installers = installersOfLine(file, line.key);
    const whyNot = Object.fromEntries(
      TURNS.flatMap((act) => {
        const may = can(whoOf(actor), act, { ...onFile(file), installers });
        return may.ok ? [] : [[act, may.sentence]];
      }),
    );
    const at = timeOf(file.site.timeZone);
    return [
      {
        number: row.number,
        line: line.key,
        label: line.label,
        place: line.group.split(' · ')[0] ?? '',
        state: row.state,
        settled: SETTLED.includes(row.state),
        holds: row.holds,
        clears: row.clears,
        owner: named(reading, row.ownerId),
        posts: reading.of.hidden
          ? []
          : row.posts.map((post) => ({ by: named(reading, post.by).name, at: at(post.at), text: post.text })),
        whyNot,
      },
    ];
  });
}

function holdsStartUp(item: DueRow): boolean {
  return item.bars === 'start-up' || (item.bars === null && START_UP.includes(item.kind));
}

function startUpOf(reading: Reading): DueItemView[] {
  const { file, actor, today } = reading.of;
  return file.due
    .filter((item) => item.caseId === file.row.id && holdsStartUp(item))
    .map((item) =>
      dueItemView(item, {
        actor,
        today,
        on: { ...onFile(file), owner: item.ownerId, askedBy: item.askedBy },
        nameOf: (id) => named(reading, id).name,
      }),
    );
}

function pointOf(site: string) {
  return ({ sentence, where, code }: OpenPoint) => ({ sentence, code, href: `/s/${site}/${where}` });
}

function signsOf({ of }: Reading): SignView[] {
  const { file, facts, actor } = of;
  if (file.row.stage !== 'field') return [];
  const may = mayAct(file, actor, 'ISSUE');
  return file.documents
    .filter((one) => one.row.state === 'approved' || one.row.state === 'issued')
    .map((one) => ({
      system: one.document.tag,
      document: one.document.id,
      state: one.row.state,
      points:
        one.row.state === 'issued'
          ? []
          : openPoints('field', facts, one.document.id).map(pointOf(file.site.slug)),
      pageHash: pageHash(file, 'ISSUE', one.document.tag),
      meaning: meaningOf('field'),
      whyNot: may.ok ? null : may.sentence,
    }));
}

async function readingOf(ctx: Ctx, of: OpenedCase): Promise<Reading> {
  const { file, actor } = of;
  const ids = [
    ...file.entries.flatMap((one) => [one.byId, ...(one.cannot ? [one.cannot.second] : [])]),
    ...file.discrepancies.flatMap((one) => [one.ownerId, ...one.posts.map((post) => post.by)]),
    ...file.due.flatMap((one) => [one.ownerId, one.askedBy]),
    ...file.seats.map((one) => one.personId),
  ];
  const people = await findPeople(ctx.db, [...new Set(ids)]);
  return {
    of,
    entries: entriesAsDomain(file.entries),
    enters: can(whoOf(actor), 'enter-field', { ...onFile(file), installers: [] }).ok,
    people: new Map(people.map((person) => [person.id, person])),
  };
}

function viewOf(reading: Reading, operations: PersonView[]): FieldView {
  const { file, actor } = reading.of;
  const may = can(whoOf(actor), 'enter-field', { ...onFile(file), installers: [] });
  const blocks = blocksOf(reading);
  const discrepancies = discrepanciesOf(reading);
  const startUp = startUpOf(reading);
  const origin = file.seats.find((seat) => seat.role === 'originator' && !seat.untilAt);
  return {
    number: file.row.number,
    title: file.row.title,
    version: file.row.version,
    base: `/s/${file.site.slug}/cases/${file.row.number}`,
    site: file.site.slug,
    stage: file.row.stage,
    stageWords: STAGE_WORDS[file.row.stage],
    you: { name: actor.person.name, enters: may.ok, whyNot: may.ok ? null : may.sentence },
    blocks,
    discrepancies,
    startUp,
    signs: signsOf(reading),
    people: operations,
    originator: origin ? named(reading, origin.personId) : null,
    left: {
      lines: blocks.reduce((sum, block) => sum + block.toSee, 0),
      discrepancies: discrepancies.filter((one) => !one.settled && one.holds).length,
      startUp: startUp.filter((item) => item.state === 'open').length,
    },
  };
}

/** The field sheet of a case. What was signed stands only on lines that the reader has seen, or where a discrepancy tells it. */
export async function fieldView(ctx: Ctx, actor: Actor, number: string): Promise<Result<FieldView>> {
  const opened = await openCase(ctx, actor, number);
  if (!opened.ok) return opened;
  const reading = await readingOf(ctx, opened.value);
  const people = await peopleOfSite(ctx.db, actor.site.id);
  const operations = people
    .filter((one) => !one.retiredAt && one.roles.includes('operations'))
    .map((one) => ({ id: one.id, name: one.name, phone: one.phone ?? '' }));
  await noteLook(opened.value, 'field');
  return ok(viewOf(reading, operations));
}
