/* Field conditions: things in the plant that a scenario depends on. */
import { z } from 'zod';
import { say } from './fields';
import { figure, idSchema, lineSchema, tagSchema, wordSchema } from './figures';

export const FIELD_CONDITION_KINDS = [
  'lock-open',
  'lock-shut',
  'blind',
  'spool',
  'travel-stop',
  'trim',
  'orifice',
  'impeller',
  'governor',
  'spring',
  'fail-position',
  'check-valve',
  'drain',
  'vent',
  'insulation',
  'level-switch',
  'supply',
  'other',
] as const;

export const fieldConditionSchema = z.strictObject({
  id: idSchema,
  tag: tagSchema,
  requires: z.strictObject({
    figure: say('required figure', figure().optional()),
    words: lineSchema.optional(),
  }),
  lock: z
    .strictObject({
      number: say('number of the lock', wordSchema),
      keeper: say('keeper of the key', wordSchema),
    })
    .optional(),
  where: wordSchema.optional(),
  photo: say('photograph needed', z.boolean()),
  roundMonths: say('months between rounds', z.number().int().positive().max(120).optional()),
  kind: z.enum(FIELD_CONDITION_KINDS),
});
export type FieldCondition = z.infer<typeof fieldConditionSchema>;
