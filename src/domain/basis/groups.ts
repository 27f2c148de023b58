/* Groups of relief points that act together, isolation valves and interlocks. */
import { z } from 'zod';
import { say } from './fields';
import { idSchema, lineSchema, maybe, tagSchema, wordSchema } from './figures';

export const groupSchema = z.strictObject({
  id: idSchema,
  name: wordSchema.optional(),
  note: lineSchema.optional(),
  limiting: say('limiting item', z.strictObject({ equipment: idSchema, side: idSchema.optional() })),
  covers: say(
    'covers',
    z.array(z.strictObject({ id: idSchema, equipment: idSchema, side: idSchema.optional() })),
  ),
  makeUp: say('make-up of vacuum', z.array(idSchema).optional()),
  members: z.array(
    z.strictObject({
      id: idSchema,
      point: say('relief point', idSchema),
      credited: say('credited', z.boolean()),
      place: z.enum(['first', 'additional', 'supplementary-fire', 'spare']),
    }),
  ),
});
export type Group = z.infer<typeof groupSchema>;

export const isolationSchema = z.strictObject({
  id: idSchema,
  tag: tagSchema.optional(),
  where: z.enum(['inlet', 'outlet', 'process']),
  protects: say('relief points it can shut off', z.array(idSchema)),
  kind: z.enum(['gate', 'ball', 'globe', 'plug', 'three-way', 'other']),
  fullBore: z.boolean().optional(),
  bore: maybe('bore'),
  k: say('loss coefficient', maybe('sumK')),
  stem: say('position of the stem', wordSchema.optional()),
  kept: z.enum(['open', 'shut', 'either']),
  interlock: idSchema.optional(),
  note: lineSchema.optional(),
  pClosed: say('pressure when closed', maybe('operatingPressure')),
  controls: z.array(z.string().max(400)).optional(),
  lock: z
    .strictObject({
      kind: z.enum(['lock', 'car-seal', 'key', 'pin', 'none']),
      number: say('number of the lock', wordSchema.optional()),
      keeper: say('keeper of the key', wordSchema.optional()),
    })
    .optional(),
  class: z.enum(['cuts-all-sources', 'process-path', 'maintenance']).optional(),
});
export type Isolation = z.infer<typeof isolationSchema>;

export const interlockSchema = z.strictObject({
  id: idSchema,
  tag: tagSchema,
  kind: z.enum(['changeover', 'key', 'other']),
  text: lineSchema,
  shutTogether: say('shut together', z.array(z.strictObject({ id: idSchema, points: z.array(idSchema) }))),
});
export type Interlock = z.infer<typeof interlockSchema>;
