/* `npm start`: installs and builds what is missing, loads the invented site into a new database, then becomes the server. */
import { subscribe } from 'node:diagnostics_channel';
import { existsSync, readFileSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { buildIsCurrent, packagesAreCurrent } from './lib/fresh.mjs';
import { ROOT, run, say, stopUnless } from './lib/run.mjs';

const { env } = process;
const demo = (env.SETWRIGHT_DEMO || 'on') === 'on';
const dataDir = resolve(env.SETWRIGHT_DATA_DIR || join(ROOT, 'data'));

async function install() {
  if (packagesAreCurrent(ROOT)) return;
  say('Installing packages (npm ci); the first time takes about two minutes.');
  stopUnless(await run('npm', ['ci', '--no-audit', '--no-fund']), 'The packages could not be installed.');
}

async function build() {
  if (buildIsCurrent(ROOT)) return;
  say('Building; this takes about twenty seconds.');
  stopUnless(await run(process.execPath, ['scripts/build.mjs']), 'Setwright was not started.');
}

async function seed() {
  if (!demo || existsSync(join(dataDir, 'setwright.db'))) return;
  say(`Loading the invented site into ${dataDir}.`);
  const code = await run(process.execPath, ['--import', 'tsx', 'scripts/seed.ts'], {
    SETWRIGHT_DATA_DIR: dataDir,
  });
  stopUnless(code, 'The invented site could not be loaded; Setwright was not started.');
}

function greet({ port }) {
  const host = env.HOST || '127.0.0.1';
  say(`\nSetwright on http://${host}:${port} (data in ${dataDir}; Ctrl+C stops it)`);
  const signIns = join(dataDir, 'sign-ins.json');
  if (!demo || !existsSync(signIns)) return;
  const { password, people } = JSON.parse(readFileSync(signIns, 'utf8'));
  say(`Demonstration sign-ins, all with the password ${password}:`);
  for (const { email, name, roles } of people) say(`  ${email.padEnd(34)} ${name}: ${roles.join(', ')}`);
  say('');
}

if (Number(process.versions.node.split('.')[0]) !== 20) {
  stopUnless(1, `Setwright runs on Node 20; this is ${process.version}.`);
}
await install();
await build();
await seed();
process.env.SETWRIGHT_DATA_DIR = dataDir;
process.env.NODE_ENV ??= 'production';
subscribe('setwright:listening', greet);
// The server is loaded into this very process, so that a signal reaches it and nothing stays behind.
await import('../dist/server/entry.mjs');
