/* Signing in through the built server with the invented site: the printed sign-ins work, malformed bodies are told, and no password is in the log. */
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startServer, type TestServer } from '../../support/server';
import { demoSignIns, personWith, signIn } from '../../support/sign-in';

const { people, password } = await demoSignIns();
const WRONG = 'a-wrong-pass-phrase-7';
let server: TestServer;
beforeAll(async () => {
  server = await startServer({ data: 'demo', env: { SETWRIGHT_LOG_LEVEL: 'trace' } });
}, 180_000);
afterAll(async () => {
  await server.stop();
});

function post(headers: Record<string, string>, body: string): Promise<Response> {
  return fetch(`${server.url}/api/v1/session`, { method: 'POST', redirect: 'manual', headers, body });
}
const JSON_TYPE = { 'Content-Type': 'application/json' };
const FORM_TYPE = { 'Content-Type': 'application/x-www-form-urlencoded' };

describe('the demonstration sign-ins', () => {
  it.each(people)('$email', async ({ email }) => {
    expect(await signIn(server.url, email)).toMatch(/^setwright_session=.{20,}/);
  });

  it('give a cookie that no script reads and no other site sends', async () => {
    const body = JSON.stringify({ email: people[0]?.email, password });
    const response = await post({ ...JSON_TYPE, 'Idempotency-Key': 'cookie-test-1' }, body);
    const cookie = response.headers.getSetCookie().join();
    expect(cookie).toMatch(/HttpOnly/i);
    expect(cookie).toMatch(/SameSite=Lax/i);
  });
});

describe('a body that can not be read', () => {
  it.each<[string, Record<string, string>, string, number, string]>([
    ['broken JSON', JSON_TYPE, '{"email":', 400, 'MALFORMED'],
    ['plain text', { 'Content-Type': 'text/plain' }, 'hello', 415, 'TYPE_REFUSED'],
    ['more than 1 MB', JSON_TYPE, `{"email":"${'a'.repeat(1_100_000)}"}`, 413, 'TOO_LARGE'],
    ['another shape', JSON_TYPE, '[1]', 422, 'SCHEMA'],
  ])('%s', async (_what, headers, body, status, code) => {
    const response = await post({ ...headers, 'Idempotency-Key': 'body-test-1' }, body);
    expect(response.status).toBe(status);
    expect(await response.json()).toMatchObject({ code, status });
  });
});

describe('a wrong password', () => {
  it('is refused, and neither it nor the right one nor the cookie comes into the log', async () => {
    const { email } = await personWith('checker');
    const cookie = await signIn(server.url, email);
    await post(
      { ...JSON_TYPE, 'Idempotency-Key': 'wrong-test-1' },
      JSON.stringify({ email, password: WRONG }),
    );
    await post(FORM_TYPE, new URLSearchParams({ email, password: WRONG }).toString());
    await fetch(`${server.url}/account`, { headers: { cookie } });
    await new Promise((resolve) => setTimeout(resolve, 50));
    const log = server.output();
    expect(log).toContain('/api/v1/session');
    for (const secret of [WRONG, password, cookie.split('=')[1] ?? 'none']) expect(log).not.toContain(secret);
  });
});
