/* Builds the server and the browser's scripts into dist, and notes when. `--if-stale` does nothing when dist is newer than the sources. */
import { buildIsCurrent, stampBuild } from './lib/fresh.mjs';
import { ROOT, runBin, say, stopUnless } from './lib/run.mjs';

if (process.argv.includes('--if-stale') && buildIsCurrent(ROOT)) {
  say('The build is newer than the sources.');
} else {
  const at = new Date();
  const code = await runBin('astro/astro.js', ['build'], {
    ASTRO_TELEMETRY_DISABLED: '1',
    NODE_ENV: 'production',
  });
  stopUnless(code, 'The build failed.');
  stampBuild(ROOT, at);
}
