/* External sheets: calculations made elsewhere, with author, inputs and figures; checked like ours. */
import { z } from 'zod';
import { say } from './fields';
import { daySchema, figure, hashSchema, idSchema, inputsSchema, lineSchema, wordSchema } from './figures';

export const externalSheetSchema = z.strictObject({
  id: idSchema,
  about: z.enum(['load', 'size', 'rated', 'inlet', 'outlet', 'force', 'other']),
  title: wordSchema,
  author: wordSchema,
  person: idSchema.optional(),
  on: say('date', daySchema.optional()),
  method: lineSchema,
  edition: wordSchema.optional(),
  file: idSchema.optional(),
  inputs: inputsSchema,
  madeOf: say('inputs it was made of', hashSchema.optional()),
  figures: z.record(z.string().min(1).max(80), figure()),
  words: z.record(z.string().min(1).max(80), lineSchema).optional(),
});
export type ExternalSheet = z.infer<typeof externalSheetSchema>;
