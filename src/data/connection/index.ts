/* The public face of the connection: open, migrate, transaction, is the schema current. */
export { databaseConfig, openDatabase, transaction, type Db, type OpenOptions } from './open';
export { migrate, migrationSource, schemaIsCurrent } from './migrate';
