/* The draft of a rich text: what was typed is kept in this tab until its form is posted. */

/** Under which key the draft of a text area is kept: the page, the form's address and the name of the field. */
export function draftKey(area: HTMLTextAreaElement): string {
  const action = area.form?.getAttribute('action') ?? '';
  const own = area.dataset['richKey'] ?? area.name;
  return ['setwright-text', location.pathname, action, own].join('|');
}

/** Keeps a draft; a full or forbidden store is no reason to disturb who writes. */
export function keepDraft(key: string, text: string): void {
  try {
    sessionStorage.setItem(key, text);
  } catch {
    return;
  }
}

/** The draft under a key, or null. */
export function draftAt(key: string): string | null {
  try {
    return sessionStorage.getItem(key);
  } catch {
    return null;
  }
}

/** Forgets a draft. */
export function dropDraft(key: string): void {
  try {
    sessionStorage.removeItem(key);
  } catch {
    return;
  }
}
