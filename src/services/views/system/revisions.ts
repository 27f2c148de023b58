/* Revisions of a system: the list, and what differs between two of them, in words and in results. */
import { type Basis, isFigure, isFields, isRich, plainText } from '@domain/basis';
import { type Change, difference, movedResults } from '@domain/difference';
import { maskChange, maskProse } from '@domain/hidden';
import { fail, ok, type Result } from '@domain/result';
import { type Q } from '@engine/quantity';
import { type RevisionRow } from '@data/revisions';
import { signaturesOfCase } from '@data/signatures';
import { dayAt } from '../days';
import { madeOfWords } from '../made-of';
import { resultLabel } from '../result-label';
import { inline, originWords, shownFigure } from '../shown';
import { toldApart } from '../told-apart';
import { baseOf } from './frame';
import { type OpenedSystem, type Seen, seenOf } from './open';

export type RevisionLine = {
  name: string;
  state: string;
  since: string;
  case?: { number: string; href: string };
  by: string;
  note: string;
  /** Where it can be read; absent where its body was never held here. */
  href?: string;
  differences?: string;
};

const STATES: Record<string, string> = {
  'in-force': 'in force',
  approved: 'approved, not installed',
  working: 'working',
  superseded: 'superseded',
  dropped: 'dropped',
};

async function signerOf(of: OpenedSystem, revision: RevisionRow): Promise<string> {
  if (revision.caseId === null) return '';
  const signatures = await signaturesOfCase(of.ctx.db, revision.caseId);
  const last = signatures.filter((one) => one.voids.length === 0 && one.gate === 'approval').at(-1);
  return last ? `${last.name}, ${last.role}` : '';
}

async function lineOf(
  of: OpenedSystem,
  revision: RevisionRow,
  before: RevisionRow | undefined,
): Promise<RevisionLine> {
  const zone = of.actor.site.timeZone;
  const number = revision.caseId ? of.caseNumbers.get(revision.caseId) : undefined;
  const base = baseOf(of);
  const name = revision.number === null ? 'not numbered yet' : String(revision.number);
  const since = revision.inPlantFrom ?? revision.approvedAt;
  const own = revision.state === 'in-force' ? base : `${base}?revision=${name}`;
  const to = revision.number === null ? 'approved' : name;
  return {
    name,
    state: STATES[revision.state] ?? revision.state,
    since: since ? dayAt(since, zone) : '',
    by: await signerOf(of, revision),
    note: of.hidden ? maskProse(revision.note ?? '') : (revision.note ?? ''),
    ...(number === undefined ? {} : { case: { number, href: `/s/${of.actor.site.slug}/cases/${number}` } }),
    ...(revision.number !== null && revision.held ? { href: own } : {}),
    ...(before && revision.held
      ? { differences: `${base}/revisions/difference?from=${String(before.number)}&to=${to}` }
      : {}),
  };
}

/** The revisions of an opened system, newest first; working ones belong to their cases and are left out. */
export async function revisionLines(of: OpenedSystem): Promise<RevisionLine[]> {
  const approved = of.revisions.filter((one) => one.state === 'approved');
  const all = [...approved, ...of.revisions.filter((one) => one.number !== null)];
  return Promise.all(
    all.map((one) => {
      const older = of.revisions.filter(
        (each) => each.held && each.number !== null && (one.number === null || each.number < one.number),
      );
      return lineOf(of, one, older[0]);
    }),
  );
}

export type DifferenceLine = {
  where: string;
  old?: string;
  now?: string;
  unit?: string;
  origin?: string;
  kind: 'changed' | 'added' | 'removed' | 'moved';
  set?: boolean;
  hidden?: boolean;
  words?: { text: string; kind: 'same' | 'removed' | 'added' }[];
};
export type DifferenceView = {
  from: string;
  to: string;
  rows: DifferenceLine[];
  moved: DifferenceLine[];
  hidden: boolean;
};

