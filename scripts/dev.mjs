/* `npm run dev`: loads the invented site into a new database, then starts Astro's development server. */
import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { ROOT, run, runBin, stopUnless } from './lib/run.mjs';

const dataDir = process.env.SETWRIGHT_DATA_DIR || join(ROOT, 'data');
if (!existsSync(join(dataDir, 'setwright.db')) && process.env.SETWRIGHT_DEMO !== 'off') {
  stopUnless(
    await run(process.execPath, ['--import', 'tsx', 'scripts/seed.ts']),
    'The invented site could not be loaded.',
  );
}
const port = process.env.PORT || '4321';
process.exitCode = await runBin('astro/astro.js', ['dev', '--host', '127.0.0.1', '--port', port]);
