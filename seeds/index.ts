/* The public face of the seeds: the invented site, a larger one varied from it for the benchmarks, and Knex's own entry. */
import { type Db } from '@data/connection';
import { seedDemo } from './load/demo';

export { DEMO_PASSWORD, seedDemo, type SeededSite, type SeedOptions } from './load/demo';
export { type LargeOptions, seedLarge } from './load/large';
export { type StoreFile } from './load/photos';
export { type HashPassword } from './load/site';

/** What `knex seed:run` calls: the invented site as of today. */
export async function seed(db: Db): Promise<void> {
  const { hashPassword } = await import('@auth/index');
  await seedDemo(db, { today: new Date().toISOString().slice(0, 10), hashPassword });
}
