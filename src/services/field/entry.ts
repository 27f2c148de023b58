/* One entry of the field sheet: whether it may stand, and all that is written with it. */
import { type Id } from '@domain/case';
import {
  askOf,
  type Compared,
  comparedEntry,
  discrepancyOf,
  type FieldEntry,
  type FieldLine,
  faultsOfEntry,
} from '@domain/field';
import { formatQuantity, type Q } from '@engine/quantity';
import { type Db } from '@data/connection';
import { addDiscrepancy, addEntry, addSighting, type DiscrepancyRow } from '@data/field';
import { findFile, markFile } from '@data/files';
import { newId } from '@data/ids';
import { peopleOfSite } from '@data/people';
import { type CaseFile } from '../case-file';
import { type Actor, type Ctx, instant } from '../context';
import { linesAsDomain } from '../field-records';
import { notify } from '../notify';
import { type EntryBody } from './bodies';

export type Fault = { path: string; code: string; sentence: string };
/** An entry with its line, ready to be written. */
export type Ready = { line: FieldLine; entry: FieldEntry; client: string; compared: Compared | undefined };

/** A line of the case's field sheet by its key. */
export function lineOf(file: CaseFile, key: string): FieldLine | undefined {
  return linesAsDomain(file.lines).find((line) => line.key === key);
}

function asEntry(ctx: Ctx, actor: Actor, file: CaseFile, body: EntryBody): FieldEntry {
  const got = instant(ctx);
  const saw = body.saw !== undefined && body.saw < got ? new Date(body.saw).toISOString() : got;
  return {
    id: newId('fieldEntry'),
    case: file.row.id,
    line: body.line,
    as: body.as,
    ...(body.installer === undefined ? {} : { installer: body.installer }),
    ...(body.seen === undefined ? {} : { seen: body.seen }),
    ...(body.text === undefined ? {} : { text: body.text }),
    files: body.files,
    ...(body.scan === undefined ? {} : { scan: body.scan }),
    by: actor.person.id,
    saw,
    got,
    device: body.device,
    shownAt: got,
    ...(body.cannot ? { cannot: body.cannot } : {}),
  };
}

function kindFault(line: FieldLine, seen: Q | string | undefined, path: string): Fault[] {
  if (seen === undefined) return [];
  const figure = askOf(line).kind === 'quantity';
  if (figure === (typeof seen !== 'string')) return [];
  const sentence = figure
    ? `${line.label}: enter a figure with its unit.`
    : `${line.label}: enter a word, not a figure.`;
  return [{ path: `${path}/seen`, code: 'kind', sentence }];
}

async function unknownFaults(db: Db, file: CaseFile, entry: FieldEntry, path: string): Promise<Fault[]> {
  const faults: Fault[] = [];
  for (const id of entry.files) {
    if ((await findFile(db, id))?.siteId !== file.site.id)
      faults.push({
        path: `${path}/files`,
        code: 'unknown',
        sentence: 'A photograph named here was never received: send it first.',
      });
  }
  if (entry.cannot) {
    const people = await peopleOfSite(db, file.site.id);
    if (!people.some((one) => one.id === entry.cannot?.second && !one.retiredAt))
      faults.push({
        path: `${path}/cannot/second`,
        code: 'unknown',
        sentence: 'The second person is not one of this site.',
      });
  }
  return faults;
}

