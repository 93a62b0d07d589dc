import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE TABLE IF NOT EXISTS reading_branches (
      revision_id INT UNSIGNED NOT NULL,
      reading_id UUID NOT NULL,
      branch SMALLINT UNSIGNED NOT NULL CHECK (branch BETWEEN 1 AND 500),
      shoots SMALLINT UNSIGNED NULL CHECK (shoots <= 999),
      PRIMARY KEY (revision_id, reading_id, branch),
      CONSTRAINT reading_branches_reading_fk FOREIGN KEY (revision_id, reading_id)
        REFERENCES readings (revision_id, id) ON DELETE CASCADE
    )
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS reading_branches');
}
