/* The record of one case: who did what and when, from what to what, and why. */
import { getAt, type Origin } from '@domain/basis';
import { can, ROLE_WORDS, type Role, STAGE_WORDS, type Stage } from '@domain/case';
import { fail, ok, type Result } from '@domain/result';
import { plainText } from '@domain/text';
import { findPeople } from '@data/people';
import { readTrail, type TrailRow } from '@data/trail';
import { onFile } from '../../case-file';
import { whoOf } from '../../context';
import { formatQuantity, type Q } from '@engine/quantity';
import { originWords } from '../shown';
import { toldApart } from '../told-apart';
import { noteLook, type OpenedCase } from './open';
import { placeOf } from './places';
import { TRAIL_WORDS } from './trail-words';
import { instantWords, shortHash } from './when';

export type TrailChange = { where: string; old?: string; now?: string };
export type TrailLine = {
  seq: number;
  at: string;
  iso: string;
  by: string;
  seat?: string;
  act: string;
  why?: string;
  changes: TrailChange[];
  /** Changes that are not listed. */
  more: number;
  hash: string;
};
export type TrailView = { entries: TrailLine[]; before: number | null };

const PAGE = 100;
const SHOWN = 12;

type Fields = Record<string, unknown>;
const isFields = (value: unknown): value is Fields =>
  typeof value === 'object' && value !== null && !Array.isArray(value);

const isQuantity = (value: unknown): value is Q & Fields =>
  isFields(value) && typeof value['value'] === 'number' && typeof value['unit'] === 'string';

/** A value of a change in words; a whole element is called by its tag or name. */
function words(value: unknown): string | undefined {
  if (value === undefined || value === null) return undefined;
  if (typeof value === 'string')
    return STAGE_WORDS[value as Stage] ?? (/^[0-9a-f]{64}$/.test(value) ? shortHash(value) : value);
  if (typeof value === 'number') return String(value);
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  if (Array.isArray(value)) return `${String(value.length)} ${value.length === 1 ? 'entry' : 'entries'}`;
  if (!isFields(value)) return undefined;
  if (value['type'] === 'doc') return plainText(value as Parameters<typeof plainText>[0]);
  if (isQuantity(value)) return formatQuantity(value);
  const name = ['tag', 'name', 'title', 'text', 'word', 'use', 'unknown', 'key']
    .map((key) => value[key])
    .find((each) => typeof each === 'string');
  return typeof name === 'string' ? name : 'an entry';
}

/** Old and new value so that a reader sees what moved: enough digits, or the origin where the figure stood. */
function pairOf(old: unknown, now: unknown): [string | undefined, string | undefined] {
  if (isQuantity(old) && isQuantity(now)) {
    if (old.value !== now.value || old.unit !== now.unit) return toldApart(old, now);
    const figure = formatQuantity(now);
    const from = (one: Fields) => originWords(one['origin'] as Origin | undefined) ?? 'no origin';
    return [`${figure}, ${from(old)}`, from(now)];
  }
  const [one, two] = [words(old), words(now)];
  return one !== undefined && one === two ? [undefined, `${two}, edited`] : [one, two];
}

function whereOf(of: OpenedCase, row: TrailRow, path: string): string {
  if (path === 'stage') return 'Stage';
  const document = of.file.documents.find(
    (one) => path.startsWith(`${one.document.id}:`) || row.subject === one.document.id,
  );
  const inside = path.slice(path.indexOf(':') + 1);
  if (document && (path.includes(':') || getAt(document.after?.body ?? {}, path) !== undefined))
    return placeOf(of, `${document.document.id}:${inside}`).label.replaceAll('_', ' ');
  const [list = '', id = ''] = path.split('/');
  if (list === 'findings') return `Finding ${id}`;
  if (list === 'unseen') return `Unseen check, ${path.slice(7)}`;
  if (list === 'agreements') return `Sheet ${path.split('/').slice(2).join('/')}`;
  return path.includes('/') ? placeOf(of, path).label : path;
}

function lineOf(of: OpenedCase, row: TrailRow, names: ReadonlyMap<string, string>): TrailLine {
  const changes = row.body.changes.slice(0, SHOWN).map((change): TrailChange => {
    const [old, now] = pairOf(change.old, change.new);
    return {
      where: whereOf(of, row, change.path),
      ...(old === undefined ? {} : { old }),
      ...(now === undefined ? {} : { now }),
    };
  });
  return {
    seq: row.seq,
    at: instantWords(row.at, of.file.site.timeZone),
    iso: row.at,
    by: row.byId === 'system' ? 'The program' : (names.get(row.byId) ?? row.byId),
    ...(row.seat === null ? {} : { seat: ROLE_WORDS[row.seat as Role] }),
    act: TRAIL_WORDS[row.act] ?? row.act.replace('.', ' ').replaceAll('-', ' '),
    ...(row.body.why === undefined ? {} : { why: row.body.why }),
    changes,
    more: row.body.changes.length - changes.length,
    hash: shortHash(row.hash),
  };
}

/** The trail of the case, youngest first. HIDDEN while the reader's view of the case is hidden, for it names what was changed to what. */
export async function trailView(of: OpenedCase, before?: number): Promise<Result<TrailView>> {
  const may = can(whoOf(of.actor), 'read-trail-of-case', { ...onFile(of.file), hidden: of.hidden });
  if (!may.ok) return fail(may.code, may.sentence);
  await noteLook(of, 'trail');
  const rows = await readTrail(of.ctx.db, of.file.site.id, {
    caseId: of.file.row.id,
    limit: PAGE,
    ...(before === undefined ? {} : { before }),
  });
  const people = await findPeople(of.ctx.db, [...new Set(rows.map((row) => row.byId))]);
  const names = new Map(people.map((person) => [person.id, person.name]));
  const last = rows.at(-1);
  return ok({
    entries: rows.map((row) => lineOf(of, row, names)),
    before: rows.length === PAGE && last ? last.seq : null,
  });
}
