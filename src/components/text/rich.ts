/* Renders a stored rich text to HTML: only known nodes and marks come out, all text is escaped, figures follow their sheets. */
import { type Rich } from '@domain/basis';
import { formatQuantity } from '@engine/quantity';
import { escapeText } from '../pictures/draw';

/** What a live figure of the text says today. */
export type FigureNow = {
  /** As the text says it: "46 871 kg/h". */
  text: string;
  href?: string;
  sheet?: string;
  /** The present value in words, when it differs from the text. */
  now?: string;
  /** True while the viewer may not see it. */
  hidden?: boolean;
};

/** How the nodes that point elsewhere are resolved; what is not resolved comes out as its plain words. */
export type RichLook = {
  figure?(attrs: Record<string, unknown>): FigureNow | undefined;
  place?(attrs: Record<string, unknown>): { label: string; href?: string } | undefined;
  person?(attrs: Record<string, unknown>): string | undefined;
};

const BLOCKS: Record<string, string> = {
  paragraph: 'p',
  bulletList: 'ul',
  orderedList: 'ol',
  listItem: 'li',
  blockquote: 'blockquote',
};
const MARKS: Record<string, string> = {
  bold: 'strong',
  italic: 'em',
  strike: 's',
  underline: 'u',
  code: 'code',
};

type Bag = Record<string, unknown>;

function bag(value: unknown): Bag {
  return typeof value === 'object' && value !== null && !Array.isArray(value) ? (value as Bag) : {};
}

function words(value: unknown): string {
  return typeof value === 'string' || typeof value === 'number' ? String(value) : '';
}

/** A link of ours or nothing: other schemes and other sites do not come out. */
function href(link: string | undefined): string {
  return link !== undefined && /^(?:\/(?!\/)|#|\?)/.test(link) ? ` href="${escapeText(link)}"` : '';
}

function tag(name: string, attributes: string, content: string): string {
  return `<${name}${attributes}>${content}</${name}>`;
}

/** The figure as it was affirmed, in the digits that the text asks for. */
function affirmed(attrs: Bag): string {
  const { value, unit, text } = bag(attrs['affirmed']);
  if (typeof value !== 'number' || typeof unit !== 'string') return words(text) || words(value);
  const decimals = attrs['decimals'];
  const q = { value, unit, ...(typeof text === 'string' ? { text } : {}) };
  return formatQuantity(q, typeof decimals === 'number' ? { decimals } : {});
}

function figure(attrs: Bag, look: RichLook): string {
  const now = look.figure?.(attrs);
  if (!now) return tag('span', ' class="live"', escapeText(affirmed(attrs)));
  if (now.hidden) return tag('span', ' class="live covered-figure"', '<span class="vh">hidden</span>');
  const stale = now.now === undefined ? '' : `Stale: ${now.sheet ?? 'the sheet'} now says ${now.now}`;
  const link = href(now.href);
  const sheet = now.sheet === undefined ? '' : ` data-sheet="${escapeText(now.sheet)}"`;
  const title = stale === '' ? '' : ` title="${escapeText(stale)}"`;
  const said = stale === '' ? '' : tag('span', ' class="vh"', `, ${escapeText(stale)}`);
  const name = link === '' ? 'span' : 'a';
  return tag(
    name,
    ` class="live${stale === '' ? '' : ' stale'}"${link}${title}${sheet}`,
    escapeText(now.text) + said,
  );
}

function place(attrs: Bag, look: RichLook): string {
  const found = look.place?.(attrs);
  const label = escapeText(found?.label ?? (words(attrs['label']) || words(attrs['path'])));
  const link = href(found?.href);
  return link === '' ? tag('span', ' class="tag"', label) : tag('a', ` class="tag"${link}`, label);
}

function person(attrs: Bag, look: RichLook): string {
  return tag('span', ' class="person"', escapeText(look.person?.(attrs) ?? words(attrs['name'])));
}

function textOf(node: Bag): string {
  const marks = Array.isArray(node['marks']) ? node['marks'] : [];
  return marks.reduce<string>(
    (html, mark) => {
      const name = MARKS[words(bag(mark)['type'])];
      return name === undefined ? html : tag(name, '', html);
    },
    escapeText(words(node['text'])),
  );
}

function heading(attrs: Bag, content: string): string {
  return tag(Number(attrs['level']) <= 2 ? 'h3' : 'h4', '', content);
}

function nodeOf(raw: unknown, look: RichLook, depth: number): string {
  const node = bag(raw);
  const type = words(node['type']);
  const attrs = bag(node['attrs']);
  if (depth > 20) return '';
  if (type === 'text') return textOf(node);
  if (type === 'hardBreak') return '<br>';
  if (type === 'horizontalRule') return '<hr>';
  if (type === 'figure') return figure(attrs, look);
  if (type === 'place') return place(attrs, look);
  if (type === 'person') return person(attrs, look);
  const content = contentOf(node['content'], look, depth + 1);
  if (type === 'heading') return heading(attrs, content);
  const block = BLOCKS[type];
  return block === undefined ? content : tag(block, '', content);
}

function contentOf(content: unknown, look: RichLook, depth: number): string {
  return Array.isArray(content) ? content.map((node) => nodeOf(node, look, depth)).join('') : '';
}

/** A rich text as safe HTML. Unknown nodes give their content, unknown marks and attributes nothing. */
export function richHtml(rich: Rich | undefined, look: RichLook = {}): string {
  return rich ? contentOf(rich.content, look, 0) : '';
}
