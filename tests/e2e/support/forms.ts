/* Forms as a person uses them: pressing a button and waiting for the next page, or for the refusal above the form. */
import { type Locator, type Page } from '@playwright/test';
import { expect } from '../../support/fixtures';
import { demoSignIns } from '../../support/sign-in';

type Within = Page | Locator;
const pageFor = (within: Within): Page => ('page' in within ? within.page() : within);

/** Marks the page that is shown, so that the next one can be told from it. */
async function mark(page: Page): Promise<void> {
  await page.evaluate(() => {
    document.documentElement.dataset['before'] = 'this';
  });
}

/** Presses a button that posts a form, and waits until the next page is whole; a refusal fails the test with its words. */
export async function send(within: Within, button: string | RegExp): Promise<void> {
  const page = pageFor(within);
  await mark(page);
  await within
    .getByRole('button', { name: button, ...(typeof button === 'string' ? { exact: true } : {}) })
    .click();
  const refusal = page.locator('html[data-before] .summary[role=alert]');
  await expect(page.locator('html:not([data-before])').or(refusal).first()).toBeVisible({ timeout: 20_000 });
  const told = (await refusal.count()) > 0 ? await refusal.innerText() : '';
  expect(told, `"${String(button)}" was refused`).toBe('');
  await page.waitForLoadState('load');
}

/** Presses a button whose form is refused; answers the summary above the form. */
export async function refusedBy(within: Within, button: string | RegExp): Promise<Locator> {
  await within
    .getByRole('button', { name: button, ...(typeof button === 'string' ? { exact: true } : {}) })
    .click();
  const summary = within.getByRole('alert');
  await expect(summary).toBeVisible();
  return summary;
}

/** Enters the password and signs. */
export async function sign(page: Page, button: string): Promise<void> {
  const { password } = await demoSignIns();
  const form = page.locator('form').filter({ has: page.getByRole('button', { name: button, exact: true }) });
  await form.getByLabel('Password').fill(password);
  await send(form, button);
}

/** Fills a field for a person's own words: the editor comes when it is entered. */
export async function write(within: Within, label: string, text: string): Promise<void> {
  const page = pageFor(within);
  const area = within.getByRole('textbox', { name: label, exact: true });
  await area.click();
  const editor = page
    .locator('.rich-text[role=textbox]')
    .and(within.getByRole('textbox', { name: label, exact: true }));
  if ((await within.locator('textarea[data-rich]').count()) > 0) {
    await expect(editor).toBeVisible();
    await editor.fill(text);
  } else await area.fill(text);
}
