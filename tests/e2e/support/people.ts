/* People of the invented site at the browser, each in a context of their own. */
import { type Browser, type BrowserContext, type Page } from '@playwright/test';
import { type TestServer } from '../../support/server';
import { demoSignIns, signIn } from '../../support/sign-in';

export const SITE = '/s/ketterwold';
export const API = '/api/v1/sites/ketterwold';

const opened: BrowserContext[] = [];

async function newContext(browser: Browser, server: TestServer): Promise<BrowserContext> {
  const context = await browser.newContext({ baseURL: server.url });
  opened.push(context);
  return context;
}

/** Closes every context that was opened here; after each test. */
export async function closeBrowsers(): Promise<void> {
  await Promise.all(opened.splice(0).map((context) => context.close()));
}

export type Someone = { name: string; email: string; cookie: string };

/** Signs a person of the invented site in by the interface, by name. */
export async function someone(server: TestServer, name: string): Promise<Someone> {
  const { people } = await demoSignIns();
  const found = people.find((person) => person.name === name);
  if (!found) throw new Error(`The invented site has no ${name}.`);
  return { name, email: found.email, cookie: await signIn(server.url, found.email) };
}

/** A page in a new browser context where a person is signed in. */
export async function pageOf(browser: Browser, server: TestServer, name: string): Promise<Page> {
  const { cookie } = await someone(server, name);
  const context = await newContext(browser, server);
  const [key = '', value = ''] = cookie.split('=');
  await context.addCookies([{ name: key, value, url: server.url }]);
  return context.newPage();
}

/** Signs in by the page as a person does, in a new browser context. */
export async function signInByPage(browser: Browser, server: TestServer, name: string): Promise<Page> {
  const { people, password } = await demoSignIns();
  const context = await newContext(browser, server);
  const page = await context.newPage();
  await page.goto('/sign-in');
  await page.getByLabel('E-mail').fill(people.find((person) => person.name === name)?.email ?? name);
  await page.getByLabel('Password').fill(password);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.waitForURL(`**${SITE}`);
  return page;
}
