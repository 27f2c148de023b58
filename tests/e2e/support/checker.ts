/* What the checker of a case does at the browser: the unseen check, agreeing sheets, findings. */
import { type Page } from '@playwright/test';
import { expect } from '../../support/fixtures';
import { send } from './forms';

/** A figure with the label of its unit, or the words of a choice. */
export type Entry = { label: string; value: string; unit?: string; from?: string };

/** Enters what is asked now; every label must be asked. */
export async function enterUnseen(page: Page, entries: readonly Entry[]): Promise<void> {
  const form = page.locator('form.unseen-form');
  for (const { label, value, unit, from } of entries) {
    const row = form.locator('.entry').filter({ has: page.getByLabel(label, { exact: true }) });
    if (unit === undefined) await row.getByLabel(label, { exact: true }).selectOption({ label: value });
    else {
      await row.getByRole('textbox', { name: label, exact: true }).fill(value);
      await row.getByLabel(`Unit of ${label.toLowerCase()}`, { exact: true }).selectOption({ label: unit });
    }
    if (from !== undefined) await row.getByLabel('Read from').fill(from);
  }
  await send(form, 'Enter what is filled in');
}

/** The labels of what is asked now, as the page shows them. */
export function askedNow(page: Page): Promise<string[]> {
  return page.locator('form.unseen-form .entry > .field > label').allInnerTexts();
}

/** Agrees every sheet that the gate still asks for; answers how many. */
export async function agreeAll(page: Page, base: string): Promise<number> {
  await page.goto(`${base}/sheets`);
  const waiting = page
    .getByRole('region', { name: /^Gate:/ })
    .getByRole('listitem')
    .filter({ hasText: 'is not agreed yet' });
  let agreed = 0;
  for (let left = await waiting.count(); left > 0; left -= 1, agreed += 1) {
    await waiting.first().getByRole('link').click();
    await send(page, 'Agree this sheet');
    await expect(page.getByRole('button', { name: 'Undo the agreement' })).toBeVisible();
    await expect(waiting).toHaveCount(left - 1);
  }
  return agreed;
}

/** Raises a finding at a place of the list. */
export async function raiseFinding(
  page: Page,
  base: string,
  of: { place: string; weight: string; text: string },
): Promise<void> {
  await page.goto(`${base}/findings`);
  const raise = page.locator('#raise');
  await raise.getByLabel('Place').selectOption({ label: of.place });
  await raise.getByRole('radio', { name: of.weight }).check();
  await raise.getByLabel('What you found').fill(of.text);
  await send(raise, 'Raise finding');
}

/** Answers, closes or opens a finding again. */
export async function turnFinding(
  page: Page,
  number: number,
  of: { button: string; label: string; text: string },
): Promise<void> {
  const thread = page.locator(`#finding-${String(number)}`);
  await thread.getByText(of.button, { exact: true }).first().click();
  await thread.getByLabel(of.label).fill(of.text);
  await send(thread, of.button);
}
