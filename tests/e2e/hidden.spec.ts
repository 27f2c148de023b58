/* While a checker works unseen, no page, paper, list or mail shows that person a result of the originator. */
import { expect, test } from '../support/fixtures';
import { type TestServer } from '../support/server';
import { figuresInTables, leaks, plainText } from './support/figures';
import { atCheck, program, type Program } from './support/interface';
import { API, closeBrowsers, pageOf, SITE } from './support/people';

test.afterEach(closeBrowsers);

const SYSTEM = 'SYS-101';
const CASE_PARTS = [
  '',
  '/changes',
  '/scenarios',
  '/sheets',
  '/outcomes',
  '/unseen',
  '/findings',
  '/differences',
  '/summary',
  '/field',
  '/signatures',
  '/notices',
  '/trail',
];
const SYSTEM_PARTS = [
  '',
  '/basis',
  '/relief-points',
  '/scenarios',
  '/sheets',
  '/lines',
  '/outcomes',
  '/revisions',
  '/revisions/difference',
];
const SORTS = [
  'tag',
  '-tag',
  'load',
  '-load',
  'required',
  '-required',
  'installed',
  'use',
  '-use',
  'margin',
  '-margin',
  'verdict',
  '-verdict',
];
const VERDICTS = ['adequate', 'marginal', 'inadequate', 'not-sized'];

let server: TestServer;
let owen: Program;
let ilse: Program;
let number: string;
let secret: Set<string>;

/** Results as the originator sees them, without figures that stand on the checker's papers too. */
async function results(): Promise<Set<string>> {
  const base = `${SITE}/cases/${number}`;
  const pages = await Promise.all([`${base}/scenarios`, `${base}/sheets`, `${base}/summary`].map(owen.get));
  const all = new Set(pages.flatMap(({ text }) => [...figuresInTables(text)]));
  const parts = ['equipment', 'sources', 'fluids', 'reliefPoints', 'loads', 'externalSheets'];
  const inputs = await Promise.all(parts.map((part) => owen.get(`${base}/changes?part=${part}`)));
  const values = inputs.flatMap(({ text }) =>
    [...text.matchAll(/ value="([\d.]+)"/g)].map((match) => match[1] ?? ''),
  );
  return new Set([...all].filter((one) => !values.includes(one)));
}

test.beforeAll(async ({ server: own }) => {
  server = own;
  owen = await program(server, 'Owen Tarrant');
  ilse = await program(server, 'Ilse Fennimore');
  number = await atCheck(owen, 'Hidden from the checker');
  secret = await results();
});

async function expectNone(paths: readonly string[]): Promise<void> {
  for (const path of paths) {
    const { status, text } = await ilse.get(path);
    expect(status, path).toBeLessThan(500);
    expect(leaks(secret, text), path).toEqual([]);
  }
}

