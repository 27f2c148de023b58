/* The id of a request, which stands in the log, in the answer's header and in every problem. */
import { randomBytes } from 'node:crypto';

const LETTERS = '23456789abcdefghjkmnpqrstuvwxyz';

/** Ten letters and digits that can be read out on the telephone. */
export function newRequestId(): string {
  return [...randomBytes(10)].map((byte) => LETTERS[byte % LETTERS.length]).join('');
}
