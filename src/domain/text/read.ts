/* Reading rich texts: as plain text, as words, and the live figures in them. */
import { convert, dimensionOf, formatQuantity, type Q } from '@engine/quantity';
import type { RichNode } from './nodes';
import type { Rich } from './schema';

/** A live figure in a text: where its value stands, and the value that the writer affirmed. */
export type FigureNode = {
  type: 'figure';
  attrs: { doc: string; side: 'this' | 'base'; path: string; decimals?: number; affirmed: Q };
};

/** The nodes of a rich text, as their type; the schema has checked them. */
export function nodesOf(rich: Rich): RichNode[] {
  return rich.content as RichNode[];
}

/** The nodes at every depth, in reading order. */
export function* everyNode(nodes: readonly RichNode[]): Generator<RichNode> {
  for (const node of nodes) {
    yield node;
    if (node.content) yield* everyNode(node.content);
  }
}

function isFigureNode(node: RichNode): node is RichNode & FigureNode {
  return node.type === 'figure';
}

/** The live figures of a text in reading order. */
export function figuresIn(rich: Rich): FigureNode[] {
  return [...everyNode(nodesOf(rich))].filter(isFigureNode).map(({ type, attrs }) => ({ type, attrs }));
}

/** How a figure is shown in plain text: the affirmed value unless a present one is given. */
export type ShowFigure = (figure: FigureNode) => string;

const affirmed: ShowFigure = ({ attrs }) =>
  formatQuantity(attrs.affirmed, attrs.decimals === undefined ? {} : { decimals: attrs.decimals });

const BLOCKS: ReadonlySet<string> = new Set([
  'paragraph',
  'heading',
  'listItem',
  'blockquote',
  'horizontalRule',
]);

function inlineText(node: RichNode, show: ShowFigure): string {
  if (isFigureNode(node)) return show(node);
  if (node.type === 'hardBreak') return '\n';
  if (node.type === 'person') return String(node.attrs?.['name'] ?? node.attrs?.['id'] ?? '');
  if (node.type === 'place') return String(node.attrs?.['label'] ?? node.attrs?.['path'] ?? '');
  const inner = (node.content ?? []).map((child) => inlineText(child, show)).join('');
  return `${node.text ?? ''}${inner}${BLOCKS.has(node.type) && inner.endsWith('\n') === false ? '\n' : ''}`;
}

/** A rich text as plain text, a line a block. `show` says how a live figure reads (default: its affirmed value). */
export function plainText(rich: Rich, show: ShowFigure = affirmed): string {
  return nodesOf(rich)
    .map((node) => inlineText(node, show))
    .join('')
    .replace(/\n+$/, '');
}

/** The words of a rich text, for counting and comparing. */
export function wordsOf(rich: Rich): string[] {
  return plainText(rich).split(/\s+/).filter(Boolean);
}

/** A rich text from plain text, a paragraph a line; empty lines are dropped. */
export function richFromText(text: string): Rich {
  const lines = text.split(/\r?\n/).map((line) => line.trim());
  const content = lines
    .filter((line) => line !== '')
    .map((line) => ({ type: 'paragraph', content: [{ type: 'text', text: line }] }));
  return { type: 'doc', content };
}

/** True when a text says nothing: no word and no figure. */
export function isEmptyRich(rich: Rich): boolean {
  return plainText(rich).trim() === '';
}

/** Beyond this share of the affirmed value a figure has moved (MODEL, section 2). */
const MOVED = 0.001;
/** A temperature has no share of itself; readings this near are the same. */
const SAME_KELVIN = 0.05;

/**
 * True when a live figure no longer says what stands there: it moved by more than 0.1 % (temperatures 0.05 K), became
 * another kind of quantity, or is gone. A word never agrees with a figure.
 */
export function figureMoved(node: FigureNode, present: Q | string | undefined): boolean {
  if (present === undefined || typeof present === 'string') return true;
  const { affirmed: then } = node.attrs;
  const dimension = dimensionOf(then.unit);
  if (dimension !== dimensionOf(present.unit)) return true;
  if (dimension === undefined) return then.unit !== present.unit || then.value !== present.value;
  if (dimension === 'temperature') return Math.abs(convert(present, 'K') - convert(then, 'K')) > SAME_KELVIN;
  const now = convert(present, then.unit);
  return Math.abs(now - then.value) > MOVED * Math.abs(then.value) * (1 + 1e-9);
}
