/* Starts the built server on a free port with its own data folder, for integration and browser tests. */
import { type ChildProcess, spawn } from 'node:child_process';
import { cp, mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { ensureBuilt, ensureTemplate } from './prepare';

export const ROOT = dirname(dirname(dirname(fileURLToPath(import.meta.url))));

export type ServerOptions = {
  /** `demo` copies the seeded database, `large` that of the benchmarks, `empty` starts without one. */
  data?: 'demo' | 'large' | 'empty';
  env?: Record<string, string>;
};

export type CaughtMessage = {
  id: string;
  from: string;
  to: string[];
  subject: string;
  text: string;
  at: string;
};

export type TestServer = {
  url: string;
  dataDir: string;
  /** Everything that the server printed so far. */
  output(): string;
  /** The mails that came out, the newest first. */
  mails(query?: { to?: string; contains?: string }): Promise<CaughtMessage[]>;
  /** Sends SIGTERM, waits for the end, removes the data folder; answers the exit code. */
  stop(options?: { keepData?: boolean }): Promise<number | null>;
};

function cleanEnv(own: Record<string, string>): Record<string, string | undefined> {
  const inherited = Object.entries(process.env).filter(
    ([name]) => !/^(SETWRIGHT_|PORT$|HOST$|VITEST|NODE_OPTIONS)/.test(name),
  );
  return { ...Object.fromEntries(inherited), NODE_ENV: 'production', ...own };
}

/** Starts a built server's entry and collects its output. */
export function spawnServer(
  entry: string,
  env: Record<string, string>,
): { child: ChildProcess; output: () => string } {
  const child = spawn(process.execPath, [entry], {
    cwd: ROOT,
    env: cleanEnv(env),
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  let text = '';
  const add = (part: Buffer) => {
    text += part.toString('utf8');
  };
  child.stdout?.on('data', add);
  child.stderr?.on('data', add);
  return { child, output: () => text };
}

/** Waits for the exit code of a process; null when a signal ended it. */
export function exitOf(child: ChildProcess): Promise<number | null> {
  if (child.exitCode !== null || child.signalCode !== null) return Promise.resolve(child.exitCode);
  return new Promise((resolve) =>
    child.once('exit', (code) => {
      resolve(code);
    }),
  );
}

async function addressOf(child: ChildProcess, output: () => string): Promise<string> {
  const deadline = Date.now() + 30_000;
  while (Date.now() < deadline) {
    const found = /"address":"([^"]+)"/.exec(output());
    if (found?.[1]) return found[1];
    if (child.exitCode !== null) break;
    await new Promise((resolve) => setTimeout(resolve, 25));
  }
  child.kill('SIGKILL');
  throw new Error(`The server did not start:\n${output()}`);
}

/** Starts a server that answers; builds and seeds first where that is missing. */
export async function startServer({ data = 'demo', env = {} }: ServerOptions = {}): Promise<TestServer> {
  const entry = await ensureBuilt();
  const dataDir = await mkdtemp(join(tmpdir(), 'setwright-test-'));
  if (data !== 'empty') await cp(await ensureTemplate(data), join(dataDir, 'setwright.db'));
  const demo = data === 'empty' ? 'off' : 'on';
  const { child, output } = spawnServer(entry, {
    PORT: '0',
    SETWRIGHT_DATA_DIR: dataDir,
    SETWRIGHT_DEMO: demo,
    ...env,
  });
  const url = await addressOf(child, output);
  return {
    url,
    dataDir,
    output,
    async mails(query = {}) {
      const answer = await fetch(`${url}/mail/messages.json?${new URLSearchParams(query).toString()}`);
      return ((await answer.json()) as { messages: CaughtMessage[] }).messages;
    },
    async stop({ keepData = false } = {}) {
      const ended = exitOf(child);
      child.kill('SIGTERM');
      const code = await ended;
      if (!keepData) await rm(dataDir, { recursive: true, force: true });
      return code;
    },
  };
}