/** The entry with its line, or what is wrong with it. A missing photograph does not refuse an entry: the gate asks for it. */
export async function readyEntry(
  db: Db,
  ctx: Ctx,
  actor: Actor,
  file: CaseFile,
  body: EntryBody,
  path: string,
): Promise<{ ready: Ready; faults: Fault[] } | { ready: undefined; faults: Fault[] }> {
  const line = lineOf(file, body.line);
  if (!line) {
    const sentence = 'The field sheet has no such line; it may have been made anew since it was loaded.';
    return { ready: undefined, faults: [{ path: `${path}/line`, code: 'unknown', sentence }] };
  }
  const entry = asEntry(ctx, actor, file, body);
  const own = faultsOfEntry({ ...line, photo: false }, entry).map((sentence) => ({
    path: `${path}/${entry.cannot ? 'cannot/second' : 'seen'}`,
    code: 'incomplete',
    sentence,
  }));
  const faults = [
    ...own,
    ...kindFault(line, entry.seen, path),
    ...(await unknownFaults(db, file, entry, path)),
  ];
  const compared = comparedEntry(line, entry, { barometer: file.site.barometer });
  return { ready: { line, entry, client: body.client, compared }, faults };
}

/** The relief point or thing in the plant that a line is about, as notices name it. */
export function placeOfLine(line: FieldLine): string {
  return line.group.split(' · ')[0] ?? line.label;
}

async function noteSighting(trx: Db, { line, entry, compared }: Ready): Promise<void> {
  const condition = /fieldConditions\/([^/#]+)/.exec(line.key)?.[1];
  if (condition === undefined || !compared || entry.as !== 'verifier') return;
  await addSighting(trx, {
    documentId: line.document,
    condition,
    at: entry.saw,
    byId: entry.by,
    agrees: compared.agrees,
    entryId: entry.id,
  });
}

/** Writes the entry alone: what was seen, when, by whom, and that the signed value was shown after it. */
export async function writeEntry(trx: Db, ready: Ready): Promise<void> {
  const { line, entry, client, compared } = ready;
  await addEntry(trx, {
    id: entry.id,
    clientId: client,
    caseId: entry.case,
    documentId: line.document,
    line: line.key,
    asWhat: entry.as,
    installer: entry.installer ?? null,
    seen: entry.seen ?? null,
    text: entry.text ?? null,
    files: entry.files,
    scan: entry.scan ?? null,
    byId: entry.by,
    saw: entry.saw,
    got: entry.got,
    device: entry.device,
    shownAt: entry.shownAt ?? null,
    cannot: entry.cannot ?? null,
    agrees: compared?.agrees ?? null,
  });
  for (const id of entry.files) await markFile(trx, id, 'referred');
  await noteSighting(trx, ready);
}

const told = (value: Q | string | undefined): string =>
  value === undefined ? 'nothing' : typeof value === 'string' ? value : formatQuantity(value);

/** The discrepancy that an entry makes, with its notice; nothing when it agrees. Gives its number. */
export async function makeDiscrepancy(
  trx: Db,
  ctx: Ctx,
  actor: Actor,
  file: CaseFile,
  ready: Ready,
): Promise<number | undefined> {
  const { line, entry } = ready;
  const made = discrepancyOf(line, entry, { barometer: file.site.barometer });
  if (!made) return undefined;
  const text = `Seen ${told(entry.seen)}, signed ${told(line.wants)}.`;
  const number = await addDiscrepancy(trx, {
    id: newId('discrepancy'),
    caseId: file.row.id,
    documentId: line.document,
    entryId: entry.id,
    holds: made.holds,
    state: 'open',
    ownerId: made.owner,
    clears: made.clears,
    findingId: null,
    posts: [{ by: entry.by, at: entry.got, text }],
  });
  await notify(trx, ctx, actor, file, { event: 'case.discrepancy-found', relief: placeOfLine(line) });
  return number;
}

/** The line of an entry that stands in the record. */
export function lineOfEntry(file: CaseFile, entryId: Id): FieldLine | undefined {
  const entry = file.entries.find((one) => one.id === entryId);
  return entry && lineOf(file, entry.line);
}

/** A discrepancy on a line that is not settled yet and can still be put right. */
export function unsettledOn(file: CaseFile, key: string): DiscrepancyRow | undefined {
  return file.discrepancies.find(
    (one) =>
      ['open', 'fixed'].includes(one.state) &&
      file.entries.some((entry) => entry.id === one.entryId && entry.line === key),
  );
}
