/* Signing in and out, the own account, the first visit, people of a site; each page also read by axe, light and dark, wide and narrow. */
import AxeBuilder from '@axe-core/playwright';
import { type Browser, type BrowserContext, type Page } from '@playwright/test';
import { expect, test } from '../support/fixtures';
import { startServer, type TestServer } from '../support/server';
import { demoSignIns, type DemoPerson } from '../support/sign-in';

/* Each page is read by axe four times, which takes its time on a small machine. */
test.describe.configure({ timeout: 360_000 });

const SITE = '/s/ketterwold';
const NEXT_PASSWORD = 'quick brick under water';
const { people, password } = await demoSignIns();
const one = (found: DemoPerson | undefined): DemoPerson => {
  if (!found) throw new Error('The invented site lacks such a person.');
  return found;
};
const coordinator = one(people.find((person) => person.roles.includes('coordinator')));
const auditor = one(people.find((person) => person.roles.includes('auditor')));
const checker = one(people.find((person) => person.roles.join() === 'checker'));
const approver = one(people.find((person) => person.roles.join() === 'approver'));
const operations = one(people.find((person) => person.roles.join() === 'operations'));

async function signIn(page: Page, email: string, given = password): Promise<void> {
  await page.goto('/sign-in?next=/account');
  await page.getByLabel('E-mail').fill(email);
  await page.getByLabel('Password').fill(given);
  await page.getByRole('button', { name: 'Sign in' }).click();
}

async function signedIn(
  browser: Browser,
  server: TestServer,
  who: DemoPerson,
): Promise<[BrowserContext, Page]> {
  const context = await browser.newContext({ baseURL: server.url });
  const page = await context.newPage();
  await signIn(page, who.email);
  await expect(page.getByRole('heading', { level: 1 })).toHaveText(who.name);
  return [context, page];
}

async function expectClean(page: Page, what: string): Promise<void> {
  for (const width of [1440, 390]) {
    for (const colorScheme of ['light', 'dark'] as const) {
      await page.setViewportSize({ width, height: 900 });
      await page.emulateMedia({ colorScheme, reducedMotion: 'reduce' });
      const { violations } = await new AxeBuilder({ page }).analyze();
      expect(
        violations.map(({ id, nodes }) => [id, nodes.map((node) => node.html)]),
        `${what} ${width} ${colorScheme}`,
      ).toEqual([]);
      const over = await page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth);
      expect(over, `${what} at ${width} is wider than the window`).toBeLessThanOrEqual(0);
    }
  }
}

test.describe('signing in', () => {
  test('leads back to the page that was asked for, never to another site', async ({ page }) => {
    await page.goto('/account');
    await expect(page).toHaveURL(/\/sign-in\?next=%2Faccount/);
    await signIn(page, operations.email);
    await expect(page).toHaveURL(/\/account$/);
    await page.getByText(operations.name, { exact: false }).first().click();
    await page.context().clearCookies();
    await page.goto('/sign-in?next=https://elsewhere.example/');
    await page.getByLabel('E-mail').fill(operations.email);
    await page.getByLabel('Password').fill(password);
    await page.getByRole('button', { name: 'Sign in' }).click();
    await expect(page).toHaveURL(/127\.0\.0\.1:\d+\/s\/ketterwold$/);
  });

  test('with a wrong password says so and keeps the e-mail; the sixth attempt is told to wait', async ({
    page,
  }) => {
    const nobody = 'nobody.at.all@ketterwold.example';
    for (let n = 0; n < 5; n += 1) {
      await signIn(page, nobody, 'not the password');
      await expect(page.getByRole('alert')).toContainText('E-mail and password do not belong together.');
    }
    await expect(page.getByLabel('E-mail')).toHaveValue(nobody);
    await expect(page.getByLabel('Password')).toHaveValue('');
    await expectClean(page, 'a refused sign-in');
    await page.getByLabel('Password').fill('not the password');
    const [answer] = await Promise.all([
      page.waitForResponse('**/api/v1/session'),
      page.getByRole('button', { name: 'Sign in' }).click(),
    ]);
    expect(answer.status()).toBe(429);
    await expect(page.getByRole('alert')).toContainText('Too many attempts. Try again in 15 minutes.');
  });

  test('runs no script', async ({ page }) => {
    await page.goto('/sign-in');
    expect(await page.locator('script').count()).toBe(0);
    await expectClean(page, 'sign-in');
  });

  test('out ends the session on the server, not only in the browser', async ({ browser, server }) => {
    const [context, page] = await signedIn(browser, server, auditor);
    const cookies = await context.cookies();
    await page.locator('details.account summary').click();
    await page.getByRole('button', { name: 'Sign out' }).first().click();
    await expect(page).toHaveURL(/\/sign-in$/);
    await context.addCookies(cookies);
    await page.goto('/account');
    await expect(page).toHaveURL(/\/sign-in/);
    await context.close();
  });
});

