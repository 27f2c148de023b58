/* Every page for every role: it answers, has one heading, logs nothing, breaks no policy, and its script is light. */
import { type Page, type Response } from '@playwright/test';
import { gzipSync } from 'node:zlib';
import { expect, test } from '../support/fixtures';
import { closeBrowsers, pageOf, SITE } from './support/people';
import { COORDINATORS, NOWHERE, ONE_OF_EACH, OVERSEERS, PAGES } from './support/routes';

test.afterEach(closeBrowsers);

/** Kilobytes (1,000 bytes) of compressed script at first load. */
const LIMITS = { none: 0, plain: 10, island: 110, caseBeforeEditor: 180 };

/** What the browser complains of, from here on. */
function complaintsOf(page: Page): string[] {
  const said: string[] = [];
  page.on('console', (message) => {
    if (['error', 'warning'].includes(message.type())) said.push(message.text());
  });
  page.on('pageerror', (error) => said.push(error.message));
  return said;
}

async function visit(page: Page, path: string, status = 200): Promise<void> {
  const answer = await page.goto(path);
  expect(answer?.status(), path).toBe(status);
  await expect(page.getByRole('heading', { level: 1 }), path).toHaveCount(1);
  expect(await page.title(), path).not.toBe('');
}

for (const [role, name] of Object.entries(ONE_OF_EACH)) {
  test(`every page opens for the ${role}, and the browser complains of nothing`, async ({
    browser,
    server,
  }) => {
    test.setTimeout(240_000);
    const page = await pageOf(browser, server, name);
    const said = complaintsOf(page);
    for (const path of PAGES) {
      await visit(page, path);
      expect.soft(said.splice(0), path).toEqual([]);
    }
    for (const path of COORDINATORS) await visit(page, path, role === 'coordinator' ? 200 : 403);
    const oversees = role === 'coordinator' || role === 'auditor';
    for (const path of OVERSEERS) await visit(page, path, oversees ? 200 : 403);
    for (const path of NOWHERE) await visit(page, path, 404);
  });
}

/** Compressed script that a page loads before anyone touches it, in kilobytes. */
async function scriptOf(page: Page, path: string): Promise<number> {
  const scripts: Response[] = [];
  const note = (answer: Response) => {
    if (answer.request().resourceType() === 'script') scripts.push(answer);
  };
  page.on('response', note);
  await page.goto(path, { waitUntil: 'networkidle' });
  page.off('response', note);
  const inline = await page.locator('script:not([src]):not([type="application/json"])').allTextContents();
  const bodies = [...(await Promise.all(scripts.map((answer) => answer.body()))), ...inline.filter(Boolean)];
  return bodies.reduce((sum, body) => sum + gzipSync(body, { level: 9 }).byteLength, 0) / 1000;
}

test('sign-in and the pages of errors carry no script', async ({ browser, server }) => {
  const stranger = await browser.newPage({ baseURL: server.url });
  expect(await scriptOf(stranger, '/sign-in')).toBe(LIMITS.none);
  const page = await pageOf(browser, server, ONE_OF_EACH.originator);
  for (const path of ['/no-such-page', `${SITE}/people/new`])
    expect(await scriptOf(page, path), path).toBe(LIMITS.none);
});

test('script is light: next to nothing without an island, the case page before an editor opens', async ({
  browser,
  server,
}) => {
  test.setTimeout(240_000);
  const page = await pageOf(browser, server, ONE_OF_EACH.originator);
  // A route of ours keeps the browser's cache out, so that each page is weighed as a first visit.
  await page.route('**/*', (route) => route.continue());
  for (const path of PAGES) {
    const kilobytes = await scriptOf(page, path);
    const islands = await page.locator('astro-island').count();
    const limit = path.includes('/cases/KW')
      ? LIMITS.caseBeforeEditor
      : islands > 0
        ? LIMITS.island
        : LIMITS.plain;
    expect.soft(kilobytes, `${path} with ${String(islands)} islands`).toBeLessThanOrEqual(limit);
  }
});
