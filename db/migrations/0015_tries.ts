import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE TABLE IF NOT EXISTS tries (
      \`key\` VARCHAR(255) NOT NULL PRIMARY KEY,
      points INT NOT NULL DEFAULT 0,
      expire BIGINT UNSIGNED NULL,
      KEY tries_expire (expire)
    )
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS tries');
}
