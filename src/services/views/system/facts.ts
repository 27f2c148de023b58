/* The facts of an element of a basis, field by field in the words of the schema, each with unit and origin. */
import {
  type Basis,
  describePath,
  getAt,
  isFigure,
  isFields,
  isRich,
  joinPath,
  type Origin,
} from '@domain/basis';
import { type Shown, shownFigure, shownShare } from '../shown';

export type Fact = { label: string; shown: Shown };
/** An element with its facts: a source, a fluid, a relief point. */
export type FactGroup = { id: string; name: string; note?: string; href?: string; facts: Fact[] };

const SILENT = new Set([
  'id',
  'tag',
  'name',
  'note',
  'text',
  'origin',
  'file',
  'signature',
  'person',
  'hidden',
]);

/** Kept as fractions, read as percentages. */
const SHARES = new Set(['overpressure', 'blowdown']);

/** What the elements of a basis are called, by their ids. */
export function namesById(doc: Basis): ReadonlyMap<string, string> {
  const elements = [
    ...[doc.equipment, doc.sources, doc.reliefPoints, doc.fieldConditions, doc.interlocks].flat(),
  ].map((one) => [one.id, one.tag] as const);
  const sides = doc.equipment.flatMap((item) => item.sides.map((side) => [side.id, side.name] as const));
  const fluids = doc.fluids.map((fluid) => [fluid.id, fluid.name] as const);
  return new Map([...elements, ...sides, ...fluids]);
}

type Walk = {
  doc: Basis;
  skip: ReadonlySet<string>;
  names: ReadonlyMap<string, string>;
  owner?: Origin;
  cut: number;
};

/** A word of the schema, or what a path or an id stands for. */
function word(value: string, { doc, names }: Walk): string {
  if (value.includes('/') && getAt(doc, value) !== undefined) return describePath(doc, value).label;
  return names.get(value) ?? value.replaceAll('-', ' ').replaceAll('_', ' ');
}

function labelOf(walk: Walk, path: string): string {
  const label = describePath(walk.doc, path)
    .label.slice(walk.cut)
    .replace(/, use$/, ', taken from')
    .replace(/, list$/, '')
    .replaceAll('_', ' ');
  return label.charAt(0).toUpperCase() + label.slice(1);
}

function leaf(walk: Walk, path: string, value: unknown): Fact[] {
  const label = labelOf(walk, path);
  if (isFigure(value)) {
    const last = path.slice(path.lastIndexOf('/') + 1);
    const shown = SHARES.has(last) ? shownShare(value, walk.owner) : shownFigure(value, walk.owner);
    return shown ? [{ label, shown }] : [];
  }
  if (typeof value === 'boolean') return [{ label, shown: { text: value ? 'yes' : 'no' } }];
  if (typeof value === 'number') return [{ label, shown: { text: String(value) } }];
  if (typeof value === 'string' && value !== '') {
    const last = path.slice(path.lastIndexOf('/') + 1);
    const isName = ['letter', 'maker', 'model', 'nominal', 'drawing', 'certificate', 'location'].includes(
      last,
    );
    return [{ label, shown: { text: isName ? value : word(value, walk) } }];
  }
  return [];
}

function inside(walk: Walk, path: string, value: unknown): Fact[] {
  if (value === undefined || value === null || isRich(value)) return [];
  if (Array.isArray(value)) {
    if (value.every((one) => typeof one === 'string')) {
      const text = value.map((one) => word(one, walk)).join(', ');
      return text === '' ? [] : [{ label: labelOf(walk, path), shown: { text } }];
    }
    return value.flatMap((one: unknown) =>
      isFields(one) && typeof one['id'] === 'string' ? inside(walk, joinPath(path, one['id']), one) : [],
    );
  }
  if (!isFields(value) || isFigure(value)) return leaf(walk, path, value);
  return Object.entries(value)
    .filter(([name]) => !SILENT.has(name) && !walk.skip.has(name))
    .flatMap(([name, child]) => inside(walk, joinPath(path, name), child));
}

/**
 * The facts of the element at a path; `skip` names fields that stand elsewhere on the page. Figures without an origin of
 * their own have the element's; `people` names persons by their ids.
 */
export function factsOf(
  doc: Basis,
  path: string,
  skip: readonly string[] = [],
  people: ReadonlyMap<string, string> = new Map(),
): Fact[] {
  const element = getAt(doc, path);
  const owner = isFields(element) ? (element['origin'] as Origin | undefined) : undefined;
  const cut = describePath(doc, path).label.length + 2;
  const walk: Walk = {
    doc,
    skip: new Set(skip),
    names: new Map([...namesById(doc), ...people]),
    cut,
    ...(owner ? { owner } : {}),
  };
  return inside(walk, path, element);
}
