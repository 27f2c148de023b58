/* Makes once what several test workers share: the build, and the seeded database that each copies. */
import { spawn } from 'node:child_process';
import { existsSync, readdirSync, statSync } from 'node:fs';
import { cp, mkdir, rm, stat } from 'node:fs/promises';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';

const ROOT = dirname(dirname(dirname(fileURLToPath(import.meta.url))));
const SHARED = join(ROOT, 'test-results', 'shared');
const STALE_LOCK = 10 * 60_000;
const STALE_COPY = 30 * 60_000;

/** Runs `make` in one worker at a time; a folder is the lock, and one left by a worker that died is broken after ten minutes. */
async function alone<T>(name: string, make: () => Promise<T>): Promise<T> {
  await mkdir(SHARED, { recursive: true });
  const lock = join(SHARED, `${name}.lock`);
  for (;;) {
    try {
      await mkdir(lock);
      break;
    } catch {
      const age = await stat(lock).then(
        ({ mtimeMs }) => Date.now() - mtimeMs,
        () => 0,
      );
      if (age > STALE_LOCK) await rm(lock, { recursive: true, force: true });
      await new Promise((resolve) => setTimeout(resolve, 100));
    }
  }
  try {
    return await make();
  } finally {
    await rm(lock, { recursive: true, force: true });
  }
}

/** What Vitest sets in the environment; a build would take DEV and the rest for its own mode. */
const OF_VITEST = /^(VITEST.*|NODE_OPTIONS|NODE_ENV|TEST|DEV|PROD|SSR|MODE|BASE_URL)$/;

function runNode(args: string[], env: Record<string, string> = {}): Promise<void> {
  const rest = Object.fromEntries(Object.entries(process.env).filter(([name]) => !OF_VITEST.test(name)));
  return new Promise((resolve, reject) => {
    const child = spawn(process.execPath, args, {
      cwd: ROOT,
      env: { ...rest, ...env },
      stdio: ['ignore', 'pipe', 'pipe'],
    });
    let text = '';
    child.stdout.on('data', (part: Buffer) => (text += part.toString()));
    child.stderr.on('data', (part: Buffer) => (text += part.toString()));
    child.on('exit', (code) => {
      if (code === 0) resolve();
      else reject(new Error(`${args.join(' ')} failed:\n${text}`));
    });
  });
}

let built: Promise<string> | undefined;

/**
 * Builds the server when the sources are newer than the build, and answers the entry of a copy: a server that loads its pages one by one
 * must not have them replaced by the next build. Once a worker.
 */
export function ensureBuilt(): Promise<string> {
  built ??= alone('build', async () => {
    await runNode(['scripts/build.mjs', '--if-stale']);
    const at = Math.floor(statSync(join(ROOT, 'dist/built-at')).mtimeMs);
    const copy = join(SHARED, `dist-${at}`);
    if (!existsSync(copy)) {
      const old = readdirSync(SHARED).filter(
        (name) => /^dist-\d+$/.test(name) && at - Number(name.slice(5)) > STALE_COPY,
      );
      for (const name of old) await rm(join(SHARED, name), { recursive: true, force: true });
      await cp(join(ROOT, 'dist'), copy, { recursive: true });
    }
    return join(copy, 'server/entry.mjs');
  });
  return built;
}

function newest(path: string): number {
  const found = statSync(path, { throwIfNoEntry: false });
  if (!found) return 0;
  if (!found.isDirectory()) return found.mtimeMs;
  return Math.max(found.mtimeMs, ...readdirSync(path).map((name) => newest(join(path, name))));
}

/** The file of a seeded database to copy; made again when seeds, migrations, domain or engine are newer, and each day: its dates move with the day. */
export async function ensureTemplate(kind: 'demo' | 'large'): Promise<string> {
  return alone(`seed-${kind}`, async () => {
    const folder = join(SHARED, kind);
    const file = join(folder, 'setwright.db');
    const from = [
      'seeds',
      'migrations',
      'src/data',
      'src/domain',
      'src/engine',
      'src/auth',
      'scripts/seed.ts',
    ];
    const made = existsSync(file) ? statSync(file).mtimeMs : 0;
    const sameDay = new Date(made).toDateString() === new Date().toDateString();
    if (sameDay && made > Math.max(...from.map((name) => newest(join(ROOT, name))))) return file;
    await rm(folder, { recursive: true, force: true });
    const flags = kind === 'large' ? ['--large'] : [];
    await runNode(['--import', 'tsx', 'scripts/seed.ts', ...flags], { SETWRIGHT_DATA_DIR: folder });
    return file;
  });
}
