/* Rich text as it is stored: Tiptap JSON with three nodes of ours (figure, place, person), checked node by node. */
import { z } from 'zod';
import { FIELDS } from '@domain/basis/fields';
import { faultOfRich } from './nodes';

/** A rich text: `{ type: 'doc', content }`. Only known nodes, marks and attributes are accepted (cleanRich makes them so). */
export const richSchema = z
  .strictObject({ type: z.literal('doc'), content: z.array(z.unknown()) })
  .superRefine((rich, context) => {
    const fault = faultOfRich(rich);
    if (fault) context.addIssue({ code: 'custom', message: fault });
  })
  .register(FIELDS, { leaf: 'rich' });
export type Rich = z.infer<typeof richSchema>;
