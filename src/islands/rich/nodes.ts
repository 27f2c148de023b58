/* The nodes of a rich text in the editor: those that a stored text may hold, and the three of ours (figure, place, person). */
import { type Extensions, Node, type NodeViewRendererProps } from '@tiptap/core';
import { StarterKit } from '@tiptap/starter-kit';
import { formatQuantity } from '@engine/quantity';
import { NODES } from '@domain/text/nodes';
import { type FigureNode } from '@domain/text/read';
import { figureText, movedTo, type OfferedFigure } from './figures';

type Attributes = Record<string, { default: unknown; rendered: boolean }>;

/** Attributes live in the JSON only; pasted HTML can't forge them. */
function attributesOf(name: string): Attributes {
  return Object.fromEntries((NODES[name] ?? []).map((one) => [one, { default: null, rendered: false }]));
}

function inline(name: string, className: string, words: (attrs: Record<string, unknown>) => string): Node {
  return Node.create({
    name,
    group: 'inline',
    inline: true,
    atom: true,
    addAttributes: () => attributesOf(name),
    renderHTML: ({ node }) => ['span', { class: className }, words(node.attrs)],
    renderText: ({ node }) => words(node.attrs),
  });
}

function wordsOf(attrs: Record<string, unknown>, ...names: string[]): string {
  const found = names.map((name) => attrs[name]).find((one) => typeof one === 'string' && one !== '');
  return typeof found === 'string' ? found : '';
}

/** A live figure as it stands in the text: underlined, wavy once the present value is another. */
function figureView(attrs: FigureNode['attrs'], offered: readonly OfferedFigure[]): HTMLElement {
  const span = document.createElement('span');
  span.className = 'live';
  span.textContent = figureText(attrs);
  const now = movedTo(attrs, offered);
  if (now) {
    span.classList.add('stale');
    span.title = `Stale: ${now.label} is now ${formatQuantity(now.value)}`;
  }
  return span;
}

function figure(offered: readonly OfferedFigure[]): Node {
  return inline('figure', 'live', (attrs) => figureText(attrs as FigureNode['attrs'])).extend({
    addNodeView:
      () =>
      ({ node }: NodeViewRendererProps) => ({ dom: figureView(node.attrs as FigureNode['attrs'], offered) }),
  });
}

/** Everything the editor may hold: what `@domain/text` accepts, no more. */
export function extensionsFor(offered: readonly OfferedFigure[]): Extensions {
  return [
    StarterKit.configure({
      heading: { levels: [3, 4] },
      link: false,
      codeBlock: false,
      dropcursor: false,
      gapcursor: false,
    }),
    figure(offered),
    inline('place', 'tag', (attrs) => wordsOf(attrs, 'label', 'path')),
    inline('person', 'person', (attrs) => wordsOf(attrs, 'name', 'id')),
  ];
}
