/* What is sent about due items. */
import { z } from 'zod';
import { ACT_BODIES } from '@domain/case';

/** A new due item: an own note, or what an approver asks for in a case (`case` is its number). */
export const askSchema = ACT_BODIES['ask-due'].omit({ owner: true }).extend({
  owner: z.string().max(80).optional(),
  case: z.string().max(40, 'There is no such case.').optional(),
});
export type AskBody = z.output<typeof askSchema>;

export const DUE_ACTS = ['do', 'accept', 'reject', 'waive'] as const;
export type DueAct = (typeof DUE_ACTS)[number];

const BODIES = {
  do: ACT_BODIES['do-due'],
  accept: ACT_BODIES['accept-due'],
  reject: ACT_BODIES['reject-due'],
  waive: ACT_BODIES['waive-due'],
} as const;
export type DueBody = { text?: string; file?: string; reason?: string };

/** True for the name of an act on a due item. */
export function isDueAct(name: string): name is DueAct {
  return (DUE_ACTS as readonly string[]).includes(name);
}

/** The schema of the body of an act; of an unknown act anything, since it is refused by name. */
export function dueBodySchema(act: string): z.ZodType<DueBody> {
  return isDueAct(act) ? BODIES[act] : z.object({});
}
