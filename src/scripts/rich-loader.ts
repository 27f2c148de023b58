/*
 * Loads the editor of rich texts when somebody goes to write in one; until then, and without script, a plain text area stands there.
 *
 * A page includes it by `<script>import '@/scripts/rich-loader';</script>` and marks its text areas `<textarea data-rich …>`.
 * `data-rich-doc` holds the stored text as JSON, `data-figures` the figures that may be inserted (see src/islands/rich/figures.ts).
 */
import { draftKey } from '../islands/rich/draft';

function open(area: HTMLTextAreaElement, focus: boolean): void {
  if (area.dataset['richState'] !== undefined) return;
  area.dataset['richState'] = 'loading';
  import('../islands/rich/open-editor')
    .then(({ openEditor }) => {
      openEditor(area, focus);
      area.dataset['richState'] = 'open';
    })
    .catch(() => {
      // The plain text area goes on working; the next focus tries again.
      delete area.dataset['richState'];
    });
}

document.addEventListener('focusin', ({ target }) => {
  if (target instanceof HTMLTextAreaElement && target.matches('[data-rich]')) open(target, true);
});

document.addEventListener('click', ({ target }) => {
  const button = target instanceof Element ? target.closest<HTMLElement>('[data-rich-open]') : null;
  const area = button && document.getElementById(button.dataset['richOpen'] ?? '');
  if (area instanceof HTMLTextAreaElement) open(area, true);
});

for (const area of document.querySelectorAll<HTMLTextAreaElement>('textarea[data-rich]')) {
  if (sessionStorage.getItem(draftKey(area)) !== null) open(area, false);
}
