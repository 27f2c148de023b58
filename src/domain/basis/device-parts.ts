/* Parts of a relief point that only some devices have: disk, pilot, power, pair with a disk, bonnet, parts list. */
import { z } from 'zod';
import { say } from './fields';
import { figure, idSchema, lineSchema, maybe, wordSchema } from './figures';

export const partSchema = z.strictObject({
  id: idSchema,
  part: wordSchema,
  material: wordSchema,
  min: say('lowest temperature', maybe('mdmt')),
  max: say('highest temperature', maybe('designTemperature')),
});

export const bonnetSchema = z.strictObject({
  kind: z.enum(['open', 'closed', 'vented']),
  lever: z.enum(['none', 'plain', 'packed']).optional(),
  plug: z.enum(['in', 'out']).optional(),
  vent: z.enum(['open', 'piped', 'plugged']).optional(),
  ventTo: wordSchema.optional(),
  note: lineSchema.optional(),
});

export const pilotSchema = z.strictObject({
  sensing: z.enum(['at-valve', 'remote']),
  at: say('sensing point', wordSchema.optional()),
  filter: z.boolean().optional(),
  tracing: z.boolean().optional(),
  purge: z.boolean().optional(),
  backflowPreventer: z.boolean().optional(),
  makerSays: say("maker's statement", idSchema.optional()),
});

export const powerSchema = z.strictObject({
  signal: wordSchema,
  energy: wordSchema,
  failsTo: z.enum(['open', 'shut']),
  certificate: wordSchema.optional(),
  listed: z.enum(['controlled-system', 't-and-p', 'asme-i']).optional(),
});

export const diskSchema = z.strictObject({
  type: z.enum(['plain', 'composite', 'graphite', 'scored', 'reverse']).optional(),
  burst: say('burst pressure', figure('burstPressure')),
  at: say('coincident temperature', maybe('designTemperature')),
  range: say('manufacturing range', maybe('manufacturingRange')),
  tolerance: say('burst tolerance', maybe('burstTolerance')),
  curve: z
    .array(
      z.strictObject({
        id: idSchema,
        at: figure('designTemperature'),
        burst: say('burst pressure', figure('burstPressure')),
      }),
    )
    .optional(),
  ratio: say('operating ratio', maybe('fraction')),
  netArea: say('minimum net flow area', maybe('orificeArea')),
  kr: say('flow resistance KR', maybe('kr')),
  fragments: z.boolean().optional(),
  liquidRated: z.boolean().optional(),
  support: say('vacuum support', z.boolean().optional()),
  lot: wordSchema.optional(),
  method: say('flow method', z.enum(['coefficient', 'resistance']).optional()),
  nozzleDiameters: z.number().min(0).max(1000).optional(),
  tailDiameters: z.number().min(0).max(1000).optional(),
  straightOut: z.boolean().optional(),
  note: lineSchema.optional(),
});

export const withDiskSchema = z.strictObject({
  disk: idSchema,
  side: z.enum(['inlet', 'outlet']),
  certifiedPair: wordSchema.optional(),
  space: say(
    'space between disk and valve',
    z.enum(['gauge', 'try-cock', 'free-vent', 'tell-tale', 'none']).optional(),
  ),
  spaceNote: lineSchema.optional(),
  opensWhateverSpace: z.boolean().optional(),
  downstreamFree: z.boolean().optional(),
  leakStated: z.boolean().optional(),
});