test.describe('the account', () => {
  test('a new password ends the other sessions and says how many', async ({ browser, server }) => {
    const [here, page] = await signedIn(browser, server, checker);
    const [there, other] = await signedIn(browser, server, checker);
    await page.goto('/account');
    await page.getByLabel('Present password').fill('not it at all');
    await page.getByLabel('New password', { exact: true }).fill(NEXT_PASSWORD);
    await page.getByLabel('New password again').fill(NEXT_PASSWORD);
    await page.getByRole('button', { name: 'Change password' }).click();
    await expect(page.getByRole('alert')).toContainText('This is not your present password.');
    await expectClean(page, 'a refused change of the password');
    await page.getByLabel('Present password').fill(password);
    await page.getByLabel('New password', { exact: true }).fill(NEXT_PASSWORD);
    await page.getByLabel('New password again').fill('something else entirely');
    await page.getByRole('button', { name: 'Change password' }).click();
    await expect(page.getByRole('alert')).toContainText('The two new passwords are not the same.');
    await page.getByLabel('Present password').fill(password);
    await page.getByLabel('New password', { exact: true }).fill(NEXT_PASSWORD);
    await page.getByLabel('New password again').fill(NEXT_PASSWORD);
    await page.getByRole('button', { name: 'Change password' }).click();
    await expect(page.getByRole('status')).toHaveText('Your password is changed. One session ended.');
    await other.goto('/account');
    await expect(other).toHaveURL(/\/sign-in/);
    await signIn(other, checker.email, NEXT_PASSWORD);
    await expect(other).toHaveURL(/\/account$/);
    // Other specs of this worker sign in as the same person.
    await other.getByLabel('Present password').fill(NEXT_PASSWORD);
    await other.getByLabel('New password', { exact: true }).fill(password);
    await other.getByLabel('New password again').fill(password);
    await other.getByRole('button', { name: 'Change password' }).click();
    await expect(other.getByRole('status')).toContainText('Your password is changed.');
    await Promise.all([here.close(), there.close()]);
  });

  test('a session that is ended from another is signed out', async ({ browser, server }) => {
    const [here, page] = await signedIn(browser, server, approver);
    const [there, other] = await signedIn(browser, server, approver);
    await page.goto('/account');
    await expectClean(page, 'account');
    await page.getByRole('button', { name: /^End the session/ }).click();
    await expect(page.getByRole('status')).toHaveText('One session ended.');
    await other.goto('/account');
    await expect(other).toHaveURL(/\/sign-in/);
    await Promise.all([here.close(), there.close()]);
  });

  test('the ground that is chosen stays', async ({ browser, server }) => {
    const [context, page] = await signedIn(browser, server, auditor);
    await page.getByRole('radio', { name: 'Dark' }).check();
    await page.getByRole('button', { name: 'Use it' }).click();
    await expect(page.locator('html')).toHaveAttribute('data-theme', 'dark');
    await page.goto('/account');
    await expect(page.locator('html')).toHaveAttribute('data-theme', 'dark');
    await context.close();
  });
});