/** Addresses within a page that begin with one of ours. */
function linksIn(html: string, begins: readonly string[]): string[] {
  const all = [...html.matchAll(/href="([^"#]+)/g)].map((match) => (match[1] ?? '').replaceAll('&amp;', '&'));
  return all.filter((href) => begins.some((begin) => href.startsWith(begin)));
}

test('the originator sees results, so that the proof below proves something', async () => {
  expect(secret.size).toBeGreaterThan(15);
  const { text } = await owen.get(`${SITE}/cases/${number}/scenarios`);
  expect(leaks(secret, text).length).toBeGreaterThan(10);
});

test('no page of the case or of its system, however it is reached', async () => {
  const base = `${SITE}/cases/${number}`;
  const system = `${SITE}/systems/${SYSTEM}`;
  const seen = new Set<string>();
  let next = [...CASE_PARTS.map((part) => base + part), ...SYSTEM_PARTS.map((part) => system + part)];
  while (next.length > 0 && seen.size < 400) {
    const found = new Set<string>();
    for (const path of next) {
      seen.add(path);
      const { status, text } = await ilse.get(path);
      expect(status, path).toBeLessThan(500);
      expect(leaks(secret, text), path).toEqual([]);
      for (const link of linksIn(text, [base, system])) found.add(link);
    }
    next = [...found].filter((link) => !seen.has(link));
  }
  expect(seen.size).toBeGreaterThan(40);
});

test('no register, whatever it is sorted and filtered by, and no list to take away', async () => {
  const registers = ['systems', 'relief-points'];
  const asked = [
    ...SORTS.map((sort) => `sort=${sort}`),
    ...VERDICTS.map((verdict) => `verdict=${verdict}`),
    'q=101',
    'figures=US',
  ];
  for (const register of registers) {
    await expectNone(asked.map((query) => `${SITE}/register/${register}?${query}`));
    await expectNone(asked.slice(0, 4).map((query) => `${SITE}/register/${register}.csv?${query}`));
  }
  await expectNone([`${API}/systems`, `${API}/relief-points`, `${API}/systems?sort=-use`, `${API}/cases`]);
});

test('neither an order nor a filter says how a hidden result lies', async () => {
  const tags = async (query: string) => {
    const { text } = await ilse.get(`${SITE}/register/systems?${query}`);
    return [...new Set([...text.matchAll(/\/systems\/(SYS-\d+)"/g)].map((match) => match[1]))];
  };
  for (const column of ['use', 'margin', 'required']) {
    const [up, down] = [await tags(`sort=${column}`), await tags(`sort=-${column}`)];
    expect(up.indexOf(SYSTEM), column).toBe(down.indexOf(SYSTEM));
  }
  for (const verdict of VERDICTS) expect(await tags(`verdict=${verdict}`), verdict).not.toContain(SYSTEM);
});

test('no search, no list of work, no answer of the interface, no paper', async () => {
  const of = `${API}/cases/${number}`;
  await expectNone([
    ...['101', 'C-101', 'acetone', 'cooling water', 'SYS-101'].map(
      (q) => `${SITE}/find?q=${encodeURIComponent(q)}`,
    ),
    SITE,
    `${SITE}/due`,
    `${SITE}/cases`,
    of,
    ...['can', 'open-points', 'affected', `documents/${SYSTEM}`, 'trail', 'field'].map(
      (part) => `${of}/${part}`,
    ),
    `${API}/systems/${SYSTEM}`,
    `${API}/systems/${SYSTEM}/evaluation`,
    `${API}/systems/${SYSTEM}/revisions`,
    `${API}/systems/${SYSTEM}/difference`,
    `${API}/due-items`,
  ]);
});

test('no refusal and no mail', async () => {
  const { etag } = await ilse.get(`${API}/cases/${number}`);
  const refused = await ilse.send(
    'POST',
    `${API}/cases/${number}/acts/PASS-check`,
    { password: 'x', pageHash: '0'.repeat(64) },
    { 'If-Match': etag },
  );
  expect(refused.status).toBeGreaterThanOrEqual(400);
  expect(leaks(secret, refused.text)).toEqual([]);
  await expect
    .poll(async () => (await server.mails({ contains: number })).length, { timeout: 15_000 })
    .toBeGreaterThan(3);
  for (const mail of await server.mails({ contains: number })) {
    expect(leaks(secret, `${mail.subject} ${mail.text}`), mail.subject).toEqual([]);
  }
});

test('what the browser holds after its scripts ran shows none either', async ({ browser }) => {
  const page = await pageOf(browser, server, 'Ilse Fennimore');
  for (const part of ['', '/changes', '/scenarios', '/sheets', '/summary']) {
    await page.goto(`${SITE}/cases/${number}${part}`);
    await expect(page.locator('astro-island[ssr][client="load"]')).toHaveCount(0);
    expect(leaks(secret, await page.content()), part).toEqual([]);
  }
  const { text } = await ilse.get(`${SITE}/register/systems?q=${SYSTEM}`);
  const row = /<tr[^>]*>(?:(?!<\/tr>)[\s\S])*SYS-101[\s\S]*?<\/tr>/.exec(text)?.[0] ?? '';
  expect(plainText(row)).not.toMatch(/\b(adequate|marginal|inadequate)\b/i);
});
