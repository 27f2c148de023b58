/* With which text an editor opens, and what its text area posts. */
import { cleanRich } from '@domain/text/clean';
import { isEmptyRich, plainText, richFromText } from '@domain/text/read';
import { type Rich } from '@domain/text/schema';

const RICH = '{"type":"doc"';

/** A rich text from what a field or a draft holds: the editor's JSON, or plain text. */
export function richOf(text: string): Rich {
  if (!text.startsWith(RICH)) return richFromText(text);
  try {
    return cleanRich(JSON.parse(text));
  } catch {
    return richFromText(text);
  }
}

export type Started = { text: Rich; from: 'draft' | 'typed' | 'stored' };

/**
 * The text to open with: a draft first, then what was typed into the plain text area, then the stored text.
 * @param typed present value of the text area
 * @param shown value with which the page was rendered
 */
export function startOf(of: {
  draft: string | null;
  typed: string;
  shown: string;
  stored: string | undefined;
}): Started {
  if (of.draft !== null) return { text: richOf(of.draft), from: 'draft' };
  if (of.typed !== of.shown || !of.stored) return { text: richOf(of.typed), from: 'typed' };
  return { text: richOf(of.stored), from: 'stored' };
}

/** What the field posts: the editor's JSON with known nodes only; nothing for an empty text. */
export function postedText(json: unknown): string {
  const clean = cleanRich(json);
  return isEmptyRich(clean) ? '' : JSON.stringify(clean);
}

/** Characters and words of a text. */
export function countOf(json: unknown): { characters: number; words: number } {
  const text = plainText(cleanRich(json));
  return { characters: text.length, words: text.split(/\s+/).filter(Boolean).length };
}

/** HTML from a word processor without its comments, styles, conditional blocks and namespaced tags. */
export function cleanPasted(html: string): string {
  return html
    .replace(/<!--[\s\S]*?-->/g, '')
    .replace(/<(style|script|xml|head|title)\b[\s\S]*?<\/\1>/gi, '')
    .replace(/<\/?(?:o|w|v|m|st1):[^>]*>/gi, '')
    .replace(/<(?:meta|link)\b[^>]*>/gi, '')
    .replace(/\s(?:style|class|lang|id|align|width|height)=(?:"[^"]*"|'[^']*'|[^\s>]+)/gi, '');
}
