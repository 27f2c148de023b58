/* Every page read by axe, wide and light, narrow and dark, by who has most to do on it; and none is wider than a phone. */
import AxeBuilder from '@axe-core/playwright';
import { type Page } from '@playwright/test';
import { expect, test } from '../support/fixtures';
import { closeBrowsers, pageOf } from './support/people';
import { COORDINATORS, NOWHERE, ONE_OF_EACH, OVERSEERS, PAGES } from './support/routes';

// One test a page, shared out between the workers.
test.describe.configure({ mode: 'parallel' });
test.afterEach(closeBrowsers);

const WIDE = { width: 1440, height: 900 };
const NARROW = { width: 390, height: 844 };

async function axe(page: Page, what: string): Promise<void> {
  const { violations } = await new AxeBuilder({ page }).options({ resultTypes: ['violations'] }).analyze();
  const told = violations.map(
    ({ id, nodes }) => `${id}: ${nodes.map((node) => node.html.slice(0, 160)).join(' ')}`,
  );
  expect.soft(told, what).toEqual([]);
}

/** Who has most to do on a page, so that axe reads its forms too. */
function readerOf(path: string): string {
  if (path.includes('/people') || path.includes('/moved')) return ONE_OF_EACH.coordinator;
  if (path.includes('KW-2026-008')) return ONE_OF_EACH.checker;
  if (path.includes('/summary')) return 'Rufus Hallam';
  return path.includes('/field') ? ONE_OF_EACH.operations : ONE_OF_EACH.originator;
}

for (const path of [...PAGES, ...COORDINATORS, ...OVERSEERS, ...NOWHERE.slice(0, 1)]) {
  test(`axe finds nothing on ${path}`, async ({ browser, server }) => {
    const page = await pageOf(browser, server, readerOf(path));
    await page.setViewportSize(WIDE);
    await page.emulateMedia({ colorScheme: 'light', reducedMotion: 'reduce' });
    await page.goto(path);
    await axe(page, `${path} at 1440, light`);
    await page.setViewportSize(NARROW);
    await page.emulateMedia({ colorScheme: 'dark', reducedMotion: 'reduce' });
    await axe(page, `${path} at 390, dark`);
    const over = await page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth);
    expect.soft(over, `${path} is wider than a phone`).toBeLessThanOrEqual(0);
  });
}
