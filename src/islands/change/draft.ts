/* The draft of a change: what was typed stays in this browser until it is saved or thrown away. */
import { type TypedByPath } from './work';

export type Draft = { version: number; typed: TypedByPath };
type Store = Pick<Storage, 'getItem' | 'setItem' | 'removeItem' | 'key' | 'length'>;

const PREFIX = 'setwright-change';

/** The key of a draft: the address it would be saved at, and the version it was typed on. */
export function draftKeyOf(api: string, version: number): string {
  return `${PREFIX}|${api}|${String(version)}`;
}

function isTyped(value: unknown): value is TypedByPath {
  if (typeof value !== 'object' || value === null || Array.isArray(value)) return false;
  return Object.values(value).every(
    (one) =>
      typeof one === 'object' &&
      one !== null &&
      ['text', 'kind', 'ref'].every((name) => typeof (one as Record<string, unknown>)[name] === 'string'),
  );
}

/** The newest draft of an address, also one typed on an older version; nothing where none is kept or readable. */
export function findDraft(store: Store, api: string): Draft | undefined {
  const start = `${PREFIX}|${api}|`;
  try {
    const versions = Array.from({ length: store.length }, (_none, index) => store.key(index) ?? '')
      .filter((key) => key.startsWith(start))
      .map((key) => Number(key.slice(start.length)))
      .filter(Number.isInteger);
    if (versions.length === 0) return undefined;
    const version = Math.max(...versions);
    const typed: unknown = JSON.parse(store.getItem(draftKeyOf(api, version)) ?? 'null');
    return isTyped(typed) && Object.keys(typed).length > 0 ? { version, typed } : undefined;
  } catch {
    return undefined;
  }
}

/** Keeps a draft, or forgets it when nothing is typed; a full store disturbs nobody. */
export function keepDraft(store: Store, api: string, { version, typed }: Draft): void {
  try {
    if (Object.keys(typed).length === 0) store.removeItem(draftKeyOf(api, version));
    else store.setItem(draftKeyOf(api, version), JSON.stringify(typed));
  } catch {
    return;
  }
}
