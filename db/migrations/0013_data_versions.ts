import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE TABLE IF NOT EXISTS data_versions (
      subject VARCHAR(100) CHARACTER SET ascii NOT NULL PRIMARY KEY,
      version BIGINT UNSIGNED NOT NULL DEFAULT 1
    )
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS data_versions');
}
