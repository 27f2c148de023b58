/* The relief basis: the design basis of one protected system as one typed document. */
import { z } from 'zod';
import { richSchema } from '@domain/text/schema';
import { equipmentSchema } from './equipment';
import { externalSheetSchema } from './external-sheets';
import { fieldConditionSchema } from './field-conditions';
import { say } from './fields';
import { idSchema, tagSchema, wordSchema } from './figures';
import { fluidSchema } from './fluids';
import { groupSchema, interlockSchema, isolationSchema } from './groups';
import { lineOfPointSchema, segmentSchema } from './lines';
import { assumptionSchema, importSchema, justificationSchema, referenceSchema } from './papers';
import { reliefPointSchema } from './relief-points';
import { scenarioSchema } from './scenarios';
import { sourceSchema } from './sources';

export const ONCE_QUESTIONS = [
  'level-swell',
  'simultaneous-loads',
  'depressuring',
  'double-jeopardy',
  'bypass-and-spare',
] as const;

const boundarySchema = z.strictObject({
  text: richSchema,
  paths: say(
    'paths to the relief points',
    z.array(
      z.strictObject({
        id: idSchema,
        equipment: idSchema,
        point: idSchema,
        valvesOnDrawing: z.number().int().min(0).max(100).optional(),
        drawing: wordSchema.optional(),
      }),
    ),
  ),
});

export const basisSchema = z.strictObject({
  schema: z.literal(1),
  id: idSchema,
  tag: tagSchema,
  name: wordSchema,
  unit: idSchema,
  service: wordSchema,
  units: z.enum(['SI', 'US']),
  grade: z.enum(['tag-only', 'copied-in', 'worked']),
  boundary: boundarySchema,
  equipment: z.array(equipmentSchema),
  sources: z.array(sourceSchema),
  fluids: z.array(fluidSchema),
  reliefPoints: say('relief points', z.array(reliefPointSchema)),
  groups: z.array(groupSchema),
  isolations: say('isolation valves', z.array(isolationSchema)),
  interlocks: z.array(interlockSchema),
  segments: z.array(segmentSchema),
  lines: z.array(lineOfPointSchema),
  scenarios: z.array(scenarioSchema),
  externalSheets: say('external sheets', z.array(externalSheetSchema)),
  fieldConditions: say('field conditions', z.array(fieldConditionSchema)),
  references: z.array(referenceSchema),
  once: say(
    'asked once a system',
    z.array(z.strictObject({ id: z.enum(ONCE_QUESTIONS), answer: richSchema })),
  ),
  assumptions: z.array(assumptionSchema),
  justifications: z.array(justificationSchema),
  neighbours: z.array(z.strictObject({ id: idSchema, with: idSchema, what: wordSchema })),
  imports: z.array(importSchema),
});
export type Basis = z.infer<typeof basisSchema>;
