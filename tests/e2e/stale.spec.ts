/* Writes that must not happen: a stale form gets the difference and no overwrite; what cannot be read, known or true is told with a sentence and a path. */
import { expect, test } from '../support/fixtures';
import { refusedBy, send } from './support/forms';
import { atCheck, briefed, drafted, program, type Program, type Told, words } from './support/interface';
import { API, closeBrowsers, pageOf, SITE } from './support/people';

test.afterEach(closeBrowsers);

/** Every refusal has the published shape: status, code, title, a sentence, the id of the request. */
function expectProblem(answer: Told, status: number, code: string): void {
  expect([answer.status, answer.body['code']], answer.text).toEqual([status, code]);
  expect(answer.type).toContain('application/problem+json');
  expect(answer.body['status']).toBe(status);
  expect(String(answer.body['type'])).toMatch(/^urn:setwright:problem:/);
  expect(String(answer.body['detail'])).toMatch(/[.!?]$/);
  expect(String(answer.body['id'])).not.toBe('');
}
const pathsOf = (answer: Told) =>
  ((answer.body['errors'] ?? []) as { path: string }[]).map((one) => one.path);

test('a brief saved in a second tab gets the difference, and what was typed stays', async ({
  browser,
  server,
}) => {
  const owen = await program(server, 'Owen Tarrant');
  const number = await drafted(owen, 'Two tabs on a brief');
  const first = await pageOf(browser, server, 'Owen Tarrant');
  const second = await first.context().newPage();
  for (const tab of [first, second]) await tab.goto(`${SITE}/cases/${number}`);
  await first.locator('#brief-form').getByLabel('Time needed').fill('Two shifts in April');
  await send(first.locator('#brief-form'), 'Save the brief');
  const form = second.locator('#brief-form');
  await form.getByLabel('Time needed').fill('A week in May');
  const refused = second.waitForResponse((answer) => answer.url().endsWith('/brief'));
  const summary = await refusedBy(form, 'Save the brief');
  expect((await refused).status()).toBe(412);
  await expect(summary).toContainText('Two shifts in April');
  await expect(summary).toContainText('A week in May');
  await expect(summary.getByRole('link', { name: 'See the page as it is now' })).toBeVisible();
  await expect(form.getByLabel('Time needed')).toHaveValue('A week in May');
  await first.reload();
  await expect(first.locator('#brief-form').getByLabel('Time needed')).toHaveValue('Two shifts in April');
});

test('a working figure saved in a second tab is not overwritten', async ({ browser, server }) => {
  const owen = await program(server, 'Owen Tarrant');
  const number = await briefed(owen, 'Two tabs on a figure');
  const first = await pageOf(browser, server, 'Owen Tarrant');
  const second = await first.context().newPage();
  const impeller = 'input[name="set.sources/src_p101/pump/impeller"]';
  for (const [tab, value] of [
    [first, '220'],
    [second, '224'],
  ] as const) {
    await tab.goto(`${SITE}/cases/${number}/changes?system=SYS-101&part=sources`);
    const element = tab.locator('details.element').filter({ has: tab.locator(impeller) });
    await element.locator('summary').first().click();
    await element.locator(impeller).fill(value);
  }
  const mine = first.locator('details.element').filter({ has: first.locator(impeller) });
  await send(mine, 'Save P-101');
  const theirs = second.locator('details.element').filter({ has: second.locator(impeller) });
  const refused = second.waitForResponse((answer) => answer.url().endsWith('/documents/SYS-101'));
  const summary = await refusedBy(theirs, 'Save P-101');
  expect((await refused).status()).toBe(412);
  await expect(summary).toContainText(/Impeller diameter: now “220”, you have “224”/);
  await expect(theirs.locator(impeller)).toHaveValue('224');
  const now = await owen.get(`${API}/cases/${number}/documents/SYS-101`);
  expect(now.text).toContain('"impeller":{"value":220');
});

test('an impossible quantity is refused beside its field, and what was typed stays', async ({
  browser,
  server,
}) => {
  const owen = await program(server, 'Owen Tarrant');
  const number = await briefed(owen, 'An impossible figure');
  const page = await pageOf(browser, server, 'Owen Tarrant');
  await page.goto(`${SITE}/cases/${number}/changes?system=SYS-101&part=sources`);
  const field = page.locator('input[name="set.sources/src_p101/pump/impeller"]');
  const element = page.locator('details.element').filter({ has: field });
  await element.locator('summary').first().click();
  for (const typed of ['-224', 'two hundred', '224 kg']) {
    await field.fill(typed);
    await refusedBy(element, 'Save P-101');
    await expect(field).toHaveAttribute('aria-invalid', 'true');
    await expect(field).toHaveAccessibleDescription(/\w+\./);
    await expect(field).toHaveValue(typed);
  }
  const now = await owen.get(`${API}/cases/${number}/documents/SYS-101`);
  expect(now.text).toContain('"impeller":{"value":212');
});

