import { readdirSync } from 'node:fs';
import { setTimeout as wait } from 'node:timers/promises';
import { fileURLToPath, pathToFileURL } from 'node:url';
import type { Knex } from 'knex';

const FOLDER = fileURLToPath(new URL('./migrations/', import.meta.url));

/** The migrations as they lie, TypeScript and all; their names keep the ending, here and in knex's own command line. */
export const migrationSource: Knex.MigrationSource<string> = {
  getMigrations: async () =>
    readdirSync(FOLDER)
      .filter((name) => name.endsWith('.ts'))
      .sort(),
  getMigrationName: (name) => name,
  getMigration: (name) =>
    import(/* webpackIgnore: true */ pathToFileURL(FOLDER + name).href) as Promise<Knex.Migration>,
};

/** Statements that change tables commit by themselves, so a migration is re-runnable in place of a transaction. */
export const migrationConfig: Knex.MigratorConfig = { migrationSource, disableTransactions: true };

const LOCK_SECONDS = 120;
const KNEX_LOCK_MS = 10_000;
const LOOK_MS = 250;

/** Brings the tables up to date; two at once queue up. Gives the names of what was run. Takes two of the pool. */
export async function migrate(knex: Knex): Promise<string[]> {
  return knex.transaction(async (held) => {
    const [[lock]] = (await held.raw(
      `SET STATEMENT max_statement_time = 0 FOR SELECT GET_LOCK(CONCAT('migrate ', DATABASE()), ?) AS got`,
      [LOCK_SECONDS],
    )) as [{ got: number }[]];
    if (lock?.got !== 1)
      throw new Error('Another start is still bringing the tables up to date. Try again in a minute.');
    try {
      await freeKnexLock(knex);
      const [, done] = (await knex.migrate.latest(migrationConfig)) as [number, string[]];
      return done;
    } finally {
      await held.raw(`SELECT RELEASE_LOCK(CONCAT('migrate ', DATABASE()))`);
    }
  });
}

/**
 * A migration that was killed never gives knex's own lock back. Under our lock its holder can only be that one, or
 * knex's command line at work just now, which gets a moment to end.
 */
async function freeKnexLock(knex: Knex): Promise<void> {
  if (!(await knex.schema.hasTable('knex_migrations_lock'))) return;
  const deadline = Date.now() + KNEX_LOCK_MS;
  while (await knex('knex_migrations_lock').where('is_locked', 1).first()) {
    if (Date.now() > deadline) return knex.migrate.forceFreeMigrationsLock(migrationConfig);
    await wait(LOOK_MS);
  }
}
