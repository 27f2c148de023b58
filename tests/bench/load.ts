/* Loads one address of a running server and measures it: requests a second and the 95th percentile of the answer times. */
import autocannon from 'autocannon';

export type Load = { perSecond: number; p95: number; failed: number };

const CONNECTIONS = 20;

function percentile(times: number[], share: number): number {
  const sorted = Float64Array.from(times).sort();
  return sorted[Math.min(sorted.length - 1, Math.floor(sorted.length * share))] ?? Number.NaN;
}

/** Requests whose query differs each time, so that no page at hand answers them. */
function addresses(
  url: string,
  anew: boolean,
): { setupRequest?: (request: autocannon.Request) => autocannon.Request } {
  if (!anew) return {};
  const { pathname } = new URL(url);
  let n = 0;
  return {
    setupRequest: (request) => {
      n += 1;
      return { ...request, path: `${pathname}?anew=${n}` };
    },
  };
}

function run(url: string, cookie: string, seconds: number, anew: boolean): Promise<Load> {
  const times: number[] = [];
  let failed = 0;
  return new Promise((resolve, reject) => {
    const options = {
      url,
      connections: CONNECTIONS,
      duration: seconds,
      headers: cookie === '' ? {} : { cookie },
      requests: [{ method: 'GET' as const, ...addresses(url, anew) }],
    };
    const running = autocannon(options, (error: Error | null, result) => {
      if (error) reject(error);
      else
        resolve({
          perSecond: times.length / result.duration,
          p95: percentile(times, 0.95),
          failed: failed + result.errors,
        });
    });
    running.on('response', (_client, status, _bytes, time) => {
      times.push(time);
      if (status !== 200) failed += 1;
    });
  });
}

/** Warms the address up, then measures it at 20 connections. Times are in milliseconds; `failed` counts answers other than 200. */
export async function measure(
  url: string,
  cookie: string,
  { seconds = 8, anew = false } = {},
): Promise<Load> {
  await run(url, cookie, 2, anew);
  return run(url, cookie, seconds, anew);
}
