/* Before the browser tests: the build and the seeded database are made once, so that no worker's first test waits for them. */
import { ensureBuilt, ensureTemplate } from './prepare';

export default async function prepareAll(): Promise<void> {
  await ensureBuilt();
  await ensureTemplate('demo');
}
