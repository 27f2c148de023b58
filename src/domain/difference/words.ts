/* Two texts word by word: what stayed, what came, what went. */
import { diffWords } from 'diff';
import { isRich } from '@domain/basis/leaves';
import { plainText } from '@domain/text/read';

export type WordPart = { kind: 'equal' | 'added' | 'removed'; text: string };

function textOf(value: unknown): string {
  if (isRich(value)) return plainText(value);
  return typeof value === 'string' ? value : '';
}

/** The parts of two texts (plain or rich) in reading order; joined without the added ones they give the first text. */
export function wordDiff(one: unknown, other: unknown): WordPart[] {
  return diffWords(textOf(one), textOf(other)).map(({ added, removed, value }) => ({
    kind: added ? 'added' : removed ? 'removed' : 'equal',
    text: value,
  }));
}
