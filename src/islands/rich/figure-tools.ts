/* Inserting a figure that the page offers, and affirming those that have moved since the text was written. */
import { type Editor } from '@tiptap/core';
import { formatQuantity } from '@engine/quantity';
import { type FigureNode } from '@domain/text/read';
import { affirm, movedTo, type OfferedFigure } from './figures';

type Moved = { at: number; now: OfferedFigure };

/** The live figures of the text that say another value than the page offers. */
function movedIn(editor: Editor, offered: readonly OfferedFigure[]): Moved[] {
  const moved: Moved[] = [];
  editor.state.doc.descendants((node, at) => {
    if (node.type.name !== 'figure') return;
    const now = movedTo(node.attrs as FigureNode['attrs'], offered);
    if (now) moved.push({ at, now });
  });
  return moved;
}

function affirmAll(editor: Editor, offered: readonly OfferedFigure[]): void {
  const { tr } = editor.state;
  for (const { at, now } of movedIn(editor, offered)) tr.setNodeMarkup(at, undefined, affirm(now));
  editor.view.dispatch(tr);
  editor.commands.focus();
}

function button(words: string, act: () => void): HTMLButtonElement {
  const made = document.createElement('button');
  made.type = 'button';
  made.className = 'btn small';
  made.textContent = words;
  made.addEventListener('click', act);
  return made;
}

function pickerOf(editor: Editor, offered: readonly OfferedFigure[], id: string): HTMLElement {
  const row = document.createElement('div');
  row.className = 'rich-figures';
  const label = document.createElement('label');
  label.htmlFor = `${id}-figure`;
  label.textContent = 'Figure';
  const select = document.createElement('select');
  select.id = label.htmlFor;
  select.className = 'in small';
  offered.forEach((one, index) => {
    const words = `${one.label}: ${formatQuantity(one.value, one.decimals === undefined ? {} : { decimals: one.decimals })}`;
    select.append(new Option(words, String(index)));
  });
  const insert = button('Insert figure', () => {
    const chosen = offered[Number(select.value)];
    if (chosen)
      editor
        .chain()
        .focus()
        .insertContent({ type: 'figure', attrs: affirm(chosen) })
        .run();
  });
  row.append(label, select, insert);
  return row;
}

/** The row of figure tools, or nothing when the page offers no figure. */
export function figureToolsOf(
  editor: Editor,
  offered: readonly OfferedFigure[],
  id: string,
): HTMLElement | undefined {
  if (offered.length === 0) return undefined;
  const row = pickerOf(editor, offered, id);
  const renew = button('', () => {
    affirmAll(editor, offered);
  });
  const show = () => {
    const count = movedIn(editor, offered).length;
    renew.hidden = count === 0;
    renew.textContent =
      count === 1 ? 'Affirm the figure that moved' : `Affirm ${String(count)} figures that moved`;
  };
  editor.on('update', show);
  show();
  row.append(renew);
  return row;
}
