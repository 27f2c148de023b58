/* The built server from outside: start, headers, denial, refusals, log, stop. */
import { readdir, rm } from 'node:fs/promises';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { version } from '../../../package.json';
import { ensureBuilt } from '../../support/prepare';
import { exitOf, spawnServer, startServer, type TestServer } from '../../support/server';

let server: TestServer;
beforeAll(async () => {
  server = await startServer({ data: 'empty' });
}, 180_000);
afterAll(async () => {
  await server.stop();
});

const get = (path: string, headers: Record<string, string> = {}) =>
  fetch(`${server.url}${path}`, { redirect: 'manual', headers });
const post = (path: string, headers: Record<string, string>, body: string) =>
  fetch(`${server.url}${path}`, { method: 'POST', redirect: 'manual', headers, body });
const JSON_TYPE = { 'Content-Type': 'application/json' };

describe('health', () => {
  it('answers 200 with the version when database and migrations are good', async () => {
    const response = await get('/health');
    expect(response.status).toBe(200);
    expect(await response.json()).toEqual({ status: 'ok', version });
  });
});

describe('headers', () => {
  it.each(['/health', '/mail', '/no-such-page', '/favicon.svg', '/api/v1/nothing'])('of %s', async (path) => {
    const { headers } = await get(path);
    expect(headers.get('x-content-type-options')).toBe('nosniff');
    expect(headers.get('referrer-policy')).toBe('same-origin');
    expect(headers.get('cross-origin-opener-policy')).toBe('same-origin');
    expect(headers.get('permissions-policy')).toContain('geolocation=()');
    expect(headers.get('x-powered-by')).toBeNull();
  });

  it('allow no inline script but Astro’s own, named by its hash', async () => {
    const policy = (await get('/mail')).headers.get('content-security-policy') ?? '';
    const scripts = policy.split(';').find((part) => part.trim().startsWith('script-src')) ?? '';
    expect(scripts.trim()).toMatch(/^script-src 'self'( 'sha256-[\w+/=]+')+$/);
    expect(policy).toContain("frame-ancestors 'none'");
    expect(policy.replace("style-src-attr 'unsafe-inline'", '')).not.toContain('unsafe');
  });

  it('let a browser keep a hashed asset for good, and nothing else', async () => {
    const page = await (await get('/mail')).text();
    const asset = /\/_astro\/[^"]+\.css/.exec(page)?.[0] ?? '';
    expect((await get(asset)).headers.get('cache-control')).toBe('public, max-age=31536000, immutable');
    expect((await get('/mail')).headers.get('cache-control')).toBe('no-store');
  });
});

describe('a visitor who is not signed in', () => {
  it('gets 401 with a problem from the interface, also where there is nothing', async () => {
    for (const path of ['/api/v1/sites/x/systems', '/api/v1/nothing']) {
      const response = await get(path);
      expect(response.status).toBe(401);
      expect(response.headers.get('content-type')).toContain('application/problem+json');
      const problem = (await response.json()) as { code: string; id: string };
      expect(problem.code).toBe('SIGN_IN');
      expect(problem.id).toBe(response.headers.get('x-request-id'));
    }
  });
});

describe('a request that another site started', () => {
  it.each([
    [{ 'Sec-Fetch-Site': 'cross-site' }],
    [{ 'Sec-Fetch-Site': 'same-site' }],
    [{ Origin: 'https://elsewhere.example' }],
    [{ Origin: 'null' }],
  ])('is refused, JSON too: %o', async (headers) => {
    const response = await post('/api/v1/session', { ...JSON_TYPE, ...headers }, '{}');
    expect(response.status).toBe(403);
    expect(await response.json()).toMatchObject({ code: 'NOT_PERMITTED', status: 403 });
  });
});

describe('the mail page', () => {
  it('exists while the catcher runs', async () => {
    expect((await get('/mail')).status).toBe(200);
    expect(await (await get('/mail/messages.json')).json()).toEqual({ messages: [] });
  });

  it('does not exist when mail goes to a real server', async () => {
    const other = await startServer({ data: 'empty', env: { SETWRIGHT_SMTP_URL: 'smtp://127.0.0.1:9' } });
    for (const path of ['/mail', '/mail/message?id=x', '/mail/messages.json']) {
      const { status } = await fetch(`${other.url}${path}`, { redirect: 'manual' });
      expect(status === 404 || status === 303, `${path} ${status}`).toBe(true);
    }
    await other.stop();
  });
});

describe('a start that can not succeed', () => {
  async function refused(env: Record<string, string>): Promise<{ code: number | null; text: string }> {
    const { child, output } = spawnServer(await ensureBuilt(), {
      SETWRIGHT_DATA_DIR: server.dataDir,
      ...env,
    });
    return { code: await exitOf(child), text: output() };
  }

  it('says in one sentence that the port is in use', async () => {
    const { code, text } = await refused({ PORT: new URL(server.url).port });
    expect(code).toBe(1);
    expect(text).toMatch(/Port \d+ on 127\.0\.0\.1 is in use\./);
    expect(text).not.toMatch(/\bat .+\.mjs:/);
  });

  it('says what is wrong with a setting', async () => {
    const { code, text } = await refused({ PORT: '0', SETWRIGHT_DEMO: 'perhaps' });
    expect(code).toBe(1);
    expect(text).toContain('SETWRIGHT_DEMO must be');
    expect(text).not.toMatch(/\bat .+\.mjs:/);
  });
});

describe('SIGTERM', () => {
  it('ends the server with code 0 and leaves no open write-ahead log', async () => {
    const other = await startServer({ data: 'empty' });
    await fetch(`${other.url}/health`);
    expect(await other.stop({ keepData: true })).toBe(0);
    const left = await readdir(other.dataDir);
    expect(left.filter((name) => /-(wal|shm)$/.test(name))).toEqual([]);
    await rm(other.dataDir, { recursive: true, force: true });
  });
});

describe('the log', () => {
  it('has one line a request with its id, and no query, which may hold anything', async () => {
    const response = await get('/mail?to=someone%40example.org');
    const id = response.headers.get('x-request-id') ?? 'none';
    await new Promise((resolve) => setTimeout(resolve, 50));
    const lines = server
      .output()
      .split('\n')
      .filter((line) => line.includes(id));
    expect(lines).toHaveLength(1);
    expect(JSON.parse(lines[0] ?? '{}')).toMatchObject({ id, method: 'GET', path: '/mail', status: 200 });
    expect(server.output()).not.toContain('someone');
  });
});
