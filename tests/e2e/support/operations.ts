/* What operations do at the phone: enter what they see, put right and see again, do what start-up waits for. */
import { type Page } from '@playwright/test';
import { expect } from '../../support/fixtures';
import { send } from './forms';

/** The smallest picture that is one: a single point. */
const PHOTOGRAPH = {
  name: 'plate.png',
  mimeType: 'image/png',
  buffer: Buffer.from(
    'iVBORw0KGgoAAAANSUhEUgAAAAEAAAABCAYAAAAfFcSJAAAADUlEQVR42mNk+M9QDwADhgGAWjR9awAAAABJRU5ErkJggg==',
    'base64',
  ),
};

/** Enters one figure with a photograph, in whichever form of the page asks for it. */
export async function enterSeen(
  page: Page,
  of: { label: string; value: string; button: string },
): Promise<void> {
  const form = page
    .locator('form')
    .filter({ has: page.getByRole('button', { name: of.button, exact: true }) });
  await form.getByRole('textbox', { name: of.label, exact: true }).fill(of.value);
  const photograph = form.getByLabel('Photograph');
  if ((await photograph.count()) > 0) await photograph.first().setInputFiles(PHOTOGRAPH);
  await send(form, of.button);
}

/** Does every start-up item that the reader may do; answers how many. */
export async function doStartUp(page: Page, base: string): Promise<number> {
  await page.goto(`${base}/field?at=start-up`);
  const open = page.locator('form.f-do');
  let done = 0;
  for (let left = await open.count(); left > 0; left -= 1, done += 1) {
    await open.first().getByLabel('What was done').fill('Done in the control room, book of shift B.');
    await send(open.first(), 'Done');
    await expect(open).toHaveCount(left - 1);
  }
  return done;
}
