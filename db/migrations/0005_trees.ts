import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE TABLE IF NOT EXISTS trees (
      id UUID NOT NULL PRIMARY KEY,
      orchard_id UUID NOT NULL,
      label VARCHAR(80) NOT NULL CHECK (CHAR_LENGTH(label) > 0),
      species VARCHAR(80) CHARACTER SET ascii NULL,
      cultivar VARCHAR(120) NULL,
      year_planted SMALLINT NULL CHECK (year_planted BETWEEN 1000 AND 2200),
      revision INT UNSIGNED NOT NULL DEFAULT 1,
      created_at DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
      updated_at DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
      KEY trees_orchard (orchard_id, label),
      CONSTRAINT trees_orchard_fk FOREIGN KEY (orchard_id) REFERENCES orchards (id) ON DELETE CASCADE,
      CONSTRAINT trees_species_fk FOREIGN KEY (species) REFERENCES species (slug)
    )
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS trees');
}
