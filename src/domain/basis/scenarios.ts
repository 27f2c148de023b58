/* Scenarios of a basis: disposition with its reason, answers with load and sizing, what they rest on. */
import { z } from 'zod';
import { richSchema } from '@domain/text/schema';
import { say } from './fields';
import { FIELD_CONDITION_KINDS } from './field-conditions';
import {
  daySchema,
  figure,
  figureRefSchema,
  idSchema,
  inputSchema,
  inputsSchema,
  lineSchema,
  maybe,
  STATUSES,
  tagSchema,
  wordSchema,
} from './figures';

export const DISPOSITIONS = ['credible', 'below-limit', 'not-credible', 'not-applicable'] as const;
export const ACCUMULATIONS = [
  'single',
  'several',
  'fire',
  'storage-fire',
  'tank',
  'tank-vacuum',
  'corrected-test',
] as const;

/** How a load or a size is had: by a method, given, by an external sheet, as a sum of answers, or not at all. */
export const calcSchema = z.discriminatedUnion('by', [
  z.strictObject({
    by: z.literal('method'),
    method: z.string().min(1).max(80),
    edition: z.string().max(80).optional(),
    inputs: inputsSchema,
  }),
  z.strictObject({ by: z.literal('given'), figure: figure('reliefLoad') }),
  z.strictObject({ by: z.literal('external'), sheet: idSchema }),
  z.strictObject({ by: z.literal('sum'), of: z.array(idSchema) }),
  z.strictObject({ by: z.literal('none') }),
]);
export type Calc = z.infer<typeof calcSchema>;

export const answerSchema = z.strictObject({
  id: idSchema,
  name: wordSchema.optional(),
  fluid: idSchema.optional(),
  group: idSchema.optional(),
  limiting: say(
    'limiting item',
    z.strictObject({ equipment: idSchema, side: idSchema.optional() }).optional(),
  ),
  liquidFull: z.boolean().optional(),
  T: say('relieving temperature', maybe('relievingTemperature')),
  lowest: say('lowest operating pressure', maybe('operatingPressure')),
  load: say('relief load', calcSchema),
  size: say('sizing', calcSchema),
  accumulation: z.enum(ACCUMULATIONS),
});
export type Answer = z.infer<typeof answerSchema>;

const safeguardSchema = z.strictObject({
  id: idSchema,
  kind: z.enum(['trip', 'alarm', 'person']),
  tag: tagSchema.optional(),
  target: wordSchema.optional(),
  test: wordSchema.optional(),
  minutes: say('time to act', maybe('minutes')),
  independentAlarm: z.boolean().optional(),
});

const boundSchema = z.strictObject({
  figure: say('figure that bounds it', inputSchema),
  live: figureRefSchema.optional(),
  head: say('head added', maybe('rise')),
  limit: z.strictObject({ equipment: idSchema, side: idSchema, of: z.enum(['mawp', 'external']) }),
});

const STATUS_FLAGS = z.boolean().optional();
const statusesSchema = z.strictObject(
  Object.fromEntries(STATUSES.map((status) => [status, STATUS_FLAGS])) as Record<
    (typeof STATUSES)[number],
    typeof STATUS_FLAGS
  >,
);

export const scenarioSchema = z.strictObject({
  id: idSchema,
  key: z.string().min(1).max(80),
  about: z.array(idSchema).optional(),
  statuses: say('operating statuses', statusesSchema),
  reason: richSchema,
  sources: z.array(idSchema).optional(),
  utility: idSchema.optional(),
  answers: z.array(answerSchema),
  disposition: z.enum(DISPOSITIONS).optional(),
  why: say(
    'why not credible',
    z.enum(['absent', 'controlled', 'double-jeopardy', 'real-independence']).optional(),
  ),
  twice: say(
    'two failures at once',
    z
      .strictObject({
        first: lineSchema,
        second: lineSchema,
        shared: z.enum(['none', 'shared']),
        hidden: z.enum(['no', 'yes']),
      })
      .optional(),
  ),
  otherMeasure: richSchema.optional(),
  examined: z.strictObject({ case: idSchema, by: idSchema, on: daySchema }).optional(),
  dependsOn: say(
    'field conditions it depends on',
    z
      .array(
        z.strictObject({
          id: idSchema,
          kind: z.enum(FIELD_CONDITION_KINDS),
          tag: tagSchema,
          condition: say('field condition', idSchema.optional()),
        }),
      )
      .optional(),
  ),
  safeguards: z.array(safeguardSchema).optional(),
  bound: say('bound below the limit', boundSchema.optional()),
});
export type Scenario = z.infer<typeof scenarioSchema>;
export type Disposition = (typeof DISPOSITIONS)[number];
export type Accumulation = (typeof ACCUMULATIONS)[number];
