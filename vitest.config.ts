/* Unit, reference and integration tests; Astro's own config is taken so that .astro components render in tests. */
import { getViteConfig } from 'astro/config';

export default getViteConfig({
  test: {
    include: ['tests/{unit,reference,integration}/**/*.test.{ts,tsx}'],
    setupFiles: ['tests/support/seeded.ts'],
    coverage: {
      include: ['src/engine/**/*.ts'],
      reportsDirectory: 'test-results/coverage',
      reporter: ['text', 'json-summary'],
    },
    testTimeout: 20_000,
    hookTimeout: 60_000,
  },
} as never);
