import { afterAll, beforeAll, inject } from 'vitest';
import { connect } from '@/db/connection';
import { migrate } from '@/db/migrate';
import { closeDatabase, database } from '@/lib/database';
import { syncSpecies } from '@/lib/species/sync';

// Every worker has a database of its own; its tables are emptied before each test file.
const name = `aftercut_test_${process.env['VITEST_POOL_ID'] ?? '1'}`;
process.env['DATABASE_URL'] = `${inject('databaseServer')}${name}`;
process.env['DEMO'] = '0';

beforeAll(async () => {
  const server = connect(`${inject('databaseServer')}aftercut`, { poolMax: 1 });
  await server.raw('CREATE DATABASE IF NOT EXISTS ??', [name]);
  await server.destroy();
  await migrate(database());
  await emptyTables();
  await syncSpecies(database());
});

afterAll(closeDatabase);

/** Empties every table but knex's own. */
export async function emptyTables(): Promise<void> {
  const db = database();
  const [tables] = (await db.raw(
    "SELECT table_name AS name FROM information_schema.tables WHERE table_schema = DATABASE() AND table_name NOT LIKE 'knex%'",
  )) as [{ name: string }[]];
  await db.transaction(async (one) => {
    await one.raw('SET FOREIGN_KEY_CHECKS = 0');
    for (const table of tables) await one.raw('DELETE FROM ??', [table.name]);
    await one.raw('SET FOREIGN_KEY_CHECKS = 1');
  });
}
