import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE TABLE IF NOT EXISTS orchards (
      id UUID NOT NULL PRIMARY KEY,
      owner_id UUID NOT NULL,
      name VARCHAR(120) NOT NULL CHECK (CHAR_LENGTH(name) > 0),
      latitude DECIMAL(9, 6) NULL CHECK (latitude BETWEEN -90 AND 90),
      longitude DECIMAL(9, 6) NULL CHECK (longitude BETWEEN -180 AND 180),
      elevation_m DECIMAL(6, 1) NULL CHECK (elevation_m BETWEEN -500 AND 9000),
      time_zone VARCHAR(64) NOT NULL DEFAULT 'Etc/UTC',
      sun ENUM('full', 'part', 'shade') NULL,
      wind ENUM('sheltered', 'breezy', 'exposed') NULL,
      water ENUM('dry', 'moderate', 'wet') NULL,
      revision INT UNSIGNED NOT NULL DEFAULT 1,
      created_at DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
      updated_at DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
      KEY orchards_owner (owner_id, name),
      CONSTRAINT orchards_point CHECK ((latitude IS NULL) = (longitude IS NULL)),
      CONSTRAINT orchards_owner_fk FOREIGN KEY (owner_id) REFERENCES people (id)
    )
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE IF EXISTS orchards');
}
