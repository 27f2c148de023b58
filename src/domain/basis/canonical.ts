/* The one way in which a value is written before it is hashed, so that equal contents always have equal hashes. */
import { sha256 } from '@noble/hashes/sha2.js';
import { bytesToHex, utf8ToBytes } from '@noble/hashes/utils.js';
import type { Hash } from './figures';

function canonicalNumber(value: number): string {
  if (!Number.isFinite(value)) throw new RangeError(`${String(value)} has no canonical form`);
  return value === 0 ? '0' : String(value);
}

const quoted = new Map<string, string>();
const KEYS_HELD = 4000;

/** A key as it is written; keys are few and come again with every document. */
function quotedKey(key: string): string {
  const known = quoted.get(key);
  if (known !== undefined) return known;
  const made = JSON.stringify(key.normalize('NFC'));
  if (quoted.size < KEYS_HELD) quoted.set(key, made);
  return made;
}

function canonicalObject(value: Record<string, unknown>): string {
  let text = '';
  for (const key of Object.keys(value).sort()) {
    const field = value[key];
    if (field !== undefined) text += `${text === '' ? '' : ','}${quotedKey(key)}:${canonical(field)}`;
  }
  return `{${text}}`;
}

function canonicalList(value: readonly unknown[]): string {
  let text = '';
  for (let i = 0; i < value.length; i += 1) text += `${i === 0 ? '' : ','}${canonical(value[i])}`;
  return `[${text}]`;
}

/**
 * The canonical text of a plain value: keys sorted, absent keys dropped, text in NFC, numbers as the shortest decimal
 * that reads back, −0 as 0, lists in stored order. Throws for what no document can hold (NaN, functions): a bug.
 */
export function canonical(value: unknown): string {
  if (value === null || value === undefined) return 'null';
  if (typeof value === 'number') return canonicalNumber(value);
  if (typeof value === 'string') return JSON.stringify(value.normalize('NFC'));
  if (typeof value === 'boolean') return value ? 'true' : 'false';
  if (Array.isArray(value)) return canonicalList(value);
  if (typeof value === 'object') return canonicalObject(value as Record<string, unknown>);
  throw new TypeError(`a ${typeof value} has no canonical form`);
}

/** SHA-256 in hexadecimal over `kind \n schema \n canonical form`; `kind` keeps hashes of different things different. */
export function hashOf(kind: string, value: unknown, schema = 1): Hash {
  return bytesToHex(sha256(utf8ToBytes(`${kind}\n${String(schema)}\n${canonical(value)}`)));
}

/** A worked number as it may enter a hash: 9 significant digits, so that the last bits of a float do not count. */
export function roundedForHash(value: number): number {
  return Number.isFinite(value) ? Number(value.toPrecision(9)) : value;
}

/** True when two plain values have the same canonical form. */
export function sameContent(one: unknown, other: unknown): boolean {
  return one === other || canonical(one) === canonical(other);
}
