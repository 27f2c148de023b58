/* Reading a document from outside: a basis or a header, or what is wrong with it. */
import type { z } from 'zod';
import { headerSchema, type Header } from '@domain/header/header';
import { fail, ok, type Result } from '@domain/result';
import { basisSchema, type Basis } from './basis';
import { errorsOf } from './issues';

function read(input: unknown): unknown {
  if (typeof input !== 'string') return input;
  try {
    return JSON.parse(input) as unknown;
  } catch {
    return undefined;
  }
}

/** A document by its schema; the problem SCHEMA lists the fields that are wrong. */
export function parseWith<T>(schema: z.ZodType<T>, input: unknown, what: string): Result<T> {
  const value = read(input);
  if (value === undefined) return fail('MALFORMED', `The ${what} can't be read: it is not JSON.`);
  const parsed = schema.safeParse(value);
  if (parsed.success) return ok(parsed.data);
  const errors = errorsOf(parsed.error.issues, value);
  return fail('SCHEMA', errors[0]?.sentence ?? `The ${what} is not in its form.`, { errors });
}

/** A relief basis from JSON (text or value). */
export function parseBasis(json: unknown): Result<Basis> {
  return parseWith(basisSchema, json, 'relief basis');
}

/** A header from JSON (text or value). */
export function parseHeader(json: unknown): Result<Header> {
  return parseWith(headerSchema, json, 'header');
}
