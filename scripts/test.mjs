/* `npm test`: lint, types, unit, reference, build, integration, browser; every part runs even when an earlier one failed. */
import { mkdirSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { findBrowser } from './lib/browser.mjs';
import { playwrightCounts, vitestCounts } from './lib/counts.mjs';
import { ROOT, run, runBin, say } from './lib/run.mjs';

const RESULTS = join(ROOT, 'test-results');
const REPORTS = join(RESULTS, 'reports');

/** A step that only passes or fails counts as one. */
function asOne(code) {
  return { passed: code === 0 ? 1 : 0, failed: code === 0 ? 0 : 1 };
}

/** Astro's check reads every .astro and .ts file of the project; the bare compiler cannot read .astro imports. */
async function types() {
  const severity = ['--minimumFailingSeverity', 'error', '--minimumSeverity', 'error'];
  return asOne(await runBin('astro/astro.js', ['check', ...severity]));
}

async function vitest(part) {
  const report = join(REPORTS, `${part}.json`);
  const code = await runBin('vitest/vitest.mjs', [
    'run',
    `tests/${part}/`,
    '--passWithNoTests',
    '--reporter=default',
    '--reporter=json',
    `--outputFile.json=${report}`,
  ]);
  return settled(vitestCounts(report), code);
}

/** A runner that ended badly without counting a failure still failed. */
function settled(counts, code) {
  const found = counts ?? { passed: 0, failed: 0 };
  return code !== 0 && found.failed === 0 ? { ...found, failed: 1 } : found;
}

async function browser() {
  const path = await findBrowser();
  if (!path) return { passed: 0, failed: 1 };
  const report = join(REPORTS, 'e2e.json');
  const code = await runBin('@playwright/test/cli.js', ['test', ...process.argv.slice(3)], {
    CHROMIUM_PATH: path,
    PLAYWRIGHT_JSON_OUTPUT_NAME: report,
  });
  return settled(playwrightCounts(report), code);
}

const STEPS = {
  lint: async () => asOne(await runBin('eslint/bin/eslint.js', ['.', '--max-warnings', '0'])),
  types,
  unit: () => vitest('unit'),
  reference: () => vitest('reference'),
  build: async () => asOne(await run(process.execPath, ['scripts/build.mjs', '--if-stale'])),
  integration: () => vitest('integration'),
  e2e: browser,
};

/** What is run before a step that is asked for alone. */
const NEEDS = { integration: ['build'], e2e: ['build'] };

const asked = process.argv[2];
if (asked !== undefined && !(asked in STEPS)) {
  process.stderr.write(`There is no part "${asked}"; there are ${Object.keys(STEPS).join(', ')}.\n`);
  process.exit(2);
}
const names = asked === undefined ? Object.keys(STEPS) : [...(NEEDS[asked] ?? []), asked];
rmSync(REPORTS, { recursive: true, force: true });
mkdirSync(REPORTS, { recursive: true });

const rows = [];
for (const name of names) {
  say(`\n== ${name}`);
  const started = Date.now();
  rows.push({ name, ...(await STEPS[name]()), seconds: Math.round((Date.now() - started) / 1000) });
}
const total = rows.reduce(
  (sum, row) => ({ passed: sum.passed + row.passed, failed: sum.failed + row.failed }),
  { passed: 0, failed: 0 },
);
say('');
for (const { name, passed, failed, seconds } of rows)
  say(`${name.padEnd(12)} ${passed} passed, ${failed} failed (${seconds} s)`);
writeFileSync(join(RESULTS, 'summary.json'), `${JSON.stringify({ ...total, rows })}\n`);
say(`all          ${total.passed} passed, ${total.failed} failed`);
process.exitCode = total.failed > 0 ? 1 : 0;
