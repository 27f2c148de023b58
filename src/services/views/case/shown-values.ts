/* Values of a document as tables of differences and forms of changes show them. */
import {
  capital,
  describePath,
  idOf,
  isFields,
  isFigure,
  isRich,
  isWordInput,
  plainText,
} from '@domain/basis';
import { type Shown, shownFigure, shownInput } from '../shown';

const HASH = /^[0-9a-f]{64}$/;
const NAMES = ['tag', 'name', 'title', 'by', 'code', 'ref'];

function nameOf(value: unknown): string {
  if (!isFields(value)) return String(value);
  for (const name of NAMES) {
    const word = value[name];
    if (typeof word === 'string' && word !== '') return word;
  }
  const flags = Object.entries(value).filter(([, flag]) => flag === true);
  if (flags.length > 0) return flags.map(([name]) => name).join(', ');
  return idOf(value) === undefined ? 'entered' : 'an entry';
}

/** The name of the element that a word stands for where the word is its id; else nothing. */
function elementNamed(document: unknown, word: string): string | undefined {
  if (!/^[a-z]+_\w+$/.test(word) || !isFields(document)) return undefined;
  const found = Object.values(document)
    .flatMap((list): unknown[] => (Array.isArray(list) ? list : []))
    .find((one) => idOf(one) === word);
  return found === undefined ? undefined : nameOf(found);
}

/** Any value of a document in words: a figure with its unit and origin, a text, a list, or the name of an element. */
export function shownAny(document: unknown, value: unknown): Shown {
  if (value === undefined || value === null) return { text: '–' };
  if (isFigure(value)) return shownFigure(value) ?? { text: '–' };
  if (isRich(value)) return { text: plainText(value) };
  if (typeof value === 'boolean') return { text: value ? 'yes' : 'no' };
  if (typeof value === 'string' && HASH.test(value)) return { text: `hash ${value.slice(0, 8)}` };
  const named = isWordInput(value) && 'word' in value ? elementNamed(document, value.word) : undefined;
  if (named !== undefined) return { text: named };
  if (isWordInput(value)) return shownInput(value, (path) => capital(describePath(document, path).label));
  if (Array.isArray(value)) return { text: value.map(nameOf).join(', ') || 'none' };
  return { text: nameOf(value) };
}
