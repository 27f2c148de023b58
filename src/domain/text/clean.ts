/* Cleaning a rich text that came from an editor: unknown nodes give up their words, unknown marks and attributes go. */
import { DEEPEST_NODE, MARKS, NODES, ownAttributesHold, type RichMark, type RichNode } from './nodes';
import type { Rich } from './schema';

function isObject(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

function only(attrs: unknown, allowed: readonly string[]): Record<string, unknown> | undefined {
  if (!isObject(attrs)) return undefined;
  const kept = Object.entries(attrs).filter(
    ([name, value]) => allowed.includes(name) && value !== null && value !== undefined,
  );
  return kept.length === 0 ? undefined : Object.fromEntries(kept);
}

function cleanMarks(marks: unknown): RichMark[] {
  if (!Array.isArray(marks)) return [];
  return marks.filter(isObject).flatMap((mark) => {
    const type = mark['type'];
    return typeof type === 'string' && Object.hasOwn(MARKS, type) ? [{ type }] : [];
  });
}

function cleanText(node: Record<string, unknown>): RichNode[] {
  const text = typeof node['text'] === 'string' ? node['text'].normalize('NFC') : '';
  if (text === '') return [];
  const marks = cleanMarks(node['marks']);
  return [marks.length > 0 ? { type: 'text', text, marks } : { type: 'text', text }];
}

function cleanNode(node: unknown, depth: number): RichNode[] {
  if (!isObject(node) || depth > DEEPEST_NODE) return [];
  const type = node['type'];
  if (type === 'text') return cleanText(node);
  const content = cleanNodes(node['content'], depth + 1);
  if (typeof type !== 'string' || !Object.hasOwn(NODES, type)) return content;
  const attrs = only(node['attrs'], NODES[type] ?? []);
  if (!ownAttributesHold(type, attrs ?? {})) return content;
  return [{ type, ...(attrs ? { attrs } : {}), ...(content.length > 0 ? { content } : {}) }];
}

function cleanNodes(content: unknown, depth: number): RichNode[] {
  return Array.isArray(content) ? content.flatMap((node) => cleanNode(node, depth)) : [];
}

const INLINE: ReadonlySet<string> = new Set(['text', 'hardBreak', 'figure', 'place', 'person']);

/** Words that lost their block (an unknown one) stand in paragraphs of their own. */
function inBlocks(nodes: readonly RichNode[]): RichNode[] {
  const blocks: RichNode[] = [];
  let loose: RichNode[] | undefined;
  for (const node of nodes) {
    if (!INLINE.has(node.type)) {
      loose = undefined;
      blocks.push(node);
    } else if (loose) {
      loose.push(node);
    } else {
      loose = [node];
      blocks.push({ type: 'paragraph', content: loose });
    }
  }
  return blocks;
}

/** A rich text of known nodes only, whatever came in; no word is lost. */
export function cleanRich(input: unknown): Rich {
  const content = isObject(input) && input['type'] === 'doc' ? input['content'] : [];
  return { type: 'doc', content: inBlocks(cleanNodes(content, 1)) };
}
