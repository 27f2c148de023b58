/* Every entered figure of a basis with its path and range key, and the origin that it or its owner has. */
import {
  type Basis,
  describePath,
  getAt,
  isFields,
  isFigure,
  isKnown,
  isLeaf,
  type KnownFigure,
  type Origin,
  originSchema,
  type Path,
  rangeKeyAt,
  walk,
} from '@domain/basis';
import { methodById } from '@engine/catalog';

export type Entered = { path: Path; figure: KnownFigure; key?: string };

const CALC_INPUT = /^(scenarios\/[^/]+\/answers\/[^/]+\/(?:load|size))\/inputs\/([^/]+)$/;
/** Lists whose quantities are copies that nobody enters. */
const COPIES = /^(justifications|imports)\//;

/** The range key of a figure: by its place in the schema, or by the input of the method that it is. */
function keyAt(basis: Basis, path: Path): string | undefined {
  const input = CALC_INPUT.exec(path);
  if (!input) return rangeKeyAt(path, basis);
  const method = getAt(basis, `${input[1] ?? ''}/method`);
  return typeof method === 'string'
    ? methodById(method)?.inputs.find((one) => one.name === input[2])?.rangeKey
    : undefined;
}

const cache = new WeakMap<Basis, readonly Entered[]>();

/** Every known figure of a basis, in the order of the document. A basis is never changed in place, so it is walked once. */
export function everyFigure(basis: Basis): readonly Entered[] {
  const before = cache.get(basis);
  if (before) return before;
  const all: Entered[] = [];
  for (const { path, value } of walk(basis, (inner) => !isLeaf(inner))) {
    if (!isFigure(value) || !isKnown(value) || COPIES.test(path)) continue;
    const key = keyAt(basis, path);
    all.push(key === undefined ? { path, figure: value } : { path, figure: value, key });
  }
  cache.set(basis, all);
  return all;
}

/** The words of a figure's place: "PSV-101A, set pressure". */
export function labelOf(basis: Basis, path: Path): string {
  const { label } = describePath(basis, path);
  return label.charAt(0).toUpperCase() + label.slice(1);
}

/** The origin of a figure: its own, else that of the nearest owner that has one. */
export function originOf(basis: Basis, path: Path): { origin: Origin; own: boolean } | undefined {
  const parts = path.split('/');
  for (let length = parts.length; length > 0; length -= 1) {
    const found = getAt(basis, parts.slice(0, length).join('/'));
    const origin = isFields(found) ? originSchema.safeParse(found['origin']) : undefined;
    if (origin?.success === true) return { origin: origin.data, own: length === parts.length };
  }
  return undefined;
}

/** The tag, name or id of the element that a figure belongs to. */
export function ownerOf(basis: Basis, path: Path): string {
  const [list = '', id = ''] = path.split('/');
  const owner = getAt(basis, `${list}/${id}`);
  if (!isFields(owner)) return list;
  for (const name of ['tag', 'name', 'title', 'key', 'nominal']) {
    const value = owner[name];
    if (typeof value === 'string') return value;
  }
  return id;
}
