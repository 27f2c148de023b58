/* Taking figures out of prose, so that a text says what it says without a result. */
import { UNITS } from '@engine/quantity';

/** What stands where a figure was. */
export const HIDDEN_WORD = '[hidden]';

const escape = (text: string): string => text.replace(/[.*+?^${}()|[\]\\/]/g, '\\$&');
const names = [
  ...Object.keys(UNITS),
  ...Object.values(UNITS).map((unit) => unit.label),
  '%',
  'percent',
  'per cent',
  '‰',
  'points',
  'bar(g)',
  'bar(a)',
  'times',
];
const units = [...new Set(names)]
  .filter((name) => name !== '' && name !== '-')
  .sort((a, b) => b.length - a.length)
  .map(escape);
const NUMBER = '[−-]?\\d[\\d.,\\u2009\\u202f\\u00a0]*(?: \\d{3}[\\d.,]*)*(?:[eE][+−-]?\\d+)?';
const FIGURE = new RegExp(
  `(?<![\\p{L}\\d])${NUMBER}(?:\\s*(?:–|-|to|…|and)\\s*${NUMBER})?\\s*(?:${units.join('|')})(?![\\p{L}])`,
  'gu',
);
const LETTER = /\b(orifice|letter|orifice letter)\s+["“]?[D-HJ-NP-RT](?![\p{L}\d])/giu;
const LETTER_BEFORE = /(?<![\p{L}\d])[D-HJ-NP-RT](?=[ -](?:orifice|letter)\b)/gu;
/** Sizes of flanged valves, "2J3": inlet, orifice letter, outlet. */
const SIZE = /(?<![\p{L}\d])\d+(?:½|\.\d)? ?[D-HJ-NP-RT] ?\d+(?![\p{L}\d])/gu;
const COEFFICIENT = /\b([CK]v)(\s*(?:of|=)?\s*)\d+(?:[.,]\d+)*/gu;
const VERDICT = /\b(inadequate|marginal|adequate)\b/giu;

/** Prose with every number that has a unit or a percent sign, every orifice letter, flow coefficient and verdict taken out. */
export function maskProse(text: string): string {
  return text
    .replace(SIZE, HIDDEN_WORD)
    .replace(COEFFICIENT, (_all, word: string, between: string) => `${word}${between}${HIDDEN_WORD}`)
    .replace(FIGURE, HIDDEN_WORD)
    .replace(LETTER_BEFORE, HIDDEN_WORD)
    .replace(LETTER, (_all, word: string) => `${word} ${HIDDEN_WORD}`)
    .replace(VERDICT, HIDDEN_WORD);
}

/** A rich text without figures: live ones become words, numbers with a unit are taken out even where marks split them. */
export function maskRich<R>(rich: R): R {
  return maskNode(rich) as R;
}

type Node = Record<string, unknown>;
const isNode = (value: unknown): value is Node =>
  typeof value === 'object' && value !== null && !Array.isArray(value);

function maskNode(node: unknown): unknown {
  if (Array.isArray(node)) return maskSiblings(node);
  if (!isNode(node)) return node;
  if (node['type'] === 'figure') return { type: 'text', text: HIDDEN_WORD };
  if (node['type'] === 'place')
    return {
      type: 'text',
      text: maskProse(String((node['attrs'] as Node | undefined)?.['label'] ?? '')) || HIDDEN_WORD,
    };
  if (typeof node['text'] === 'string') return { ...node, text: maskProse(node['text']) };
  return 'content' in node ? { ...node, content: maskNode(node['content']) } : node;
}

/** A number in one run and its unit in the next still make a figure: when joining shows one, the runs are joined. */
function maskSiblings(nodes: unknown[]): unknown[] {
  const runs = nodes.every((node) => isNode(node) && typeof node['text'] === 'string');
  if (!runs || nodes.length < 2) return nodes.map(maskNode);
  const whole = nodes.map((node) => String((node as Node)['text'])).join('');
  const apart = nodes.map((node) => maskProse(String((node as Node)['text']))).join('');
  return maskProse(whole) === apart ? nodes.map(maskNode) : [{ type: 'text', text: maskProse(whole) }];
}
