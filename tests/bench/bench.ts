/* `npm run bench`: one run against the built server on loopback with 2,000 systems; prints rates, answer times, ratios and script weights beside their limits. */
import { signInAs } from '../support/sign-in';
import { startServer, type TestServer } from '../support/server';
import { measure, type Load } from './load';
import { weigh } from './weight';

const SITE = '/s/ketterwold';
const LIMIT_P95 = 50;
const LIMIT_RATIO = 0.25;

let missed = 0;

/** A line with its limit; counts what misses it. */
function line(name: string, value: string, good: boolean, limit: string): void {
  if (!good) missed += 1;
  process.stdout.write(`${name.padEnd(34)} ${value.padStart(34)}   ${good ? 'within' : 'MISSES'} ${limit}\n`);
}

/** A page with what it is called here; its weight's limit in kB. */
type Page = { name: string; path: string; limit?: number };

/** The number of the case to measure: the first in the list of the site's cases. */
async function caseNumber(server: TestServer, cookie: string): Promise<string> {
  const answer = await fetch(`${server.url}/api/v1/sites/ketterwold/cases`, { headers: { cookie } });
  const found = /"number":\s*"([A-Z]+-\d{4}-\d{3})"/.exec(await answer.text());
  return found?.[1] ?? 'KW-2026-003';
}

function told({ perSecond, p95 }: Load): string {
  return `${perSecond.toFixed(0)} requests/s, p95 ${p95.toFixed(1)} ms`;
}

async function rates(server: TestServer, cookie: string, number: string): Promise<void> {
  process.stdout.write('Answers at 20 connections\n');
  const trivial = await measure(`${server.url}/sign-in`, '');
  line('trivial page (/sign-in)', told(trivial), trivial.failed === 0, 'all answered 200');
  const pages = [
    { name: 'register, 2,000 systems', path: `${SITE}/register/systems` },
    { name: `case page ${number}`, path: `${SITE}/cases/${number}` },
  ];
  for (const { name, path } of pages) {
    const load = await measure(`${server.url}${path}`, cookie);
    const ratio = load.perSecond / trivial.perSecond;
    line(
      name,
      told(load),
      load.p95 < LIMIT_P95 && load.failed === 0,
      `p95 under ${LIMIT_P95} ms, all answered 200 (${load.failed} not)`,
    );
    line(
      '  of the trivial page’s rate',
      `${(100 * ratio).toFixed(0)} %`,
      ratio >= LIMIT_RATIO,
      `at least ${100 * LIMIT_RATIO} %`,
    );
    const anew = await measure(`${server.url}${path}`, cookie, { anew: true });
    process.stdout.write(
      `${'  rendered anew each time'.padEnd(34)} ${told(anew).padStart(34)}   for comparison\n`,
    );
  }
}

async function weights(server: TestServer, cookie: string, number: string): Promise<void> {
  process.stdout.write('\nCompressed script at first load\n');
  const inCase = `${SITE}/cases/${number}`;
  const pages: Page[] = [
    { name: 'sign-in', path: '/sign-in', limit: 0 },
    { name: 'error page', path: '/no-such-page', limit: 0 },
    { name: 'my work', path: SITE },
    { name: 'register', path: `${SITE}/register/systems` },
    { name: 'account', path: '/account' },
    { name: 'case', path: inCase, limit: 180 },
    ...['scenarios', 'sheets', 'unseen', 'summary', 'field'].map((part) => ({
      name: `case, ${part}`,
      path: `${inCase}/${part}`,
      limit: 180,
    })),
  ];
  for (const { name, path, limit } of pages) {
    const { kilobytes, islands } = await weigh(`${server.url}${path}`, cookie);
    const most = limit ?? (islands > 0 ? 110 : 10);
    line(name, `${kilobytes.toFixed(1)} kB, islands: ${islands}`, kilobytes <= most, `${most} kB`);
  }
}

const server = await startServer({ data: 'large' });
try {
  const cookie = await signInAs(server.url, 'originator');
  const number = await caseNumber(server, cookie);
  await rates(server, cookie, number);
  await weights(server, cookie, number);
} finally {
  await server.stop();
}
process.stdout.write(missed === 0 ? '\nAll limits held.\n' : `\n${missed} limits missed.\n`);
process.exitCode = missed === 0 ? 0 : 1;
