/* Weighs the script that a page loads at first: its own, its islands' and everything they import, compressed as gzip. */
import { gzipSync } from 'node:zlib';

const SOURCES = [
  /<script[^>]+src="([^"]+)"/g,
  /<link[^>]+rel="modulepreload"[^>]+href="([^"]+)"/g,
  /(?:component-url|renderer-url|before-hydration-url)="([^"]+)"/g,
];
/** Static imports and re-exports of a bundled module; `import("…")` waits for its moment and is not part of the first load. */
const IMPORTS = /(?:\bfrom|\bimport)\s*"(\.[^"]+\.js)"/g;
const INLINE = /<script(?![^>]+src=)[^>]*>([\s\S]*?)<\/script>/g;

function found(text: string, pattern: RegExp): string[] {
  return [...text.matchAll(pattern)].map((match) => match[1] ?? '').filter((part) => part !== '');
}

export type Weight = { kilobytes: number; files: number; islands: number };

/** The compressed script of a page in kB (1,000 bytes), with how many files and islands it comes from. */
export async function weigh(url: string, cookie: string): Promise<Weight> {
  const page = await (await fetch(url, { headers: { cookie, accept: 'text/html' } })).text();
  const seen = new Set<string>();
  let bytes = found(page, INLINE).reduce((sum, script) => sum + gzipSync(script).byteLength, 0);
  const queue = SOURCES.flatMap((pattern) => found(page, pattern)).map((path) => new URL(path, url).href);
  for (let next = queue.pop(); next !== undefined; next = queue.pop()) {
    if (seen.has(next)) continue;
    seen.add(next);
    const script = await (await fetch(next)).text();
    bytes += gzipSync(script, { level: 9 }).byteLength;
    for (const path of found(script, IMPORTS)) queue.push(new URL(path, next).href);
  }
  return { kilobytes: bytes / 1000, files: seen.size, islands: page.split('<astro-island').length - 1 };
}
