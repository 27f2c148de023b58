/* The caution that every page, sheet, basis and export repeats word for word. */

/** An aid, not an approval. */
export const CAUTION =
  'An aid to qualified engineers. Not a substitute for the governing code, the manufacturer’s certified data or a licensed engineer’s judgement. Check the edition in force locally.';
