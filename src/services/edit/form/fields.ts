/* The flat fields of a form about a document, gathered by the path that they speak of. */
import { type Path } from '@domain/basis';

/** What a form says of one place. `flags` and `list` are there when the form asked, even with nothing chosen. */
export type Asked = {
  set?: string;
  unit?: string;
  kind?: string;
  ref?: string;
  calc?: string;
  flags?: string[];
  list?: string[];
};

const PLAIN = /^(set|unit|calc)\.(.+)$/;
const MANY = /^(flags|list)\.(.+)\[\]$/;
const ORIGIN = /^origin\.(.+)\.(kind|ref)$/;

function note(asked: Map<Path, Asked>, name: string, value: string): void {
  const plain = PLAIN.exec(name);
  const many = MANY.exec(name);
  const origin = ORIGIN.exec(name);
  const path = plain?.[2] ?? many?.[2] ?? origin?.[1];
  if (path === undefined) return;
  const one = asked.get(path) ?? {};
  if (plain) one[plain[1] as 'set' | 'unit' | 'calc'] = value;
  if (origin) one[origin[2] as 'kind' | 'ref'] = value;
  if (many) {
    const key = many[1] as 'flags' | 'list';
    one[key] = [...(one[key] ?? []), ...(value === '' ? [] : [value])];
  }
  asked.set(path, one);
}

/**
 * `set.<path>`, `unit.<path>`, `origin.<path>.kind`, `origin.<path>.ref`, `calc.<path>`, `flags.<path>[]` and
 * `list.<path>[]` by their path; other fields are left out.
 */
export function askedOf(typed: readonly (readonly [string, string])[]): Map<Path, Asked> {
  const asked = new Map<Path, Asked>();
  for (const [name, value] of typed) note(asked, name, value);
  return asked;
}

/** The value of a field that is no place of a document. */
export function own(typed: readonly (readonly [string, string])[], name: string): string | undefined {
  return typed.find(([other]) => other === name)?.[1];
}
