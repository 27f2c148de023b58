/* Originator, checker and approver of a case are three people: what the pages offer, and what the server answers when they are passed by. */
import { expect, test } from '../support/fixtures';
import { demoSignIns } from '../support/sign-in';
import { refusedBy } from './support/forms';
import { atCheck, drafted, program, type Program, words, write } from './support/interface';
import { API, closeBrowsers, pageOf, SITE } from './support/people';

test.afterEach(closeBrowsers);

const HASH = '0'.repeat(64);

async function acting(by: Program, number: string, act: string) {
  const { password } = await demoSignIns();
  const { etag } = await by.get(`${API}/cases/${number}`);
  return by.send(
    'POST',
    `${API}/cases/${number}/acts/${act}`,
    { password, pageHash: HASH },
    { 'If-Match': etag },
  );
}

test('an originator can neither check nor approve the case, and the pages say why', async ({
  browser,
  server,
}) => {
  const owen = await program(server, 'Owen Tarrant');
  const number = await atCheck(owen, 'Independence of the originator');
  for (const act of ['PASS-check', 'SIGN', 'REFUSE']) {
    const answer = await acting(owen, number, act);
    expect([act, answer.status, answer.body['code']]).toEqual([act, 403, 'NOT_PERMITTED']);
    expect(String(answer.body['detail'])).toMatch(/role|seat|nominated/);
  }
  const unseen = await owen.send('POST', `${API}/cases/${number}/unseen/reveal`, { document: 'doc_sys101' });
  expect(unseen.status).toBe(403);
  const page = await pageOf(browser, server, 'Owen Tarrant');
  await page.goto(`${SITE}/cases/${number}/unseen`);
  await expect(page.locator('form.unseen-form')).toHaveCount(0);
  await expect(page.getByText('works this before anything is shown')).toBeVisible();
  await page.goto(`${SITE}/cases/${number}/summary`);
  await expect(page.getByRole('button', { name: 'Sign and approve' })).toHaveCount(0);
  await expect(page.getByText('Signed by each named approver of this case once')).toBeVisible();
  const can = await owen.get(`${API}/cases/${number}/can`);
  const acts = can.body['acts'] as { act: string; ok: boolean; sentence?: string }[];
  for (const act of ['PASS-check', 'SIGN', 'agree', 'unseen']) {
    const answer = acts.find((one) => one.act === act);
    expect(answer?.ok, act).toBe(false);
    expect(answer?.sentence, act).toMatch(/\.$/);
  }
});

test('one who is originator and checker by role cannot be nominated for both', async ({
  browser,
  server,
}) => {
  const hedda = await program(server, 'Hedda Brannick');
  const number = await drafted(hedda, 'Independence of the checker');
  const { etag } = await hedda.get(`${API}/cases/${number}`);
  const seats = [{ role: 'checker', person: 'per_p01' }];
  const answer = await hedda.send('POST', `${API}/cases/${number}/seats`, { seats }, { 'If-Match': etag });
  expect([answer.status, answer.body['code']]).toEqual([403, 'NOT_INDEPENDENT']);
  expect(String(answer.body['detail'])).toMatch(/Hedda Brannick|originator/);
  const page = await pageOf(browser, server, 'Hedda Brannick');
  await page.goto(`${SITE}/cases/${number}`);
  const choice = page.getByRole('group', { name: 'Checker' }).getByRole('radio', { name: /Hedda Brannick/ });
  await expect(choice).toHaveAccessibleName(/originator/);
  await choice.check();
  const summary = await refusedBy(page.locator('#people'), 'Nominate these people');
  await expect(summary).toContainText(/originator/);
  await page.reload();
  await expect(choice).not.toBeChecked();
});

test('a checker of the case does not approve it, an approver does not check it', async ({ server }) => {
  const owen = await program(server, 'Owen Tarrant');
  const number = await atCheck(owen, 'Independence of the approver');
  for (const [name, act] of [
    ['Ilse Fennimore', 'SIGN'],
    ['Grace Okonta', 'PASS-check'],
    ['Tomas Adeyre', 'SIGN'],
    ['Aoife Renshaw', 'PASS-check'],
    ['Hedda Brannick', 'PASS-check'],
  ] as const) {
    const answer = await acting(await program(server, name), number, act);
    expect([name, answer.status, answer.body['code']]).toEqual([name, 403, 'NOT_PERMITTED']);
  }
});

test('a person sits in one independent seat of a case only', async ({ server }) => {
  const owen = await program(server, 'Owen Tarrant');
  const number = await drafted(owen, 'One seat a person');
  await write(owen, number, 'PATCH', 'brief', { effect: words('None.') });
  for (const role of ['checker', 'approver', 'operations']) {
    const { etag } = await owen.get(`${API}/cases/${number}`);
    const seats = [{ role, person: 'per_p02' }];
    const answer = await owen.send('POST', `${API}/cases/${number}/seats`, { seats }, { 'If-Match': etag });
    expect(answer.status, role).toBeGreaterThanOrEqual(400);
    const after = await owen.get(`${API}/cases/${number}`);
    expect(JSON.stringify(after.body['seats']), role).not.toContain(`"${role}"`);
  }
});
