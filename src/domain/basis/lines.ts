/* Inlet and outlet lines of relief points, in segments that several lines may share. */
import { z } from 'zod';
import { richSchema } from '@domain/text/schema';
import { say } from './fields';
import {
  daySchema,
  figure,
  hashSchema,
  idSchema,
  lineSchema,
  maybe,
  ptSchema,
  tagSchema,
  wordSchema,
} from './figures';

export const segmentSchema = z.strictObject({
  id: idSchema,
  nominal: say('nominal size', wordSchema.optional()),
  bore: figure('bore'),
  length: figure('inletLength', 'outletLength'),
  rise: maybe('rise'),
  roughness: maybe('roughness'),
  material: wordSchema.optional(),
  enlarges: say('enlargement treated by', z.enum(['static', 'momentum']).optional()),
  rating: ptSchema.optional(),
  fittings: z.array(
    z.strictObject({
      id: idSchema,
      name: wordSchema,
      count: z.number().int().min(0).max(1000),
      k: say('loss coefficient', figure('sumK')),
      by: say('method of the loss', z.enum(['K', 'length', '2-K', '3-K']).optional()),
    }),
  ),
});
export type Segment = z.infer<typeof segmentSchema>;

export const endSchema = z.strictObject({
  to: say('discharges to', z.enum(['atmosphere', 'header', 'process', 'sewer', 'catch-tank', 'inflow'])),
  header: idSchema.optional(),
  node: idSchema.optional(),
  equipment: tagSchema.optional(),
  system: idSchema.optional(),
  pressure: maybe('superimposed'),
  pressureMax: say('greatest pressure', maybe('superimposed')),
  location: wordSchema.optional(),
  direction: z.enum(['up', 'level', 'down']).optional(),
  assessment: say(
    'assessment of the discharge',
    z
      .strictObject({
        text: richSchema,
        by: idSchema.optional(),
        on: daySchema.optional(),
        rests: hashSchema.optional(),
      })
      .optional(),
  ),
  near: say(
    'places nearby',
    z
      .array(
        z.strictObject({
          id: idSchema,
          place: wordSchema,
          dx: say('distance across', maybe('clearance')),
          dz: say('distance in height', maybe('clearance')),
        }),
      )
      .optional(),
  ),
});
export type End = z.infer<typeof endSchema>;

const stabilitySchema = z.strictObject({
  blowdown: lineSchema.optional(),
  sound: say('speed of sound', maybe('soundSpeed')),
  bodyPressure: maybe('superimposed'),
  lowFlow: lineSchema.optional(),
  history: lineSchema.optional(),
  author: idSchema.optional(),
  file: idSchema.optional(),
});

export const lineOfPointSchema = z.strictObject({
  id: idSchema,
  point: say('relief point', idSchema),
  side: z.enum(['inlet', 'outlet']),
  path: say('path of segments', z.array(idSchema)),
  drawing: wordSchema.optional(),
  from: wordSchema.optional(),
  selfDraining: z.boolean().optional(),
  pocket: z.boolean().optional(),
  lowPointDrain: z.boolean().optional(),
  entersFrom: z.enum(['above', 'side', 'below']).optional(),
  tracing: z.enum(['none', 'traced', 'flushed']).optional(),
  takeOff: z
    .strictObject({
      flowing: say('on a flowing line', z.boolean()),
      diameters: say('straight diameters before it', z.number().min(0).max(1000).optional()),
    })
    .optional(),
  end: endSchema.optional(),
  support: z
    .strictObject({
      allowable: say('allowable reaction force', maybe('reactionForce')),
      dlf: say('dynamic load factor', maybe('dlf')),
      ref: say('reference', wordSchema.optional()),
    })
    .optional(),
  stability: stabilitySchema.optional(),
});
export type Line = z.infer<typeof lineOfPointSchema>;
