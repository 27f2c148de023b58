/* The editor of a rich text: takes the place of a plain text area, which goes on posting what is written. */
import { Editor, type JSONContent } from '@tiptap/core';
import { LONGEST_TEXT } from '@domain/text/nodes';
import { formatNumber } from '@engine/quantity';
import { draftAt, draftKey, dropDraft, keepDraft } from './draft';
import { figureToolsOf } from './figure-tools';
import { type OfferedFigure, offeredIn } from './figures';
import { extensionsFor } from './nodes';
import { cleanPasted, countOf, postedText, type Started, startOf } from './start';
import { toolbarOf } from './toolbar';

type Parts = { frame: HTMLElement; ground: HTMLElement; count: HTMLElement; said: HTMLElement };

function element(className: string, tag: 'div' | 'p' = 'div'): HTMLElement {
  const made = document.createElement(tag);
  made.className = className;
  return made;
}

function partsFor(): Parts {
  const frame = element('rich');
  const count = element('rich-count hint', 'p');
  const said = element('rich-said hint', 'p');
  said.setAttribute('role', 'status');
  return { frame, ground: element('rich-ground'), count, said };
}

function labelOf(area: HTMLTextAreaElement): { words: string; id: string | undefined } {
  const label = area.labels[0];
  if (!label) return { words: area.getAttribute('aria-label') ?? 'Text', id: undefined };
  label.id ||= `${area.id || area.name}-label`;
  return { words: label.textContent.trim(), id: label.id };
}

function attributesFor(area: HTMLTextAreaElement): Record<string, string> {
  const { words, id } = labelOf(area);
  const described = area.getAttribute('aria-describedby');
  return {
    class: 'rich-text hand',
    role: 'textbox',
    'aria-multiline': 'true',
    ...(id ? { 'aria-labelledby': id } : { 'aria-label': words }),
    ...(described ? { 'aria-describedby': described } : {}),
    ...(area.getAttribute('aria-invalid') ? { 'aria-invalid': 'true' } : {}),
  };
}

function showCount(count: HTMLElement, json: unknown): void {
  const { characters, words } = countOf(json);
  const over = characters > LONGEST_TEXT;
  count.textContent = `${formatNumber(words)} ${words === 1 ? 'word' : 'words'}, ${formatNumber(characters)} of ${formatNumber(LONGEST_TEXT)} characters${over ? ': shorten it' : ''}`;
  count.classList.toggle('over', over);
}

/** Until the form is posted the draft is kept, and the browser asks before the page is left. */
function guard(area: HTMLTextAreaElement, key: string, isDirty: () => boolean): void {
  let posting = false;
  area.form?.addEventListener('submit', () => {
    posting = true;
    dropDraft(key);
  });
  // A refusal is told inside the form: the text is not written yet, so its draft is kept again.
  const told = new MutationObserver(() => {
    if (!posting || !area.form?.querySelector('.summary')) return;
    posting = false;
    if (isDirty()) keepDraft(key, area.value);
  });
  if (area.form) told.observe(area.form, { childList: true });
  window.addEventListener('beforeunload', (event) => {
    if (isDirty() && !posting) event.preventDefault();
  });
}

function editorIn(
  parts: Parts,
  area: HTMLTextAreaElement,
  started: Started,
  offered: readonly OfferedFigure[],
): Editor {
  return new Editor({
    element: parts.ground,
    extensions: extensionsFor(offered),
    content: started.text as JSONContent,
    injectCSS: false,
    editorProps: { attributes: attributesFor(area), transformPastedHTML: cleanPasted },
  });
}

function follow(editor: Editor, area: HTMLTextAreaElement, parts: Parts, started: Started): void {
  const key = draftKey(area);
  let dirty = started.from !== 'stored' && area.value !== area.defaultValue;
  const write = () => {
    const json = editor.getJSON();
    area.value = postedText(json);
    showCount(parts.count, json);
  };
  write();
  if (started.from === 'draft') {
    dirty = true;
    parts.said.textContent = 'What you had typed here before is back. It is not saved yet.';
  }
  editor.on('update', () => {
    dirty = true;
    write();
    keepDraft(key, area.value);
  });
  guard(area, key, () => dirty);
}

/** Opens the editor in place of a text area; the area stays in its form, hidden, and carries the JSON. */
export function openEditor(area: HTMLTextAreaElement, focus: boolean): void {
  const offered = offeredIn(area.dataset['figures']);
  const started = startOf({
    draft: draftAt(draftKey(area)),
    typed: area.value,
    shown: area.defaultValue,
    stored: area.dataset['richDoc'],
  });
  const parts = partsFor();
  const editor = editorIn(parts, area, started, offered);
  const label = labelOf(area).words;
  const figures = figureToolsOf(editor, offered, area.id || area.name);
  parts.frame.append(toolbarOf(editor, label), parts.ground, ...(figures ? [figures] : []));
  parts.frame.append(parts.count, parts.said);
  area.hidden = true;
  area.after(parts.frame);
  area.labels[0]?.addEventListener('click', () => editor.commands.focus());
  follow(editor, area, parts, started);
  if (focus) editor.commands.focus('end');
}
