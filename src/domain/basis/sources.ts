/* Sources: the tagged things that a load comes from. */
import { z } from 'zod';
import { say } from './fields';
import {
  daySchema,
  figure,
  idSchema,
  lineSchema,
  maybe,
  originSchema,
  tagSchema,
  wordSchema,
} from './figures';

export const SOURCE_KINDS = [
  'pump',
  'compressor',
  'control-valve',
  'hand-valve',
  'regulator',
  'check-valve',
  'orifice',
  'exchanger',
  'heater',
  'reaction',
  'feed',
  'upstream',
  'make-up',
  'utility',
] as const;

const pumpSchema = z.strictObject({
  displacement: z.enum(['centrifugal', 'positive']),
  type: wordSchema.optional(),
  curve: say(
    'curve points',
    z
      .array(
        z.strictObject({
          id: idSchema,
          q: say('flow', figure('pumpFlow')),
          dp: say('differential pressure', figure('pumpHead')),
        }),
      )
      .optional(),
  ),
  shutoff: say('shut-off pressure', maybe('pumpShutoff')),
  coefficient: say('curve coefficient', maybe('pumpCoefficient')),
  suctionMax: say('greatest suction pressure', maybe('suction')),
  rated: say('rated flow', maybe('machineFlow')),
  impeller: say('impeller diameter', maybe('impeller')),
  speed: maybe('speed'),
  stages: z.number().int().positive().max(100).optional(),
});

const valveSchema = z.strictObject({
  coefficient: say('flow coefficient', maybe('controlValveKv')),
  xT: say('xT', maybe('xT')),
  fL: say('FL', maybe('fL')),
  size: maybe('nominalSize'),
  upstreamMax: say('greatest upstream pressure', maybe('sourcePressure')),
  failsTo: z.enum(['open', 'shut', 'stays']).optional(),
  stop: say(
    'travel stop',
    z
      .strictObject({
        tag: tagSchema.optional(),
        kv: say('flow coefficient at the stop', maybe('controlValveKv')),
        condition: say('field condition', idSchema.optional()),
        note: lineSchema.optional(),
      })
      .optional(),
  ),
  bypass: z
    .strictObject({
      tag: tagSchema,
      kv: say('flow coefficient of the bypass', maybe('controlValveKv')),
      kept: z.enum(['open', 'locked-shut', 'blinded']),
      condition: say('field condition', idSchema.optional()),
    })
    .optional(),
});

const checkSchema = z.strictObject({
  nominal: say('nominal size', maybe('nominalSize')),
  dissimilar: say('two of different kind in series', z.boolean().optional()),
  inspected: daySchema.optional(),
  inspection: wordSchema.optional(),
  leak: say('leak of the check valve', maybe('checkLeak')),
});

const heatSchema = z.strictObject({
  ua: say('UA', maybe('ua')),
  duty: maybe('heatInput'),
  hot: say('temperature of the hot side', maybe('operatingTemperature')),
  removed: say('heat still removed', maybe('heatInput')),
});

export const sourceSchema = z.strictObject({
  id: idSchema,
  tag: tagSchema,
  name: wordSchema.optional(),
  equipment: idSchema.optional(),
  system: idSchema.optional(),
  utility: idSchema.optional(),
  fluid: idSchema.optional(),
  origin: originSchema.optional(),
  kind: z.enum(SOURCE_KINDS),
  pump: pumpSchema.optional(),
  valve: valveSchema.optional(),
  check: say('check valve', checkSchema.optional()),
  orifice: z
    .strictObject({ bore: maybe('bore'), cd: say('discharge coefficient', maybe('orificeCd')) })
    .optional(),
  heat: heatSchema.optional(),
  pressure: maybe('sourcePressure'),
  temperature: maybe('operatingTemperature'),
  flow: maybe('reliefLoad'),
});
export type Source = z.infer<typeof sourceSchema>;