test.describe('what a program sends', () => {
  let owen: Program;
  let number: string;
  let version: string;
  test.beforeAll(async ({ server }) => {
    owen = await program(server, 'Owen Tarrant');
    number = await drafted(owen, 'Bad input');
    version = (await owen.get(`${API}/cases/${number}`)).etag;
  });
  test.afterAll(async () => {
    expect((await owen.get(`${API}/cases/${number}`)).etag, 'something was written').toBe(version);
  });
  const brief = (body: unknown, headers: Record<string, string> = { 'If-Match': version }) =>
    owen.send('PATCH', `${API}/cases/${number}/brief`, body, headers);

  test('a body that is no JSON, and one of another kind', async () => {
    expectProblem(await brief('{"title":'), 400, 'MALFORMED');
    expectProblem(
      await brief('<brief/>', { 'If-Match': version, 'Content-Type': 'text/xml' }),
      415,
      'TYPE_REFUSED',
    );
  });

  test('an unknown field, a wrong kind of value, an oversize text: each with its path', async () => {
    expectProblem(await brief({ colour: 'red' }), 422, 'SCHEMA');
    const wrong = await brief({ timeNeeded: 12 });
    expectProblem(wrong, 422, 'SCHEMA');
    expect(pathsOf(wrong)).toContain('timeNeeded');
    const long = await brief({ title: 'x'.repeat(5_000) });
    expectProblem(long, 422, 'SCHEMA');
    expect(pathsOf(long)).toContain('title');
    expectProblem(await brief({ effect: words('x'.repeat(1_200_000)) }), 413, 'TOO_LARGE');
  });

  test('no version, a version of something else, an old version', async () => {
    expectProblem(await brief({ timeNeeded: 'soon' }, {}), 428, 'VERSION_MISSING');
    expectProblem(await brief({ timeNeeded: 'soon' }, { 'If-Match': '"person-1"' }), 400, 'MALFORMED');
    const stale = await brief({ timeNeeded: 'soon' }, { 'If-Match': '"case-0"' });
    expectProblem(stale, 412, 'STALE');
    expect(stale.body['present']).toBeTruthy();
  });

  test('unknown ids', async () => {
    for (const path of ['cases/KW-2099-001', 'systems/SYS-999', 'people/per_none']) {
      expectProblem(await owen.get(`${API}/${path}`), 404, 'UNKNOWN');
    }
    expectProblem(await owen.get('/api/v1/sites/elsewhere/cases'), 404, 'UNKNOWN');
    const seats = { seats: [{ role: 'checker', person: 'per_none' }] };
    const answer = await owen.send('POST', `${API}/cases/${number}/seats`, seats, { 'If-Match': version });
    expect(answer.status).toBeGreaterThanOrEqual(400);
    expect(answer.status).toBeLessThan(500);
    expect(answer.type).toContain('application/problem+json');
  });

  test('a gate that is shut names its open points with their places', async () => {
    const signature = { password: 'setwright', pageHash: '0'.repeat(64) };
    const path = `${API}/cases/${number}/acts/PASS-draft`;
    const shut = await owen.send('POST', path, signature, { 'If-Match': version });
    expectProblem(shut, 409, 'GATE_SHUT');
    const open = shut.body['openPoints'] as { sentence: string; where: string }[];
    expect(open.length).toBeGreaterThan(5);
    for (const point of open) expect(point.where).toMatch(new RegExp(`^cases/${number}`));
  });
});

test('an act of another stage, and one without a key', async ({ server }) => {
  const owen = await program(server, 'Owen Tarrant');
  const number = await atCheck(owen, 'Another stage');
  const { etag } = await owen.get(`${API}/cases/${number}`);
  const brief = await owen.send(
    'PATCH',
    `${API}/cases/${number}/brief`,
    { timeNeeded: 'now' },
    { 'If-Match': etag },
  );
  expectProblem(brief, 409, 'WRONG_STAGE');
  const hold = { reason: 'Waiting for the maker.', review: '2099-01-01' };
  const noKey = await owen.send('POST', `${API}/cases/${number}/acts/HOLD`, hold, {
    'If-Match': etag,
    'Idempotency-Key': '',
  });
  expectProblem(noKey, 400, 'KEY_MISSING');
});

test('the same key and body happen once, another body with the key is refused', async ({ server }) => {
  const owen = await program(server, 'Owen Tarrant');
  const body = { class: 'permanent', title: 'Raised once', systems: ['SYS-103'] };
  const key = { 'Idempotency-Key': 'one-and-the-same-key' };
  const first = await owen.send('POST', `${API}/cases`, body, key);
  const again = await owen.send('POST', `${API}/cases`, body, key);
  expect(again.body['number']).toBe(first.body['number']);
  const other = await owen.send('POST', `${API}/cases`, { ...body, title: 'Raised twice' }, key);
  expectProblem(other, 422, 'KEY_REUSED');
});
