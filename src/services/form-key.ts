/* The key of a form: sent with it, it makes what the form does happen once, however often it is sent. */
import { newId } from '@data/ids';

/** A fresh key, `form_01KBD…`. The prefix lets a page that is served again be given fresh keys. */
export function newKey(): string {
  return newId('form');
}

const KEYS = /\bform_[0-9A-HJKMNP-TV-Z]{26}\b/g;

/** The same page with fresh keys; a key that stands in two places is the same in both afterwards. */
export function withFreshKeys(html: string): string {
  const fresh = new Map<string, string>();
  return html.replace(KEYS, (old) => {
    const known = fresh.get(old) ?? newKey();
    fresh.set(old, known);
    return known;
  });
}
