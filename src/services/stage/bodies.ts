/* Schemas of what the acts of the stage table carry; one form may bring fields of several, so absent ones are optional. */
import { z } from 'zod';
import { ACT_BODIES } from '@domain/case';
import { type StageBody } from './types';

const deficiency = z.strictObject({
  outcome: z.string().regex(/^[0-9a-f]{64}$/, 'This is not an outcome of the rulebook.'),
  owner: z.string().min(1, 'Name the owner of the deficiency.'),
  due: z.iso.date({ error: 'Give the day by which it is mended, such as 2026-03-17.' }),
  interim: z
    .string()
    .trim()
    .min(10, 'Write the interim measure in a sentence.')
    .max(4_000, 'The interim measure is too long.'),
});

/** Signing an approval may take deficiencies on as well. */
const approval = ACT_BODIES.SIGN.extend({
  deficiencies: z.array(deficiency).max(100, 'At most 100 deficiencies go with a signature.').default([]),
});

const BODIES: Readonly<Record<string, z.ZodType<StageBody>>> = {
  'PASS-draft': ACT_BODIES.PASS,
  'PASS-draft-graded': ACT_BODIES.PASS,
  'PASS-scenarios': ACT_BODIES.PASS,
  'PASS-check': ACT_BODIES.PASS,
  SIGN: approval,
  REFUSE: ACT_BODIES.REFUSE,
  'RETURN-own': ACT_BODIES.RETURN,
  'RETURN-check': ACT_BODIES.RETURN,
  'RETURN-approval': ACT_BODIES.RETURN,
  'RETURN-field': ACT_BODIES.RETURN,
  HOLD: ACT_BODIES.HOLD,
  RESUME: ACT_BODIES.RESUME,
  WITHDRAW: ACT_BODIES.WITHDRAW,
  ISSUE: ACT_BODIES.ISSUE,
  DROP: ACT_BODIES.DROP,
  CARRY_OVER: ACT_BODIES.CARRY_OVER,
};

const anything: z.ZodType<StageBody> = z.object({});

/** The schema of an act's body; of an unknown act anything, since it is refused by name. */
export function stageBodySchema(act: string): z.ZodType<StageBody> {
  return BODIES[act] ?? anything;
}
