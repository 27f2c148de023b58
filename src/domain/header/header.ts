/* A header: network, members and common causes as a document of its own, with revisions and cases like a basis. */
import { z } from 'zod';
import { say } from '@domain/basis/fields';
import { figure, idSchema, lineSchema, maybe, tagSchema, wordSchema } from '@domain/basis/figures';
import { segmentSchema } from '@domain/basis/lines';
import { assumptionSchema, justificationSchema, referenceSchema } from '@domain/basis/papers';
import { richSchema } from '@domain/text/schema';

const loadSchema = z.strictObject({
  id: idSchema,
  system: idSchema,
  revision: z.number().int().min(0).optional(),
  scenario: idSchema,
  group: idSchema,
  node: idSchema,
  share: say('share of the load', maybe('fraction')),
  timing: richSchema.optional(),
});

const causeSchema = z.strictObject({
  id: idSchema,
  key: z.string().min(1).max(80),
  name: wordSchema,
  text: richSchema,
  utility: idSchema.optional(),
  loads: z.array(loadSchema),
});

export const headerSchema = z.strictObject({
  schema: z.literal(1),
  id: idSchema,
  tag: tagSchema,
  name: wordSchema,
  unit: idSchema,
  service: wordSchema,
  disposesTo: wordSchema,
  note: lineSchema.optional(),
  normal: say('normal pressure', maybe('superimposed')),
  viscosity: say('gas viscosity', maybe('viscosityGas')),
  limits: z.strictObject({
    mach: say('Mach limit', maybe('mach')),
    pressure: say('pressure limit', maybe('rating')),
  }),
  nodes: z.array(
    z.strictObject({
      id: idSchema,
      name: wordSchema,
      tip: z.boolean().optional(),
      pressure: maybe('superimposed'),
    }),
  ),
  segments: z.array(
    z.strictObject({
      ...segmentSchema.shape,
      length: figure('outletLength'),
      from: say('from node', idSchema),
      to: say('to node', idSchema),
    }),
  ),
  members: z.array(z.strictObject({ id: idSchema, system: idSchema, node: idSchema })),
  references: z.array(referenceSchema),
  assumptions: z.array(assumptionSchema),
  causes: say('common causes', z.array(causeSchema)),
  justifications: z.array(justificationSchema),
});
export type Header = z.infer<typeof headerSchema>;
