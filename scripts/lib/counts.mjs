/* Adds up what the test runners counted themselves. */
import { readFileSync } from 'node:fs';

/** `{ passed, failed }` of a runner's JSON report; undefined when the runner left none. */
function counted(file, read) {
  try {
    return read(JSON.parse(readFileSync(file, 'utf8')));
  } catch {
    return undefined;
  }
}

/** Vitest's counts. A file that could not be loaded has no tests to fail, so it counts as one. */
export function vitestCounts(file) {
  return counted(file, (report) => {
    const broken = report.testResults.filter(
      (one) => one.status === 'failed' && one.assertionResults.length === 0,
    );
    return { passed: report.numPassedTests, failed: report.numFailedTests + broken.length };
  });
}

/** Playwright's counts; a test that passed only when repeated is a failure. */
export function playwrightCounts(file) {
  return counted(file, ({ stats, errors }) => ({
    passed: stats.expected,
    failed: stats.unexpected + stats.flaky + errors.length,
  }));
}
