/* The register and a system's page in a browser: order and filters by links and one form, no script, both truths. */
import { type Page } from '@playwright/test';
import { expect, test } from '../support/fixtures';
import { signIn } from '../support/sign-in';

async function enter(page: Page, url: string, email: string): Promise<void> {
  const cookie = await signIn(url, email);
  const at = cookie.indexOf('=');
  await page.context().addCookies([{ name: cookie.slice(0, at), value: cookie.slice(at + 1), url }]);
}

test('the register sorts, filters and leads to a system, without a script', async ({ page, server }) => {
  await enter(page, server.url, 'aoife.renshaw@ketterwold.example');
  await page.goto('/s/ketterwold/register/systems');
  expect(await page.locator('script').count()).toBe(0);
  await page.getByRole('link', { name: 'Used', exact: true }).click();
  await page.getByRole('link', { name: 'Used', exact: true }).click();
  await expect(page.locator('table.reg tbody tr').first()).toContainText('SYS-302');
  await page.getByLabel('Verdict').selectOption('inadequate');
  await page.getByRole('button', { name: 'Show' }).click();
  await expect(page.locator('.count')).toContainText('1 of 18 systems, 1 filter');
  await page.locator('table.reg').getByRole('link', { name: 'SYS-302' }).click();
  await expect(page.getByRole('heading', { level: 1 })).toHaveText('Low-pressure separator V-306');
});

test('both truths stand on the register while an approved revision waits', async ({ page, server }) => {
  await enter(page, server.url, 'aoife.renshaw@ketterwold.example');
  await page.goto('/s/ketterwold/register/systems?q=SYS-201');
  await expect(page.locator('tr.also')).toContainText('approved, not installed: KW-2025-036');
});

test('a checker before the unseen check sees hatched rows, and an unknown tag is not there', async ({
  page,
  server,
}) => {
  await enter(page, server.url, 'ilse.fennimore@ketterwold.example');
  await page.goto('/s/ketterwold/register/systems?q=SYS-302');
  await expect(page.locator('table.reg td.covered')).toContainText('Hidden until your own figures are in');
  await expect(page.locator('main')).not.toContainText('121.3');
  const answer = await page.goto('/s/ketterwold/systems/SYS-999');
  expect(answer?.status()).toBe(404);
});
