/* What is sent from the field: entries as a phone's queue or a form without script gives them. */
import { z } from 'zod';
import { ACT_BODIES } from '@domain/case';
import { dimensionOf, type Q, readTyped } from '@engine/quantity';

const words = (what: string, most: number) =>
  z
    .string({ error: `${what} must be text.` })
    .trim()
    .max(most, `${what} is too long.`);

/** A reading as it was typed, with the unit that stands beside it. */
const typed = z
  .object({ typed: words('The reading', 60), unit: words('The unit', 24) })
  .transform(({ typed: text, unit }, check): Q => {
    const dimension = dimensionOf(unit);
    const read = dimension
      ? readTyped(text, { dimension, unit })
      : { ok: false as const, sentence: `There is no unit ${unit}.` };
    if (read.ok) return read.q;
    check.addIssue({ code: 'custom', message: read.sentence, path: ['typed'] });
    return z.NEVER;
  });

const quantity = z.strictObject({
  value: z.number({ error: 'A figure must be a number.' }),
  unit: z
    .string()
    .max(24)
    .refine((unit) => dimensionOf(unit) !== undefined, 'There is no such unit.'),
  text: z.string().max(40, 'A figure has at most 40 characters.').optional(),
});

const cannot = z.object({
  why: z.enum(['reach', 'painted', 'insulated', 'other'], { error: 'Say why it cannot be read.' }),
  means: words('The second means', 400).min(3, 'Say by which second means it was established.'),
  second: words('The second person', 80).min(1, 'Name the second person.'),
});

const isBlank = (value: unknown): boolean =>
  typeof value === 'object' && value !== null
    ? Object.entries(value).every(([name, inner]) => name === 'unit' || inner === '')
    : value === undefined || value === '';

/** Leaves out what a form sends although nothing was filled in. */
function filled(entry: unknown): unknown {
  if (typeof entry !== 'object' || entry === null || Array.isArray(entry)) return entry;
  const { seen, cannot: why, blank: _blank, ...rest } = entry as Record<string, unknown>;
  return {
    ...rest,
    ...(isBlank(seen) ? {} : { seen }),
    ...(isBlank(why) ? {} : { cannot: why }),
  };
}

/** A row of a form that says that it may stay empty, and did. */
function isEmptyRow(entry: unknown): boolean {
  if (typeof entry !== 'object' || entry === null || !('blank' in entry)) return false;
  const { seen, cannot: why } = entry as { seen?: unknown; cannot?: unknown };
  return isBlank(seen) && isBlank(why);
}

const shape = z
  .strictObject({
    client: words('The entry', 80).min(1, 'The entry has no id.'),
    line: words('The line', 400).min(1, 'The line is missing.'),
    as: z.enum(['installer', 'verifier'], { error: 'Say whether you installed it or verify it.' }),
    installer: words('The installer', 200).optional(),
    seen: z
      .union([quantity, typed, words('What is there', 400).min(1, 'Enter what is there.')], {
        error: 'Enter what is there: a word, or a figure with its unit.',
      })
      .optional(),
    text: words('The remark', 4_000).optional(),
    files: z.array(words('The photograph', 80)).max(20, 'At most 20 photographs go with a line.').default([]),
    scan: words('The scanned tag', 200).optional(),
    saw: z.iso.datetime({ error: 'The time at which it was seen is not a time.' }).optional(),
    device: words('The phone', 200).default('browser'),
    cannot: cannot.optional(),
  })
  .refine((entry) => entry.seen !== undefined || entry.cannot !== undefined, {
    error: 'Enter what is there, or say that it cannot be read.',
    path: ['seen'],
  });

const entry = z.preprocess(filled, shape);
export type EntryBody = z.output<typeof shape>;

/** Entries of a field sheet; rows that a form marks with `blank` may stay empty. */
export const entriesSchema = z.strictObject({
  entries: z.preprocess(
    (list) => (Array.isArray(list) ? list.filter((row) => !isEmptyRow(row)) : list),
    z
      .array(entry, { error: 'Send the lines as a list of entries.' })
      .min(1, 'Enter at least one line.')
      .max(200, 'At most 200 lines are taken at once.'),
  ),
});
export type EntriesBody = { entries: EntryBody[] };

/** A line seen again after it was put right. */
export const seeAgainSchema = z.strictObject({ entry });
export const fixSchema = ACT_BODIES.fix;
export const sendBackSchema = ACT_BODIES['send-back'];
