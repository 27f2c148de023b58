/* The scripts' own judgement: when packages and build are current, and what the runners counted. */
import { mkdirSync, mkdtempSync, rmSync, utimesSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { playwrightCounts, vitestCounts } from '../../../scripts/lib/counts.mjs';
import { buildIsCurrent, packagesAreCurrent, stampBuild } from '../../../scripts/lib/fresh.mjs';

let root: string;
beforeEach(() => {
  root = mkdtempSync(join(tmpdir(), 'setwright-scripts-'));
});
afterEach(() => {
  rmSync(root, { recursive: true });
});

function write(path: string, content: unknown, at?: Date): string {
  const file = join(root, path);
  mkdirSync(dirname(file), { recursive: true });
  writeFileSync(file, typeof content === 'string' ? content : JSON.stringify(content));
  if (at) utimesSync(file, at, at);
  return file;
}

describe('packagesAreCurrent', () => {
  const wanted = {
    packages: {
      '': {},
      'node_modules/a': { version: '1.0.0' },
      'node_modules/b': { version: '2.0.0', optional: true },
    },
  };

  it('is false without node_modules, true when all is there, optional packages of other platforms aside', () => {
    write('package-lock.json', wanted);
    expect(packagesAreCurrent(root)).toBe(false);
    write('node_modules/.package-lock.json', { packages: { 'node_modules/a': { version: '1.0.0' } } });
    expect(packagesAreCurrent(root)).toBe(true);
  });

  it('is false when a package has another version or is missing', () => {
    write('package-lock.json', wanted);
    write('node_modules/.package-lock.json', { packages: { 'node_modules/a': { version: '1.0.1' } } });
    expect(packagesAreCurrent(root)).toBe(false);
    write('node_modules/.package-lock.json', { packages: {} });
    expect(packagesAreCurrent(root)).toBe(false);
  });
});

describe('buildIsCurrent', () => {
  const built = new Date('2026-03-16T07:00:00.000Z');
  const before = new Date(built.getTime() - 1_000);
  const after = new Date(built.getTime() + 1_000);

  /** Writing a file touches its folder too: only the times given here count. */
  function source(at: Date): void {
    write('src/pages/a.astro', '', at);
    for (const folder of ['src/pages', 'src']) utimesSync(join(root, folder), at, at);
  }

  it('is true only when nothing is newer than the stamp of the build', () => {
    source(before);
    expect(buildIsCurrent(root)).toBe(false);
    write('dist/server/entry.mjs', '');
    stampBuild(root, built);
    expect(buildIsCurrent(root)).toBe(true);
    source(after);
    expect(buildIsCurrent(root)).toBe(false);
  });
});

describe('the counts of the runners', () => {
  it('of Vitest: a file that could not be loaded counts as one failure', () => {
    const assertionResults = [{ status: 'passed' }];
    const testResults = [
      { status: 'passed', assertionResults },
      { status: 'failed', assertionResults: [] },
    ];
    const file = write('unit.json', { numPassedTests: 12, numFailedTests: 1, testResults });
    expect(vitestCounts(file)).toEqual({ passed: 12, failed: 2 });
  });

  it('of Playwright: a test that passed only when repeated failed, and so did what stopped the run', () => {
    const file = write('e2e.json', {
      stats: { expected: 5, unexpected: 1, flaky: 1, skipped: 2 },
      errors: [{}],
    });
    expect(playwrightCounts(file)).toEqual({ passed: 5, failed: 3 });
  });

  it('are unknown when a runner left no report', () => {
    expect(vitestCounts(join(root, 'nothing.json'))).toBeUndefined();
  });
});
