/* Mails that came out of the local catcher, read as their receiver does. */
import { type Page } from '@playwright/test';
import { expect } from '../../support/fixtures';
import { type CaughtMessage, type TestServer } from '../../support/server';

/** Waits for the mail to a person whose subject contains a text. */
export async function mailTo(server: TestServer, to: string, contains: string): Promise<CaughtMessage> {
  await expect
    .poll(async () => (await server.mails({ to, contains })).length, {
      message: `a mail to ${to} about "${contains}"`,
      timeout: 15_000,
    })
    .toBeGreaterThan(0);
  const [newest] = await server.mails({ to, contains });
  if (!newest) throw new Error('The mail went away again.');
  return newest;
}

/** Opens the link of a mail in the receiver's browser. */
export async function follow(page: Page, mail: CaughtMessage): Promise<void> {
  const link = /https?:\/\/\S+/.exec(mail.text)?.[0];
  if (!link) throw new Error(`The mail "${mail.subject}" has no link.`);
  const answer = await page.goto(link);
  expect(answer?.status(), link).toBe(200);
}
