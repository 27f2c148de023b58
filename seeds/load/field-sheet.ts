/* Field sheets of seeded cases: lines from the signed revision, what operations saw, discrepancies. */
import { type Q } from '@engine/quantity';
import {
  type Discrepancy,
  type FieldEntry,
  type FieldFacts,
  type FieldLine,
  fieldLines,
} from '@domain/field';
import { newId } from '@data/ids';
import { insert, insertMany } from '@data/mapping';
import { DISCREPANCIES, FIELD_ENTRIES, FIELD_LINES } from '@data/tables/field';
import { idOf, personId, pointId, systemOf } from '../convert';
import supplement from '../data/supplement/site.json';
import { type DemoDiscrepancy, type DemoFieldLine } from '../cases/demo-case-types';
import { photoId, writePhoto } from './photos';
import { type CaseDoc, type CasePlan } from './plan';

const INSTALLERS: Record<string, string | undefined> = supplement.shops.installers;
const LINE_TIME = 60_000;

/** Where an item of theirs stands on our sheet, by its wording. */
const ITEMS: [RegExp, (device: string) => string][] = [
  [/^tag plate/, (device) => `reliefPoints/${pointId(device)}/tag`],
  [/^orifice letter/, (device) => `reliefPoints/${pointId(device)}/orifice/letter`],
  [/^set pressure/, (device) => `reliefPoints/${pointId(device)}/set`],
  [/^CDTP/, (device) => `reliefPoints/${pointId(device)}/cdtp`],
  [/^connections/, (device) => `reliefPoints/${pointId(device)}/inlet`],
  [/^serial equals/, (device) => `reliefPoints/${pointId(device)}#serial`],
  [/^as-left pop/, (device) => `reliefPoints/${pointId(device)}#as-left`],
  [/^flow area/, (device) => `reliefPoints/${pointId(device)}/orifice/actual`],
  [/^CV-201 position/, () => `isolations/${idOf('iso', 'CV-201', 'inlet')}/kept`],
  [/^lever seal number/, () => `isolations/${idOf('iso', 'CV-201', 'inlet')}/lock/number`],
  [/^closed bonnet/, (device) => `reliefPoints/${pointId(device)}/bonnet/plug`],
  [/^vent open/, (device) => `reliefPoints/${pointId(device)}/bonnet/vent`],
  [/^shipping plugs/, (device) => `reliefPoints/${pointId(device)}#transport`],
  [/^(lateral|outlet to header)/, (device) => `lines/${idOf('ln', `${device}/out`)}#drawn`],
  [/^plate of the rental/, () => `sources/${idOf('src', 'PCV-440T')}/valve/coefficient`],
];

/** One observation of theirs that has a line of ours. */
export type Seen = { key: string; device: string; demo: DemoFieldLine };

function seenOf(plan: CasePlan, doc: CaseDoc): Seen[] {
  return Object.entries(plan.demo.field_sheet?.devices ?? {}).flatMap(([device, lines]) =>
    lines.flatMap((demo) => {
      const at = ITEMS.find(([pattern]) => pattern.test(demo.item))?.[1](device);
      return at === undefined ? [] : [{ key: `${doc.document}:${at}`, device, demo }];
    }),
  );
}

const QUANTITY = /^(-?\d+(?:\.\d+)?) (bar_g|psig|mm2|degC)$/;

/** What was found in the form of the line: a quantity with its printed digits, or the line's own word when it agrees. */
function foundOn(line: FieldLine, seen: Seen | undefined): Q | string {
  const text = seen?.demo.found ?? '';
  const quantity = QUANTITY.exec(text);
  if (quantity) return { value: Number(quantity[1]), unit: quantity[2] ?? '', text: quantity[1] ?? '' };
  if (line.key.endsWith('#serial')) return text === '' ? serialOf(line.key) : text;
  if (seen && seen.demo.result === 'discrepancy') return text;
  return line.wants ?? 'seen';
}

