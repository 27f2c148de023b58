/* Text that people type into the acts of a case: trimmed, capped, refused with a sentence. */
import { z } from 'zod';
import { cleanRich } from '@domain/text/clean';
import { richFromText } from '@domain/text/read';
import { type Rich } from './scalars';

/** Longest texts taken, in characters; a rich text is measured by its JSON. */
export const CAPS = { line: 200, reason: 4_000, rich: 100_000, list: 200 } as const;

/** A short text of one line. `what` names the field in the sentence of a refusal. */
export function line(what: string, min = 1) {
  return z
    .string({ error: `${what} must be text.` })
    .trim()
    .min(min, `${what} is empty: write it in one line.`)
    .max(CAPS.line, `${what} is longer than ${CAPS.line} characters: shorten it to one line.`);
}

/** A reason or remark of a few sentences; `min` is the site's reason length where one is asked. */
export function reason(what: string, min = 1) {
  return z
    .string({ error: `${what} must be text.` })
    .trim()
    .min(min, min > 1 ? `${what} needs at least ${min} characters: say why.` : `${what} is empty: say why.`)
    .max(CAPS.reason, `${what} is longer than ${CAPS.reason} characters: shorten it or attach a file.`);
}

/** What a form sends for a rich text: the editor's JSON as a string, or the plain text of a bare text area. */
export function richOfField(value: unknown): unknown {
  if (typeof value !== 'string') return value;
  if (!value.startsWith('{"type":"doc"')) return richFromText(value);
  try {
    return cleanRich(JSON.parse(value));
  } catch {
    return richFromText(value);
  }
}

/** Rich text as the editor sends it, or plain text of a form; its nodes are cleaned by the text module before storing. */
export function rich(what: string) {
  const doc = z
    .object(
      {
        type: z.literal('doc', { error: `${what} is not a text of the editor.` }),
        content: z
          .array(z.unknown(), { error: `${what} is not a text of the editor.` })
          .max(2_000, `${what} is too long.`),
      },
      { error: `${what} is not a text of the editor.` },
    )
    .refine((value) => JSON.stringify(value).length <= CAPS.rich, {
      error: `${what} is longer than ${CAPS.rich} characters: shorten it or attach a file.`,
    });
  return z.preprocess(richOfField, doc) satisfies z.ZodType<Rich>;
}

/** A day of the calendar, `2026-03-17`. */
export function day(what: string) {
  return z.iso.date({ error: `${what} must be a day such as 2026-03-17.` });
}

/** An id made by the program. */
export function id(what: string) {
  return z
    .string({ error: `${what} is missing.` })
    .min(1, `${what} is missing.`)
    .max(120, `${what} is not an id of this site.`);
}
