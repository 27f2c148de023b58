/* What a basis leans on: references, justifications, imports of header revisions. */
import { z } from 'zod';
import { richSchema } from '@domain/text/schema';
import { say } from './fields';
import {
  daySchema,
  hashSchema,
  idSchema,
  pathSchema,
  quantitySchema,
  tagSchema,
  wordSchema,
} from './figures';

export const REFERENCE_KINDS = [
  'pid',
  'drawing',
  'data-sheet',
  'calculation',
  'simulation',
  'rerate',
  'calorimetry',
  'stress',
  'procedure',
  'standard',
  'letter',
  'other',
] as const;

export const referenceSchema = z.strictObject({
  id: idSchema,
  title: z.string().max(400),
  names: say('tags it names', z.array(tagSchema)),
  file: idSchema.optional(),
  kind: z.enum(REFERENCE_KINDS),
});
export type Reference = z.infer<typeof referenceSchema>;

export const justificationSchema = z.strictObject({
  id: idSchema,
  code: wordSchema,
  subject: pathSchema,
  values: z.record(z.string().max(80), z.union([quantitySchema, z.string().max(2000)])),
  hash: hashSchema,
  text: richSchema,
  by: idSchema,
  on: daySchema,
  acceptedBy: idSchema.optional(),
  file: idSchema.optional(),
});
export type Justification = z.infer<typeof justificationSchema>;

export const importSchema = z.strictObject({
  id: idSchema,
  header: idSchema,
  revision: z.number().int().min(0),
  node: idSchema,
});
export type Import = z.infer<typeof importSchema>;

export const assumptionSchema = z.strictObject({ id: idSchema, text: richSchema });
