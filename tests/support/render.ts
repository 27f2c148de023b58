/* Renders Astro components in tests, and keeps the result as a page for looking at. */
import { mkdirSync, writeFileSync } from 'node:fs';
import { experimental_AstroContainer as Container, type ContainerRenderOptions } from 'astro/container';

type Component = Parameters<Awaited<ReturnType<typeof Container.create>>['renderToString']>[0];

/** HTML of one component with its props and slots. */
export async function render(
  component: Component,
  props: Record<string, unknown> = {},
  slots?: ContainerRenderOptions['slots'],
): Promise<string> {
  const container = await Container.create();
  return container.renderToString(component, { props, ...(slots ? { slots } : {}) });
}

/** Renders a whole page of the gallery and writes it to test-results/gallery with links to its style sheets. */
export async function renderPage(component: Component, name: string): Promise<string> {
  const container = await Container.create();
  const html = await container.renderToString(component, { partial: false });
  mkdirSync('test-results/gallery', { recursive: true });
  const links = ['global', 'phone', 'sign-in', 'katex']
    .map((sheet) => `<link rel="stylesheet" href="css/${sheet}.css">`)
    .join('');
  writeFileSync(`test-results/gallery/${name}.html`, html.replace('</head>', `${links}</head>`));
  return html;
}
