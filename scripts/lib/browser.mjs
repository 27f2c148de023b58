/* Finds the Chromium that the browser tests drive; on Debian as root it installs it. */
import { existsSync } from 'node:fs';
import { run, say } from './run.mjs';

const DEBIAN_CHROMIUM = '/usr/bin/chromium';

/** The path of Chromium, or undefined after a sentence that says what to install. */
export async function findBrowser() {
  const path = process.env.CHROMIUM_PATH || DEBIAN_CHROMIUM;
  if (existsSync(path)) return path;
  const debianRoot = existsSync('/etc/debian_version') && process.getuid?.() === 0;
  if (debianRoot && !process.env.CHROMIUM_PATH) {
    say('Installing Chromium for the browser tests (apt-get install chromium).');
    const apt = { DEBIAN_FRONTEND: 'noninteractive' };
    await run('apt-get', ['update', '-qq'], apt);
    await run('apt-get', ['install', '-y', '-qq', '--no-install-recommends', 'chromium'], apt);
    if (existsSync(path)) return path;
  }
  say(`The browser tests need Chromium at ${path}: install it, or set CHROMIUM_PATH to where it is.`);
  return undefined;
}
