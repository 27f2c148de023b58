/* How much of the engine its tests reach, by branches; `npm run coverage`. */
import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';

const from = (path: string) => fileURLToPath(new URL(path, import.meta.url));

export default defineConfig({
  resolve: { alias: { '@engine': from('./src/engine'), '@domain': from('./src/domain') } },
  test: {
    include: ['tests/unit/engine/**/*.test.ts', 'tests/reference/*.test.ts'],
    testTimeout: 60_000,
    coverage: {
      provider: 'v8',
      include: ['src/engine/**/*.ts'],
      reportsDirectory: 'test-results/coverage',
      reporter: ['text', 'json-summary'],
    },
  },
});