test.describe('people', () => {
  test('the coordinator adds someone, who accepts the invitation from the mail', async ({
    browser,
    server,
  }) => {
    const [context, page] = await signedIn(browser, server, coordinator);
    await page.goto(`${SITE}/people`);
    await expectClean(page, 'people');
    await page.getByRole('link', { name: 'Add a person' }).click();
    await page.getByLabel('Name').fill('Wenke Oduya');
    await page.getByLabel('E-mail').fill('not an address');
    await page.getByRole('button', { name: 'Add and invite' }).click();
    await expect(page.getByRole('alert')).toContainText('An e-mail address looks like name@example.org.');
    await expect(page.getByLabel('Name')).toHaveValue('Wenke Oduya');
    await expectClean(page, 'a refused person');
    await page.getByLabel('E-mail').fill('wenke.oduya@ketterwold.example');
    await page.getByLabel('Auditor').check();
    await page.getByRole('button', { name: 'Add and invite' }).click();
    await expect(page.getByRole('status')).toHaveText(
      'An invitation is on its way to wenke.oduya@ketterwold.example.',
    );
    await expectClean(page, 'a person');

    await expect
      .poll(async () => (await server.mails({ to: 'wenke.oduya@ketterwold.example' })).length)
      .toBe(1);
    const [mail] = await server.mails({ to: 'wenke.oduya@ketterwold.example' });
    const link = /http\S+\/invite\/\S+/.exec(mail?.text ?? '')?.[0] ?? '';
    const guest = await browser.newContext({ baseURL: server.url });
    const invited = await guest.newPage();
    await invited.goto(link);
    await expectClean(invited, 'an invitation');
    await invited.getByLabel('New password', { exact: true }).fill('short');
    await invited.getByLabel('New password again').fill('short');
    await invited.getByRole('button', { name: 'Set password and sign in' }).click();
    await expect(invited.getByRole('alert')).toContainText('it needs at least 12');
    await invited.getByLabel('New password', { exact: true }).fill(NEXT_PASSWORD);
    await invited.getByLabel('New password again').fill(NEXT_PASSWORD);
    await invited.getByRole('button', { name: 'Set password and sign in' }).click();
    await expect(invited).toHaveURL(/\/s\/ketterwold$/);
    expect(server.output()).not.toContain(link.split('/').at(-1));
    await invited.goto(`${SITE}/people`);
    await expect(invited.getByRole('row', { name: /Wenke Oduya/ })).toContainText('auditor');
    await Promise.all([context.close(), guest.close()]);
  });

  test('a stale form shows what stands now and overwrites nothing, with script and without', async ({
    browser,
    server,
  }) => {
    const [context, page] = await signedIn(browser, server, coordinator);
    await page.goto(`${SITE}/people`);
    await page.getByRole('link', { name: operations.name }).click();
    await expect(page.getByRole('heading', { level: 1 })).toHaveText(operations.name);
    const address = page.url();
    const plain = await browser.newContext({ baseURL: server.url, javaScriptEnabled: false });
    await plain.addCookies(await context.cookies());
    const other = await plain.newPage();
    await other.goto(address);
    const third = await context.newPage();
    await third.goto(address);
    await third.getByLabel('Job').fill('Shift leader');
    await third.getByRole('button', { name: 'Save the record' }).click();
    await expect(third.getByRole('status')).toHaveText('The record is saved.');

    await page.getByLabel('Job').fill('Night foreman');
    await page.getByRole('button', { name: 'Save the record' }).click();
    await expect(page.getByRole('alert')).toContainText('now “Shift leader”, you have “Night foreman”');
    await expect(page.getByLabel('Job')).toHaveValue('Night foreman');
    await expectClean(page, 'a stale record');

    await other.getByLabel('Job').fill('Night foreman');
    await other.getByRole('button', { name: 'Save the record' }).click();
    await expect(other.getByRole('heading', { level: 1 })).toHaveText('Someone changed this meanwhile');
    await expect(other.getByRole('row', { name: /^Job/ })).toContainText('Shift leader');
    /* Where scripts are off axe cannot run either: it reads the same markup in a page where they are on. */
    await third.setContent(await other.content());
    await expectClean(third, 'the page of a problem');
    await other.getByRole('link', { name: 'See the page as it is now' }).click();
    await expect(other.getByLabel('Job')).toHaveValue('Shift leader');
    await Promise.all([context.close(), plain.close()]);
  });

  test('a deactivated person is out at once and comes back with the same roles', async ({
    browser,
    server,
  }) => {
    const [context, page] = await signedIn(browser, server, coordinator);
    const victim = one(people.filter((person) => person.roles.join() === 'operations')[1] ?? operations);
    const [gone, left] = await signedIn(browser, server, victim);
    await page.goto(`${SITE}/people`);
    await page.getByRole('link', { name: victim.name }).click();
    await page.getByRole('button', { name: 'Deactivate' }).click();
    await expect(page.getByRole('status')).toContainText('is deactivated; all sessions ended.');
    await left.goto('/account');
    await expect(left).toHaveURL(/\/sign-in/);
    await signIn(left, victim.email);
    await expect(left.getByRole('alert')).toContainText('do not belong together');
    await page.getByRole('button', { name: 'Reactivate' }).click();
    await expect(page.getByRole('status')).toContainText('is active again.');
    await signIn(left, victim.email);
    await expect(left).toHaveURL(/\/account$/);
    await Promise.all([context.close(), gone.close()]);
  });

  test('the coordinator’s own roles can’t be set', async ({ browser, server }) => {
    const [context, page] = await signedIn(browser, server, coordinator);
    await page.goto(`${SITE}/people`);
    await page.getByRole('link', { name: coordinator.name }).click();
    await expect(page.getByRole('button', { name: 'Set roles' })).toHaveCount(0);
    await expect(page.locator('main')).toContainText('nobody changes their own roles');
    const answer = await context.request.put(
      `/api/v1/sites/ketterwold/people/${page.url().split('/').at(-1) ?? ''}/roles`,
      {
        headers: { 'If-Match': '"person-1"' },
        data: { roles: ['coordinator', 'approver'] },
      },
    );
    expect(answer.status()).toBe(403);
    expect(await answer.json()).toMatchObject({ code: 'NOT_INDEPENDENT' });
    await context.close();
  });

  test('someone else reads the list and may change nothing', async ({ browser, server }) => {
    const [context, page] = await signedIn(browser, server, auditor);
    await page.goto(`${SITE}/people`);
    await expect(page.getByRole('row', { name: new RegExp(operations.name) })).toBeVisible();
    await expect(page.locator('main')).not.toContainText('@ketterwold.example');
    await expectClean(page, 'people, read only');
    expect((await page.goto(`${SITE}/people/new`))?.status()).toBe(403);
    const answer = await context.request.post('/api/v1/sites/ketterwold/people', { data: {} });
    expect(answer.status()).toBe(403);
    expect(await answer.json()).toMatchObject({ code: 'NOT_PERMITTED' });
    expect((await context.request.get('/api/v1/sites/nowhere/people')).status()).toBe(404);
    await context.close();
  });
});

