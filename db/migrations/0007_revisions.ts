import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE TABLE IF NOT EXISTS revisions (
      id INT UNSIGNED NOT NULL AUTO_INCREMENT PRIMARY KEY,
      entry_id UUID NOT NULL,
      number INT UNSIGNED NOT NULL,
      author_id UUID NOT NULL,
      title VARCHAR(200) NULL,
      species VARCHAR(80) CHARACTER SET ascii NULL,
      cultivar VARCHAR(120) NULL,
      orchard_id UUID NULL,
      tree_id UUID NULL,
      sun ENUM('full', 'part', 'shade') NULL,
      wind ENUM('sheltered', 'breezy', 'exposed') NULL,
      water ENUM('dry', 'moderate', 'wet') NULL,
      elevation_m DECIMAL(6, 1) NULL CHECK (elevation_m BETWEEN -500 AND 9000),
      doc MEDIUMTEXT NOT NULL CHECK (JSON_VALID(doc)),
      schema_version SMALLINT UNSIGNED NOT NULL,
      created_at DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
      saved_at DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
      accepted_at DATETIME(3) NULL,
      accepted_by UUID NULL,
      KEY revisions_entry (entry_id, number),
      KEY revisions_species (species),
      KEY revisions_orchard (orchard_id),
      CONSTRAINT revisions_entry_fk FOREIGN KEY (entry_id) REFERENCES entries (id) ON DELETE CASCADE,
      CONSTRAINT revisions_author_fk FOREIGN KEY (author_id) REFERENCES people (id),
      CONSTRAINT revisions_accepter_fk FOREIGN KEY (accepted_by) REFERENCES people (id),
      CONSTRAINT revisions_species_fk FOREIGN KEY (species) REFERENCES species (slug),
      CONSTRAINT revisions_orchard_fk FOREIGN KEY (orchard_id) REFERENCES orchards (id),
      CONSTRAINT revisions_tree_fk FOREIGN KEY (tree_id) REFERENCES trees (id) ON DELETE SET NULL
    )
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS revisions');
}
