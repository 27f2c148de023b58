/* Text of people and messages as a page shows it: what was typed into a refused form, and addresses in a message. */
import { type Sent } from './context';

const NEVER_SHOWN = /password|code|token|secret/i;

/** The fields of a form in the order of the page, without empty ones and without anything secret. */
export function shownFields(sent: Sent | undefined): { name: string; value: string }[] {
  return (sent?.typed ?? [])
    .map(([name, value]) => ({ name, value }))
    .filter(({ name, value }) => value.trim() !== '' && !NEVER_SHOWN.test(name));
}

/** Cuts a text into plain parts and web addresses. */
export function textWithLinks(text: string): { text: string; link: boolean }[] {
  return text
    .split(/(https?:\/\/[^\s<>"]+)/)
    .filter((part) => part !== '')
    .map((part) => ({ text: part, link: /^https?:\/\//.test(part) }));
}
