/* What a running server holds open: settings, database, log, clock, mail catcher and outbox worker; opened once, closed once. */
import { join } from 'node:path';
import { type Auth, openAuth, sweepSessions } from '@auth/index';
import { migrate, openDatabase, type Db } from '@data/connection';
import { sweepAnswers } from '@data/idempotency';
import { databaseOutbox, makeMailer, startCatcher, startWorker, type Catcher } from '@notices/index';
import { version } from '../package.json';
import { readConfig, type Config } from './config';
import { makeLog, type Log } from './http/log';

export type Clock = () => Date;

export type Runtime = {
  config: Config & { baseUrl: string };
  db: Db;
  auth: Auth;
  log: Log;
  clock: Clock;
  catcher: Catcher | undefined;
  version: string;
  /** Finishes the message being sent, then closes catcher and database: no -wal file stays behind. */
  close(): Promise<void>;
};

// The middleware and the entry are bundled apart, and the development server loads modules again: both must find the same one.
const HELD = Symbol.for('setwright.runtime');
type Holder = { [HELD]?: Promise<Runtime> };
const holder = globalThis as Holder;

const clock: Clock = () => new Date();

/** How this machine reaches the server, for links when no address is configured. */
function addressOf(host: string, port: number): string {
  const name = host === '0.0.0.0' || host === '::' ? 'localhost' : host;
  return `http://${name.includes(':') ? `[${name}]` : name}:${port}`;
}

const HOUR = 3_600_000;

/** Forgets sessions that ended and answers kept for repeated requests, now and every six hours. */
function keepSwept(db: Db, log: Log): NodeJS.Timeout {
  const sweep = async () => {
    const now = clock().getTime();
    await sweepSessions(db, new Date(now).toISOString());
    await sweepAnswers(db, new Date(now - 48 * HOUR).toISOString());
  };
  const swept = () => {
    sweep().catch((error: unknown) => {
      log.error({ err: error }, 'sweeping failed');
    });
  };
  swept();
  return setInterval(swept, 6 * HOUR).unref();
}

async function open(config: Config, port: number): Promise<Runtime> {
  const log = makeLog(config.logLevel);
  const db = openDatabase(config.databaseFile);
  await migrate(db);
  const catcher = config.smtpUrl
    ? undefined
    : await startCatcher(config.catcherPort, join(config.dataDir, 'mails.jsonl'), clock);
  const mailer = makeMailer(config.smtpUrl ?? catcher?.url ?? '', config.mailFrom);
  const baseUrl = config.baseUrl ?? addressOf(config.host, port);
  const sweeper = keepSwept(db, log);
  const worker = startWorker(databaseOutbox(db, baseUrl), mailer, clock, log);
  return {
    config: { ...config, baseUrl },
    db,
    auth: openAuth(db, { secure: config.secure }),
    log,
    clock,
    catcher,
    version,
    async close() {
      clearInterval(sweeper);
      await worker.stop();
      await catcher?.close();
      await db.destroy();
    },
  };
}

/** Opens everything; the port is the one that the server listens on, for links in notices when no address is configured. */
export function startRuntime(config: Config, port: number): Promise<Runtime> {
  holder[HELD] = open(config, port);
  return holder[HELD];
}

/** What the server opened. The development server has no entry of ours: there the first request opens it. */
export function currentRuntime(): Promise<Runtime> {
  const held = holder[HELD];
  if (held) return held;
  if (!import.meta.env.DEV) throw new Error('The server was not started by its entry.');
  const read = readConfig(process.env);
  if (!read.ok) throw new Error(read.sentences.join(' '));
  return startRuntime(read.config, read.config.port);
}
