import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE TABLE IF NOT EXISTS species (
      slug VARCHAR(80) CHARACTER SET ascii NOT NULL PRIMARY KEY,
      scientific VARCHAR(120) NOT NULL,
      genus VARCHAR(60) NOT NULL,
      wood ENUM('soft', 'medium', 'hard') NULL
    )
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS species');
}
