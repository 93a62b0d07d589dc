import { connect } from '@/db/connection';
import { migrate } from '@/db/migrate';
import { saying } from '@/db/server/run';
import { seedIfEmpty } from '@/lib/demo/seed';
import type { Env } from '@/lib/env';
import { say } from './say';

const MIGRATION_SECONDS = 600;

/**
 * Tables up to date, the catalogue in step, and the demo where nobody is yet.
 * @throws Error of one line when the database does not answer
 */
export async function prepare(databaseUrl: string, settings: Env): Promise<void> {
  const db = connect(databaseUrl, { poolMax: 2, statementTimeoutSeconds: MIGRATION_SECONDS });
  try {
    await saying(
      say,
      'Waiting for the database to answer',
      db.raw('SELECT 1').then(undefined, (error: NodeJS.ErrnoException) => {
        throw new Error(
          `The database of DATABASE_URL cannot be used (${error.code ?? error.name}). Does it run, and do user and password fit?`,
        );
      }),
    );
    await saying(say, 'Waiting for the tables to be brought up to date', migrate(db));
    await saying(say, 'Waiting for the catalogue and the demo', seedIfEmpty(db, settings, say));
  } finally {
    await db.destroy();
  }
}
