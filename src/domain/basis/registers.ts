/* Registers of their own beside the documents: fitted devices (the thing on the nozzle) and utilities of the site. */
import { z } from 'zod';
import { daySchema, figure, idSchema, maybe, quantitySchema, tagSchema, wordSchema } from './figures';

const plateSchema = z.strictObject({
  tag: tagSchema.optional(),
  set: quantitySchema.optional(),
  cdtp: quantitySchema.optional(),
  burst: quantitySchema.optional(),
  lot: wordSchema.optional(),
  capacity: quantitySchema.optional(),
  medium: wordSchema.optional(),
  at: wordSchema.optional(),
  spring: wordSchema.optional(),
  area: quantitySchema.optional(),
  size: wordSchema.optional(),
});

export const fittedDeviceSchema = z.strictObject({
  id: idSchema,
  serial: wordSchema,
  maker: wordSchema.optional(),
  model: wordSchema.optional(),
  year: z.number().int().min(1850).max(2200).optional(),
  code: wordSchema.optional(),
  plate: plateSchema,
  places: z.array(
    z.strictObject({
      point: idSchema,
      from: daySchema,
      to: daySchema.optional(),
      known: z.string().max(40),
      by: idSchema,
    }),
  ),
  tests: z.array(
    z.strictObject({
      id: idSchema,
      on: daySchema,
      shop: wordSchema.optional(),
      authorised: z.boolean().optional(),
      received: quantitySchema.optional(),
      left: quantitySchema.optional(),
      leakage: wordSchema.optional(),
      seals: z.array(wordSchema).optional(),
      file: idSchema.optional(),
    }),
  ),
});
export type FittedDevice = z.infer<typeof fittedDeviceSchema>;

export const utilitySchema = z.strictObject({
  id: idSchema,
  kind: z.enum([
    'power',
    'cooling-water',
    'steam',
    'instrument-air',
    'card',
    'refrigerant',
    'fuel',
    'inert-gas',
    'fire-zone',
    'weather-group',
  ]),
  tag: tagSchema,
  name: wordSchema,
  figures: z.record(z.string().max(80), figure()),
  area: maybe('fireZoneArea'),
  users: z.array(idSchema),
  of: idSchema.optional(),
});
export type Utility = z.infer<typeof utilitySchema>;
