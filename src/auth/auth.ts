/* What the functions of this folder share: the database, Lucia and the counters of attempts; one a server. */
import { type Db } from '@data/connection';
import { createLimits, type Limits } from './limits';
import { createLucia } from './lucia';

export type Auth = { db: Db; lucia: ReturnType<typeof createLucia>; limits: Limits };

/** Opens sign-in on a database. `secure`: people reach the site by https, so cookies carry Secure. */
export function openAuth(db: Db, options: { secure: boolean }): Auth {
  return { db, lucia: createLucia(db, options), limits: createLimits() };
}
