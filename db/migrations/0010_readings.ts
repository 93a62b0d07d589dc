import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE TABLE IF NOT EXISTS readings (
      revision_id INT UNSIGNED NOT NULL,
      id UUID NOT NULL,
      revision INT UNSIGNED NOT NULL DEFAULT 1,
      date DATE NULL,
      date_approximate ENUM('month', 'season') NULL,
      total INT UNSIGNED NULL,
      branches SMALLINT UNSIGNED NULL CHECK (branches BETWEEN 1 AND 500),
      longest_shoot_m DECIMAL(9, 6) NULL CHECK (longest_shoot_m BETWEEN 0 AND 100),
      dieback_m DECIMAL(9, 6) NULL CHECK (dieback_m BETWEEN 0 AND 100),
      removed INT UNSIGNED NULL,
      kept INT UNSIGNED NULL,
      note VARCHAR(2000) NULL,
      thinned BOOLEAN NOT NULL DEFAULT FALSE,
      set_aside BOOLEAN NOT NULL DEFAULT FALSE,
      PRIMARY KEY (revision_id, id),
      KEY readings_id (id),
      CONSTRAINT readings_total CHECK (total IS NULL OR branches IS NULL OR total <= 999 * branches),
      CONSTRAINT readings_revision_fk FOREIGN KEY (revision_id) REFERENCES revisions (id) ON DELETE CASCADE,
      CONSTRAINT readings_id_fk FOREIGN KEY (id) REFERENCES reading_ids (id) ON DELETE CASCADE
    )
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS readings');
}
