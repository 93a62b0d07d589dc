import type { Knex } from 'knex';
import { connect } from '@/db/connection';
import { env } from '@/lib/env';

/** A connection or a transaction: what every query is handed. */
export type Db = Knex | Knex.Transaction;

const STATEMENT_TIMEOUT_SECONDS = 10;

// One pool a process, also when a bundler loads this module more than once.
const shared = globalThis as typeof globalThis & { aftercutPool?: Knex };

/** The process's one pool. */
export function database(): Knex {
  const url = env().DATABASE_URL;
  if (!url) throw new Error('DATABASE_URL is not set: start the app with "npm start".');
  return (shared.aftercutPool ??= connect(url, {
    poolMax: 10,
    statementTimeoutSeconds: STATEMENT_TIMEOUT_SECONDS,
  }));
}

/** Closes the pool; the next `database()` opens a new one. */
export async function closeDatabase(): Promise<void> {
  const pool = shared.aftercutPool;
  delete shared.aftercutPool;
  await pool?.destroy();
}
