/* The Content-Security-Policy in a real browser: nothing of ours is stopped by it, islands wake up under it, an inline script that is not ours is stopped. */
import { createHash } from 'node:crypto';
import { expect, test } from '../support/fixtures';
import { signInAs } from '../support/sign-in';

const PAGES = [
  '/s/ketterwold',
  '/s/ketterwold/register/systems',
  '/s/ketterwold/cases/KW-2026-003',
  '/account',
  '/mail',
  '/no-such-page',
];

test.beforeEach(async ({ context, server }) => {
  const [name = '', value = ''] = (await signInAs(server.url, 'originator')).split('=');
  await context.addCookies([{ name, value, url: server.url }]);
});

for (const path of PAGES) {
  test(`${path} runs whole under the policy`, async ({ page }) => {
    const stopped: string[] = [];
    page.on('console', (message) => {
      if (message.text().includes('Content Security Policy')) stopped.push(message.text());
    });
    const response = await page.goto(path);
    const policy = response?.headers()['content-security-policy'] ?? '';
    const html = (await response?.text()) ?? '';
    for (const [, script = ''] of html.matchAll(/<script(?![^>]+src=)[^>]*>([\s\S]*?)<\/script>/g)) {
      expect(policy).toContain(`'sha256-${createHash('sha256').update(script).digest('base64')}'`);
    }
    expect(policy.replace("style-src-attr 'unsafe-inline'", '')).not.toContain('unsafe');
    await page.mouse.wheel(0, 4000);
    await expect(page.locator('astro-island[ssr][client="load"]')).toHaveCount(0);
    expect(stopped).toEqual([]);
  });
}

test('at least one page has an island, so that the proof above proves something', async ({ page }) => {
  let islands = 0;
  for (const path of PAGES) {
    await page.goto(path);
    islands += await page.locator('astro-island').count();
  }
  expect(islands).toBeGreaterThan(0);
});

test('an inline script that is not ours is stopped', async ({ page }) => {
  await page.goto('/account');
  const ran = await page.evaluate(() => {
    const script = document.createElement('script');
    script.textContent = 'document.body.dataset.foreign = "ran"';
    document.body.append(script);
    return document.body.dataset['foreign'];
  });
  expect(ran).toBeUndefined();
});
