/* The small values that every part of a document is made of: ids, days, quantities, figures with their origin, method inputs. */
import { z } from 'zod';
import { FIELDS } from './fields';

export type Id = string;
export type Tag = string;
export type Path = string;
export type Hash = string;
export type Unit = string;
export type Day = string;
export type Instant = string;

/** An id is never shown; it may not hold what separates a path. */
export const idSchema = z
  .string()
  .max(80)
  .regex(/^[^\s/#]+$/, 'an id holds no blank, "/" or "#"');
export const tagSchema = z.string().trim().min(1).max(60);
export const pathSchema = z.string().min(1).max(400);
export const hashSchema = z.string().regex(/^[0-9a-f]{64}$/, 'a hash is 64 hexadecimal digits');
export const daySchema = z
  .string()
  .regex(/^\d{4}-(0[1-9]|1[0-2])-(0[1-9]|[12]\d|3[01])$/, 'a day is written 2026-02-28');
/** A short name or word. */
export const wordSchema = z.string().max(200);
/** A sentence or a remark. */
export const lineSchema = z.string().max(2000);

/** A quantity as it was entered; `text` keeps the digits as typed or printed when they say more than the number ("5.10"). */
export const quantitySchema = z.strictObject({
  value: z.number(),
  unit: z.string().min(1).max(24),
  text: z.string().max(40).optional(),
});
export type Q = z.infer<typeof quantitySchema>;

/** Where a copied figure was taken: document, path, and the value taken then. */
export const figureRefSchema = z.strictObject({
  doc: idSchema,
  path: pathSchema,
  via: z.enum(['same', 'saturation-temperature', 'saturation-pressure']).optional(),
  taken: quantitySchema,
  revision: z.number().int().min(0).optional(),
});
export type FigureRef = z.infer<typeof figureRefSchema>;

export const originSchema = z.strictObject({
  kind: z.enum([
    'drawing',
    'data-sheet',
    'maker',
    'plate',
    'test-record',
    'field-reading',
    'simulation',
    'calculation',
    'judgement',
    'figure',
  ]),
  ref: z.string().max(400),
  method: z.string().max(200).optional(),
  file: idSchema.optional(),
  figure: figureRefSchema.optional(),
});
export type Origin = z.infer<typeof originSchema>;

const knownFigureSchema = z.strictObject({ ...quantitySchema.shape, origin: originSchema.optional() });
const unknownFigureSchema = z.strictObject({
  unknown: z.string().min(1).max(400),
  key: z.string().max(60).optional(),
});
const figureOptions = [knownFigureSchema, unknownFigureSchema] as const;

export type KnownFigure = z.infer<typeof knownFigureSchema>;
export type UnknownFigure = z.infer<typeof unknownFigureSchema>;
/** A figure: known with its origin, or asked and not known. `K` names its range key. */
export type F<_K extends string = string> = KnownFigure | UnknownFigure;

/**
 * The schema of a figure that remembers its range keys.
 * @param keys keys of RANGES; the first holds unless the place of the figure picks another (tank pressure, outlet length)
 */
export function figure(...keys: string[]): z.ZodUnion<typeof figureOptions> {
  return z.union(figureOptions).register(FIELDS, { keys, leaf: 'figure' });
}

/** An optional figure. */
export function maybe(...keys: string[]): z.ZodOptional<z.ZodUnion<typeof figureOptions>> {
  return figure(...keys).optional();
}

/** An input of a method: a figure, the path of another value of the same document, a word, a flag or a list of ids. */
export const inputSchema = z
  .union([
    ...figureOptions,
    z.strictObject({ use: pathSchema }),
    z.strictObject({ word: z.string().max(8000), origin: originSchema.optional() }),
    z.strictObject({ flag: z.boolean(), origin: originSchema.optional() }),
    z.strictObject({ list: z.array(idSchema), origin: originSchema.optional() }),
  ])
  .register(FIELDS, { leaf: 'input' });
export type Input = z.infer<typeof inputSchema>;
export const inputsSchema = z.record(z.string().min(1).max(80), inputSchema);

export const codeSchema = z.strictObject({
  basis: z.enum(['asme-viii-1', 'asme-viii-2', 'asme-i', 'b31.3', 'en', 'api-620', 'api-650', 'other']),
  edition: z.string().max(60).optional(),
  units: z.enum(['US', 'SI']),
});
export type Code = z.infer<typeof codeSchema>;

/** A pressure and the temperature that it holds at. */
export const ptSchema = z.strictObject({ p: figure('rating'), at: maybe('designTemperature') });
export type PT = z.infer<typeof ptSchema>;

export const STATUSES = ['normal', 'start-up', 'shutdown', 'standby', 'isolated', 'cleaning'] as const;
export const statusSchema = z.enum(STATUSES);
export type Status = z.infer<typeof statusSchema>;

/** True for a figure that is known (false for absent and for asked-but-unknown). */
export function isKnown(figureOrNothing: F | undefined): figureOrNothing is KnownFigure {
  return figureOrNothing !== undefined && 'value' in figureOrNothing;
}

/** The quantity of a known figure, without its origin; nothing for an absent or unknown one. */
export function quantityOf(figureOrNothing: F | undefined): Q | undefined {
  if (!isKnown(figureOrNothing)) return undefined;
  const { value, unit, text } = figureOrNothing;
  return text === undefined ? { value, unit } : { value, unit, text };
}
