/* What the originator of a case does at the browser: raise, brief, nominate, answer for systems, change figures. */
import { type Page } from '@playwright/test';
import { expect } from '../../support/fixtures';
import { send, write } from './forms';
import { SITE } from './people';

export type Seats = { checker: string; approvers: string[]; operations: string[] };

/** Raises a permanent case by the form; answers its number. */
export async function raise(
  page: Page,
  of: { title: string; system: string; what: string },
): Promise<string> {
  await page.goto(`${SITE}/cases/new`);
  await page.getByLabel('Title').fill(of.title);
  await page.getByLabel('What changes, and why').fill(of.what);
  await page.getByLabel('System', { exact: true }).selectOption(of.system);
  await page.getByRole('radio', { name: /^Permanent/ }).check();
  await send(page, 'Raise the case');
  await expect(page.getByRole('heading', { level: 1 })).toContainText(of.title);
  return /KW-\d{4}-\d{3}/.exec(page.url())?.[0] ?? '';
}

/** Fills the brief: basis, effect, time and one paper that is due before start-up. */
export async function brief(page: Page, paper: { kind: string; reference: string }): Promise<void> {
  const form = page.locator('#brief-form');
  await write(
    form,
    'Technical basis',
    'Pump curve of the larger impeller; the rating of E-101 was worked again.',
  );
  await write(form, 'Effect on safety and health', 'Loss of cooling water makes more vapour than before.');
  await form.getByLabel('Time needed').fill('One shift in the April stop');
  const row = form.getByRole('group', { name: 'Further paper 1' });
  await row.getByLabel('Kind').selectOption(paper.kind);
  await row.getByLabel('Reference').fill(paper.reference);
  await row.getByLabel('From').fill('rev 3');
  await row.getByLabel('To').fill('rev 4');
  await send(form, 'Save the brief');
}

/** Nominates by name. */
export async function nominate(page: Page, seats: Seats): Promise<void> {
  const people = page.locator('#people');
  const within = (legend: string) => people.getByRole('group', { name: legend });
  await within('Checker').getByRole('radio', { name: seats.checker }).check();
  for (const name of seats.approvers) await within('Approvers').getByRole('checkbox', { name }).check();
  for (const name of seats.operations) await within('Operations').getByRole('checkbox', { name }).check();
  await send(people, 'Nominate these people');
}

/** Answers every affected system that has no answer yet with "not affected". */
export async function answerAffected(page: Page, reason: string): Promise<number> {
  const open = page.locator('#affected form:visible');
  let answered = 0;
  for (; (await open.count()) > 0; answered += 1) {
    const form = open.first();
    await form.getByRole('radio', { name: /^Not affected/ }).check();
    await form.getByLabel('Reason').fill(reason);
    await send(form, 'Save the answer');
  }
  return answered;
}

export type Proposed = { label: string; value: string; from: string; ref: string };

/** Changes figures of one element of the working revision, each with where it is from; its section is opened for change first. */
export async function propose(page: Page, element: string, figures: readonly Proposed[]): Promise<void> {
  const part = page
    .locator('details.element')
    .filter({ has: page.locator(`summary b:text-is("${element}")`) });
  const row = page.locator('.figure-row').getByText(figures[0]?.label ?? '', { exact: true });
  const section = page.locator('section').filter({ has: part.filter({ has: row }) });
  const change = section.getByRole('link', { name: 'Change these' }).first();
  if ((await change.count()) > 0) await change.click();
  const found = part.filter({ has: page.getByLabel(figures[0]?.label ?? '', { exact: true }) }).first();
  if ((await found.getAttribute('open')) === null) await found.locator('summary').first().click();
  for (const { label, value, from, ref } of figures) {
    await found.getByLabel(label, { exact: true }).fill(value);
    await found.getByLabel(`Kind of origin of ${label}`).selectOption({ label: from });
    await found.getByLabel(`Reference of the origin of ${label}`).fill(ref);
  }
  await send(found, `Save ${element}`);
}
