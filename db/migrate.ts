import { readdirSync } from 'node:fs';
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

const LOCK = 'aftercut-migrate';
const LOCK_SECONDS = 120;

/** Brings the tables up to date; two at once queue up. Gives the names of what was run. */
export async function migrate(knex: Knex): Promise<string[]> {
  return knex.transaction(async (held) => {
    const [[lock]] = (await held.raw('SELECT GET_LOCK(?, ?) AS got', [LOCK, LOCK_SECONDS])) as [
      { got: number }[],
    ];
    if (lock?.got !== 1)
      throw new Error('Another start is still bringing the tables up to date. Try again in a minute.');
    try {
      // Whoever held knex's own lock and was killed never gave it back; under ours nobody else can hold it.
      await knex.migrate.forceFreeMigrationsLock(migrationConfig);
      const [, done] = (await knex.migrate.latest(migrationConfig)) as [number, string[]];
      return done;
    } finally {
      await held.raw('SELECT RELEASE_LOCK(?)', [LOCK]);
    }
  });
}
