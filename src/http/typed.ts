/* Text of people and messages as a page shows it: what was typed into a refused form, and addresses in a message. */
import { type Sent } from './context';

const NEVER_SHOWN = /password|code|token|secret/i;
/** `per_01KBD…`: the name of a thing in the database. */
const IS_ID = /^(?:per|doc|rev|case|due|fnd|fd|el|file)_\w+$/;

/** The fields of a form in the order of the page, without empty ones and without anything secret. */
export function shownFields(sent: Sent | undefined): { name: string; value: string }[] {
  return (sent?.typed ?? [])
    .map(([name, value]) => ({ name, value }))
    .filter(({ name, value }) => value.trim() !== '' && !NEVER_SHOWN.test(name) && !IS_ID.test(value));
}

/** Cuts a text into plain parts and web addresses. */
export function textWithLinks(text: string): { text: string; link: boolean }[] {
  return text
    .split(/(https?:\/\/[^\s<>"]+)/)
    .filter((part) => part !== '')
    .map((part) => ({ text: part, link: /^https?:\/\//.test(part) }));
}

/** A field's name as words: `barometer.value` → `Barometer, value`. */
export function fieldWords(name: string): string {
  const words = name
    .replace(/\[\]$/, '')
    .split(/[./]/)
    .map((part) => (/^\d+$/.test(part) ? String(Number(part) + 1) : part))
    .map((part) => part.replace(/([a-z])([A-Z])/g, '$1 $2').toLowerCase())
    .join(', ');
  return words.charAt(0).toUpperCase() + words.slice(1);
}

/** The page of ours that a form stood on, by its Referer; undefined for none of ours. */
export function formPage(referer: string | null): string | undefined {
  if (referer === null || !URL.canParse(referer)) return undefined;
  const { pathname, search } = new URL(referer);
  return pathname.startsWith('/api/') || pathname === '/problem' ? undefined : `${pathname}${search}`;
}

function flat(present: unknown, path = ''): [string, string][] {
  if (present === null || present === undefined) return [[path, '']];
  if (typeof present !== 'object') return [[path, String(present)]];
  return Object.entries(present).flatMap(([name, value]) => flat(value, path ? `${path}.${name}` : name));
}

/** The typed fields that differ from what stands now; ids of things, which say nothing to a reader, are left out. */
export function differing(
  sent: Sent | undefined,
  present: unknown,
): { name: string; now: string; yours: string }[] {
  const now = new Map(flat(present));
  return shownFields(sent)
    .map(({ name, value }) => ({ name, yours: value, now: now.get(name) ?? value }))
    .filter((row) => row.now !== row.yours && !IS_ID.test(row.now + row.yours));
}
