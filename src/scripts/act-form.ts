/*
 * Posts forms without leaving the page, so that a refusal is told above the form and what was typed stays.
 *
 * A page includes it by `<script>import '@/scripts/act-form';</script>` and marks its forms `<form method="post" data-act …>`.
 * Without script the same form posts as it is. Fields that are wrong are found by name: `seats/checker` is the field `seats.checker`.
 */

type Told = { code: string; title: string; detail: string; id: string } & Partial<{
  errors: { path: string; sentence: string }[];
  openPoints: { sentence: string; where: string }[];
  present: unknown;
}>;
type Line = { text: string; href?: string; blank?: boolean };

const UNREACHED: Told = {
  code: 'UNREACHED',
  title: 'The server does not answer',
  detail:
    'It is not known whether this was written. What you typed is still here: send it again, it happens once.',
  id: '',
};

function make<K extends keyof HTMLElementTagNameMap>(
  tag: K,
  className = '',
  text = '',
): HTMLElementTagNameMap[K] {
  const element = document.createElement(tag);
  if (className) element.className = className;
  element.textContent = text;
  return element;
}

/** The control that a field path means, also within lists: `roles/0` is in `roles[]`. */
function controlOf(form: HTMLFormElement, path: string): HTMLElement | undefined {
  const name = path.replaceAll('/', '.');
  const names = [name, `${name}[]`, `${name}.value`, `set.${name}`, name.replace(/\.\d+$/, '[]')];
  const controls = [...form.querySelectorAll<HTMLElement>('[name]:not([type=hidden])')];
  return controls.find((control) =>
    names.includes((control.getAttribute('name') ?? '').replaceAll('/', '.')),
  );
}

function labelOf(control: HTMLElement): string {
  const label = (control as HTMLInputElement).labels?.[0]?.textContent ?? control.getAttribute('name') ?? '';
  return label.trim();
}

function clear(form: HTMLFormElement): void {
  form.querySelectorAll('.summary, .err[data-told]').forEach((old) => {
    old.remove();
  });
  form.querySelectorAll('.bad').forEach((field) => {
    field.classList.remove('bad');
  });
  form.querySelectorAll('[aria-invalid]').forEach((control) => {
    control.removeAttribute('aria-invalid');
  });
}

/** Frames the field and puts the sentence under it. Gives the id that a link jumps to. */
function mark(control: HTMLElement, sentence: string): string {
  const field = control.closest('.field, fieldset') ?? control.parentElement;
  if (!control.id) control.id = `f-${control.getAttribute('name') ?? ''}`;
  field?.classList.add('bad');
  field?.querySelectorAll('.err').forEach((old) => {
    old.remove();
  });
  const told = make('p', 'err', sentence);
  told.id = `${control.id}-error`;
  told.dataset['told'] = '';
  field?.append(told);
  control.setAttribute('aria-invalid', 'true');
  control.setAttribute('aria-describedby', `${control.id}-hint ${told.id}`);
  return `#${control.id}`;
}

/** Where what stands now differs from what the form holds, field by field. */
function differing(form: HTMLFormElement, present: unknown, path = ''): Line[] {
  if (typeof present === 'object' && present !== null) {
    const parts = Object.entries(present);
    return parts.flatMap(([name, value]) => differing(form, value, path ? `${path}/${name}` : name));
  }
  const control = controlOf(form, path);
  const now = present === null || present === undefined ? '' : String(present);
  if (!(control instanceof HTMLInputElement || control instanceof HTMLTextAreaElement)) return [];
  if (!control.matches('textarea, [type=text], [type=email], [type=date]') || control.value === now)
    return [];
  const label = labelOf(control);
  const href = `#${control.id}`;
  // A rich text is posted as JSON, which nobody reads: what stands now is shown when it is not what the page began with.
  if (control.value.startsWith('{"type":"doc"'))
    return control.defaultValue === now ? [] : [{ text: `${label}: now “${now}”, yours stays below`, href }];
  return [{ text: `${label}: now “${now}”, you have “${control.value}”`, href }];
}

function linesOf(form: HTMLFormElement, told: Told): Line[] {
  const fields = (told.errors ?? []).map(({ path, sentence }) => {
    const control = controlOf(form, path);
    return control ? { text: sentence, href: mark(control, sentence) } : { text: sentence };
  });
  const site = /^\/s\/[^/]+/.exec(location.pathname)?.[0] ?? '';
  const open = (told.openPoints ?? []).map(({ sentence, where }) => ({
    text: sentence,
    href: `${site}/${where}`,
  }));
  const lines: Line[] = [...fields, ...open];
  if (told.code === 'STALE') {
    lines.push(...differing(form, told.present));
    lines.push({ text: 'See the page as it is now', href: location.href.replace(/#.*/, ''), blank: true });
  }
  if (told.code === 'SIGN_IN') {
    lines.push({ text: 'Sign in beside this page, then send it again', href: '/sign-in', blank: true });
  }
  return lines;
}

function listOf(lines: readonly Line[]): HTMLUListElement {
  const list = make('ul');
  for (const { text, href, blank } of lines) {
    const item = make('li');
    const part = href ? make('a', '', text) : make('span', '', text);
    if (part instanceof HTMLAnchorElement && href) part.href = href;
    if (part instanceof HTMLAnchorElement && blank) part.target = '_blank';
    item.append(part);
    list.append(item);
  }
  return list;
}

/** Tells a refusal above the form, in the shape of the component ErrorSummary. */
function tell(form: HTMLFormElement, told: Told): void {
  const summary = make('div', 'summary');
  summary.setAttribute('role', 'alert');
  summary.tabIndex = -1;
  summary.append(make('h2', '', told.title));
  const lines = linesOf(form, told);
  const said = (told.errors ?? []).some(({ sentence }) => told.detail.endsWith(sentence));
  if (!said) summary.append(make('p', '', told.detail));
  if (lines.length > 0) summary.append(listOf(lines));
  if (told.code === 'INTERNAL') summary.append(make('p', 'note', `Request ${told.id}`));
  form.prepend(summary);
  summary.focus();
}

function goOn(next: string): void {
  const to = new URL(next, location.href);
  const same = to.pathname === location.pathname && to.search === location.search;
  location.assign(to.href);
  if (same && to.hash !== '') location.reload();
}

async function send(form: HTMLFormElement, button: HTMLElement | null): Promise<void> {
  const data = new FormData(form, button);
  const plain = new URLSearchParams();
  for (const [name, value] of data) if (typeof value === 'string') plain.append(name, value);
  const action = button?.getAttribute('formaction') ?? form.getAttribute('action') ?? location.href;
  const answer = await fetch(action, {
    method: 'POST',
    headers: { Accept: 'application/problem+json' },
    body: form.enctype === 'multipart/form-data' ? data : plain,
  });
  const body = (await answer.json()) as Told & { next?: string };
  if (answer.ok) goOn(body.next ?? location.href);
  else tell(form, body);
}

document.addEventListener('submit', (event) => {
  const form = event.target;
  if (!(form instanceof HTMLFormElement) || !form.matches('[data-act]') || event.defaultPrevented) return;
  event.preventDefault();
  if (form.ariaBusy === 'true') return;
  clear(form);
  form.ariaBusy = 'true';
  event.submitter?.setAttribute('aria-busy', 'true');
  send(form, event.submitter)
    .catch(() => {
      tell(form, UNREACHED);
    })
    .finally(() => {
      form.ariaBusy = null;
      event.submitter?.removeAttribute('aria-busy');
    });
});
