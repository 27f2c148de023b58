/* Naming a place of a document in the words of the trade, and the page part where it is edited. */
import { formatQuantity } from '@engine/quantity';
import { scenarioByKey } from '@domain/scenarios/list';
import { quantityOf, type Path } from './figures';
import { isFigure } from './leaves';
import { childOf, idOf, isFields, joinPath, partsOf } from './paths';
import { labelAt, schemaOf } from './schema-walk';

type Fields = Record<string, unknown>;

/** `where` is the part of a case or system page with an anchor: `scenarios#fire-wetted`. */
export type Described = { label: string; where: string };

function wordAt(element: Fields, name: string): string | undefined {
  const value = element[name];
  return typeof value === 'string' && value !== '' ? value : undefined;
}

function listOf(document: unknown, name: string): unknown[] {
  const list = childOf(document, name);
  return Array.isArray(list) ? (list as unknown[]) : [];
}

function tagOf(document: unknown, list: string, id: unknown): string {
  const element = typeof id === 'string' ? childOf(listOf(document, list), id) : undefined;
  return (isFields(element) ? (wordAt(element, 'tag') ?? wordAt(element, 'name')) : undefined) ?? String(id);
}

function nameOfScenario(scenario: Fields, document: unknown): string {
  const key = wordAt(scenario, 'key') ?? '';
  const name = scenarioByKey(key)?.name ?? key;
  const about = Array.isArray(scenario['about']) ? scenario['about'] : [];
  if (about.length === 0) return name;
  const tags = about.map((id) => {
    const source = tagOf(document, 'sources', id);
    return source === id ? tagOf(document, 'equipment', id) : source;
  });
  return `${name} (${tags.join(', ')})`;
}

function nameOfGroup(group: Fields, document: unknown): string {
  const members = Array.isArray(group['members']) ? group['members'].filter(isFields) : [];
  const tags = members.map((member) => tagOf(document, 'reliefPoints', member['point']));
  return wordAt(group, 'name') ?? (tags.length > 0 ? `group of ${tags.join(', ')}` : 'group');
}

/** Lines that run through a segment, for segments have no name of their own. */
function nameOfSegment(segment: Fields, document: unknown): string {
  const lines = listOf(document, 'lines').filter(isFields);
  const through = lines.filter((line) => Array.isArray(line['path']) && line['path'].includes(segment['id']));
  const names = through.map((line) => nameOfLine(line, document));
  const size = wordAt(segment, 'nominal');
  return [names.length > 0 ? `segment of ${names.join(' and ')}` : 'segment', size]
    .filter(Boolean)
    .join(', ');
}

function nameOfLine(line: Fields, document: unknown): string {
  return `${String(line['side'])} line of ${tagOf(document, 'reliefPoints', line['point'])}`;
}

const SPECIAL: Readonly<Record<string, (element: Fields, document: unknown) => string>> = {
  scenarios: nameOfScenario,
  groups: nameOfGroup,
  segments: nameOfSegment,
  lines: nameOfLine,
  members: (member, document) => tagOf(document, 'reliefPoints', member['point']),
  imports: (one, document) => `header ${tagOf(document, 'headers', one['header'])}`,
};

/** What an element of a list is called: tag, name or title, or what it belongs to. */
export function nameOfElement(list: string, element: unknown, document: unknown): string | undefined {
  if (!isFields(element)) return typeof element === 'string' ? element : undefined;
  const special = SPECIAL[list];
  if (special) return special(element, document);
  const named = ['tag', 'name', 'title', 'part', 'place', 'substance', 'code']
    .map((name) => wordAt(element, name))
    .find(Boolean);
  if (named) return named;
  const at = element['at'];
  const quantity = isFigure(at) ? quantityOf(at) : undefined;
  return quantity ? `at ${formatQuantity(quantity)}` : undefined;
}

/** Fields whose words say nothing beside those of the field inside them. */
const SILENT: ReadonlySet<string> = new Set([
  'inputs',
  'figures',
  'orifice',
  'disk',
  'k',
  'spring',
  'superimposed',
  'pump',
  'valve',
  'figure',
]);
const SINGULAR: Readonly<Record<string, string>> = {
  equipment: 'equipment',
  ratings: 'rating',
  curve: 'curve point',
  answers: 'answer',
  psat: 'vapour pressure',
  assumptions: 'assumption',
  justifications: 'justification',
  once: 'question asked once',
  fittings: 'fitting',
  near: 'place nearby',
  paths: 'path to a relief point',
};

/** The page part for each list of a document; the rest of a document is edited under "changes". */
const PARTS: Readonly<Record<string, string>> = {
  scenarios: 'scenarios',
  once: 'scenarios',
  lines: 'lines',
  segments: 'lines',
  externalSheets: 'sheets',
};

function placeOf(path: Path): string {
  const [list, id] = partsOf(path);
  return `${PARTS[list ?? ''] ?? 'changes'}${list ? `#${id ?? list}` : ''}`;
}

/** The words along a path, outermost first. */
function wordsAlong(document: unknown, path: Path): string[] {
  const root = schemaOf(document);
  const parts = partsOf(path);
  const words: string[] = [];
  let value: unknown = document;
  let walked: Path = '';
  parts.forEach((part, index) => {
    const inList = Array.isArray(value);
    const list = parts[index - 1] ?? '';
    value = childOf(value, part);
    walked = joinPath(walked, part);
    const last = index === parts.length - 1;
    if (inList)
      words.push(
        nameOfElement(list, value, document) ??
          SINGULAR[list] ??
          (value === undefined ? 'something that is gone' : (idOf(value) ?? part)),
      );
    else if (last || (!Array.isArray(value) && !SILENT.has(part))) words.push(labelAt(root, walked));
  });
  return words;
}

/**
 * A place in words: "PSV-101A, set pressure" for `reliefPoints/rp_1/set`. Works for a basis and for a header; an
 * element that is gone is called by the list that it stood in.
 */
export function describePath(document: unknown, path: Path): Described {
  const words = wordsAlong(document, path);
  return { label: words.length > 0 ? words.join(', ') : 'the document', where: placeOf(path) };
}
