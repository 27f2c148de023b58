/// <reference types="vite/client" />
/* The type of Knex's own better-sqlite3 client, which the package ships without one; and what Vite adds to import.meta. */
declare module 'knex/lib/dialects/better-sqlite3/index.js' {
  import { type Knex } from 'knex';

  type Query = { sql: string; bindings?: unknown[] };
  export default class Client {
    constructor(config: Knex.Config);
    _query(connection: unknown, query: Query): Promise<unknown>;
  }
}
