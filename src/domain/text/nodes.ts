/* Which nodes, marks and attributes a rich text may hold, and the first fault of one that holds another. */

/** A mark on a piece of text. */
export type RichMark = { type: string; attrs?: Record<string, unknown> };
/** A node of a rich text. */
export type RichNode = {
  type: string;
  text?: string;
  attrs?: Record<string, unknown>;
  marks?: RichMark[];
  content?: RichNode[];
};

/** Longest rich text, in characters of plain text, and deepest nesting. */
export const LONGEST_TEXT = 20_000;
export const DEEPEST_NODE = 12;

/** Node → the attributes it may have. */
export const NODES: Readonly<Record<string, readonly string[]>> = {
  paragraph: [],
  heading: ['level'],
  text: [],
  hardBreak: [],
  bulletList: [],
  orderedList: ['start', 'type'],
  listItem: [],
  blockquote: [],
  horizontalRule: [],
  figure: ['doc', 'side', 'path', 'decimals', 'affirmed'],
  place: ['doc', 'path', 'label'],
  person: ['id', 'name'],
};
/** Mark → the attributes it may have. */
export const MARKS: Readonly<Record<string, readonly string[]>> = {
  bold: [],
  italic: [],
  strike: [],
  underline: [],
  code: [],
};

function isObject(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

function isQuantity(value: unknown): boolean {
  return (
    isObject(value) &&
    typeof value['value'] === 'number' &&
    Number.isFinite(value['value']) &&
    typeof value['unit'] === 'string'
  );
}

/** True when the attributes are those that a node of ours needs. */
export function ownAttributesHold(type: string, attrs: Record<string, unknown>): boolean {
  if (type === 'figure') {
    const side = attrs['side'];
    return (
      typeof attrs['doc'] === 'string' &&
      typeof attrs['path'] === 'string' &&
      (side === 'this' || side === 'base') &&
      isQuantity(attrs['affirmed'])
    );
  }
  if (type === 'place') return typeof attrs['path'] === 'string';
  if (type === 'person') return typeof attrs['id'] === 'string';
  return true;
}

function faultOfMarks(marks: unknown): string | undefined {
  if (marks === undefined) return undefined;
  if (!Array.isArray(marks)) return 'the marks of a text are not a list';
  for (const mark of marks) {
    const type = isObject(mark) ? mark['type'] : undefined;
    if (typeof type !== 'string' || !Object.hasOwn(MARKS, type))
      return `a text may not be marked as "${String(type)}"`;
  }
  return undefined;
}

function faultOfNode(node: unknown, depth: number): string | undefined {
  if (depth > DEEPEST_NODE) return `a text may be nested ${DEEPEST_NODE} deep at most`;
  if (!isObject(node)) return 'a text holds something that is not a node';
  const type = node['type'];
  if (typeof type !== 'string' || !Object.hasOwn(NODES, type))
    return `a text may not hold a "${String(type)}"`;
  if (type === 'text' && typeof node['text'] !== 'string') return 'a piece of text is empty of text';
  const attrs = isObject(node['attrs']) ? node['attrs'] : {};
  const stranger = Object.keys(attrs).find((name) => !NODES[type]?.includes(name));
  if (stranger) return `a "${type}" may not have "${stranger}"`;
  if (!ownAttributesHold(type, attrs)) return `a "${type}" lacks what it points to`;
  const marks = faultOfMarks(node['marks']);
  if (marks) return marks;
  return faultOfContent(node['content'], depth + 1);
}

function faultOfContent(content: unknown, depth: number): string | undefined {
  if (content === undefined) return undefined;
  if (!Array.isArray(content)) return 'the content of a text is not a list';
  for (const node of content) {
    const fault = faultOfNode(node, depth);
    if (fault) return fault;
  }
  return undefined;
}

function lengthOf(content: unknown): number {
  if (!Array.isArray(content)) return 0;
  let length = 0;
  for (const node of content) {
    if (!isObject(node)) continue;
    length += typeof node['text'] === 'string' ? node['text'].length : 0;
    length += lengthOf(node['content']);
  }
  return length;
}

/** The first fault of a rich text in a sentence, or nothing. */
export function faultOfRich(rich: { content: unknown[] }): string | undefined {
  const fault = faultOfContent(rich.content, 1);
  if (fault) return fault;
  return lengthOf(rich.content) > LONGEST_TEXT
    ? `a text may have ${LONGEST_TEXT} characters at most`
    : undefined;
}
