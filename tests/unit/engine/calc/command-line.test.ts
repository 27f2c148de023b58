/* The command line as a person runs it: one document in, one answer out, exit codes. */
import { spawnSync } from 'node:child_process';
import { describe, expect, it } from 'vitest';

const ROOT = new URL('../../../../', import.meta.url).pathname;

/** Runs the command with the document on standard input. */
function run(input: string, ...args: string[]) {
  const command = ['--import', 'tsx', 'scripts/calc.ts', ...args];
  const { status, stdout, stderr } = spawnSync(process.execPath, command, {
    cwd: ROOT,
    input,
    encoding: 'utf8',
  });
  return { status, stdout, stderr };
}

const good = {
  id: 'good',
  topic: 'a.gas-C',
  inputs: { k: { value: 1.4 } },
  want: { C_US: 'sqrt(lb*lbmol*degR)/(lbf*h)' },
};
const bad = { id: 'bad', topic: 'z.none', inputs: {} };

describe('npm run calc', () => {
  it('answers every case in the order it was given, and exits with 1 because one failed', () => {
    const { status, stdout } = run(JSON.stringify({ cases: [bad, good] }), '-');
    const { results } = JSON.parse(stdout) as { results: Record<string, unknown>[] };
    expect(results.map((one) => one['id'])).toEqual(['bad', 'good']);
    expect(results[0]).toMatchObject({
      topic: 'z.none',
      outputs: {},
      warnings: [],
      error: { code: 'METHOD_UNKNOWN', field: 'topic' },
    });
    expect(results[1]).not.toHaveProperty('error');
    expect(results[1]).not.toHaveProperty('steps');
    expect(status).toBe(1);
  });

  it('exits with 0 when all were worked, and adds the steps when asked', () => {
    const { status, stdout } = run(`\uFEFF${JSON.stringify({ cases: [good] })}`, '-', '--sheet');
    const { results } = JSON.parse(stdout) as {
      results: { steps?: unknown[]; outputs: Record<string, { value: number }> }[];
    };
    // API 520-1 table of C: 356 at k = 1.40.
    expect(results[0]?.outputs['C_US']?.value).toBeCloseTo(356, 0);
    expect(results[0]?.steps?.length).toBeGreaterThan(0);
    expect(status).toBe(0);
  });

  it.each([
    [['-'], 'not json', /JSON/],
    [['-'], '{"case": []}', /"cases"/],
    [['no-such-file.json'], '', /no-such-file/],
    [[], '', /Usage/],
    [['-', '--sheets'], '', /Usage/],
  ])('%j says on standard error what is wrong and exits with 1', (args, input, sentence) => {
    const { status, stdout, stderr } = run(input, ...args);
    expect(stdout).toBe('');
    expect(stderr).toMatch(sentence);
    expect(status).toBe(1);
  });
});
