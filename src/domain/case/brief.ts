/* The brief of a case: what changes, why, for how long, and which papers it touches. */
import { z } from 'zod';
import { CAPS, day, id, line, rich } from './text-fields';

const PAPER_STATES = ['not-started', 'drafted', 'issued-for-approval', 'issued', 'cancelled'] as const;

export const paperSchema = z.strictObject({
  id: id('The paper'),
  kind: line('The kind of the paper'),
  reference: line('The reference of the paper'),
  from: line('The present issue of the paper', 0),
  to: line('The coming issue of the paper', 0),
  when: z.enum(['before-start-up', 'after'], {
    error: 'Say whether the paper is due before start-up or after.',
  }),
  state: z.enum(PAPER_STATES, { error: `The state of a paper is one of ${PAPER_STATES.join(', ')}.` }),
});

export const briefSchema = z.strictObject({
  title: line('The title', 3),
  whatChanges: rich('What changes'),
  technicalBasis: rich('The technical basis'),
  effect: rich('The effect on safety and health'),
  timeNeeded: line('The time needed', 0),
  starts: day('The start').optional(),
  ends: day('The end').optional(),
  removal: rich('The removal').optional(),
  safeguards: rich('The safeguards').optional(),
  substitute: rich('The substitute protection').optional(),
  owner: id('The owner').optional(),
  papers: z.array(paperSchema).max(CAPS.list, `A case lists at most ${CAPS.list} papers.`),
});

export type Paper = z.infer<typeof paperSchema>;
export type Brief = z.infer<typeof briefSchema>;

/** A brief with only its title: where every case begins. */
export function emptyBrief(title: string): Brief {
  const none = () => ({ type: 'doc' as const, content: [] });
  return { title, whatChanges: none(), technicalBasis: none(), effect: none(), timeNeeded: '', papers: [] };
}
