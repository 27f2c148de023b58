/* Just enough of a rich text to know whether it says something. */
import { type Rich } from './scalars';

function* texts(node: unknown): Generator<string> {
  if (typeof node !== 'object' || node === null) return;
  if ('text' in node && typeof node.text === 'string') yield node.text;
  if ('type' in node && node.type === 'figure') yield '0';
  if ('content' in node && Array.isArray(node.content)) for (const child of node.content) yield* texts(child);
}

/** Number of characters that a rich text says, blanks at the ends not counted; a live figure counts as one. */
export function lengthOf(rich: Rich | undefined): number {
  return [...texts(rich)].join(' ').trim().length;
}
