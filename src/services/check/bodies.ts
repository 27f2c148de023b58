/* Schemas of what the check's forms and programs send: a text may come as rich text or as plain lines. */
import { z } from 'zod';
import { ACT_BODIES } from '@domain/case';
import { richFromText } from '@domain/text';

/** Takes a plain text where a rich one is meant: forms without script have no editor. An absent text stays absent. */
function withText<S extends z.ZodType>(schema: S) {
  return z.preprocess((body) => {
    if (typeof body !== 'object' || body === null || !('text' in body)) return body;
    return typeof body.text === 'string' && body.text.trim() !== ''
      ? { ...body, text: richFromText(body.text) }
      : body;
  }, schema);
}

export const reconcileSchema = withText(ACT_BODIES.reconcile);
export const raiseFindingSchema = withText(ACT_BODIES['raise-finding']);
export const answerFindingSchema = withText(ACT_BODIES['answer-finding']);
export const closeFindingSchema = withText(ACT_BODIES['close-finding']);
export const reopenFindingSchema = withText(ACT_BODIES['reopen-finding']);
