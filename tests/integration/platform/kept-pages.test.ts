/* Pages kept for a moment: fresh keys each time, nothing old after a write, nothing of another reader. */
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startServer, type TestServer } from '../../support/server';
import { signInAs } from '../../support/sign-in';

const RAISE = '/s/ketterwold/cases/new';
const CASES = '/s/ketterwold/cases';

let server: TestServer;
let hedda: string;
let auditor: string;
beforeAll(async () => {
  server = await startServer();
  hedda = await signInAs(server.url, 'originator');
  auditor = await signInAs(server.url, 'auditor');
}, 180_000);
afterAll(async () => {
  await server.stop();
});

const page = async (path: string, cookie: string) =>
  (await fetch(`${server.url}${path}`, { redirect: 'manual', headers: { cookie } })).text();
const keysOf = (html: string) => [...html.matchAll(/form_[0-9A-Z]{26}/g)].map(([key]) => key);

describe('a page that was served a moment ago', () => {
  it('comes again with fresh keys, the rest the same', async () => {
    const [first, second] = [await page(RAISE, hedda), await page(RAISE, hedda)];
    expect(keysOf(first).length).toBeGreaterThan(0);
    expect(keysOf(second).filter((key) => keysOf(first).includes(key))).toEqual([]);
    const without = (html: string) => html.replace(/form_[0-9A-Z]{26}/g, '');
    expect(without(second)).toBe(without(first));
  });

  it('shows what was written since', async () => {
    const title = 'Raised between two looks at the list';
    expect(await page(CASES, hedda)).not.toContain(title);
    const raised = await fetch(`${server.url}/api/v1/sites/ketterwold/cases`, {
      method: 'POST',
      headers: { cookie: hedda, 'Content-Type': 'application/json', 'Idempotency-Key': 'kept-pages-0001' },
      body: JSON.stringify({ class: 'permanent', title, systems: ['SYS-101'] }),
    });
    expect(raised.status).toBe(201);
    expect(await page(CASES, hedda)).toContain(title);
  });

  it('is never another person’s', async () => {
    const [his, hers] = [await page('/s/ketterwold', hedda), await page('/s/ketterwold', auditor)];
    expect(his).toContain('Hedda Brannick');
    expect(hers).not.toContain('Hedda Brannick');
  });

  it('is gone with the session', async () => {
    const cookie = await signInAs(server.url, 'approver');
    expect(await page(CASES, cookie)).toContain('<h1');
    const out = await fetch(`${server.url}/api/v1/session`, {
      method: 'DELETE',
      headers: { cookie, 'Idempotency-Key': 'kept-pages-0002' },
    });
    expect(out.ok).toBe(true);
    const again = await fetch(`${server.url}${CASES}`, { redirect: 'manual', headers: { cookie } });
    expect(again.status).toBe(303);
  });
});
