/* The tests that judge the bare arithmetic of the engine by numbers, without sheets and without Astro: quick enough to judge every mutant. */
import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';

const from = (path: string) => fileURLToPath(new URL(path, import.meta.url));

export default defineConfig({
  resolve: { alias: { '@engine': from('./src/engine'), '@domain': from('./src/domain') } },
  test: {
    include: ['tests/unit/engine/bare/*.test.ts'],
    setupFiles: ['tests/support/seeded.ts'],
    testTimeout: 20_000,
  },
});
