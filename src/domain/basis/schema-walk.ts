/* Following a path through the schemas: which field stands there, its words, its range key. */
import { z } from 'zod';
import { headerSchema } from '@domain/header/header';
import { unitsOfKey } from '@engine/ranges';
import { dimensionOf, type Dimension } from '@engine/quantity';
import { basisSchema } from './basis';
import { FIELDS, wordsOfName, type FieldMeta } from './fields';
import type { Path } from './figures';
import { childOf, isFields, partsOf } from './paths';

/** The schema of a document: a basis or a header, told apart by what only one of them has. */
export function schemaOf(document: unknown): z.ZodType {
  return isFields(document) && Object.hasOwn(document, 'nodes') ? headerSchema : basisSchema;
}

/** A schema and everything that it wraps (optional and the like), outermost first. */
function* layersOf(schema: z.core.$ZodType): Generator<z.core.$ZodType> {
  yield schema;
  if (schema instanceof z.ZodOptional || schema instanceof z.ZodNullable) yield* layersOf(schema.unwrap());
  if (schema instanceof z.ZodUnion) for (const option of schema.options) yield* layersOf(option);
}

function stepInto(schema: z.core.$ZodType, part: string): z.core.$ZodType | undefined {
  for (const layer of layersOf(schema)) {
    if (layer instanceof z.ZodObject && Object.hasOwn(layer.shape, part)) return layer.shape[part];
    if (layer instanceof z.ZodArray) return layer.element;
    if (layer instanceof z.ZodRecord) return layer.valueType;
  }
  return undefined;
}

/** The schema of the field at a path; nothing when no document can have that path. */
export function schemaAt(root: z.core.$ZodType, path: Path): z.core.$ZodType | undefined {
  let schema: z.core.$ZodType | undefined = root;
  for (const part of partsOf(path)) {
    if (schema) schema = stepInto(schema, part);
  }
  return schema;
}

/** What is known of a field: nearest words, range keys and leaf of the schema and of what it wraps. */
export function metaOf(schema: z.core.$ZodType): FieldMeta {
  const found: FieldMeta = {};
  for (const layer of layersOf(schema)) {
    const meta = FIELDS.get(layer as z.ZodType);
    if (!meta) continue;
    found.label ??= meta.label;
    found.keys ??= meta.keys;
    found.leaf ??= meta.leaf;
  }
  return found;
}

/** The words of a field: its own, or its name taken apart. */
export function labelAt(root: z.core.$ZodType, path: Path): string {
  const schema = schemaAt(root, path);
  const label = schema ? metaOf(schema).label : undefined;
  return label ?? wordsOfName(partsOf(path).at(-1) ?? '');
}

function choose(keys: readonly string[], path: Path, document: unknown): string | undefined {
  if (keys.length < 2) return keys[0];
  const [list, id] = partsOf(path);
  const element = childOf(childOf(document, list ?? ''), id ?? '');
  if (keys.includes('tankDesignPressure') && isFields(element) && element['kind'] === 'storage-tank')
    return 'tankDesignPressure';
  if (keys.includes('outletLength') && isOnlyInOutlets(document, id ?? '')) return 'outletLength';
  return keys[0];
}

function isOnlyInOutlets(document: unknown, segment: string): boolean {
  const lines = isFields(document) ? document['lines'] : undefined;
  if (!Array.isArray(lines)) return true;
  const uses = lines
    .filter((line) => isFields(line) && Array.isArray(line['path']) && line['path'].includes(segment))
    .filter(isFields);
  return uses.length > 0 && uses.every((line) => line['side'] === 'outlet');
}

/**
 * The range key of the figure at a path (RULES section 3 or ours); with a document, the one that the place picks
 * (tank pressure, outlet length). Nothing where no range is set (inputs of methods: the method knows theirs).
 */
export function rangeKeyAt(path: Path, document?: unknown): string | undefined {
  const schema = schemaAt(schemaOf(document), path);
  return schema ? choose(metaOf(schema).keys ?? [], path, document) : undefined;
}

/** The dimensions that a figure at this path may be entered in, the usual first, and the unit that a bare number means. */
export function expectedAt(
  path: Path,
  document?: unknown,
): { dimension: Dimension[]; unit: string } | undefined {
  const key = rangeKeyAt(path, document);
  const units = key === undefined ? [] : unitsOfKey(key);
  const dimension = [...new Set(units.flatMap((unit) => dimensionOf(unit) ?? []))];
  return units[0] === undefined || dimension.length === 0 ? undefined : { dimension, unit: units[0] };
}

/** The parts of a document in the order in which it is read. */
export function sectionsOf(document: unknown): string[] {
  const schema = schemaOf(document);
  return schema instanceof z.ZodObject ? Object.keys(schema.shape) : [];
}
