/* Whether the packages and the build on disk still belong to the sources. */
import { existsSync, readdirSync, readFileSync, statSync, utimesSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';

const BUILT_FROM = [
  'src',
  'tests/reference',
  'workflows',
  'migrations',
  'public',
  'astro.config.mjs',
  'tailwind.config.mjs',
  'tsconfig.json',
  'package.json',
  'package-lock.json',
];
const STAMP = 'dist/built-at';

function readJson(file) {
  try {
    return JSON.parse(readFileSync(file, 'utf8'));
  } catch {
    return undefined;
  }
}

/** True when node_modules holds what package-lock.json names; packages of other platforms may be absent. */
export function packagesAreCurrent(root) {
  const wanted = readJson(join(root, 'package-lock.json'))?.packages ?? {};
  const there = readJson(join(root, 'node_modules/.package-lock.json'))?.packages;
  if (!there) return false;
  return Object.entries(wanted).every(
    ([path, entry]) =>
      path === '' || entry.link || there[path]?.version === entry.version || (entry.optional && !there[path]),
  );
}

function newest(path) {
  const found = statSync(path, { throwIfNoEntry: false });
  if (!found) return 0;
  if (!found.isDirectory()) return found.mtimeMs;
  return readdirSync(path).reduce(
    (latest, name) => Math.max(latest, newest(join(path, name))),
    found.mtimeMs,
  );
}

/** True when dist was built after the last change of any source. */
export function buildIsCurrent(root) {
  const stamp = statSync(join(root, STAMP), { throwIfNoEntry: false });
  if (!stamp || !existsSync(join(root, 'dist/server/entry.mjs'))) return false;
  return BUILT_FROM.every((name) => newest(join(root, name)) <= stamp.mtimeMs);
}

/** Marks dist as built from the sources of a moment: the start of the build, so that an edit during it counts. */
export function stampBuild(root, at) {
  const file = join(root, STAMP);
  writeFileSync(file, `${at.toISOString()}\n`);
  utimesSync(file, at, at);
}
