/* Playwright's `test` with a server of the worker's own: import it instead of the package's. */
import { test as base } from '@playwright/test';
import { startServer, type TestServer } from './server';

export { expect } from '@playwright/test';

type WorkerFixtures = { server: TestServer };

/** `server` is the worker's; `baseURL` points at it, also for `browser.newContext({ baseURL: server.url })`. */
export const test = base.extend<object, WorkerFixtures>({
  server: [
    async ({ browserName: _ }, use) => {
      const server = await startServer();
      await use(server);
      await server.stop();
    },
    { scope: 'worker' },
  ],
  baseURL: async ({ server }, use) => {
    await use(server.url);
  },
});