test('an empty installation makes its first site and site coordinator, once', async ({ browser }) => {
  const server = await startServer({ data: 'empty' });
  const context = await browser.newContext({ baseURL: server.url });
  const page = await context.newPage();
  await page.goto('/');
  await expect(page).toHaveURL(/\/first-coordinator$/);
  await expectClean(page, 'first visit');
  const fill = async (fields: Record<string, string>) => {
    for (const [label, value] of Object.entries(fields))
      await page.getByLabel(label, { exact: true }).fill(value);
  };
  await fill({
    'Name of the site': 'Marlpit Works',
    'Name in addresses': 'marlpit',
    'Letters of case numbers': 'MP',
  });
  await fill({
    'Mean barometric pressure': '12',
    Name: 'Ines Tavares',
    'E-mail': 'ines@marlpit.example',
    Password: NEXT_PASSWORD,
  });
  await page.getByRole('button', { name: 'Create and sign in' }).click();
  await expect(page.getByRole('alert')).toContainText('impossible');
  await expect(page.getByLabel('Name of the site')).toHaveValue('Marlpit Works');
  await fill({ 'Mean barometric pressure': '0.995', Password: NEXT_PASSWORD });
  await page.getByRole('button', { name: 'Create and sign in' }).click();
  await expect(page).toHaveURL(/\/s\/marlpit\/people$/);
  await expect(page.getByRole('row', { name: /Ines Tavares/ })).toContainText('site coordinator');
  await page.goto('/first-coordinator');
  await expect(page).not.toHaveURL(/first-coordinator/);
  const again = await context.request.post('/api/v1/first-coordinator', { data: {} });
  expect(again.status()).toBe(422);
  await context.close();
  expect(await server.stop()).toBe(0);
});
