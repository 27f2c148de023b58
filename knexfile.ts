/* Knex's own configuration, for its command line; migrations run through src/data/connection only. */
import { join } from 'node:path';
import { type Knex } from 'knex';
import { databaseConfig } from './src/data/connection/open';
import { migrationSource } from './src/data/connection/migrate';

const folder = process.env['SETWRIGHT_DATA_DIR'] ?? './data';

const config: Knex.Config = {
  ...databaseConfig(join(folder, 'setwright.db')),
  migrations: { migrationSource, tableName: 'migrations' },
  seeds: { directory: './seeds', extension: 'ts', loadExtensions: ['.ts'] },
};

export default config;
