/* The server's entry: checks the settings, takes the port, opens the database, then serves until it is told to stop. */
import { channel } from 'node:diagnostics_channel';
import { createServer, type RequestListener, type Server } from 'node:http';
import { type AddressInfo } from 'node:net';
import { setTimeout as wait } from 'node:timers/promises';
import { createExports as adapterExports } from '@astrojs/node/server.js';
import { type SSRManifest } from 'astro';
import { readConfig, type Config } from './config';
import { SECURITY_HEADERS } from './http/headers';
import { startRuntime, type Runtime } from './runtime';
import { workChecksAhead } from './services/views/method-checks';

type AdapterOptions = Parameters<typeof adapterExports>[1];

/** How long open requests may take to finish after SIGTERM. */
const GRACE = 5_000;

/** When the check values of the methods are worked, after the start and between two methods: never before a reader. Milliseconds. */
const AHEAD_AFTER = 20_000;
const AHEAD_PAUSE = 100;

/** Says why the server can't start, without a stack, and ends. */
function giveUp(sentences: string[]): never {
  process.stderr.write(
    `Setwright did not start:\n${sentences.map((sentence) => `  - ${sentence}\n`).join('')}`,
  );
  process.exit(1);
}

function whyNotListening(error: NodeJS.ErrnoException, config: Config): string {
  const where = `${config.host}:${config.port}`;
  if (error.code === 'EADDRINUSE')
    return `Port ${config.port} on ${config.host} is in use. Stop what uses it, or choose another by PORT.`;
  if (error.code === 'EACCES') return `This user may not listen on ${where}. Choose a PORT above 1023.`;
  return `The server can't listen on ${where}: ${error.message}`;
}

/** Takes the port first, so that a second start fails before it touches the database. */
function listen(server: Server, config: Config): Promise<number> {
  return new Promise((resolve) => {
    server.once('error', (error) => giveUp([whyNotListening(error, config)]));
    server.listen(config.port, config.host, () => {
      resolve((server.address() as AddressInfo).port);
    });
  });
}

/** Assets bypass the middleware, so the fixed headers are set before anything answers. */
function withHeaders(handler: RequestListener): RequestListener {
  return (request, response) => {
    for (const [name, value] of Object.entries(SECURITY_HEADERS)) response.setHeader(name, value);
    handler(request, response);
  };
}

/** Stops accepting, lets open requests finish, closes worker, catcher and database, and ends with code 0. */
function stopOn(server: Server, runtime: Runtime): void {
  let stopping = false;
  const stop = async () => {
    const closed = new Promise((resolve) => server.close(resolve));
    server.closeIdleConnections();
    const cut = setTimeout(() => {
      server.closeAllConnections();
    }, GRACE);
    await closed;
    clearTimeout(cut);
    await runtime.close();
    runtime.log.info('stopped');
    process.exit(0);
  };
  const once = () => {
    if (stopping) return;
    stopping = true;
    stop().catch((error: unknown) => {
      runtime.log.error({ err: error }, 'did not stop cleanly');
      process.exit(1);
    });
  };
  process.on('SIGTERM', once);
  process.on('SIGINT', once);
}

async function run(manifest: SSRManifest, options: AdapterOptions): Promise<void> {
  const read = readConfig(process.env);
  if (!read.ok) giveUp(read.sentences);
  let handler: RequestListener = (_request, response) => {
    response.writeHead(503, { 'Retry-After': '2' }).end('Starting.');
  };
  const server = createServer(
    withHeaders((request, response) => {
      handler(request, response);
    }),
  );
  const port = await listen(server, read.config);
  const runtime = await startRuntime(read.config, port).catch((error: unknown) => {
    const why = error instanceof Error ? error.message : String(error);
    return giveUp([`The database ${read.config.databaseFile} can't be opened: ${why}`]);
  });
  handler = adapterExports(manifest, options).handler as RequestListener;
  stopOn(server, runtime);
  const mail = runtime.catcher ? `${runtime.catcher.url}, read on /mail` : 'sent by SMTP';
  runtime.log.info(
    { address: `http://${read.config.host}:${port}`, mail, version: runtime.version },
    'listening',
  );
  channel('setwright:listening').publish({ port });
  await wait(AHEAD_AFTER, undefined, { ref: false });
  await workChecksAhead(() => wait(AHEAD_PAUSE, undefined, { ref: false }));
}

/** Astro's generated entry calls this as soon as it is loaded. */
export function start(manifest: SSRManifest, options: AdapterOptions): void {
  void run(manifest, options);
}

export { nothing as createExports };

/** Astro's generated entry asks what the server exports: nothing. */
function nothing(): Record<string, never> {
  return {};
}
