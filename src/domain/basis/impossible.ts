/* Figures that physics does not allow, among those that a change has touched. */
import { methodById } from '@engine/catalog';
import type { FieldError } from '@domain/result';
import { checkRange, type RangeContext } from '@engine/ranges';
import { describePath } from './describe';
import { isKnown, type Path } from './figures';
import { isFigure, isLeaf } from './leaves';
import { childOf, getAt, idOf, joinPath, splitPath, walk } from './paths';
import { rangeKeyAt } from './schema-walk';

type Touch = { op: string; path: Path; value?: unknown };

/** Every known figure at or below a path with the verdict of its range. */
function* figuresBelow(document: unknown, path: Path): Generator<{ path: Path; value: unknown }> {
  const start = getAt(document, path);
  if (start === undefined) return;
  for (const place of walk(start, (value) => !isLeaf(value), path)) {
    if (isFigure(place.value)) yield place;
  }
}

/** The range key of an input of a calculation: its method knows it. */
function inputKeyAt(document: unknown, path: Path): string | undefined {
  const { parent, last } = splitPath(path);
  const { parent: calc, last: field } = splitPath(parent);
  const method = field === 'inputs' ? childOf(getAt(document, calc), 'method') : undefined;
  const inputs = typeof method === 'string' ? methodById(method)?.inputs : undefined;
  return inputs?.find((input) => input.name === last)?.rangeKey;
}

/** One sentence for each impossible figure at or below a path. */
export function impossibleBelow(document: unknown, path: Path, context: RangeContext = {}): FieldError[] {
  const errors: FieldError[] = [];
  for (const { path: at, value } of figuresBelow(document, path)) {
    const ofField = rangeKeyAt(at, document);
    const key = ofField ?? inputKeyAt(document, at);
    if (key === undefined || !isFigure(value) || !isKnown(value)) continue;
    const check = checkRange(key, value, context, describePath(document, at).label);
    // An input of the wrong kind is refused by the sheet itself, which knows what it takes.
    if (check.wrongUnit && ofField === undefined) continue;
    if (check.verdict === 'impossible' && check.sentence)
      errors.push({ path: at, code: 'VALUE_IMPOSSIBLE', sentence: check.sentence });
  }
  return errors;
}

/** The impossible figures that a list of changes has brought in; what stood before is not asked again. */
export function impossibleFigures(
  document: unknown,
  touches: readonly Touch[],
  context: RangeContext,
): FieldError[] {
  const paths = touches.flatMap(({ op, path, value }) => {
    if (op === 'set') return [path];
    return op === 'add' ? [joinPath(path, idOf(value) ?? '')] : [];
  });
  return [...new Set(paths)].flatMap((path) => impossibleBelow(document, path, context));
}
