/* Unseen entries as they are typed: a figure with its unit is read by what the item asks for, and told beside its field when it cannot be. */
import { z } from 'zod';
import { ACT_BODIES, type ActBody, type GateFacts, unseenState, type UnseenItem } from '@domain/case';
import { fail, type FieldError, ok, type Problem, type Result } from '@domain/result';
import { type Dimension, dimensionOf, displayUnit, readTyped, UNITS } from '@engine/quantity';
import { loadCaseFile } from '../case-file';
import { type Actor, type Ctx, today } from '../context';
import { gateFacts } from '../gate-facts';
import { type Write } from '../one-act';
import { enterUnseen, type UnseenAnswer } from './unseen';

const entry = ACT_BODIES.unseen.shape.entries.element;
const text = (most: number) => z.string().max(most, `At most ${String(most)} characters are taken here.`);
const typedEntry = z.strictObject({
  document: text(120),
  scope: text(400),
  typed: text(40).optional(),
  unit: text(24).optional(),
  word: text(200).optional(),
  cites: text(200).optional(),
});
/** Entries as programs send them (`value`) or as a form does (`typed` and `unit`). */
export const unseenBodySchema = z.strictObject({
  entries: z
    .array(z.union([typedEntry, entry]), { error: 'Send a list of entries.' })
    .min(1, 'Enter at least one.')
    .max(200, 'Too many entries at once.'),
});
export type UnseenBody = z.infer<typeof unseenBodySchema>;
type Sent = UnseenBody['entries'][number];
type Entry = ActBody<'unseen'>['entries'][number];

/** The dimensions that an item takes: a pressure may be given gauge or absolute, for the program knows the barometer. */
export function dimensionsOf(item: UnseenItem): Dimension[] {
  if (item.ask.kind === 'word') return [];
  const { dimension } = item.ask;
  const reading = dimension === 'pressure-gauge' || dimension === 'pressure-absolute';
  return reading
    ? [dimension, dimension === 'pressure-gauge' ? 'pressure-absolute' : 'pressure-gauge']
    : [dimension];
}

/** The unit that a bare number of an item means, unless another was chosen. */
export function unitOf(item: UnseenItem, system: 'SI' | 'US'): string {
  if (item.ask.kind === 'word') return '';
  if (item.quantity === 'inlet-loss' && item.ask.dimension === 'dimensionless') return '%';
  return displayUnit(item.ask.dimension, system);
}

/** The units that an item may be entered in. */
export function unitsFor(item: UnseenItem): string[] {
  const takes = dimensionsOf(item);
  return Object.keys(UNITS).filter((unit) => {
    const dimension = dimensionOf(unit);
    return dimension !== undefined && takes.includes(dimension);
  });
}

type Item = { item: UnseenItem; system: 'SI' | 'US' };
type Read = { entry: Entry } | { error: FieldError; code: Problem['code'] } | undefined;

function itemsOf(facts: GateFacts): Map<string, Item> {
  return new Map(
    facts.documents.flatMap((of) =>
      unseenState(of, facts).items.map((item): [string, Item] => [
        `${of.document} ${item.scope}`,
        { item, system: of.doc?.units ?? 'SI' },
      ]),
    ),
  );
}

function wrong(index: number, field: string, code: string, sentence: string): Read {
  const path = `entries/${String(index)}/${field}`;
  return { error: { path, code, sentence }, code: code === 'UNIT_AMBIGUOUS' ? code : 'SCHEMA' };
}

function readOne(sent: Sent, index: number, found: Item | undefined): Read {
  const { document, scope } = sent;
  const own = { document, scope, ...(sent.cites ? { cites: sent.cites } : {}) };
  if ('value' in sent && sent.value) {
    const dimension = dimensionOf(sent.value.unit);
    if (found && (dimension === undefined || !dimensionsOf(found.item).includes(dimension)))
      return wrong(
        index,
        'value',
        'dimension',
        `${found.item.label}: ${sent.value.unit} does not measure this.`,
      );
    return { entry: { ...own, value: sent.value } };
  }
  if (sent.word !== undefined && sent.word !== '') return { entry: { ...own, word: sent.word } };
  const typed = 'typed' in sent ? (sent.typed ?? '').trim() : '';
  if (typed === '') return undefined;
  if (!found) return { entry: { ...own, word: typed } };
  const unit = 'unit' in sent && sent.unit ? sent.unit : unitOf(found.item, found.system);
  const takes = dimensionsOf(found.item);
  if (takes.length === 0) return wrong(index, 'typed', 'kind', `${found.item.label}: choose one.`);
  const read = readTyped(typed, { dimension: takes, unit });
  if (!read.ok) return wrong(index, 'typed', read.code, `${found.item.label}: ${read.sentence}`);
  return { entry: { ...own, value: read.q } };
}

function readAll(body: UnseenBody, facts: GateFacts): Result<ActBody<'unseen'>> {
  const items = itemsOf(facts);
  const read = body.entries.map((sent, index) =>
    readOne(sent, index, items.get(`${sent.document} ${sent.scope}`)),
  );
  const bad = read.flatMap((one) => (one && 'error' in one ? [one] : []));
  const first = bad[0];
  if (first) {
    const code = bad.every((one) => one.code === 'UNIT_AMBIGUOUS') ? 'UNIT_AMBIGUOUS' : 'SCHEMA';
    return fail(code, first.error.sentence, { errors: bad.map((one) => one.error) });
  }
  const entries = read.flatMap((one) => (one && 'entry' in one ? [one.entry] : []));
  if (entries.length > 0) return ok({ entries });
  return fail('SCHEMA', 'Nothing was entered: fill in at least one reading, choice or figure.', {
    errors: [{ path: 'entries/0/typed', code: 'missing', sentence: 'Enter at least one.' }],
  });
}

/** Enters what was typed. Permission and stage are judged first; a figure that cannot be read is refused beside its field. */
export async function enterTypedUnseen(
  ctx: Ctx,
  actor: Actor,
  number: string,
  sent: Write<UnseenBody>,
): Promise<Result<UnseenAnswer>> {
  const { body } = sent;
  if (!body.ok) return enterUnseen(ctx, actor, number, { ...sent, body });
  const file = await loadCaseFile(ctx.db, actor.site, number);
  if (!file) return fail('UNKNOWN', `This site has no case ${number}.`);
  const facts = await gateFacts(ctx.db, file, today(ctx, actor.site), true);
  return enterUnseen(ctx, actor, number, { ...sent, body: readAll(body.value, facts) });
}
