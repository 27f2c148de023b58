/* Turns the flat fields of a form into the nested body that a program would send. */

type Nested = { [name: string]: unknown };

function isIndex(part: string): boolean {
  return /^\d{1,3}$/.test(part);
}

function put(into: Nested, parts: readonly string[], value: unknown): void {
  const [first = '', ...rest] = parts;
  // A name that would reach the prototype of an object is no field of ours.
  if (first === '__proto__' || first === 'constructor' || first === 'prototype') return;
  if (rest.length === 0) {
    into[first] = value;
    return;
  }
  const inner = (into[first] ??= {}) as Nested;
  put(inner, rest, value);
}

/** Objects whose names are all numbers are lists. */
function listed(value: unknown): unknown {
  if (typeof value !== 'object' || value === null || Array.isArray(value)) return value;
  const entries = Object.entries(value).map(([name, inner]): [string, unknown] => [name, listed(inner)]);
  const isList = entries.length > 0 && entries.every(([name]) => isIndex(name));
  if (!isList) return Object.fromEntries(entries);
  return entries.sort(([a], [b]) => Number(a) - Number(b)).map(([, inner]) => inner);
}

/** True for a row of a form that was left empty: it is no entry of a list. */
function isBlankRow(value: unknown): boolean {
  return (
    typeof value === 'object' && value !== null && !Array.isArray(value) && Object.keys(value).length === 0
  );
}

function withoutBlankRows(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(withoutBlankRows).filter((row) => !isBlankRow(row));
  if (typeof value !== 'object' || value === null) return value;
  return Object.fromEntries(Object.entries(value).map(([name, inner]) => [name, withoutBlankRows(inner)]));
}

/**
 * `requirements.0.text=…` → `{ requirements: [{ text: … }] }`. A field left empty was not filled in and is left out; a
 * row of a list whose fields are all empty is left out whole.
 */
export function nested(fields: Readonly<Record<string, string | string[]>>): Nested {
  const body: Nested = {};
  for (const [name, value] of Object.entries(fields)) {
    const parts = name.split('.');
    if (value !== '') put(body, parts, value);
    else if (parts.length > 1) put(body, parts.slice(0, -1), reach(body, parts.slice(0, -1)) ?? {});
  }
  return withoutBlankRows(listed(body)) as Nested;
}

function reach(body: Nested, parts: readonly string[]): unknown {
  return parts.reduce<unknown>((value, part) => (value as Nested | undefined)?.[part], body);
}