/** A value of a difference in words; whole elements are told by what they are called. */
function valueWords(value: unknown): string | undefined {
  if (value === undefined) return undefined;
  if (isFigure(value)) return inline(shownFigure(value));
  if (isRich(value)) return plainText(value);
  if (Array.isArray(value)) return value.map((one) => valueWords(one) ?? '').join(', ');
  if (isFields(value)) {
    const named = ['tag', 'name', 'title', 'text']
      .map((key) => value[key])
      .find((one) => typeof one === 'string');
    return typeof named === 'string' ? named : 'as entered';
  }
  return typeof value === 'boolean' ? (value ? 'yes' : 'no') : String(value);
}

const KINDS = { moved: 'changed', added: 'added', removed: 'removed', order: 'moved' } as const;
const WORDS = { equal: 'same', added: 'added', removed: 'removed' } as const;

function rowOf(change: Change, sides: { from: Basis; to: Basis }, hidden: boolean): DifferenceLine {
  const kind = KINDS[change.kind];
  if (hidden) return { where: maskChange(change).label, kind, hidden: true };
  const made = madeOfWords(sides.from, sides.to, change.path);
  const old = change.kind === 'order' ? undefined : made ? 'the inputs of then' : valueWords(change.old);
  const now = change.kind === 'order' ? undefined : (made ?? valueWords(change.now));
  const origin = isFigure(change.now) && 'origin' in change.now ? originWords(change.now.origin) : undefined;
  return {
    where: change.label,
    kind,
    ...(old === undefined ? {} : { old }),
    ...(now === undefined ? {} : { now }),
    ...(origin === undefined ? {} : { origin }),
    ...(/^reliefPoints\/[^/]+\/set$/.test(change.path) ? { set: true } : {}),
    ...(change.words
      ? { words: change.words.map((part) => ({ text: part.text, kind: WORDS[part.kind] })) }
      : {}),
  };
}

/** The results that a difference tells; everything else stands on the sheets. */
const TOLD = /^sheets\/.*#(A_required|relief_load|relieving_pressure|MAAP|verdict|CDTP)$/;
function movedRows(from: Seen, to: Seen): DifferenceLine[] {
  if (!from.evaluation || !to.evaluation) return [];
  const shown = movedResults(from.evaluation, to.evaluation).filter((one) => TOLD.test(one.path));
  return shown.map((moved) => {
    const [key = '', output = ''] = moved.path.replace(/^sheets\//, '').split('#');
    const where = resultLabel(to.body, key, output);
    const both = typeof moved.old === 'object' && typeof moved.now === 'object';
    const [old, now] = both
      ? toldApart(moved.old as Q, moved.now as Q)
      : [valueWords(moved.old), valueWords(moved.now)];
    return {
      where,
      kind: 'changed',
      ...(old === undefined ? {} : { old }),
      ...(now === undefined ? {} : { now }),
    };
  });
}

async function sideOf(of: OpenedSystem, name: string): Promise<Result<Seen>> {
  const found =
    name === 'approved'
      ? of.revisions.find((one) => one.state === 'approved')
      : of.revisions.find((one) => one.number !== null && String(one.number) === name);
  const seen = found && (await seenOf(of, found));
  if (seen) return ok(seen);
  return fail('UNKNOWN', `${of.document.tag} holds no revision ${name.slice(0, 20)} that can be compared.`);
}

/** What differs between two revisions, `from` and `to` by number or "approved". */
export async function differenceOf(
  of: OpenedSystem,
  from: string,
  to: string,
): Promise<Result<DifferenceView>> {
  const one = await sideOf(of, from);
  if (!one.ok) return one;
  const other = await sideOf(of, to);
  if (!other.ok) return other;
  const { barometer } = of.actor.site;
  const sides = { from: one.value.body, to: other.value.body };
  const changes = difference(sides.from, sides.to, { barometer });
  return ok({
    from: from === 'approved' ? 'Approved' : `Rev ${from}`,
    to: to === 'approved' ? 'Approved' : `Rev ${to}`,
    rows: changes.map((change) => rowOf(change, sides, of.hidden)),
    moved: movedRows(one.value, other.value),
    hidden: of.hidden,
  });
}
