/* What is known of a field besides its shape: the trade's words for it, its range keys, and whether it is one leaf. */
import { z } from 'zod';

/** Metadata of a field: `label` in the trade's words, `keys` of the input ranges (RULES section 3), `leaf` when it differs as a whole. */
export type FieldMeta = { label?: string; keys?: readonly string[]; leaf?: 'figure' | 'rich' | 'input' };

export const FIELDS = z.registry<FieldMeta>();

/** Gives a schema its words; the schema itself is not touched (shared ones keep theirs). */
export function say<S extends z.ZodType>(label: string, schema: S): S {
  const copy = schema.clone() as S;
  FIELDS.add(copy, { label });
  return copy;
}

/** "designVacuum" → "design vacuum": the words of a field that has none of its own. */
export function wordsOfName(name: string): string {
  return name.replace(
    /([a-z0-9])([A-Z])/g,
    (_all, before: string, capital: string) => `${before} ${capital.toLowerCase()}`,
  );
}

/** A sentence begins with a capital. */
export function capital(words: string): string {
  return words.charAt(0).toUpperCase() + words.slice(1);
}