function serialOf(key: string): string {
  const point = /reliefPoints\/(rp_[^#/]+)/.exec(key)?.[1];
  const tag = /^doc_(sys\d+):/.exec(key)?.[1]?.replace('sys', 'SYS-') ?? '';
  const device = systemOf(tag).devices.find((candidate) => pointId(candidate.tag) === point);
  return device?.nameplate.serial ?? '';
}

/** The number that theirs gives a photograph, else one of the case's own. */
function photoNumber(plan: CasePlan, seen: Seen | undefined, n: number): number {
  const told = seen?.demo.photo?.match(/\d+/)?.[0];
  return told === undefined ? Number(plan.demo.id.slice(-3)) * 1000 + n : Number(told);
}

function entryOf(plan: CasePlan, line: FieldLine, seen: Seen | undefined, n: number): FieldEntry {
  const sheet = plan.demo.field_sheet;
  const began = Date.parse(plan.world.shift.instant(`${sheet?.on ?? plan.demo.raised_on}T08:30:00+01:00`));
  const saw = new Date(began + n * LINE_TIME).toISOString();
  const installer = INSTALLERS[plan.demo.id];
  return {
    id: newId('fieldEntry'),
    case: plan.id,
    line: line.key,
    as: 'verifier',
    ...(installer === undefined ? {} : { installer }),
    seen: foundOn(line, seen),
    ...(seen?.demo.photo == null ? {} : { text: `Photograph ${seen.demo.photo}` }),
    files: line.photo ? [photoId(photoNumber(plan, seen, n))] : [],
    ...(line.label === 'Tag plate' ? { scan: typeof line.wants === 'string' ? line.wants : '' } : {}),
    by: personId(sheet?.filled_by ?? 'P-07'),
    saw,
    got: saw,
    device: 'field phone',
  };
}

const STATES: Record<string, Discrepancy['state']> = { open: 'open', closed: 'seen-again' };

/** The entry that a discrepancy of theirs comes from: its device, and an item whose finding did not agree. */
function entryBehind(
  discrepancy: DemoDiscrepancy,
  lines: readonly FieldLine[],
  entries: readonly FieldEntry[],
  seen: readonly Seen[],
): FieldEntry | undefined {
  const own = seen.filter((one) => one.device === discrepancy.device);
  const odd =
    own.find((one) => one.demo.result === 'discrepancy') ??
    own.find((one) => one.demo.item.startsWith('vent'));
  const wanted = odd && lines.find((line) => line.key === odd.key);
  return entries.find((entry) => entry.line === wanted?.key);
}

function discrepanciesOf(
  plan: CasePlan,
  facts: Omit<FieldFacts, 'discrepancies'>,
  seen: readonly Seen[],
): Discrepancy[] {
  return (plan.demo.field_sheet?.discrepancies ?? []).flatMap((demo, n) => {
    const entry = entryBehind(demo, facts.lines, facts.entries, seen);
    if (!entry) return [];
    return [
      {
        id: newId('discrepancy'),
        number: n + 1,
        entry: entry.id,
        holds: demo.holds_start_up,
        state: STATES[demo.state] ?? 'accepted',
        owner: personId(demo.owner),
        clears: `It clears when the line is put right and seen again: ${demo.item}.`,
        posts: demo.thread.map((post) => ({
          by: personId(post.person),
          at: plan.world.shift.instant(post.at),
          text: post.text,
        })),
      },
    ];
  });
}

/** The field sheet of a case: complete when it was issued, as far as theirs goes while it is in the field. */
export function fieldOf(plan: CasePlan): FieldFacts {
  const none: FieldFacts = { lines: [], entries: [], discrepancies: [] };
  const acted = plan.demo.emergency !== undefined;
  if (!['field', 'in-force'].includes(plan.stage) && !acted) return none;
  return plan.documents.reduce<FieldFacts>((facts, doc) => {
    const lines = fieldLines(doc.working.body, doc.base.body);
    const seen = seenOf(plan, doc);
    const entered = lines.filter((line) => !acted || seen.some((one) => one.key === line.key));
    const entries = entered.map((line, n) =>
      entryOf(
        plan,
        line,
        seen.find((one) => one.key === line.key),
        n,
      ),
    );
    const discrepancies = discrepanciesOf(plan, { lines, entries }, seen);
    return {
      lines: [...facts.lines, ...lines],
      entries: [...facts.entries, ...entries],
      discrepancies: [...facts.discrepancies, ...discrepancies],
    };
  }, none);
}

function documentOf(facts: FieldFacts, key: string): string {
  return facts.lines.find((line) => line.key === key)?.document ?? '';
}

async function writePhotos(plan: CasePlan, facts: FieldFacts): Promise<void> {
  for (const entry of facts.entries) {
    for (const file of entry.files) await writePhoto(plan.world, file, entry.by, entry.got);
  }
}

/** Writes lines, entries and discrepancies. */
export async function writeField(plan: CasePlan, facts: FieldFacts): Promise<void> {
  const { trx } = plan.world;
  const signed = plan.stage === 'field' || plan.stage === 'in-force';
  const lines = facts.lines.map((line) => ({
    caseId: plan.id,
    documentId: line.document,
    key: line.key,
    ord: line.order,
    grouped: line.group,
    label: line.label,
    wants: line.wants ?? null,
    photo: line.photo,
    holds: line.holds,
    facts: {},
  }));
  if (signed || facts.entries.length > 0) await insertMany(trx, FIELD_LINES, lines);
  await writePhotos(plan, facts);
  const wrong = new Set(facts.discrepancies.map((one) => one.entry));
  const entries = facts.entries.map(({ case: caseId, as, by, cannot: _cannot, ...entry }) => ({
    ...entry,
    clientId: `seed-${entry.id}`,
    caseId,
    documentId: documentOf(facts, entry.line),
    asWhat: as,
    byId: by,
    agrees: !wrong.has(entry.id),
  }));
  await insertMany(trx, FIELD_ENTRIES, entries);
  for (const { entry, owner, ...one } of facts.discrepancies) {
    const line = facts.entries.find((candidate) => candidate.id === entry)?.line ?? '';
    await insert(trx, DISCREPANCIES, {
      ...one,
      caseId: plan.id,
      documentId: documentOf(facts, line),
      entryId: entry,
      ownerId: owner,
    });
  }
}
