/* The tools above a text: real buttons, one stop of the Tab key, arrows between them. */
import { type Editor } from '@tiptap/core';

type Tool = {
  label: string;
  keys?: string;
  run: (editor: Editor) => boolean;
  /** Name and attributes that are active while the tool's state holds; absent for tools that only act. */
  active?: [string, Record<string, unknown>?];
};

const TOOLS: readonly Tool[] = [
  {
    label: 'Bold',
    keys: 'Control+B',
    run: (editor) => editor.chain().focus().toggleBold().run(),
    active: ['bold'],
  },
  {
    label: 'Italic',
    keys: 'Control+I',
    run: (editor) => editor.chain().focus().toggleItalic().run(),
    active: ['italic'],
  },
  {
    label: 'Heading',
    run: (editor) => editor.chain().focus().toggleHeading({ level: 3 }).run(),
    active: ['heading', { level: 3 }],
  },
  {
    label: 'Small heading',
    run: (editor) => editor.chain().focus().toggleHeading({ level: 4 }).run(),
    active: ['heading', { level: 4 }],
  },
  { label: 'List', run: (editor) => editor.chain().focus().toggleBulletList().run(), active: ['bulletList'] },
  {
    label: 'Numbered list',
    run: (editor) => editor.chain().focus().toggleOrderedList().run(),
    active: ['orderedList'],
  },
  { label: 'Undo', keys: 'Control+Z', run: (editor) => editor.chain().focus().undo().run() },
  { label: 'Redo', keys: 'Control+Shift+Z', run: (editor) => editor.chain().focus().redo().run() },
];

function buttonOf(tool: Tool, editor: Editor): HTMLButtonElement {
  const button = document.createElement('button');
  button.type = 'button';
  button.textContent = tool.label;
  if (tool.keys) button.setAttribute('aria-keyshortcuts', tool.keys);
  button.addEventListener('click', () => tool.run(editor));
  return button;
}

/** Left and right go from tool to tool, Home and End to the ends; only one of them takes the Tab key. */
function rove(bar: HTMLElement, buttons: readonly HTMLButtonElement[]): void {
  const stop = (at: number) => {
    buttons.forEach((button, index) => {
      button.tabIndex = index === at ? 0 : -1;
    });
  };
  stop(0);
  bar.addEventListener('keydown', (event) => {
    const at = buttons.findIndex((button) => button === document.activeElement);
    const steps: Record<string, number> = {
      ArrowRight: at + 1,
      ArrowLeft: at - 1,
      Home: 0,
      End: buttons.length - 1,
    };
    const to = steps[event.key];
    if (at < 0 || to === undefined) return;
    event.preventDefault();
    const next = (to + buttons.length) % buttons.length;
    stop(next);
    buttons[next]?.focus();
  });
}

/** The toolbar of an editor. */
export function toolbarOf(editor: Editor, label: string): HTMLElement {
  const bar = document.createElement('div');
  bar.className = 'rich-tools';
  bar.setAttribute('role', 'toolbar');
  bar.setAttribute('aria-label', `Tools of ${label}`);
  const buttons = TOOLS.map((tool) => buttonOf(tool, editor));
  bar.append(...buttons);
  rove(bar, buttons);
  const show = () => {
    TOOLS.forEach((tool, index) => {
      if (tool.active) buttons[index]?.setAttribute('aria-pressed', String(editor.isActive(...tool.active)));
    });
  };
  editor.on('transaction', show);
  show();
  return bar;
}
